'use client';

import { useActionState } from 'react';

import { setUp } from '@/app/(auth)/actions';
import { TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { NewPasswordFields } from '@/components/access/new-password-fields';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function FirstRunForm() {
  const [state, submit] = useActionState(setUp, untouchedForm);
  return (
    <form action={submit} className="grid gap-4">
      <FormMessage state={state} />
      <TextField label="Name" name="name" autoComplete="name" required maxLength={200} state={state} />
      <TextField label="E-mail" name="email" type="email" autoComplete="username" required maxLength={254} state={state} />
      <NewPasswordFields state={state} />
      <SubmitButton>Create the account and sign in</SubmitButton>
    </form>
  );
}
