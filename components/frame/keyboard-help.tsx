'use client';

import { setKeyboardHelp, useKeyboardHelp, type KeyLine } from '@/components/frame/page-keys';
import { Dialog } from '@/components/ui/dialog';
import { KeyHint } from '@/components/ui/key-hint';
import { SectionHeading } from '@/components/ui/page-header';
import { useKeys } from '@/components/ui/use-keys';

const everywhere: readonly KeyLine[] = [
  { keys: '/', does: 'Search works, authors, DOIs and portfolios' },
  { keys: '?', does: 'Show this list' },
  { keys: 'Esc', does: 'Close what is open: panel, menu, dialog' },
  { keys: 'Tab', does: 'Go to the next control' },
];
const inTables: readonly KeyLine[] = [
  { keys: '↑ ↓', does: 'Go from row to row' },
  { keys: 'Home End', does: 'Go to the first or last row' },
  { keys: 'Enter', does: 'Open the row' },
];

function Group({ title, lines }: { title: string; lines: readonly KeyLine[] }) {
  return (
    <section className="grid gap-2">
      <SectionHeading level={3}>{title}</SectionHeading>
      <dl className="grid gap-1.5 text-table">
        {lines.map((line) => (
          <div key={line.keys} className="grid grid-cols-[7rem_minmax(0,1fr)] gap-3">
            <dt className="flex gap-1">{line.keys.split(' ').map((key) => <KeyHint key={key} boxed>{key}</KeyHint>)}</dt>
            <dd>{line.does}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

/** The list of keys that `?` opens: those of every page, of tables, and those that the page added with `usePageKeys`. */
export function KeyboardHelp() {
  const { open, groups } = useKeyboardHelp();
  useKeys({ '?': () => setKeyboardHelp(true) });
  return (
    <Dialog open={open} onOpenChange={setKeyboardHelp} title="Keys">
      <div className="grid gap-5">
        {groups.map((group) => <Group key={group.title} {...group} />)}
        <Group title="Everywhere" lines={everywhere} />
        <Group title="In tables" lines={inTables} />
      </div>
    </Dialog>
  );
}
