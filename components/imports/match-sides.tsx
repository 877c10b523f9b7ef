import Link from 'next/link';
import { type ReactNode } from 'react';

import { MarkedText } from '@/components/imports/marked-text';
import { formatNumber } from '@/components/ui/numbers';
import { type MatchSide, type MatchView } from '@/lib/api/types';

const text = (value: string | number | null) => (value === null ? null : String(value));
const where = (side: MatchSide) => [side.venue, side.volume, side.pages].filter(Boolean).join(', ') || null;

/** File and line of a side; a file of a portfolio that the person was not given has no line for them. */
export function placeOf(side: MatchSide): string {
  return side.line > 0 ? `${side.fileName} line ${formatNumber(side.line)}` : side.fileName;
}

interface Row {
  label: string;
  left: string | null;
  right: string | null;
  /** Compared as a whole rather than word by word. */
  whole?: boolean;
  className?: string;
}

function Value({ own, other, whole }: { own: string | null; other: string | null; whole?: boolean }): ReactNode {
  if (!own) return <span className="text-ink-soft">none</span>;
  return whole ? own : <MarkedText text={own} other={other} />;
}

/** The two records of a match side by side, what differs marked. */
export function MatchSides({ match, leftIsNew }: { match: MatchView; leftIsNew: boolean }) {
  const { left, right } = match;
  const rows: Row[] = [
    { label: 'Title', left: left.title, right: right.title, className: 'font-serif text-work' },
    { label: 'Authors', left: left.authors, right: right.authors },
    { label: 'Year', left: text(left.year), right: text(right.year), whole: true },
    { label: 'Venue', left: where(left), right: where(right) },
    { label: 'DOI', left: left.doi, right: right.doi, whole: true, className: 'font-mono text-small break-all' },
    { label: 'References', left: formatNumber(left.references), right: formatNumber(right.references), whole: true },
  ];
  const head = 'pb-2 pr-3 text-left text-small font-semibold text-ink-soft align-bottom';
  const title = (side: MatchSide, isNew: boolean) => (isNew ? `In this file, line ${formatNumber(side.line)}` : <>{side.workId ? <><Link prefetch={false} href={`/works/${side.workId}`}>Catalogued</Link>, from</> : 'From'} <span className="break-all">{placeOf(side)}</span></>);
  return (
    <table className="w-full table-fixed border-collapse">
      <caption className="sr-only">The two records side by side</caption>
      <thead>
        <tr>
          <th scope="col" className={`${head} hidden w-28 sm:table-cell`}><span className="sr-only">Field</span></th>
          <th scope="col" className={head}>{title(left, leftIsNew)}</th>
          <th scope="col" className={head}>{title(right, false)}</th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ label, left: a, right: b, whole, className = '' }) => {
          const differs = whole && label !== 'References' && a !== null && b !== null && a !== b;
          const cell = `border-t border-thread py-2 pr-3 align-top text-table [overflow-wrap:anywhere] ${className} ${differs ? 'bg-weld-wash' : ''}`;
          return (
            <tr key={label}>
              <th scope="row" className="hidden border-t border-thread py-2 text-left align-top text-small font-semibold text-ink-soft sm:table-cell">{label}{differs && <span className="sr-only">, differs</span>}</th>
              <td className={cell}><Value own={a} other={b} whole={whole} /></td>
              <td className={cell}><Value own={b} other={a} whole={whole} /></td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
