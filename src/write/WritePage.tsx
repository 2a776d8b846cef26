export function WritePage() {
  return null;
}
