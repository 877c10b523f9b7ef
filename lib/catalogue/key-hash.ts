import { hash } from 'node:crypto';

/**
 * Keys of linking are long texts; the database holds 16 bytes of each: the first half of its SHA-256, so that nobody can make two keys meet.
 *
 * @returns 32 hexadecimal digits
 */
export function keyHashHex(key: string): string {
  return hash('sha256', key, 'hex').slice(0, 32);
}

/** The 16 bytes of `keyHashHex`, as the database holds them. */
export function keyHash(key: string): Buffer {
  return Buffer.from(keyHashHex(key), 'hex');
}
