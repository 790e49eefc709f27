import { hash, verify } from '@node-rs/argon2';

/** The argon2id string that is stored. The package's defaults are those OWASP names: 19 MiB, 2 passes. */
export function hashPassword(password: string): Promise<string> {
  return hash(password);
}

// Of a password that nobody knows: an unknown address then takes as long as a wrong password.
let hashOfNobody: Promise<string> | null = null;

/** @param storedHash null when there is no such account; the answer is then false, at the same speed */
export async function verifyPassword(storedHash: string | null, password: string): Promise<boolean> {
  hashOfNobody ??= hash(crypto.randomUUID());
  const matches = await verify(storedHash ?? (await hashOfNobody), password);
  return matches && storedHash !== null;
}
