import { clsx } from 'clsx';

import { formatNumber } from '@/components/ui/numbers';

interface ProgressProps {
  label: string;
  done: number;
  total: number;
  /** Words beside the bar: stage, count, time left. */
  detail?: string;
  /** Nothing moves: the work is over or waits. */
  still?: boolean;
  className?: string;
}

/** A woven bar. With `total` 0 the share is unknown and only the weave moves. */
export function Progress({ label, done, total, detail, still, className }: ProgressProps) {
  const share = total > 0 ? Math.min(1, done / total) : null;
  return (
    <div className={clsx('grid gap-1', className)}>
      <div role="progressbar" aria-label={label} aria-valuemin={0} aria-valuemax={100} {...(share === null ? {} : { 'aria-valuenow': Math.round(share * 100) })} aria-valuetext={detail} className="h-2.5 overflow-hidden rounded-sm bg-[var(--bar-ground)]">
        <div className={clsx('keep-colour h-full transition-[width]', share === null ? 'bg-[var(--bar)]' : 'bg-indigo', still ? 'weave-still' : 'weave')} style={{ width: `${share === null ? 100 : Math.max(1, share * 100)}%` }} />
      </div>
      {detail && <p className="text-small text-ink-soft">{detail}</p>}
    </div>
  );
}

/** "about 2 minutes left" from the time gone by; null while too little is known. */
export function timeLeft(startedAt: string | null, done: number, total: number, now: number): string | null {
  if (!startedAt || total <= 0 || done <= 0 || done >= total) return null;
  const elapsed = (now - new Date(startedAt).getTime()) / 1000;
  if (elapsed < 2) return null;
  const seconds = Math.round((elapsed / done) * (total - done));
  if (seconds < 5) return 'a few seconds left';
  if (seconds < 90) return `about ${formatNumber(Math.ceil(seconds / 5) * 5)} seconds left`;
  return `about ${formatNumber(Math.ceil(seconds / 60))} minutes left`;
}
