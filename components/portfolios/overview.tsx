'use client';

import Link from 'next/link';

import { coverageFigures, explainFigure, type CoverageFigure, type FigureEvidence } from '@/components/portfolios/coverage-words';
import { periodWords } from '@/components/portfolios/level-words';
import { LatestAnalysis, NextSteps, stepsOf } from '@/components/portfolios/next-steps';
import { PageWithPanel } from '@/components/portfolios/page-with-panel';
import { PortfolioMenu } from '@/components/portfolios/portfolio-menu';
import { YearBars } from '@/components/portfolios/year-bars';
import { count } from '@/components/ui/numbers';
import { Caution, Notice } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { usePortfolio } from '@/lib/api/hooks';
import { type PortfolioDetail, type UnitView } from '@/lib/api/types';

interface OverviewProps {
  initial: PortfolioDetail;
  units: (UnitView & { depth: number })[];
  may: { edit: boolean; import: boolean; analyse: boolean };
}

function Evidence({ evidence, worksPath }: { evidence: FigureEvidence; worksPath: string }) {
  return (
    <div className="grid gap-5 text-[14px]">
      <p>{evidence.definition}</p>
      <div>
        <h3 className="border-b border-thread pb-1 font-sans text-[12.5px] font-semibold text-ink-soft">How it is counted</h3>
        <dl className="mt-2 grid gap-1.5">
          {evidence.counted.map(({ label, value }) => (
            <div key={label} className="flex justify-between gap-4"><dt>{label}</dt><dd className="font-semibold">{value}</dd></div>
          ))}
        </dl>
      </div>
      {evidence.caution && <Caution href="/methods#coverage">{evidence.caution}</Caution>}
      {evidence.worksQuery !== null && <Link href={`${worksPath}${evidence.worksQuery}`}>{evidence.worksLabel}</Link>}
    </div>
  );
}

const isFigure = (text: string | null): text is CoverageFigure => (coverageFigures as readonly (string | null)[]).includes(text);

/** What is in the portfolio, how well it is covered, and what to do next. */
export function Overview({ initial, units, may }: OverviewProps) {
  const { data: portfolio = initial, mutate } = usePortfolio(initial.id, { fallbackData: initial, refreshInterval: (data) => (data && data.imports.open > 0 ? 5000 : 0) });
  const { search, href, go } = useAddress();
  const chosen = search.get('figure');
  const figure = isFigure(chosen) ? chosen : null;
  const evidence = figure && explainFigure(figure, portfolio.coverage);
  const dated = portfolio.years.reduce((sum, one) => sum + one.works, 0);
  const facts = [portfolio.unit?.name, periodWords(portfolio.periodFrom, portfolio.periodTo), count(portfolio.imports.accepted, 'accepted import')].filter(Boolean);
  return (
    <PageWithPanel
      panel={evidence && { eyebrow: 'Evidence for', title: `${evidence.value} ${evidence.label}`, content: <Evidence evidence={evidence} worksPath={`/portfolios/${portfolio.id}/works`} /> }}
      onClose={() => go({ figure: null })}
    >
      <div className="grid max-w-[64rem] gap-8">
        <header className="grid gap-2">
          <div className="flex flex-wrap items-start justify-between gap-3">
            <h1 className="text-[31px] leading-[35px]">{portfolio.name}</h1>
            {may.edit && <PortfolioMenu portfolio={portfolio} units={units} onChanged={() => void mutate()} />}
          </div>
          <p className="text-ink-soft">{facts.join(' · ')}</p>
          {portfolio.description && <p className="max-w-[44rem] whitespace-pre-line">{portfolio.description}</p>}
          {portfolio.demonstration && (
            <div className="mt-1 max-w-[44rem]">
              <Notice tone="caution" title="Invented for demonstration">The university, its people and every work in here are made up by a generator; their DOIs use the reserved prefix 10.5555 and lead nowhere.</Notice>
            </div>
          )}
        </header>
        <section aria-labelledby="coverage-title" className="grid gap-3">
          <h2 id="coverage-title" className="border-b border-ink pb-2 text-[21px] leading-[25px]">What is in it</h2>
          <ul className="grid grid-cols-2 gap-x-6 gap-y-5 sm:grid-cols-3 lg:grid-cols-5">
            {coverageFigures.map((name) => {
              const { value, label, beside } = explainFigure(name, portfolio.coverage);
              return (
                <li key={name} className={figure === name ? 'border-l-[3px] border-weld pl-3' : ''}>
                  <Link href={href({ figure: name })} scroll={false} aria-current={figure === name ? 'true' : undefined} className="grid w-fit gap-0.5">
                    <span className="font-serif text-[28px] leading-[32px]">{value}</span>
                    <span className="text-[14px] leading-[18px]">{label}</span>
                  </Link>
                  {beside && <span className="text-[13px] text-ink-soft">{beside}</span>}
                </li>
              );
            })}
          </ul>
          <Caution>A citation network is only as good as its coverage. Every figure opens to how it is counted.</Caution>
        </section>
        <NextSteps steps={stepsOf(portfolio, may.import, may.analyse)} />
        <LatestAnalysis portfolio={portfolio} />
        <YearBars years={portfolio.years} undated={portfolio.works - dated} />
      </div>
    </PageWithPanel>
  );
}
