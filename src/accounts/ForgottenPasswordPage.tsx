export function ForgottenPasswordPage() {
  return null;
}
