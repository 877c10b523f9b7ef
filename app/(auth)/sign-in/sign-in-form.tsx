'use client';

import Link from 'next/link';
import { useActionState } from 'react';

import { signIn } from '@/app/(auth)/actions';
import { TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function SignInForm({ next, message }: { next: string; message: string | null }) {
  const [state, submit] = useActionState(signIn, { ...untouchedForm, error: message });
  return (
    <form action={submit} className="grid gap-4">
      <FormMessage state={state} />
      <input type="hidden" name="next" value={next} />
      <TextField label="E-mail" name="email" type="email" autoComplete="username" required maxLength={254} state={state} />
      <TextField label="Password" name="password" type="password" autoComplete="current-password" required state={state} />
      <div className="flex flex-wrap items-center justify-between gap-3">
        <SubmitButton>Sign in</SubmitButton>
        <Link href="/forgot-password" className="text-indigo underline underline-offset-2">
          Forgot the password?
        </Link>
      </div>
    </form>
  );
}
