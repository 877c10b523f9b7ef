import { findYear } from '@/lib/bibliography/normalise';

export interface DateParts {
  year?: number;
  month?: number;
  day?: number;
}

const months = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const monthWord = /(?<!\p{L})(jan(?:uary)?|feb(?:ruary)?|mar(?:ch)?|apr(?:il)?|may|june?|july?|aug(?:ust)?|sept?(?:ember)?|oct(?:ober)?|nov(?:ember)?|dec(?:ember)?)(?!\p{L})/iu;

/** 1 to 12 from a number or an English name, abbreviated or not, also within "JUN 15"; undefined otherwise. */
export function parseMonth(text: string): number | undefined {
  const word = text.trim();
  if (/^\d{1,2}$/.test(word)) return Number(word) >= 1 && Number(word) <= 12 ? Number(word) : undefined;
  const match = monthWord.exec(word.slice(0, 100));
  return match ? months.indexOf(match[1].slice(0, 3).toLowerCase()) + 1 : undefined;
}

const validDay = (text: string | undefined) => (text && Number(text) >= 1 && Number(text) <= 31 ? Number(text) : undefined);

/** Dates as reference formats write them: "2001-05-03", "2001/05/03/other", "2001/2003" (a range: its beginning), "May 2001", "3 May 2001". Only what was found is set. */
export function parseDate(text: string): DateParts {
  const year = findYear(text.slice(0, 1_000));
  if (year === undefined) return {};
  const iso = /^\s*(\d{4})(?:[-/](\d{1,2})(?!\d)(?:[-/](\d{1,2})(?!\d))?)?/.exec(text);
  let month: number | undefined;
  let day: number | undefined;
  if (iso && Number(iso[1]) === year && iso[2]) {
    month = parseMonth(iso[2]);
    day = month ? validDay(iso[3]) : undefined;
  } else {
    month = parseMonth(text.slice(0, 1_000).replace(/\d+/g, ' '));
    const beside = month ? /(?<!\d)(\d{1,2})(?:st|nd|rd|th)?\.?\s+\p{L}{3}|\p{L}{3}\.?\s+(\d{1,2})(?!\d)/u.exec(text.slice(0, 1_000)) : null;
    day = beside ? validDay(beside[1] ?? beside[2]) : undefined;
  }
  return { year, ...(month ? { month } : {}), ...(day ? { day } : {}) };
}

export interface Pages {
  firstPage?: string;
  lastPage?: string;
}

/** "123-9" -> 123 and 129; "1--10", "e123", "S5-S9", "12, 15-17" -> 12. */
export function parsePages(text: string): Pages {
  const clean = text.slice(0, 1_000).replace(/^\s*(?:pp?|pages?)\b\.?\s*/i, '').trim();
  // "xxi + 554" counts the pages of a book.
  if (clean === '' || /^[ivxlcdm]{1,12}\s*\+\s*\d/i.test(clean)) return {};
  const match = /^([^\s,;–—‐-]{1,40})\s*(?:-{1,3}|[–—‐])\s*([^\s,;–—‐-]{1,40})/.exec(clean);
  if (!match) {
    const [only] = clean.split(/[,;]/);
    return only.trim() === '' ? {} : { firstPage: only.trim().replace(/\+{1,3}$/, '').slice(0, 60) };
  }
  const [, firstPage, last] = match;
  return { firstPage, lastPage: expand(firstPage, last) };
}

/** The last page in full: exporters leave out the digits it shares with the first. */
function expand(first: string, last: string): string {
  const start = /^(\p{L}{0,3})(\d{1,15})$/u.exec(first);
  const end = /^(\p{L}{0,3})(\d{1,15})$/u.exec(last);
  if (!start || !end || end[2].length >= start[2].length || (end[1] !== '' && end[1] !== start[1])) return last;
  const full = start[2].slice(0, start[2].length - end[2].length) + end[2];
  return Number(full) > Number(start[2]) ? `${start[1]}${full}` : last;
}
