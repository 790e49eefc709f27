/** @param publicUrl where people reach the server, without a slash at the end */
export function shareAddress(publicUrl: string, token: string): string {
  return `${publicUrl}/share/${token}`;
}
