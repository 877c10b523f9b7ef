import { afterAll, expect, it, vi } from 'vitest';

vi.hoisted(() => Object.assign(process.env, { HEDDLE_TEST: '1', HEDDLE_TEST_TRIES_PER_ADDRESS: '5', HEDDLE_TRUST_PROXY: '1' }));

import { requestPasswordReset } from '@/lib/access/accounts';
import { authenticate } from '@/lib/access/sign-in';
import { closeDatabase } from '@/lib/db/connection';
import { unique } from '../factories';

afterAll(closeDatabase);

const newAddress = () => `2001:db8::${unique('').slice(1, 5)}:${unique('').slice(1, 5)}`;
/** As a trusted proxy writes it: what the client claimed, then what the proxy saw. */
const from = (address: string, claimed = '203.0.113.7') => new Headers({ 'x-forwarded-for': `${claimed}, ${address}` });
const email = () => `${unique()}@test.example`;

it('stops an address that tries many accounts, whatever it claims to be, and no other address', async () => {
  const address = newAddress();
  for (let index = 0; index < 5; index += 1) expect(await authenticate(email(), 'x', from(address, `203.0.113.${index}`))).toBeNull();
  await expect(authenticate(email(), 'x', from(address, '203.0.113.99'))).rejects.toMatchObject({ status: 429 });
  expect(await authenticate(email(), 'x', from(newAddress()))).toBeNull();
});

it('stops an address that asks for many resets, and still lets it sign in', async () => {
  const address = newAddress();
  for (let index = 0; index < 5; index += 1) await requestPasswordReset(email(), from(address));
  await expect(requestPasswordReset(email(), from(address))).rejects.toMatchObject({ status: 429 });
  expect(await authenticate(email(), 'x', from(address))).toBeNull();
});
