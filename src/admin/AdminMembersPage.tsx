export function AdminMembersPage() {
  return null;
}
