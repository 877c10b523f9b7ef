'use client';

import { type ComponentProps } from 'react';

import { SelectField as PlainSelectField, TextField as PlainTextField } from '@/components/ui/field';
import { type FormState } from '@/lib/access/form-state';

interface FormFieldProps {
  name: string;
  state: FormState;
}

/** A line of text of a form: filled again with what was typed when the form failed, with its own fault below it. */
export function TextField({ name, state, defaultValue, ...field }: FormFieldProps & ComponentProps<typeof PlainTextField>) {
  return <PlainTextField {...field} name={name} error={state.errors[name]} defaultValue={state.values[name] ?? defaultValue} />;
}

/** A choice of a form. The key makes the browser take the value anew: React resets a form after its action, but not a select's default. */
export function SelectField({ name, state, defaultValue, ...field }: FormFieldProps & ComponentProps<typeof PlainSelectField>) {
  const value = state.values[name] ?? defaultValue;
  return <PlainSelectField key={String(value)} {...field} name={name} error={state.errors[name]} defaultValue={value} />;
}
