'use client';

import { type ReactNode } from 'react';
import { useFormStatus } from 'react-dom';

import { Button, type ButtonKind } from '@/components/ui/button';

interface SubmitButtonProps {
  children: ReactNode;
  kind?: ButtonKind;
  /** Where the visible words alone would not tell buttons apart. */
  label?: string;
}

/** Sends its form; while that is under way it stays focusable but does nothing twice. */
export function SubmitButton({ children, kind = 'primary', label }: SubmitButtonProps) {
  const { pending } = useFormStatus();
  return (
    <Button type="submit" kind={kind} aria-label={label} aria-disabled={pending || undefined} onClick={(event) => pending && event.preventDefault()}>
      {children}
    </Button>
  );
}
