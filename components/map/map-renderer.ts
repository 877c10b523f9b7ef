import Graph from 'graphology';
import Sigma from 'sigma';
import { type Settings } from 'sigma/settings';
import { type EdgeDisplayData, type NodeDisplayData } from 'sigma/types';

import { drawDottedThreads, drawPatches, prepareCloth, type Cloth, type Project } from '@/components/map/cloth-layer';
import { dyeOf, inks, mixed, type Scheme } from '@/components/map/dyes';
import { KnotProgram, type KnotLook } from '@/components/map/knot-program';
import { drawClusterLabels, drawRetractions, type Box } from '@/components/map/label-layer';
import { frameOf, type Patch } from '@/components/map/patches';
import { isUncertain, knotSide, partThreads } from '@/components/map/threads';
import { type AnalysisMap } from '@/lib/api/types';

export interface MapView {
  /** 1 for each work that is shown. */
  visible: Uint8Array;
  hiddenClusters: ReadonlySet<number>;
  /** Works by index, or -1. */
  selected: number;
  /** Works linked with the selected one; they keep their colour while the rest steps back. */
  linked: ReadonlySet<number>;
}

export interface CameraPlace {
  x: number;
  y: number;
  ratio: number;
}

interface MapRendererOptions {
  map: AnalysisMap;
  patches: readonly Patch[];
  scheme: Scheme;
  view: MapView;
  camera: CameraPlace | null;
  onSelect: (work: number | null) => void;
  /** The work under the pointer and its place in pixels; null when it leaves. */
  onHover: (work: number | null, place: { x: number; y: number }) => void;
  onCamera: (camera: CameraPlace) => void;
}

type Knot = Partial<NodeDisplayData> & KnotLook & { x: number; y: number; size: number; color: string; work: number };
type Thread = { size: number; color: string; link: number };

const mostThreads = { within: 15_000, between: 2_000 };

/** The map on screen: patches and dotted threads on a canvas below, knots and solid threads by sigma, labels on a canvas above. */
export class MapRenderer {
  private readonly sigma: Sigma<Knot, Thread>;
  private readonly between: number[];
  private readonly contexts: Record<'cloth' | 'names', CanvasRenderingContext2D>;
  private cloth: Cloth;
  private scheme: Scheme;
  private view: MapView;
  private hovered = -1;
  /** Knots shrink with the view, or a map on a telephone would be one heap. */
  private knotScale = 1;
  private cameraTimer: ReturnType<typeof setTimeout> | undefined;

  constructor(container: HTMLElement, private readonly options: MapRendererOptions) {
    const { map, patches, scheme, view, camera } = options;
    this.scheme = scheme;
    this.view = view;
    this.cloth = prepareCloth(patches, scheme);
    const threads = partThreads(map, mostThreads.within, mostThreads.between);
    this.between = threads.between;
    this.sigma = new Sigma<Knot, Thread>(this.makeGraph(threads.within), container, this.settings());
    this.sigma.setCustomBBox(frameOf(map, patches));
    this.contexts = { cloth: this.addLayer('cloth', { beforeLayer: 'edges' }), names: this.addLayer('names', { afterLayer: 'nodes' }) };
    this.sigma.resize(true);
    this.measure();
    if (camera) this.sigma.getCamera().setState(camera);
    this.listen();
    this.sigma.refresh();
  }

  /** sigma keeps canvases of its own making at the size of the view; its types know the place of a layer for canvases without context only. */
  private addLayer(name: 'cloth' | 'names', place: { beforeLayer: string } | { afterLayer: string }): CanvasRenderingContext2D {
    const layer = { style: { pointerEvents: 'none' }, ...place };
    this.sigma.createCanvasContext(name, layer);
    const context = this.sigma.getCanvases()[name].getContext('2d');
    if (!context) throw new Error('This browser cannot draw on a canvas.');
    return context;
  }

  private settings(): Partial<Settings<Knot, Thread>> {
    return {
      allowInvalidContainer: true,
      nodeProgramClasses: { knot: KnotProgram as never },
      defaultNodeType: 'knot',
      renderLabels: false,
      defaultDrawNodeHover: () => undefined,
      hideEdgesOnMove: this.options.map.links.source.length > 20_000,
      minCameraRatio: 0.02,
      maxCameraRatio: 2.5,
      stagePadding: 28,
      zIndex: true,
      nodeReducer: (_, knot) => this.showKnot(knot),
      edgeReducer: (_, thread) => this.showThread(thread),
    };
  }

