import { clsx } from 'clsx';
import Link from 'next/link';

export interface Crumb {
  label: string;
  /** Left out for the place itself. */
  href?: string;
}

/** Where this page is: "Portfolios / Freshwater Ecology". The last step is the place itself. */
export function Breadcrumb({ items, label = 'Place', className }: { items: readonly Crumb[]; label?: string; className?: string }) {
  return (
    <nav aria-label={label} className={clsx('min-w-0', className)}>
      <ol className="flex min-w-0 items-baseline">
        {items.map((item, index) => {
          const last = index === items.length - 1;
          return (
            <li key={`${index} ${item.label}`} className={clsx('flex items-baseline', last ? 'min-w-0' : 'shrink-0')}>
              {item.href ? (
                <Link href={item.href} aria-current={last ? 'page' : undefined} className={clsx('truncate no-underline hover:underline', last ? 'font-semibold text-ink' : 'text-ink-soft')}>
                  {item.label}
                </Link>
              ) : (
                <span aria-current={last ? 'page' : undefined} title={item.label} className={clsx('truncate', last ? 'font-semibold' : 'text-ink-soft')}>
                  {item.label}
                </span>
              )}
              {!last && <span aria-hidden="true" className="px-1.5 text-ink-soft">/</span>}
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
