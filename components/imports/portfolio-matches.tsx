'use client';

import { SheetWithEvidence } from '@/components/frame/sheet-with-evidence';
import { MatchEvidence } from '@/components/imports/match-evidence';
import { MatchReview } from '@/components/imports/match-review';
import { useMatchQueue } from '@/components/imports/use-match-queue';
import { count } from '@/components/ui/numbers';
import { PageHeader } from '@/components/ui/page-header';
import { useAddress } from '@/components/ui/use-address';
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
  const { search, href, go } = useAddress();
  const chosen = search.get('evidence');
  const evidence = queue.current && chosen !== 'none' && <MatchEvidence match={queue.current} onClose={() => go({ evidence: 'none' }, 'replace')} />;
  return (
    // Beside the question on wide screens; on narrow ones, where it would cover it, only when asked for.
    <SheetWithEvidence evidence={chosen === 'match' ? evidence : evidence && <div className="hidden lg:contents">{evidence}</div>}>
      <div className="grid gap-6">
        <PageHeader
          title="Matches to review"
          subtitle={`Records that may be one work, strongest first. They stand as works of their own until somebody answers “same”, and every answer can be taken back.${later > 0 ? ` ${count(later, 'match', 'matches')} left for later.` : ''}`}
        />
        <MatchReview queue={queue} importId={null} mayDecide={mayDecide} whyHref={chosen === 'match' ? null : href({ evidence: 'match' })} whyBeside={chosen === null} />
      </div>
    </SheetWithEvidence>
  );
}
