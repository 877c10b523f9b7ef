'use client';

import { useActionState, useState } from 'react';

import { changeRole } from '@/app/(workspace)/admin/actions';
import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';
import { roles, type Role } from '@/lib/access/permissions';

/** The role of one person; the button comes up once another role is chosen. */
export function RoleForm({ userId, name, role }: { userId: string; name: string; role: Role }) {
  const [state, submit] = useActionState(changeRole, untouchedForm);
  const [chosen, setChosen] = useState<string>(role);
  return (
    <form action={submit}>
      <input type="hidden" name="id" value={userId} />
      <div className="flex gap-2">
        <select name="role" aria-label={`Role of ${name}`} value={chosen} onChange={(event) => setChosen(event.target.value)} className="min-h-9 rounded-sm border border-thread-strong bg-paper px-2 py-1 text-ink">
          {roles.map((each) => (
            <option key={each}>{each}</option>
          ))}
        </select>
        {chosen !== role && (
          <SubmitButton kind="secondary" label={`Change the role of ${name}`}>
            Change
          </SubmitButton>
        )}
      </div>
      <FormMessage state={state} />
    </form>
  );
}
