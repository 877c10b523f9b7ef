'use client';

import { useEffect, useEffectEvent, useRef, useState, type KeyboardEvent } from 'react';

import { type Scheme } from '@/components/map/dyes';
import { type CameraPlace, type MapRenderer, type MapView } from '@/components/map/map-renderer';
import { type Arrow } from '@/components/map/map-state';
import { type Patch } from '@/components/map/patches';
import { workName } from '@/components/analyses/work-name';
import { type AnalysisMap } from '@/lib/api/types';

interface MapCanvasProps {
  map: AnalysisMap;
  patches: readonly Patch[];
  view: MapView;
  scheme: Scheme;
  camera: CameraPlace | null;
  /** Said when the map takes the focus. */
  label: string;
  describedBy: string;
  onReady: (renderer: MapRenderer | null) => void;
  onSelect: (work: number | null) => void;
  onWalk: (arrow: Arrow) => void;
  onOpen: () => void;
  onCamera: (camera: CameraPlace) => void;
  onFailure: () => void;
}

function HoverCard({ map, work, place, width }: { map: AnalysisMap; work: number; place: { x: number; y: number }; width: number }) {
  const cluster = map.clusters.find((one) => one.number === map.cluster[work]);
  const leftward = place.x > width - 300;
  return (
    <div
      aria-hidden="true"
      className="pointer-events-none absolute z-10 w-max max-w-72 rounded-sm border border-thread-strong bg-paper px-3 py-2 shadow-float"
      style={{ top: place.y, ...(leftward ? { right: width - place.x + 16 } : { left: place.x + 16 }), transform: 'translateY(-50%)' }}
    >
      <p className="font-serif text-work font-medium">
        {map.retracted[work] && <span className="text-madder">Retracted: </span>}
        {workName({ title: map.titles[work], authors: map.authors[work], year: map.years[work] })}
      </p>
      <p className="text-small text-ink-soft">{[map.titles[work] === null ? null : map.authors[work], map.titles[work] === null ? null : map.years[work], map.catalogued[work] ? null : 'cited only'].filter((part) => part !== null).join(' · ')}</p>
      <p className="mt-1 text-small">
        <span className="font-semibold">{map.size[work]}</span> citations here, rank <span className="font-semibold">{map.rank[work]}</span>
        {cluster && `, cluster ${cluster.letter}`}
      </p>
    </div>
  );
}

const panSteps: Record<Arrow, [number, number]> = { ArrowLeft: [-0.2, 0], ArrowRight: [0.2, 0], ArrowUp: [0, -0.2], ArrowDown: [0, 0.2] };
const isArrow = (key: string): key is Arrow => key in panSteps;

/** The drawn map with pointer and keyboard. sigma needs WebGL and a window, so it is loaded here and only in the browser. */
export function MapCanvas({ map, patches, view, scheme, camera, label, describedBy, onReady, onSelect, onWalk, onOpen, onCamera, onFailure }: MapCanvasProps) {
  const box = useRef<HTMLDivElement>(null);
  const [renderer, setRenderer] = useState<MapRenderer | null>(null);
  const [hovered, setHovered] = useState<{ work: number; place: { x: number; y: number } } | null>(null);
  const [width, setWidth] = useState(0);
  const select = useEffectEvent((work: number | null) => onSelect(work));
  const moved = useEffectEvent((place: CameraPlace) => onCamera(place));
  const start = useEffectEvent((made: MapRenderer | null) => {
    setRenderer(made);
    onReady(made);
  });
  const fail = useEffectEvent(() => onFailure());
  const make = useEffectEvent(async (container: HTMLElement, stopped: () => boolean) => {
    const { MapRenderer: Renderer } = await import('@/components/map/map-renderer');
    if (stopped()) return null;
    return new Renderer(container, {
      map, patches, scheme, view, camera,
      onSelect: (work) => select(work),
      onHover: (work, place) => {
        setWidth(container.clientWidth);
        setHovered(work === null ? null : { work, place });
      },
      onCamera: (place) => moved(place),
    });
  });

  useEffect(() => {
    const container = box.current;
    if (!container) return;
    let stopped = false;
    let made: MapRenderer | null = null;
    make(container, () => stopped)
      .then((renderer) => {
        if (!renderer) return;
        made = renderer;
        start(renderer);
        // Labels were measured with whatever font was there.
        void document.fonts.ready.then(() => !stopped && renderer.redraw());
      })
      .catch(() => fail());
    return () => {
      stopped = true;
      made?.kill();
      start(null);
      setHovered(null);
    };
  }, [map, patches]);

  useEffect(() => renderer?.setView(view), [renderer, view]);
  useEffect(() => renderer?.setScheme(scheme), [renderer, scheme]);

  const press = (event: KeyboardEvent) => {
    if (!renderer || event.ctrlKey || event.metaKey || event.altKey) return;
    const { key } = event;
    if (isArrow(key)) {
      if (event.shiftKey) renderer.pan(...panSteps[key]);
      else onWalk(key);
    } else if (key === '+' || key === '=') renderer.zoomBy(1.5);
    else if (key === '-') renderer.zoomBy(1 / 1.5);
    else if (key === '0' || key === 'Home') renderer.fit();
    else if (key === 'Enter') onOpen();
    else if (key === 'Escape' && view.selected >= 0) onSelect(null);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };

  return (
    <div className="absolute inset-0 overflow-hidden bg-paper">
      <div ref={box} role="application" tabIndex={0} aria-label={label} aria-describedby={describedBy} onKeyDown={press} className="focus-inset absolute inset-0 touch-none" />
      {hovered && <HoverCard map={map} work={hovered.work} place={hovered.place} width={width} />}
    </div>
  );
}
