/** Takes the body of one BibTeX entry apart: key and fields, with recovery at each fault. Linear in the length of the body. */

export interface BibtexField {
  value: string;
  /** Line of the field's name. */
  line: number;
  /** Line on which the value begins. */
  valueLine: number;
}

/** After this many values without end nothing further is read of an entry. */
const mostEndless = 20;

export type Fault = (code: string, message: string, line: number) => void;

const monthNames = new Map(['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December'].map((name) => [name.slice(0, 3).toLowerCase(), name]));
/** Where the next field seems to begin, after a value whose end was not found. */
const nextField = /[}"]?,?[ \t]{0,200}\n[ \t]{0,200}[A-Za-z][\w-]{0,60}[ \t]{0,200}=/g;
const fieldFollows = /[A-Za-z][\w:-]{0,60}\s{0,200}=/y;
const resyncAt = /[,;\n][ \t\n]{0,200}(?=[A-Za-z][\w:-]{0,60}[ \t]{0,200}=)/g;

/** 1 for the characters that end a name: blanks and , = { } " ( ) # */
const endsName = new Uint8Array(128);
for (let code = 0; code <= 32; code += 1) endsName[code] = 1;
for (const character of ',={}"()#') endsName[character.charCodeAt(0)] = 1;

export class BibtexBodyReader {
  private at = 0;
  private line: number;
  /** Place of the next line end behind those counted; -1 when there is none. */
  private nextLineEnd: number;
  /** Values whose end was not found. Each costs a look at all the rest, so they are counted. */
  private endless = 0;

  constructor(private readonly text: string, firstLine: number, private readonly macros: ReadonlyMap<string, string>, private readonly growth: number, private readonly fault: Fault) {
    this.line = firstLine;
    this.nextLineEnd = text.indexOf('\n');
  }

  /** Line of a place; places are asked for in ascending order, so counting is linear. */
  private lineOf(place: number): number {
    while (this.nextLineEnd >= 0 && this.nextLineEnd < place) {
      this.line += 1;
      this.nextLineEnd = this.text.indexOf('\n', this.nextLineEnd + 1);
    }
    return this.line;
  }

  /** Blanks, and comments between tokens. */
  private skipBlanks(): void {
    const { text } = this;
    let { at } = this;
    for (;;) {
      while (at < text.length && text.charCodeAt(at) <= 32) at += 1;
      if (text.charCodeAt(at) !== 37) break;
      const end = text.indexOf('\n', at);
      at = end < 0 ? text.length : end;
    }
    this.at = at;
  }

  private readName(): string {
    const { text } = this;
    const start = this.at;
    let at = start;
    for (; at < text.length; at += 1) {
      const code = text.charCodeAt(at);
      if (code < 128 && endsName[code] === 1) break;
    }
    this.at = at;
    return text.slice(start, at);
  }

  /** The citation key; '' when the entry begins with a field at once. */
  readKey(): string {
    const { text } = this;
    this.skipBlanks();
    const start = this.at;
    while (this.at < text.length && !',=\n}'.includes(text[this.at])) this.at += 1;
    if (text[this.at] === '=') {
      this.at = start;
      return '';
    }
    const key = text.slice(start, this.at).trim();
    this.skipBlanks();
    if (text[this.at] === ',') this.at += 1;
    return key;
  }

  /** A quote ends a value only where something that may follow a value follows it: M\"uller and "so called" words stand in real files. */
  private endsQuoted(place: number): boolean {
    const { text } = this;
    let at = place + 1;
    while (at < text.length && text.charCodeAt(at) <= 32) at += 1;
    if (at >= text.length || ',#})%'.includes(text[at])) return true;
    fieldFollows.lastIndex = at;
    return fieldFollows.test(text);
  }

  /** The text of a delimited value; on a missing end, up to where the next field seems to begin. */
  private delimited(quoted: boolean): string {
    const { text } = this;
    const start = this.at + 1;
    let depth = quoted ? 0 : 1;
    let place = start;
    for (; place < text.length; place += 1) {
      const code = text.charCodeAt(place);
      if (code === 123) depth += 1;
      else if (code === 125) {
        depth -= 1;
        if (!quoted && depth === 0) break;
      } else if (quoted && code === 34 && depth <= 0) {
        if (this.endsQuoted(place)) break;
        this.fault('quote-in-value', 'A quotation mark within a quoted value was kept as text.', this.lineOf(place));
      }
    }
    if (place < text.length) {
      this.at = place + 1;
      return text.slice(start, place);
    }
    this.fault('unbalanced-braces', quoted ? 'A quoted value has no end; it was taken up to the next field.' : 'Braces do not balance in a value; it was taken up to the next field.', this.lineOf(start));
    this.endless += 1;
    nextField.lastIndex = start;
    const match = this.endless <= mostEndless ? nextField.exec(text) : null;
    this.at = match ? match.index + match[0].indexOf('\n') : text.length;
    const value = text.slice(start, match ? match.index : text.length);
    let end = value.length;
    while (end > 0 && (value.charCodeAt(end - 1) <= 32 || ')},'.includes(value[end - 1]))) end -= 1;
    return value.slice(0, end);
  }

