import { type Computed } from '@/lib/analyses/compute';
import { type LoadedNetwork } from '@/lib/analyses/input';
import { type AnalysisMap } from '@/lib/api/types';
import { database } from '@/lib/db/connection';
import { insertRows, run, selectIn, type Cell } from '@/lib/db/bulk';
import { type AnalysisParameters, type AnalysisResult, type BasisResult } from '@/lib/network/types';
import { storage } from '@/lib/services/storage';
import { Analysis, type AnalysisCoverage, type AnalysisSummary } from '@/models/analysis';

/** null is the one way to say "no value" in the database and in JSON. */
const valued = (value: number): number | null => (Number.isFinite(value) ? value : null);
const rounded = (value: number, digits: number): number => Number(value.toFixed(digits));

interface Label {
  id: number;
  title: string | null;
  authorsLabel: string | null;
  venue: string | null;
  doi: string | null;
  retracted: number;
}

function mapOf(analysisId: number, basis: BasisResult, result: AnalysisResult, network: LoadedNetwork, labels: Map<number, Label>, parameters: AnalysisParameters): AnalysisMap {
  const drawn: number[] = [];
  const place = new Int32Array(result.workIndex.length).fill(-1);
  for (let work = 0; work < result.workIndex.length; work += 1) {
    if (!Number.isFinite(basis.x[work])) continue;
    place[work] = drawn.length;
    drawn.push(work);
  }
  const inputOf = (work: number) => network.input.works[result.workIndex[work]];
  const labelOf = (work: number) => labels.get(network.workIds[result.workIndex[work]]);
  return {
    analysisId: String(analysisId),
    basis: basis.basis,
    ids: drawn.map((work) => String(network.workIds[result.workIndex[work]])),
    titles: drawn.map((work) => labelOf(work)?.title ?? null),
    authors: drawn.map((work) => labelOf(work)?.authorsLabel ?? null),
    years: drawn.map((work) => inputOf(work).year),
    x: drawn.map((work) => rounded(basis.x[work], 4)),
    y: drawn.map((work) => rounded(basis.y[work], 4)),
    size: drawn.map((work) => result.inDegree[work]),
    pageRank: drawn.map((work) => rounded(result.pageRank[work], 5)),
    rank: drawn.map((work) => result.rank[work]),
    catalogued: drawn.map((work) => inputOf(work).catalogued),
    retracted: drawn.map((work) => Boolean(labelOf(work)?.retracted)),
    cluster: drawn.map((work) => basis.cluster[work]),
    firmness: drawn.map((work) => (Number.isFinite(basis.firmness[work]) ? rounded(basis.firmness[work], 3) : null)),
    clusters: basis.clusters.map((cluster, number) => ({ number, letter: cluster.letter, name: cluster.name, size: cluster.size, firmness: valued(cluster.firmness) })),
    links: {
      source: [...basis.linkSource].map((work) => place[work]),
      target: [...basis.linkTarget].map((work) => place[work]),
      weight: [...basis.linkWeight].map((weight) => rounded(weight, 5)),
    },
    notDrawn: result.workIndex.length - drawn.length,
    similarity: basis.basis === 'citation' ? 'citations' : parameters.similarity,
  };
}

function flowsOf(basis: BasisResult): { letters: string[]; citations: number[][] } {
  const size = basis.clusters.length;
  return {
    letters: basis.clusters.map((cluster) => cluster.letter),
    citations: Array.from({ length: size }, (_, row) => [...basis.clusterCitations.subarray(row * size, (row + 1) * size)]),
  };
}

function summaryOf(result: AnalysisResult, elapsedMs: number): AnalysisSummary {
  const { run: how } = result;
  return {
    works: how.works, cataloguedWorks: how.cataloguedWorks, citedOnlyWorks: how.citedOnlyWorks, citations: how.citations, danglingWorks: how.danglingWorks, loops: how.loops,
    loopWorks: how.loopWorks, backwardLinks: how.backwardLinks, skippedForReferences: how.skippedForReferences, lastYear: how.lastYear, pageRankIterations: how.pageRankIterations,
    pageRankResidual: how.pageRankResidual, elapsedMs,
    bases: result.bases.map((basis) => ({ basis: basis.basis, clusters: basis.clusters.length, linkedWorks: basis.linkedWorks, pairs: basis.pairs, modularity: basis.modularity, agreementMean: basis.agreementMean, agreementMinimum: basis.agreementMinimum })),
  };
}

