'use client';

import Link from 'next/link';
import { useMemo, useState } from 'react';

import { workName } from '@/components/analyses/work-name';
import { isUncertain } from '@/components/map/threads';
import { type DataColumn } from '@/components/tables/columns';
import { DataTable } from '@/components/tables/data-table';
import { Button } from '@/components/ui/button';
import { ClusterSwatch } from '@/components/ui/cluster-swatch';
import { formatDecimal, formatNumber } from '@/components/ui/numbers';
import { EmptyState, Pill } from '@/components/ui/status';
import { type AnalysisMap } from '@/lib/api/types';

interface MapTableProps {
  map: AnalysisMap;
  visible: Uint8Array;
  selected: number;
  links: readonly (readonly unknown[])[];
  onSelect: (work: number) => void;
}

type Key = 'rank' | 'title' | 'year' | 'cluster' | 'size' | 'pageRank' | 'firmness' | 'links';
const step = 100;

/** The works that the map shows, as a table: same filters, same selection. */
export function MapTable({ map, visible, selected, links, onSelect }: MapTableProps) {
  const [sort, setSort] = useState('rank');
  const [shown, setShown] = useState(step);
  const letters = useMemo(() => new Map(map.clusters.map((cluster) => [cluster.number, cluster.letter])), [map]);
  const rows = useMemo(() => {
    const key = sort.replace(/^-/, '') as Key;
    const valueOf = (work: number): number | string | null =>
      ({ rank: map.rank[work], title: map.titles[work], year: map.years[work], cluster: map.cluster[work] < 0 ? null : map.cluster[work], size: map.size[work], pageRank: map.pageRank[work], firmness: map.firmness[work], links: links[work].length })[key];
    const direction = sort.startsWith('-') ? -1 : 1;
    return map.ids.flatMap((_, work) => (visible[work] ? [work] : [])).sort((a, b) => {
      const [one, other] = [valueOf(a), valueOf(b)];
      // Works without the value stand last both ways.
      if (one === null || other === null) return one === other ? map.rank[a] - map.rank[b] || a - b : one === null ? 1 : -1;
      const order = typeof one === 'string' && typeof other === 'string' ? one.localeCompare(other, 'en') : Number(one) - Number(other);
      return order * direction || map.rank[a] - map.rank[b] || a - b;
    });
  }, [map, visible, sort, links]);
  const columns = useMemo<DataColumn<number>[]>(
    () => [
      { id: 'rank', head: 'Rank', sort: 'rank', numeric: true, fixed: true, narrow: 'lead', width: '4rem', cell: (work) => <span className="font-serif text-[1.3125rem]">{formatNumber(map.rank[work])}</span> },
      {
        id: 'title', head: 'Work', sort: 'title', fixed: true, narrow: 'title',
        cell: (work) => (
          <span className="grid gap-0.5">
            <Link prefetch={false} href={`/works/${map.ids[work]}`} className="font-serif text-work font-medium text-ink no-underline hover:underline">{workName({ title: map.titles[work], authors: map.authors[work], year: map.years[work] })}</Link>
            <span className="text-small text-ink-soft">{[map.authors[work], map.catalogued[work] ? null : 'cited only'].filter((part) => part !== null).join(' · ')} {map.retracted[work] && <Pill tone="problem">Retracted</Pill>}</span>
          </span>
        ),
      },
      { id: 'year', head: 'Year', sort: 'year', highestFirst: true, numeric: true, width: '4.5rem', cell: (work) => map.years[work] ?? '–' },
      { id: 'cluster', head: 'Cluster', sort: 'cluster', width: '5.5rem', cell: (work) => <ClusterSwatch index={map.cluster[work] < 0 ? null : map.cluster[work]} letter={letters.get(map.cluster[work])} uncertain={isUncertain(map.firmness[work])} /> },
      { id: 'firmness', head: 'Firmness', sort: 'firmness', highestFirst: true, numeric: true, width: '5.5rem', cell: (work) => formatDecimal(map.firmness[work]) },
      { id: 'size', head: 'Citations here', sort: 'size', highestFirst: true, numeric: true, width: '6.5rem', cell: (work) => formatNumber(map.size[work]) },
      { id: 'pageRank', head: 'PageRank', sort: 'pageRank', highestFirst: true, numeric: true, width: '5.5rem', cell: (work) => formatDecimal(map.pageRank[work]) },
      { id: 'links', head: 'Links drawn', sort: 'links', highestFirst: true, numeric: true, width: '6rem', cell: (work) => formatNumber(links[work].length) },
    ],
    [map, letters, links],
  );
  return (
    <div className="grid gap-3 px-4 py-4 md:px-6">
      <DataTable
        caption="Works on the map"
        columns={columns}
        rows={rows.slice(0, shown)}
        rowKey={(work) => map.ids[work]}
        sort={sort}
        onSort={setSort}
        selectedKey={selected >= 0 ? map.ids[selected] : null}
        onOpen={onSelect}
        empty={<EmptyState title="No work fits">Widen the years, or show more clusters.</EmptyState>}
      />
      {rows.length > shown && <Button className="justify-self-start" onClick={() => setShown(shown + step)}>Show {formatNumber(Math.min(step, rows.length - shown))} more of {formatNumber(rows.length)}</Button>}
    </div>
  );
}
