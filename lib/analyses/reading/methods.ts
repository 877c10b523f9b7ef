import { type Measure } from '@/lib/analyses/reading/queries';
import { type AnalysisParameters } from '@/lib/network/types';
import { type AnalysisCoverage } from '@/models/analysis';

type CautionCode = 'C1' | 'C2' | 'C3' | 'C4' | 'C5' | 'C6' | 'C7' | 'C8' | 'C9' | 'C10' | 'C11' | 'C12' | 'C13';

interface Method {
  name: string;
  /** How the figure is counted, in words. */
  definition: string;
  /** Where the method comes from. */
  source: string;
  doi: string | null;
  cautions: readonly CautionCode[];
}

/** One entry per measure: what evidence panels, exports and the methods page say of it. */
export const methods: Record<Measure, Method> = {
  inDegree: {
    name: 'Citations here',
    definition: 'Distinct works of this analysis that cite the work. A work that names it twice counts once; a work citing itself is left out.',
    source: 'Garfield (1955), Citation indexes for science, Science 122:108–111',
    doi: '10.1126/science.122.3159.108',
    cautions: ['C1', 'C2', 'C3', 'C7', 'C8', 'C9', 'C10'],
  },
  outDegree: {
    name: 'Works cited here',
    definition: 'Distinct works of this analysis that the work cites. References to works outside the analysis are not counted.',
    source: 'Price (1965), Networks of scientific papers, Science 149:510–515',
    doi: '10.1126/science.149.3683.510',
    cautions: ['C1', 'C8'],
  },
  pageRank: {
    name: 'PageRank',
    definition:
      'Where a reader ends up who follows references at random, and at each step starts again at a random work instead with a fixed chance. Shown so that the mean work has 1. Readers of works without references start again anywhere.',
    source: 'Brin & Page (1998), The anatomy of a large-scale hypertextual web search engine, Computer Networks and ISDN Systems 30:107–117; on citations: Chen, Xie, Maslov & Redner (2007), Finding scientific gems, J. Informetrics 1:8–15',
    doi: '10.1016/S0169-7552(98)00110-X',
    cautions: ['C1', 'C2', 'C5', 'C7', 'C8', 'C11'],
  },
  agePercentile: {
    name: 'Age-fair percentile',
    definition: 'Share of the works of the same publication year in this analysis that have fewer citations here, with half of those that have as many, in percent. 50 is the middle of its year.',
    source: 'Bornmann, Leydesdorff & Mutz (2013), The use of percentiles and percentile rank classes, J. Informetrics 7:158–165',
    doi: '10.1016/j.joi.2012.10.001',
    cautions: ['C1', 'C2', 'C4', 'C7', 'C9', 'C10', 'C12', 'C13'],
  },
  citationsPerYear: {
    name: 'Citations per year',
    definition: 'Citations here divided by the years from publication to the last year of the analysis, at least one.',
    source: 'Garfield (1955), Citation indexes for science, Science 122:108–111',
    doi: '10.1126/science.122.3159.108',
    cautions: ['C1', 'C2', 'C3', 'C7', 'C8', 'C9', 'C10'],
  },
};

const percent = (share: number) => `${Math.round(share * 100)}%`;

function coverageCaution(coverage: AnalysisCoverage | null): string {
  const rest = 'Only imported records count.';
  if (!coverage || coverage.references === 0 || coverage.cataloguedWorks === 0) return rest;
  return `${rest} ${percent(coverage.worksWithReferences / coverage.cataloguedWorks)} of the catalogued works carry references; ${percent(coverage.linkedReferences / coverage.references)} of their references lead to a catalogued work.`;
}

/** The cautions of the methods page in the words in which they stand beside a figure. */
const words: Record<Exclude<CautionCode, 'C1'>, string> = {
  C2: 'Young works have had little time to be cited, and the last year is incomplete.',
  C3: 'Fields cite differently; raw counts compare only within a field.',
  C4: 'Small numbers move easily: a year with few works gives coarse percentiles.',
  C5: 'The figure depends on method, parameters and seed.',
  C6: 'Not for decisions about a person.',
  C7: 'It shows use within this portfolio, not quality.',
  C8: 'Linking of references makes errors both ways; open the places to check.',
  C9: 'Citations of and by retracted works are counted; retracted works are marked.',
  C10: 'Same-author citations are counted; their number is shown beside the figure.',
  C11: 'Read the interval, not the rank alone.',
  C12: 'Languages and document types are covered unequally.',
  C13: 'It compares with the works of this analysis, not with the world.',
};

export function cautionsOf(measure: Measure, coverage: AnalysisCoverage | null): string[] {
  return methods[measure].cautions.map((code) => (code === 'C1' ? coverageCaution(coverage) : words[code]));
}

/** Cautions that stand on every table, map and export of an analysis. */
export function exportCautions(coverage: AnalysisCoverage | null): string[] {
  return [words.C7, coverageCaution(coverage), words.C6, words.C11];
}

const similarityNames = { 'association-strength': 'association strength', cosine: 'cosine', jaccard: 'Jaccard' } as const;

/** Every parameter of an analysis, named as on screen. */
export function describeParameters(parameters: AnalysisParameters): { label: string; value: string }[] {
  const { periodFrom, periodTo } = parameters;
  return [
    { label: 'Scope', value: parameters.scope === 'catalogued' ? 'catalogued works only' : `catalogued works, and cited-only works with ${parameters.minimumCitations} citations or more` },
    { label: 'Citing works published', value: periodFrom === null && periodTo === null ? 'any year' : `${periodFrom ?? 'the beginning'} to ${periodTo ?? 'the end'}` },
    { label: 'Damping of PageRank', value: String(parameters.damping) },
    { label: 'Rank intervals', value: parameters.replicates === 0 ? 'none' : `95%, ${parameters.replicates} resamples of the citing works` },
    { label: 'Similarity', value: similarityNames[parameters.similarity] },
    { label: 'Clustering', value: `${parameters.clustering === 'leiden' ? 'Leiden' : 'Louvain'}, resolution ${parameters.resolution}, best of ${parameters.repeats}` },
    { label: 'Longest reference list counted', value: String(parameters.maximumReferences) },
    { label: 'Seed', value: String(parameters.seed) },
  ];
}

const shown: Record<Measure, readonly string[]> = {
  inDegree: ['Scope', 'Citing works published'],
  outDegree: ['Scope', 'Citing works published'],
  pageRank: ['Scope', 'Citing works published', 'Damping of PageRank', 'Rank intervals', 'Seed'],
  agePercentile: ['Scope', 'Citing works published'],
  citationsPerYear: ['Scope', 'Citing works published'],
};

/** The parameters on which a measure depends. */
export function parametersOf(measure: Measure, parameters: AnalysisParameters): { label: string; value: string }[] {
  return describeParameters(parameters).filter(({ label }) => shown[measure].includes(label));
}
