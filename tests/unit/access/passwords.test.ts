import { describe, expect, it } from 'vitest';

import { emailField, personNameField } from '@/lib/access/email';
import { hashPassword, passwordFault, verifyPassword } from '@/lib/access/passwords';

describe('passwords', () => {
  it('are taken from twelve characters on, counted as people see them', () => {
    expect(passwordFault('elevenchars', 'a@b.example')).toContain('12');
    expect(passwordFault('🪡🧵🪡🧵🪡🧵🪡🧵🪡🧵a', 'a@b.example')).toContain('12');
    expect(passwordFault('twelve chars', 'a@b.example')).toBeNull();
    expect(passwordFault('x y z '.repeat(40), 'a@b.example')).toContain('200');
  });

  it('are refused when they are the address or among the first that others would try', () => {
    expect(passwordFault('Nela.Sorn@tarnholm.example', 'nela.sorn@tarnholm.example')).toContain('e-mail');
    expect(passwordFault('nela.sorn.1990', 'nela.sorn.1990@tarnholm.example')).toContain('e-mail');
    for (const password of ['Password1234', 'pass-word-pass-word', 'ababababababab', '111111111111']) expect(passwordFault(password, 'a@b.example'), password).toContain('among the first');
  });

  it('fit whether their letters arrive composed or not, and nothing else fits', async () => {
    const hash = await hashPassword('Zo\u00eb und die Gr\u00e4ser');
    expect(await verifyPassword(hash, 'Zoe\u0308 und die Gra\u0308ser')).toBe(true);
    expect(await verifyPassword(hash, 'Zoe und die Graser')).toBe(false);
  });

  it('never fit an account without one, which takes as long as one with', async () => {
    expect(await verifyPassword(null, 'a password that nobody has')).toBe(false);
    const hash = await hashPassword('eight blue kettles');
    const time = async (stored: string | null) => {
      const start = performance.now();
      for (let index = 0; index < 8; index += 1) await verifyPassword(stored, 'wrong password');
      return performance.now() - start;
    };
    await time(hash);
    const [known, unknown] = [await time(hash), await time(null)];
    // A skipped hash would be a thousand times quicker; the wide bound only forgives a busy machine.
    expect(unknown / known).toBeGreaterThan(0.2);
  });
});

describe('addresses and names', () => {
  it('are trimmed, and addresses compared in lower case', () => {
    expect(emailField.parse('  Nela.SORN@Tarnholm.example ')).toBe('nela.sorn@tarnholm.example');
    expect(personNameField.parse('  Nela Sørn ')).toBe('Nela Sørn');
  });

  it('are refused when they are none, too long, or would disturb the line they stand in', () => {
    for (const email of ['', 'nela', 'nela@', 'a b@c.example', 'a@b.example\nBcc: all@b.example', `${'a'.repeat(250)}@b.example`, 7]) expect(emailField.safeParse(email).success, String(email)).toBe(false);
    for (const name of ['', '   ', 'a\nb', 'a\u202eb', 'a'.repeat(201), null]) expect(personNameField.safeParse(name).success).toBe(false);
  });
});
