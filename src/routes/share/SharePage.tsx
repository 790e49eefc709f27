export function SharePage() {
  return null;
}
