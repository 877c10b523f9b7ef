/** Normal forms for comparing. Never shown: what a person sees stays as it was read. */
import { texToUnicode } from '@/lib/bibliography/latex';

/** Letters that have no decomposition but a customary spelling in plain Latin: old cited-reference lists know only the latter. */
const plainLetters: Record<string, string> = { ß: 'ss', ø: 'o', ł: 'l', đ: 'd', ð: 'd', þ: 'th', æ: 'ae', œ: 'oe', ı: 'i', ŋ: 'n', ħ: 'h', ς: 'σ' };
const asciiOnly = /^[\u0000-\u007f]*$/;

/** Compatibility decomposition without marks, case-folded. */
function fold(text: string): string {
  if (asciiOnly.test(text)) return text.toLowerCase();
  return text
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replace(/[ßøłđðþæœıŋħς]/g, (letter) => plainLetters[letter]);
}

/**
 * NFKD, marks dropped, case-folded, TeX markup gone, "&" -> "and", everything but letters and digits -> one space.
 * Letters of all scripts are kept: a Latin-only filter would empty Chinese titles.
 */
export function normaliseText(text: string): string {
  const plain = /[\\{}]/.test(text) ? texToUnicode(text) : text;
  return fold(plain)
    .replace(/&/g, ' and ')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Letters alone: "van der Meer" -> "vandermeer", "O'Neill" -> "oneill". */
export function normaliseFamily(name: string): string {
  return fold(/[\\{}]/.test(name) ? texToUnicode(name) : name).replace(/[^\p{L}]+/gu, '');
}

/** First four-digit number from 1500 to 2100 in a text; undefined without one. */
export function findYear(text: string): number | undefined {
  for (const match of text.matchAll(/(?<!\d)\d{4}(?!\d)/g)) {
    const year = Number(match[0]);
    if (year >= 1500 && year <= 2100) return year;
  }
  return undefined;
}

/** First page as a key: digits with the letter before or behind them, lower-case, without leading zeros ("p. 0283A" -> "283a", "E123" -> "e123"). Undefined without digits. */
export function firstPage(text: string): string | undefined {
  const match = /[a-z]?\d+[a-z]?/i.exec(text.replace(/^\s*(?:pp?|pages?|art(?:icle)?|no)\b\.?\s*/i, ''));
  return match ? match[0].toLowerCase().replace(/^([a-z]?)0+(?=\d)/, '$1') : undefined;
}
