import { stopWords } from '@/lib/evaluation/stop-words';

export interface TermSource {
  title: string;
  keywords: readonly string[];
}

/** The terms of a list of works: `terms[offsets[work] .. offsets[work + 1])` are the numbers of the distinct terms of a work. */
export interface TermIndex {
  offsets: Uint32Array;
  terms: Uint32Array;
  /** Compared form of each term: lower-case words, without marks, joined by single spaces. */
  forms: string[];
  /** Readable form of each term. */
  spellings: string[];
  /** 1 where the work has any word at all. */
  hasText: Uint8Array;
}

interface Word {
  form: string;
  spelling: string;
  stops: boolean;
}

const longestTerm = 3;
/** A term in fewer works can never set a cluster apart. */
const fewestWorks = 3;
/** Titles are data of strangers: one of a megabyte must not decide how long an analysis takes. */
const longestText = 2_000;
const mostKeywords = 100;

/**
 * Finds the candidate terms of works: runs of one to three words in titles and keywords, across neither punctuation nor a
 * stop word. A run of numbers or of single letters is no term. Each work counts a term once. Terms in fewer than three works are dropped.
 * Readable form: words as they are most often spelt, lower-case unless capitals belong to the word ("DNA", "Wadden Sea").
 * Cost O(total words). Works without words have no terms. Terms are numbered in the order in which they are first met.
 */
export function extractTerms(works: readonly TermSource[]): TermIndex {
  const spellings = new SpellingVotes();
  const numbers = new Map<string, number>();
  const counts: number[] = [];
  const rows: Uint32Array[] = [];
  const hasText = new Uint8Array(works.length);
  works.forEach((work, index) => {
    const own = new Set<number>();
    for (const segment of segmentsOf(work, spellings)) {
      if (segment.length > 0) hasText[index] = 1;
      eachTerm(segment, (form) => {
        let number = numbers.get(form);
        if (number === undefined) {
          number = counts.length;
          numbers.set(form, number);
          counts.push(0);
        }
        own.add(number);
      });
    }
    for (const number of own) counts[number] += 1;
    rows.push(Uint32Array.from(own));
  });
  return { ...keepCommonTerms(rows, counts, numbers, spellings), hasText };
}

function keepCommonTerms(rows: Uint32Array[], counts: number[], numbers: Map<string, number>, votes: SpellingVotes): Omit<TermIndex, 'hasText'> {
  const renumbered = new Int32Array(counts.length).fill(-1);
  const forms: string[] = [];
  for (const [form, number] of numbers) {
    if (counts[number] < fewestWorks) continue;
    renumbered[number] = forms.length;
    forms.push(form);
  }
  const offsets = new Uint32Array(rows.length + 1);
  const terms: number[] = [];
  rows.forEach((row, work) => {
    for (const number of row) if (renumbered[number] >= 0) terms.push(renumbered[number]);
    offsets[work + 1] = terms.length;
  });
  const spellings = forms.map((form) => form.split(' ').map((word) => votes.choose(word)).join(' '));
  return { offsets, terms: Uint32Array.from(terms), forms, spellings };
}

function segmentsOf(work: TermSource, votes: SpellingVotes): Word[][] {
  const segments: Word[][] = [];
  for (const text of [work.title, ...work.keywords.slice(0, mostKeywords)]) {
    const words = text.slice(0, longestText).replace(/<[^<>]{0,40}>/g, ' ').split(/[\s]*[.,:;?!()[\]{}"“”„«»…/|–—]+[\s]*/).map(wordsOf);
    votes.count(words.flat());
    segments.push(...words);
  }
  return segments;
}

function wordsOf(segment: string): Word[] {
  const words: Word[] = [];
  // Letters and digits of any script, joined inside by hyphens or apostrophes.
  for (const [spelling] of segment.matchAll(/[\p{L}\p{N}\p{M}]+(?:[-‐‑'’][\p{L}\p{N}\p{M}]+)*/gu)) {
    const form = spelling.normalize('NFKD').replace(/\p{M}+/gu, '').replace(/[‐‑]/g, '-').replace(/’/g, "'").toLowerCase();
    words.push({ form, spelling, stops: stopWords.has(form) });
  }
  return words;
}

function eachTerm(words: Word[], visit: (form: string) => void): void {
  for (let start = 0; start < words.length; start += 1) {
    if (words[start].stops) continue;
    let form = '';
    for (let length = 1; length <= longestTerm && start + length <= words.length; length += 1) {
      const last = words[start + length - 1];
      if (last.stops) break;
      form = length === 1 ? last.form : `${form} ${last.form}`;
      if (isTerm(form)) visit(form);
    }
  }
}

/** At least one word of two letters or more (one character will do in scripts that write words so). */
function isTerm(form: string): boolean {
  return form.length <= 100 && /\p{L}[\p{L}-]|[\p{Script=Han}\p{Script=Hangul}\p{Script=Hiragana}\p{Script=Katakana}]/u.test(form);
}

/**
 * How each word is most often written. The first word of a text and texts in title case or capitals throughout say nothing about a word's own
 * capitals and are heard only where nothing better speaks.
 */
class SpellingVotes {
  private readonly votes = new Map<string, Map<string, number>>();

  count(words: Word[]): void {
    const capitals = words.slice(1).filter(({ spelling, stops }) => !stops && startsUpper(spelling)).length;
    const content = words.slice(1).filter(({ stops }) => !stops).length;
    const tellsCase = content === 0 || capitals < 0.7 * content;
    words.forEach(({ form, spelling }, place) => {
      // Capitals or digits inside a word ("DNA", "CO2", "pH") are its own, unless everything is in capitals.
      const ownCapitals = /\p{L}.*\p{Lu}/u.test(spelling) && !(words.length > 1 && words.every((word) => word.spelling === word.spelling.toUpperCase()));
      const certain = ownCapitals || (tellsCase && place > 0);
      const heard = certain ? spelling : spelling.toLowerCase();
      const own = this.votes.get(form) ?? new Map<string, number>();
      own.set(heard, (own.get(heard) ?? 0) + (certain ? 1_000 : 1));
      this.votes.set(form, own);
    });
  }

  choose(form: string): string {
    const own = this.votes.get(form);
    if (own === undefined) return form;
    let best = form;
    let most = 0;
    for (const [spelling, votes] of own) {
      if (votes > most || (votes === most && spelling < best)) {
        best = spelling;
        most = votes;
      }
    }
    return best;
  }
}

const startsUpper = (word: string): boolean => /^\p{Lu}/u.test(word);
