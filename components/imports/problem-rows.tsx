import { formatNumber } from '@/components/ui/numbers';
import { Pill } from '@/components/ui/status';
import { type ImportProblemView } from '@/lib/api/types';

/** What was wrong in the file, by line. */
export function ProblemRows({ problems }: { problems: ImportProblemView[] }) {
  return (
    <ul aria-label="Problems by line" className="divide-y divide-thread border-y border-thread">
      {problems.map((problem) => (
        <li key={problem.id} className="grid grid-cols-[minmax(5.5rem,auto)_minmax(0,1fr)] items-baseline gap-x-4 gap-y-1 py-2 sm:grid-cols-[7rem_minmax(0,1fr)_auto]">
          <span className="font-mono text-head text-ink-soft">line {formatNumber(problem.line)}</span>
          <span className="[overflow-wrap:anywhere]">{problem.message}{problem.key && <span className="ml-2 font-mono text-head text-ink-soft">{problem.key}</span>}</span>
          <span className="max-sm:col-start-2"><Pill tone={problem.severity === 'error' ? 'problem' : 'caution'}>{problem.severity === 'error' ? 'left out' : 'kept, look at it'}</Pill></span>
        </li>
      ))}
    </ul>
  );
}
