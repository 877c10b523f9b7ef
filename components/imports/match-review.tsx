'use client';

import { MatchSides } from '@/components/imports/match-sides';
import { useKeys } from '@/components/imports/use-keys';
import { type useMatchQueue, type Decision } from '@/components/imports/use-match-queue';
import { Button } from '@/components/ui/button';
import { formatNumber } from '@/components/ui/numbers';
import { EmptyState, Notice } from '@/components/ui/status';

const words: Record<Decision, string> = { same: 'one work', different: 'two works', later: 'left for later' };

function Key({ children }: { children: string }) {
  return <kbd aria-hidden="true" className="font-sans text-[12.5px] opacity-80">{children}</kbd>;
}

interface MatchReviewProps {
  queue: ReturnType<typeof useMatchQueue>;
  importId: string | null;
  mayDecide: boolean;
  onWhy: () => void;
}

/** One question at a time, answered with one key: S same, D different, L later, U undo. */
export function MatchReview({ queue, importId, mayDecide, onWhy }: MatchReviewProps) {
  const { current, position, total, last, problem, decide, undo } = queue;
  useKeys({ s: () => current && decide(current, 'same'), d: () => current && decide(current, 'different'), l: () => current && decide(current, 'later'), u: undo }, mayDecide);
  return (
    <section aria-labelledby="review-title" className="grid gap-4">
      <h2 id="review-title" className="text-[21px] leading-[25px]">
        Are these the same work? {current && <span className="font-sans text-[14px] text-ink-soft">{formatNumber(position)} of {formatNumber(total)}</span>}
      </h2>
      {problem && <Notice tone="problem" title="The answer was not taken">{problem} The question stands again.</Notice>}
      {current ? (
        <>
          <MatchSides match={current} leftIsNew={importId !== null} />
          <div className="flex flex-wrap items-center gap-2">
            {mayDecide && (
              <>
                <Button kind="primary" aria-keyshortcuts="S" onClick={() => decide(current, 'same')}>Same work <Key>S</Key></Button>
                <Button aria-keyshortcuts="D" onClick={() => decide(current, 'different')}>Different <Key>D</Key></Button>
                <Button aria-keyshortcuts="L" onClick={() => decide(current, 'later')}>Later <Key>L</Key></Button>
                <Button kind="quiet" aria-keyshortcuts="U" onClick={undo} disabled={!last}>Undo <Key>U</Key></Button>
              </>
            )}
            <Button kind="quiet" onClick={onWhy}>Why it was proposed</Button>
          </div>
        </>
      ) : (
        <EmptyState title={total > 1 ? 'All answered' : 'Nothing to review'} action={mayDecide && last ? <Button aria-keyshortcuts="U" onClick={undo}>Undo the last answer <Key>U</Key></Button> : undefined}>
          Matches left for later can be asked for again; every answer can be taken back.
        </EmptyState>
      )}
      <p role="status" className="min-h-5 text-[13px] text-ink-soft">{last && `Last answer: ${last.match.left.title ?? 'untitled'}, ${words[last.decision]}.`}</p>
    </section>
  );
}
