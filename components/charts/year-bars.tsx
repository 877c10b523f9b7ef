import { clsx } from 'clsx';
import { type ReactNode } from 'react';

import { TableTwin } from '@/components/charts/table-twin';
import { count as countWords, formatNumber } from '@/components/ui/numbers';

export interface YearCount {
  year: number;
  count: number;
}

interface YearBarsProps {
  values: readonly YearCount[];
  /** The question that the chart answers: "When did the citing works appear?" */
  title: ReactNode;
  /** What is counted: one and many. */
  unit?: readonly [one: string, many: string];
  /** Low and without a title line, within the evidence panel, whose section head says what it shows. */
  compact?: boolean;
  tone?: 'indigo' | 'linen';
}

/** Every year between the first and the last has its place, also the empty ones. */
export function fillYears(values: readonly YearCount[]): YearCount[] {
  if (values.length === 0) return [];
  const counts = new Map(values.map((one) => [one.year, one.count]));
  const years = values.map((one) => one.year);
  const [first, last] = [Math.min(...years), Math.max(...years)];
  return Array.from({ length: last - first + 1 }, (_, index) => ({ year: first + index, count: counts.get(first + index) ?? 0 }));
}

/** Counts by year as bars with the numbers as a table on request. */
export function YearBars({ values, title, unit = ['work', 'works'], compact = false, tone = 'indigo' }: YearBarsProps) {
  const years = fillYears(values);
  if (years.length === 0) return null;
  const highest = Math.max(...years.map((one) => one.count));
  const best = years.find((one) => one.count === highest) ?? years[0];
  const [first, last] = [years[0].year, years[years.length - 1].year];
  const words = `${countWords(years.reduce((sum, one) => sum + one.count, 0), unit[0], unit[1])} from ${first} to ${last}, most in ${best.year} (${formatNumber(best.count)})`;
  return (
    <figure className="grid gap-1.5">
      <figcaption className={compact ? 'sr-only' : 'text-table font-semibold'}>{title}</figcaption>
      <div className="relative">
        {!compact && <span aria-hidden="true" className="absolute -top-0.5 left-0 bg-linen pr-2 text-small text-ink-soft">{countWords(highest, unit[0], unit[1])} in {best.year}</span>}
        <svg role="img" aria-label={words} viewBox={`0 0 ${years.length * 10} 100`} preserveAspectRatio="none" className={clsx('keep-colour block w-full', compact ? 'h-12' : 'h-32 pt-5')}>
          {years.map((one, index) => {
            const height = highest === 0 ? 0 : (one.count / highest) * 100;
            return (
              <rect key={one.year} x={index * 10 + 0.9} width={8.2} y={100 - height} height={height} fill={tone === 'indigo' ? 'var(--bar)' : 'var(--bar-linen)'}>
                <title>{`${one.year}: ${countWords(one.count, unit[0], unit[1])}`}</title>
              </rect>
            );
          })}
        </svg>
      </div>
      <div aria-hidden="true" className="-mt-1.5 flex justify-between border-t border-thread-strong pt-1 text-table text-ink-soft">
        <span>{first}</span>
        {last > first && <span>{last}</span>}
      </div>
      <TableTwin caption={typeof title === 'string' ? title : words} heads={['Year', unit[1]]} rows={years.map((one) => [String(one.year), formatNumber(one.count)])} />
    </figure>
  );
}
