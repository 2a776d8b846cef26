export function PreviewPage() {
  return null;
}
