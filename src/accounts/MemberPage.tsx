export function MemberPage() {
  return null;
}
