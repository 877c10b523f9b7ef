import Link from 'next/link';
import { type ComponentProps } from 'react';

import { workName } from '@/components/analyses/work-name';
import { IntervalBar } from '@/components/charts/interval-bar';
import { type EvidenceMeasure } from '@/components/rankings/work-evidence';
import { type DataColumn } from '@/components/tables/columns';
import { ClusterSwatch } from '@/components/ui/cluster-swatch';
import { formatDecimal, formatNumber } from '@/components/ui/numbers';
import { Pill } from '@/components/ui/status';
import { isUncertain } from '@/components/map/threads';
import { type AnalysisWorkItem } from '@/lib/api/types';
import { type Basis } from '@/lib/network/types';

interface ColumnOptions {
  basis: Basis;
  /** Ends of the interval bars, the same for the page. */
  track: { from: number; to: number };
  /** A link that opens the evidence of a figure. */
  evidence: (measure: EvidenceMeasure, work: string) => Pick<ComponentProps<'a'>, 'href' | 'onClick'>;
}

function Title({ work }: { work: AnalysisWorkItem }) {
  return (
    <span className="grid gap-0.5">
      <span className="font-serif text-work font-medium [overflow-wrap:anywhere]">
        <Link prefetch={false} href={`/works/${work.id}`} className="text-ink no-underline hover:underline">{workName(work)}</Link>
        {work.retracted && <span className="ml-2 align-middle font-sans"><Pill tone="problem">Retracted</Pill></span>}
      </span>
      <span className="text-small text-ink-soft">
        {work.title !== null && [work.authors, work.year ?? 'no year', work.venue].filter(Boolean).join(' · ')}
        {!work.catalogued && (work.title === null ? 'cited only' : ' · cited only')}
        {work.inLoop && ' · in a loop'}
      </span>
    </span>
  );
}

/** "2–7", or one rank where the interval is one. */
export const intervalWords = (low: number, high: number) => (low === high ? formatNumber(low) : `${formatNumber(low)} to ${formatNumber(high)}`);

/** Columns of the ranking. Every figure that can be explained is a link to its evidence. */
export function rankingColumns({ basis, track, evidence }: ColumnOptions): DataColumn<AnalysisWorkItem>[] {
  const figure = (measure: EvidenceMeasure, work: AnalysisWorkItem, text: string, label: string) => (
    <a {...evidence(measure, work.id)} aria-label={`${label}: ${text}. Open the evidence`}>{text}</a>
  );
  const log = track.to / track.from > 40;
  return [
    { id: 'rank', head: 'Rank', sort: 'rank', numeric: true, fixed: true, narrow: 'lead', width: '4rem', cell: (work) => <span className="font-serif text-[1.3125rem]">{formatNumber(work.rank)}</span> },
    { id: 'work', head: 'Work', sort: 'title', fixed: true, narrow: 'title', cell: (work) => <Title work={work} /> },
    {
      id: 'cluster', head: 'Cluster', width: '5rem',
      cell: (work) => {
        const cluster = work.clusters[basis];
        return cluster ? <ClusterSwatch index={cluster.number} letter={cluster.letter} uncertain={isUncertain(cluster.firmness)} /> : <span className="text-ink-soft">none</span>;
      },
    },
    { id: 'inDegree', head: 'Citations here', sort: 'inDegree', highestFirst: true, numeric: true, width: '6.5rem', cell: (work) => figure('inDegree', work, formatNumber(work.inDegree), 'Citations here') },
    { id: 'pageRank', head: <>PageRank<br />(mean 1)</>, label: 'PageRank (mean 1)', sort: 'pageRank', highestFirst: true, numeric: true, width: '5.5rem', cell: (work) => figure('pageRank', work, formatDecimal(work.pageRank), 'PageRank') },
    {
      id: 'interval', head: 'Rank interval, 95%', width: '9rem', narrow: 'wide',
      cell: (work) => <IntervalBar value={work.rank} low={work.rankLow} high={work.rankHigh} from={track.from} to={track.to} scale={log ? 'log' : 'linear'} label={`Rank ${work.rank}, 95% interval ${intervalWords(work.rankLow, work.rankHigh)}`} />,
    },
    { id: 'agePercentile', head: <>Age-fair<br />percentile</>, label: 'Age-fair percentile', sort: 'agePercentile', highestFirst: true, numeric: true, width: '5.5rem', cell: (work) => (work.agePercentile === null ? '–' : figure('agePercentile', work, formatDecimal(work.agePercentile, 0), 'Age-fair percentile')) },
    { id: 'pageRankHigh', head: <>PageRank<br />at 0.85</>, label: 'PageRank at 0.85', sort: 'pageRankHigh', highestFirst: true, numeric: true, hiddenAtFirst: true, width: '5.5rem', cell: (work) => formatDecimal(work.pageRankHigh) },
    { id: 'citationsPerYear', head: <>Citations<br />per year</>, label: 'Citations per year', sort: 'citationsPerYear', highestFirst: true, numeric: true, hiddenAtFirst: true, width: '5.5rem', cell: (work) => (work.citationsPerYear === null ? '–' : figure('citationsPerYear', work, formatDecimal(work.citationsPerYear), 'Citations per year')) },
    { id: 'outDegree', head: <>Works<br />cited here</>, label: 'Works cited here', sort: 'outDegree', highestFirst: true, numeric: true, hiddenAtFirst: true, width: '5.5rem', cell: (work) => figure('outDegree', work, formatNumber(work.outDegree), 'Works cited here') },
    {
      id: 'citationRank', head: <>Rank by<br />citations</>, label: 'Rank by citations', sort: 'citationRank', numeric: true, hiddenAtFirst: true, width: '6.5rem',
      cell: (work) => <span>{formatNumber(work.citationRank)} <span className="text-small text-ink-soft">({work.citationRankLow}–{work.citationRankHigh})</span></span>,
    },
    { id: 'year', head: 'Year', sort: 'year', highestFirst: true, numeric: true, hiddenAtFirst: true, width: '4rem', cell: (work) => work.year ?? '–' },
  ];
}
