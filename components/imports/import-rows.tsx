'use client';

import Link from 'next/link';

import { formatWords, progressWords, stateWords } from '@/components/imports/import-words';
import { useNow } from '@/components/imports/use-now';
import { DateText } from '@/components/ui/date-text';
import { count, formatBytes, formatNumber } from '@/components/ui/numbers';
import { Progress } from '@/components/ui/progress';
import { Pill } from '@/components/ui/status';
import { importMoves } from '@/lib/api/hooks';
import { type ImportView } from '@/lib/api/types';

const head = 'px-2 pb-2 text-head font-semibold text-ink-soft first:pl-0 last:pr-0';

function Counts({ row, now }: { row: ImportView; now: number | null }) {
  if (importMoves(row)) return <Progress label={`Progress of ${row.fileName}`} done={row.progress.done} total={row.progress.total} detail={progressWords(row, now ?? 0)} className="min-w-40" />;
  if (row.error) return <p className="max-w-[34rem] text-small text-madder">{row.error}</p>;
  if (!row.counts) return <span className="text-ink-soft">–</span>;
  const { counts } = row;
  const parts = [`${formatNumber(counts.new)} new`, `${formatNumber(counts.known)} known`, ...(counts.review > 0 ? [`${formatNumber(counts.review)} to review`] : []), ...(counts.problems > 0 ? [count(counts.problems, 'problem')] : [])];
  return <p className="text-small text-ink-soft">{count(counts.records, 'record')}: {parts.join(', ')}</p>;
}

/** The imports of a portfolio, newest first, one line an upload. */
export function ImportRows({ imports }: { imports: ImportView[] }) {
  const now = useNow(imports.some(importMoves));
  return (
    <table className="w-full border-collapse text-table">
      <caption className="sr-only">Imports</caption>
      <thead>
        <tr className="border-b border-ink">
          <th scope="col" className={`${head} text-left`}>File</th>
          <th scope="col" className={`${head} hidden text-left md:table-cell`}>What is in it</th>
          <th scope="col" className={`${head} text-left`}>State</th>
          <th scope="col" className={`${head} hidden text-right lg:table-cell`}>Uploaded</th>
        </tr>
      </thead>
      <tbody className="divide-y divide-thread">
        {imports.map((row) => {
          const { words, tone } = stateWords(row);
          return (
            <tr key={row.id} className="align-top hover:bg-paper">
              <th scope="row" className="py-3 pr-2 text-left font-normal">
                <Link prefetch={false} href={`/portfolios/${row.portfolioId}/imports/${row.id}`} className="font-mono text-small break-all text-ink no-underline hover:underline">{row.fileName}</Link>
                <p className="text-small text-ink-soft">{[row.format && formatWords[row.format], formatBytes(row.bytes)].filter(Boolean).join(' · ')}</p>
                <div className="mt-1 md:hidden"><Counts row={row} now={now} /></div>
              </th>
              <td className="hidden px-2 py-3 md:table-cell"><Counts row={row} now={now} /></td>
              <td className="py-3 pl-2"><Pill tone={tone}>{words}</Pill></td>
              <td className="hidden py-3 pl-2 text-right text-small text-ink-soft lg:table-cell">
                <DateText at={row.createdAt} withTime />
                {row.uploadedBy && <p>{row.uploadedBy}</p>}
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
