'use client';

import { useActionState } from 'react';

import { saveName } from '@/app/(workspace)/account/actions';
import { TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function NameForm({ name }: { name: string }) {
  const [state, submit] = useActionState(saveName, untouchedForm);
  return (
    <form action={submit} className="grid gap-3">
      <TextField label="Name that others see" name="name" autoComplete="name" required maxLength={200} defaultValue={name} state={state} />
      <div>
        <SubmitButton kind="secondary">Save the name</SubmitButton>
      </div>
      <FormMessage state={state} />
    </form>
  );
}
