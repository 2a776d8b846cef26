export function AdminStatePage() {
  return null;
}
