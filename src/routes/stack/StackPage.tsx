export function StackPage() {
  return null;
}
