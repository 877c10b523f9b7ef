/** Values of parsed JSON of which nothing is known beforehand. */
import { parseDate, parseMonth, type DateParts } from '@/lib/bibliography/dates';
import { tidyText, withoutTags } from '@/lib/bibliography/plain-text';
import { type EntryBuilder, type ReadSession } from '@/lib/bibliography/readers/builder';
import { type JsonItem } from '@/lib/bibliography/readers/json-items';

/** A JSON object as nothing is known of it. */
export type JsonObject = Record<string, unknown>;

export const isObject = (value: unknown): value is JsonObject => typeof value === 'object' && value !== null && !Array.isArray(value);

/** Own property; inherited names such as __proto__ are never followed. */
export const own = (object: JsonObject, name: string): unknown => (Object.hasOwn(object, name) ? object[name] : undefined);

/** Own property as text: numbers become text, of a list the first counts, everything else is no value. */
export function textOf(object: JsonObject, ...names: string[]): string | undefined {
  for (const name of names) {
    const value = own(object, name);
    const single: unknown = Array.isArray(value) ? value[0] : value;
    if (typeof single === 'string') {
      const text = tidyText(withoutTags(single));
      if (text !== '') return text;
    } else if (typeof single === 'number' && Number.isFinite(single)) return String(single);
  }
  return undefined;
}

/** Own property as a list; one object or text counts as a list of one. */
export function listOf(object: JsonObject, name: string): unknown[] {
  const value = own(object, name);
  return Array.isArray(value) ? value : value === undefined || value === null ? [] : [value];
}

/** A whole number that is not negative, also when it is written as text. */
export function numberOf(object: JsonObject, ...names: string[]): number | undefined {
  const text = textOf(object, ...names);
  return text !== undefined && /^\d{1,9}$/.test(text) ? Number(text) : undefined;
}

/** A date with `date-parts` (numbers or texts), `raw` or `literal`, or plain text. Only what was found is set. */
export function dateOf(value: unknown): DateParts {
  if (typeof value === 'string' || typeof value === 'number') return parseDate(String(value));
  if (!isObject(value)) return {};
  const [first] = listOf(value, 'date-parts');
  const parts = (Array.isArray(first) ? first : []).slice(0, 3).map((part: unknown) => (typeof part === 'number' || (typeof part === 'string' && /^\s*-?\d{1,4}\s*$/.test(part)) ? Number(part) : NaN));
  const [year, month, day] = parts;
  if (Number.isInteger(year) && year >= 1000 && year <= 2200) {
    const monthFound = Number.isInteger(month) && month >= 1 && month <= 12;
    return { year, ...(monthFound ? { month } : {}), ...(monthFound && Number.isInteger(day) && day >= 1 && day <= 31 ? { day } : {}) };
  }
  const written = textOf(value, 'raw', 'literal', 'date-parts', 'year');
  const date = written ? parseDate(written) : {};
  const named = date.year && !date.month ? parseMonth(textOf(value, 'month') ?? '') : undefined;
  return named ? { ...date, month: named } : date;
}

/** Parses one item and hands it to `fill`; what is no object, or no JSON, becomes a rejection. `newBuilder` makes the builder of each entry. */
export function takeItem(session: ReadSession, item: JsonItem, newBuilder: (line: number) => EntryBuilder, fill: (builder: EntryBuilder, object: JsonObject, item: JsonItem) => void, recovered = false): void {
  const reject = (line: number, text: string, code: string, message: string): void => {
    const builder = newBuilder(line);
    builder.problem('error', code, message);
    session.emit((position) => builder.rejected(position, text));
  };
  if (item.tooDeep) return reject(item.line, item.text, 'too-deep', 'The item is nested deeper than any record; it was not read.');
  let parsed: unknown;
  try {
    parsed = JSON.parse(item.text);
  } catch (error) {
    const pieces = recovered ? [] : recoverItems(item);
    if (pieces.length > 1) for (const piece of pieces) takeItem(session, piece, newBuilder, fill, true);
    else reject(item.line, item.text, 'invalid-json', `The item is not valid JSON: ${error instanceof Error ? error.message.slice(0, 120) : 'unknown fault'}`);
    return;
  }
  if (!isObject(parsed)) return reject(item.line, item.text, 'not-an-object', 'The item is no object.');
  const builder = newBuilder(item.line);
  fill(builder, parsed, item);
  if (builder.tellsNothing && !builder.key) {
    builder.problem('error', 'empty-entry', 'The item holds nothing that describes a work.');
    session.emit((position) => builder.rejected(position, item.text));
  } else session.emit((position) => builder.record(position, item.text));
}

/**
 * A fault in one item may have drawn later ones into it: pieces that begin on a line of their own, indented as the item itself is. When one
 * of them is valid, the rest was swallowed, and each is looked at by itself. Empty when nothing is gained.
 */
function recoverItems(item: JsonItem): JsonItem[] {
  if (item.indent < 0) return [];
  const starts = [0];
  for (const match of item.text.matchAll(/\n([ \t]{0,200})\{/g)) if (match[1].length === item.indent) starts.push(match.index + match[0].length - 1);
  const pieces: JsonItem[] = [];
  let line = item.line;
  let counted = 0;
  let valid = false;
  starts.forEach((start, index) => {
    for (let at = item.text.indexOf('\n', counted); at >= 0 && at < start; at = item.text.indexOf('\n', counted)) {
      line += 1;
      counted = at + 1;
    }
    const text = item.text.slice(start, starts[index + 1]).trimEnd().replace(/[,\]]$/, '').trimEnd().replace(/,$/, '');
    // Without any indentation nested objects look like items: there only whole lines are believed.
    valid ||= (item.indent > 0 || !text.includes('\n')) && isJsonObject(text);
    pieces.push({ ...item, text, line });
  });
  return valid ? pieces : [];
}

function isJsonObject(text: string): boolean {
  try {
    return isObject(JSON.parse(text));
  } catch {
    return false;
  }
}

/** Lines on which the elements of an item's own array begin; empty when the item stands on one line. */
export function elementLines(item: JsonItem, name: string): number[] {
  const { text } = item;
  if (!text.includes('\n')) return [];
  const lines: number[] = [];
  let line = item.line;
  let depth = 0;
  let listDepth = -1;
  let string = -1;
  let last = '';
  for (let at = 0; at < text.length; at += 1) {
    const code = text.charCodeAt(at);
    if (code === 10) line += 1;
    else if (string >= 0) {
      if (code === 92) at += 1;
      else if (code === 34) {
        last = text.slice(string, Math.min(at, string + 40));
        string = -1;
      }
    } else if (code === 34) string = at + 1;
    else if (code === 123 || code === 91) {
      if (code === 91 && listDepth < 0 && depth <= 2 && last === name) listDepth = depth + 1;
      else if (depth === listDepth && code === 123) lines.push(line);
      depth += 1;
    } else if (code === 125 || code === 93) {
      depth -= 1;
      if (depth < listDepth) return lines;
    }
  }
  return lines;
}

