export function EditKilnPage() {
  return null;
}
