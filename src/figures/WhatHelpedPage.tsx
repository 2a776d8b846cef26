export function WhatHelpedPage() {
  return null;
}
