'use client';

import Link from 'next/link';
import { useState } from 'react';

import { useEvidence } from '@/components/analyses/use-analyses';
import { workName } from '@/components/analyses/work-name';
import { DistributionStrip } from '@/components/charts/distribution-strip';
import { YearBars } from '@/components/charts/year-bars';
import { EvidencePanel } from '@/components/evidence/evidence-panel';
import { EvidenceMethod, EvidenceRows, EvidenceSection, FileLines } from '@/components/evidence/evidence-parts';
import { DefinitionList } from '@/components/ui/definition-list';
import { count, formatDecimal, formatNumber } from '@/components/ui/numbers';
import { Caution, Pill } from '@/components/ui/status';
import { type EvidenceView } from '@/lib/api/types';
import { type SpreadBin } from '@/lib/analyses/reading/spread';

export const evidenceMeasures = ['inDegree', 'outDegree', 'pageRank', 'agePercentile', 'citationsPerYear'] as const;
export type EvidenceMeasure = (typeof evidenceMeasures)[number];

/** "inDegree:12" as it stands in the address; null for anything else. */
export function parseEvidence(text: string | null): { measure: EvidenceMeasure; work: string } | null {
  const [, measure, work] = /^(\w+):([1-9]\d{0,15})$/.exec(text ?? '') ?? [];
  return work !== undefined && (evidenceMeasures as readonly string[]).includes(measure) ? { measure: measure as EvidenceMeasure, work } : null;
}

const anchors: Record<EvidenceMeasure, string> = { inDegree: 'citations-here', outDegree: 'citations-here', pageRank: 'pagerank', agePercentile: 'age-percentile', citationsPerYear: 'citations-per-year' };

function titleOf({ measure, value, rank }: EvidenceView): string {
  const ranked = rank ? `, rank ${formatNumber(rank.rank)}${rank.low === rank.high ? '' : ` (${formatNumber(rank.low)}–${formatNumber(rank.high)})`}` : '';
  switch (measure) {
    case 'inDegree':
      return `${count(value ?? 0, 'citation')} here`;
    case 'outDegree':
      return `${count(value ?? 0, 'work')} cited here`;
    case 'pageRank':
      return `PageRank ${formatDecimal(value)}${ranked}`;
    case 'agePercentile':
      return value === null ? 'No percentile' : `Percentile ${formatDecimal(value, 1)} of its year`;
    case 'citationsPerYear':
      return value === null ? 'No figure per year' : `${formatDecimal(value)} citations per year`;
  }
}

const pageSizes = [5, 50, 200];

function Places({ evidence, shown, onMore }: { evidence: EvidenceView; shown: number; onMore: () => void }) {
  const left = evidence.placesTotal - evidence.places.length;
  return (
    <EvidenceSection title="Where the references were read">
      {evidence.places.length > 0 ? (
        <FileLines lines={evidence.places.map((place) => ({ file: place.fileName, line: place.line, text: place.raw, href: `/portfolios/${place.portfolioId}/imports/${place.importId}` }))} />
      ) : (
        <p className="text-table text-ink-soft">{evidence.placesHidden > 0 ? 'In no file that you were given.' : 'No references: nothing was counted.'}</p>
      )}
      {left > 0 && (shown < 200 ? <button type="button" className="min-h-6 justify-self-start text-small text-indigo underline decoration-1 underline-offset-[3px]" onClick={onMore}>{count(left, 'more', 'more')}</button> : <p className="text-small text-ink-soft">and {formatNumber(left)} more</p>)}
      {evidence.placesHidden > 0 && <p className="text-small text-ink-soft">{count(evidence.placesHidden, 'further reference')} in files of portfolios that you were not given.</p>}
    </EvidenceSection>
  );
}

interface WorkEvidenceProps {
  analysisId: string;
  measure: EvidenceMeasure;
  work: string;
  spreads: Partial<Record<EvidenceMeasure, SpreadBin[]>>;
  onClose: () => void;
}

/** Why a figure of a work is what it is: counted how, from which references, read where, by which method, with which cautions. */
export function WorkEvidence({ analysisId, measure, work, spreads, onClose }: WorkEvidenceProps) {
  const [size, setSize] = useState(0);
  const { data: evidence, error, isLoading, mutate } = useEvidence(analysisId, { measure, work, pageSize: pageSizes[size] });
  const spread = spreads[measure] ?? [];
  const value = evidence?.value ?? null;
  return (
    <EvidencePanel
      panelKey={`${measure}:${work}`}
      title={evidence ? titleOf(evidence) : 'Evidence'}
      subject={evidence && <Link href={`/works/${evidence.work.id}`}>{workName(evidence.work)}</Link>}
      facts={evidence && <>{evidence.work.title !== null && [evidence.work.authors, evidence.work.year].filter((part) => part !== null).join(' · ')} {evidence.work.retracted && <Pill tone="problem">Retracted</Pill>}</>}
      loading={isLoading && !evidence}
      problem={error?.message ?? null}
      onRetry={() => void mutate()}
      onClose={onClose}
    >
      {evidence && (
        <>
          <EvidenceRows rows={evidence.counted} />
          <Places evidence={evidence} shown={pageSizes[size]} onMore={() => setSize(Math.min(pageSizes.length - 1, size + 1))} />
          {evidence.citingByYear.length > 0 && (
            <EvidenceSection title="Citing works by year">
              <YearBars compact title="Citing works by year" unit={['citing work', 'citing works']} values={evidence.citingByYear.map(({ year, works }) => ({ year, count: works }))} />
            </EvidenceSection>
          )}
          {spread.length > 1 && value !== null && (
            <DistributionStrip
              bins={spread}
              title="Where it stands among all works"
              axis={measure === 'inDegree' ? 'citations here, bins doubling' : 'PageRank, bins doubling'}
              mark={{ value, label: 'this work' }}
              format={(one) => (measure === 'inDegree' ? formatNumber(one) : one.toLocaleString('en-GB', { maximumFractionDigits: 3 }))}
            />
          )}
          <EvidenceMethod href={`/methods#${anchors[measure]}`}>{evidence.method.definition}</EvidenceMethod>
          <DefinitionList items={evidence.method.parameters} />
          <div className="grid gap-2">{evidence.cautions.map((caution) => <Caution key={caution} href={null}>{caution}</Caution>)}</div>
        </>
      )}
    </EvidencePanel>
  );
}
