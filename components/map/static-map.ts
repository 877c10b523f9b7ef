import { dyeOf, inks, weaveOf, type Scheme } from '@/components/map/dyes';
import { labelOfCluster } from '@/components/map/label-layer';
import { clusterPatches, frameOf, type Patch } from '@/components/map/patches';
import { isUncertain, knotSide, partThreads } from '@/components/map/threads';
import { xmlText } from '@/lib/analyses/reading/xml-text';
import { type AnalysisMap } from '@/lib/api/types';

export interface StaticMapOptions {
  scheme: Scheme;
  title: string;
  /** One line each below the picture. */
  caution: string;
  provenance: string;
  /** Patches of the whole map, where the given one is a part of it, so that filters do not move the cloth. */
  patches?: Patch[];
}

const [frameWidth, frameHeight, headHeight, footHeight, legendWidth] = [980, 780, 74, 62, 300];
const mostThreads = { within: 12_000, between: 1_200 };
const mostInLegend = 18;

const clip = (text: string, most: number) => (text.length > most ? `${text.slice(0, most - 1).trimEnd()}…` : text);
const round = (value: number) => Number(value.toFixed(1));

export const basisWords: Record<AnalysisMap['basis'], string> = { cocitation: 'cited together', coupling: 'shared references', citation: 'citing each other' };

/** From the coordinates of the map to the picture; y grows downwards there. */
function project(map: AnalysisMap, patches: readonly Patch[]): (x: number, y: number) => [number, number] {
  const extent = frameOf(map, patches);
  const scale = Math.min(frameWidth / (extent.x[1] - extent.x[0]), frameHeight / (extent.y[1] - extent.y[0]));
  const [middleX, middleY] = [(extent.x[0] + extent.x[1]) / 2, (extent.y[0] + extent.y[1]) / 2];
  return (x, y) => [round(frameWidth / 2 + (x - middleX) * scale), round(headHeight + frameHeight / 2 - (y - middleY) * scale)];
}

function weavePattern(cluster: number, scheme: Scheme): string {
  const weave = weaveOf(cluster);
  if (!weave) return '';
  const { angles, spacing } = weave;
  const lines = angles.length === 2 ? `<path d="M0 0H${spacing}M0 0V${spacing}"/>` : `<path d="M0 0H${spacing}"/>`;
  return `<pattern id="weave-${cluster}" width="${spacing}" height="${spacing}" patternUnits="userSpaceOnUse" patternTransform="rotate(${angles[0]})"><g stroke="${dyeOf(cluster, scheme)}" stroke-opacity="0.2" stroke-width="1" fill="none">${lines}</g></pattern>`;
}

/** The outline of a patch, kept once and used three times. */
function patchPath(patch: Patch, at: (x: number, y: number) => [number, number]): string {
  return `<path id="patch-${patch.cluster}" d="${patch.loops.map((loop) => `M${loop.map(([x, y]) => at(x, y).join(' ')).join('L')}Z`).join('')}" fill-rule="evenodd"/>`;
}

function drawPatch({ cluster }: Patch, scheme: Scheme): string {
  const dye = dyeOf(cluster, scheme);
  const copy = (look: string) => `<use href="#patch-${cluster}" ${look}/>`;
  return `${copy(`fill="${dye}" fill-opacity="0.09"`)}${weaveOf(cluster) ? copy(`fill="url(#weave-${cluster})"`) : ''}${copy(`fill="none" stroke="${dye}" stroke-opacity="0.55" stroke-width="1.4" stroke-dasharray="6 4"`)}`;
}

