'use client';

import { clsx } from 'clsx';
import { useEffect, useRef, useState } from 'react';

import { controlClass } from '@/components/ui/field';

interface FilterFieldProps {
  label: string;
  placeholder?: string;
  /** What stands in the address. */
  value: string;
  /** Called a moment after the last key; replace the address rather than push. */
  onChange: (value: string) => void;
  className?: string;
}

const pauseMs = 300;

/** Words that narrow a list as they are typed. */
export function FilterField({ label, placeholder = label, value, onChange, className }: FilterFieldProps) {
  const [draft, setDraft] = useState(value);
  const [known, setKnown] = useState(value);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  // The address changed by other means (back, a link that clears the filters): it wins over what was typed.
  if (known !== value) {
    setKnown(value);
    if (value !== draft.trim()) setDraft(value);
  }
  useEffect(() => () => {
    if (timer.current) clearTimeout(timer.current);
  }, []);
  return (
    <input
      type="search"
      aria-label={label}
      placeholder={placeholder}
      maxLength={300}
      value={draft}
      onChange={(event) => {
        const text = event.target.value;
        setDraft(text);
        if (timer.current) clearTimeout(timer.current);
        timer.current = setTimeout(() => onChange(text.trim()), pauseMs);
      }}
      className={clsx(controlClass, 'min-w-48 flex-1 text-table md:max-w-[18rem]', className)}
    />
  );
}
