'use client';

import { useState } from 'react';

import useSWR, { type SWRConfiguration, type SWRResponse } from 'swr';

import { fetchJson, type ApiProblem } from '@/lib/api/client';
import { type Page } from '@/lib/api/schemas';
import {
  type ImportColumnsView,
  type ImportProblemView,
  type ImportRecordView,
  type ImportView,
  type MatchView,
  type PortfolioDetail,
  type PortfolioView,
  type WorkDetail,
  type WorkListItem,
  type WorkReferenceView,
} from '@/lib/api/types';

type Query = Record<string, string | number | boolean | null | undefined>;

/** The address of an API route with its query, keys in a fixed order so that equal questions share one answer. */
export function apiPath(path: string, query: Query = {}): string {
  const search = new URLSearchParams();
  for (const key of Object.keys(query).sort()) {
    const value = query[key];
    if (value !== undefined && value !== null && value !== '') search.set(key, String(value));
  }
  const text = search.toString();
  return text ? `${path}?${text}` : path;
}

/**
 * Reads a route of the API. `fallbackData` is what the server knew when it drew the page: with it the first paint needs no spinner.
 * The answer to a former question stays in view while the next one is on its way.
 *
 * A function given as `refreshInterval` decides by what is shown. SWR itself would ask it only when it starts its timer, and start the timer
 * anew for every other function; so it is given the number.
 */
export function useApi<Result>(path: string | null, { refreshInterval, ...options }: SWRConfiguration<Result, ApiProblem> = {}): SWRResponse<Result, ApiProblem> {
  const [interval, setInterval] = useState(0);
  const answer = useSWR<Result, ApiProblem>(path, fetchJson<Result>, {
    keepPreviousData: true,
    // 4xx do not change by asking again.
    shouldRetryOnError: (error: ApiProblem) => error.status === 0 || error.status >= 500,
    ...options,
    refreshInterval: interval,
  });
  const wanted = typeof refreshInterval === 'function' ? refreshInterval(answer.data) : (refreshInterval ?? 0);
  if (wanted !== interval) setInterval(wanted);
  return answer;
}

type Options<Result> = SWRConfiguration<Result, ApiProblem>;

export const usePortfolios = (query: Query = {}, options?: Options<Page<PortfolioView>>) => useApi(apiPath('/api/portfolios', query), options);

export const usePortfolio = (portfolioId: string, options?: Options<PortfolioDetail>) => useApi(`/api/portfolios/${portfolioId}`, options);

export const usePortfolioWorks = (portfolioId: string, query: Query, options?: Options<Page<WorkListItem>>) => useApi(apiPath(`/api/portfolios/${portfolioId}/works`, query), options);

export const useWork = (workId: string, options?: Options<WorkDetail>) => useApi(`/api/works/${workId}`, options);

export const useWorkReferences = (workId: string, query: Query, options?: Options<Page<WorkReferenceView>>) => useApi(apiPath(`/api/works/${workId}/references`, query), options);

export const useCitingWorks = (workId: string, query: Query, options?: Options<Page<WorkListItem>>) => useApi(apiPath(`/api/works/${workId}/citing`, query), options);

/** States in which an import goes on by itself; pages look again every second meanwhile. */
const moving = new Set<ImportView['state']>(['uploaded', 'reading', 'checking', 'accepting', 'undoing']);
export const importMoves = (row: ImportView): boolean => moving.has(row.state) || (row.progress.stage?.startsWith('undoing') ?? false);
const pollInterval = 1000;
const whileImportsMove = (page: Page<ImportView> | undefined) => (page?.items.some(importMoves) ? pollInterval : 0);
const whileImportMoves = (row: ImportView | undefined) => (row && importMoves(row) ? pollInterval : 0);

export const useImports = (portfolioId: string, query: Query, options?: Options<Page<ImportView>>) =>
  useApi(apiPath(`/api/portfolios/${portfolioId}/imports`, query), { refreshInterval: whileImportsMove, ...options });

export const useImport = (importId: string, options?: Options<ImportView>) => useApi(`/api/imports/${importId}`, { refreshInterval: whileImportMoves, ...options });

export const useImportColumns = (importId: string | null) => useApi<ImportColumnsView>(importId && `/api/imports/${importId}/columns`, { revalidateOnFocus: false });

export const useImportRecords = (importId: string, query: Query, options?: Options<Page<ImportRecordView>>) => useApi(apiPath(`/api/imports/${importId}/records`, query), options);

export const useImportProblems = (importId: string, query: Query, options?: Options<Page<ImportProblemView>>) => useApi(apiPath(`/api/imports/${importId}/problems`, query), options);

export const useMatches = (portfolioId: string, query: Query, options?: Options<Page<MatchView>>) => useApi(apiPath(`/api/portfolios/${portfolioId}/matches`, query), options);
