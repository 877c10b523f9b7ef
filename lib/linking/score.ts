/**
 * How likely two records are the same work: Fellegi-Sunter weights over title, first author, year, volume and page, identifiers.
 *
 * Formula: each field adds log2(m/u) where it agrees and log2((1-m)/(1-u)) where it does not, nothing where a side is missing;
 * P = 1 / (1 + (1-prior)/prior * 2^-W). m and u are the defaults of the method note (title .92/5e-4, year .97/.08, author .90/.01,
 * DOI .95/1e-6); partial agreement of titles and a year that is off by one are steps between, our own choice.
 * Source: Fellegi & Sunter (1969), JASA 64:1183-1210, doi 10.1080/01621459.1969.10501049.
 * Assumes independent fields, which overstates W a little: the answer here is only whether a person should look.
 */
import { tokenJaccard } from '@/lib/linking/group';

/** One reason for the score of a proposed match. */
export interface MatchReason {
  field: 'identifier' | 'title' | 'author' | 'year' | 'volume-page' | 'venue';
  /** Plain words, e.g. "Title, 0.98 similar". */
  verdict: string;
  /** Log2 of the likelihood ratio: positive speaks for the same work. */
  weight: number;
}

export interface ScoreInput {
  /** Normalised title. */
  title: string;
  /** Normalised first family name. */
  family: string;
  year: number | null;
  volumePage: string | null;
  doi: string | null;
}

/** Prior probability that two records which share a block are the same work. */
export const blockPrior = 1e-3;
/** At or above this probability a pair is shown to a person. */
export const reviewThreshold = 0.2;

/** Notices about a work are never that work. */
const notice = /^(?:retract\w*|correct\w*|erratum|errata|corrigendum|comment(?:ary)? on|reply to|response to|expression of concern)\b/;

/** Dice coefficient of letter pairs, 0..1: forgives typing errors that break a word. */
export function bigramSimilarity(a: string, b: string): number {
  if (a === b) return 1;
  if (a.length < 2 || b.length < 2) return 0;
  const pairs = new Map<string, number>();
  for (let at = 0; at < a.length - 1; at += 1) {
    const pair = a.slice(at, at + 2);
    pairs.set(pair, (pairs.get(pair) ?? 0) + 1);
  }
  let common = 0;
  for (let at = 0; at < b.length - 1; at += 1) {
    const pair = b.slice(at, at + 2);
    const left = pairs.get(pair) ?? 0;
    if (left > 0) {
      common += 1;
      pairs.set(pair, left - 1);
    }
  }
  return (2 * common) / (a.length + b.length - 2);
}

function titleReason(a: string, b: string): MatchReason | null {
  if (a === '' || b === '') return null;
  const similarity = Math.max(tokenJaccard(a, b), bigramSimilarity(a, b));
  const telling = Math.min(a.split(' ').length, b.split(' ').length) >= 4;
  let weight = similarity >= 0.99 ? 10.8 : similarity >= 0.9 ? 7 : similarity >= 0.8 ? 4 : similarity >= 0.65 ? 0 : -3.6;
  // "Introduction" and "Introduction" say little of each other.
  if (!telling) weight = Math.min(weight, 3);
  return { field: 'title', verdict: `Title, ${similarity.toFixed(2)} similar`, weight };
}

/** @returns probability 0..1, weight in bits, and the reasons in order of the fields; null where a notice meets the work it is about */
export function scorePair(a: ScoreInput, b: ScoreInput): { score: number; weight: number; reasons: MatchReason[] } | null {
  if (notice.test(a.title) !== notice.test(b.title)) return null;
  const reasons: MatchReason[] = [];
  const title = titleReason(a.title, b.title);
  if (title) reasons.push(title);
  if (a.family && b.family) {
    const same = a.family === b.family;
    reasons.push({ field: 'author', verdict: same ? 'First author agrees' : 'First author differs', weight: same ? 6.49 : -3.31 });
  }
  if (a.year !== null && b.year !== null) {
    const apart = Math.abs(a.year - b.year);
    reasons.push({ field: 'year', verdict: apart === 0 ? 'Year agrees' : apart === 1 ? 'Year differs by one' : `Year differs by ${apart}`, weight: apart === 0 ? 3.6 : apart === 1 ? -0.6 : -4.94 });
  }
  if (a.volumePage && b.volumePage) {
    const same = a.volumePage === b.volumePage;
    reasons.push({ field: 'volume-page', verdict: same ? 'Volume and first page agree' : 'Volume or first page differs', weight: same ? 8 : -3 });
  }
  if (a.doi && b.doi) reasons.push({ field: 'identifier', verdict: a.doi === b.doi ? 'DOI agrees' : 'DOIs differ', weight: a.doi === b.doi ? 19.86 : -4.32 });
  else reasons.push({ field: 'identifier', verdict: a.doi || b.doi ? 'DOI missing on one side' : 'DOI missing on both sides', weight: 0 });
  const weight = reasons.reduce((sum, reason) => sum + reason.weight, 0);
  return { score: 1 / (1 + ((1 - blockPrior) / blockPrior) * 2 ** -weight), weight, reasons };
}
