import { createHash } from 'node:crypto';

/** Keys of linking are long texts; the database holds 16 bytes of each. MD5 serves as a short fingerprint here, not as a protection. */
export function keyHash(key: string): Buffer {
  return createHash('md5').update(key).digest();
}
