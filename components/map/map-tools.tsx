'use client';

import { type MapRenderer } from '@/components/map/map-renderer';
import { IconButton } from '@/components/ui/button';
import { Icon } from '@/components/ui/icons';

/** Buttons over the map, for those who neither scroll nor pinch. */
export function MapTools({ renderer, onTable }: { renderer: MapRenderer | null; onTable: () => void }) {
  return (
    <div role="group" aria-label="View of the map" className="absolute top-4 right-4 grid gap-1.5">
      <IconButton label="Zoom in" onClick={() => renderer?.zoomBy(1.5)}><Icon name="plus" /></IconButton>
      <IconButton label="Zoom out" onClick={() => renderer?.zoomBy(1 / 1.5)}><Icon name="minus" /></IconButton>
      <IconButton label="Show the whole map" onClick={() => renderer?.fit()}><Icon name="home" /></IconButton>
      <IconButton label="Show as table" onClick={onTable}><Icon name="list" /></IconButton>
    </div>
  );
}
