'use client';

import { useActionState } from 'react';

import { accept } from '@/app/(auth)/actions';
import { TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { NewPasswordFields } from '@/components/access/new-password-fields';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function InvitationForm({ secret, name, email }: { secret: string; name: string; email: string }) {
  const [state, submit] = useActionState(accept, untouchedForm);
  return (
    <form action={submit} className="grid gap-4">
      <FormMessage state={state} />
      <input type="hidden" name="secret" value={secret} />
      <TextField label="Name" name="name" autoComplete="name" required maxLength={200} defaultValue={name} state={state} />
      <NewPasswordFields state={state} email={email} />
      <SubmitButton>Accept and sign in</SubmitButton>
    </form>
  );
}
