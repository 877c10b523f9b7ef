'use client';

import { useEffect, useRef } from 'react';

import { EvidencePanel } from '@/components/evidence/evidence-panel';
import { SheetWithEvidence } from '@/components/frame/sheet-with-evidence';
import { ImportActions } from '@/components/imports/import-actions';
import { isUndoing, progressWords, stateWords, summaryWords } from '@/components/imports/import-words';
import { MatchEvidence } from '@/components/imports/match-evidence';
import { MatchReview } from '@/components/imports/match-review';
import { ProblemRows } from '@/components/imports/problem-rows';
import { RecordRows } from '@/components/imports/record-rows';
import { useMatchQueue } from '@/components/imports/use-match-queue';
import { useNow } from '@/components/imports/use-now';
import { count, formatNumber } from '@/components/ui/numbers';
import { PageHeader, SectionHeading } from '@/components/ui/page-header';
import { Pagination } from '@/components/ui/pagination';
import { Progress } from '@/components/ui/progress';
import { EmptyState, Notice, Pill, PillLink, type Tone } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { RawRecord } from '@/components/works/raw-record';
import { importMoves, useImport, useImportProblems, useImportRecords } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type ImportProblemView, type ImportRecordView, type ImportView, type MatchView } from '@/lib/api/types';

export type Shown = 'all' | 'new' | 'known' | 'review' | 'rejected' | 'problems';

interface ImportPageProps {
  initial: ImportView;
  shown: Shown;
  page: number;
  records: Page<ImportRecordView>;
  problems: Page<ImportProblemView>;
  matches: Page<MatchView>;
  mayDecide: boolean;
}

function Pills({ row, shown }: { row: ImportView; shown: Shown }) {
  const { href } = useAddress();
  if (!row.counts) return <Pill tone={stateWords(row).tone}>{stateWords(row).words}</Pill>;
  const { counts } = row;
  const pills: { show: Shown; tone: Tone; words: string; there: boolean }[] = [
    { show: 'new', tone: 'done', words: `${formatNumber(counts.new)} new`, there: true },
    { show: 'known', tone: 'done', words: `${formatNumber(counts.known)} already catalogued`, there: true },
    { show: 'review', tone: 'caution', words: `${formatNumber(counts.review)} to review`, there: counts.review > 0 || shown === 'review' },
    { show: 'rejected', tone: 'problem', words: `${formatNumber(counts.rejected)} left out`, there: counts.rejected > 0 },
    { show: 'problems', tone: 'problem', words: count(counts.problems, 'problem'), there: counts.problems > 0 },
  ];
  return (
    <nav aria-label="Show" className="flex flex-wrap gap-2">
      {pills.filter((pill) => pill.there).map((pill) => (
        <PillLink key={pill.show} tone={pill.tone} current={shown === pill.show} href={href({ show: shown === pill.show ? null : pill.show, page: null, evidence: null })}>{pill.words}</PillLink>
      ))}
    </nav>
  );
}

/** One import on its way: what the file is, what it would do, what must be answered, and the way back. */
export function ImportPage({ initial, shown, page, records: firstRecords, problems: firstProblems, matches, mayDecide }: ImportPageProps) {
  const { data: row = initial, mutate } = useImport(initial.id, { fallbackData: initial });
  const { search, href, go } = useAddress();
  const moves = importMoves(row);
  const now = useNow(moves);
  const recordQuery = { page, outcome: shown === 'all' || shown === 'problems' ? null : shown };
  const records = useImportRecords(row.id, recordQuery, { fallbackData: firstRecords });
  const problems = useImportProblems(row.id, { page: shown === 'problems' ? page : 1 }, { fallbackData: firstProblems });
  const queue = useMatchQueue(row.portfolioId, row.id, matches, () => void mutate());

  // What was listed while the file was being read is out of date once it stands still.
  const moved = useRef(moves);
  useEffect(() => {
    if (moved.current && !moves) void Promise.all([records.mutate(), problems.mutate(), queue.renew()]);
    moved.current = moves;
  });

  const chosen = search.get('evidence');
  const record = records.data?.items.find((one) => `record-${one.id}` === chosen) ?? null;
  const reviewing = !moves && (row.state === 'review' || row.state === 'accepted') && (queue.total > 0 || shown === 'review');
  const reasons = reviewing && queue.current && chosen !== 'none' ? <MatchEvidence match={queue.current} onClose={() => go({ evidence: 'none' }, 'replace')} /> : null;
  // The reasons stand beside the question on wide screens; on narrow ones, where they would cover it, only when asked for.
  const evidence = record ? (
    <EvidencePanel panelKey={`record-${record.id}`} eyebrow="The record as it was read" title={record.title ?? record.key ?? 'No title'}>
      <RawRecord fileName={row.fileName} line={record.line} raw={record.raw} />
    </EvidencePanel>
  ) : chosen === 'match' ? reasons : reasons && <div className="hidden lg:contents">{reasons}</div>;
  const listed = shown === 'problems' ? problems.data : records.data;

  return (
    <SheetWithEvidence evidence={evidence}>
      <div className="grid gap-7">
        <PageHeader title={row.fileName} subtitle={summaryWords(row)}>
          {moves && <Progress label={`Progress of ${row.fileName}`} done={row.progress.done} total={row.progress.total} detail={progressWords(row, now ?? 0)} />}
          {row.error && <Notice tone="problem" title={row.state === 'failed' ? 'The file could not be read' : undefined}>{row.error}</Notice>}
          <div className="flex flex-wrap items-center justify-between gap-3">
            <Pills row={row} shown={shown} />
            {mayDecide && <ImportActions row={row} onChanged={(next) => void mutate(next, { revalidate: next === undefined })} />}
          </div>
          {(row.counts?.review ?? 0) > 0 && (row.state === 'review' || row.state === 'accepted') && !isUndoing(row) && (
            <p className="max-w-[46rem] text-table text-ink-soft">
              Records to review {row.state === 'review' ? 'are catalogued as works of their own when you accept' : 'stand as works of their own'}, and the question stays open; answering “same” merges the two, and everything can be taken back.
            </p>
          )}
        </PageHeader>
        {reviewing && <MatchReview queue={queue} importId={row.id} mayDecide={mayDecide} whyHref={chosen === 'match' ? null : href({ evidence: 'match' })} whyBeside={chosen === null} />}
        {!moves && row.counts && listed && (
          <section aria-labelledby="listed-title" className="grid gap-1">
            <SectionHeading id="listed-title" beside={formatNumber(listed.total)}>{shown === 'problems' ? 'Problems in this file' : 'Records'}</SectionHeading>
            {listed.total === 0 && <EmptyState title={shown === 'problems' ? 'No problems' : 'No such records'} />}
            {shown === 'problems' ? problems.data && problems.data.total > 0 && <ProblemRows problems={problems.data.items} /> : records.data && records.data.total > 0 && <RecordRows records={records.data.items} chosen={record?.id ?? null} />}
            <Pagination page={listed.page} pageSize={listed.pageSize} total={listed.total} hrefOf={(change) => href({ page: change.page === 1 ? null : change.page, evidence: null })} label="Pages of this list" />
          </section>
        )}
      </div>
    </SheetWithEvidence>
  );
}
