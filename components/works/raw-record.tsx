import { formatNumber } from '@/components/ui/numbers';

/** A record as it stood in its file: the end of every way from a figure to its evidence. */
export function RawRecord({ fileName, line, raw, cut }: { fileName: string; line: number; raw: string; cut?: boolean }) {
  return (
    <div className="grid gap-2">
      <p className="font-mono text-[12.5px] break-all">{fileName} <span className="whitespace-nowrap">line {formatNumber(line)}</span></p>
      <pre tabIndex={0} aria-label="The record as it stood in the file" className="max-h-[60dvh] overflow-auto border-y border-thread bg-linen p-3 font-mono text-[12.5px] leading-[18px] whitespace-pre-wrap [overflow-wrap:anywhere]">{raw}</pre>
      {cut && <p className="text-[13px] text-ink-soft">Only the beginning is shown; the file holds the rest.</p>}
    </div>
  );
}
