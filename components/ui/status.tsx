import { clsx } from 'clsx';
import Link from 'next/link';
import { type ReactNode } from 'react';

export type Tone = 'done' | 'caution' | 'problem' | 'neutral';

const tones: Record<Tone, string> = {
  done: 'border-verdigris bg-verdigris-wash text-verdigris',
  caution: 'border-weld bg-weld-wash text-weld-ink',
  problem: 'border-madder bg-madder-wash text-madder',
  neutral: 'border-thread-strong bg-transparent text-ink-soft',
};

/** A state in one or two words. */
export function Pill({ tone = 'neutral', children }: { tone?: Tone; children: ReactNode }) {
  return <span className={clsx('inline-flex items-center rounded-full border px-2.5 py-px text-head leading-[1.125rem] whitespace-nowrap', tones[tone])}>{children}</span>;
}

/** A pill that filters; `href` reproduces the view. */
export function PillLink({ tone = 'neutral', href, current, children }: { tone?: Tone; href: string; current?: boolean; children: ReactNode }) {
  return (
    <Link prefetch={false} href={href} scroll={false} aria-current={current ? 'true' : undefined} className={clsx('inline-flex min-h-6 items-center rounded-full border px-2.5 py-px text-head leading-[1.125rem] whitespace-nowrap no-underline hover:underline aria-[current]:ring-1 aria-[current]:ring-current', tones[tone])}>
      {children}
    </Link>
  );
}

/** One short line of caution with a link to the methods page. */
export function Caution({ children, href = '/methods#cautions' }: { children: ReactNode; href?: string | null }) {
  return (
    <p className="border-l-[3px] border-weld py-0.5 pl-2.5 text-small text-ink-soft">
      {children} {href && <Link prefetch={false} href={href} className="ml-1 whitespace-nowrap">Cautions</Link>}
    </p>
  );
}

/** What came of something, within the page. */
export function Notice({ tone = 'neutral', title, children, actions }: { tone?: Tone; title?: string; children?: ReactNode; actions?: ReactNode }) {
  return (
    <div role={tone === 'problem' ? 'alert' : 'status'} className={clsx('flex flex-wrap items-center justify-between gap-3 border-l-[3px] px-3 py-2 text-table', tones[tone])}>
      <div>
        {title && <p className="font-semibold">{title}</p>}
        {children && <div className="text-ink">{children}</div>}
      </div>
      {actions && <div className="flex gap-2">{actions}</div>}
    </div>
  );
}

/** Nothing here yet: what to do next, and the button for it. */
export function EmptyState({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="grid justify-items-start gap-2 border-y border-thread px-1 py-10">
      <p className="font-serif text-panel">{title}</p>
      {children && <div className="max-w-[38rem] text-ink-soft">{children}</div>}
      {action && <div className="mt-2">{action}</div>}
    </div>
  );
}

/** Holds the place of what is coming. */
export function Skeleton({ className }: { className?: string }) {
  return <span aria-hidden="true" className={clsx('block rounded-sm bg-thread opacity-60', className)} />;
}
