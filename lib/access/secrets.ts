import { createHash, randomBytes } from 'node:crypto';

/** A new secret of 32 random bytes in letters that need no escaping in an address. */
export function makeSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** What is kept of a secret. 256 random bits need no slow hash; a look-up by hash also leaks no timing about the secret. */
export function hashSecret(secret: string): Buffer {
  return createHash('sha256').update(secret).digest();
}
