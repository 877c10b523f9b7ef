'use client';

import { type ReactNode } from 'react';
import { useFormStatus } from 'react-dom';

interface SubmitButtonProps {
  children: ReactNode;
  kind?: 'primary' | 'secondary' | 'danger';
  /** Where the visible words alone would not tell buttons apart. */
  label?: string;
}

const looks = {
  primary: 'bg-indigo text-on-indigo border-indigo',
  secondary: 'bg-paper text-indigo border-indigo',
  danger: 'bg-paper text-madder border-madder',
};

/** Sends its form; while that is under way it stays focusable but does nothing twice. */
export function SubmitButton({ children, kind = 'primary', label }: SubmitButtonProps) {
  const { pending } = useFormStatus();
  return (
    <button type="submit" aria-label={label} aria-disabled={pending} onClick={(event) => pending && event.preventDefault()} className={`min-h-9 rounded-sm border px-4 py-1.5 font-semibold ${looks[kind]} aria-disabled:opacity-70`}>
      {children}
    </button>
  );
}
