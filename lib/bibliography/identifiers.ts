/**
 * Identifiers in canonical form. A check character catches typing errors; it does not prove that the thing exists. What fails its check
 * is kept as text elsewhere and never serves as a key.
 */

const longestDoi = 300;

function count(text: string, character: string): number {
  let found = 0;
  for (const one of text) if (one === character) found += 1;
  return found;
}

/** Trailing signs that belong to the sentence, not to the name: brackets only when they have no partner within it. */
function withoutTrailingSigns(doi: string): string {
  let text = doi;
  for (;;) {
    const last = text[text.length - 1];
    const lone = (last === ')' && count(text, '(') < count(text, ')')) || (last === ']' && count(text, '[') < count(text, ']'));
    if (!lone && !'.,;:"\'}>’”'.includes(last)) return text;
    if (last === '>' && count(text, '<') >= count(text, '>')) return text;
    text = text.slice(0, -1);
  }
}

/** ISO 26324 names: without resolver or prefix, percent-decoded once, ASCII lower-cased, without trailing punctuation. Undefined when it is none. */
export function normaliseDoi(text: string): string | undefined {
  let doi = text
    .slice(0, 2_000)
    .trim()
    .replace(/^<?(?:url:)?(?:https?:\/\/)?(?:dx\.|www\.)?doi\.org\//i, '')
    .replace(/^(?:info:doi\/|urn:doi:|\[?doi\]?\s{0,9}[:=]?\s{0,9})/i, '')
    .replace(/^(?:https?:\/\/)?(?:dx\.|www\.)?doi\.org\//i, '')
    .trim();
  if (/%[0-9a-f]{2}/i.test(doi)) {
    try {
      doi = decodeURIComponent(doi);
    } catch {
      // Not percent-encoded after all: a bare percent sign is legal in a suffix.
    }
  }
  const match = /^10\.\d{4,9}(?:\.\d+)*\/\S+/.exec(doi);
  if (!match || match[0].length > longestDoi) return undefined;
  doi = withoutTrailingSigns(match[0]);
  if (doi.endsWith('/')) return undefined;
  return doi.replace(/[A-Z]+/g, (letters) => letters.toLowerCase());
}

/** The first DOI anywhere in a text (its first 10,000 characters). */
export function findDoi(text: string): string | undefined {
  const match = /(?<![\d.])10\.\d{4,9}(?:\.\d{1,9}){0,9}\/[^\s"]{1,300}/.exec(text.slice(0, 10_000));
  if (!match) return undefined;
  // "<" belongs to the old serial-item names (48:4<320::AID-...>3.0.CO;2-V); elsewhere it begins a tag. A second DOI may follow a ";".
  const found = /<\d+::/.test(match[0]) ? match[0] : match[0].split(/[<>]/)[0];
  return normaliseDoi(found.split(/[;,](?=(?:doi:?)?10\.\d{4}|https?:)/i)[0]);
}

/** ISO 3297: NNNN-NNNC, weights 8 to 2, modulus 11. */
export function normaliseIssn(text: string): string | undefined {
  const match = /(?<![\dXx-])(\d{4})[-‐–]?(\d{3}[\dXx])(?![\dXx-])/.exec(text);
  if (!match) return undefined;
  const digits = `${match[1]}${match[2]}`.toUpperCase();
  let sum = 0;
  for (let at = 0; at < 7; at += 1) sum += Number(digits[at]) * (8 - at);
  const check = (11 - (sum % 11)) % 11;
  return digits[7] === (check === 10 ? 'X' : String(check)) ? `${digits.slice(0, 4)}-${digits.slice(4)}` : undefined;
}

/** ISO 2108: 13 digits; a ten-digit number becomes the former. */
export function normaliseIsbn(text: string): string | undefined {
  const match = /(?<![\dXx])(?:97[89][-\s‐–]?)?(?:\d[-\s‐–]?){9}[\dXx](?![\dXx])/.exec(text);
  if (!match) return undefined;
  const digits = match[0].replace(/[^\dXx]/g, '').toUpperCase();
  if (digits.length === 13) return /^\d{13}$/.test(digits) && isbnCheck(digits.slice(0, 12)) === digits[12] ? digits : undefined;
  if (digits.length !== 10) return undefined;
  let sum = 0;
  for (let at = 0; at < 9; at += 1) sum += Number(digits[at]) * (10 - at);
  const check = (11 - (sum % 11)) % 11;
  if (digits[9] !== (check === 10 ? 'X' : String(check))) return undefined;
  const body = `978${digits.slice(0, 9)}`;
  return `${body}${isbnCheck(body)}`;
}

function isbnCheck(twelve: string): string {
  let sum = 0;
  for (let at = 0; at < 12; at += 1) sum += Number(twelve[at]) * (at % 2 === 0 ? 1 : 3);
  return String((10 - (sum % 10)) % 10);
}

/** ISO/IEC 7064 MOD 11-2, as in the ISNI block (ISO 27729): 0000-0000-0000-000X. */
export function normaliseOrcid(text: string): string | undefined {
  const match = /(?<![\dXx])(\d{4})-?(\d{4})-?(\d{4})-?(\d{3}[\dXx])(?![\dXx])/.exec(text);
  if (!match) return undefined;
  const digits = match.slice(1, 5).join('').toUpperCase();
  let total = 0;
  for (let at = 0; at < 15; at += 1) total = (total + Number(digits[at])) * 2;
  const check = (12 - (total % 11)) % 11;
  return digits[15] === (check === 10 ? 'X' : String(check)) ? `${digits.slice(0, 4)}-${digits.slice(4, 8)}-${digits.slice(8, 12)}-${digits.slice(12)}` : undefined;
}

/** ROR: 0, six Crockford base-32 characters, two digits of ISO/IEC 7064 MOD 97-10. Nine characters, lower-case, without the address. */
export function normaliseRor(text: string): string | undefined {
  const match = /^(?:(?:https?:\/\/)?ror\.org\/)?(0([0-9a-hj-km-np-tv-z]{6})(\d{2}))$/i.exec(text.trim());
  if (!match) return undefined;
  const alphabet = '0123456789abcdefghjkmnpqrstvwxyz';
  let value = 0;
  for (const character of match[2].toLowerCase()) value = value * 32 + alphabet.indexOf(character);
  return 98 - ((value * 100) % 97) === Number(match[3]) ? match[1].toLowerCase() : undefined;
}

export function isRor(text: string): boolean {
  return normaliseRor(text) !== undefined;
}

export function normalisePmid(text: string): string | undefined {
  const match = /^\s*(?:pmid\s?[:=]?\s*|(?:https?:\/\/)?(?:www\.)?(?:pubmed\.ncbi\.nlm\.nih\.gov|ncbi\.nlm\.nih\.gov\/pubmed)\/)?(\d{1,9})\/?\s*$/i.exec(text.slice(0, 200));
  return match && Number(match[1]) > 0 ? String(Number(match[1])) : undefined;
}

export function normalisePmcid(text: string): string | undefined {
  const match = /^\s*(?:pmcid\s?[:=]?\s*)?pmc(\d{1,9})\b/i.exec(text.slice(0, 200));
  return match ? `PMC${Number(match[1])}` : undefined;
}

/** Identifier of a preprint archive, without version: "2101.00001", "hep-th/9901001". */
export function normaliseArxiv(text: string): string | undefined {
  const match = /^\s*(?:arxiv\s?:\s?)?((?:\d{4}\.\d{4,5})|(?:[a-z-]{2,12}(?:\.[a-z]{2})?\/\d{7}))(?:v\d{1,3})?(?:\s*\[[\w.-]{1,20}\])?\s*$/i.exec(text.slice(0, 200));
  return match ? match[1].toLowerCase() : undefined;
}
