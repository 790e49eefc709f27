import { createHash, randomBytes } from 'node:crypto';

/**
 * A new secret for a token, a reset mail or a share link: 256 random bits, so that it cannot be guessed and its
 * hash needs no salt.
 *
 * @param prefix says in a leaked text what it is, such as "skw_"
 */
export function makeSecret(prefix = ''): string {
  return prefix + randomBytes(32).toString('base64url');
}

/** What is stored in place of a secret: its SHA-256, in hex. */
export function hashSecret(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}
