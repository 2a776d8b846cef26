export function AdminMailPage() {
  return null;
}
