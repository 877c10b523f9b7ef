/**
 * The shapes of the network library: plain typed arrays in, plain typed arrays out.
 * Works are numbered 0 .. n-1 in the order in which they are given; `i -> j` always means "i cites j".
 */

/** Directed links in compressed sparse rows: the works cited by i are `targets[offsets[i] .. offsets[i + 1])`, ascending, without duplicates or self-links. */
export interface DirectedNetwork {
  size: number;
  /** length size + 1 */
  offsets: Uint32Array;
  /** length = number of links */
  targets: Uint32Array;
}

/** A weighted undirected network in compressed sparse rows, each link stored from both ends, no self-links. */
export interface WeightedNetwork {
  size: number;
  offsets: Uint32Array;
  neighbours: Uint32Array;
  weights: Float64Array;
}

/** Called with a share between 0 and 1 of the stage named; throws to cancel (the caller passes a function that throws once its signal is set). */
export type Progress = (stage: string, share: number) => void;

export type Basis = 'cocitation' | 'coupling' | 'citation';
export const bases = ['cocitation', 'coupling', 'citation'] as const;
export type Similarity = 'association-strength' | 'cosine' | 'jaccard';
export const similarities = ['association-strength', 'cosine', 'jaccard'] as const;

/** Everything that an analysis is fixed by. Stored with it and part of its fingerprint. */
export interface AnalysisParameters {
  /** 'catalogued': only catalogued works; 'with-cited': cited-only works too, if they are cited at least `minimumCitations` times. */
  scope: 'catalogued' | 'with-cited';
  /** Publication years of the citing (catalogued) works, inclusive; null means open. */
  periodFrom: number | null;
  periodTo: number | null;
  /** Least number of citations from catalogued works of the scope that a cited-only work needs to take part. */
  minimumCitations: number;
  /** Share of a reader's steps that follow a reference, 0 < damping < 1. */
  damping: number;
  similarity: Similarity;
  clustering: 'leiden' | 'louvain';
  /** Resolution of modularity, > 0. */
  resolution: number;
  /** Seeds tried for each basis; the partition of highest quality is kept, the others give firmness. */
  repeats: number;
  /** Bootstrap replicates for rank intervals; 0 for none. */
  replicates: number;
  /** Works citing more than this many references are left out when pairs are counted. */
  maximumReferences: number;
  /** 32-bit seed of everything random. */
  seed: number;
}

export const defaultParameters: AnalysisParameters = {
  scope: 'with-cited',
  periodFrom: null,
  periodTo: null,
  minimumCitations: 3,
  damping: 0.5,
  similarity: 'association-strength',
  clustering: 'leiden',
  resolution: 1,
  repeats: 20,
  replicates: 200,
  maximumReferences: 500,
  seed: 1,
};

/** One work as the analysis sees it. */
export interface AnalysisWorkInput {
  /** Stable natural key (never a database id), the order of everything follows it. */
  key: string;
  year: number | null;
  catalogued: boolean;
  title: string;
  keywords: string[];
}

/**
 * The input of an analysis. `works` may come in any order; `citations` pairs are indices into `works`.
 * Works with `catalogued` false are cited-only works: they have no reference list of their own.
 * All cited works of the catalogued works in the period are given, whatever the scope, so that coupling sees full reference lists.
 */
export interface AnalysisInput {
  works: AnalysisWorkInput[];
  citing: Uint32Array;
  cited: Uint32Array;
}

/** A cluster as found on one basis. */
export interface ClusterResult {
  /** A, B, ... Z, AA, ... by size, ties by smallest member. */
  letter: string;
  size: number;
  /** Terms that set it apart, strongest first: works of the cluster that have it, and signed log-likelihood G2. */
  terms: { term: string; works: number; logLikelihood: number }[];
  /** Name made from the terms, or "Cluster A" where no term sets it apart. */
  name: string;
  /** Mean over members of the share of repeats in which a member's group-mates were with it, 0..1. */
  firmness: number;
  /** cut / min(strength inside, outside); null where undefined. */
  conductance: number | null;
  firstYear: number | null;
  medianYear: number | null;
  lastYear: number | null;
}

/** The clusters and layout of one basis. Arrays run over `AnalysisResult.workIndex`. */
export interface BasisResult {
  basis: Basis;
  /** Number of works with at least one link on this basis. */
  linkedWorks: number;
  /** Pairs with a link. */
  pairs: number;
  /** Quality (modularity at the given resolution) of the partition kept, its number of clusters. */
  modularity: number;
  /** Mean and least adjusted Rand index between the repeats; null with fewer than 2 repeats. */
  agreementMean: number | null;
  agreementMinimum: number | null;
  /** Cluster number per work, by size; -1 for works without links (they form no group). */
  cluster: Int32Array;
  /** Share of repeats in which the work's group-mates were with it, 0..1; NaN for works without a cluster. */
  firmness: Float64Array;
  clusters: ClusterResult[];
  /** Layout, unit-free, centred on 0; NaN for works without links, which are not drawn. */
  x: Float64Array;
  y: Float64Array;
  /** The links drawn on the map: strongest of each work, similarity as weight. Indices into workIndex, source < target, ordered. */
  linkSource: Uint32Array;
  linkTarget: Uint32Array;
  linkWeight: Float64Array;
  /** Citations between clusters, row-major clusters x clusters: citing cluster to cited cluster. */
  clusterCitations: Float64Array;
}

/** The whole result. All arrays have one entry per work of the analysis, in order of `key`. */
export interface AnalysisResult {
  /** Index into `AnalysisInput.works` of each work of the analysis, in order of key. */
  workIndex: Uint32Array;
  /** Distinct works of the analysis citing it. */
  inDegree: Uint32Array;
  /** Distinct works of the analysis cited by it. */
  outDegree: Uint32Array;
  /** PageRank with mean 1 at `damping`. */
  pageRank: Float64Array;
  /** The same at 0.85, shown beside it. */
  pageRankHigh: Float64Array;
  /** Competition rank by PageRank (1 = highest; ties within 1e-9 relative share a rank). */
  rank: Uint32Array;
  /** 2.5 % and 97.5 % quantiles of the rank over the replicates; equal to rank when replicates = 0. */
  rankLow: Uint32Array;
  rankHigh: Uint32Array;
  /** Competition rank by in-degree with its interval. */
  citationRank: Uint32Array;
  citationRankLow: Uint32Array;
  citationRankHigh: Uint32Array;
  /** Percentile of in-degree within the publication year, ties at mid-rank, 0..100; NaN without a year. */
  agePercentile: Float64Array;
  /** Citations of the analysis over years since publication (at least 1) up to the last year; NaN without a year. */
  citationsPerYear: Float64Array;
  /** 1 where the work lies in a strong component of two or more works. */
  inLoop: Uint8Array;
  bases: BasisResult[];
  /** How the numbers came about. */
  run: {
    works: number;
    citations: number;
    cataloguedWorks: number;
    citedOnlyWorks: number;
    pageRankIterations: number;
    pageRankResidual: number;
    pageRankConverged: boolean;
    danglingWorks: number;
    loops: number;
    loopWorks: number;
    backwardLinks: number;
    skippedForReferences: number;
    lastYear: number | null;
    seed: number;
    engine: string;
  };
}
