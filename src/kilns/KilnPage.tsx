export function KilnPage() {
  return null;
}
