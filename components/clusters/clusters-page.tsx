'use client';

import { AnalysisHead } from '@/components/analyses/analysis-head';
import { basisMeaning, basisWords } from '@/components/analyses/analysis-words';
import { RunningAnalysis } from '@/components/analyses/running-analysis';
import { ClusterArticle } from '@/components/clusters/cluster-article';
import { FlowTable } from '@/components/clusters/flow-table';
import { count, formatDecimal, formatNumber } from '@/components/ui/numbers';
import { SectionHeading } from '@/components/ui/page-header';
import { Pagination } from '@/components/ui/pagination';
import { Caution, EmptyState, Notice } from '@/components/ui/status';
import { Tabs } from '@/components/ui/tabs';
import { useAddress } from '@/components/ui/use-address';
import { type Page } from '@/lib/api/schemas';
import { type AnalysisClusterItem, type AnalysisView } from '@/lib/api/types';
import { bases, type Basis } from '@/lib/network/types';

interface ClustersPageProps {
  chosen: AnalysisView;
  finished: AnalysisView[];
  latest: AnalysisView | null;
  basis: Basis;
  list: Page<AnalysisClusterItem>;
  mayRun: boolean;
}

/** Below these mean agreements between repeats, clusters are to be read with care, or hardly at all. */
const [firmAgreement, leastAgreement] = [0.7, 0.5];

function Agreement({ agreement }: { agreement: number | null }) {
  if (agreement === null || agreement >= firmAgreement) return null;
  return agreement < leastAgreement ? (
    <Notice tone="caution" title="These clusters are not repeatable">Repeats agree by {formatDecimal(agreement)} only (adjusted Rand index). Other seeds draw other groups; do not report these. Another basis or resolution may hold better.</Notice>
  ) : (
    <Notice tone="caution" title="These clusters depend on the seed">Repeats agree by {formatDecimal(agreement)} (adjusted Rand index). Read each cluster with its firmness.</Notice>
  );
}

/** The clusters of an analysis on one basis. */
export function ClustersPage({ chosen, finished, latest, basis, list, mayRun }: ClustersPageProps) {
  const { href } = useAddress();
  const base = `/portfolios/${chosen.portfolioId}`;
  const query = `${basis === 'cocitation' ? '' : `&basis=${basis}`}${chosen.id === finished[0].id ? '' : `&analysis=${chosen.id}`}`;
  const facts = chosen.summary?.bases.find((one) => one.basis === basis);
  const outside = chosen.summary && facts ? chosen.summary.works - list.items.reduce((sum, cluster) => sum + cluster.size, 0) : 0;
  return (
    <div className="grid max-w-[80rem] gap-5 px-4 pt-6 pb-12 md:px-7">
      <AnalysisHead title="What the works are about" chosen={chosen} finished={finished} mayRun={mayRun}>
        <Caution>Clusters depend on basis, resolution and seed; names are made from terms and are suggestions.</Caution>
      </AnalysisHead>
      {latest && <RunningAnalysis initial={latest} mayRun={mayRun} />}
      <Tabs
        label="What links two works"
        tabs={bases.map((one) => ({ href: href({ basis: one === 'cocitation' ? null : one, page: null }), label: basisWords[one], count: formatNumber(chosen.summary?.bases.find((found) => found.basis === one)?.clusters ?? 0), current: one === basis }))}
      />
      <p className="max-w-[46rem] text-table text-ink-soft">
        {basisMeaning[basis]}
        {facts && ` ${count(facts.linkedWorks, 'work')} ${facts.linkedWorks === 1 ? 'has' : 'have'} a link, in ${count(facts.pairs, 'pair')}; ${count(facts.clusters, 'cluster')}, modularity ${formatDecimal(facts.modularity)}${facts.agreementMean === null ? '' : `, agreement of repeats ${formatDecimal(facts.agreementMean)}`}.`}
        {list.total <= list.pageSize && outside > 0 && ` ${count(outside, 'work')} stand${outside === 1 ? 's' : ''} in no cluster.`}
      </p>
      <Agreement agreement={facts?.agreementMean ?? null} />
      {list.items.length === 0 ? (
        <EmptyState title="No clusters on this basis">Too few works are linked in this way. Another basis may show more, or import more reference lists.</EmptyState>
      ) : (
        <div className="border-t border-ink">{list.items.map((cluster) => <ClusterArticle key={cluster.letter} cluster={cluster} base={base} query={query} />)}</div>
      )}
      <Pagination page={list.page} pageSize={list.pageSize} total={list.total} hrefOf={(change) => href({ page: change.page && change.page > 1 ? change.page : null })} />
      {list.items.length > 1 && (
        <section aria-labelledby="flows" className="grid gap-3">
          <SectionHeading id="flows">How clusters cite each other</SectionHeading>
          <FlowTable clusters={list.items} />
        </section>
      )}
    </div>
  );
}
