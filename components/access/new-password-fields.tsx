'use client';

import { TextField } from '@/components/access/fields';
import { type FormState } from '@/lib/access/form-state';

/** A new password, twice: nobody can see what they typed. `email` lets password managers know whose it is. */
export function NewPasswordFields({ state, email }: { state: FormState; email?: string }) {
  return (
    <>
      {email && <input type="email" name="username" autoComplete="username" value={email} readOnly hidden />}
      <TextField label="New password" name="password" type="password" autoComplete="new-password" required state={state} hint="12 characters or more; a few unrelated words are easy to keep in mind." />
      <TextField label="New password again" name="repeated" type="password" autoComplete="new-password" required state={state} />
    </>
  );
}
