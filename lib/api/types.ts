/**
 * What the API gives, field by field. Presenters in the services list these fields by hand; a row never leaves raw.
 * Ids are decimal strings, dates ISO 8601, null means "no value".
 */
import { type GrantLevel, type Role } from '@/lib/access/permissions';
import { type ColumnKind } from '@/lib/bibliography/readers/delimited-columns';
import { type Format, type PersonName, type WorkType } from '@/lib/bibliography/record';
import { type Basis, type AnalysisParameters } from '@/lib/network/types';
import { type AnalysisCoverage, type AnalysisSummary } from '@/models/analysis';
import { type ImportCounts, type ImportState } from '@/models/import';

export interface ProgressView {
  stage: string | null;
  done: number;
  total: number;
}

export interface UnitView {
  id: string;
  parentId: string | null;
  name: string;
  kind: string;
}

export interface PortfolioView {
  id: string;
  name: string;
  description: string;
  unit: { id: string; name: string } | null;
  periodFrom: number | null;
  periodTo: number | null;
  demonstration: boolean;
  /** What the person may do here. */
  level: GrantLevel;
  works: number;
  updatedAt: string;
}

/** GET /api/portfolios/:id adds what the overview shows. */
export interface PortfolioDetail extends PortfolioView {
  coverage: { cataloguedWorks: number; worksWithReferences: number; references: number; linkedReferences: number; citedOnlyWorks: number };
  years: { year: number; works: number }[];
  imports: { accepted: number; open: number; failed: number };
  openMatches: number;
  latestAnalysis: AnalysisView | null;
  grants: { userId: string; name: string; email: string; role: Role; level: GrantLevel }[] | null;
}

export interface WorkListItem {
  id: string;
  title: string | null;
  authors: string | null;
  year: number | null;
  venue: string | null;
  type: WorkType;
  doi: string | null;
  catalogued: boolean;
  retracted: boolean;
  /** References in its records; 0 for cited-only works. */
  references: number;
  /** Distinct works of this portfolio citing it. */
  citationsHere: number;
  /** Records standing on it. */
  records: number;
}

export interface WorkRecordView {
  id: string;
  importId: string;
  fileName: string;
  format: Format | null;
  line: number;
  raw: string;
  references: number;
}

export interface WorkDetail {
  id: string;
  title: string | null;
  authors: PersonName[];
  authorsLabel: string | null;
  type: WorkType;
  year: number | null;
  venue: string | null;
  volume: string | null;
  issue: string | null;
  firstPage: string | null;
  lastPage: string | null;
  articleNumber: string | null;
  publisher: string | null;
  doi: string | null;
  identifiers: Record<string, string | string[]>;
  abstract: string | null;
  keywords: string[];
  language: string | null;
  url: string | null;
  catalogued: boolean;
  retracted: boolean;
  references: number;
  citing: number;
  cited: number;
  /** Records that the person may see; `hiddenRecords` counts those in portfolios that they were not given. */
  records: WorkRecordView[];
  hiddenRecords: number;
  portfolios: { id: string; name: string }[];
  /** Where it stands in the latest finished analysis of each portfolio that the person may see. */
  standings: { portfolioId: string; portfolioName: string; analysisId: string; rank: number; rankLow: number; rankHigh: number; inDegree: number; pageRank: number }[];
}

export interface WorkReferenceView {
  recordId: string;
  position: number;
  line: number;
  fileName: string;
  raw: string;
  work: { id: string; title: string | null; authors: string | null; year: number | null; catalogued: boolean } | null;
  how: string | null;
}

export interface ImportView {
  id: string;
  portfolioId: string;
  fileName: string;
  format: Format | null;
  encoding: string | null;
  bytes: number;
  sha256: string;
  state: ImportState;
  progress: ProgressView;
  counts: ImportCounts | null;
  error: string | null;
  uploadedBy: string | null;
  createdAt: string;
  startedAt: string | null;
  acceptedAt: string | null;
  undoneAt: string | null;
  /** True in the answer to an upload whose file already stands in this portfolio; the import is the earlier one. */
  alreadyThere?: boolean;
}

/** Of a table: its heads, what they are taken for, and its first rows. */
export interface ImportColumnsView {
  delimiter: string;
  heads: string[];
  columns: (ColumnKind | null)[];
  /** What a person said that the columns hold; null where their heads decided. */
  chosen: (ColumnKind | null)[] | null;
  rows: string[][];
}

