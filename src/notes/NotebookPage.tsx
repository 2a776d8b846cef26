export function NotebookPage() {
  return null;
}
