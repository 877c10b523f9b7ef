/** Takes the body of one BibTeX entry apart: key and fields, with recovery at each fault. */

export interface BibtexField {
  value: string;
  line: number;
}

export interface BibtexBody {
  key: string;
  fields: Map<string, BibtexField>;
}

type Fault = (code: string, message: string, line: number) => void;

const monthNames = new Map(['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December'].map((name) => [name.slice(0, 3).toLowerCase(), name]));
const nameEnd = /[\s,={}"()#]/;
/** Where the next field seems to begin, after a value whose end was not found. */
const nextField = /[}"]?,?[ \t]*\n[ \t]*[A-Za-z][\w-]*[ \t]*=/g;

export class BibtexBodyReader {
  private at = 0;
  private lineAt = 0;
  private line: number;

  constructor(private readonly text: string, firstLine: number, private readonly macros: ReadonlyMap<string, string>, private readonly growth: number, private readonly fault: Fault) {
    this.line = firstLine;
  }

  /** Line of a place; places are asked for in ascending order, so counting is linear. */
  private lineOf(place: number): number {
    for (; this.lineAt < place && this.lineAt < this.text.length; this.lineAt += 1) if (this.text.charCodeAt(this.lineAt) === 10) this.line += 1;
    return this.line;
  }

  /** Blanks, and comments between tokens. */
  private skipBlanks(): void {
    const { text } = this;
    for (;;) {
      while (this.at < text.length && text.charCodeAt(this.at) <= 32) this.at += 1;
      if (text[this.at] !== '%') return;
      while (this.at < text.length && text[this.at] !== '\n') this.at += 1;
    }
  }

  private readKey(): string {
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
      } else if (quoted && code === 34 && depth <= 0) break;
    }
    if (place < text.length) {
      this.at = place + 1;
      return text.slice(start, place);
    }
    this.fault('unbalanced-braces', quoted ? 'A quoted value has no end; it was taken up to the next field.' : 'Braces do not balance in a value; it was taken up to the next field.', this.lineOf(start));
    nextField.lastIndex = start;
    const match = nextField.exec(text);
    const end = match ? match.index : text.length;
    this.at = match ? match.index + match[0].search(/\n/) : text.length;
    return text.slice(start, end).replace(/[)}\s,]+$/, '');
  }

  private readValue(): string {
    const { text } = this;
    const pieces: string[] = [];
    let length = 0;
    for (;;) {
      this.skipBlanks();
      if (this.at >= text.length) {
        this.fault('value-missing', 'A value is missing.', this.lineOf(this.at));
        break;
      }
      const character = text[this.at];
      let piece = '';
      if (character === '{') piece = this.delimited(false);
      else if (character === '"') piece = this.delimited(true);
      else {
        const start = this.at;
        while (this.at < text.length && !nameEnd.test(text[this.at])) this.at += 1;
        const word = text.slice(start, this.at);
        if (word === '') {
          this.fault('value-missing', 'A value is missing.', this.lineOf(this.at));
          this.at += 1;
          break;
        }
        const macro = this.macros.get(word.toLowerCase()) ?? monthNames.get(word.toLowerCase());
        if (macro !== undefined) piece = macro;
        else {
          piece = word;
          if (!/^\d/.test(word)) this.fault('undefined-abbreviation', `The abbreviation "${word.slice(0, 60)}" is not defined; it was kept as text.`, this.lineOf(start));
        }
      }
      if (length + piece.length > this.growth) {
        this.fault('value-too-long', 'A value grows beyond measure through its abbreviations; it was cut.', this.lineOf(this.at));
        pieces.push(piece.slice(0, Math.max(0, this.growth - length)));
        length = this.growth;
      } else {
        pieces.push(piece);
        length += piece.length;
      }
      this.skipBlanks();
      if (text[this.at] !== '#') break;
      this.at += 1;
    }
    return pieces.join('');
  }

  /** Goes on behind the next comma or line end that is followed by "name =". False when there is none. */
  private resync(): boolean {
    const pattern = /[,;\n][ \t\n]*(?=[A-Za-z][\w-]*[ \t]*=)/g;
    pattern.lastIndex = this.at;
    const match = pattern.exec(this.text);
    if (!match) return false;
    this.at = match.index + match[0].length;
    return true;
  }

  read(withKey: boolean): BibtexBody {
    const { text } = this;
    const key = withKey ? this.readKey() : '';
    const fields = new Map<string, BibtexField>();
    while (this.at < text.length) {
      this.skipBlanks();
      if (text[this.at] === ',') {
        this.at += 1;
        continue;
      }
      if (this.at >= text.length) break;
      const start = this.at;
      while (this.at < text.length && !nameEnd.test(text[this.at])) this.at += 1;
      const name = text.slice(start, this.at).toLowerCase();
      this.skipBlanks();
      if (name === '' || text[this.at] !== '=') {
        this.fault('field-expected', name ? `"=" was expected after "${name.slice(0, 60)}".` : 'The name of a field was expected.', this.lineOf(start));
        if (name === '') this.at = Math.max(this.at, start);
        if (!this.resync()) break;
        continue;
      }
      this.at += 1;
      const line = this.lineOf(start);
      const value = this.readValue();
      const former = fields.get(name);
      if (!former) fields.set(name, { value, line });
      else if (former.value !== value) this.fault('repeated-field', `The field "${name.slice(0, 60)}" stands twice; the first one counts.`, line);
      this.skipBlanks();
      if (this.at < text.length && text[this.at] !== ',') {
        if (text[this.at] !== ')' && text[this.at] !== '}' && !/^[A-Za-z][\w-]*[ \t]*=/.test(text.slice(this.at, this.at + 80))) {
          this.fault('comma-expected', `A comma was expected after "${name.slice(0, 60)}".`, this.lineOf(this.at));
          if (!this.resync()) break;
        } else if (text[this.at] === ')' || text[this.at] === '}') this.at += 1;
      }
    }
    return { key, fields };
  }
}

/** Parts at a separator word or sign that stands outside braces. */
export function splitOutsideBraces(text: string, separator: 'and' | ','): string[] {
  const parts: string[] = [];
  let depth = 0;
  let start = 0;
  for (let at = 0; at < text.length; at += 1) {
    const code = text.charCodeAt(at);
    if (code === 92) at += 1;
    else if (code === 123) depth += 1;
    else if (code === 125) depth -= 1;
    else if (depth > 0) continue;
    else if (separator === ',' ? code === 44 : code <= 32 && /^\sand\s/i.test(text.slice(at, at + 5))) {
      parts.push(text.slice(start, at));
      at += separator === ',' ? 0 : 3;
      start = at + 1;
    }
  }
  parts.push(text.slice(start));
  return parts.map((part) => part.trim());
}
