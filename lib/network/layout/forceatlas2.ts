import { Repulsion } from '@/lib/network/layout/barnes-hut';

/** What is laid out: nodes with masses and weighted links, each stored from both ends. */
export interface LayoutNetwork {
  size: number;
  offsets: Uint32Array;
  neighbours: Uint32Array;
  weights: Float64Array;
  masses: Float64Array;
}

export interface ForceSettings {
  /** Strength of the repulsion between masses. */
  repulsion: number;
  /** Pull towards the origin per mass and distance; keeps the picture together. */
  gravity: number;
  /** Barnes-Hut: a cell acts as one when its width is less than this times its distance. */
  openness: number;
}

export const defaultForces: ForceSettings = { repulsion: 10, gravity: 0.05, openness: 1.4 };

/**
 * ForceAtlas2: linked nodes attract in proportion to weight and distance, all nodes repel in proportion to their masses and the inverse of
 * the distance, and each node's step shrinks with how much its force swings, so that the whole settles without a cooling schedule.
 *   attraction w d,   repulsion k m_i m_j / d,   gravity g m d,
 *   global speed ~ traction / swing,   step of a node = force * speed / (1 + sqrt(speed * its swing))
 * Source: Jacomy, Venturini, Heymann & Bastian (2014), PLoS ONE 9:e98679, doi 10.1371/journal.pone.0098679; own kernel on typed arrays.
 * Cost O(n log n + links) a step. Deterministic. Needs a start without two nodes at one place (those would never part).
 * `x` and `y` are moved in place.
 */
export function runForces(network: LayoutNetwork, x: Float64Array, y: Float64Array, steps: number, settings: ForceSettings = defaultForces): void {
  const { size, offsets, neighbours, weights, masses } = network;
  const repulsion = new Repulsion(size, masses);
  const forceX = new Float64Array(size);
  const forceY = new Float64Array(size);
  const lastX = new Float64Array(size);
  const lastY = new Float64Array(size);
  let speed = 1;
  for (let step = 0; step < steps; step += 1) {
    repulsion.compute(x, y, settings.repulsion, settings.openness, forceX, forceY);
    let swing = 0;
    let traction = 0;
    for (let node = 0; node < size; node += 1) {
      const atX = x[node];
      const atY = y[node];
      let pullX = 0;
      let pullY = 0;
      for (let link = offsets[node], end = offsets[node + 1]; link < end; link += 1) {
        const neighbour = neighbours[link];
        pullX += weights[link] * (x[neighbour] - atX);
        pullY += weights[link] * (y[neighbour] - atY);
      }
      const gravity = settings.gravity * masses[node];
      forceX[node] += pullX - gravity * atX;
      forceY[node] += pullY - gravity * atY;
      swing += masses[node] * distance(forceX[node] - lastX[node], forceY[node] - lastY[node]);
      traction += (masses[node] * distance(forceX[node] + lastX[node], forceY[node] + lastY[node])) / 2;
    }
    // The speed may rise by at most half a step, else one calm step would throw the nodes about.
    speed += Math.min(traction / (swing + 1e-12) - speed, 0.5 * speed);
    for (let node = 0; node < size; node += 1) {
      const ownSwing = masses[node] * distance(forceX[node] - lastX[node], forceY[node] - lastY[node]);
      const share = speed / (1 + Math.sqrt(speed * ownSwing));
      x[node] += forceX[node] * share;
      y[node] += forceY[node] * share;
      lastX[node] = forceX[node];
      lastY[node] = forceY[node];
    }
  }
}

const distance = (byX: number, byY: number): number => Math.sqrt(byX * byX + byY * byY);
