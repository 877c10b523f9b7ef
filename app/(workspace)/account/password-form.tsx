'use client';

import { useActionState } from 'react';

import { savePassword } from '@/app/(workspace)/account/actions';
import { TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { NewPasswordFields } from '@/components/access/new-password-fields';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function PasswordForm({ email }: { email: string }) {
  const [state, submit] = useActionState(savePassword, untouchedForm);
  return (
    <form action={submit} className="grid gap-3">
      <TextField label="Present password" name="current" type="password" autoComplete="current-password" required state={state} />
      <NewPasswordFields state={state} email={email} />
      <div>
        <SubmitButton kind="secondary">Change the password</SubmitButton>
      </div>
      <FormMessage state={state} />
    </form>
  );
}
