'use client';

import Link from 'next/link';

import { type DataColumn } from '@/components/tables/columns';
import { DataTable } from '@/components/tables/data-table';
import { formatNumber } from '@/components/ui/numbers';
import { Pill, type Tone } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { type ImportRecordView } from '@/lib/api/types';

const outcomes: Record<NonNullable<ImportRecordView['outcome']>, { words: string; tone: Tone }> = {
  new: { words: 'new', tone: 'done' },
  known: { words: 'already catalogued', tone: 'done' },
  review: { words: 'to review', tone: 'caution' },
  rejected: { words: 'left out', tone: 'problem' },
};

const nameOf = (record: ImportRecordView) => record.title ?? record.key ?? 'No title';

/** The records of an import in the order of the file; each opens to its raw text in the evidence panel. */
export function RecordRows({ records, chosen }: { records: ImportRecordView[]; chosen: string | null }) {
  const { href, go } = useAddress();
  const columns: DataColumn<ImportRecordView>[] = [
    { id: 'line', head: 'Line', numeric: true, width: '4.5rem', cell: (record) => <span className="font-mono text-small text-ink-soft">{formatNumber(record.line)}</span> },
    {
      id: 'record',
      head: 'Record',
      narrow: 'title',
      cell: (record) => (
        <>
          <Link prefetch={false} href={href({ evidence: `record-${record.id}` })} scroll={false} className="font-serif text-work text-ink no-underline [overflow-wrap:anywhere] hover:underline">{nameOf(record)}</Link>
          <span className="block text-small text-ink-soft">{[record.authors, record.year].filter((part) => part !== null).join(' · ')}</span>
        </>
      ),
    },
    { id: 'outcome', head: 'Outcome', width: '11rem', cell: (record) => (record.outcome ? <Pill tone={outcomes[record.outcome].tone}>{outcomes[record.outcome].words}</Pill> : '–') },
    { id: 'references', head: 'References', numeric: true, width: '7rem', cell: (record) => formatNumber(record.references) },
    { id: 'work', head: 'Work', width: '5rem', cell: (record) => (record.workId ? <Link prefetch={false} href={`/works/${record.workId}`} aria-label={`The work of ${nameOf(record)}`}>open</Link> : '–') },
  ];
  return <DataTable caption="Records of this file" columns={columns} rows={records} rowKey={(record) => record.id} selectedKey={chosen} onOpen={(record) => go({ evidence: `record-${record.id}` })} />;
}
