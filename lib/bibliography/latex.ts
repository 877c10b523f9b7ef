/** TeX text to Unicode (NFC): accents, special letters, dashes, quotes; braces and unknown commands go, their text stays. Linear in length. */

const combining: Record<string, string> = { '`': '\u0300', "'": '\u0301', '^': '\u0302', '~': '\u0303', '=': '\u0304', '.': '\u0307', '"': '\u0308', u: '\u0306', v: '\u030c', H: '\u030b', c: '\u0327', k: '\u0328', r: '\u030a', b: '\u0331', d: '\u0323', t: '\u0361' };

const symbols = new Map(Object.entries({
  ss: 'ß', ae: 'æ', AE: 'Æ', oe: 'œ', OE: 'Œ', aa: 'å', AA: 'Å', o: 'ø', O: 'Ø', l: 'ł', L: 'Ł', i: 'ı', j: 'ȷ', dj: 'đ', DJ: 'Đ', th: 'þ', TH: 'Þ', dh: 'ð', DH: 'Ð', ng: 'ŋ', NG: 'Ŋ',
  textendash: '–', textemdash: '—', ldots: '…', dots: '…', textquoteright: '’', textquoteleft: '‘', textquotedblleft: '“', textquotedblright: '”', guillemotleft: '«', guillemotright: '»',
  copyright: '©', pounds: '£', S: '§', P: '¶', dag: '†', ddag: '‡', textdegree: '°', textregistered: '®', texttrademark: '™', textbackslash: '\\', textasciitilde: '~', textunderscore: '_', textasciicircum: '^',
  TeX: 'TeX', LaTeX: 'LaTeX', BibTeX: 'BibTeX', alpha: 'α', beta: 'β', gamma: 'γ', delta: 'δ', epsilon: 'ε', varepsilon: 'ε', zeta: 'ζ', eta: 'η', theta: 'θ', kappa: 'κ', lambda: 'λ', mu: 'μ', nu: 'ν', xi: 'ξ', pi: 'π',
  rho: 'ρ', sigma: 'σ', tau: 'τ', phi: 'φ', varphi: 'φ', chi: 'χ', psi: 'ψ', omega: 'ω', Gamma: 'Γ', Delta: 'Δ', Theta: 'Θ', Lambda: 'Λ', Pi: 'Π', Sigma: 'Σ', Phi: 'Φ', Psi: 'Ψ', Omega: 'Ω',
  times: '×', pm: '±', leq: '≤', le: '≤', geq: '≥', ge: '≥', infty: '∞', to: '→', rightarrow: '→', approx: '≈', sim: '∼', cdot: '·', circ: '°', slash: '/', quad: ' ', qquad: ' ', space: ' ', textquotesingle: "'", textbar: '|', textless: '<', textgreater: '>', euro: '€',
}));

function place(argument: string, mark: string): string {
  const characters = [...argument];
  if (characters.length === 0) return '';
  const first = characters[0] === 'ı' ? 'i' : characters[0] === 'ȷ' ? 'j' : characters[0];
  let at = 1;
  while (at < characters.length && /\p{M}/u.test(characters[at])) at += 1;
  return first + characters.slice(1, at).join('') + mark + characters.slice(at).join('');
}

class TexText {
  private at = 0;
  private out: string[] = [];
  constructor(private readonly text: string, private readonly depth: number) {}

  /** The argument of a command: a group, a command or one character. */
  private argument(): string {
    const { text } = this;
    while (text[this.at] === ' ') this.at += 1;
    if (this.at >= text.length) return '';
    if (text[this.at] === '{') {
      let depth = 0;
      const start = this.at + 1;
      for (; this.at < text.length; this.at += 1) {
        if (text[this.at] === '{') depth += 1;
        else if (text[this.at] === '}' && (depth -= 1) === 0) break;
      }
      const inside = text.slice(start, this.at);
      this.at += 1;
      // Nested accents are two or three deep; deeper nesting is hostile and stays as it is.
      return this.depth > 20 ? inside : new TexText(inside, this.depth + 1).convert();
    }
    if (text[this.at] === '\\') {
      const command = /\\(?:[A-Za-z]+ ?|[^A-Za-z])/y;
      command.lastIndex = this.at;
      const match = command.exec(text);
      if (match) {
        this.at += match[0].length;
        const word = match[0].slice(1).trim();
        // An accent on an accent: \'{\^o} without its braces.
        if (combining[word] && !symbols.has(word)) return place(this.argument(), combining[word]);
        return symbols.get(word) ?? '';
      }
    }
    const character = String.fromCodePoint(text.codePointAt(this.at) as number);
    this.at += character.length;
    return character;
  }

  private command(): void {
    const { text } = this;
    const pattern = /\\(?:([A-Za-z]+)\*?|([^A-Za-z]))/y;
    pattern.lastIndex = this.at;
    const match = pattern.exec(text);
    if (!match) {
      this.at += 1;
      return;
    }
    this.at += match[0].length;
    const [, word, sign] = match;
    if (sign !== undefined) {
      if (combining[sign] && '`\'^~=."'.includes(sign)) this.out.push(place(this.argument(), combining[sign]));
      else if ('&%$#_{}'.includes(sign)) this.out.push(sign);
      else if (' ,;\n\\'.includes(sign)) this.out.push(' ');
      return;
    }
    if (word.length === 1 && combining[word] && !symbols.has(word)) this.out.push(place(this.argument(), combining[word]));
    else if (symbols.has(word)) {
      this.out.push(symbols.get(word) as string);
      while (text[this.at] === ' ') this.at += 1;
      if (text[this.at] === '{' && text[this.at + 1] === '}') this.at += 2;
    } else while (text[this.at] === ' ') this.at += 1;
  }

  convert(): string {
    const { text, out } = this;
    while (this.at < text.length) {
      const next = /[\\{}$~`'-]/g;
      next.lastIndex = this.at;
      const found = next.exec(text);
      const stop = found ? found.index : text.length;
      if (stop > this.at) {
        out.push(text.slice(this.at, stop));
        this.at = stop;
      }
      if (!found) break;
      const character = text[stop];
      if (character === '\\') this.command();
      else if (character === '{' || character === '}' || character === '$') this.at += 1;
      else if (character === '~') this.take(' ', 1);
      else if (text.startsWith('---', stop)) this.take('—', 3);
      else if (text.startsWith('--', stop)) this.take('–', 2);
      else if (text.startsWith('``', stop)) this.take('“', 2);
      else if (text.startsWith("''", stop)) this.take('”', 2);
      else this.take(character, 1);
    }
    return out.join('');
  }

  private take(piece: string, length: number): void {
    this.out.push(piece);
    this.at += length;
  }
}

export function texToUnicode(text: string): string {
  if (!/[\\{}$~`'-]/.test(text)) return text.replace(/\s+/g, ' ').trim().normalize('NFC');
  return new TexText(text, 0).convert().replace(/\s+/g, ' ').trim().normalize('NFC');
}

/** DOIs and addresses stand verbatim, but for the escapes that TeX needs. */
export function texVerbatim(text: string): string {
  return text.replace(/\\url\s*\{([^{}]*)\}/g, '$1').replace(/\\([_%&#$~{}])/g, '$1').replace(/[{}]/g, '').replace(/\s+/g, ' ').trim();
}
