import { clsx } from 'clsx';

import { TableTwin } from '@/components/charts/table-twin';
import { formatNumber } from '@/components/ui/numbers';

export interface DistributionBin {
  from: number;
  /** Not included, except in the last bin. */
  to: number;
  count: number;
}

interface DistributionStripProps {
  bins: readonly DistributionBin[];
  /** The question: "How are citations spread over the works?" */
  title: string;
  /** Unit of the axis: "citations here". */
  axis: string;
  /** What is counted in a bin. */
  unit?: string;
  /** A value to mark, with its words: "this work, 164". */
  mark?: { value: number; label: string };
  format?: (value: number) => string;
}

/** How a measure is spread, as a low strip with one value marked. Bins have equal width on screen, whatever they span. */
export function DistributionStrip({ bins, title, axis, unit = 'works', mark, format = formatNumber }: DistributionStripProps) {
  if (bins.length === 0) return null;
  const highest = Math.max(...bins.map((bin) => bin.count));
  const [first, last] = [bins[0], bins[bins.length - 1]];
  const marked = mark ? bins.findIndex((bin, index) => mark.value >= bin.from && (mark.value < bin.to || (index === bins.length - 1 && mark.value <= bin.to))) : -1;
  const within = mark && marked >= 0 ? marked + (bins[marked].to > bins[marked].from ? (mark.value - bins[marked].from) / (bins[marked].to - bins[marked].from) : 0.5) : null;
  const place = within === null ? null : (within / bins.length) * 100;
  const range = (bin: DistributionBin) => (bin.from === bin.to ? format(bin.from) : `${format(bin.from)} to ${format(bin.to)}`);
  return (
    <figure className="grid gap-1.5">
      <figcaption className="text-table font-semibold">{title}</figcaption>
      <div className={clsx('relative', place !== null && 'pt-5')}>
        {mark && place !== null && (
          <>
            <span className={clsx('absolute top-0 text-small whitespace-nowrap', place > 50 ? '-translate-x-full pr-1.5' : 'pl-1.5')} style={{ left: `${place}%` }}>{mark.label}</span>
            <span aria-hidden="true" className="absolute top-1 bottom-0 w-0.5 -translate-x-1/2 bg-ink" style={{ left: `${place}%` }} />
          </>
        )}
        <svg role="img" aria-label={`${title} ${formatNumber(bins.reduce((sum, bin) => sum + bin.count, 0))} ${unit}, from ${format(first.from)} to ${format(last.to)} ${axis}.`} viewBox={`0 0 ${bins.length * 10} 100`} preserveAspectRatio="none" className="keep-colour block h-14 w-full">
          {bins.map((bin, index) => {
            const height = highest === 0 ? 0 : (bin.count / highest) * 100;
            return (
              <rect key={bin.from} x={index * 10 + 0.4} width={9.2} y={100 - height} height={height} fill="var(--bar-linen)">
                <title>{`${range(bin)} ${axis}: ${formatNumber(bin.count)} ${unit}`}</title>
              </rect>
            );
          })}
        </svg>
      </div>
      <div aria-hidden="true" className="-mt-1.5 flex justify-between gap-4 border-t border-thread-strong pt-1 text-small text-ink-soft">
        <span>{format(first.from)}</span>
        <span>{axis}</span>
        <span>{format(last.to)}</span>
      </div>
      <TableTwin caption={title} heads={[axis, unit]} rows={bins.map((bin) => [range(bin), formatNumber(bin.count)])} />
    </figure>
  );
}
