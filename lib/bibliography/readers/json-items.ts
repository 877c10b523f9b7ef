/**
 * Finds the items of a JSON file as its text comes in: the elements of the outermost array, or of an array `items`, `references`, `data` or
 * `results` within an outermost object (also inside its `message`), or that object itself; also one object a line. Each item is parsed by
 * itself, so a file of any size takes the memory of its largest item, and one broken item costs itself alone.
 */
export interface JsonItem {
  text: string;
  line: number;
  /** Blanks before it on its line; -1 when something else stands before it. */
  indent: number;
  /** Nested deeper than any record is: not to be parsed. */
  tooDeep: boolean;
}

const listNames = new Set(['items', 'references', 'data', 'results', 'works', 'records']);
const envelopeNames = new Set(['message', 'data', 'response']);
/** An item longer or deeper than this is no bibliographic record. */
const longestItem = 16_000_000;
const deepest = 64;
const comma = 44;
const newline = 10;

export class JsonItemScanner {
  private text = '';
  private at = 0;
  private line = 1;
  private inString = false;
  private escaped = false;
  private depth = 0;
  /** Number of brackets around the elements that are items; 0 before a list was found. */
  private listDepth = 0;
  /** Names of the objects that enclose this place, as far as a list may still stand in them; null once it may not. */
  private envelope: string[] | null = [];
  private itemStart = -1;
  private itemLine = 0;
  private itemIndent = -1;
  private itemDeepest = 0;
  private itemIsScalar = false;
  /** Until a list is found the outermost object may itself be the item. */
  private rootStart = -1;
  private rootLine = 1;
  private rootDeepest = 0;
  private foundList = false;
  private stringStart = -1;
  private lastString = '';
  /** One object a line: known once an outermost object ended on the line on which it began. */
  private lineByLine = false;
  /** Depth of an array that becomes the list if an object follows. */
  private listToBe = 0;
  private strayLine = 0;
  private dropping = false;
  /** Blanks since the line began; -1 once something else stood on it. */
  private blanks = 0;

  constructor(private readonly onItem: (item: JsonItem) => void, private readonly onFault: (code: string, message: string, line: number) => void) {}

  write(chunk: string): void {
    this.text += chunk;
    this.scan();
    this.forget();
  }

  end(): void {
    if (this.itemStart >= 0) {
      this.give(this.itemStart, this.text.length, this.itemLine, this.itemDeepest, this.itemIndent);
      this.onFault('file-cut-short', 'The file ends within an item.', this.line);
    } else if (this.depth > 0) {
      if (this.rootStart >= 0 && !this.foundList) this.give(this.rootStart, this.text.length, this.rootLine, this.rootDeepest);
      this.onFault('file-cut-short', 'The file ends before its brackets are closed.', this.line);
    }
    this.text = '';
  }

  private give(start: number, end: number, line: number, depth: number, indent = -1): void {
    this.onItem({ text: this.text.slice(start, end).trimEnd(), line, indent, tooDeep: depth > deepest });
  }

  /** Drops the text that nothing may be cut from any more. */
  private forget(): void {
    const begun = this.itemStart >= 0 ? this.itemStart : this.foundList ? -1 : this.rootStart;
    if (begun >= 0 && this.text.length - begun > longestItem) {
      this.onFault('item-too-long', `An item is longer than ${longestItem} characters; it was left out.`, this.itemStart >= 0 ? this.itemLine : this.rootLine);
      this.dropping = this.itemStart >= 0;
      this.itemStart = -1;
      this.rootStart = -1;
      this.stringStart = -1;
      return this.drop(this.at);
    }
    // A string that is no name can be dropped: names are short.
    if (begun < 0 && this.at - this.stringStart > 100) this.stringStart = -1;
    this.drop(begun >= 0 ? begun : this.stringStart >= 0 ? this.stringStart : this.at);
  }

  private drop(until: number): void {
    if (until === 0) return;
    this.text = this.text.slice(until);
    this.at -= until;
    if (this.itemStart >= 0) this.itemStart -= until;
    if (this.rootStart >= 0) this.rootStart -= until;
    if (this.stringStart >= 0) this.stringStart -= until;
  }

  private open(isArray: boolean): void {
    const { depth } = this;
    this.depth += 1;
    if (depth === 0) {
      this.foundList = isArray;
      this.listDepth = isArray ? 1 : 0;
      this.rootStart = isArray ? -1 : this.at;
      this.rootLine = this.line;
      this.rootDeepest = 0;
      this.envelope = [];
    } else if (this.listDepth === 0) this.openInEnvelope(isArray, depth);
    else if (depth === this.listDepth && this.itemStart < 0 && !this.dropping) this.beginItem(false);
    this.itemDeepest = Math.max(this.itemDeepest, this.depth - this.listDepth);
    this.rootDeepest = Math.max(this.rootDeepest, this.depth);
  }

