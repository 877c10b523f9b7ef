import { count, formatDecimal } from '@/components/ui/numbers';
import { type MatchView } from '@/lib/api/types';

const signed = (weight: number) => `${weight > 0 ? '+' : weight < 0 ? '−' : ''}${formatDecimal(Math.abs(weight), 1)}`;

/** Why a match was proposed and what follows from each answer: the content of the evidence panel beside the question. */
export function MatchReasons({ match }: { match: MatchView }) {
  const kept = Math.max(match.left.references, match.right.references);
  return (
    <div className="grid gap-5">
      <dl className="grid gap-1.5 text-[14px]">
        {match.reasons.map((reason) => (
          <div key={reason.field} className="flex justify-between gap-4">
            <dt>{reason.verdict}</dt>
            <dd className="font-semibold">{signed(reason.weight)}</dd>
          </div>
        ))}
      </dl>
      <div>
        <h3 className="border-b border-thread pb-1 font-sans text-[12.5px] font-semibold text-ink-soft">If you answer “same”</h3>
        <p className="mt-2 text-[14px]">
          One work with the records of both. {kept === 0 ? 'Neither has references.' : `${count(kept, 'reference')} ${kept === 1 ? 'is' : 'are'} kept.`} Its fields come from the fuller record. It can be taken back.
        </p>
      </div>
      <div>
        <h3 className="border-b border-thread pb-1 font-sans text-[12.5px] font-semibold text-ink-soft">How the score is made</h3>
        <p className="mt-2 text-[14px]">
          Each line is evidence for (+) or against (−) one work, in powers of two; the score is the probability that follows. <a href="/methods#linking">Definition and source</a>
        </p>
      </div>
    </div>
  );
}
