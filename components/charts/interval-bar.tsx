import { formatNumber } from '@/components/ui/numbers';

interface IntervalBarProps {
  value: number;
  low: number;
  high: number;
  /** Ends of the track, the same for all bars of a column. */
  from?: number;
  to: number;
  /** Ranks of long lists need the logarithm, or all good ones fall on one another; from must then be over 0. */
  scale?: 'linear' | 'log';
  /** Said for the picture: "Rank 3, 95% interval 2 to 7". */
  label: string;
  /** Writes the ends; whole numbers unless given. */
  format?: (value: number) => string;
}

const width = 120;

/** Where a value lies on the track, 0..1, kept within it. */
export function placeOnTrack(value: number, from: number, to: number, scale: 'linear' | 'log'): number {
  const at = scale === 'log' ? Math.log : (one: number) => one;
  const span = at(to) - at(from);
  return span > 0 ? Math.min(1, Math.max(0, (at(value) - at(from)) / span)) : 0;
}

/** A value on its interval: band for the interval, stroke for the value, the ends in figures below. */
export function IntervalBar({ value, low, high, from = 1, to, scale = 'linear', label, format = formatNumber }: IntervalBarProps) {
  const place = (one: number) => placeOnTrack(one, from, to, scale) * width;
  const [left, right] = [place(low), place(high)];
  return (
    <span className="inline-grid gap-0.5">
      <svg role="img" aria-label={label} viewBox={`0 0 ${width} 12`} width={width} height={12} className="keep-colour block max-w-full">
        <rect y="2" width={width} height="8" rx="1" fill="var(--bar-ground)" />
        <rect x={Math.min(left, width - 3)} y="2" width={Math.max(3, right - left)} height="8" rx="1" fill="var(--bar)" />
        <rect x={Math.min(width - 2, Math.max(0, place(value) - 1))} width="2" height="12" fill="var(--ink)" />
      </svg>
      <span aria-hidden="true" className="text-small leading-4 text-ink-soft">{low === high ? format(low) : `${format(low)}–${format(high)}`}</span>
    </span>
  );
}
