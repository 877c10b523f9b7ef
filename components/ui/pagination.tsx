import Link from 'next/link';
import { type ReactNode } from 'react';

import { Icon } from '@/components/ui/icons';
import { formatNumber } from '@/components/ui/numbers';

/** The numbers to offer: first, last, the page and its neighbours; null where some are left out. */
export function pagesToShow(page: number, pages: number): (number | null)[] {
  const wanted = [...new Set([1, page - 1, page, page + 1, pages])].filter((one) => one >= 1 && one <= pages).sort((a, b) => a - b);
  return wanted.flatMap((one, index) => {
    const gap = index === 0 ? 0 : one - wanted[index - 1] - 1;
    return gap === 0 ? [one] : gap === 1 ? [one - 1, one] : [null, one];
  });
}

interface PaginationProps {
  page: number;
  pageSize: number;
  total: number;
  /** The address of another page of this list; `useAddressState().hrefOf` gives it. */
  hrefOf: (change: { page?: number; pageSize?: number }) => string;
  /** Offered sizes; none, no choice. */
  pageSizes?: readonly number[];
  label?: string;
}

const box = 'inline-grid min-h-8 min-w-8 place-items-center rounded-sm border px-1.5 no-underline';

function Step({ href, label, children }: { href: string | null; label: string; children: ReactNode }) {
  if (href === null) return <span aria-hidden="true" className={`${box} border-transparent opacity-40`}>{children}</span>;
  return (
    <Link prefetch={false} href={href} aria-label={label} className={`${box} border-transparent text-indigo hover:border-thread-strong`}>
      {children}
    </Link>
  );
}

/** "51 to 100 of 4,812", the pages as links and the number of rows on a page. */
export function Pagination({ page, pageSize, total, hrefOf, pageSizes = [], label = 'Pages' }: PaginationProps) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  const first = (page - 1) * pageSize + 1;
  if (total === 0) return null;
  return (
    <nav aria-label={label} className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 py-2 text-table text-ink-soft">
      <p>{first > total ? `Nothing on this page; ${formatNumber(total)} in all` : `${formatNumber(first)} to ${formatNumber(Math.min(page * pageSize, total))} of ${formatNumber(total)}`}</p>
      {pages > 1 && (
        <ul className="flex flex-wrap items-center gap-1">
          <li>
            <Step href={page > 1 ? hrefOf({ page: Math.min(page - 1, pages) }) : null} label="Page before">
              <Icon name="left" />
            </Step>
          </li>
          {pagesToShow(page, pages).map((one, index) => (
            <li key={one ?? `gap ${index}`}>
              {one === null ? (
                <span aria-hidden="true" className="px-1">…</span>
              ) : (
                <Link
                  prefetch={false}
                  href={hrefOf({ page: one })}
                  aria-label={`Page ${formatNumber(one)}`}
                  aria-current={one === page ? 'page' : undefined}
                  className={`${box} ${one === page ? 'border-thread-strong bg-paper font-semibold text-ink' : 'border-transparent text-indigo hover:border-thread-strong'}`}
                >
                  {formatNumber(one)}
                </Link>
              )}
            </li>
          ))}
          <li>
            <Step href={page < pages ? hrefOf({ page: page + 1 }) : null} label="Next page">
              <Icon name="right" />
            </Step>
          </li>
        </ul>
      )}
      {pageSizes.length > 0 && total > Math.min(...pageSizes) && (
        <p className="flex flex-wrap items-center gap-x-1">
          Rows on a page:
          {pageSizes.map((size) => (
            <Link
              prefetch={false}
              key={size}
              href={hrefOf({ pageSize: size })}
              aria-current={size === pageSize ? 'true' : undefined}
              className={`${box} ${size === pageSize ? 'border-thread-strong bg-paper font-semibold text-ink' : 'border-transparent text-indigo hover:border-thread-strong'}`}
            >
              {size}
            </Link>
          ))}
        </p>
      )}
    </nav>
  );
}
