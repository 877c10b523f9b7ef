import { formatDecimal, formatNumber, formatShare } from '@/components/ui/numbers';

interface NumberTextProps {
  /** null where there is no value: an en dash is shown, "no value" is read out. */
  value: number | null;
  /** 'share' takes 0..1 and shows per cent. */
  as?: 'whole' | 'decimal' | 'share';
  /** Places after the point; 2 for decimals and 0 for shares unless told. */
  digits?: number;
  /** Shown after the number, kept on its line. */
  unit?: string;
}

/** A figure as pages write it. */
export function NumberText({ value, as = 'whole', digits, unit }: NumberTextProps) {
  if (value === null || !Number.isFinite(value)) {
    return (
      <>
        <span aria-hidden="true" className="text-ink-soft">–</span>
        <span className="sr-only">no value</span>
      </>
    );
  }
  const text = as === 'whole' ? formatNumber(value) : as === 'share' ? formatShare(value, digits) : formatDecimal(value, digits);
  return <span className="whitespace-nowrap">{unit ? `${text} ${unit}` : text}</span>;
}
