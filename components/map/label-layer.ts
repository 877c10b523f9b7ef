import { type Project } from '@/components/map/cloth-layer';
import { inks, type Scheme } from '@/components/map/dyes';
import { type Patch } from '@/components/map/patches';
import { clusterName } from '@/components/analyses/work-name';
import { type AnalysisMap } from '@/lib/api/types';

/** A rectangle of the view, in pixels. */
export interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

const meet = (a: Box, b: Box) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

/** Name of a cluster as labels show it: "A · Peat carbon under drainage". */
export function labelOfCluster({ letter, name }: { letter: string; name: string }, most = 40): string {
  const shown = name.length > most ? `${name.slice(0, most - 1).trimEnd()}…` : name;
  return `${letter} · ${clusterName(shown)}`;
}

interface LabelView {
  context: CanvasRenderingContext2D;
  project: Project;
  width: number;
  height: number;
  hidden: ReadonlySet<number>;
  scheme: Scheme;
  /** Where no label may stand. */
  taken: readonly Box[];
}

/**
 * Letters and names of clusters above their patches or, where another label stands there, on their middles; a label below a patch would be
 * read as its neighbour's. Larger clusters choose first; in want of room the letter has to do, and the legend has the name.
 */
export function drawClusterLabels(map: Pick<AnalysisMap, 'clusters'>, patches: readonly Patch[], { context, project, width, height, hidden, scheme, taken: covered }: LabelView): void {
  const { ground, ink } = inks[scheme];
  const names = new Map(map.clusters.map((cluster) => [cluster.number, cluster]));
  const taken: Box[] = [...covered];
  const narrow = width < 560;
  context.font = `600 ${narrow ? 13 : 15}px "Newsreader Variable", Georgia, serif`;
  context.textAlign = 'center';
  context.textBaseline = 'alphabetic';
  context.lineJoin = 'round';
  for (const patch of patches) {
    const cluster = names.get(patch.cluster);
    if (!cluster || hidden.has(patch.cluster)) continue;
    const [top, bottom] = [project({ x: patch.top[0], y: patch.top[1] }), project({ x: patch.bottom[0], y: patch.bottom[1] })];
    const whole = labelOfCluster(cluster, narrow ? 18 : 40);
    const middle = { x: (top.x + bottom.x) / 2, y: (top.y + bottom.y) / 2 + 5 };
    const tries: [string, number, number][] = [[whole, top.x, top.y - 8], [whole, middle.x, middle.y], [cluster.letter, top.x, top.y - 8], [cluster.letter, middle.x, middle.y]];
    for (const [text, x, y] of tries) {
      const half = context.measureText(text).width / 2 + 4;
      // A patch that reaches over the edge keeps its label within the view.
      const placedX = Math.min(width - half, Math.max(half, x));
      const placedY = Math.min(height - 8, Math.max(20, y));
      if (Math.abs(placedX - x) > width / 3 || Math.abs(placedY - y) > height / 2) continue;
      const box = { left: placedX - half, right: placedX + half, top: placedY - 16, bottom: placedY + 5 };
      if (taken.some((other) => meet(other, box))) continue;
      taken.push(box);
      context.strokeStyle = ground;
      context.lineWidth = 4.5;
      context.strokeText(text, placedX, placedY);
      context.fillStyle = ink;
      context.fillText(text, placedX, placedY);
      break;
    }
  }
}

/** Crosses over retracted works: never by colour alone. */
export function drawRetractions(works: readonly { x: number; y: number; half: number }[], context: CanvasRenderingContext2D, scheme: Scheme): void {
  if (works.length === 0) return;
  context.strokeStyle = inks[scheme].retracted;
  context.lineWidth = 2;
  context.beginPath();
  for (const { x, y, half } of works) {
    const reach = half + 2;
    context.moveTo(x - reach, y - reach);
    context.lineTo(x + reach, y + reach);
    context.moveTo(x + reach, y - reach);
    context.lineTo(x - reach, y + reach);
  }
  context.stroke();
}
