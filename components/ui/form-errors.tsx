'use client';

import { useEffect, useRef } from 'react';

export interface FieldFault {
  /** The `id` of the control, to jump there. */
  fieldId: string;
  message: string;
}

/** All that keeps a form from being sent, in one place above it, each with a way to its field; takes the focus when it appears. */
export function FormErrorSummary({ faults, title = 'This could not be saved yet' }: { faults: readonly FieldFault[]; title?: string }) {
  const box = useRef<HTMLDivElement>(null);
  const shown = faults.length > 0;
  useEffect(() => {
    if (shown) box.current?.focus();
  }, [shown]);
  if (!shown) return null;
  return (
    <div ref={box} tabIndex={-1} role="alert" className="border-l-[3px] border-madder bg-madder-wash px-4 py-3">
      <p className="font-semibold text-madder">{title}</p>
      <ul className="mt-1 grid gap-1 text-table">
        {faults.map((fault) => (
          <li key={fault.fieldId}>
            <a
              href={`#${fault.fieldId}`}
              className="text-madder"
              onClick={(event) => {
                event.preventDefault();
                document.getElementById(fault.fieldId)?.focus();
              }}
            >
              {fault.message}
            </a>
          </li>
        ))}
      </ul>
    </div>
  );
}
