'use client';

import Link from 'next/link';

import { formatNumber } from '@/components/ui/numbers';
import { Pill, type Tone } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { type ImportRecordView } from '@/lib/api/types';

const outcomes: Record<NonNullable<ImportRecordView['outcome']>, { words: string; tone: Tone }> = {
  new: { words: 'new', tone: 'done' },
  known: { words: 'already catalogued', tone: 'done' },
  review: { words: 'to review', tone: 'caution' },
  rejected: { words: 'rejected', tone: 'problem' },
};

const head = 'px-2 pb-2 text-[12.5px] font-semibold text-ink-soft first:pl-0 last:pr-0';

/** The records of an import in the order of the file; each opens to its raw text in the evidence panel. */
export function RecordRows({ records, chosen }: { records: ImportRecordView[]; chosen: string | null }) {
  const { href } = useAddress();
  return (
    <table className="w-full border-collapse text-[14.5px]">
      <caption className="sr-only">Records of this file</caption>
      <thead>
        <tr className="border-b border-ink">
          <th scope="col" className={`${head} hidden text-right sm:table-cell`}>Line</th>
          <th scope="col" className={`${head} text-left max-sm:pl-0`}>Record</th>
          <th scope="col" className={`${head} text-left`}>Outcome</th>
          <th scope="col" className={`${head} hidden text-right sm:table-cell`}>References</th>
        </tr>
      </thead>
      <tbody className="divide-y divide-thread">
        {records.map((record) => {
          const outcome = record.outcome && outcomes[record.outcome];
          return (
            <tr key={record.id} className={`align-baseline ${record.id === chosen ? 'bg-weld-wash' : 'hover:bg-paper'}`}>
              <td className="hidden py-2.5 pr-2 text-right font-mono text-[12.5px] text-ink-soft sm:table-cell">{formatNumber(record.line)}</td>
              <th scope="row" className="py-2.5 pr-2 text-left font-normal sm:pl-2">
                <Link href={href({ record: record.id })} scroll={false} className="font-serif text-[16.5px] leading-[21px] text-ink no-underline [overflow-wrap:anywhere] hover:underline">{record.title ?? record.key ?? 'No title'}</Link>
                <p className="text-[13px] leading-[18px] text-ink-soft">
                  {[record.authors, record.year].filter((part) => part !== null).join(' · ')}
                  {record.workId && <> <Link href={`/works/${record.workId}`} className="whitespace-nowrap">the work<span className="sr-only"> of {record.title ?? `the record at line ${record.line}`}</span></Link></>}
                </p>
              </th>
              <td className="py-2.5 pl-2">{outcome ? <Pill tone={outcome.tone}>{outcome.words}</Pill> : '–'}</td>
              <td className="hidden py-2.5 pl-2 text-right sm:table-cell">{formatNumber(record.references)}</td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
