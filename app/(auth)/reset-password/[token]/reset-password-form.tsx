'use client';

import { useActionState } from 'react';

import { setNewPassword } from '@/app/(auth)/actions';
import { FormMessage } from '@/components/access/form-message';
import { NewPasswordFields } from '@/components/access/new-password-fields';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function ResetPasswordForm({ secret, email }: { secret: string; email: string }) {
  const [state, submit] = useActionState(setNewPassword, untouchedForm);
  return (
    <form action={submit} className="grid gap-4">
      <FormMessage state={state} />
      <input type="hidden" name="secret" value={secret} />
      <NewPasswordFields state={state} email={email} />
      <SubmitButton>Set the password and sign in</SubmitButton>
    </form>
  );
}
