export interface Extent {
  x: [number, number];
  y: [number, number];
}

const quantile = (sorted: Float64Array, share: number) => sorted[Math.min(sorted.length - 1, Math.max(0, Math.round(share * (sorted.length - 1))))];

function span(values: readonly number[], cut: number): [number, number] {
  const sorted = Float64Array.from(values).sort();
  // Far outliers would shrink everything else: the frame holds all but a share of them at each side, and a margin.
  const [low, high] = [quantile(sorted, cut), quantile(sorted, 1 - cut)];
  const margin = (high - low) * 0.06 || 1;
  return [low - margin, high + margin];
}

/** The frame in which a map is first shown. */
export function extentOf(x: readonly number[], y: readonly number[], cut = 0.005): Extent {
  if (x.length === 0) return { x: [-1, 1], y: [-1, 1] };
  return { x: span(x, cut), y: span(y, cut) };
}
