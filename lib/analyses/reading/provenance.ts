import { describeParameters, exportCautions } from '@/lib/analyses/reading/methods';
import { type ExportQuery } from '@/lib/analyses/reading/queries';
import { type Analysis } from '@/models/analysis';

/** What an export says of where it comes from. Holds no clock and no name of a person: the same analysis gives the same bytes. */
export interface Provenance {
  service: 'Heddle';
  analysisId: string;
  portfolioId: string;
  portfolio: string;
  finishedAt: string | null;
  engine: string | null;
  fingerprints: { input: string | null; result: string | null };
  parameters: Analysis['parameters'];
  parametersInWords: { label: string; value: string }[];
  coverage: Analysis['coverage'];
  filters: Record<string, string | number>;
  cautions: string[];
}

function filtersOf(query: ExportQuery): Record<string, string | number> {
  const filters: Record<string, string | number> = {};
  for (const name of ['q', 'yearFrom', 'yearTo', 'cluster', 'off', 'catalogued'] as const) {
    const value = query[name];
    if (value !== undefined && value !== '') filters[name] = value;
  }
  if (filters.cluster !== undefined || filters.off !== undefined) filters.basis = query.basis;
  return { ...filters, sort: `${query.sort.descending ? '-' : ''}${query.sort.field}` };
}

export function provenanceOf(analysis: Analysis, portfolio: string, query: ExportQuery): Provenance {
  return {
    service: 'Heddle',
    analysisId: String(analysis.id),
    portfolioId: String(analysis.portfolioId),
    portfolio,
    finishedAt: analysis.finishedAt?.toISOString() ?? null,
    engine: analysis.engine,
    fingerprints: { input: analysis.inputFingerprint, result: analysis.resultFingerprint },
    parameters: analysis.parameters,
    parametersInWords: describeParameters(analysis.parameters),
    coverage: analysis.coverage,
    filters: filtersOf(query),
    cautions: exportCautions(analysis.coverage),
  };
}

/** One line below a picture or in the head of a network file. */
export function provenanceLine(provenance: Pick<Provenance, 'portfolio' | 'analysisId' | 'finishedAt' | 'parameters' | 'fingerprints'>): string {
  const day = provenance.finishedAt === null ? '' : `, ${new Date(provenance.finishedAt).toLocaleDateString('en-GB', { day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' })}`;
  const result = provenance.fingerprints.result === null ? '' : ` · result ${provenance.fingerprints.result.slice(0, 12)}`;
  return `Heddle · ${provenance.portfolio} · analysis ${provenance.analysisId}${day} · seed ${provenance.parameters.seed}${result}`;
}
