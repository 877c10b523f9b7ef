'use client';

import { useActionState } from 'react';

import { invite } from '@/app/(workspace)/admin/actions';
import { SelectField, TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';

const choices = [
  ['librarian', 'Librarian: imports, curates, exports'],
  ['evaluator', 'Evaluator: analyses, compares, exports'],
  ['author', 'Author: browses what they were given'],
  ['reader', 'Reader: views what they were given'],
  ['administrator', 'Administrator: everything'],
];

export function InviteForm() {
  const [state, submit] = useActionState(invite, untouchedForm);
  return (
    <form action={submit} className="grid gap-3">
      <TextField label="Name" name="name" required maxLength={200} autoComplete="off" state={state} />
      <TextField label="E-mail" name="email" type="email" required maxLength={254} autoComplete="off" state={state} />
      <SelectField label="Role" name="role" defaultValue="librarian" state={state}>
        {choices.map(([role, words]) => (
          <option key={role} value={role}>
            {words}
          </option>
        ))}
      </SelectField>
      <div>
        <SubmitButton>Send the invitation</SubmitButton>
      </div>
      <FormMessage state={state} />
    </form>
  );
}
