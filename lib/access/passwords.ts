import { hash, verify } from '@node-rs/argon2';

import { invalid } from '@/lib/errors';

export const leastPasswordLength = 12;
const mostPasswordLength = 200;

/** argon2id with the least parameters of the OWASP Password Storage Cheat Sheet: 19 MiB, two passes, one lane. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Long enough for the length rule and still among the first that anybody would try. */
const common = new Set([
  'password1234', 'password12345', 'password123456', 'passwordpassword', '123456789012', '1234567890123', '12345678901234', 'qwertyuiop12', 'qwertyuiop123',
  'qwertyuiopas', 'qwertyuiopasdf', 'abcdefghijkl', 'abcdefghijklm', 'letmeinletmein', 'iloveyou1234', 'welcome12345', 'administrator', 'administrator1', 'changemechangeme', 'correcthorsebatterystaple',
]);

/** The same letters typed on different systems may arrive composed or not; both must open the account. */
function normalise(password: string): string {
  return password.normalize('NFKC');
}

/** Why the password cannot be taken, in words for its owner; null when it can. */
export function passwordFault(password: string, email: string): string | null {
  const text = normalise(password);
  const lower = text.toLowerCase();
  if ([...text].length < leastPasswordLength) return `Use ${leastPasswordLength} characters or more; a few unrelated words are easy to keep in mind.`;
  if (text.length > mostPasswordLength) return `Use at most ${mostPasswordLength} characters.`;
  if (lower === email.toLowerCase() || lower === email.toLowerCase().split('@')[0]) return 'Choose something other than the e-mail address.';
  if (common.has(lower.replace(/[\s._-]/g, '')) || new Set(lower).size < 4) return 'This password is among the first that others would try. Choose another.';
  return null;
}

/** Throws the 422 that names the field `password`. */
export function assertPassword(password: string, email: string): void {
  const fault = passwordFault(password, email);
  if (fault) throw invalid(fault, { password: fault });
}

export async function hashPassword(password: string): Promise<string> {
  return hash(normalise(password), cost);
}

let dummy: Promise<string> | undefined;

/** Whether the password fits. Without a hash, one of nobody is tried and fails, so that unknown and known accounts take the same time. */
export async function verifyPassword(storedHash: string | null, password: string): Promise<boolean> {
  dummy ??= hashPassword('a password that nobody has');
  const fits = await verify(storedHash ?? (await dummy), normalise(password).slice(0, 1000));
  return fits && storedHash !== null;
}