  /** One piece of a value; null when there is none. */
  private piece(): string | null {
    const { text } = this;
    const character = text[this.at];
    if (character === '{') return this.delimited(false);
    if (character === '"') return this.delimited(true);
    const start = this.at;
    const word = this.readName();
    if (word === '') {
      this.fault('value-missing', 'A value is missing.', this.lineOf(start));
      return null;
    }
    const name = word.toLowerCase();
    const macro = this.macros.get(name) ?? monthNames.get(name);
    if (macro === undefined && !/^\d/.test(word)) this.fault('undefined-abbreviation', `The abbreviation "${word.slice(0, 60)}" is not defined; it was kept as text.`, this.lineOf(start));
    return macro ?? word;
  }

  private readValue(): string {
    const { text } = this;
    let value: string | null = null;
    for (;;) {
      this.skipBlanks();
      if (this.at >= text.length) {
        this.fault('value-missing', 'A value is missing.', this.lineOf(this.at));
        break;
      }
      const piece = this.piece();
      if (piece === null) break;
      if (value === null) value = piece;
      else if (value.length + piece.length <= this.growth) value += piece;
      else if (value.length < this.growth) {
        this.fault('value-too-long', 'A value grows beyond measure through its abbreviations; it was cut.', this.lineOf(this.at));
        value = (value + piece).slice(0, this.growth);
      }
      this.skipBlanks();
      if (text[this.at] !== '#') break;
      this.at += 1;
    }
    return value ?? '';
  }

  /** Goes on behind the next comma or line end that is followed by "name =". False when there is none. */
  private resync(): boolean {
    resyncAt.lastIndex = this.at;
    const match = resyncAt.exec(this.text);
    if (!match) return false;
    this.at = match.index + match[0].length;
    return true;
  }

  private keep(fields: Map<string, BibtexField>, name: string, field: BibtexField): void {
    const former = fields.get(name);
    if (!former) fields.set(name, field);
    else if (former.value !== field.value) this.fault('repeated-field', `The field "${name.slice(0, 60)}" stands twice; the first one counts.`, field.line);
  }

  /** Behind a value: a comma, the end, or a fault to recover from. False when nothing more can be read. */
  private separate(name: string): boolean {
    const { text } = this;
    this.skipBlanks();
    const character = text[this.at];
    if (character === undefined || character === ',') return true;
    if (character === ')' || character === '}') {
      this.at += 1;
      return true;
    }
    fieldFollows.lastIndex = this.at;
    this.fault('comma-expected', `A comma was expected after "${name.slice(0, 60)}".`, this.lineOf(this.at));
    return fieldFollows.test(text) || this.resync();
  }

  readFields(): Map<string, BibtexField> {
    const { text } = this;
    const fields = new Map<string, BibtexField>();
    for (;;) {
      this.skipBlanks();
      if (this.at >= text.length) break;
      if (text[this.at] === ',') {
        this.at += 1;
        continue;
      }
      const start = this.at;
      const name = this.readName().toLowerCase();
      this.skipBlanks();
      if (name === '' || text[this.at] !== '=') {
        this.fault('field-expected', name ? `"=" was expected after "${name.slice(0, 60)}".` : 'The name of a field was expected.', this.lineOf(start));
        if (!this.resync()) break;
        continue;
      }
      this.at += 1;
      const line = this.lineOf(start);
      this.skipBlanks();
      const valueLine = this.lineOf(this.at);
      this.keep(fields, name, { value: this.readValue(), line, valueLine });
      if (!this.separate(name)) break;
    }
    return fields;
  }
}

const isBlank = (code: number) => code <= 32 || code === 160;

/** Parts at "and" or at commas that stand outside braces; at most `most` parts, the last one then holds the rest. */
export function splitOutsideBraces(text: string, separator: 'and' | ',', most = Infinity): string[] {
  const parts: string[] = [];
  let depth = 0;
  let start = 0;
  for (let at = 0; at < text.length && parts.length + 1 < most; at += 1) {
    const code = text.charCodeAt(at);
    if (code === 92) at += 1;
    else if (code === 123) depth += 1;
    else if (code === 125) depth = Math.max(0, depth - 1);
    else if (depth > 0) continue;
    else if (separator === ',') {
      if (code !== 44) continue;
      parts.push(text.slice(start, at).trim());
      start = at + 1;
    } else if ((code === 97 || code === 65) && at > 0 && isBlank(text.charCodeAt(at - 1)) && isBlank(text.charCodeAt(at + 3)) && text.slice(at, at + 3).toLowerCase() === 'and') {
      parts.push(text.slice(start, at).trim());
      start = at + 3;
      at += 2;
    }
  }
  parts.push(text.slice(start).trim());
  return parts;
}
