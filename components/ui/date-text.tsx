'use client';

import { useSyncExternalStore } from 'react';

import { useViewerZone } from '@/components/ui/use-viewer-zone';

/** "14 May 2026" or "14 May 2026, 09:30", in the given zone. */
export function formatDate(at: string | Date, zone: string, withTime = false): string {
  const format = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', ...(withTime ? { hour: '2-digit', minute: '2-digit' } : {}), timeZone: zone });
  return format.format(new Date(at)).replace(' at ', ', ');
}

const minute = 60_000;
const steps = [
  { below: 60, unit: 'minute', size: 1 },
  { below: 24 * 60, unit: 'hour', size: 60 },
  { below: 7 * 24 * 60, unit: 'day', size: 24 * 60 },
] as const;

/** "just now", "12 minutes ago", "2 days ago"; null from a week on, where the date says more. */
export function formatAgo(at: string | Date, now: number): string | null {
  const minutes = Math.floor((now - new Date(at).getTime()) / minute);
  if (minutes < 1) return 'just now';
  const step = steps.find((one) => minutes < one.below);
  if (!step) return null;
  const amount = Math.floor(minutes / step.size);
  return `${amount} ${step.unit}${amount === 1 ? '' : 's'} ago`;
}

/** A moment in the viewer's zone; `at` is ISO 8601. */
export function DateText({ at, withTime = false }: { at: string; withTime?: boolean }) {
  const zone = useViewerZone();
  return (
    <time dateTime={at} className="whitespace-nowrap">
      {formatDate(at, zone, withTime)}
    </time>
  );
}

const halfMinute = minute / 2;
function subscribeClock(onChange: () => void): () => void {
  const timer = setInterval(onChange, halfMinute);
  return () => clearInterval(timer);
}
/** A snapshot must stay the same between two changes, so the clock is read in half minutes. */
const readClock = () => Math.floor(Date.now() / halfMinute);

/** How long ago; the full moment is its title. The server writes the date, since its clock is not the viewer's. */
export function RelativeTime({ at }: { at: string }) {
  const zone = useViewerZone();
  const half = useSyncExternalStore<number | null>(subscribeClock, readClock, () => null);
  const ago = half === null ? null : formatAgo(at, (half + 1) * halfMinute);
  return (
    <time dateTime={at} title={formatDate(at, zone, true)} className="whitespace-nowrap">
      {ago ?? formatDate(at, zone)}
    </time>
  );
}
