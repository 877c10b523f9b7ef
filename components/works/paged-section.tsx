'use client';

import { type ReactNode } from 'react';

import { formatNumber } from '@/components/ui/numbers';
import { SectionHeading } from '@/components/ui/page-header';
import { Pagination } from '@/components/ui/pagination';
import { Notice } from '@/components/ui/status';
import { type ApiProblem } from '@/lib/api/client';
import { type Page } from '@/lib/api/schemas';

interface PagedSectionProps<Item> {
  /** Anchor. */
  id: string;
  title: string;
  page: Page<Item>;
  error: ApiProblem | undefined;
  /** Said where the list is empty. */
  empty: ReactNode;
  hrefOf: (change: { page?: number }) => string;
  itemKey: (item: Item) => string;
  children: (item: Item) => ReactNode;
}

/** A list of a work's page with its own page number. */
export function PagedSection<Item>({ id, title, page, error, empty, hrefOf, itemKey, children }: PagedSectionProps<Item>) {
  return (
    <section id={id} aria-labelledby={`${id}-title`} className="grid scroll-mt-4 gap-1">
      <SectionHeading id={`${id}-title`} beside={formatNumber(page.total)}>{title}</SectionHeading>
      {error && <Notice tone="problem" title="The list could not be renewed">{error.message}</Notice>}
      {page.items.length === 0 && page.total === 0 ? <p className="py-2 text-ink-soft">{empty}</p> : <ol className="divide-y divide-thread border-b border-thread">{page.items.map((item) => <li key={itemKey(item)} className="py-2.5">{children(item)}</li>)}</ol>}
      {page.total > page.pageSize && <Pagination page={page.page} pageSize={page.pageSize} total={page.total} hrefOf={hrefOf} label={`Pages of ${title}`} />}
    </section>
  );
}
