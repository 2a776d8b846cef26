export function NewestPage() {
  return null;
}
