'use client';

import { useEffect, useId, useRef, type ReactNode } from 'react';

import { Button, IconButton } from '@/components/ui/button';
import { Icon } from '@/components/ui/icons';
import { Notice, Skeleton } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { useKeys } from '@/components/ui/use-keys';

interface EvidencePanelProps {
  /** What is open, as it stands in the address (`?evidence=...`); a change moves the focus here. */
  panelKey: string;
  /** Small words above the title. */
  eyebrow?: string;
  /** The big figure with its words: "164 citations here". */
  title: ReactNode;
  /** What the figure is about, such as the title of a work. */
  subject?: ReactNode;
  /** Facts below the subject, soft. */
  facts?: ReactNode;
  loading?: boolean;
  /** Why the evidence could not be read. */
  problem?: string | null;
  onRetry?: () => void;
  /** Takes `evidence` out of the address unless given. */
  onClose?: () => void;
  children?: ReactNode;
}

function Body({ loading, problem, onRetry, children }: Pick<EvidencePanelProps, 'loading' | 'problem' | 'onRetry' | 'children'>) {
  if (problem) {
    return (
      <Notice tone="problem" title="The evidence could not be read" actions={onRetry && <Button onClick={onRetry}>Try again</Button>}>
        {problem}
      </Notice>
    );
  }
  if (loading) {
    return (
      <div aria-busy="true" className="grid gap-6">
        <p role="status" className="sr-only">Reading the evidence</p>
        {[4, 3, 2].map((lines) => (
          <div key={lines} className="grid gap-2.5">
            <Skeleton className="h-3 w-28" />
            {Array.from({ length: lines }, (_, line) => <Skeleton key={line} className="h-4" />)}
          </div>
        ))}
      </div>
    );
  }
  return <div className="grid gap-6">{children}</div>;
}

/** The panel behind a figure: at the right of the sheet, or from below on narrow screens. Escape closes it and gives the focus back. */
export function EvidencePanel({ panelKey, eyebrow = 'Evidence for', title, subject, facts, onClose, ...body }: EvidencePanelProps) {
  const { show } = useAddress();
  const titleId = useId();
  const heading = useRef<HTMLHeadingElement>(null);
  const opener = useRef<HTMLElement | null>(null);
  const seen = useRef<string | null>(null);

  // A page that is loaded with an open panel keeps the focus at its start; only what is opened by hand takes it.
  useEffect(() => {
    const before = document.activeElement;
    const openedByHand = before instanceof HTMLElement && before !== document.body;
    if (openedByHand && seen.current !== panelKey && !heading.current?.closest('section')?.contains(before)) {
      opener.current = before;
      heading.current?.focus({ preventScroll: true });
    }
    seen.current = panelKey;
  }, [panelKey]);

  const close = () => {
    if (onClose) onClose();
    else show({ evidence: null });
    if (opener.current?.isConnected) opener.current.focus({ preventScroll: true });
  };
  useKeys({ Escape: close });

  return (
    <section
      aria-labelledby={titleId}
      data-evidence-sheet=""
      className="no-print border-thread bg-paper max-lg:fixed max-lg:inset-x-0 max-lg:bottom-0 max-lg:z-30 max-lg:max-h-[62dvh] max-lg:overflow-y-auto max-lg:border-t max-lg:shadow-float lg:w-[23.25rem] lg:shrink-0 lg:border-l"
    >
      <div className="px-4 pt-5 pb-8 md:px-6 lg:sticky lg:top-0 lg:max-h-dvh lg:overflow-y-auto">
        <div className="mb-5 flex items-start gap-3">
          <div className="min-w-0 flex-1">
            <p className="text-small text-ink-soft">{eyebrow}</p>
            <h2 ref={heading} id={titleId} tabIndex={-1} className="text-panel [overflow-wrap:anywhere] focus-visible:outline-offset-4">
              {title}
            </h2>
            {subject && <div className="mt-1.5 font-serif text-work font-medium [overflow-wrap:anywhere]">{subject}</div>}
            {facts && <p className="mt-1.5 text-small text-ink-soft">{facts}</p>}
          </div>
          <IconButton label="Close the evidence" className="-mt-1 -mr-2 border-transparent bg-transparent" onClick={close}>
            <Icon name="close" />
          </IconButton>
        </div>
        <Body {...body} />
      </div>
    </section>
  );
}
