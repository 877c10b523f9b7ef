/** Numbers and dates as pages show them. One locale until the interface has languages: the server and the browser must write the same. */
const whole = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 0 });

export function formatNumber(value: number): string {
  return whole.format(value);
}

/** Fixed decimals; an en dash where there is no value. */
export function formatDecimal(value: number | null, digits = 2): string {
  return value === null ? '–' : value.toLocaleString('en-GB', { minimumFractionDigits: digits, maximumFractionDigits: digits });
}

/** A share of 0..1 as per cent; an en dash where there is no value. */
export function formatShare(share: number | null, digits = 0): string {
  return share === null || !Number.isFinite(share) ? '–' : `${(share * 100).toLocaleString('en-GB', { minimumFractionDigits: digits, maximumFractionDigits: digits })}%`;
}

export function formatBytes(bytes: number): string {
  if (bytes < 1024) return `${bytes} B`;
  const units = ['KiB', 'MiB', 'GiB'];
  let value = bytes;
  let unit = -1;
  while (value >= 1024 && unit < units.length - 1) {
    value /= 1024;
    unit += 1;
  }
  return `${value.toLocaleString('en-GB', { maximumFractionDigits: value < 10 ? 1 : 0 })} ${units[unit]}`;
}

/** "1 work", "2 works". */
export function count(value: number, one: string, many = `${one}s`): string {
  return `${formatNumber(value)} ${value === 1 ? one : many}`;
}
