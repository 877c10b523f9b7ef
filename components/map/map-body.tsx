'use client';

import { useRouter } from 'next/navigation';
import { useMemo, useState, type ReactNode } from 'react';

import { SheetWithEvidence } from '@/components/frame/sheet-with-evidence';
import { usePageKeys, type KeyLine } from '@/components/frame/page-keys';
import { useShownScheme } from '@/components/frame/use-scheme';
import { MapCanvas } from '@/components/map/map-canvas';
import { MapExport } from '@/components/map/map-export';
import { MapLegend } from '@/components/map/map-legend';
import { type MapPageProps } from '@/components/map/map-page';
import { type MapRenderer } from '@/components/map/map-renderer';
import { MapSearch } from '@/components/map/map-search';
import { cameraText, describeWork, firstWork, parseCamera, walkTo, type Arrow } from '@/components/map/map-state';
import { MapTable } from '@/components/map/map-table';
import { MapTools } from '@/components/map/map-tools';
import { StaticFallback } from '@/components/map/static-fallback';
import { useMapState } from '@/components/map/use-map-state';
import { WorkPanel } from '@/components/map/work-panel';
import { YearBrush } from '@/components/map/year-brush';
import { fillYears } from '@/components/charts/year-bars';
import { parseEvidence, WorkEvidence } from '@/components/rankings/work-evidence';
import { Button } from '@/components/ui/button';
import { Sheet } from '@/components/ui/dialog';
import { count, formatNumber } from '@/components/ui/numbers';
import { Caution } from '@/components/ui/status';
import { type AnalysisMap } from '@/lib/api/types';

const keys: readonly KeyLine[] = [
  { keys: '← → ↑ ↓', does: 'Walk along the links from the selected work' },
  { keys: 'Shift+← → ↑ ↓', does: 'Move the map' },
  { keys: '+ −', does: 'Zoom in, zoom out' },
  { keys: '0', does: 'Show the whole map' },
  { keys: 'Enter', does: 'Open the selected work' },
  { keys: 'Escape', does: 'Select nothing' },
];

const noSpreads = {};

function worksByYear(map: AnalysisMap) {
  const years = new Map<number, number>();
  for (const year of map.years) if (year !== null) years.set(year, (years.get(year) ?? 0) + 1);
  return { years: fillYears([...years].map(([year, works]) => ({ year, count: works }))).map((one) => ({ year: one.year, works: one.count })), undated: map.years.filter((year) => year === null).length };
}

