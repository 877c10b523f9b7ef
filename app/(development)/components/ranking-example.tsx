'use client';

import Link from 'next/link';

import { exampleWorks, type ExampleWork } from './example-data';
import { IntervalBar } from '@/components/charts/interval-bar';
import { type DataColumn } from '@/components/tables/columns';
import { DataTable } from '@/components/tables/data-table';
import { FilterField } from '@/components/tables/filter-field';
import { useAddressState } from '@/components/tables/use-address-state';
import { Button } from '@/components/ui/button';
import { ClusterSwatch } from '@/components/ui/cluster-swatch';
import { SelectField } from '@/components/ui/field';
import { NumberText } from '@/components/ui/number-text';
import { PageHeader } from '@/components/ui/page-header';
import { Pagination } from '@/components/ui/pagination';
import { Caution, EmptyState } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';

const columns: DataColumn<ExampleWork>[] = [
  { id: 'rank', head: 'Rank', numeric: true, fixed: true, narrow: 'lead', width: '3.5rem', sort: 'rank', cell: (work) => <span className="font-serif text-[1.25rem]">{work.rank}</span> },
  {
    id: 'work',
    head: 'Work',
    fixed: true,
    narrow: 'title',
    sort: 'title',
    cell: (work) => (
      <>
        <span className="block font-serif text-work">{work.title}</span>
        <span className="block text-small text-ink-soft">{work.authors}</span>
      </>
    ),
  },
  { id: 'cluster', head: 'Cluster', width: '4.5rem', cell: (work) => <ClusterSwatch index={work.cluster} uncertain={work.uncertain} /> },
  { id: 'citations', head: 'Citations here', numeric: true, highestFirst: true, sort: 'inDegree', cell: (work) => <Link href={`?evidence=${work.id}`} scroll={false}><NumberText value={work.citations} /></Link> },
  { id: 'pageRank', head: <>PageRank<br />(mean 1)</>, label: 'PageRank (mean 1)', numeric: true, highestFirst: true, sort: 'pageRank', cell: (work) => <NumberText value={work.pageRank} as="decimal" /> },
  { id: 'interval', head: 'Rank interval, 95%', width: '8.5rem', cell: (work) => <IntervalBar value={work.rank} low={work.low} high={work.high} to={16} label={`Rank ${work.rank}, 95% interval ${work.low} to ${work.high}`} /> },
  { id: 'percentile', head: <>Age-fair<br />percentile</>, label: 'Age-fair percentile', numeric: true, highestFirst: true, sort: 'percentile', cell: (work) => work.percentile },
  { id: 'references', head: 'References', numeric: true, hiddenAtFirst: true, cell: (work) => work.citations * 3 },
];

export function RankingExample() {
  const { search, show } = useAddress();
  const { sort, page, pageSize, filters, hrefOf, set } = useAddressState({ sort: '-pageRank', pageSize: 50, filters: ['q'] });
  const found = exampleWorks.filter((work) => work.title.toLowerCase().includes(filters.q.toLowerCase()));
  const state = search.get('state');
  return (
    <div className="grid gap-4">
      <PageHeader title="Works this portfolio rests on" subtitle="Analysis of 14 May 2026 · 4,812 works, 96,204 references, 87% linked">
        <Caution>Counts show use within this portfolio, not quality. Read with the coverage and intervals; not for decisions on persons.</Caution>
      </PageHeader>
      <DataTable
        name="example"
        caption="Works by PageRank"
        columns={columns}
        rows={state === 'loading' ? [] : found}
        loading={state === 'loading'}
        rowKey={(work) => work.id}
        sort={sort}
        onSort={(next) => set({ sort: next })}
        selectedKey={search.get('evidence')}
        onOpen={(work) => show({ evidence: work.id })}
        filters={
          <>
            <FilterField label="Filter by title, author or venue" value={filters.q} onChange={(q) => set({ filters: { q } }, 'replace')} />
            <SelectField label="Cluster" labelHidden className="w-36">
              <option>All clusters</option>
              <option>A Peat carbon under drainage</option>
            </SelectField>
          </>
        }
        actions={<Button>Export table</Button>}
        empty={<EmptyState title="No work fits" action={<Button kind="primary" onClick={() => set({ filters: { q: null } })}>Show all works</Button>}>Take a filter away, or look for other words.</EmptyState>}
      />
      <Pagination page={page} pageSize={pageSize} total={4812} hrefOf={hrefOf} pageSizes={[25, 50, 100]} />
    </div>
  );
}
