'use client';

import { useId, type ReactNode } from 'react';

import { Button } from '@/components/ui/button';
import { formatNumber } from '@/components/ui/numbers';
import { Notice } from '@/components/ui/status';
import { type ApiProblem } from '@/lib/api/client';
import { type Page } from '@/lib/api/schemas';

interface PagedSectionProps<Item> {
  title: string;
  page: Page<Item>;
  error: ApiProblem | undefined;
  /** Said where the list is empty. */
  empty: ReactNode;
  onPage: (page: number) => void;
  itemKey: (item: Item) => string;
  children: (item: Item) => ReactNode;
}

/** A list of a work's page with its own page number. */
export function PagedSection<Item>({ title, page, error, empty, onPage, itemKey, children }: PagedSectionProps<Item>) {
  const id = useId();
  const first = (page.page - 1) * page.pageSize + 1;
  const last = Math.min(page.page * page.pageSize, page.total);
  return (
    <section aria-labelledby={id} className="grid gap-2">
      <h2 id={id} className="border-b border-ink pb-2 text-[21px] leading-[25px]">
        {title} <span className="font-sans text-[14px] text-ink-soft">{formatNumber(page.total)}</span>
      </h2>
      {error && <Notice tone="problem" title="The list could not be renewed">{error.message}</Notice>}
      {page.items.length === 0 ? <p className="py-2 text-ink-soft">{empty}</p> : <ol className="divide-y divide-thread border-b border-thread">{page.items.map((item) => <li key={itemKey(item)} className="py-2.5">{children(item)}</li>)}</ol>}
      {page.total > page.pageSize && (
        <nav aria-label={`Pages of ${title}`} className="flex flex-wrap items-center gap-3 text-[14px] text-ink-soft">
          <span>{first > page.total ? 'Nothing on this page' : `${formatNumber(first)} to ${formatNumber(last)} of ${formatNumber(page.total)}`}</span>
          <Button className="min-h-8 py-1" disabled={page.page <= 1} onClick={() => onPage(page.page - 1)}>Before</Button>
          <Button className="min-h-8 py-1" disabled={last >= page.total} onClick={() => onPage(page.page + 1)}>Next</Button>
        </nav>
      )}
    </section>
  );
}