  private makeGraph(within: readonly number[]): Graph<Knot, Thread> {
    const { map } = this.options;
    const graph = new Graph<Knot, Thread>({ type: 'undirected', multi: true });
    const most = map.size.reduce((highest, value) => Math.max(highest, value), 0);
    // Large knots first: small ones lie on top and can be reached.
    const order = map.ids.map((_, work) => work).sort((a, b) => map.size[b] - map.size[a] || a - b);
    for (const work of order) graph.addNode(String(work), { x: map.x[work], y: map.y[work], size: knotSide(map.size[work], most, map.ids.length) / 2, color: '#000000', hem: '#000000', hemWidth: 0, work });
    for (const link of within) graph.addEdge(String(map.links.source[link]), String(map.links.target[link]), { size: 0.9, color: '#000000', link });
    return graph;
  }

  private showKnot(knot: Knot): Partial<NodeDisplayData> & Partial<KnotLook> {
    const { map } = this.options;
    const { visible, selected, linked } = this.view;
    const { work } = knot;
    if (!visible[work]) return { ...knot, hidden: true };
    const { ground, ink, selected: weld } = inks[this.scheme];
    const away = selected >= 0 && work !== selected && !linked.has(work);
    const dye = away ? mixed(dyeOf(map.cluster[work], this.scheme), ground, 0.62) : dyeOf(map.cluster[work], this.scheme);
    const hollow = isUncertain(map.firmness[work]);
    const size = knot.size * this.knotScale;
    const look: Knot = { ...knot, size, color: hollow ? ground : dye, hem: hollow ? dye : ground, hemWidth: hollow ? 1.8 : 0.9, zIndex: away ? 0 : 1 };
    if (work === selected) return { ...look, hem: this.scheme === 'light' ? ink : weld, hemWidth: 2.6, size: size + 3, zIndex: 3 };
    if (work === this.hovered) return { ...look, hem: ink, hemWidth: 1.8, size: size + 1, zIndex: 2 };
    return look;
  }

  private showThread(thread: Thread): Partial<EdgeDisplayData> {
    const { map } = this.options;
    const { visible, selected } = this.view;
    const [source, target] = [map.links.source[thread.link], map.links.target[thread.link]];
    if (!visible[source] || !visible[target]) return { ...thread, hidden: true };
    // sigma adds half-transparent colours up where threads cross; mixed with the ground beforehand, they stay what they are.
    return { ...thread, color: mixed(dyeOf(map.cluster[source], this.scheme), inks[this.scheme].ground, selected >= 0 ? 0.82 : 0.55) };
  }

  private readonly project: Project = (point) => this.sigma.graphToViewport(point);

  private listen(): void {
    const { onSelect, onHover, onCamera } = this.options;
    const { sigma } = this;
    // After it: a view that changed its size is emptied in the course of rendering.
    sigma.on('afterRender', () => {
      this.drawBelow();
      this.drawAbove();
    });
    sigma.on('resize', () => {
      this.measure();
      this.hover(-1);
      onHover(null, { x: 0, y: 0 });
    });
    sigma.on('enterNode', ({ node }) => {
      this.hover(Number(node));
      onHover(this.hovered, this.placeOf(this.hovered));
    });
    sigma.on('leaveNode', () => {
      this.hover(-1);
      onHover(null, { x: 0, y: 0 });
    });
    sigma.on('clickNode', ({ node }) => onSelect(Number(node)));
    sigma.on('clickStage', () => onSelect(null));
    sigma.on('doubleClickNode', (event) => {
      event.preventSigmaDefault();
      this.flyTo(Number(event.node));
    });
    sigma.getCamera().on('updated', () => {
      if (this.hovered >= 0) onHover(this.hovered, this.placeOf(this.hovered));
      clearTimeout(this.cameraTimer);
      this.cameraTimer = setTimeout(() => {
        const { x, y, ratio } = sigma.getCamera().getState();
        onCamera({ x, y, ratio });
      }, 350);
    });
  }

  private measure(): void {
    const { width, height } = this.sigma.getDimensions();
    this.knotScale = Math.min(1, Math.max(0.5, Math.min(width, height) / 620));
  }

  private hover(work: number): void {
    if (work === this.hovered) return;
    const changed = [this.hovered, work].filter((one) => one >= 0).map(String);
    this.hovered = work;
    this.sigma.getContainer().style.cursor = work >= 0 ? 'pointer' : '';
    this.sigma.refresh({ partialGraph: { nodes: changed }, skipIndexation: true });
  }

