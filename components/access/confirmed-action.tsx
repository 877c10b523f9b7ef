'use client';

import { useActionState, useState } from 'react';

import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm, type FormState } from '@/lib/access/form-state';

interface ConfirmedActionProps {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  /** Sent along unseen. */
  fields: Record<string, string>;
  label: string;
  /** What it is done to; tells the buttons of one column apart. */
  subject: string;
  /** What will be gone. Without it the action is not asked about first: it can be undone. */
  question?: string;
}

/** A button for one row; asks first, in place, where the deed cannot be undone. */
export function ConfirmedAction({ action, fields, label, subject, question }: ConfirmedActionProps) {
  const [state, submit] = useActionState(action, untouchedForm);
  // 'kept' is 'closed' after a change of mind: the focus then goes back to where it came from.
  const [asking, setAsking] = useState<'closed' | 'open' | 'kept'>('closed');
  const hidden = Object.entries(fields).map(([name, value]) => <input key={name} type="hidden" name={name} value={value} />);
  const plain = 'rounded-sm px-1 py-0.5 text-indigo underline underline-offset-2';
  return (
    <div className="grid gap-0.5">
      {question && asking !== 'open' ? (
        <div>
          <button type="button" className={plain} autoFocus={asking === 'kept'} onClick={() => setAsking('open')} aria-label={`${label}: ${subject}`}>
            {label}
          </button>
        </div>
      ) : (
        <form action={submit} className="flex flex-wrap items-center gap-2">
          {hidden}
          {question && <p className="basis-full text-[13px]">{question}</p>}
          <SubmitButton kind={question ? 'destructive' : 'secondary'} label={`${label}: ${subject}`}>
            {label}
          </SubmitButton>
          {question && (
            <button type="button" className={plain} autoFocus onClick={() => setAsking('kept')}>
              Keep
            </button>
          )}
        </form>
      )}
      <FormMessage state={state} />
    </div>
  );
}
