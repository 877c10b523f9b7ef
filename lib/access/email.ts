import { z } from 'zod';

/** E-mail addresses are kept and compared trimmed and in lower case, so that one mailbox is one account. */
export function normaliseEmail(email: string): string {
  return email.trim().normalize('NFC').toLowerCase();
}

export const emailField = z.string('Give an e-mail address.').transform(normaliseEmail).pipe(z.email('This does not look like an e-mail address.').max(254, 'This e-mail address is too long.'));

// Bidirectional controls could make a name read as another one in lists and mails.
const unprintable = /[\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069]/u;

export const personNameField = z
  .string('Give a name.')
  .trim()
  .min(1, 'Give a name.')
  .max(200, 'Use at most 200 characters.')
  .refine((name) => !unprintable.test(name), 'Use printable characters only.');
