export function RunPage() {
  return null;
}
