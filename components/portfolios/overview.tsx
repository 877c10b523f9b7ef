'use client';

import Link from 'next/link';

import { EvidencePanel } from '@/components/evidence/evidence-panel';
import { EvidenceCaution, EvidenceRows } from '@/components/evidence/evidence-parts';
import { SheetWithEvidence } from '@/components/frame/sheet-with-evidence';
import { coverageFigures, explainFigure, type CoverageFigure } from '@/components/portfolios/coverage-words';
import { periodWords } from '@/components/portfolios/level-words';
import { LatestAnalysis, NextSteps, stepsOf } from '@/components/portfolios/next-steps';
import { PortfolioMenu } from '@/components/portfolios/portfolio-menu';
import { YearBars } from '@/components/portfolios/year-bars';
import { count } from '@/components/ui/numbers';
import { PageHeader, SectionHeading } from '@/components/ui/page-header';
import { Caution, Notice } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { usePortfolio } from '@/lib/api/hooks';
import { type PortfolioDetail, type UnitView } from '@/lib/api/types';

interface OverviewProps {
  initial: PortfolioDetail;
  units: (UnitView & { depth: number })[];
  may: { edit: boolean; import: boolean; analyse: boolean };
}

function Evidence({ figure, portfolio }: { figure: CoverageFigure; portfolio: PortfolioDetail }) {
  const { value, label, definition, counted, caution, worksQuery, worksLabel } = explainFigure(figure, portfolio.coverage);
  return (
    <EvidencePanel panelKey={figure} title={`${value} ${label}`} subject={portfolio.name}>
      <p className="text-table">{definition}</p>
      <EvidenceRows rows={counted} />
      {caution && <EvidenceCaution href="/methods#coverage">{caution}</EvidenceCaution>}
      {worksQuery !== null && <Link prefetch={false} href={`/portfolios/${portfolio.id}/works${worksQuery}`} className="text-table">{worksLabel}</Link>}
    </EvidencePanel>
  );
}

const whileImportsAreOpen = (portfolio: PortfolioDetail | undefined) => (portfolio && portfolio.imports.open > 0 ? 5000 : 0);

const isFigure = (text: string | null): text is CoverageFigure => (coverageFigures as readonly (string | null)[]).includes(text);

/** What is in the portfolio, how well it is covered, and what to do next. */
export function Overview({ initial, units, may }: OverviewProps) {
  const { data: portfolio = initial, mutate } = usePortfolio(initial.id, { fallbackData: initial, refreshInterval: whileImportsAreOpen });
  const { search, href } = useAddress();
  const chosen = search.get('evidence');
  const figure = isFigure(chosen) ? chosen : null;
  const dated = portfolio.years.reduce((sum, one) => sum + one.works, 0);
  const facts = [portfolio.unit?.name, periodWords(portfolio.periodFrom, portfolio.periodTo), portfolio.imports.accepted > 0 ? count(portfolio.imports.accepted, 'accepted import') : 'nothing accepted yet'].filter(Boolean);
  return (
    <SheetWithEvidence evidence={figure && <Evidence figure={figure} portfolio={portfolio} />}>
      <div className="grid max-w-[66rem] gap-8">
        <PageHeader title={portfolio.name} subtitle={facts.join(' · ')} actions={may.edit && <PortfolioMenu portfolio={portfolio} units={units} onChanged={() => void mutate()} />}>
          {portfolio.description && <p className="max-w-[44rem] whitespace-pre-line">{portfolio.description}</p>}
          {portfolio.demonstration && (
            <div className="max-w-[44rem]">
              <Notice tone="caution" title="Invented for demonstration">The university, its people and every work in here are made up by a generator; their DOIs use the reserved prefix 10.5555 and lead nowhere.</Notice>
            </div>
          )}
        </PageHeader>
        <section aria-labelledby="coverage-title" className="grid gap-4">
          <SectionHeading id="coverage-title">What is in it</SectionHeading>
          <ul className="grid grid-cols-2 gap-x-6 gap-y-5 sm:grid-cols-3 xl:grid-cols-5">
            {coverageFigures.map((name) => {
              const { value, label, beside } = explainFigure(name, portfolio.coverage);
              return (
                <li key={name} className={figure === name ? '-ml-3 border-l-[3px] border-weld pl-[9px]' : ''}>
                  <Link prefetch={false} href={href({ evidence: name })} scroll={false} aria-current={figure === name ? 'true' : undefined} className="grid w-fit gap-0.5">
                    <span className="font-serif text-[1.75rem] leading-[2rem]">{value}</span>
                    <span className="text-table">{label}</span>
                  </Link>
                  {beside && <span className="text-small text-ink-soft">{beside}</span>}
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
    </SheetWithEvidence>
  );
}
