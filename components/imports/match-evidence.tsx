'use client';

import { EvidencePanel } from '@/components/evidence/evidence-panel';
import { EvidenceMethod, EvidenceRows, EvidenceSection } from '@/components/evidence/evidence-parts';
import { count, formatDecimal } from '@/components/ui/numbers';
import { type MatchView } from '@/lib/api/types';

const signed = (weight: number) => `${weight > 0 ? '+' : weight < 0 ? '−' : ''}${formatDecimal(Math.abs(weight), 1)}`;

/** Why a match was proposed, and what follows from the answer "same". */
export function MatchEvidence({ match, onClose }: { match: MatchView; onClose: () => void }) {
  const kept = Math.max(match.left.references, match.right.references);
  return (
    <EvidencePanel panelKey="match" eyebrow="Why it was proposed" title={`Score ${formatDecimal(match.score)}`} onClose={onClose}>
      <EvidenceRows title="For and against" rows={match.reasons.map((reason) => ({ label: reason.verdict, value: signed(reason.weight), key: reason.field }))} />
      <EvidenceSection title="If you answer “same”">
        <p className="text-table">
          One work with the records of both. {kept === 0 ? 'Neither has references.' : `${count(kept, 'reference')} ${kept === 1 ? 'is' : 'are'} kept.`} Its fields come from the fuller record. It can be taken back.
        </p>
      </EvidenceSection>
      <EvidenceMethod title="How the score is made" href="/methods#linking">
        Each line is evidence for (+) or against (−) one work, in powers of two; the score is the probability that follows.
      </EvidenceMethod>
    </EvidencePanel>
  );
}
