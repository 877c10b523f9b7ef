import { z } from 'zod';

import { id, paging, sortBy, yearQuery } from '@/lib/api/schemas';
import { bases } from '@/lib/network/types';

/** Columns by which works of an analysis can be sorted. */
export const workSorts = ['rank', 'pageRank', 'pageRankHigh', 'inDegree', 'outDegree', 'year', 'title', 'agePercentile', 'citationsPerYear', 'citationRank'] as const;
export type WorkSort = (typeof workSorts)[number];

export const basis = z.enum(bases).default('cocitation');

const filters = {
  q: paging.q,
  yearFrom: yearQuery,
  yearTo: yearQuery,
  /** Letter of a cluster on `basis`, or "none" for works without one. */
  cluster: z.string().regex(/^([A-Z]{1,4}|none)$/, 'must be the letter of a cluster, or none').optional(),
  /** Letters of clusters on `basis` to leave out, "-" for works in no cluster; as hidden on the map. */
  off: z.string().max(2_000).regex(/^([A-Z]{1,4}|-)(,([A-Z]{1,4}|-))*$/, 'must be letters of clusters with commas between').optional(),
  basis,
  catalogued: z.enum(['true', 'false']).optional(),
};

const sort = sortBy(workSorts, 'rank');

/** Filters and sort of the ranking; the table, its exports and the map's table twin share them. */
export const analysisWorksQuery = z.object({ ...filters, page: paging.page, pageSize: paging.pageSize, sort });
export type AnalysisWorksQuery = z.output<typeof analysisWorksQuery>;
export type WorkFilters = Pick<AnalysisWorksQuery, 'q' | 'yearFrom' | 'yearTo' | 'cluster' | 'off' | 'basis' | 'catalogued'>;

export const clustersQuery = z.object({ basis, page: paging.page, pageSize: paging.pageSize });
export const mapQuery = z.object({ basis });

export const measures = ['inDegree', 'outDegree', 'pageRank', 'agePercentile', 'citationsPerYear'] as const;
export type Measure = (typeof measures)[number];

/** `page` and `pageSize` leaf through the places where references were read. */
export const evidenceQuery = z.object({ work: id, measure: z.enum(measures), page: paging.page, pageSize: paging.pageSize.unwrap().default(20) });

export const exportFormats = ['csv', 'json', 'graphml', 'svg'] as const;
export const exportQuery = z.object({ ...filters, sort, format: z.enum(exportFormats), scheme: z.enum(['light', 'dark']).default('light') });
export type ExportQuery = z.output<typeof exportQuery>;

export const analysesQuery = z.object({ page: paging.page, pageSize: paging.pageSize, state: z.enum(['queued', 'running', 'finished', 'failed', 'cancelled']).optional() });
