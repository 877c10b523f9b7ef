import { clsx } from 'clsx';
import { type ComponentProps, type ReactNode } from 'react';

/** Pieces of a short table that the server draws whole. Long lists take components/tables/data-table. */
export function Table({ caption, children, className }: { caption: string; children: ReactNode; className?: string }) {
  return (
    // Position: sr-only captions must not widen the page from within a scroller.
    <div role="region" aria-label={`${caption}, table`} tabIndex={0} className="relative overflow-x-auto">
      <table className={clsx('w-full border-collapse text-table', className)}>
        <caption className="sr-only">{caption}</caption>
        {children}
      </table>
    </div>
  );
}

interface CellShape {
  /** Figures stand at the right. */
  numeric?: boolean;
}

export function TableHead({ children }: { children: ReactNode }) {
  return (
    <thead>
      <tr className="border-b border-ink">{children}</tr>
    </thead>
  );
}

export function ColumnHead({ numeric, className, ...props }: CellShape & ComponentProps<'th'>) {
  return <th scope="col" className={clsx('px-2 py-2 align-bottom text-head font-semibold text-ink-soft first:pl-0 last:pr-0', numeric ? 'text-right' : 'text-left', className)} {...props} />;
}

export function TableBody({ children }: { children: ReactNode }) {
  return <tbody className="divide-y divide-thread border-b border-thread">{children}</tbody>;
}

export function Cell({ numeric, className, ...props }: CellShape & ComponentProps<'td'>) {
  return <td className={clsx('px-2 py-2.5 align-top first:pl-0 last:pr-0', numeric && 'text-right whitespace-nowrap', className)} {...props} />;
}

/** The cell that names its row. */
export function RowHead({ className, ...props }: ComponentProps<'th'>) {
  return <th scope="row" className={clsx('px-2 py-2.5 text-left align-top font-normal first:pl-0', className)} {...props} />;
}
