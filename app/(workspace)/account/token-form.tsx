'use client';

import { useActionState } from 'react';

import { makeToken } from '@/app/(workspace)/account/actions';
import { SelectField, TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

export function TokenForm() {
  const [state, submit] = useActionState(makeToken, untouchedForm);
  return (
    <form action={submit} className="grid max-w-md gap-3">
      <TextField label="What the token is for" name="name" required maxLength={120} autoComplete="off" state={state} />
      <SelectField label="Works for" name="expiresInDays" defaultValue="90" state={state}>
        <option value="30">30 days</option>
        <option value="90">90 days</option>
        <option value="365">A year</option>
        <option value="never">Until it is revoked</option>
      </SelectField>
      <div>
        <SubmitButton kind="secondary">Make a token</SubmitButton>
      </div>
      <FormMessage state={state} />
      {state.data.secret && <output className="block rounded-sm border border-thread-strong bg-paper px-3 py-2 font-mono break-all select-all">{state.data.secret}</output>}
    </form>
  );
}
