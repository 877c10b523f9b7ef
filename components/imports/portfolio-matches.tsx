'use client';

import { useState } from 'react';

import { MatchReasons } from '@/components/imports/match-reasons';
import { MatchReview } from '@/components/imports/match-review';
import { useMatchQueue } from '@/components/imports/use-match-queue';
import { PageWithPanel } from '@/components/portfolios/page-with-panel';
import { count, formatDecimal } from '@/components/ui/numbers';
import { type Page } from '@/lib/api/schemas';
import { type MatchView } from '@/lib/api/types';

interface PortfolioMatchesProps {
  portfolioId: string;
  initial: Page<MatchView>;
  later: number;
  mayDecide: boolean;
}

const nothingElse = () => undefined;

/** All open matches of a portfolio, whichever import they came with; strongest first. */
export function PortfolioMatches({ portfolioId, initial, later, mayDecide }: PortfolioMatchesProps) {
  const queue = useMatchQueue(portfolioId, null, initial, nothingElse);
  const [whyOpen, setWhyOpen] = useState(false);
  return (
    <PageWithPanel
      panel={whyOpen && queue.current ? { eyebrow: 'Why it was proposed', title: `Score ${formatDecimal(queue.current.score)}`, content: <MatchReasons match={queue.current} /> } : null}
      onClose={() => setWhyOpen(false)}
    >
      <div className="grid gap-6">
        <header className="grid gap-1">
          <h1 className="text-[31px] leading-[35px]">Matches to review</h1>
          <p className="text-ink-soft">Records that may be one work, strongest first. They stand as works of their own until somebody answers “same”, and every answer can be taken back.{later > 0 && ` ${count(later, 'match', 'matches')} left for later.`}</p>
        </header>
        <MatchReview queue={queue} importId={null} mayDecide={mayDecide} onWhy={() => setWhyOpen(true)} />
      </div>
    </PageWithPanel>
  );
}
