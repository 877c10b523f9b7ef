'use client';

import { useEffect, useState } from 'react';

import { AnalysisChooser } from '@/components/analyses/analysis-head';
import { basisMeaning, basisWords } from '@/components/analyses/analysis-words';
import { RunningAnalysis } from '@/components/analyses/running-analysis';
import { useMap } from '@/components/analyses/use-analyses';
import { MapBody } from '@/components/map/map-body';
import { Button, ButtonLink } from '@/components/ui/button';
import { DateText } from '@/components/ui/date-text';
import { SelectField } from '@/components/ui/field';
import { EmptyState, Notice, Skeleton } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { type AnalysisView } from '@/lib/api/types';
import { bases, type Basis } from '@/lib/network/types';

export interface MapPageProps {
  chosen: AnalysisView;
  finished: AnalysisView[];
  latest: AnalysisView | null;
  basis: Basis;
  portfolio: string;
  caution: string;
  provenance: string;
  mayRun: boolean;
  mayExport: boolean;
}

/** What stands above the legend: which map this is. */
function MapHead({ chosen, finished, latest, basis, mayRun }: MapPageProps) {
  const { go } = useAddress();
  return (
    <div className="grid gap-3">
      <div>
        {/* The page has its h1 in any width; this head moves into a sheet where it is narrow. */}
        <p aria-hidden="true" className="font-serif text-panel font-medium max-lg:hidden">Map of works</p>
        <p className="text-small text-ink-soft">Analysis of <DateText at={chosen.finishedAt ?? chosen.createdAt} /></p>
      </div>
      <AnalysisChooser chosen={chosen} finished={finished} />
      <SelectField label="What links two works" hint={basisMeaning[basis]} value={basis} onChange={(event) => go({ basis: event.target.value === 'cocitation' ? null : event.target.value, off: null, at: null, cluster: null })}>
        {bases.map((one) => <option key={one} value={one}>{basisWords[one]}</option>)}
      </SelectField>
      {latest && <RunningAnalysis initial={latest} mayRun={mayRun} />}
    </div>
  );
}

/** The map of an analysis: drawn, walked, searched, filtered; as a table too. */
export function MapPage(props: MapPageProps) {
  const { chosen, basis, mayRun } = props;
  const { data: map, error, isLoading, mutate } = useMap(chosen.id, basis);
  const head = <MapHead {...props} />;
  const title = <h1 className="sr-only">Map of works</h1>;
  // Slow maps say so; quick ones do not flicker.
  const [slow, setSlow] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setSlow(true), 400);
    return () => clearTimeout(timer);
  }, []);
  if (error) {
    return (
      <div className="grid max-w-[40rem] gap-4 px-4 py-6 md:px-7">
        {title}
        {head}
        <Notice tone="problem" title="The map could not be read" actions={<Button onClick={() => void mutate()}>Try again</Button>}>{error.message}</Notice>
      </div>
    );
  }
  if (!map || isLoading) {
    return (
      <div aria-busy="true" className="lg:flex lg:h-[calc(100dvh-6.4rem)]">
        {title}
        <div className="grid content-start gap-4 border-thread p-5 lg:w-[18rem] lg:shrink-0 lg:border-r">
          {head}
          {Array.from({ length: 6 }, (_, row) => <Skeleton key={row} className="h-5" />)}
        </div>
        <div className="grid min-h-[60dvh] flex-1 place-items-center bg-paper">{slow && <p role="status" className="text-ink-soft">Reading the map</p>}</div>
      </div>
    );
  }
  if (map.ids.length === 0) {
    return (
      <div className="grid max-w-[40rem] gap-4 px-4 py-6 md:px-7">
        {title}
        {head}
        <EmptyState title="Nothing to draw on this basis" action={mayRun && <ButtonLink href={`/portfolios/${chosen.portfolioId}/analyses/new?like=${chosen.id}`}>New analysis</ButtonLink>}>
          No two works are linked in this way. Another basis may show more, or an analysis with fewer citations asked of cited-only works.
        </EmptyState>
      </div>
    );
  }
  return (
    <>
      {title}
      <MapBody key={`${chosen.id} ${basis}`} {...props} map={map} head={head} />
    </>
  );
}
