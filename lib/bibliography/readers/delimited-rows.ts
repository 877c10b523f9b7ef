import { LineSplitter } from '@/lib/bibliography/readers/lines';

export interface DelimitedRow {
  cells: string[];
  /** Line on which the row begins, from 1. */
  line: number;
  /** The row as it stood, its lines joined. */
  raw: string;
  /** A quotation mark was opened and never closed; the line was taken as it stands, marks included. */
  unclosed: boolean;
}

export const delimiters = [',', ';', '\t', '|'] as const;
export type Delimiter = (typeof delimiters)[number];

/** A field in quotation marks over more lines than this was opened by mistake. */
const mostLines = 200;

/**
 * Cells of a row by RFC 4180: quotation marks around a cell, doubled within it, line ends allowed inside. Null while a quotation is open.
 * A mark in the middle of a bare cell is an ordinary character, as spreadsheets write it.
 */
export function splitCells(text: string, delimiter: Delimiter): string[] | null {
  const cells: string[] = [];
  for (let at = 0; ; ) {
    if (text[at] === '"') {
      let cell = '';
      for (let from = at + 1; ; ) {
        const mark = text.indexOf('"', from);
        if (mark < 0) return null;
        cell += text.slice(from, mark);
        if (text[mark + 1] === '"') {
          cell += '"';
          from = mark + 2;
          continue;
        }
        at = mark + 1;
        break;
      }
      // What stands between the closing mark and the delimiter belongs to the cell.
      const end = text.indexOf(delimiter, at);
      cells.push(cell + text.slice(at, end < 0 ? text.length : end));
      if (end < 0) return cells;
      at = end + 1;
    } else {
      const end = text.indexOf(delimiter, at);
      cells.push(text.slice(at, end < 0 ? text.length : end));
      if (end < 0) return cells;
      at = end + 1;
    }
  }
}

/** True when, after these lines, a quotation is still open. Looks at the new line only. */
function staysOpen(open: boolean, line: string, delimiter: Delimiter): boolean {
  let within = open;
  let atStart = !open;
  for (let at = 0; at < line.length; at += 1) {
    const sign = line[at];
    if (within) {
      if (sign !== '"') continue;
      if (line[at + 1] === '"') at += 1;
      else within = false;
    } else if (sign === '"' && atStart) within = true;
    atStart = !within && sign === delimiter;
  }
  return within;
}

/** Rows of a delimited table from pushed text. A quotation that is opened by mistake costs its own line and no other. */
export class DelimitedRows {
  private readonly lines: LineSplitter;
  private pending: { text: string; line: number }[] = [];
  private length = 0;
  private open = false;

  constructor(private readonly delimiter: Delimiter, private readonly longest: number, private readonly onRow: (row: DelimitedRow) => void, onOverlong: (line: number) => void, private readonly firstLine = 0) {
    this.lines = new LineSplitter((text, line) => this.take(text, line + this.firstLine), (line) => onOverlong(line + this.firstLine));
  }

  write(text: string): void {
    this.lines.write(text);
  }

  end(): void {
    this.lines.end();
    while (this.pending.length > 0) this.giveUp();
  }

  private take(text: string, line: number): void {
    if (this.pending.length === 0 && text === '') return;
    this.pending.push({ text, line });
    this.length += text.length + 1;
    this.open = staysOpen(this.open, text, this.delimiter);
    if (!this.open) return this.finish();
    if (this.pending.length > mostLines || this.length > this.longest) this.giveUp();
  }

  private finish(): void {
    const raw = this.pending.map((one) => one.text).join('\n');
    const [{ line }] = this.pending;
    this.pending = [];
    this.length = 0;
    const cells = splitCells(raw, this.delimiter);
    this.onRow({ cells: cells ?? raw.split(this.delimiter), line, raw, unclosed: cells === null });
  }

  /** The first line of what is pending becomes a row as it stands; what came after it is looked at anew. */
  private giveUp(): void {
    const [first, ...rest] = this.pending;
    this.pending = [];
    this.length = 0;
    this.open = false;
    this.onRow({ cells: first.text.split(this.delimiter), line: first.line, raw: first.text, unclosed: true });
    for (const { text, line } of rest) this.take(text, line);
  }
}
