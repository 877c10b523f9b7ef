import { presentAnalysis } from '@/lib/analyses/reading/analyses';
import { type AnalysisView } from '@/lib/api/types';
import { Analysis } from '@/models/analysis';

/** The newest analysis of the portfolio, in whatever state it is, or null. */
export async function latestAnalysis(portfolioId: number): Promise<AnalysisView | null> {
  const row = await Analysis.findOne({ where: { portfolioId }, order: [['id', 'DESC']] });
  return row && presentAnalysis(row);
}
