import { dyeOf, inks, weaveOf, withOpacity, type Scheme } from '@/components/map/dyes';
import { type Patch } from '@/components/map/patches';
import { type AnalysisMap } from '@/lib/api/types';

/** From the coordinates of the map to pixels. */
export type Project = (point: { x: number; y: number }) => { x: number; y: number };

/** The affine matrix of a projection: the map is never rotated, but y is turned over. */
export function matrixOf(project: Project): DOMMatrix {
  const [origin, right, up] = [project({ x: 0, y: 0 }), project({ x: 1, y: 0 }), project({ x: 0, y: 1 })];
  return new DOMMatrix([right.x - origin.x, right.y - origin.y, up.x - origin.x, up.y - origin.y, origin.x, origin.y]);
}

function pathOf(patch: Patch): Path2D {
  const path = new Path2D();
  for (const loop of patch.loops) {
    loop.forEach(([x, y], index) => (index === 0 ? path.moveTo(x, y) : path.lineTo(x, y)));
    path.closePath();
  }
  return path;
}

/** A tile of the weave of a cluster, drawn twice as fine as the screen needs. */
function weaveTile(cluster: number, scheme: Scheme): HTMLCanvasElement | null {
  const weave = weaveOf(cluster);
  if (!weave) return null;
  const side = weave.spacing * 2;
  const tile = document.createElement('canvas');
  tile.width = side;
  tile.height = side;
  const context = tile.getContext('2d');
  if (!context) return null;
  context.strokeStyle = withOpacity(dyeOf(cluster, scheme), scheme === 'light' ? 0.2 : 0.24);
  context.lineWidth = 2;
  context.beginPath();
  for (const angle of weave.angles) {
    if (angle === 0 || angle === 90) {
      context.moveTo(angle === 0 ? 0 : 1, angle === 0 ? 1 : 0);
      context.lineTo(angle === 0 ? side : 1, angle === 0 ? 1 : side);
      continue;
    }
    // Drawn past the corners, so that the lines of neighbouring tiles meet.
    const [from, to] = angle === 135 ? [-side, 2 * side] : [2 * side, -side];
    for (const shift of [-side, 0, side]) {
      context.moveTo(shift - side, from);
      context.lineTo(shift + 2 * side, to);
    }
  }
  context.stroke();
  return tile;
}

export interface Cloth {
  patches: { patch: Patch; path: Path2D; tile: HTMLCanvasElement | null }[];
  scheme: Scheme;
}

export function prepareCloth(patches: readonly Patch[], scheme: Scheme): Cloth {
  return { patches: patches.map((patch) => ({ patch, path: pathOf(patch), tile: weaveTile(patch.cluster, scheme) })), scheme };
}

interface ClothView {
  context: CanvasRenderingContext2D;
  project: Project;
  /** Clusters that are hidden altogether. */
  hidden: ReadonlySet<number>;
}

/** Patches: a wash of the dye, its weave, and a running stitch around. The weave is fastened to the map, so that it moves along. */
export function drawPatches({ patches, scheme }: Cloth, { context, project, hidden }: ClothView): void {
  const matrix = matrixOf(project);
  for (const { patch, path, tile } of patches) {
    if (hidden.has(patch.cluster)) continue;
    const placed = new Path2D();
    placed.addPath(path, matrix);
    const dye = dyeOf(patch.cluster, scheme);
    context.fillStyle = withOpacity(dye, scheme === 'light' ? 0.085 : 0.12);
    context.fill(placed, 'evenodd');
    const pattern = tile && context.createPattern(tile, 'repeat');
    if (pattern) {
      pattern.setTransform(new DOMMatrix([0.5, 0, 0, 0.5, matrix.e, matrix.f]));
      context.fillStyle = pattern;
      context.fill(placed, 'evenodd');
    }
    context.strokeStyle = withOpacity(dye, 0.6);
    context.lineWidth = 1.4;
    context.setLineDash([6, 4]);
    context.stroke(placed);
  }
  context.setLineDash([]);
}

interface ThreadView {
  context: CanvasRenderingContext2D;
  project: Project;
  visible: Uint8Array;
  /** The work that is selected, or -1: threads that end there are drawn strong. */
  selected: number;
}

/** Threads between clusters, dotted; those of the selected work in ink. */
export function drawDottedThreads(map: AnalysisMap, links: readonly number[], scheme: Scheme, { context, project, visible, selected }: ThreadView): void {
  const matrix = matrixOf(project);
  const { source, target } = map.links;
  const at = (work: number) => [matrix.a * map.x[work] + matrix.e, matrix.d * map.y[work] + matrix.f] as const;
  const line = (link: number) => {
    context.moveTo(...at(source[link]));
    context.lineTo(...at(target[link]));
  };
  context.lineCap = 'round';
  context.setLineDash([0.6, 4]);
  context.lineWidth = 1;
  context.strokeStyle = withOpacity(inks[scheme].thread, selected >= 0 ? 0.16 : 0.45);
  context.beginPath();
  for (const link of links) if (visible[source[link]] && visible[target[link]]) line(link);
  context.stroke();
  context.setLineDash([]);
  context.lineCap = 'butt';
  if (selected < 0) return;
  context.strokeStyle = withOpacity(inks[scheme].ink, 0.55);
  context.lineWidth = 1.2;
  context.beginPath();
  for (let link = 0; link < source.length; link += 1) if ((source[link] === selected || target[link] === selected) && visible[source[link]] && visible[target[link]]) line(link);
  context.stroke();
}
