'use client';

import { useRef, useState, type PointerEvent } from 'react';

import { formatNumber } from '@/components/ui/numbers';

interface YearBrushProps {
  /** Works by year, every year between the first and the last. */
  years: readonly { year: number; works: number }[];
  from: number | null;
  to: number | null;
  undated: number;
  onChange: (from: number | null, to: number | null, done: boolean) => void;
}

/** Years to show: dragged over the bars, or set by two sliders that a keyboard moves too. */
export function YearBrush({ years, from, to, undated, onChange }: YearBrushProps) {
  const strip = useRef<HTMLDivElement>(null);
  const [anchor, setAnchor] = useState<number | null>(null);
  if (years.length < 2) return null;
  const [first, last] = [years[0].year, years[years.length - 1].year];
  const [low, high] = [Math.max(first, from ?? first), Math.min(last, to ?? last)];
  const whole = low === first && high === last;
  const most = Math.max(...years.map((one) => one.works));
  const shown = years.reduce((sum, one) => sum + (one.year >= low && one.year <= high ? one.works : 0), 0);
  const choose = (a: number, b: number, done: boolean) => {
    const [start, end] = [Math.max(first, Math.min(a, b)), Math.min(last, Math.max(a, b))];
    onChange(start === first ? null : start, end === last ? null : end, done);
  };
  const yearAt = (event: PointerEvent) => {
    const box = strip.current?.getBoundingClientRect();
    const share = box ? (event.clientX - box.left) / box.width : 0;
    return Math.min(last, Math.max(first, first + Math.floor(share * years.length)));
  };
  const slider = (label: string, value: number, change: (year: number) => void) => (
    <input type="range" aria-label={label} aria-valuetext={String(value)} min={first} max={last} value={value} onChange={(event) => change(Number(event.target.value))} className="h-6 min-w-0 flex-1 accent-[var(--indigo)]" />
  );
  return (
    <div role="group" aria-label="Years shown" className="border-t border-thread bg-paper px-4 pt-2 pb-2 md:px-6">
      <div
        ref={strip}
        aria-hidden="true"
        className="keep-colour flex h-11 cursor-col-resize touch-none items-end gap-px"
        onPointerDown={(event) => {
          event.currentTarget.setPointerCapture(event.pointerId);
          setAnchor(yearAt(event));
        }}
        onPointerMove={(event) => anchor !== null && choose(anchor, yearAt(event), false)}
        onPointerUp={(event) => {
          if (anchor !== null) choose(anchor, yearAt(event), true);
          setAnchor(null);
        }}
        onPointerCancel={() => setAnchor(null)}
        onDoubleClick={() => onChange(null, null, true)}
      >
        {years.map((one) => (
          <span key={one.year} title={`${one.year}: ${formatNumber(one.works)} works`} className="flex h-full flex-1 items-end">
            <span className="block w-full" style={{ height: one.works === 0 ? 0 : `${Math.max(4, (one.works / most) * 100)}%`, background: one.year >= low && one.year <= high ? 'var(--bar-linen)' : 'var(--bar-ground)' }} />
          </span>
        ))}
      </div>
      <div className="mt-1 flex items-center gap-3 text-table">
        <span>{low}</span>
        {slider('First year', low, (year) => choose(Math.min(year, high), high, false))}
        <span className="text-center text-small whitespace-nowrap text-ink-soft max-sm:hidden">{whole ? 'Drag to choose years' : `${formatNumber(shown)} works${undated > 0 ? `; ${formatNumber(undated)} without a year hidden` : ''}`}</span>
        {slider('Last year', high, (year) => choose(low, Math.max(year, low), false))}
        <span>{high}</span>
        {!whole && <button type="button" className="min-h-6 text-small text-indigo underline underline-offset-[3px]" onClick={() => onChange(null, null, true)}>All years</button>}
      </div>
    </div>
  );
}
