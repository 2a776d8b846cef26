export function AdminAuditPage() {
  return null;
}
