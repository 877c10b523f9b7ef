import { formatShare } from '@/components/ui/numbers';

/** A ruled line as long as a cluster is firm: the share of repeats in which its works stayed together. */
export function FirmnessRuler({ firmness, className = 'w-full' }: { firmness: number | null; className?: string }) {
  const words = firmness === null ? 'Firmness unknown' : `Firmness: together in ${formatShare(firmness)} of repeats`;
  return (
    <svg role="img" aria-label={words} viewBox="0 0 100 8" preserveAspectRatio="none" className={`keep-colour block h-2 ${className}`}>
      <title>{words}</title>
      <line x1="0" y1="7.5" x2="100" y2="7.5" stroke="var(--thread)" strokeWidth="1" vectorEffect="non-scaling-stroke" />
      {firmness !== null && <line x1="0" y1="3.5" x2={100 * firmness} y2="3.5" stroke="var(--ink-soft)" strokeWidth="6" strokeDasharray="2 2.4" vectorEffect="non-scaling-stroke" />}
    </svg>
  );
}
