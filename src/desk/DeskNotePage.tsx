export function DeskNotePage() {
  return null;
}
