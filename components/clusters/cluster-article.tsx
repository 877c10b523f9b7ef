import Link from 'next/link';

import { clusterName, workName } from '@/components/analyses/work-name';
import { FirmnessRuler } from '@/components/clusters/firmness-ruler';
import { ClusterSwatch } from '@/components/ui/cluster-swatch';
import { count, formatDecimal, formatNumber, formatShare } from '@/components/ui/numbers';
import { type AnalysisClusterItem } from '@/lib/api/types';

interface ClusterArticleProps {
  cluster: AnalysisClusterItem;
  /** Start of the portfolio's addresses, and the part of a query that keeps analysis and basis. */
  base: string;
  query: string;
}

function years({ firstYear, medianYear, lastYear }: AnalysisClusterItem): string {
  if (firstYear === null || lastYear === null) return 'no years known';
  return `${firstYear === lastYear ? firstYear : `${firstYear}–${lastYear}`}${medianYear === null ? '' : `, middle ${Math.round(medianYear)}`}`;
}

/** What a cluster is about, what it rests on, how old and how firm it is. */
export function ClusterArticle({ cluster, base, query }: ClusterArticleProps) {
  const title = `cluster-${cluster.letter}`;
  const outward = cluster.citesClusters.filter((one) => one.letter !== cluster.letter).sort((a, b) => b.citations - a.citations).slice(0, 3);
  return (
    <article aria-labelledby={title} id={cluster.letter} className="grid scroll-mt-6 gap-x-8 gap-y-4 border-b border-thread py-5 lg:grid-cols-[minmax(15rem,5fr)_minmax(0,8fr)]">
      <div className="grid content-start gap-2.5">
        <h2 id={title} className="text-panel">
          <ClusterSwatch index={cluster.number} letter={cluster.letter} name={clusterName(cluster.name)} />
        </h2>
        <p className="text-table text-ink-soft">{count(cluster.size, 'work')} · {years(cluster)}</p>
        <div className="grid max-w-80 gap-1">
          <FirmnessRuler firmness={cluster.firmness} />
          <p className="text-small text-ink-soft">
            {cluster.firmness === null ? 'Firmness unknown' : `Firm: its works stayed together in ${formatShare(cluster.firmness)} of repeats`}
            {cluster.conductance !== null && `; conductance ${formatDecimal(cluster.conductance)}${cluster.conductance > 0.5 ? ' (more leads out than stays within)' : ''}`}
          </p>
        </div>
        {outward.length > 0 && (
          <p className="text-small text-ink-soft">
            Cites {outward.map((one, index) => <span key={one.letter}>{index > 0 && ', '}<a href={`#${one.letter}`}>{one.letter}</a> {formatNumber(one.citations)} times</span>)}
          </p>
        )}
        <p className="flex flex-wrap gap-x-4 text-table">
          <Link prefetch={false} href={`${base}/rankings?cluster=${cluster.letter}${query}`}>Its works, ranked</Link>
          <Link prefetch={false} href={`${base}/map?cluster=${cluster.letter}${query}`}>On the map</Link>
        </p>
      </div>
      <div className="grid content-start gap-4">
        {cluster.terms.length > 0 && (
          <div>
            <h3 className="border-b border-thread pb-1 font-sans text-head font-semibold text-ink-soft">Terms that set it apart</h3>
            <ul className="mt-2 flex flex-wrap gap-x-5 gap-y-1 text-table">
              {cluster.terms.slice(0, 8).map((term) => (
                <li key={term.term} title={`Log-likelihood ${formatDecimal(term.logLikelihood, 1)}`}>
                  {term.term} <span className="text-small text-ink-soft">{formatNumber(term.works)}</span>
                </li>
              ))}
            </ul>
          </div>
        )}
        <div>
          <h3 className="border-b border-thread pb-1 font-sans text-head font-semibold text-ink-soft">Core works, by PageRank</h3>
          <ol className="mt-1 divide-y divide-thread">
            {cluster.coreWorks.map((work) => (
              <li key={work.workId} className="flex items-baseline justify-between gap-4 py-1.5">
                <span className="min-w-0">
                  <Link prefetch={false} href={`/works/${work.workId}`} className="font-serif text-work text-ink no-underline [overflow-wrap:anywhere] hover:underline">{workName(work)}</Link>{' '}
                  <span className="text-small text-ink-soft">{work.title !== null && [work.authors, work.year].filter((part) => part !== null).join(' · ')}</span>
                </span>
                <span className="shrink-0 text-small text-ink-soft">
                  rank {formatNumber(work.rank)} · <Link prefetch={false} href={`${base}/rankings?evidence=inDegree:${work.workId}${query}`}>{count(work.inDegree, 'citation')}</Link>
                </span>
              </li>
            ))}
          </ol>
        </div>
      </div>
    </article>
  );
}
