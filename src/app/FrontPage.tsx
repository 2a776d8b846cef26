export function FrontPage() {
  return null;
}
