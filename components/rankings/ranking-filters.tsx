'use client';

import { basisWords } from '@/components/analyses/analysis-words';
import { clusterName } from '@/components/analyses/work-name';
import { FilterField } from '@/components/tables/filter-field';
import { SelectField } from '@/components/ui/field';
import { bases, type Basis } from '@/lib/network/types';

export interface ClusterChoice {
  letter: string;
  name: string;
  size: number;
}

export type RankingFilter = 'q' | 'yearFrom' | 'yearTo' | 'cluster' | 'basis' | 'catalogued';

interface RankingFiltersProps {
  filters: Record<RankingFilter, string>;
  clusters: Record<Basis, ClusterChoice[]>;
  onChange: (filters: Partial<Record<RankingFilter, string | null>>, how: 'push' | 'replace') => void;
}

/** What narrows the ranking: words, years, a cluster on one of the bases, kind of work. */
export function RankingFilters({ filters, clusters, onChange }: RankingFiltersProps) {
  const chooseCluster = (value: string) => {
    const [basis, letter] = value.split(':');
    onChange({ basis: basis === 'cocitation' ? null : basis, cluster: letter || null }, 'push');
  };
  return (
    <>
      <div className="w-full sm:w-64"><FilterField label="Filter by title, author or venue" value={filters.q} onChange={(q) => onChange({ q: q || null }, 'replace')} /></div>
      <div className="w-28"><FilterField label="Published from, year" placeholder="From year" value={filters.yearFrom} onChange={(year) => onChange({ yearFrom: year || null }, 'replace')} className="min-w-0!" /></div>
      <div className="w-28"><FilterField label="Published to, year" placeholder="To year" value={filters.yearTo} onChange={(year) => onChange({ yearTo: year || null }, 'replace')} className="min-w-0!" /></div>
      <SelectField label="Cluster" labelHidden className="w-64 max-w-full text-table" value={`${filters.basis || 'cocitation'}:${filters.cluster}`} onChange={(event) => chooseCluster(event.target.value)}>
        {bases.map((basis) => (
          <optgroup key={basis} label={basisWords[basis]}>
            <option value={`${basis}:`}>{`All clusters, ${basisWords[basis].toLowerCase()}`}</option>
            {clusters[basis].map((cluster) => <option key={cluster.letter} value={`${basis}:${cluster.letter}`}>{`${cluster.letter} · ${clusterName(cluster.name)} (${cluster.size})`}</option>)}
            <option value={`${basis}:none`}>In no cluster</option>
          </optgroup>
        ))}
      </SelectField>
      <SelectField label="Kind of work" labelHidden className="w-40 text-table" value={filters.catalogued} onChange={(event) => onChange({ catalogued: event.target.value || null }, 'push')}>
        <option value="">All works</option>
        <option value="true">Catalogued</option>
        <option value="false">Cited only</option>
      </SelectField>
    </>
  );
}
