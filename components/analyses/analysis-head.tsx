'use client';

import { type ReactNode } from 'react';

import { analysisFacts } from '@/components/analyses/analysis-words';
import { ButtonLink } from '@/components/ui/button';
import { DateText, formatDate } from '@/components/ui/date-text';
import { SelectField } from '@/components/ui/field';
import { count } from '@/components/ui/numbers';
import { PageHeader } from '@/components/ui/page-header';
import { useAddress } from '@/components/ui/use-address';
import { useViewerZone } from '@/components/ui/use-viewer-zone';
import { type AnalysisView } from '@/lib/api/types';

interface ChooserProps {
  chosen: AnalysisView;
  finished: AnalysisView[];
  className?: string;
}

/** Which of the portfolio's finished analyses the page shows. */
export function AnalysisChooser({ chosen, finished, className }: ChooserProps) {
  const { go } = useAddress();
  const zone = useViewerZone();
  if (finished.length < 2) return null;
  return (
    <SelectField label="Analysis" labelHidden className={className} value={chosen.id} onChange={(event) => go({ analysis: event.target.value === finished[0].id ? null : event.target.value, page: null, evidence: null, cluster: null, work: null, off: null })}>
      {finished.map((one) => (
        <option key={one.id} value={one.id}>
          {`${formatDate(one.finishedAt ?? one.createdAt, zone, true)}: ${count(one.summary?.works ?? 0, 'work')}, no. ${one.id}`}
        </option>
      ))}
    </SelectField>
  );
}

interface AnalysisHeadProps extends ChooserProps {
  title: string;
  mayRun: boolean;
  /** Cautions below the facts. */
  children?: ReactNode;
}

/** Head of a page that shows an analysis: title, which analysis and its coverage, the way to others and to a new one. */
export function AnalysisHead({ title, chosen, finished, mayRun, children }: AnalysisHeadProps) {
  const base = `/portfolios/${chosen.portfolioId}/analyses`;
  return (
    <PageHeader
      title={title}
      subtitle={<>Analysis of <DateText at={chosen.finishedAt ?? chosen.createdAt} /> · {analysisFacts(chosen)} · <a href={`${base}/${chosen.id}`}>How it was made</a></>}
      actions={
        <>
          <AnalysisChooser chosen={chosen} finished={finished} className="w-72 max-w-full" />
          {mayRun && <ButtonLink href={`${base}/new`}>New analysis</ButtonLink>}
        </>
      }
    >
      {children}
    </PageHeader>
  );
}
