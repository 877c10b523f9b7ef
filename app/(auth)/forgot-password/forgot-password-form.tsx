'use client';

import Link from 'next/link';
import { useActionState } from 'react';

import { askForReset } from '@/app/(auth)/actions';
import { TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function ForgotPasswordForm() {
  const [state, submit] = useActionState(askForReset, untouchedForm);
  return (
    <form action={submit} className="grid gap-4">
      <FormMessage state={state} />
      <TextField label="E-mail" name="email" type="email" autoComplete="username" required maxLength={254} state={state} />
      <div className="flex flex-wrap items-center justify-between gap-3">
        <SubmitButton>Send the link</SubmitButton>
        <Link href="/sign-in" className="text-indigo underline underline-offset-2">
          Back to sign-in
        </Link>
      </div>
    </form>
  );
}
