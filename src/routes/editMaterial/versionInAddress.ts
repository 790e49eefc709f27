/** The version that an address names; null for none, or for what cannot be one. */
export function versionInAddress(text: string | null): number | null {
  const version = Number(text);
  return Number.isInteger(version) && version > 0 ? version : null;
}
