import { type Metadata } from 'next';

import { AnalysisPage } from '@/components/analyses/analysis-page';
import { describeParameters } from '@/lib/analyses/reading/methods';
import { analysisForPage } from '@/lib/analyses/reading/pages';

export const metadata: Metadata = { title: 'Analysis' };

export default async function Page({ params }: { params: Promise<{ portfolioId: string; analysisId: string }> }) {
  const { portfolioId, analysisId } = await params;
  const { analysis, mayRun } = await analysisForPage(portfolioId, analysisId);
  return <AnalysisPage analysis={analysis} parameters={describeParameters(analysis.parameters)} mayRun={mayRun} />;
}
