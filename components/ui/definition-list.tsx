import { type ReactNode } from 'react';

export interface Definition {
  label: ReactNode;
  /** The figure; a link where it can be explained further. */
  value: ReactNode;
  /** Tells rows apart when the label is not text. */
  key?: string;
}

/** Label left, figure right, as in the evidence panel. */
export function DefinitionList({ items }: { items: readonly Definition[] }) {
  return (
    <dl className="grid gap-2 text-table">
      {items.map(({ label, value, key }, index) => (
        <div key={key ?? (typeof label === 'string' ? label : index)} className="flex flex-wrap items-baseline justify-between gap-x-4">
          <dt>{label}</dt>
          <dd className="ml-auto text-right font-semibold">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

/** Facts of a thing in two columns: term at the left, words beside it. */
export function FactList({ items }: { items: readonly Definition[] }) {
  return (
    <dl className="divide-y divide-thread border-y border-thread text-table">
      {items.map(({ label, value, key }, index) => (
        <div key={key ?? (typeof label === 'string' ? label : index)} className="grid gap-x-6 py-2 sm:grid-cols-[9rem_minmax(0,1fr)]">
          <dt className="text-small font-semibold text-ink-soft sm:pt-px">{label}</dt>
          <dd className="min-w-0 [overflow-wrap:anywhere]">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
