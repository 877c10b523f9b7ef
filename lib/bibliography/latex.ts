/**
 * TeX text to Unicode: accents, special letters, dashes, quotes; braces and unknown commands go, their text stays.
 * One pass without recursion: an accent waits for the next letter, however deep in braces that letter stands, so time is linear whatever
 * the nesting.
 */
import { tidyBlanks, tidyText } from '@/lib/bibliography/plain-text';

const accents = new Map(Object.entries({
  '`': '\u0300', "'": '\u0301', '^': '\u0302', '~': '\u0303', '=': '\u0304', '.': '\u0307', '"': '\u0308', u: '\u0306', v: '\u030c', H: '\u030b', c: '\u0327', k: '\u0328', r: '\u030a', b: '\u0331', d: '\u0323', t: '\u0361',
  textcommabelow: '\u0326', textogonekcentered: '\u0328', hat: '\u0302', tilde: '\u0303', bar: '\u0304', acute: '\u0301', grave: '\u0300', ddot: '\u0308', dot: '\u0307', check: '\u030c', breve: '\u0306', vec: '\u20d7',
}));

const symbols = new Map(Object.entries({
  ss: 'ß', SS: 'SS', ae: 'æ', AE: 'Æ', oe: 'œ', OE: 'Œ', aa: 'å', AA: 'Å', o: 'ø', O: 'Ø', l: 'ł', L: 'Ł', i: 'ı', j: 'ȷ', imath: 'ı', jmath: 'ȷ', dj: 'đ', DJ: 'Đ', th: 'þ', TH: 'Þ', dh: 'ð', DH: 'Ð', ng: 'ŋ', NG: 'Ŋ', ij: 'ĳ', IJ: 'Ĳ',
  textendash: '–', endash: '–', textemdash: '—', emdash: '—', ldots: '…', dots: '…', textellipsis: '…', cdots: '⋯', textquoteright: '’', textquoteleft: '‘', textquotedblleft: '“', textquotedblright: '”', textquotedbl: '"', textquotesingle: "'", lq: '‘', rq: '’',
  guillemotleft: '«', guillemotright: '»', guillemetleft: '«', guillemetright: '»', guilsinglleft: '‹', guilsinglright: '›', quotedblbase: '„', quotesinglbase: '‚', glqq: '„', grqq: '“',
  copyright: '©', textcopyright: '©', pounds: '£', textsterling: '£', euro: '€', texteuro: '€', textcent: '¢', textyen: '¥', S: '§', P: '¶', dag: '†', ddag: '‡', dagger: '†', ddagger: '‡', textdegree: '°', degree: '°', textregistered: '®', texttrademark: '™',
  textexclamdown: '¡', textquestiondown: '¿', textordfeminine: 'ª', textordmasculine: 'º', textperiodcentered: '·', textbullet: '•', bullet: '•', textmu: 'µ', textonehalf: '½', textbackslash: '\\', textasciitilde: '~', textunderscore: '_', textasciicircum: '^',
  textbar: '|', textless: '<', textgreater: '>', textbraceleft: '{', textbraceright: '}', lbrace: '{', rbrace: '}', textdollar: '$', textasteriskcentered: '*', ast: '*', star: '⋆', slash: '/', TeX: 'TeX', LaTeX: 'LaTeX', LaTeXe: 'LaTeX2ε', BibTeX: 'BibTeX',
  alpha: 'α', beta: 'β', gamma: 'γ', delta: 'δ', epsilon: 'ε', varepsilon: 'ε', zeta: 'ζ', eta: 'η', theta: 'θ', vartheta: 'ϑ', iota: 'ι', kappa: 'κ', lambda: 'λ', mu: 'μ', nu: 'ν', xi: 'ξ', pi: 'π', rho: 'ρ', sigma: 'σ', varsigma: 'ς', tau: 'τ', upsilon: 'υ', phi: 'φ',
  varphi: 'φ', chi: 'χ', psi: 'ψ', omega: 'ω', Gamma: 'Γ', Delta: 'Δ', Theta: 'Θ', Lambda: 'Λ', Xi: 'Ξ', Pi: 'Π', Sigma: 'Σ', Upsilon: 'Υ', Phi: 'Φ', Psi: 'Ψ', Omega: 'Ω', ell: 'ℓ', hbar: 'ħ', partial: '∂', nabla: '∇', sum: '∑', prod: '∏', int: '∫', sqrt: '√',
  times: '×', pm: '±', mp: '∓', div: '÷', leq: '≤', le: '≤', geq: '≥', ge: '≥', neq: '≠', ne: '≠', ll: '≪', gg: '≫', equiv: '≡', approx: '≈', sim: '∼', simeq: '≃', cong: '≅', propto: '∝', infty: '∞', to: '→', rightarrow: '→', leftarrow: '←', leftrightarrow: '↔',
  Rightarrow: '⇒', in: '∈', cap: '∩', cup: '∪', subset: '⊂', oplus: '⊕', otimes: '⊗', cdot: '·', circ: '°', prime: '′', perp: '⊥', parallel: '∥', langle: '⟨', rangle: '⟩', quad: ' ', qquad: ' ', space: ' ', nobreakspace: ' ', thinspace: ' ', enspace: ' ', par: ' ', newline: ' ',
}));

