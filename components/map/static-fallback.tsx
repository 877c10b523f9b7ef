'use client';

import { useEffect, useMemo, useState } from 'react';

import { type Scheme } from '@/components/map/dyes';
import { type Patch } from '@/components/map/patches';
import { drawStaticMap } from '@/components/map/static-map';
import { Notice } from '@/components/ui/status';
import { type AnalysisMap } from '@/lib/api/types';

interface StaticFallbackProps {
  map: AnalysisMap;
  patches: Patch[];
  scheme: Scheme;
  title: string;
  caution: string;
  provenance: string;
}

/** The same map as a picture, for browsers without WebGL. Everything else on the page works as before. */
export function StaticFallback({ map, patches, scheme, title, caution, provenance }: StaticFallbackProps) {
  const svg = useMemo(() => drawStaticMap(map, { scheme, title, caution, provenance, patches }), [map, patches, scheme, title, caution, provenance]);
  const [address, setAddress] = useState<string | null>(null);
  useEffect(() => {
    // As an image, nothing within the picture can act on the page.
    const made = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }));
    // The address exists only here, after mounting; the server has nothing to draw it from.
    // eslint-disable-next-line react-hooks/set-state-in-effect
    setAddress(made);
    return () => URL.revokeObjectURL(made);
  }, [svg]);
  return (
    <div className="absolute inset-0 grid grid-rows-[auto_minmax(0,1fr)] overflow-auto bg-paper">
      <Notice title="A still picture">This browser cannot draw the map with WebGL. Search, filters and the table work all the same.</Notice>
      {/* eslint-disable-next-line @next/next/no-img-element -- a blob that was made here; there is nothing to optimise */}
      {address && <img src={address} alt={`Map of ${map.ids.length} works in ${map.clusters.length} clusters; the table holds the same works`} className="size-full object-contain" />}
    </div>
  );
}
