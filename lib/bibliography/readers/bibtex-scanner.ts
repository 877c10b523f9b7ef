/**
 * Finds the entries of a BibTeX file as its text comes in. Each character is looked at once, so time is linear also in a million "@".
 *
 * An entry ends at its closing brace, or, when that is missing, before the next line that begins like an entry: one bad entry never
 * swallows another. A "%" before the "@" of a line comments an entry out, and so does @comment{...}.
 */

export interface ScannedEntry {
  type: string;
  /** Text between the opening and the closing delimiter. */
  body: string;
  raw: string;
  /** Line of the "@". */
  line: number;
  /** Line on which `body` begins. */
  bodyLine: number;
  closed: boolean;
}

const marker = /[ \t]*@[ \t]*[A-Za-z][\w-]{0,60}[ \t]*[{(][ \t]*[^\s,={}()"#%]{0,200}/y;
const opening = /@\s{0,200}([A-Za-z][\w:.+-]{0,60})\s{0,200}([{(])/y;
/** Types that are taken for an entry even when the "@" stands right behind a word, where an address of mail would stand. */
const usualTypes = /^(?:article|book|booklet|inbook|incollection|inproceedings|conference|manual|mastersthesis|phdthesis|thesis|misc|proceedings|techreport|report|unpublished|online|string|preamble|comment)$/;
/** An opening may stand across chunks, and so may the marker of the next entry. */
const lookAhead = 600;
/** An entry longer than this is closed where it is; nothing real comes near. */
const longestEntry = 24_000_000;
/** A comment longer than this was never closed: what follows its first line is read again as entries. */
const longestComment = 2_000_000;

interface OpenEntry {
  type: string;
  start: number;
  bodyStart: number;
  line: number;
  bodyLine: number;
  round: boolean;
  depth: number;
  quoted: boolean;
}

type Fault = (code: string, message: string, line: number) => void;

export class BibtexScanner {
  private text = '';
  private at = 0;
  private line = 1;
  private commented = false;
  private entry: OpenEntry | null = null;
  /** After one comment without end, comments end like entries: the file is read twice at most. */
  private commentsEndAtMarker = false;

  constructor(private readonly onEntry: (entry: ScannedEntry) => void, private readonly onFault: Fault) {}

  write(chunk: string): void {
    this.text += chunk;
    this.scan(false);
  }

  end(): void {
    this.scan(true);
    while (this.entry) {
      if (this.entry.type === 'comment' && !this.commentsEndAtMarker) this.reopenComment();
      else this.finish(this.text.length, false);
      this.scan(true);
    }
    this.text = '';
    this.at = 0;
  }

  private scan(last: boolean): void {
    while (this.entry ? this.scanInside(last) : this.scanOutside(last));
    const keep = this.entry ? this.entry.start : Math.max(0, this.at - 1);
    if (keep === 0) return;
    this.text = this.text.slice(keep);
    this.at -= keep;
    if (this.entry) {
      this.entry.start -= keep;
      this.entry.bodyStart -= keep;
    }
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
        if (this.openEntry()) return true;
      }
      this.at += 1;
    }
    return false;
  }

  private openEntry(): boolean {
    const { text, at } = this;
    const before = at > 0 ? text[at - 1] : '\n';
    opening.lastIndex = at;
    const match = opening.exec(text);
    if (match) {
      const type = match[1].toLowerCase();
      if (/[\w.+-]/.test(before) && !usualTypes.test(type)) return false;
      const { line } = this;
      for (const character of match[0]) if (character === '\n') this.line += 1;
      this.at += match[0].length;
      this.entry = { type, start: at, bodyStart: this.at, line, bodyLine: this.line, round: match[2] === '(', depth: 0, quoted: false };
      return true;
    }
    if (before === '\n' && /^@\s{0,20}[A-Za-z]/.test(text.slice(at, at + 30))) this.onFault('stray-text', `Text that looks like an entry but is none: ${text.slice(at, at + 60).split('\n')[0]}`, this.line);
    return false;
  }

  /** Inside an entry. False when more text is needed. */
  private scanInside(last: boolean): boolean {
    const { text } = this;
    const entry = this.entry as OpenEntry;
    const { length } = text;
    let { depth, quoted } = entry;
    let at = this.at;
    const pause = (): false => {
      entry.depth = depth;
      entry.quoted = quoted;
      this.at = at;
      return false;
    };
    for (; at < length; at += 1) {
      const code = text.charCodeAt(at);
      if (code > 125) continue;
      if (code === 123) depth += 1;
      else if (code === 125) {
        if (depth === 0 && !entry.round) return this.finish(at, true);
        if (depth > 0) depth -= 1;
      } else if (code === 34) {
        if (depth === 0) quoted = !quoted;
      } else if (code === 41) {
        if (entry.round && depth === 0 && !quoted) return this.finish(at, true);
      } else if (code === 10) {
        if (!last && length - at < lookAhead) return pause();
        this.line += 1;
        const ends = entry.type !== 'comment' || this.commentsEndAtMarker;
        if ((ends && this.entryFollows(at + 1)) || at - entry.start > longestEntry) return this.finish(at + 1, false);
        if (!ends && at - entry.start > longestComment) {
          this.reopenComment();
          return true;
        }
      }
    }
    // One line without end: cut it loose before the memory is full.
    if (at - entry.start > longestEntry * 2) return this.finish(at, false);
    return pause();
  }

  /** True when the line at a place begins like an entry. */
  private entryFollows(place: number): boolean {
    const { text } = this;
    let at = place;
    while (text.charCodeAt(at) === 32 || text.charCodeAt(at) === 9) at += 1;
    if (text.charCodeAt(at) !== 64) return false;
    marker.lastIndex = at;
    return marker.test(text);
  }

  private reopenComment(): void {
    const entry = this.entry as OpenEntry;
    this.commentsEndAtMarker = true;
    this.onFault('comment-not-closed', 'A comment has no end; what follows it was read as entries.', entry.line);
    this.entry = null;
    this.at = entry.bodyStart;
    this.line = entry.bodyLine;
    this.commented = false;
  }

  private finish(end: number, closed: boolean): true {
    const entry = this.entry as OpenEntry;
    const { text } = this;
    this.entry = null;
    this.at = closed ? end + 1 : end;
    this.commented = false;
    const raw = text.slice(entry.start, closed ? end + 1 : end);
    this.onEntry({ type: entry.type, body: text.slice(entry.bodyStart, end), raw: closed ? raw : raw.trimEnd(), line: entry.line, bodyLine: entry.bodyLine, closed });
    return true;
  }
}
