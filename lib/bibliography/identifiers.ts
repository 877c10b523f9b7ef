/**
 * Identifiers in canonical form. A check character catches typing errors; it does not prove that the thing exists. What fails its check
 * is kept as text elsewhere and never serves as a key.
 */

/** ISO 26324 names: without resolver or prefix, percent-decoded once, ASCII lower-cased, without trailing punctuation. Undefined when it is none. */
export function normaliseDoi(text: string): string | undefined {
  let doi = text.trim().replace(/^(?:https?:\/\/)?(?:dx\.|www\.)?doi\.org\//i, '').replace(/^(?:info:doi\/|urn:doi:|doi\s*[:=]?\s*)/i, '').trim();
  if (/%[0-9a-f]{2}/i.test(doi)) {
    try {
      doi = decodeURIComponent(doi);
    } catch {
      // Not percent-encoded after all: a bare percent sign is legal in a suffix.
    }
  }
  const match = /^10\.\d{4,9}(?:\.\d+)*\/\S+/.exec(doi);
  if (!match) return undefined;
  doi = match[0];
  for (;;) {
    const last = doi[doi.length - 1];
    if ('.,;'.includes(last) || (last === ')' && count(doi, '(') < count(doi, ')')) || (last === ']' && count(doi, '[') < count(doi, ']')) || '"\'}'.includes(last)) doi = doi.slice(0, -1);
    else break;
  }
  if (doi.endsWith('/') || doi.length > 300) return undefined;
  return doi.replace(/[A-Z]+/g, (letters) => letters.toLowerCase());
}

function count(text: string, character: string): number {
  let found = 0;
  for (const one of text) if (one === character) found += 1;
  return found;
}

/** The first DOI anywhere in a text. */
export function findDoi(text: string): string | undefined {
  const match = /10\.\d{4,9}(?:\.\d+)*\/[^\s"<>]+/.exec(text.slice(0, 10_000));
  return match ? normaliseDoi(match[0]) : undefined;
}

/** ISO 3297: NNNN-NNNC, weights 8 to 2, modulus 11. */
export function normaliseIssn(text: string): string | undefined {
  const match = /(\d{4})-?(\d{3}[\dXx])/.exec(text);
  if (!match) return undefined;
  const digits = `${match[1]}${match[2]}`.toUpperCase();
  let sum = 0;
  for (let at = 0; at < 7; at += 1) sum += Number(digits[at]) * (8 - at);
  const check = (11 - (sum % 11)) % 11;
  return digits[7] === (check === 10 ? 'X' : String(check)) ? `${digits.slice(0, 4)}-${digits.slice(4)}` : undefined;
}

/** ISO 2108: 13 digits; a ten-digit number becomes the former. */
export function normaliseIsbn(text: string): string | undefined {
  const match = /(?:97[89][-\s]?)?(?:\d[-\s]?){9}[\dXx]/.exec(text);
  if (!match) return undefined;
  const digits = match[0].replace(/[-\s]/g, '').toUpperCase();
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
  const match = /(\d{4})-?(\d{4})-?(\d{4})-?(\d{3}[\dXx])/.exec(text);
  if (!match) return undefined;
  const digits = match.slice(1, 5).join('').toUpperCase();
  let total = 0;
  for (let at = 0; at < 15; at += 1) total = (total + Number(digits[at])) * 2;
  const check = (12 - (total % 11)) % 11;
  return digits[15] === (check === 10 ? 'X' : String(check)) ? `${digits.slice(0, 4)}-${digits.slice(4, 8)}-${digits.slice(8, 12)}-${digits.slice(12)}` : undefined;
}

/** ROR: 0, six Crockford base-32 characters, two digits of ISO/IEC 7064 MOD 97-10. */
export function isRor(text: string): boolean {
  const match = /^(?:https?:\/\/ror\.org\/)?0([0-9a-hj-km-np-tv-z]{6})(\d{2})$/i.exec(text.trim());
  if (!match) return false;
  const alphabet = '0123456789abcdefghjkmnpqrstvwxyz';
  let value = 0;
  for (const character of match[1].toLowerCase()) value = value * 32 + alphabet.indexOf(character);
  return 98 - ((value * 100) % 97) === Number(match[2]);
}

export function normalisePmid(text: string): string | undefined {
  const match = /^\s*(?:pmid:?\s*)?(\d{1,9})\s*$/i.exec(text);
  return match && Number(match[1]) > 0 ? String(Number(match[1])) : undefined;
}

export function normalisePmcid(text: string): string | undefined {
  const match = /^\s*(?:pmcid:?\s*)?pmc(\d{1,9})\b/i.exec(text);
  return match ? `PMC${Number(match[1])}` : undefined;
}

export function normaliseArxiv(text: string): string | undefined {
  const match = /^\s*(?:arxiv:)?((?:\d{4}\.\d{4,5})|(?:[a-z-]+(?:\.[a-z]{2})?\/\d{7}))(?:v\d+)?\s*$/i.exec(text);
  return match ? match[1].toLowerCase() : undefined;
}
