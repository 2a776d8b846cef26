export function FindPage() {
  return null;
}
