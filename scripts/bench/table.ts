/** One measured figure of a suite. */
export interface Measurement {
  name: string;
  /** In `unit`; null where nothing could be measured. */
  value: number | null;
  unit: string;
  note?: string;
}

/** Whether a suite says `export const needsDatabase = true`. Read from its source, because importing it would already need the database. */
export function wantsDatabase(source: string): boolean {
  return /^export const needsDatabase(?:\s*:\s*boolean)?\s*=\s*true\b/m.test(source);
}

/**
 * Measurements as an aligned table. The ratio compares each figure with the first of the same unit, which a suite therefore
 * lists first as its base line; a unit with one figure only has none.
 */
export function formatMeasurements(measurements: Measurement[]): string {
  const bases = new Map<string, { value: number | null; count: number }>();
  for (const { unit, value } of measurements) {
    const base = bases.get(unit);
    if (base) base.count += 1;
    else bases.set(unit, { value, count: 1 });
  }
  const rows = measurements.map(({ name, value, unit, note }) => {
    const base = bases.get(unit);
    const comparable = base && base.count > 1 && base.value !== null && base.value !== 0 && value !== null;
    return [name, formatFigure(value), unit, comparable ? `${(value / (base.value as number)).toFixed(2)} x` : '', note ?? ''];
  });
  const table = [['measured', 'value', 'unit', 'ratio', 'note'], ...rows];
  const widths = table[0].map((_title, column) => Math.max(...table.map((row) => row[column].length)));
  const numeric = new Set([1, 3]);
  return table
    .map((row) => row.map((cell, column) => (numeric.has(column) ? cell.padStart(widths[column]) : cell.padEnd(widths[column]))).join('  ').trimEnd())
    .join('\n');
}

/** Four significant digits, thousands apart; whole numbers whole. */
function formatFigure(value: number | null): string {
  if (value === null) return '-';
  if (Number.isInteger(value) || Math.abs(value) >= 1000) return Math.round(value).toLocaleString('en-GB');
  return value.toPrecision(4);
}
