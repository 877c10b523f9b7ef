'use client';

import Link from 'next/link';
import { useMemo, useState } from 'react';

import { DataTable } from '@/components/tables/data-table';
import { type DataColumn } from '@/components/tables/columns';
import { useAddressState } from '@/components/tables/use-address-state';
import { Button } from '@/components/ui/button';
import { count, formatNumber } from '@/components/ui/numbers';
import { PageHeader } from '@/components/ui/page-header';
import { Pagination } from '@/components/ui/pagination';
import { EmptyState, Notice } from '@/components/ui/status';
import { useMembership } from '@/components/works/use-membership';
import { useSelection } from '@/components/works/use-selection';
import { WorkFilters } from '@/components/works/work-filters';
import { WorkLine } from '@/components/works/work-line';
import { titleOf, typeWords } from '@/components/works/work-words';
import { usePortfolioWorks } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type WorkListItem } from '@/lib/api/types';

const filterNames = ['q', 'type', 'yearFrom', 'yearTo', 'catalogued', 'retracted'] as const;

function columnsOf(selection: ReturnType<typeof useSelection> | null, pageIds: string[]): DataColumn<WorkListItem>[] {
  const { chosen, toggle } = selection ?? {};
  const box = 'size-[18px] accent-[var(--indigo)]';
  return [
    ...(chosen && toggle
      ? [{
          id: 'chosen',
          label: 'Chosen',
          fixed: true,
          width: '2rem',
          narrow: 'lead' as const,
          head: <input type="checkbox" aria-label="Choose all works of this page" className={box} checked={pageIds.length > 0 && pageIds.every((id) => chosen.has(id))} onChange={(event) => toggle(pageIds, event.target.checked)} />,
          cell: (work: WorkListItem) => <input type="checkbox" aria-label={`Choose ${titleOf(work)}`} className={box} checked={chosen.has(work.id)} onChange={(event) => toggle([work.id], event.target.checked)} />,
        }]
      : []),
    { id: 'title', head: 'Work', sort: 'title', fixed: true, narrow: 'title', cell: (work) => <WorkLine work={work} yearElsewhere /> },
    { id: 'year', head: 'Year', sort: 'year', highestFirst: true, numeric: true, width: '5rem', cell: (work) => work.year ?? '–' },
    { id: 'type', head: 'Type', width: '8rem', hiddenAtFirst: true, cell: (work) => typeWords[work.type] },
    { id: 'references', head: 'References', sort: 'references', highestFirst: true, numeric: true, width: '7rem', cell: (work) => (work.references > 0 ? <Link prefetch={false} href={`/works/${work.id}#references`} aria-label={`${formatNumber(work.references)} references of ${titleOf(work)}`}>{formatNumber(work.references)}</Link> : '0') },
    { id: 'citationsHere', head: 'Citations here', sort: 'citationsHere', highestFirst: true, numeric: true, width: '8rem', cell: (work) => (work.citationsHere > 0 ? <Link prefetch={false} href={`/works/${work.id}#cited-by`} aria-label={`${formatNumber(work.citationsHere)} citations here of ${titleOf(work)}`}>{formatNumber(work.citationsHere)}</Link> : '0') },
    { id: 'records', head: 'Records', numeric: true, width: '6rem', narrow: 'hidden', cell: (work) => (work.records > 0 ? <Link prefetch={false} href={`/works/${work.id}#records`} aria-label={`${formatNumber(work.records)} records of ${titleOf(work)}`}>{formatNumber(work.records)}</Link> : '0') },
    { id: 'doi', head: 'DOI', width: '14rem', hiddenAtFirst: true, narrow: 'wide', cell: (work) => (work.doi ? <span className="font-mono text-small break-all">{work.doi}</span> : '–') },
  ];
}

interface WorksPageProps {
  portfolioId: string;
  initial: Page<WorkListItem>;
  mayCurate: boolean;
}

/** The works of a portfolio: find, sort, open; curators take works out and put them back. */
export function WorksPage({ portfolioId, initial, mayCurate }: WorksPageProps) {
  const { sort, filters, filtered, query, hrefOf, set } = useAddressState({ sort: '-year', filters: filterNames });
  // What the server drew answers the address that the page was opened with, and no other.
  const [firstQuery] = useState(query);
  const { data, error, isLoading, mutate } = usePortfolioWorks(portfolioId, query, { fallbackData: query === firstQuery ? initial : undefined });
  const list = data ?? initial;
  const selection = useSelection();
  const curates = mayCurate && filters.catalogued === '';
  const membership = useMembership(portfolioId, () => {
    selection.clear();
    void mutate();
  });
  const pageIds = useMemo(() => list.items.map((work) => work.id), [list]);
  const columns = useMemo(() => columnsOf(curates ? selection : null, pageIds), [curates, selection, pageIds]);
  const chosen = [...selection.chosen];
  const scope = filters.catalogued === 'false' ? 'cited-only work' : 'work';
  return (
    <div className="grid gap-5 px-4 pt-6 pb-12 md:px-7">
      <PageHeader title="Works" subtitle={`${count(list.total, scope)}${filtered && filters.catalogued !== 'false' ? ' found' : ''}. Citations here count distinct works of this portfolio that cite the work.`} />
      {error && <Notice tone="problem" title="The list could not be read" actions={<Button onClick={() => void mutate()}>Try again</Button>}>{error.message}</Notice>}
      {curates && chosen.length > 0 && (
        <div role="region" aria-label="Chosen works" className="sticky top-0 z-10 flex flex-wrap items-center justify-between gap-3 border-y border-weld bg-weld-wash px-3 py-2">
          <p className="text-table">{count(chosen.length, 'work')} chosen</p>
          <div className="flex gap-2">
            <Button kind="quiet" onClick={selection.clear}>Choose none</Button>
            <Button disabled={membership.sending} onClick={() => void membership.remove(chosen)}>Take out of the portfolio</Button>
          </div>
        </div>
      )}
      {membership.problem && <Notice tone="problem" title="The works could not be changed">{membership.problem}</Notice>}
      <DataTable
        caption="Works of this portfolio"
        name="works"
        columns={columns}
        rows={list.items}
        rowKey={(work) => work.id}
        sort={sort}
        onSort={(next) => set({ sort: next })}
        loading={isLoading && !data}
        filters={<WorkFilters filters={filters} onChange={(change, how) => set({ filters: change }, how)} />}
        empty={
          filtered ? (
            <EmptyState title="No work is like that" action={<Button onClick={() => set({ filters: Object.fromEntries(filterNames.map((name) => [name, null])) })}>Clear the filters</Button>}>Every word must occur in title, authors, venue, year or keywords; a DOI must be whole.</EmptyState>
          ) : (
            <EmptyState title="No works yet">{mayCurate ? <>Works come with imports. <Link prefetch={false} href={`/portfolios/${portfolioId}/imports`}>Import what you have</Link></> : 'Works come with imports, which librarians make.'}</EmptyState>
          )
        }
      />
      <Pagination page={list.page} pageSize={list.pageSize} total={list.total} hrefOf={hrefOf} pageSizes={[25, 50, 100, 200]} />
    </div>
  );
}
