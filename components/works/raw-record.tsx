import { formatNumber } from '@/components/ui/numbers';

/** Characters at which the service cuts a raw record. */
const rawLimit = 20_000;

/** A record as it stood in its file: the end of every way from a figure to its evidence. */
export function RawRecord({ fileName, line, raw }: { fileName: string; line: number; raw: string }) {
  return (
    <div className="grid gap-2">
      <p className="font-mono text-head break-all">{fileName} <span className="whitespace-nowrap">line {formatNumber(line)}</span></p>
      <pre tabIndex={0} aria-label="The record as it stood in the file" className="max-h-[60dvh] overflow-auto border-y border-thread bg-linen p-3 font-mono text-head leading-[1.125rem] whitespace-pre-wrap [overflow-wrap:anywhere]">{raw}</pre>
      {raw.length >= rawLimit && <p className="text-small text-ink-soft">Only the beginning is shown; the file holds the rest.</p>}
    </div>
  );
}
