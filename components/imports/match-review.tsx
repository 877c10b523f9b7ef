'use client';

import { MatchSides } from '@/components/imports/match-sides';
import { type useMatchQueue, type Decision } from '@/components/imports/use-match-queue';
import { usePageKeys, type KeyLine } from '@/components/frame/page-keys';
import { Button, ButtonLink } from '@/components/ui/button';
import { KeyHint } from '@/components/ui/key-hint';
import { formatNumber } from '@/components/ui/numbers';
import { EmptyState, Notice } from '@/components/ui/status';
import { useKeys } from '@/components/ui/use-keys';

const words: Record<Decision, string> = { same: 'one work', different: 'two works', later: 'left for later' };

const keyLines: readonly KeyLine[] = [
  { keys: 'S', does: 'Same work' },
  { keys: 'D', does: 'Different works' },
  { keys: 'L', does: 'Leave it for later' },
  { keys: 'U', does: 'Undo the last answer' },
];

interface MatchReviewProps {
  queue: ReturnType<typeof useMatchQueue>;
  importId: string | null;
  mayDecide: boolean;
  /** Opens the reasons in the evidence panel; null while they are open. */
  whyHref: string | null;
  /** Wide screens show the reasons unasked. */
  whyBeside: boolean;
}

/** One question at a time, answered with one key: S same, D different, L later, U undo. */
export function MatchReview({ queue, importId, mayDecide, whyHref, whyBeside }: MatchReviewProps) {
  const { current, position, total, last, problem, decide, undo } = queue;
  useKeys({ s: () => current && decide(current, 'same'), d: () => current && decide(current, 'different'), l: () => current && decide(current, 'later'), u: undo }, mayDecide);
  usePageKeys('Reviewing matches', keyLines);
  return (
    <section aria-labelledby="review-title" className="grid gap-4">
      <h2 id="review-title" className="text-panel">
        Are these the same work? {current && <span className="font-sans text-table text-ink-soft">{formatNumber(position)} of {formatNumber(total)}</span>}
      </h2>
      {problem && <Notice tone="problem" title="The answer was not taken">{problem} The question stands again.</Notice>}
      {current ? (
        <>
          <MatchSides match={current} leftIsNew={importId !== null} />
          <div className="flex flex-wrap items-center gap-2">
            {mayDecide && (
              <>
                <Button kind="primary" aria-keyshortcuts="S" onClick={() => decide(current, 'same')}>Same work <KeyHint>S</KeyHint></Button>
                <Button aria-keyshortcuts="D" onClick={() => decide(current, 'different')}>Different <KeyHint>D</KeyHint></Button>
                <Button aria-keyshortcuts="L" onClick={() => decide(current, 'later')}>Later <KeyHint>L</KeyHint></Button>
                <Button kind="quiet" aria-keyshortcuts="U" onClick={undo} disabled={!last}>Undo <KeyHint>U</KeyHint></Button>
              </>
            )}
            {whyHref && <ButtonLink kind="quiet" href={whyHref} scroll={false} className={whyBeside ? 'text-indigo lg:hidden' : 'text-indigo'}>Why it was proposed</ButtonLink>}
          </div>
        </>
      ) : (
        <EmptyState title={total > 1 ? 'All answered' : 'Nothing to review'} action={mayDecide && last ? <Button aria-keyshortcuts="U" onClick={undo}>Undo the last answer <KeyHint>U</KeyHint></Button> : undefined}>
          Matches left for later can be asked for again; every answer can be taken back.
        </EmptyState>
      )}
      <p role="status" className="min-h-5 text-small text-ink-soft">{last && `Last answer: ${last.match.left.title ?? 'untitled'}, ${words[last.decision]}.`}</p>
    </section>
  );
}
