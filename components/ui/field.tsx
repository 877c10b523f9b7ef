'use client';

import { clsx } from 'clsx';
import { useId, type ComponentProps, type ReactNode } from 'react';

import { Icon } from '@/components/ui/icons';

export const controlClass = 'min-h-9 w-full rounded-sm border border-thread-strong bg-paper px-3 py-1.5 text-ink hover:border-ink-soft disabled:opacity-60 aria-[invalid=true]:border-madder';

interface FieldProps {
  /** Made up unless given; an error summary needs to know it. */
  id?: string;
  label: string;
  hint?: ReactNode;
  error?: string;
  /** The label is read out but not shown. */
  labelHidden?: boolean;
}

interface Wiring {
  id: string;
  'aria-invalid'?: true;
  'aria-describedby'?: string;
}

/** Label, control, hint and error of one field, tied together. */
export function Field({ id: givenId, label, hint, error, labelHidden, children, className }: FieldProps & { className?: string; children: (wiring: Wiring) => ReactNode }) {
  const madeId = useId();
  const id = givenId ?? madeId;
  const described = [error && `${id}-error`, hint && `${id}-hint`].filter(Boolean).join(' ');
  return (
    <div className={clsx('grid gap-1', className)}>
      <label htmlFor={id} className={labelHidden ? 'sr-only' : 'text-small font-semibold'}>
        {label}
      </label>
      {children({ id, ...(error ? { 'aria-invalid': true as const } : {}), ...(described ? { 'aria-describedby': described } : {}) })}
      {error && <p id={`${id}-error`} className="text-small text-madder">{error}</p>}
      {hint && <p id={`${id}-hint`} className="text-small text-ink-soft">{hint}</p>}
    </div>
  );
}

export function TextField({ id, label, hint, error, labelHidden, className, ...input }: FieldProps & ComponentProps<'input'>) {
  return (
    <Field id={id} label={label} hint={hint} error={error} labelHidden={labelHidden} className={className}>
      {(wiring) => <input {...input} {...wiring} className={controlClass} />}
    </Field>
  );
}

export function TextArea({ id, label, hint, error, labelHidden, className, rows = 3, ...input }: FieldProps & ComponentProps<'textarea'>) {
  return (
    <Field id={id} label={label} hint={hint} error={error} labelHidden={labelHidden} className={className}>
      {(wiring) => <textarea rows={rows} {...input} {...wiring} className={controlClass} />}
    </Field>
  );
}

export function SelectField({ id, label, hint, error, labelHidden, className, children, ...select }: FieldProps & ComponentProps<'select'>) {
  return (
    <Field id={id} label={label} hint={hint} error={error} labelHidden={labelHidden} className={className}>
      {(wiring) => (
        <span className="relative grid">
          <select {...select} {...wiring} className={clsx(controlClass, 'appearance-none truncate pr-9')}>
            {children}
          </select>
          <Icon name="down" size={14} className="pointer-events-none absolute top-1/2 right-3 -translate-y-1/2 text-ink-soft" />
        </span>
      )}
    </Field>
  );
}

export function Checkbox({ id: givenId, label, hint, className, ...input }: { label: ReactNode; hint?: ReactNode } & ComponentProps<'input'>) {
  const madeId = useId();
  const id = givenId ?? madeId;
  return (
    <div className={clsx('flex items-start gap-2.5', className)}>
      <input type="checkbox" id={id} {...input} className="mt-0.5 size-[18px] shrink-0 accent-[var(--indigo)]" />
      <label htmlFor={id} className="grid gap-0.5">
        <span>{label}</span>
        {hint && <span className="text-small text-ink-soft">{hint}</span>}
      </label>
    </div>
  );
}

/** A choice of few, all of them visible. */
export function RadioGroup<Value extends string>({ legend, name, value, options, onChange, className }: { legend: string; name: string; value: Value; options: readonly { value: Value; label: string; hint?: string }[]; onChange: (value: Value) => void; className?: string }) {
  return (
    <fieldset className={clsx('grid gap-1.5', className)}>
      <legend className="mb-1 text-small font-semibold">{legend}</legend>
      {options.map((option) => (
        <label key={option.value} className="flex items-start gap-2.5">
          <input type="radio" name={name} value={option.value} checked={option.value === value} onChange={() => onChange(option.value)} className="mt-0.5 size-[18px] shrink-0 accent-[var(--indigo)]" />
          <span className="grid">
            <span>{option.label}</span>
            {option.hint && <span className="text-small text-ink-soft">{option.hint}</span>}
          </span>
        </label>
      ))}
    </fieldset>
  );
}

/** What kept a form from being sent; focused by whoever shows it. */
export function FormError({ children }: { children: ReactNode }) {
  return (
    <p role="alert" className="border-l-[3px] border-madder bg-madder-wash px-3 py-2 text-[14px] text-madder">
      {children}
    </p>
  );
}
