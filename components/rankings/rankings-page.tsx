'use client';

import Link from 'next/link';
import { useMemo } from 'react';

import { AnalysisHead } from '@/components/analyses/analysis-head';
import { RunningAnalysis } from '@/components/analyses/running-analysis';
import { useShallow } from '@/components/analyses/use-shallow';
import { SheetWithEvidence } from '@/components/frame/sheet-with-evidence';
import { rankingColumns } from '@/components/rankings/columns';
import { RankingFilters, type ClusterChoice, type RankingFilter } from '@/components/rankings/ranking-filters';
import { parseEvidence, WorkEvidence, type EvidenceMeasure } from '@/components/rankings/work-evidence';
import { DataTable } from '@/components/tables/data-table';
import { useAddressState } from '@/components/tables/use-address-state';
import { Button, ButtonLink } from '@/components/ui/button';
import { Menu, MenuLink } from '@/components/ui/menu';
import { Pagination } from '@/components/ui/pagination';
import { Caution, EmptyState, Notice } from '@/components/ui/status';
import { apiPath } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type AnalysisView, type AnalysisWorkItem } from '@/lib/api/types';
import { type SpreadBin } from '@/lib/analyses/reading/spread';
import { bases, type Basis } from '@/lib/network/types';

interface RankingsPageProps {
  chosen: AnalysisView;
  finished: AnalysisView[];
  latest: AnalysisView | null;
  list: Page<AnalysisWorkItem>;
  clusters: Record<Basis, ClusterChoice[]>;
  spreads: Partial<Record<EvidenceMeasure, SpreadBin[]>>;
  loops: AnalysisWorkItem[];
  mayRun: boolean;
  mayExport: boolean;
}

const filterNames: RankingFilter[] = ['q', 'yearFrom', 'yearTo', 'cluster', 'basis', 'catalogued'];
/** Below this PageRank says nothing (METHODS: withheld under 20 works). */
const leastWorks = 20;

function ExportMenu({ analysisId, query }: { analysisId: string; query: Record<string, string | number | undefined> }) {
  const href = (format: string) => apiPath(`/api/analyses/${analysisId}/export`, { ...query, page: undefined, pageSize: undefined, format });
  return (
    <Menu label="Export table" trigger={<Button>Export table</Button>}>
      <MenuLink download href={href('csv')}>CSV, every row that fits</MenuLink>
      <MenuLink download href={href('json')}>JSON, with parameters and cautions</MenuLink>
    </Menu>
  );
}

/** Works of an analysis, ranked, with the evidence of any figure beside them. */
export function RankingsPage({ chosen, finished, latest, list, clusters, spreads, loops, mayRun, mayExport }: RankingsPageProps) {
  const { sort, filters, filtered, query, hrefOf, set } = useAddressState<RankingFilter>({ sort: 'rank', pageSize: 50, filters: filterNames });
  const shallow = useShallow();
  const { link } = shallow;
  const evidence = parseEvidence(shallow.search.get('evidence'));
  const basis = bases.find((one) => one === filters.basis) ?? 'cocitation';
  const columns = useMemo(() => {
    const track = { from: Math.min(...list.items.map((work) => work.rankLow)), to: Math.max(...list.items.map((work) => work.rankHigh)) };
    return rankingColumns({ basis, track, evidence: (measure, work) => link({ evidence: `${measure}:${work}` }) });
  }, [basis, list.items, link]);
  const close = () => shallow.set({ evidence: null });
  const clear = hrefOf({ filters: Object.fromEntries(filterNames.map((name) => [name, null])) });
  return (
    <SheetWithEvidence evidence={evidence && <WorkEvidence key={`${evidence.measure}:${evidence.work}`} analysisId={chosen.id} measure={evidence.measure} work={evidence.work} spreads={spreads} onClose={close} />}>
      <div className="grid gap-5">
        <AnalysisHead title="Works this portfolio rests on" chosen={chosen} finished={finished} mayRun={mayRun}>
          <Caution>Counts show use within this portfolio, not quality. Read with the coverage and intervals; not for decisions on persons.</Caution>
        </AnalysisHead>
        {latest && <RunningAnalysis initial={latest} mayRun={mayRun} />}
        {loops.length > 0 && (
          <Notice tone="caution" title={loops.length === 1 ? 'A work among the first ten lies in a loop' : `${loops.length} works among the first ten lie in loops`}>
            They cite each other, directly or round a corner, and hand PageRank back and forth: {loops.map((work) => work.title ?? 'an untitled work').join('; ')}. Compare with citations here, or with a lower damping. <Link href="/methods#pagerank">Why</Link>
          </Notice>
        )}
        {(chosen.summary?.works ?? 0) < leastWorks && <Notice tone="caution" title="Too few works for PageRank">With fewer than {leastWorks} works, ranks by PageRank mean little. Read the citations here, one by one.</Notice>}
        <DataTable
          caption="Works by rank"
          name="rankings"
          columns={columns}
          rows={list.items}
          rowKey={(work) => work.id}
          sort={sort}
          onSort={(next) => set({ sort: next })}
          selectedKey={evidence?.work ?? null}
          onOpen={(work) => shallow.set({ evidence: `pageRank:${work.id}` })}
          filters={<RankingFilters filters={filters} clusters={clusters} onChange={(changed, how) => set({ filters: changed }, how)} />}
          actions={mayExport && <ExportMenu analysisId={chosen.id} query={query} />}
          empty={filtered ? <EmptyState title="No work fits" action={<ButtonLink href={clear} scroll={false}>Clear the filters</ButtonLink>}>Take a word or a year away.</EmptyState> : <EmptyState title="No works in this analysis">Its scope or period left none over.</EmptyState>}
        />
        <Pagination page={list.page} pageSize={list.pageSize} total={list.total} hrefOf={hrefOf} pageSizes={[25, 50, 100, 200]} />
      </div>
    </SheetWithEvidence>
  );
}
