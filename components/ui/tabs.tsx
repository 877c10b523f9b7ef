import { clsx } from 'clsx';
import Link from 'next/link';

export interface TabLink {
  href: string;
  label: string;
  /** Shown after the label. */
  count?: string;
  current: boolean;
}

/** Views of one page as links: each has an address of its own. */
export function Tabs({ label, tabs, className }: { label: string; tabs: readonly TabLink[]; className?: string }) {
  return (
    <nav aria-label={label} className={clsx('scrollbar-none relative overflow-x-auto shadow-[inset_0_-1px_var(--thread)]', className)}>
      <ul className="flex gap-x-6">
        {tabs.map((tab) => (
          <li key={tab.href}>
            <Link
              href={tab.href}
              scroll={false}
              aria-current={tab.current ? 'page' : undefined}
              className="focus-inset block border-b-2 border-transparent py-2 whitespace-nowrap text-ink-soft no-underline hover:text-ink aria-[current]:border-madder aria-[current]:font-semibold aria-[current]:text-ink"
            >
              {tab.label}
              {tab.count !== undefined && <span className="ml-1.5 text-small font-normal text-ink-soft">{tab.count}</span>}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