  private drawBelow(): void {
    const { width, height } = this.sigma.getDimensions();
    const context = this.contexts.cloth;
    context.clearRect(0, 0, width, height);
    drawPatches(this.cloth, { context, project: this.project, hidden: this.view.hiddenClusters });
    drawDottedThreads(this.options.map, this.between, this.scheme, { context, project: this.project, visible: this.view.visible, selected: this.view.selected });
  }

  private drawAbove(): void {
    const { map, patches } = this.options;
    const { width, height } = this.sigma.getDimensions();
    const context = this.contexts.names;
    context.clearRect(0, 0, width, height);
    const retracted = map.retracted.flatMap((marked, work) => (marked && this.view.visible[work] ? [{ ...this.placeOf(work), half: this.halfOf(work) }] : []));
    drawRetractions(retracted, context, this.scheme);
    drawClusterLabels(map, patches, { context, project: this.project, width, height, hidden: this.view.hiddenClusters, scheme: this.scheme, taken: this.covered() });
  }

  /** What lies over the map: its buttons. Labels keep clear of them. */
  private covered(): Box[] {
    const { width } = this.sigma.getDimensions();
    return [{ left: width - 64, top: 0, right: width, bottom: 196 }];
  }

  private halfOf(work: number): number {
    return this.sigma.scaleSize(this.sigma.getNodeDisplayData(String(work))?.size ?? 0);
  }

  /** Place of a work in pixels of the view. */
  placeOf(work: number): { x: number; y: number } {
    const { map } = this.options;
    return this.project({ x: map.x[work], y: map.y[work] });
  }

  setView(view: MapView): void {
    this.view = view;
    this.sigma.refresh({ skipIndexation: true });
  }

  setScheme(scheme: Scheme): void {
    if (scheme === this.scheme) return;
    this.scheme = scheme;
    this.cloth = prepareCloth(this.options.patches, scheme);
    this.sigma.refresh({ skipIndexation: true });
  }

  /** Draws again, e.g. once fonts have come. */
  redraw(): void {
    this.sigma.refresh({ skipIndexation: true });
  }

  private move(place: Partial<CameraPlace>): void {
    const camera = this.sigma.getCamera();
    if (window.matchMedia('(prefers-reduced-motion: reduce)').matches) camera.setState(place);
    else void camera.animate(place, { duration: 320 });
  }

  zoomBy(factor: number): void {
    const camera = this.sigma.getCamera();
    this.move({ ratio: camera.getBoundedRatio(camera.getState().ratio / factor) });
  }

  fit(): void {
    this.move({ x: 0.5, y: 0.5, ratio: 1 });
  }

  /** Moves the view by shares of its width and height. */
  pan(right: number, down: number): void {
    const { width, height } = this.sigma.getDimensions();
    this.move(this.sigma.viewportToFramedGraph({ x: width * (0.5 + right), y: height * (0.5 + down) }));
  }

  flyTo(work: number, ratio = 0.45): void {
    const place = this.sigma.getNodeDisplayData(String(work));
    if (place) this.move({ x: place.x, y: place.y, ratio: Math.min(this.sigma.getCamera().getState().ratio, ratio) });
  }

  /** Brings a work into view if it lies outside; otherwise leaves the camera alone. */
  reveal(work: number): void {
    const { width, height } = this.sigma.getDimensions();
    const { x, y } = this.placeOf(work);
    const margin = 40;
    if (x > margin && x < width - margin && y > margin && y < height - margin) return;
    const place = this.sigma.getNodeDisplayData(String(work));
    if (place) this.move({ x: place.x, y: place.y });
  }

  /** Shows the whole of a cluster's patch. */
  flyToCluster(cluster: number): void {
    const points = this.options.patches.find((patch) => patch.cluster === cluster)?.loops.flat() ?? [];
    if (points.length === 0) return;
    const places = points.map(([x, y]) => this.project({ x, y }));
    const [xs, ys] = [places.map((place) => place.x), places.map((place) => place.y)];
    const [left, right, top, bottom] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
    const { width, height } = this.sigma.getDimensions();
    const camera = this.sigma.getCamera();
    const ratio = camera.getState().ratio * Math.max((right - left) / width, (bottom - top) / height) * 1.3;
    this.move({ ...this.sigma.viewportToFramedGraph({ x: (left + right) / 2, y: (top + bottom) / 2 }), ratio: camera.getBoundedRatio(ratio) });
  }

  kill(): void {
    clearTimeout(this.cameraTimer);
    this.sigma.kill();
  }
}
