import { type DirectedNetwork } from '@/lib/network/types';
import { transposeNetwork } from '@/lib/network/compressed-rows';

/**
 * PageRank by power iteration: how often a reader arrives at a work who follows a random reference with probability `damping` and
 * otherwise starts anew according to the teleport vector. A reader at a work without references (dangling) starts anew as well.
 *
 *   p_j = d * sum over i of p_i P_ij + (d * sum over dangling i of p_i + 1 - d) * v_j,   sum of p = 1,
 *
 * P_ij: weight of the link i -> j over the sum of the weights of i's links; v: teleport vector.
 * Source: Brin & Page (1998), doi 10.1016/S0169-7552(98)00110-X; citation networks: Chen, Xie, Maslov & Redner (2007), doi 10.1016/j.joi.2006.06.001.
 * Starts from v; stops when the absolute changes of a round sum to less than `tolerance` (absolute: it does not grow with the network).
 * Cost O(links) a round, about ln(tolerance) / ln(damping) rounds. An empty network gives no values and counts as converged.
 */
export interface PageRankOptions {
  /** 0 < damping < 1 */
  damping: number;
  /** One positive weight per link, in the order of `network.targets`; all equal by default. */
  weights?: Float64Array;
  /** Non-negative, not all zero; scaled to sum 1; uniform by default. */
  teleport?: Float64Array;
  tolerance?: number;
  maximumIterations?: number;
}

export interface PageRankResult {
  /** Probabilities, sum 1. */
  values: Float64Array;
  iterations: number;
  /** Sum of the absolute changes of the last round. */
  residual: number;
  /** False when `maximumIterations` rounds did not reach the tolerance: the values are then no answer. */
  converged: boolean;
}

/** The links turned round, each with the share of the citing work's rank that it carries. */
interface Shares {
  incoming: DirectedNetwork;
  share: Float64Array;
  dangling: Uint8Array;
}

export function computePageRank(network: DirectedNetwork, options: PageRankOptions): PageRankResult {
  const { damping, tolerance = 1e-12, maximumIterations = 1_000 } = options;
  if (!(damping > 0 && damping < 1)) throw new RangeError(`Damping must lie between 0 and 1; it is ${damping}.`);
  const { size } = network;
  const teleport = scaleTeleport(size, options.teleport);
  const { incoming, share, dangling } = shareOut(network, options.weights);
  let values = teleport.slice();
  let next = new Float64Array(size);
  let iterations = 0;
  let residual = 0;
  let converged = size === 0;
  while (!converged && iterations < maximumIterations) {
    let restarting = 0;
    for (let work = 0; work < size; work += 1) if (dangling[work] === 1) restarting += values[work];
    const restart = damping * restarting + 1 - damping;
    residual = 0;
    for (let work = 0; work < size; work += 1) {
      let received = 0;
      for (let place = incoming.offsets[work], end = incoming.offsets[work + 1]; place < end; place += 1) received += values[incoming.targets[place]] * share[place];
      const value = damping * received + restart * teleport[work];
      residual += Math.abs(value - values[work]);
      next[work] = value;
    }
    [values, next] = [next, values];
    iterations += 1;
    converged = residual < tolerance;
  }
  return { values, iterations, residual, converged };
}

function scaleTeleport(size: number, given: Float64Array | undefined): Float64Array {
  if (given === undefined) return new Float64Array(size).fill(1 / size);
  if (given.length !== size) throw new RangeError(`The teleport vector has ${given.length} entries for ${size} works.`);
  const sum = given.reduce((total, value) => total + value, 0);
  if (!(sum > 0) || given.some((value) => value < 0)) throw new RangeError('The teleport vector must be non-negative and not all zero.');
  return given.map((value) => value / sum);
}

function shareOut(network: DirectedNetwork, weights: Float64Array | undefined): Shares {
  const { size, offsets, targets } = network;
  if (weights && weights.length !== targets.length) throw new RangeError(`There are ${weights.length} weights for ${targets.length} links.`);
  if (weights?.some((weight) => !(weight > 0))) throw new RangeError('Link weights must be positive.');
  const incoming = transposeNetwork(network);
  const share = new Float64Array(targets.length);
  const dangling = new Uint8Array(size);
  const next = incoming.offsets.slice(0, size);
  for (let work = 0; work < size; work += 1) {
    let total = 0;
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) total += weights ? weights[place] : 1;
    if (offsets[work] === offsets[work + 1]) dangling[work] = 1;
    // The transpose keeps the order of the citing works, so that walking the rows once more meets its slots in turn.
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) share[next[targets[place]]++] = (weights ? weights[place] : 1) / total;
  }
  return { incoming, share, dangling };
}
