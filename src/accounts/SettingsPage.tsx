export function SettingsPage() {
  return null;
}
