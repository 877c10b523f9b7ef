import { type ReactNode } from 'react';

interface SimpleTableProps {
  /** Read by screen readers; the heading above says it to the others. */
  caption: string;
  head: ReactNode;
  children: ReactNode;
}

/** A short table that the server draws whole; wide ones scroll within their own frame, by keyboard too. */
export function SimpleTable({ caption, head, children }: SimpleTableProps) {
  return (
    <div className="relative overflow-x-auto" tabIndex={0} role="region" aria-label={`${caption}, table`}>
      <table className="w-full border-collapse text-[14.5px]">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr className="border-b border-thread-strong">{head}</tr>
        </thead>
        <tbody className="divide-y divide-thread">{children}</tbody>
      </table>
    </div>
  );
}

export function HeadCell({ children }: { children: ReactNode }) {
  return (
    <th scope="col" className="px-2 py-2 text-left text-[12.5px] font-semibold text-ink-soft first:pl-0">
      {children}
    </th>
  );
}

export function Cell({ children }: { children: ReactNode }) {
  return <td className="px-2 py-2 align-top first:pl-0">{children}</td>;
}
