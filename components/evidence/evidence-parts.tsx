import Link from 'next/link';
import { type ReactNode } from 'react';

import { DefinitionList, type Definition } from '@/components/ui/definition-list';
import { count, formatShare } from '@/components/ui/numbers';
import { SectionHeading } from '@/components/ui/page-header';
import { Caution } from '@/components/ui/status';

/** One part of the panel under its small ruled head: "How it is counted", "Where the references were read". */
export function EvidenceSection({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="grid gap-2">
      <SectionHeading level={3}>{title}</SectionHeading>
      {children}
    </section>
  );
}

/** Rows of label and figure. */
export function EvidenceRows({ title = 'How it is counted', rows }: { title?: string; rows: readonly Definition[] }) {
  return (
    <EvidenceSection title={title}>
      <DefinitionList items={rows} />
    </EvidenceSection>
  );
}

export interface FileLine {
  file: string;
  /** Counted from 1. */
  line: number;
  /** The record or reference read there. */
  href?: string;
  /** What was read, where it helps. */
  text?: string;
}

/** A line number in groups of three, kept together: "10 482". */
const groupedLine = (line: number) => String(line).replace(/\B(?=(\d{3})+$)/g, '\u00a0');

/** Files and lines, as they were read. `more` leads to the rest. */
export function FileLines({ lines, more }: { lines: readonly FileLine[]; more?: { count: number; href: string } }) {
  return (
    <div className="grid gap-1">
      <ul className="grid gap-1 font-mono text-[0.78125rem] leading-[1.125rem] text-ink-soft">
        {lines.map((line, index) => {
          const place = `${line.file}\u00a0\u00a0line\u00a0${groupedLine(line.line)}`;
          return (
            <li key={`${line.file} ${line.line} ${index}`} className="[overflow-wrap:anywhere]">
              {line.href ? <Link prefetch={false} href={line.href} scroll={false}>{place}</Link> : place}
              {line.text && <span className="mt-0.5 block border-l-2 border-thread pl-2 text-ink">{line.text}</span>}
            </li>
          );
        })}
      </ul>
      {more && more.count > 0 && <Link prefetch={false} href={more.href} scroll={false} className="w-fit text-small">{count(more.count, 'more', 'more')}</Link>}
    </div>
  );
}

/** By which method, in words, with the way to its definition and source. */
export function EvidenceMethod({ children, href, title = 'Method' }: { children: ReactNode; href: string; title?: string }) {
  return (
    <EvidenceSection title={title}>
      <p className="text-table">
        {children} <Link prefetch={false} href={href}>Definition and source</Link>
      </p>
    </EvidenceSection>
  );
}

interface EvidenceCoverageProps {
  /** 0..1, null where there is nothing to take a share of. */
  withReferences: number | null;
  linked: number | null;
}

/** The shares that the figure depends on. */
export function EvidenceCoverage({ withReferences, linked }: EvidenceCoverageProps) {
  return (
    <EvidenceRows
      title="Coverage"
      rows={[
        { label: 'Catalogued works with references', value: formatShare(withReferences) },
        { label: 'References linked to a work', value: formatShare(linked) },
      ]}
    />
  );
}

/** With which caution. */
export function EvidenceCaution({ children, href }: { children: ReactNode; href?: string }) {
  return <Caution href={href}>{children}</Caution>;
}
