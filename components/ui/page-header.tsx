import { clsx } from 'clsx';
import { type ReactNode } from 'react';

interface PageHeaderProps {
  title: ReactNode;
  /** One line of facts below the title: "Analysis of 14 May 2026 · 4,812 works". */
  subtitle?: ReactNode;
  /** Buttons at the right. */
  actions?: ReactNode;
  /** Below the subtitle: cautions, pills, progress. */
  children?: ReactNode;
}

/** The head of a page: its one h1. */
export function PageHeader({ title, subtitle, actions, children }: PageHeaderProps) {
  return (
    <div className="grid gap-3">
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <h1 className="text-title [overflow-wrap:anywhere]">{title}</h1>
          {subtitle && <p className="mt-1.5 text-ink-soft">{subtitle}</p>}
        </div>
        {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
      </div>
      {children}
    </div>
  );
}

interface SectionHeadingProps {
  children: ReactNode;
  id?: string;
  /** A count or other words beside the title, smaller. */
  beside?: ReactNode;
  actions?: ReactNode;
  /** 2 unless told: a section of the page. 3 is the small ruled head of a panel. */
  level?: 2 | 3;
  className?: string;
}

/** The head of a section: serif on an ink rule; or, at level 3, the small ruled line of a panel. */
export function SectionHeading({ children, id, beside, actions, level = 2, className }: SectionHeadingProps) {
  if (level === 3) {
    return (
      <h3 id={id} className={clsx('border-b border-thread pb-1.5 font-sans text-head font-semibold text-ink-soft', className)}>
        {children}
      </h3>
    );
  }
  return (
    <div className={clsx('flex flex-wrap items-baseline justify-between gap-x-4 gap-y-2 border-b border-ink pb-2', className)}>
      <h2 id={id} className="text-panel">
        {children} {beside !== undefined && <span className="ml-1 font-sans text-small text-ink-soft">{beside}</span>}
      </h2>
      {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
    </div>
  );
}
