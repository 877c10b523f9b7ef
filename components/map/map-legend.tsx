'use client';

import { basisWords } from '@/components/analyses/analysis-words';
import { FirmnessRuler } from '@/components/clusters/firmness-ruler';
import { labelOfCluster } from '@/components/map/label-layer';
import { clusterDye } from '@/components/ui/cluster-swatch';
import { Button } from '@/components/ui/button';
import { formatNumber } from '@/components/ui/numbers';
import { type AnalysisMap } from '@/lib/api/types';

interface MapLegendProps {
  map: AnalysisMap;
  off: ReadonlySet<string>;
  onToggle: (off: ReadonlySet<string>) => void;
  onFind: (cluster: number) => void;
}

const mostShown = 40;

function Row({ letter, number, label, size, firmness, shown, onChange, onFind }: { letter: string; number: number; label: string; size: number; firmness: number | null; shown: boolean; onChange: (shown: boolean) => void; onFind?: () => void }) {
  const dye = clusterDye(number);
  return (
    <li className="grid gap-0.5 py-1">
      <div className="flex items-start gap-2.5">
        <label className="flex min-w-0 flex-1 cursor-pointer items-start gap-2.5">
          <input type="checkbox" checked={shown} onChange={(event) => onChange(event.target.checked)} className="keep-colour mt-[3px] grid size-[15px] shrink-0 appearance-none place-content-center rounded-[2px] border-2 before:size-[5px] before:bg-paper checked:before:hidden" style={{ borderColor: dye, backgroundColor: shown ? dye : 'transparent' }} />
          <span className={shown ? '' : 'text-ink-soft line-through decoration-1'}>{label}</span>
        </label>
        {onFind ? (
          <button type="button" onClick={onFind} aria-label={`Show cluster ${letter} on the map`} title="Show on the map" className="-my-0.5 min-h-6 rounded-sm px-1 text-indigo hover:underline">{formatNumber(size)}</button>
        ) : (
          <span className="px-1">{formatNumber(size)}</span>
        )}
      </div>
      {firmness !== null && <FirmnessRuler firmness={firmness} />}
    </li>
  );
}

/** Clusters with their firmness; each can be hidden, or found on the map. */
export function MapLegend({ map, off, onToggle, onFind }: MapLegendProps) {
  const toggle = (letter: string, shown: boolean) => {
    const next = new Set(off);
    if (shown) next.delete(letter);
    else next.add(letter);
    onToggle(next);
  };
  const outside = map.cluster.reduce((sum, cluster) => sum + (cluster < 0 ? 1 : 0), 0);
  const clusters = map.clusters.slice(0, mostShown);
  return (
    <section aria-labelledby="legend-title" className="grid gap-2">
      <div className="flex items-baseline justify-between gap-3">
        <h2 id="legend-title" className="font-sans text-table font-semibold">Clusters: {basisWords[map.basis].toLowerCase()}</h2>
        {off.size > 0 && <Button kind="quiet" className="min-h-6! px-1! py-0! text-small text-indigo" onClick={() => onToggle(new Set())}>Show all</Button>}
      </div>
      <ul className="text-table">
        {clusters.map((cluster) => (
          <Row key={cluster.letter} letter={cluster.letter} number={cluster.number} label={labelOfCluster(cluster, 70)} size={cluster.size} firmness={cluster.firmness} shown={!off.has(cluster.letter)} onChange={(shown) => toggle(cluster.letter, shown)} onFind={() => onFind(cluster.number)} />
        ))}
        {outside > 0 && <Row letter="-" number={-1} label="In no cluster" size={outside} firmness={null} shown={!off.has('-')} onChange={(shown) => toggle('-', shown)} />}
      </ul>
      {map.clusters.length > mostShown && <p className="text-small text-ink-soft">and {formatNumber(map.clusters.length - mostShown)} smaller clusters, undyed</p>}
      <p className="text-small text-ink-soft">The ruled line under each shows how firm it is: the share of repeats in which its works stayed together. Hollow knots stand between clusters; crossed ones are retracted. A knot’s area shows its citations here.</p>
    </section>
  );
}