/** The map once it is there: legend, drawing or table, years, panel. */
export function MapBody({ map, head, portfolio, caution, provenance, mayExport }: MapPageProps & { map: AnalysisMap; head: ReactNode }) {
  const state = useMapState(map);
  const { shallow, filters, patches, neighbours, visible, counts, selected, view, shown } = state;
  const { search, set } = shallow;
  const scheme = useShownScheme();
  const router = useRouter();
  const [renderer, setRenderer] = useState<MapRenderer | null>(null);
  const [still, setStill] = useState(false);
  const [spoken, setSpoken] = useState('');
  const [sheet, setSheet] = useState(false);
  usePageKeys('Map', keys);
  const years = useMemo(() => worksByYear(map), [map]);
  const asTable = search.get('view') === 'table';
  const evidence = parseEvidence(search.get('evidence'));
  const shownNeighbours = selected >= 0 ? neighbours[selected].filter((near) => visible[near.work]) : [];

  const select = (work: number | null) => {
    set({ work: work === null ? null : map.ids[work], evidence: null });
    setSpoken(work === null ? 'Nothing selected.' : describeWork(map, work, neighbours[work].filter((near) => visible[near.work])));
    if (work !== null) renderer?.reveal(work);
  };
  const find = (work: number) => {
    select(work);
    renderer?.flyTo(work);
  };
  const walk = (arrow: Arrow) => {
    const next = selected < 0 ? firstWork(map, visible) : walkTo(map, selected, neighbours[selected], visible, arrow);
    if (next === null) setSpoken(selected < 0 ? 'No work is shown.' : 'No link leads that way.');
    else select(next);
  };
  const ready = (made: MapRenderer | null) => {
    setRenderer(made);
    const letter = search.get('cluster');
    const cluster = map.clusters.find((one) => one.letter === letter);
    if (made && cluster && !search.get('at')) requestAnimationFrame(() => made.flyToCluster(cluster.number));
  };
  const filterChanges = { yearFrom: search.get('yearFrom'), yearTo: search.get('yearTo'), off: search.get('off') };
  const side = (
    <div className="grid content-start gap-5">
      {head}
      <div className="max-lg:hidden"><MapSearch map={map} visible={visible} onFind={find} /></div>
      <MapLegend map={map} off={filters.off} onToggle={(off) => set({ off: [...off].join(',') })} onFind={(cluster) => renderer?.flyToCluster(cluster)} />
      <div className="grid gap-2 border-t border-thread pt-3">
        <p className="text-small text-ink-soft">
          {count(counts.works, 'work')} shown, {count(counts.links, 'link')} between them, the strongest of each work. {map.notDrawn > 0 && `${count(map.notDrawn, 'work')} without a link ${map.notDrawn === 1 ? 'is' : 'are'} not drawn.`}
        </p>
        <Caution>Nearness shows how works are used together here, not quality; the layout depends on basis and seed.</Caution>
      </div>
      <div className="flex flex-wrap gap-2">
        <Button aria-pressed={asTable} onClick={() => set({ view: asTable ? null : 'table' })}>{asTable ? 'Show as map' : 'Show as table'}</Button>
        {mayExport && <MapExport shown={shown} patches={patches} scheme={scheme} title={portfolio} caution={caution} provenance={provenance} filters={filterChanges} />}
      </div>
    </div>
  );
  const panel = evidence ? (
    <WorkEvidence key={`${evidence.measure}:${evidence.work}`} analysisId={map.analysisId} measure={evidence.measure} work={evidence.work} spreads={noSpreads} onClose={() => set({ evidence: null })} />
  ) : (
    selected >= 0 && <WorkPanel map={map} work={selected} neighbours={shownNeighbours} link={shallow.link} onSelect={select} onCentre={() => renderer?.flyTo(selected)} onClose={() => select(null)} />
  );

  return (
    <div className="lg:h-[calc(100dvh-6.4rem)] lg:overflow-hidden lg:[&>div]:h-full">
      <SheetWithEvidence bare evidence={panel || null} aside={<div className="p-5 max-lg:hidden lg:h-[calc(100dvh-6.4rem)] lg:overflow-y-auto">{side}</div>}>
        <div className="flex h-[76dvh] min-h-[26rem] flex-col lg:h-[calc(100dvh-6.4rem)]">
          <div className="flex items-center gap-2 border-b border-thread px-4 py-2 md:px-6 lg:hidden">
            <div className="min-w-0 flex-1"><MapSearch map={map} visible={visible} onFind={find} /></div>
            <Button onClick={() => setSheet(true)}>Clusters</Button>
          </div>
          <div className="relative min-h-0 flex-1">
            {asTable ? (
              <div className="absolute inset-0 overflow-y-auto"><MapTable map={map} visible={visible} selected={selected} links={neighbours} onSelect={select} /></div>
            ) : still ? (
              <StaticFallback map={shown} patches={patches} scheme={scheme} title={portfolio} caution={caution} provenance={provenance} />
            ) : (
              <MapCanvas
                map={map}
                patches={patches}
                view={view}
                scheme={scheme}
                camera={parseCamera(search.get('at'))}
                label={`Map of ${formatNumber(counts.works)} works in ${formatNumber(map.clusters.length)} clusters. Arrow keys walk along links, plus and minus zoom.`}
                describedBy="map-spoken"
                onReady={ready}
                onSelect={select}
                onWalk={walk}
                onOpen={() => selected >= 0 && router.push(`/works/${map.ids[selected]}`)}
                onCamera={(camera) => set({ at: cameraText(camera) === '0.5,0.5,1' ? null : cameraText(camera) }, 'replace')}
                onFailure={() => setStill(true)}
              />
            )}
            {!asTable && !still && <MapTools renderer={renderer} onTable={() => set({ view: 'table' })} />}
            <p id="map-spoken" role="status" aria-live="polite" className="sr-only">{spoken}</p>
          </div>
          <YearBrush years={years.years} undated={years.undated} from={filters.yearFrom} to={filters.yearTo} onChange={(from, to, done) => set({ yearFrom: from, yearTo: to }, done ? 'push' : 'replace')} />
        </div>
      </SheetWithEvidence>
      <Sheet open={sheet} onOpenChange={setSheet} title="Map of works">{side}</Sheet>
    </div>
  );
}