  /** Only the envelopes that exporters write lead to a list; "references" within one record does not. */
  private openInEnvelope(isArray: boolean, depth: number): void {
    if (this.envelope === null || this.envelope.length !== depth - 1) return;
    if (!isArray) {
      if (envelopeNames.has(this.lastString) && depth < 3) this.envelope.push(this.lastString);
      return;
    }
    if (listNames.has(this.lastString)) this.listToBe = depth + 1;
  }

  /** A list of objects, not of texts: "references": ["a", "b"] is a field of the object. */
  private decideList(code: number): void {
    if (code === 123 || code === 93) {
      this.listDepth = this.listToBe;
      this.foundList = true;
    }
    this.listToBe = 0;
  }

  private beginItem(scalar: boolean): void {
    this.itemStart = this.at;
    this.itemLine = this.line;
    this.itemIndent = this.blanks;
    this.itemDeepest = 0;
    this.itemIsScalar = scalar;
  }

  private endItem(end: number): void {
    this.give(this.itemStart, end, this.itemLine, this.itemDeepest, this.itemIndent);
    this.itemStart = -1;
  }

  private close(): void {
    if (this.depth === 0) return this.stray();
    if (this.itemStart >= 0 && this.itemIsScalar) this.endItem(this.at);
    this.depth -= 1;
    const { depth } = this;
    if (this.listDepth > 0 && depth === this.listDepth) {
      this.dropping = false;
      if (this.itemStart >= 0) this.endItem(this.at + 1);
    } else if (depth === 0) {
      if (this.rootStart >= 0 && !this.foundList) this.give(this.rootStart, this.at + 1, this.rootLine, this.rootDeepest);
      if (this.rootStart >= 0 && this.rootLine === this.line) this.lineByLine = true;
      this.rootStart = -1;
      this.listDepth = 0;
    } else if (depth < this.listDepth) this.listDepth = 1_000_000;
    else if (this.envelope && this.envelope.length > depth - 1 && this.listDepth === 0) this.envelope.length = Math.max(0, depth - 1);
  }

  /** Anything else than brackets, strings and blanks. */
  private other(code: number): void {
    if (this.depth === 0) {
      if (code !== comma && code !== 0xfeff) this.stray();
    } else if (this.depth === this.listDepth) {
      if (code === comma) {
        if (this.itemStart >= 0) this.endItem(this.at);
      } else if (this.itemStart < 0) this.beginItem(true);
    }
  }

  private stray(): void {
    if (this.strayLine !== this.line) this.onFault('stray-text', 'Text outside the JSON values of the file.', this.line);
    this.strayLine = this.line;
  }

  private lineEnd(): void {
    this.line += 1;
    // A string cannot go over a line end: one that does was never closed.
    this.inString = false;
    this.escaped = false;
    this.stringStart = -1;
    this.blanks = 0;
  }

  /** One object a line: an object left open costs its own line, not the file. */
  private cutAtLine(): void {
    if (!this.lineByLine || this.blanks !== 0 || this.depth === 0 || this.rootStart < 0 || this.foundList) return;
    this.give(this.rootStart, this.at, this.rootLine, this.rootDeepest);
    this.rootStart = -1;
    this.depth = 0;
  }

  private scanString(): void {
    const { text } = this;
    let { at } = this;
    for (; at < text.length; at += 1) {
      const code = text.charCodeAt(at);
      if (this.escaped) this.escaped = false;
      else if (code === 92) this.escaped = true;
      else if (code === 34) {
        this.inString = false;
        this.lastString = this.stringStart >= 0 && at - this.stringStart < 40 ? text.slice(this.stringStart, at) : '';
        this.stringStart = -1;
        at += 1;
        break;
      }
      if (code === newline) break;
    }
    this.at = at;
  }

  private scan(): void {
    const { text } = this;
    while (this.at < text.length) {
      if (this.inString) {
        this.scanString();
        if (this.inString && this.at >= text.length) return;
        if (!this.inString) continue;
      }
      const code = text.charCodeAt(this.at);
      if (code === newline) this.lineEnd();
      else if (code <= 32) this.blanks += this.blanks < 0 ? 0 : 1;
      else {
        if (this.listToBe > 0) this.decideList(code);
        this.significant(code);
        this.blanks = -1;
      }
      this.at += 1;
    }
  }

  private significant(code: number): void {
    if (code === 123) {
      this.cutAtLine();
      this.open(false);
    } else if (code === 91) this.open(true);
    else if (code === 125 || code === 93) this.close();
    else {
      if (this.depth === this.listDepth || this.depth === 0) this.other(code);
      if (code !== 34) return;
      this.inString = true;
      this.stringStart = this.at + 1;
    }
  }
}
