export function NewKilnPage() {
  return null;
}
