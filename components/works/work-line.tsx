import Link from 'next/link';

import { titleOf } from '@/components/works/work-words';
import { Pill } from '@/components/ui/status';

interface WorkLineProps {
  /** The year stands in a column of its own. */
  yearElsewhere?: boolean;
  work: { id: string; title: string | null; authors: string | null; year: number | null; venue?: string | null; catalogued: boolean; retracted?: boolean };
}

/** Title, authors, year and venue of a work in a list. */
export function WorkLine({ work, yearElsewhere = false }: WorkLineProps) {
  return (
    <div className="min-w-0">
      <Link prefetch={false} href={`/works/${work.id}`} className="font-serif text-work text-ink no-underline [overflow-wrap:anywhere] hover:underline">{titleOf(work)}</Link>
      <span className="ml-2 inline-flex gap-1.5 align-middle">
        {work.retracted && <Pill tone="problem">retracted</Pill>}
        {!work.catalogued && <Pill>cited only</Pill>}
      </span>
      <p className="text-small text-ink-soft">{[work.title === null ? null : work.authors, work.title === null || yearElsewhere ? null : work.year, work.venue].filter((part) => part !== null && part !== undefined).join(' · ')}</p>
    </div>
  );
}
