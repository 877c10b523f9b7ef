import Link from 'next/link';

import { ButtonLink } from '@/components/ui/button';
import { DateText } from '@/components/ui/date-text';
import { count } from '@/components/ui/numbers';
import { SectionHeading } from '@/components/ui/page-header';
import { type PortfolioDetail } from '@/lib/api/types';

interface Step {
  title: string;
  text: string;
  href: string;
  action: string;
}

/** What this person can do next here, most pressing first. Steps that their role or grant does not allow are not offered. */
export function stepsOf(portfolio: PortfolioDetail, mayImport: boolean, mayAnalyse: boolean): Step[] {
  const base = `/portfolios/${portfolio.id}`;
  const steps: Step[] = [];
  if (mayImport && portfolio.works === 0 && portfolio.imports.open === 0) {
    steps.push({ title: 'Import what you have', text: 'Reference exports in BibTeX, RIS and other formats. You see what a file would do before anything is catalogued.', href: `${base}/imports`, action: 'Import files' });
  }
  if (mayImport && portfolio.imports.open > 0) steps.push({ title: `${count(portfolio.imports.open, 'import')} under way`, text: 'Look at what they would do, then accept them or set them aside.', href: `${base}/imports`, action: 'Open imports' });
  if (portfolio.imports.failed > 0 && mayImport) steps.push({ title: `${count(portfolio.imports.failed, 'import')} could not be read`, text: 'The files are kept. Look at the reason, or have them read in another format.', href: `${base}/imports`, action: 'Open imports' });
  if (mayImport && portfolio.openMatches > 0) {
    steps.push({ title: `${count(portfolio.openMatches, 'match', 'matches')} to review`, text: 'Works that may be one and the same. They stand apart until somebody answers, one key an answer.', href: `${base}/imports/matches`, action: 'Review matches' });
  }
  const analysis = portfolio.latestAnalysis;
  if (portfolio.works > 0 && analysis === null && mayAnalyse) steps.push({ title: 'Run an analysis', text: 'Rankings, clusters and maps of these works and of what they cite. The defaults are good.', href: `${base}/analyses/new`, action: 'Analyse' });
  if (analysis?.state === 'failed' && mayAnalyse) steps.push({ title: 'The last analysis failed', text: analysis.error ?? 'No reason was given.', href: `${base}/analyses/${analysis.id}`, action: 'Open' });
  return steps;
}

export function NextSteps({ steps }: { steps: Step[] }) {
  if (steps.length === 0) return null;
  return (
    <section aria-labelledby="next-title">
      <SectionHeading id="next-title">What to do next</SectionHeading>
      <ul className="divide-y divide-thread border-b border-thread">
        {steps.map((step, index) => (
          <li key={step.title} className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 py-3">
            <div className="max-w-[38rem]">
              <p className="font-semibold">{step.title}</p>
              <p className="text-table text-ink-soft">{step.text}</p>
            </div>
            <ButtonLink href={step.href} kind={index === 0 ? 'primary' : 'secondary'}>{step.action}</ButtonLink>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** Where the latest analysis stands, with ways into it. */
export function LatestAnalysis({ portfolio }: { portfolio: PortfolioDetail }) {
  const analysis = portfolio.latestAnalysis;
  if (!analysis) return null;
  const base = `/portfolios/${portfolio.id}`;
  const { summary } = analysis;
  return (
    <section aria-labelledby="analysis-title" className="grid gap-3">
      <SectionHeading id="analysis-title">Latest analysis</SectionHeading>
      {analysis.state === 'finished' && summary ? (
        <>
          <p>
            <DateText at={analysis.finishedAt ?? analysis.createdAt} />: {count(summary.works, 'work')} ({count(summary.cataloguedWorks, 'catalogued one')}) and {count(summary.citations, 'citation')} between them
            {summary.bases.length > 0 && <>; {summary.bases.map((basis) => `${count(basis.clusters, 'cluster')} ${basisWords[basis.basis]}`).join(', ')}</>}.
          </p>
          <div className="flex flex-wrap gap-2">
            <ButtonLink href={`${base}/rankings`}>Rankings</ButtonLink>
            <ButtonLink href={`${base}/clusters`}>Clusters</ButtonLink>
            <ButtonLink href={`${base}/map`}>Map</ButtonLink>
            <ButtonLink href={`${base}/analyses/${analysis.id}`} kind="quiet">How it was made</ButtonLink>
          </div>
        </>
      ) : (
        <p>
          {analysis.state === 'queued' && 'Waits to be computed.'}
          {analysis.state === 'running' && 'Is being computed; it is safe to leave.'}
          {analysis.state === 'cancelled' && 'Was cancelled.'}
          {analysis.state === 'failed' && `Failed: ${analysis.error ?? 'no reason was given'}`} <Link href={`${base}/analyses/${analysis.id}`}>Look at it</Link>
        </p>
      )}
    </section>
  );
}

const basisWords = { cocitation: 'by co-citation', coupling: 'by shared references', citation: 'by citations' } as const;
