import { clsx } from 'clsx';
import { type ReactNode } from 'react';

interface SheetWithEvidenceProps {
  /** The open EvidencePanel, or null while none is open: the sheet then has the whole width. */
  evidence: ReactNode;
  children: ReactNode;
  /** Another column at the left of the sheet, such as the map's legend. */
  aside?: ReactNode;
  /** The sheet goes to its edges, without padding: the map. */
  bare?: boolean;
}

/** A wide sheet and, beside it, the evidence panel; on narrow screens the panel comes as a sheet from below. */
export function SheetWithEvidence({ evidence, children, aside, bare = false }: SheetWithEvidenceProps) {
  return (
    <div className="lg:flex lg:min-h-[calc(100dvh-6.4rem)] lg:items-stretch">
      {aside && <div className="border-thread max-lg:border-b lg:w-[18rem] lg:shrink-0 lg:border-r">{aside}</div>}
      <div className={clsx('min-w-0 flex-1', !bare && 'px-4 pt-6 pb-12 md:px-7')}>{children}</div>
      {evidence}
    </div>
  );
}
