import { analyseNetwork, serialiseInput, serialiseResult } from '@/lib/network/analysis';
import { generateNetwork } from '@/lib/network/generate';
import { defaultParameters, type AnalysisResult } from '@/lib/network/types';
import { type Measurement } from '@/scripts/bench/table';

const works = 10_000;

/** A full analysis with default parameters on a made network of 10,000 catalogued works, about 300,000 citations among them and 100,000 of works outside. */
export function benchNetwork(): Measurement[] {
  const input = generateNetwork({ works, meanReferences: 30, outsideCitations: 100_000, seed: 1 });
  const stages = new Map<string, number>();
  let stage = '';
  let since = performance.now();
  const close = (next: string): void => {
    const now = performance.now();
    if (stage !== '') stages.set(stage, (stages.get(stage) ?? 0) + now - since);
    stage = next;
    since = now;
  };
  const started = performance.now();
  const processor = process.cpuUsage();
  const result = analyseNetwork(input, defaultParameters, (name) => {
    if (name !== stage) close(name);
  });
  close('serialising');
  const total = performance.now() - started;
  const { user, system } = process.cpuUsage(processor);
  const bytes = serialiseResult(result).length + serialiseInput(input, defaultParameters).length;
  close('');
  const { run } = result;
  return [
    { name: 'whole analysis', value: total, unit: 'ms', note: `${run.cataloguedWorks} catalogued + ${run.citedOnlyWorks} cited-only works, ${run.citations} citations, one thread` },
    { name: 'processor time of it', value: (user + system) / 1000, unit: 'ms', note: 'all threads of the process, so garbage collection too; differs from the first row where others use the machine' },
    ...[...stages].map(([name, value]) => ({ name, value, unit: 'ms', note: noteOf(name, result, bytes) })),
    { name: 'peak memory of the process', value: process.resourceUsage().maxRSS / 1024, unit: 'MiB', note: 'with the input and the generator' },
  ];
}

function noteOf(stage: string, result: AnalysisResult, bytes: number): string | undefined {
  if (stage === 'serialising') return `${bytes} bytes of input and result`;
  if (stage === 'rank intervals') return `${defaultParameters.replicates} replicates`;
  const basis = result.bases.find(({ basis: name }) => stage.startsWith(name === 'cocitation' ? 'co-citation' : name));
  if (!basis) return undefined;
  if (stage.endsWith('pairs')) return `${basis.pairs} pairs`;
  if (stage.endsWith('clusters')) return `${basis.clusters.length} clusters, ${defaultParameters.repeats} repeats, modularity ${basis.modularity.toFixed(4)}`;
  return stage.endsWith('map') ? `${basis.linkedWorks} works, ${basis.linkSource.length} links` : undefined;
}

export const run = async (): Promise<Measurement[]> => benchNetwork();
