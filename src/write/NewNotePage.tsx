export function NewNotePage() {
  return null;
}
