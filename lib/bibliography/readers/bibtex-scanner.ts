/**
 * Finds the entries of a BibTeX file as its text comes in. Each character is looked at once, so time is linear also in a million "@".
 *
 * An entry ends at its closing brace, or, when that is missing, before the next line that begins like an entry: one bad entry never
 * swallows another. A "%" before the "@" of a line comments an entry out.
 */

export interface ScannedEntry {
  type: string;
  /** Text between the opening and the closing delimiter. */
  body: string;
  raw: string;
  line: number;
  /** Line on which `body` begins. */
  closed: boolean;
}

const marker = /[ \t]*@[ \t]*[A-Za-z][\w-]*[ \t]*[{(][ \t]*[^\s,={}()"#%]*[ \t]*,?/y;
const opening = /@\s*([A-Za-z][\w:.+-]{0,60})\s*([{(])/y;
/** An opening may stand across chunks, and so may the marker of the next entry. */
const lookAhead = 400;
/** An entry longer than this is closed where it is; nothing real comes near. */
const longestEntry = 24_000_000;

export class BibtexScanner {
  private text = '';
  private at = 0;
  private line = 1;
  private commented = false;
  private entry: { type: string; start: number; bodyStart: number; line: number; round: boolean; depth: number; quoted: boolean } | null = null;

  constructor(private readonly onEntry: (entry: ScannedEntry) => void, private readonly onStray: (text: string, line: number) => void) {}

  write(chunk: string): void {
    this.text += chunk;
    this.scan(false);
  }

  end(): void {
    this.scan(true);
    if (this.entry) this.finish(this.text.length, false);
    this.drop(this.text.length);
  }

  private drop(until: number): void {
    this.text = this.text.slice(until);
    this.at -= until;
    if (this.entry) {
      this.entry.start -= until;
      this.entry.bodyStart -= until;
    }
  }

  private scan(last: boolean): void {
    for (;;) {
      if (this.entry) {
        if (!this.scanInside(last)) break;
      } else if (!this.scanOutside(last)) break;
    }
    const keep = this.entry ? this.entry.start : this.at;
    if (keep > 0) this.drop(keep);
  }

  /** Between entries. False when more text is needed. */
  private scanOutside(last: boolean): boolean {
    const { text } = this;
    while (this.at < text.length) {
      const code = text.charCodeAt(this.at);
      if (code === 10) {
        this.line += 1;
        this.commented = false;
      } else if (code === 37) this.commented = true;
      else if (code === 64 && !this.commented) {
        if (!last && text.length - this.at < lookAhead) return false;
        opening.lastIndex = this.at;
        const match = opening.exec(text);
        if (match) {
          this.entry = { type: match[1].toLowerCase(), start: this.at, bodyStart: this.at + match[0].length, line: this.line, round: match[2] === '(', depth: 0, quoted: false };
          for (const character of match[0]) if (character === '\n') this.line += 1;
          this.at += match[0].length;
          return true;
        }
        if (/^@\s*[A-Za-z]/.test(text.slice(this.at, this.at + 40)) && text.slice(Math.max(0, this.at - 1), this.at).trim() === '') this.onStray(text.slice(this.at, this.at + 60), this.line);
      }
      this.at += 1;
    }
    return false;
  }

  /** Inside an entry. False when more text is needed. */
  private scanInside(last: boolean): boolean {
    const { text } = this;
    const entry = this.entry as NonNullable<typeof this.entry>;
    for (; this.at < text.length; this.at += 1) {
      const code = text.charCodeAt(this.at);
      if (code === 123) entry.depth += 1;
      else if (code === 125) {
        if (entry.depth === 0 && !entry.round) {
          this.finish(this.at, true);
          return true;
        }
        if (entry.depth > 0) entry.depth -= 1;
      } else if (code === 34 && entry.depth === 0) entry.quoted = !entry.quoted;
      else if (code === 41 && entry.round && entry.depth === 0 && !entry.quoted) {
        this.finish(this.at, true);
        return true;
      } else if (code === 10) {
        if (!last && text.length - this.at < lookAhead) return false;
        this.line += 1;
        if (entry.type !== 'comment') {
          marker.lastIndex = this.at + 1;
          if (marker.test(text)) {
            this.at += 1;
            this.finish(this.at, false);
            return true;
          }
        }
        if (this.at - entry.start > longestEntry) {
          this.at += 1;
          this.finish(this.at, false);
          return true;
        }
      }
    }
    // One line without end: cut it loose before the memory is full.
    if (this.at - entry.start > longestEntry * 2) this.finish(this.at, false);
    return false;
  }

  private finish(end: number, closed: boolean): void {
    const entry = this.entry as NonNullable<typeof this.entry>;
    const { text } = this;
    this.entry = null;
    this.at = closed ? end + 1 : end;
    this.commented = false;
    this.onEntry({ type: entry.type, body: text.slice(entry.bodyStart, end), raw: text.slice(entry.start, closed ? end + 1 : end).trimEnd(), line: entry.line, closed });
    if (this.at > 1_000_000) this.drop(this.at);
  }
}
