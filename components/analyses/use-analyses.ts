'use client';

import { type SWRConfiguration } from 'swr';

import { type ApiProblem } from '@/lib/api/client';
import { apiPath, useApi } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type AnalysisMap, type AnalysisView, type EvidenceView } from '@/lib/api/types';

type Options<Result> = SWRConfiguration<Result, ApiProblem>;

/** States in which an analysis goes on by itself; pages look again every second meanwhile. */
export const analysisMoves = (analysis: Pick<AnalysisView, 'state'>): boolean => analysis.state === 'queued' || analysis.state === 'running';
const pollInterval = 1000;
const whileAnalysisMoves = (row: AnalysisView | undefined) => (row && analysisMoves(row) ? pollInterval : 0);
const whileAnalysesMove = (page: Page<AnalysisView> | undefined) => (page?.items.some(analysisMoves) ? pollInterval : 0);

/** Results of a finished analysis never change: asked once, they hold. */
const fixed = { revalidateIfStale: false, revalidateOnFocus: false, revalidateOnReconnect: false };

export const useAnalysis = (analysisId: string, options?: Options<AnalysisView>) =>
  useApi<AnalysisView>(`/api/analyses/${analysisId}`, { refreshInterval: whileAnalysisMoves, ...options });

export const useAnalyses = (portfolioId: string, query: { page: number; pageSize?: number }, options?: Options<Page<AnalysisView>>) =>
  useApi<Page<AnalysisView>>(apiPath(`/api/portfolios/${portfolioId}/analyses`, query), { refreshInterval: whileAnalysesMove, ...options });

export const useEvidence = (analysisId: string, query: { work: string; measure: string; pageSize: number } | null, options?: Options<EvidenceView>) =>
  useApi<EvidenceView>(query && apiPath(`/api/analyses/${analysisId}/evidence`, query), { ...fixed, keepPreviousData: false, ...options });

export const useMap = (analysisId: string, basis: string) => useApi<AnalysisMap>(apiPath(`/api/analyses/${analysisId}/map`, { basis }), { ...fixed, keepPreviousData: false });

export interface JobState {
  id: string;
  state: 'queued' | 'running' | 'done' | 'failed' | 'cancelled';
  error: string | null;
}

const whileJobRuns = (job: JobState | undefined) => (!job || job.state === 'queued' || job.state === 'running' ? pollInterval : 0);

export const useJob = (jobId: string | null) => useApi<JobState>(jobId && `/api/jobs/${jobId}`, { refreshInterval: whileJobRuns, keepPreviousData: false });
