import { signedLogLikelihood } from '@/lib/evaluation/log-likelihood';
import { extractTerms, type TermIndex, type TermSource } from '@/lib/evaluation/term-extraction';

/**
 * The terms that set each cluster apart, and a name made from them.
 * For each term: works of the cluster with and without it against all other works of the list with and without it (presence, not frequency), ranked
 * by signed log-likelihood (`log-likelihood.ts`). A term must be in at least three works of the cluster and a twentieth of them, and be commoner there
 * than chance (G2 of 3.84 or more: 5 % with one degree of freedom). A shorter term gives way to a longer one that is in four fifths of its works.
 * Sources: Dunning (1993), aclanthology.org/J93-1003.
 * Cost O(terms of all works). Works without words are left out on both sides. A cluster that nothing sets apart has no terms and the name "Cluster A".
 */
export interface ClusterTerm {
  /** Readable form. */
  term: string;
  /** Works of the cluster that have it. */
  works: number;
  logLikelihood: number;
}

export interface ClusterTopic {
  terms: ClusterTerm[];
  name: string;
}

interface Candidate extends ClusterTerm {
  form: string;
}

const fewestWorks = 3;
const leastShare = 0.05;
const leastLogLikelihood = 3.841459;
const coveredShare = 0.8;
const termsKept = 10;
/** Candidates compared with each other for cover; far more than are kept. */
const candidatesKept = 60;

/** Reads the terms of all works once; `describe` can then be asked for any number of clusterings of them. */
export class TopicTerms {
  private readonly index: TermIndex;
  /** Works that have each term. */
  private readonly works: Uint32Array;
  private readonly worksWithText: number;

  constructor(sources: readonly TermSource[]) {
    this.index = extractTerms(sources);
    this.works = new Uint32Array(this.index.forms.length);
    for (const term of this.index.terms) this.works[term] += 1;
    this.worksWithText = this.index.hasText.reduce((sum, has) => sum + has, 0);
  }

  /**
   * Terms and names of clusters 0 .. letters.length - 1; `clusters` gives the cluster of each work, negative for none.
   * Names are unique within the list.
   */
  describe(clusters: Int32Array, letters: readonly string[]): ClusterTopic[] {
    const members: number[][] = letters.map(() => []);
    clusters.forEach((cluster, work) => {
      if (cluster >= 0 && this.index.hasText[work] === 1) members[cluster].push(work);
    });
    const inCluster = new Uint32Array(this.index.forms.length);
    const lists = members.map((works) => this.rankTerms(works, inCluster));
    const names = nameClusters(lists, letters);
    return lists.map((terms, cluster) => ({ name: names[cluster], terms: terms.slice(0, termsKept).map(({ term, works, logLikelihood }) => ({ term, works, logLikelihood })) }));
  }

  /** `inCluster`: counters, all 0, left as they were found. */
  private rankTerms(works: number[], inCluster: Uint32Array): Candidate[] {
    const { offsets, terms, forms, spellings } = this.index;
    const met: number[] = [];
    for (const work of works) {
      for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
        if (inCluster[terms[place]] === 0) met.push(terms[place]);
        inCluster[terms[place]] += 1;
      }
    }
    const least = Math.max(fewestWorks, leastShare * works.length);
    const candidates: Candidate[] = [];
    for (const term of met) {
      const inWith = inCluster[term];
      inCluster[term] = 0;
      if (inWith < least) continue;
      const outWith = this.works[term] - inWith;
      const logLikelihood = signedLogLikelihood({ inWith, inWithout: works.length - inWith, outWith, outWithout: this.worksWithText - works.length - outWith });
      if (logLikelihood >= leastLogLikelihood) candidates.push({ form: forms[term], term: spellings[term], works: inWith, logLikelihood });
    }
    candidates.sort((one, other) => other.logLikelihood - one.logLikelihood || other.form.length - one.form.length || (one.form < other.form ? -1 : 1));
    return dropCovered(candidates.slice(0, candidatesKept));
  }
}

/** Drops terms that a longer one says as well: it holds their words in a row and is in most of their works. */
function dropCovered(candidates: Candidate[]): Candidate[] {
  const covers = (longer: Candidate, shorter: Candidate): boolean =>
    longer.form.length > shorter.form.length && ` ${longer.form} `.includes(` ${shorter.form} `) && longer.works >= coveredShare * shorter.works;
  return candidates.filter((shorter) => !candidates.some((longer) => covers(longer, shorter)));
}

function nameClusters(lists: Candidate[][], letters: readonly string[]): string[] {
  const names = lists.map((terms, cluster) => (terms.length === 0 ? `Cluster ${letters[cluster]}` : joinTerms(terms, 2)));
  const taken = new Map<string, number[]>();
  names.forEach((name, cluster) => taken.set(name, [...(taken.get(name) ?? []), cluster]));
  for (const clusters of taken.values()) {
    if (clusters.length > 1) for (const cluster of clusters) names[cluster] = joinTerms(lists[cluster], 3);
  }
  const given = new Set<string>();
  return names.map((name, cluster) => {
    // Two clusters may share their three strongest terms; the letter is unique.
    const own = given.has(name) ? `${name} (${letters[cluster]})` : name;
    given.add(own);
    return own;
  });
}

/** The strongest terms that share no word (plural or not) with each other, at most `count`. */
function joinTerms(terms: Candidate[], count: number): string {
  const used = new Set<string>();
  const chosen: string[] = [];
  for (const { form, term } of terms) {
    if (chosen.length === count) break;
    const stems = form.split(' ').map(stemOf);
    if (stems.some((stem) => used.has(stem))) continue;
    stems.forEach((stem) => used.add(stem));
    chosen.push(term);
  }
  return chosen.join(', ');
}

/** Rough on purpose: enough to see that "peatlands" repeats "peatland". */
const stemOf = (word: string): string => (word.length > 4 ? word.replace(/(?:es|s|en|e)$/, '') : word);