function drawThreads(map: AnalysisMap, places: [number, number][], scheme: Scheme): { svg: string; drawn: number } {
  const { within, between } = partThreads(map, mostThreads.within, mostThreads.between);
  const line = (link: number) => `M${places[map.links.source[link]].join(' ')}L${places[map.links.target[link]].join(' ')}`;
  const byCluster = new Map<number, string>();
  for (const link of within) {
    const cluster = map.cluster[map.links.source[link]];
    byCluster.set(cluster, (byCluster.get(cluster) ?? '') + line(link));
  }
  const solid = [...byCluster].map(([cluster, path]) => `<path d="${path}" stroke="${dyeOf(cluster, scheme)}" stroke-opacity="0.28" stroke-width="0.7"/>`).join('');
  const dotted = between.length > 0 ? `<path d="${between.map(line).join('')}" stroke="${inks[scheme].thread}" stroke-opacity="0.4" stroke-width="0.8" stroke-dasharray="0.8 3.6" stroke-linecap="round"/>` : '';
  return { svg: `<g fill="none">${dotted}${solid}</g>`, drawn: within.length + between.length };
}

function drawKnots(map: AnalysisMap, places: [number, number][], scheme: Scheme): string {
  const most = map.size.reduce((highest, value) => Math.max(highest, value), 0);
  const order = map.ids.map((_, work) => work).sort((a, b) => map.size[b] - map.size[a] || a - b);
  const knots = order.map((work) => {
    const side = round(knotSide(map.size[work], most, map.ids.length));
    const [x, y] = [round(places[work][0] - side / 2), round(places[work][1] - side / 2)];
    const dye = dyeOf(map.cluster[work], scheme);
    const hollow = isUncertain(map.firmness[work]);
    const title = `${map.retracted[work] ? 'Retracted: ' : ''}${map.titles[work] ?? 'Untitled work'}`;
    const label = [title, map.authors[work], map.years[work], `${map.size[work]} citations here`].filter((part) => part !== null).join(' · ');
    const look = hollow ? `fill="${inks[scheme].ground}" stroke="${dye}" stroke-width="1.4"` : `fill="${dye}" stroke="${inks[scheme].ground}" stroke-width="0.8"`;
    const struck = map.retracted[work] ? `<path d="M${x} ${y}l${side} ${side}m0 ${-side}l${-side} ${side}" stroke="${inks[scheme].retracted}" stroke-width="1.6"/>` : '';
    return `<g><title>${xmlText(label)}</title><rect x="${x}" y="${y}" width="${side}" height="${side}" rx="1" ${look}/>${struck}</g>`;
  });
  return knots.join('\n');
}

function drawLabels(map: AnalysisMap, patches: readonly Patch[], at: (x: number, y: number) => [number, number], scheme: Scheme): string {
  const names = new Map(map.clusters.map((cluster) => [cluster.number, cluster]));
  return patches
    .flatMap((patch) => {
      const cluster = names.get(patch.cluster);
      if (!cluster) return [];
      const [x, y] = at(...patch.top);
      const text = cluster.number < 10 ? labelOfCluster(cluster, 34) : cluster.letter;
      return `<text x="${Math.min(frameWidth - 120, Math.max(120, x))}" y="${Math.max(headHeight + 16, y - 7)}" text-anchor="middle" font-family="Newsreader, Georgia, serif" font-size="15" font-weight="600" fill="${inks[scheme].ink}" stroke="${inks[scheme].ground}" stroke-width="4" paint-order="stroke" stroke-linejoin="round">${xmlText(text)}</text>`;
    })
    .join('');
}

