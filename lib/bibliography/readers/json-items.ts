/**
 * Finds the items of a JSON file as its text comes in: the elements of the outermost array, or of `message.items`, `items` or `references`
 * within an outermost object, or that object itself; also one object a line. Each item is parsed by itself, so a file of any size takes the
 * memory of its largest item, and one broken item costs itself alone.
 */
export interface JsonItem {
  text: string;
  line: number;
}

const listNames = new Set(['items', 'message', 'references', 'data']);
/** An item longer or deeper than this is no bibliographic record. */
const longestItem = 16_000_000;
const deepest = 64;

export class JsonItemScanner {
  private text = '';
  private at = 0;
  private line = 1;
  private inString = false;
  private escaped = false;
  private stack: ('[' | '{')[] = [];
  /** Depth of the list whose elements are items; -1 before one was found. */
  private listDepth = -1;
  private itemStart = -1;
  private itemLine = 0;
  private stringStart = -1;
  private lastString = '';
  private rootStart = -1;
  private rootLine = 1;
  private found = false;

  constructor(private readonly onItem: (item: JsonItem) => void, private readonly onFault: (code: string, message: string, line: number) => void) {}

  write(chunk: string): void {
    this.text += chunk;
    this.scan();
    const keep = this.itemStart >= 0 ? this.itemStart : this.rootStart >= 0 && !this.found ? this.rootStart : this.stringStart >= 0 && this.inString ? this.stringStart : this.at;
    if (keep > 0) this.drop(keep);
    if (this.itemStart >= 0 && this.text.length > longestItem) {
      this.onFault('item-too-long', `An item is longer than ${longestItem} characters; it was left out.`, this.itemLine);
      this.itemStart = -1;
      this.drop(this.at);
    } else if (this.itemStart < 0 && this.text.length > longestItem * 4) {
      this.onFault('item-too-long', 'The file is one object beyond measure; it cannot be read.', this.rootLine);
      this.found = true;
      this.drop(this.at);
    }
  }

  end(): void {
    if (this.itemStart >= 0) {
      this.onItem({ text: this.text.slice(this.itemStart), line: this.itemLine });
      this.onFault('file-cut-short', 'The file ends within an item.', this.line);
    } else if (this.stack.length > 0) this.onFault('file-cut-short', 'The file ends before its brackets are closed.', this.line);
  }

  private drop(until: number): void {
    this.text = this.text.slice(until);
    this.at -= until;
    if (this.itemStart >= 0) this.itemStart -= until;
    if (this.rootStart >= 0) this.rootStart -= until;
    if (this.stringStart >= 0) this.stringStart -= until;
  }

  private open(bracket: '[' | '{'): void {
    const depth = this.stack.length;
    if (depth === 0) {
      this.found = false;
      this.rootStart = bracket === '{' ? this.at : -1;
      this.rootLine = this.line;
      this.listDepth = bracket === '[' ? 0 : -1;
    } else if (this.listDepth < 0 && bracket === '[' && depth <= 2 && listNames.has(this.lastString) && this.lastString !== 'message') {
      // A list of objects, not of texts: "references": ["a", "b"] is a field of the object.
      if (/^\s*(?:\{|\])/.test(this.text.slice(this.at + 1, this.at + 200)) && this.parents()) this.listDepth = depth;
    } else if (this.listDepth >= 0 && depth === this.listDepth + 1 && this.itemStart < 0) {
      this.itemStart = this.at;
      this.itemLine = this.line;
    }
    this.stack.push(bracket);
    if (this.stack.length === deepest && this.itemStart >= 0) this.onFault('too-deep', `An item is nested deeper than ${deepest}; it may not be read.`, this.line);
    if (this.stack.length > 100_000) this.stack.length = 100_000;
  }

  /** Only the envelopes that exporters write lead to a list; "reference" of one record does not. */
  private parents(): boolean {
    return this.stack.every((bracket) => bracket === '{');
  }

  private close(): void {
    this.stack.pop();
    const depth = this.stack.length;
    if (this.itemStart >= 0 && depth === this.listDepth + 1) {
      this.found = true;
      this.onItem({ text: this.text.slice(this.itemStart, this.at + 1), line: this.itemLine });
      this.itemStart = -1;
    } else if (depth === 0) {
      if (!this.found && this.rootStart >= 0 && this.listDepth < 0) this.onItem({ text: this.text.slice(this.rootStart, this.at + 1), line: this.rootLine });
      this.rootStart = -1;
      this.listDepth = -1;
    } else if (depth === this.listDepth) this.found = true;
  }

  private scan(): void {
    const { text } = this;
    for (; this.at < text.length; this.at += 1) {
      const code = text.charCodeAt(this.at);
      if (code === 10) this.line += 1;
      if (this.inString) {
        if (this.escaped) this.escaped = false;
        else if (code === 92) this.escaped = true;
        else if (code === 34) {
          this.inString = false;
          this.lastString = this.at - this.stringStart < 40 ? text.slice(this.stringStart, this.at) : '';
          this.stringStart = -1;
        }
      } else if (code === 34) {
        this.inString = true;
        this.stringStart = this.at + 1;
      } else if (code === 123) this.open('{');
      else if (code === 91) this.open('[');
      else if (code === 125 || code === 93) this.close();
    }
  }
}

/** A JSON object as nothing is known of it. */
export type JsonObject = Record<string, unknown>;

export const isObject = (value: unknown): value is JsonObject => typeof value === 'object' && value !== null && !Array.isArray(value);

/** Own property as text: numbers become text, everything else is no value. Inherited names such as __proto__ are never followed. */
export function textOf(object: JsonObject, ...names: string[]): string | undefined {
  for (const name of names) {
    const value = Object.hasOwn(object, name) ? object[name] : undefined;
    const single = Array.isArray(value) ? value[0] : value;
    if (typeof single === 'string' && single.trim() !== '') return single.replace(/<\/?(?:i|b|sub|sup|em|strong|scp|jats:[a-z]+|span|p|title)\b[^<>]{0,200}>/gi, '').replace(/&amp;/g, '&').replace(/&lt;/g, '<').replace(/&gt;/g, '>').replace(/\s+/g, ' ').trim().normalize('NFC');
    if (typeof single === 'number' && Number.isFinite(single)) return String(single);
  }
  return undefined;
}

/** Own property as a list; one object or text counts as a list of one. */
export function listOf(object: JsonObject, name: string): unknown[] {
  const value = Object.hasOwn(object, name) ? object[name] : undefined;
  return Array.isArray(value) ? value : value === undefined || value === null ? [] : [value];
}

/** Year, month and day of a date with `date-parts`, `raw` or `literal`. */
export function datePartsOf(value: unknown): number[] {
  if (!isObject(value)) return [];
  const [first] = listOf(value, 'date-parts');
  const parts = Array.isArray(first) ? first : [];
  return parts.map(Number).filter((part) => Number.isInteger(part) && part > 0);
}