/** Commands whose first argument is not text: sorting keys, link targets, colours. */
const silentArgument = /^(?:noopsort|noop|sortnoop|nosort|href|textcolor|color|bibinfo|hspace|vspace|label|cite[a-z]*)$/i;

const special = /[\\{}$~`'-]/g;
const specialInMath = /[\\{}$~`'^_-]/g;
const commandAt = /\\(?:([A-Za-z]+)\*?|([^A-Za-z]))/y;

class TexText {
  private at = 0;
  private readonly out: string[] = [];
  /** Combining marks that wait for their letter, innermost first. */
  private marks = '';
  private depth = 0;
  /** Text is left out while `depth` is above this; -1 when nothing is left out. */
  private silentAbove = -1;
  private inMath = false;
  private lastDollar: number;

  constructor(private readonly text: string) {
    this.lastDollar = text.lastIndexOf('$');
  }

  private put(piece: string): void {
    if (this.silentAbove < 0) this.out.push(piece);
  }

  /** A letter under the accents that wait for it. */
  private putBase(base: string): void {
    this.put((base === 'ı' ? 'i' : base === 'ȷ' ? 'j' : base) + this.marks);
    this.marks = '';
  }

  private command(): void {
    const { text } = this;
    commandAt.lastIndex = this.at;
    const match = commandAt.exec(text);
    if (!match) {
      this.at += 1;
      return;
    }
    this.at += match[0].length;
    const [, word, sign] = match;
    // \a'o is what \'o becomes within a tabbing environment.
    if (word === 'a' && match[0].length === 2 && "'`=".includes(text[this.at] ?? ' ')) {
      this.marks = (accents.get(text[this.at]) as string) + this.marks.slice(0, 3);
      this.at += 1;
      return;
    }
    const accent = accents.get(word ?? sign);
    if (accent !== undefined && (sign !== undefined || word.length === 1 || text[this.at] === '{')) {
      // Three marks on one letter are real (Vietnamese, transliterations); a thousand are not.
      if (this.marks.length < 4) this.marks = accent + this.marks;
      return;
    }
    if (sign !== undefined) {
      if ('&%$#_{}'.includes(sign)) this.put(sign);
      else if (' ,;:\n\\'.includes(sign)) this.put(' ');
      return;
    }
    const symbol = symbols.get(word);
    if (symbol !== undefined) {
      if (this.marks === '') this.put(symbol);
      else this.putBase(symbol);
    }
    while (text[this.at] === ' ') this.at += 1;
    if (symbol !== undefined && text[this.at] === '{' && text[this.at + 1] === '}') this.at += 2;
    else if (text[this.at] === '{' && this.silentAbove < 0 && silentArgument.test(word)) this.silentAbove = this.depth;
  }

  private brace(opening: boolean): void {
    this.at += 1;
    if (opening) {
      this.depth += 1;
      return;
    }
    this.marks = '';
    this.depth = Math.max(0, this.depth - 1);
    if (this.silentAbove >= this.depth) this.silentAbove = -1;
  }

  /** The letter an accent waits for. */
  private takeBase(): void {
    const { text } = this;
    const character = text[this.at];
    if (character === ' ' || character === '$') this.at += 1;
    else if (character === '\\') this.command();
    else if (character === '{' || character === '}') this.brace(character === '{');
    else {
      const base = String.fromCodePoint(text.codePointAt(this.at) as number);
      this.at += base.length;
      this.putBase(base);
    }
  }

  private sign(character: string): void {
    const { text, at } = this;
    if (character === '\\') return this.command();
    if (character === '{' || character === '}') return this.brace(character === '{');
    if (character === '$') {
      // A dollar sign without a partner is a price.
      if (this.inMath || at < this.lastDollar) this.inMath = !this.inMath;
      else this.put('$');
      this.at += 1;
    } else if (character === '^' || character === '_') this.at += 1;
    else if (character === '~') this.take(' ', 1);
    else if (text.startsWith('---', at)) this.take('—', 3);
    else if (text.startsWith('--', at)) this.take('–', 2);
    else if (text.startsWith('``', at)) this.take('“', 2);
    else if (text.startsWith("''", at)) this.take('”', 2);
    else this.take(character, 1);
  }

  private take(piece: string, length: number): void {
    this.put(piece);
    this.at += length;
  }

  convert(): string {
    const { text } = this;
    while (this.at < text.length) {
      if (this.marks !== '') {
        this.takeBase();
        continue;
      }
      const next = this.inMath ? specialInMath : special;
      next.lastIndex = this.at;
      const found = next.exec(text);
      const stop = found ? found.index : text.length;
      if (stop > this.at) this.put(text.slice(this.at, stop));
      this.at = stop;
      if (found) this.sign(found[0]);
    }
    return this.out.join('');
  }
}

/** Plain text in NFC, blanks tidied. */
export function texToUnicode(text: string): string {
  return tidyText(/[\\{}$~`'-]/.test(text) ? new TexText(text).convert() : text);
}

/** DOIs and addresses stand verbatim, but for the escapes that TeX needs. */
export function texVerbatim(text: string): string {
  if (!/[\\{}]/.test(text)) return tidyBlanks(text);
  return tidyBlanks(text.replace(/\\url\s*\{([^{}]*)\}/g, '$1').replace(/\\([_%&#$~{}])/g, '$1').replace(/\{?\\textasciitilde(?:\{\}|\s|(?=\}))\}?/g, '~').replace(/[{}]/g, ''));
}
