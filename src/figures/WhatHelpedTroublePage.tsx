export function WhatHelpedTroublePage() {
  return null;
}
