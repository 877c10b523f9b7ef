'use client';

import { type ReactNode } from 'react';

interface PageWithPanelProps {
  /** What the evidence panel shows; null while it is closed. */
  panel: { eyebrow: string; title: string; content: ReactNode } | null;
  onClose: () => void;
  children: ReactNode;
}

/** A wide sheet and, beside it, the evidence panel. */
export function PageWithPanel({ panel, onClose, children }: PageWithPanelProps) {
  return (
    <div className="lg:flex lg:items-stretch">
      <div className="min-w-0 flex-1 px-4 py-6 sm:px-7">{children}</div>
      {panel && (
        <aside aria-label="Evidence" className="border-l border-thread bg-paper p-6 lg:w-[372px] lg:shrink-0">
          <p className="text-[13px] text-ink-soft">{panel.eyebrow}</p>
          <h2 className="mb-4 text-[21px] leading-[25px]">{panel.title}</h2>
          {panel.content}
          <button type="button" onClick={onClose} className="mt-4 underline">Close</button>
        </aside>
      )}
    </div>
  );
}
