'use client';

import { RunningAnalysis } from '@/components/analyses/running-analysis';
import { basisWords } from '@/components/analyses/analysis-words';
import { Fingerprints } from '@/components/analyses/fingerprints';
import { ButtonLink } from '@/components/ui/button';
import { DateText } from '@/components/ui/date-text';
import { FactList } from '@/components/ui/definition-list';
import { count, formatDecimal, formatNumber, formatShare } from '@/components/ui/numbers';
import { PageHeader, SectionHeading } from '@/components/ui/page-header';
import { Caution } from '@/components/ui/status';
import { Cell, ColumnHead, RowHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { type AnalysisView } from '@/lib/api/types';

interface AnalysisPageProps {
  analysis: AnalysisView;
  parameters: { label: string; value: string }[];
  mayRun: boolean;
}

function Figures({ analysis }: { analysis: AnalysisView }) {
  const { summary, coverage } = analysis;
  if (!summary || !coverage) return null;
  const share = (part: number, whole: number) => `${formatNumber(part)} of ${formatNumber(whole)} (${formatShare(whole > 0 ? part / whole : null)})`;
  return (
    <FactList
      items={[
        { label: 'Works', value: `${formatNumber(summary.works)}: ${count(summary.cataloguedWorks, 'catalogued work')}, ${count(summary.citedOnlyWorks, 'cited-only work')}` },
        { label: 'Citations', value: `${formatNumber(summary.citations)} between them; ${count(summary.backwardLinks, 'citation')} of later works` },
        { label: 'Coverage', value: `${share(coverage.worksWithReferences, coverage.cataloguedWorks)} catalogued works carry references; ${share(coverage.linkedReferences, coverage.references)} references lead to a catalogued work` },
        { label: 'Without a year', value: count(coverage.worksWithoutYear, 'catalogued work') },
        { label: 'Without references', value: `${count(summary.danglingWorks, 'work')} of the analysis cite nothing in it` },
        { label: 'Loops', value: summary.loops === 0 ? 'none' : `${count(summary.loops, 'loop')} of ${count(summary.loopWorks, 'work')} citing each other` },
        { label: 'Left out of pairs', value: `${count(summary.skippedForReferences, 'work')} with longer reference lists` },
        { label: 'PageRank', value: `settled after ${count(summary.pageRankIterations, 'round')}, residual ${summary.pageRankResidual.toExponential(1)}` },
        { label: 'Computed in', value: `${formatDecimal(summary.elapsedMs / 1000, 1)} seconds` },
      ]}
    />
  );
}

function Bases({ analysis }: { analysis: AnalysisView }) {
  if (!analysis.summary) return null;
  return (
    <Table caption="What each basis gave">
      <TableHead>
        <ColumnHead>Basis</ColumnHead>
        {['Works linked', 'Pairs', 'Clusters', 'Modularity', 'Agreement, mean', 'least'].map((head) => <ColumnHead key={head} numeric>{head}</ColumnHead>)}
      </TableHead>
      <TableBody>
        {analysis.summary.bases.map((basis) => (
          <tr key={basis.basis}>
            <RowHead>{basisWords[basis.basis]}</RowHead>
            {[formatNumber(basis.linkedWorks), formatNumber(basis.pairs), formatNumber(basis.clusters), formatDecimal(basis.modularity), formatDecimal(basis.agreementMean), formatDecimal(basis.agreementMinimum)].map((text, index) => <Cell key={index} numeric>{text}</Cell>)}
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}

/** How one analysis was made: state, figures, parameters, fingerprints. */
export function AnalysisPage({ analysis, parameters, mayRun }: AnalysisPageProps) {
  const base = `/portfolios/${analysis.portfolioId}`;
  const by = [analysis.createdBy && `asked for by ${analysis.createdBy}`].filter(Boolean).join('');
  return (
    <div className="grid max-w-[64rem] gap-8 px-4 pt-6 pb-12 md:px-7">
      <PageHeader
        title={<>Analysis of <DateText at={analysis.finishedAt ?? analysis.createdAt} /></>}
        subtitle={`No. ${analysis.id}${by ? `, ${by}` : ''}`}
        actions={
          <>
            {analysis.state === 'finished' && (
              <>
                <ButtonLink href={`${base}/rankings?analysis=${analysis.id}`}>Rankings</ButtonLink>
                <ButtonLink href={`${base}/clusters?analysis=${analysis.id}`}>Clusters</ButtonLink>
                <ButtonLink href={`${base}/map?analysis=${analysis.id}`}>Map</ButtonLink>
              </>
            )}
            <ButtonLink href={`${base}/analyses`}>All analyses</ButtonLink>
            {mayRun && <ButtonLink href={`${base}/analyses/new?like=${analysis.id}`}>New one like it</ButtonLink>}
          </>
        }
      >
        <Caution>An analysis never changes once it has finished; imports and edits since then are not in it.</Caution>
      </PageHeader>
      {analysis.state !== 'finished' && <RunningAnalysis key={analysis.id} initial={analysis} mayRun={mayRun} />}
      {analysis.state === 'finished' && (
        <>
          <section aria-labelledby="figures" className="grid gap-3"><SectionHeading id="figures">What went in and came out</SectionHeading><Figures analysis={analysis} /></section>
          <section aria-labelledby="bases" className="grid gap-3"><SectionHeading id="bases">Clusters by basis</SectionHeading><Bases analysis={analysis} /></section>
        </>
      )}
      <section aria-labelledby="parameters" className="grid gap-3"><SectionHeading id="parameters">Parameters</SectionHeading><FactList items={parameters} /></section>
      {analysis.state === 'finished' && <section aria-labelledby="fingerprints" className="grid gap-3"><SectionHeading id="fingerprints">Fingerprints</SectionHeading><Fingerprints analysis={analysis} mayRun={mayRun} /></section>}
    </div>
  );
}