function drawLegend(map: AnalysisMap, scheme: Scheme): string {
  const { ink, inkSoft, thread } = inks[scheme];
  const rows = map.clusters.slice(0, mostInLegend).map((cluster, index) => {
    const y = headHeight + 34 + index * 36;
    const ruler = cluster.firmness === null ? '' : `<path d="M0 ${y + 12}H${round(240 * cluster.firmness)}" stroke="${inkSoft}" stroke-width="5" stroke-dasharray="2 2"/><path d="M0 ${y + 15.5}H240" stroke="${thread}" stroke-width="0.7"/>`;
    return `<rect x="0" y="${y - 10}" width="11" height="11" rx="1" fill="${dyeOf(cluster.number, scheme)}"/><text x="19" y="${y}" fill="${ink}">${xmlText(labelOfCluster(cluster, 24))}</text><text x="240" y="${y}" text-anchor="end" fill="${ink}">${cluster.size}</text>${ruler}`;
  });
  const y = headHeight + 34 + rows.length * 36;
  const more = map.clusters.length > mostInLegend ? `<text x="0" y="${y}" fill="${inkSoft}">and ${map.clusters.length - mostInLegend} smaller clusters</text>` : '';
  const notes = ['Area of a knot: citations here.', 'Ruled line: share of repeats in which', 'a cluster’s works stayed together.', 'Hollow: stands between clusters.', 'Crossed out: retracted.'];
  const lines = notes.map((note, index) => `<text x="0" y="${y + (more ? 26 : 6) + index * 18}" fill="${inkSoft}" font-size="12.5">${note}</text>`);
  return `<g transform="translate(${frameWidth + 30} 0)" font-size="13.5"><text x="0" y="${headHeight + 6}" font-weight="600" fill="${ink}">Clusters: ${basisWords[map.basis]}</text>${rows.join('')}${more}${lines.join('')}</g>`;
}

/**
 * A map as one self-contained SVG document: patches, threads, knots, labels, legend, caution and provenance. Drawn the same on the server
 * (exports) and in the browser (the fallback without WebGL); every text in it is escaped.
 */
export function drawStaticMap(map: AnalysisMap, options: StaticMapOptions): string {
  const { scheme } = options;
  const { ground, ink, inkSoft, thread } = inks[scheme];
  const patches = options.patches ?? clusterPatches(map);
  const at = project(map, patches);
  const places = map.ids.map((_, work) => at(map.x[work], map.y[work]));
  const threads = drawThreads(map, places, scheme);
  const [width, height] = [frameWidth + legendWidth, headHeight + frameHeight + footHeight];
  const links = map.links.source.length;
  const counts = `${map.ids.length} works, ${links} links${threads.drawn < links ? ` (the ${threads.drawn} strongest drawn)` : ''}; ${map.notDrawn} works without a link are not drawn. Weight: ${map.similarity.replace('-', ' ')}.`;
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" role="img" aria-labelledby="map-title map-description" font-family="'Public Sans', system-ui, sans-serif">`,
    `<title id="map-title">${xmlText(options.title)}: map of works ${basisWords[map.basis]}</title><desc id="map-description">${xmlText(`${counts} ${options.caution} ${options.provenance}`)}</desc>`,
    `<defs>${patches.map((patch) => weavePattern(patch.cluster, scheme) + patchPath(patch, at)).join('')}<clipPath id="frame"><rect x="0" y="${headHeight}" width="${frameWidth}" height="${frameHeight}"/></clipPath></defs>`,
    `<rect width="${width}" height="${height}" fill="${ground}"/>`,
    `<text x="28" y="42" font-family="Newsreader, Georgia, serif" font-size="26" fill="${ink}">${xmlText(clip(options.title, 70))}</text><text x="28" y="63" font-size="13" fill="${inkSoft}">${xmlText(counts)}</text>`,
    `<g clip-path="url(#frame)">${patches.map((patch) => drawPatch(patch, scheme)).join('')}${threads.svg}${drawKnots(map, places, scheme)}${drawLabels(map, patches, at, scheme)}</g>`,
    drawLegend(map, scheme),
    `<path d="M28 ${height - 50}H${width - 28}" stroke="${thread}" stroke-width="0.7"/><text x="28" y="${height - 31}" font-size="12.5" fill="${ink}">${xmlText(options.caution)}</text><text x="28" y="${height - 13}" font-size="12" fill="${inkSoft}">${xmlText(options.provenance)}</text>`,
    '</svg>\n',
  ].join('\n');
}