export interface ImportRecordView {
  id: string;
  position: number;
  line: number;
  key: string | null;
  title: string | null;
  authors: string | null;
  year: number | null;
  outcome: 'new' | 'known' | 'review' | 'rejected' | null;
  references: number;
  raw: string;
  workId: string | null;
}

export interface ImportProblemView {
  id: string;
  line: number;
  severity: 'error' | 'warning';
  code: string;
  message: string;
  key: string | null;
}

export interface MatchSide {
  recordId: string;
  workId: string | null;
  fileName: string;
  line: number;
  title: string | null;
  authors: string | null;
  year: number | null;
  venue: string | null;
  volume: string | null;
  pages: string | null;
  doi: string | null;
  references: number;
}

export interface MatchView {
  id: string;
  state: 'open' | 'same' | 'different' | 'later';
  score: number;
  reasons: { field: string; verdict: string; weight: number }[];
  left: MatchSide;
  right: MatchSide;
  decidedBy: string | null;
  decidedAt: string | null;
}

export interface AnalysisView {
  id: string;
  portfolioId: string;
  state: 'queued' | 'running' | 'finished' | 'failed' | 'cancelled';
  parameters: AnalysisParameters;
  progress: ProgressView;
  coverage: AnalysisCoverage | null;
  summary: AnalysisSummary | null;
  fingerprints: { input: string | null; result: string | null };
  verified: 'same' | 'different' | null;
  engine: string | null;
  error: string | null;
  createdBy: string | null;
  createdAt: string;
  startedAt: string | null;
  finishedAt: string | null;
}

export interface ClusterRef {
  letter: string;
  number: number;
  firmness: number | null;
}

export interface AnalysisWorkItem {
  /** Same as workId; list items carry `id`. */
  id: string;
  workId: string;
  title: string | null;
  authors: string | null;
  year: number | null;
  venue: string | null;
  doi: string | null;
  catalogued: boolean;
  retracted: boolean;
  inDegree: number;
  outDegree: number;
  pageRank: number;
  pageRankHigh: number;
  rank: number;
  rankLow: number;
  rankHigh: number;
  citationRank: number;
  citationRankLow: number;
  citationRankHigh: number;
  agePercentile: number | null;
  citationsPerYear: number | null;
  inLoop: boolean;
  clusters: Record<Basis, ClusterRef | null>;
}

export interface AnalysisClusterItem {
  id: string;
  basis: Basis;
  number: number;
  letter: string;
  name: string;
  size: number;
  firmness: number | null;
  conductance: number | null;
  firstYear: number | null;
  medianYear: number | null;
  lastYear: number | null;
  terms: { term: string; works: number; logLikelihood: number }[];
  /** Its works of highest PageRank. */
  coreWorks: { workId: string; title: string | null; authors: string | null; year: number | null; inDegree: number; rank: number }[];
  /** Citations from this cluster to each cluster, by letter. */
  citesClusters: { letter: string; citations: number }[];
}

/** Compact columns, all of one length for works and of another for links. Works without a link on the basis are not drawn; `notDrawn` counts them. */
export interface AnalysisMap {
  analysisId: string;
  basis: Basis;
  ids: string[];
  titles: (string | null)[];
  authors: (string | null)[];
  years: (number | null)[];
  x: number[];
  y: number[];
  /** Citations here (in-degree). */
  size: number[];
  pageRank: number[];
  rank: number[];
  catalogued: boolean[];
  retracted: boolean[];
  /** Cluster number, -1 for none. */
  cluster: number[];
  /** null without a cluster. */
  firmness: (number | null)[];
  clusters: { number: number; letter: string; name: string; size: number; firmness: number | null }[];
  links: { source: number[]; target: number[]; weight: number[] };
  notDrawn: number;
  similarity: string;
}

export interface EvidenceView {
  work: { id: string; title: string | null; authors: string | null; year: number | null; retracted: boolean };
  measure: 'inDegree' | 'outDegree' | 'pageRank' | 'agePercentile' | 'citationsPerYear';
  value: number | null;
  rank: { rank: number; low: number; high: number } | null;
  /** Rows of "how it is counted". */
  counted: { label: string; value: string }[];
  /** Where the references behind it were read; the first ones and how many in all. */
  places: { importId: string; portfolioId: string; fileName: string; line: number; raw: string; citingWorkId: string; citingTitle: string | null }[];
  placesTotal: number;
  /** References in files of portfolios that the person was not given. */
  placesHidden: number;
  citingByYear: { year: number; works: number }[];
  method: { name: string; definition: string; source: string; doi: string | null; parameters: { label: string; value: string }[] };
  coverage: AnalysisCoverage | null;
  cautions: string[];
}