/** Stores a finished analysis: rows in one transaction, artifacts before it, so that a finished analysis always has all of its parts. */
export async function storeResult(row: Analysis, network: LoadedNetwork, computed: Computed, coverage: AnalysisCoverage, elapsedMs: number): Promise<void> {
  const { result } = computed;
  const ids = [...result.workIndex].map((index) => network.workIds[index]);
  const labels = new Map((await selectIn<Label, number>(null, 'SELECT id, title, authorsLabel, venue, doi, retracted FROM works WHERE id IN (?)', ids)).map((label) => [label.id, label]));
  for (const basis of result.bases) {
    await storage().write(`analyses/${row.id}/map-${basis.basis}.json`, JSON.stringify(mapOf(row.id, basis, result, network, labels, row.parameters)));
    await storage().write(`analyses/${row.id}/flows-${basis.basis}.json`, JSON.stringify(flowsOf(basis)));
  }
  const works: Cell[][] = ids.map((workId, work) => {
    const label = labels.get(workId);
    const input = network.input.works[result.workIndex[work]];
    const clusters = (['cocitation', 'coupling', 'citation'] as const).flatMap((name) => {
      const basis = result.bases.find((one) => one.basis === name);
      const cluster = basis ? basis.cluster[work] : -1;
      return [cluster < 0 ? null : cluster, basis ? valued(basis.firmness[work]) : null];
    });
    return [
      row.id, work, workId, input.catalogued, label?.title?.slice(0, 1000) ?? null, label?.authorsLabel ?? null, input.year, label?.venue?.slice(0, 300) ?? null, label?.doi ?? null, Boolean(label?.retracted),
      result.inDegree[work], result.outDegree[work], result.pageRank[work], result.pageRankHigh[work], result.rank[work], result.rankLow[work], result.rankHigh[work],
      result.citationRank[work], result.citationRankLow[work], result.citationRankHigh[work], valued(result.agePercentile[work]), valued(result.citationsPerYear[work]), Boolean(result.inLoop[work]), ...clusters,
    ];
  });
  const clusterRows: Cell[][] = result.bases.flatMap((basis) =>
    basis.clusters.map((cluster, number) => [
      row.id, basis.basis, number, cluster.letter, cluster.name.slice(0, 300), cluster.size, JSON.stringify(cluster.terms), valued(cluster.firmness), cluster.conductance, cluster.firstYear, cluster.medianYear, cluster.lastYear,
    ]),
  );
  await database().transaction(async (transaction) => {
    await run(transaction, 'DELETE FROM analysis_works WHERE analysisId = ?', [row.id]);
    await run(transaction, 'DELETE FROM analysis_clusters WHERE analysisId = ?', [row.id]);
    await insertRows(
      transaction,
      `INSERT INTO analysis_works (analysisId, position, workId, catalogued, title, authorsLabel, year, venue, doi, retracted, inDegree, outDegree, pageRank, pageRankHigh, \`rank\`, rankLow, rankHigh,
       citationRank, citationRankLow, citationRankHigh, agePercentile, citationsPerYear, inLoop, cocitationCluster, cocitationFirmness, couplingCluster, couplingFirmness, citationCluster, citationFirmness)`,
      works,
    );
    await insertRows(transaction, 'INSERT INTO analysis_clusters (analysisId, basis, number, letter, name, size, terms, firmness, conductance, firstYear, medianYear, lastYear)', clusterRows);
    // Only a running analysis finishes: one that was cancelled meanwhile stays cancelled.
    await Analysis.update(
      {
        state: 'finished', progressStage: null, progressDone: 0, progressTotal: 0, inputFingerprint: computed.inputFingerprint, resultFingerprint: computed.resultFingerprint, engine: result.run.engine,
        coverage, summary: summaryOf(result, elapsedMs), error: null, finishedAt: new Date(),
      },
      { where: { id: row.id, state: 'running' }, transaction },
    );
  });
}
