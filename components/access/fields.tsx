'use client';

import { useId, type ComponentProps, type ReactNode } from 'react';

import { type FormState } from '@/lib/access/form-state';

const control = 'w-full rounded-sm border border-thread-strong bg-paper px-3 py-2 text-ink aria-[invalid=true]:border-madder';

interface FieldProps {
  label: string;
  name: string;
  state: FormState;
  hint?: string;
}

/** Label, control, hint and fault of one field, tied together for screen readers. */
function FieldFrame({ label, name, state, hint, children }: FieldProps & { children: (wiring: { id: string; name: string; 'aria-invalid'?: true; 'aria-describedby'?: string }) => ReactNode }) {
  const id = useId();
  const fault = state.errors[name];
  const described = [fault ? `${id}-fault` : null, hint ? `${id}-hint` : null].filter(Boolean).join(' ');
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="text-[13px] font-semibold">
        {label}
      </label>
      {children({ id, name, ...(fault ? { 'aria-invalid': true as const } : {}), ...(described ? { 'aria-describedby': described } : {}) })}
      {fault && (
        <p id={`${id}-fault`} className="text-[13px] text-madder">
          {fault}
        </p>
      )}
      {hint && (
        <p id={`${id}-hint`} className="text-[13px] text-ink-soft">
          {hint}
        </p>
      )}
    </div>
  );
}

/** A line of text; filled again with what was typed when the form failed. */
export function TextField({ label, name, state, hint, defaultValue, ...input }: FieldProps & Omit<ComponentProps<'input'>, 'name'>) {
  return (
    <FieldFrame label={label} name={name} state={state} hint={hint}>
      {(wiring) => <input {...input} {...wiring} defaultValue={state.values[name] ?? defaultValue} className={control} />}
    </FieldFrame>
  );
}

export function SelectField({ label, name, state, hint, defaultValue, children, ...select }: FieldProps & Omit<ComponentProps<'select'>, 'name'>) {
  const value = state.values[name] ?? defaultValue;
  return (
    <FieldFrame label={label} name={name} state={state} hint={hint}>
      {/* The key makes the browser take the value anew: React resets a form after its action, but not a select's default. */}
      {(wiring) => (
        <select key={String(value)} {...select} {...wiring} defaultValue={value} className={control}>
          {children}
        </select>
      )}
    </FieldFrame>
  );
}
