import { clsx } from 'clsx';

const dyes = 10;

/** 0 -> A, 25 -> Z, 26 -> AA. Clusters are numbered by size. */
export function clusterLetter(index: number): string {
  const rest = Math.floor(index / 26);
  return (rest > 0 ? clusterLetter(rest - 1) : '') + String.fromCharCode(65 + (index % 26));
}

/** The custom property of a cluster's dye; neutral from the eleventh cluster on and for works in no cluster (null). */
export function clusterDye(index: number | null): string {
  return index !== null && index >= 0 && index < dyes ? `var(--dye-${index + 1})` : 'var(--dye-none)';
}

interface ClusterSwatchProps {
  /** Counted from 0, as clusters are numbered; null for works in no cluster. */
  index: number | null;
  /** The letter stored with the cluster; made from the index unless given. */
  letter?: string;
  /** What the cluster is about, after its letter. */
  name?: string;
  /** Drawn hollow: the work's place in the cluster is uncertain. */
  uncertain?: boolean;
  className?: string;
}

/** A square of dyed cloth and the cluster's letter: colour never stands alone. */
export function ClusterSwatch({ index, letter, name, uncertain = false, className }: ClusterSwatchProps) {
  const dye = clusterDye(index);
  const words = index === null && letter === undefined ? 'none' : (letter ?? clusterLetter(index ?? 0));
  return (
    <span className={clsx('inline-flex items-baseline gap-2', className)}>
      <svg aria-hidden="true" viewBox="0 0 12 12" className="keep-colour size-[11px] shrink-0 translate-y-px">
        {uncertain ? <rect x="1" y="1" width="10" height="10" rx="1" fill="none" stroke={dye} strokeWidth="2" /> : <rect width="12" height="12" rx="1.5" fill={dye} />}
      </svg>
      <span>
        <span className={name ? 'font-semibold' : undefined}>{words}</span>
        {name && <span className="ml-2">{name}</span>}
        {uncertain && <span className="sr-only"> (uncertain)</span>}
      </span>
    </span>
  );
}
