'use client';

import { useMemo } from 'react';

import { useShallow } from '@/components/analyses/use-shallow';
import { filtersOf, neighboursOf, visibleWorks, type MapFilters, type Neighbour } from '@/components/map/map-state';
import { type MapView } from '@/components/map/map-renderer';
import { clusterPatches, type Patch } from '@/components/map/patches';
import { restrictMap } from '@/components/map/restrict-map';
import { type AnalysisMap } from '@/lib/api/types';

export interface MapState {
  shallow: ReturnType<typeof useShallow>;
  filters: MapFilters;
  patches: Patch[];
  neighbours: Neighbour[][];
  visible: Uint8Array;
  /** How many works are shown, and how many links among them. */
  counts: { works: number; links: number };
  /** Index of the selected work, or -1: none, or one that is not on this map. */
  selected: number;
  view: MapView;
  /** The map with its filters, for exports and the still picture. */
  shown: AnalysisMap;
}

/** Everything that follows from a map and the address. Heavy parts are made anew only when the map or the filters change. */
export function useMapState(map: AnalysisMap): MapState {
  const shallow = useShallow();
  const { search } = shallow;
  const filterText = ['yearFrom', 'yearTo', 'off'].map((name) => `${name}=${search.get(name) ?? ''}`).join('&');
  const filters = useMemo(() => filtersOf(new URLSearchParams(filterText)), [filterText]);
  const patches = useMemo(() => clusterPatches(map), [map]);
  const neighbours = useMemo(() => neighboursOf(map), [map]);
  const indexOf = useMemo(() => new Map(map.ids.map((id, work) => [id, work])), [map]);
  const visible = useMemo(() => visibleWorks(map, filters), [map, filters]);
  const asked = indexOf.get(search.get('work') ?? '') ?? -1;
  const selected = asked >= 0 && visible[asked] ? asked : -1;
  const hiddenClusters = useMemo(() => new Set(map.clusters.filter((cluster) => filters.off.has(cluster.letter)).map((cluster) => cluster.number)), [map, filters]);
  const view = useMemo<MapView>(() => ({ visible, hiddenClusters, selected, linked: new Set(selected >= 0 ? neighbours[selected].map((near) => near.work) : []) }), [visible, hiddenClusters, selected, neighbours]);
  const counts = useMemo(() => ({ works: visible.reduce((sum, one) => sum + one, 0), links: map.links.source.reduce((sum, source, link) => sum + (visible[source] && visible[map.links.target[link]] ? 1 : 0), 0) }), [map, visible]);
  const shown = useMemo(() => (counts.works === map.ids.length ? map : restrictMap(map, new Set(map.ids.filter((_, work) => visible[work])))), [map, visible, counts.works]);
  return { shallow, filters, patches, neighbours, visible, counts, selected, view, shown };
}
