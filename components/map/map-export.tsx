'use client';

import { type Scheme } from '@/components/map/dyes';
import { type Patch } from '@/components/map/patches';
import { drawStaticMap } from '@/components/map/static-map';
import { Button } from '@/components/ui/button';
import { Menu, MenuItem, MenuLink } from '@/components/ui/menu';
import { useToast } from '@/components/ui/toast';
import { apiPath } from '@/lib/api/hooks';
import { type AnalysisMap } from '@/lib/api/types';

interface MapExportProps {
  /** What is shown: the map with its filters. */
  shown: AnalysisMap;
  patches: Patch[];
  scheme: Scheme;
  title: string;
  caution: string;
  provenance: string;
  filters: Record<string, string | null>;
}

const pictureScale = 2;

/** Draws the picture of the SVG export at twice its size. */
async function drawPng(svg: string): Promise<Blob> {
  const address = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = address;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = image.naturalWidth * pictureScale;
    canvas.height = image.naturalHeight * pictureScale;
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
    return await new Promise((resolve, reject) => canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error('The picture could not be drawn.'))), 'image/png'));
  } finally {
    URL.revokeObjectURL(address);
  }
}

function save(blob: Blob, name: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(blob);
  link.download = name;
  link.click();
  // The browser reads it after this turn.
  setTimeout(() => URL.revokeObjectURL(link.href), 10_000);
}

/** What is shown, as a picture, a network or a table; each with its caution and where it comes from. */
export function MapExport({ shown, patches, scheme, title, caution, provenance, filters }: MapExportProps) {
  const toast = useToast();
  const href = (format: string) => apiPath(`/api/analyses/${shown.analysisId}/export`, { ...filters, basis: shown.basis, format, ...(format === 'svg' ? { scheme } : {}) });
  const png = async () => {
    try {
      save(await drawPng(drawStaticMap(shown, { scheme, title, caution, provenance, patches })), `heddle-analysis-${shown.analysisId}-map-${shown.basis}.png`);
    } catch {
      toast({ text: 'This browser could not make the picture. Take the SVG instead; nothing is lost.' });
    }
  };
  return (
    <Menu label="Export what is shown" align="start" trigger={<Button>Export</Button>}>
      <MenuLink download href={href('svg')}>SVG picture</MenuLink>
      <MenuItem onSelect={() => void png()}>PNG picture</MenuItem>
      <MenuLink download href={href('graphml')}>GraphML network</MenuLink>
      <MenuLink download href={href('csv')}>CSV table</MenuLink>
      <MenuLink download href={href('json')}>JSON table</MenuLink>
    </Menu>
  );
}
