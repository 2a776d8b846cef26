export function ConfirmAddressPage() {
  return null;
}
