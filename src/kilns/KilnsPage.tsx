export function KilnsPage() {
  return null;
}
