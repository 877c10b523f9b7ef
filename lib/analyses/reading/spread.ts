import { select } from '@/lib/db/bulk';

export interface SpreadBin {
  from: number;
  /** Not included, except in the last bin. */
  to: number;
  count: number;
}

/**
 * How a measure is spread over the works of an analysis, in bins that double in width: such measures run over orders of magnitude, and
 * equal bins would put nearly all works into the first one. Citations begin with bins for 0 and 1, PageRank at a sixteenth of the mean.
 */
export async function readSpread(analysisId: number, measure: 'inDegree' | 'pageRank'): Promise<SpreadBin[]> {
  const step = measure === 'inDegree' ? 'IF(inDegree = 0, -1, FLOOR(LOG2(inDegree)))' : 'GREATEST(-4, FLOOR(LOG2(GREATEST(pageRank, 1e-9))))';
  const rows = await select<{ step: number; total: number }>(null, `SELECT ${step} AS step, COUNT(*) AS total FROM analysis_works WHERE analysisId = ? GROUP BY step ORDER BY step`, [analysisId]);
  if (rows.length === 0) return [];
  const counts = new Map(rows.map((row) => [Number(row.step), Number(row.total)]));
  const [first, last] = [measure === 'inDegree' ? -1 : Number(rows[0].step), Number(rows[rows.length - 1].step)];
  return Array.from({ length: last - first + 1 }, (_, index) => {
    const at = first + index;
    const from = measure === 'inDegree' && at === -1 ? 0 : measure === 'pageRank' && at === -4 ? 0 : 2 ** at;
    return { from, to: measure === 'inDegree' && at === -1 ? 1 : 2 ** (at + 1), count: counts.get(at) ?? 0 };
  });
}
