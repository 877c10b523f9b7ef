import { findYear } from '@/lib/bibliography/normalise';

export interface DateParts {
  year?: number;
  month?: number;
  day?: number;
}

const months = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

/** 1 to 12 from a number or an English name, abbreviated or not; undefined otherwise. */
export function parseMonth(text: string): number | undefined {
  const word = text.trim().toLowerCase();
  if (/^\d{1,2}$/.test(word)) return Number(word) >= 1 && Number(word) <= 12 ? Number(word) : undefined;
  const at = months.indexOf(word.slice(0, 3));
  return word.length >= 3 && at >= 0 ? at + 1 : undefined;
}

/** Dates as reference formats write them: "2001-05-03", "2001/05/03/other", "2001/2003" (a range: its beginning), "May 2001". */
export function parseDate(text: string): DateParts {
  const iso = /^\s*(\d{4})(?:[-/](\d{1,2})(?!\d)(?:[-/](\d{1,2})(?!\d))?)?/.exec(text);
  const year = findYear(text);
  if (iso && Number(iso[1]) === year) {
    const month = iso[2] ? parseMonth(iso[2]) : undefined;
    const day = month && iso[3] && Number(iso[3]) >= 1 && Number(iso[3]) <= 31 ? Number(iso[3]) : undefined;
    return { year, month, day };
  }
  const word = /\b(jan|feb|mar|apr|may|jun|jul|aug|sep|oct|nov|dec)/i.exec(text);
  return { year, month: word ? parseMonth(word[1]) : undefined };
}

/** "123-9" -> 123 and 129; "1--10", "e123", "S5-S9". */
export function parsePages(text: string): { firstPage?: string; lastPage?: string } {
  const clean = text.replace(/^\s*(?:pp?|pages?)\.?\s*/i, '').trim();
  if (clean === '') return {};
  const match = /^([^\s,;–—-]{1,40})\s*(?:-{1,3}|–|—)\s*([^\s,;]{1,40})/.exec(clean);
  if (!match) return { firstPage: clean.split(/[,;]/)[0].trim().slice(0, 60) };
  const [, first, last] = match;
  const full = /^\d+$/.test(first) && /^\d+$/.test(last) && last.length < first.length ? first.slice(0, first.length - last.length) + last : last;
  return { firstPage: first, lastPage: full };
}
