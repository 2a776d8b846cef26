export function NewPasswordPage() {
  return null;
}
