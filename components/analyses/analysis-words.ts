import { count, formatShare } from '@/components/ui/numbers';
import { type AnalysisView } from '@/lib/api/types';
import { type AnalysisParameters, type Basis } from '@/lib/network/types';

export const basisWords: Record<Basis, string> = { cocitation: 'Cited together', coupling: 'Shared references', citation: 'Citing each other' };

/** What a link on a basis means, in one sentence. */
export const basisMeaning: Record<Basis, string> = {
  cocitation: 'Two works are linked when works of this portfolio cite both.',
  coupling: 'Two works are linked when they cite the same works.',
  citation: 'Two works are linked when one cites the other.',
};

export const stateWords: Record<AnalysisView['state'], string> = { queued: 'Waiting', running: 'Running', finished: 'Finished', failed: 'Failed', cancelled: 'Cancelled' };

const steps: [stage: string, words: string, weight: number][] = [
  ['loading', 'Reading works and citations', 2],
  ['network', 'Building the network', 1],
  ['ranks', 'Ranking works', 1],
  ['rank intervals', 'Resampling for rank intervals', 4],
  ['words', 'Reading titles and keywords', 1],
  ...(['co-citation', 'coupling', 'citation'] as const).flatMap((basis): [string, string, number][] => [
    [`${basis}: pairs`, `Counting pairs, ${basis}`, 2],
    [`${basis}: clusters`, `Finding clusters, ${basis}`, 4],
    [`${basis}: map`, `Laying out the map, ${basis}`, 4],
    [`${basis}: terms`, `Naming clusters, ${basis}`, 1],
  ]),
  ['storing', 'Storing the result', 2],
];
const wholeWeight = steps.reduce((sum, [, , weight]) => sum + weight, 0);

/** How far a running analysis is: its stage in words, and a share of the whole from the stages' usual lengths. */
export function progressOf({ stage, done, total }: AnalysisView['progress']): { words: string; done: number; total: number } {
  const at = steps.findIndex(([name]) => name === stage?.toLowerCase());
  if (at < 0) return { words: stage ?? 'Starting', done: 0, total: 0 };
  const before = steps.slice(0, at).reduce((sum, [, , weight]) => sum + weight, 0);
  const within = total > 0 ? Math.min(1, done / total) : 0;
  return { words: `${steps[at][1]} (step ${at + 1} of ${steps.length}${within > 0 ? `, ${Math.round(within * 100)}%` : ''})`, done: Math.round(((before + within * steps[at][2]) / wholeWeight) * 1000), total: 1000 };
}

/** "4,812 works, 96,204 references, 87% linked". */
export function analysisFacts({ summary, coverage }: AnalysisView): string {
  const facts = [];
  if (summary) facts.push(count(summary.works, 'work'));
  if (coverage) facts.push(count(coverage.references, 'reference'), `${formatShare(coverage.references > 0 ? coverage.linkedReferences / coverage.references : null)} lead to a catalogued work`);
  return facts.join(', ');
}

/** What sets an analysis apart from others of its portfolio, in a few words. */
export function parameterWords(parameters: AnalysisParameters): string {
  const { periodFrom, periodTo } = parameters;
  const words = [parameters.scope === 'catalogued' ? 'catalogued works only' : `with cited-only works from ${count(parameters.minimumCitations, 'citation')}`];
  if (periodFrom !== null || periodTo !== null) words.push(`citing works ${periodFrom ?? '…'}–${periodTo ?? '…'}`);
  words.push(`damping ${parameters.damping}`, parameters.similarity.replace('-', ' '), `${parameters.clustering === 'leiden' ? 'Leiden' : 'Louvain'} at ${parameters.resolution}`, `seed ${parameters.seed}`);
  return words.join(', ');
}
