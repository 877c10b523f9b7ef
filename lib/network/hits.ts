import { transposeNetwork } from '@/lib/network/compressed-rows';
import { type DirectedNetwork } from '@/lib/network/types';

/**
 * HITS: a good hub cites good authorities, a good authority is cited by good hubs.
 *
 *   authority = sum of the hub scores of the works that cite it;  hub = sum of the authority scores of the works that it cites.
 *
 * The limits are the principal eigenvectors of A'A and AA'. Source: Kleinberg (1999), J. ACM 46:604, doi 10.1145/324133.324140.
 * Starts from all ones; stops when no authority score (at length 1) moves by more than `tolerance`; both vectors are scaled to sum 1.
 * Cost O(links) a round; the number of rounds grows with the closeness of the two largest singular values.
 * Where these differ by less than 1e-6 relative, the answer depends on the start and `unique` is false: publish no ranks then.
 * Without links every score is 0, the singular value is 0 and `unique` is false. Works outside the dominant block have score 0.
 */
export interface HitsResult {
  /** Sum 1, or all 0 without links. */
  authorities: Float64Array;
  hubs: Float64Array;
  singularValue: number;
  unique: boolean;
  iterations: number;
  /** Largest change of the last round. */
  residual: number;
  converged: boolean;
}

export function computeHits(network: DirectedNetwork, { tolerance = 1e-12, maximumIterations = 10_000 } = {}): HitsResult {
  const { size } = network;
  const incoming = transposeNetwork(network);
  if (network.targets.length === 0) {
    return { authorities: new Float64Array(size), hubs: new Float64Array(size), singularValue: 0, unique: false, iterations: 0, residual: 0, converged: true };
  }
  const authorities = new Float64Array(size).fill(1);
  const hubs = new Float64Array(size);
  const moved = new Float64Array(size);
  scaleToLength(authorities);
  let iterations = 0;
  let residual = Infinity;
  let square = 0;
  while (residual > tolerance && iterations < maximumIterations) {
    addAlong(network, authorities, hubs);
    addAlong(incoming, hubs, moved);
    square = scaleToLength(moved);
    residual = 0;
    for (let work = 0; work < size; work += 1) residual = Math.max(residual, Math.abs(moved[work] - authorities[work]));
    authorities.set(moved);
    iterations += 1;
  }
  addAlong(network, authorities, hubs);
  const singularValue = Math.sqrt(square);
  const unique = secondSingularValue(network, incoming, authorities) < singularValue * (1 - 1e-6);
  scaleToSum(authorities);
  scaleToSum(hubs);
  return { authorities, hubs, singularValue, unique, iterations, residual, converged: residual <= tolerance };
}

/**
 * Largest singular value among directions at right angles to the dominant one. The estimate comes from below, so a miss would
 * call an ambiguous case unique; 2,000 rounds from an uneven start leave no room for that at a gap of 1e-6.
 */
function secondSingularValue(network: DirectedNetwork, incoming: DirectedNetwork, dominant: Float64Array): number {
  const { size } = network;
  const vector = new Float64Array(size);
  // Uneven on purpose: a start with a symmetry of the network could stand at right angles to the second direction.
  for (let work = 0; work < size; work += 1) vector[work] = 1 + ((work * 2654435761) % 97) / 97;
  const hubs = new Float64Array(size);
  const image = new Float64Array(size);
  let square = 0;
  for (let round = 0; round < 2_000; round += 1) {
    let along = 0;
    for (let work = 0; work < size; work += 1) along += vector[work] * dominant[work];
    for (let work = 0; work < size; work += 1) vector[work] -= along * dominant[work];
    if (scaleToLength(vector) < 1e-12) return Math.sqrt(square);
    addAlong(network, vector, hubs);
    addAlong(incoming, hubs, image);
    const last = square;
    square = 0;
    for (let work = 0; work < size; work += 1) square += vector[work] * image[work];
    if (round > 50 && Math.abs(square - last) <= 1e-13 * square) break;
    vector.set(image);
  }
  return Math.sqrt(Math.max(0, square));
}

function addAlong({ size, offsets, targets }: DirectedNetwork, from: Float64Array, into: Float64Array): void {
  for (let work = 0; work < size; work += 1) {
    let sum = 0;
    for (let place = offsets[work], end = offsets[work + 1]; place < end; place += 1) sum += from[targets[place]];
    into[work] = sum;
  }
}

function scaleToLength(vector: Float64Array): number {
  let square = 0;
  for (let work = 0; work < vector.length; work += 1) square += vector[work] * vector[work];
  const length = Math.sqrt(square);
  if (length > 0) for (let work = 0; work < vector.length; work += 1) vector[work] /= length;
  return length;
}

function scaleToSum(vector: Float64Array): void {
  let sum = 0;
  for (let work = 0; work < vector.length; work += 1) sum += vector[work];
  if (sum > 0) for (let work = 0; work < vector.length; work += 1) vector[work] /= sum;
}
