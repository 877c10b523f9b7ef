import { exportedTitle } from '@/lib/analyses/reading/export-table';
import { provenanceLine, type Provenance } from '@/lib/analyses/reading/provenance';
import { xmlText } from '@/lib/analyses/reading/xml-text';
import { type AnalysisMap } from '@/lib/api/types';

const keys: [id: string, domain: 'node' | 'edge', type: string][] = [
  ['title', 'node', 'string'],
  ['authors', 'node', 'string'],
  ['year', 'node', 'int'],
  ['citationsHere', 'node', 'int'],
  ['pageRank', 'node', 'double'],
  ['rank', 'node', 'int'],
  ['catalogued', 'node', 'boolean'],
  ['retracted', 'node', 'boolean'],
  ['cluster', 'node', 'string'],
  ['clusterName', 'node', 'string'],
  ['firmness', 'node', 'double'],
  ['x', 'node', 'double'],
  ['y', 'node', 'double'],
  ['weight', 'edge', 'double'],
];

function data(fields: Record<string, string | number | boolean | null>): string {
  return Object.entries(fields)
    .filter(([, value]) => value !== null)
    .map(([key, value]) => `<data key="${key}">${typeof value === 'string' ? xmlText(value) : String(value)}</data>`)
    .join('');
}

/** The map's network as GraphML (graphml.graphdrawing.org): works as nodes, drawn links as undirected edges. */
export function* graphml(map: AnalysisMap, provenance: Provenance): Generator<string> {
  yield '<?xml version="1.0" encoding="UTF-8"?>\n<graphml xmlns="http://graphml.graphdrawing.org/xmlns" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance" xsi:schemaLocation="http://graphml.graphdrawing.org/xmlns http://graphml.graphdrawing.org/xmlns/1.0/graphml.xsd">\n';
  yield `<desc>${xmlText([provenanceLine(provenance), ...provenance.cautions].join(' '))}</desc>\n`;
  for (const [id, domain, type] of keys) yield `<key id="${id}" for="${domain}" attr.name="${id}" attr.type="${type}"/>\n`;
  yield `<graph id="${map.basis}" edgedefault="undirected">\n`;
  const clusters = new Map(map.clusters.map((cluster) => [cluster.number, cluster]));
  let chunk = '';
  for (const [index, id] of map.ids.entries()) {
    const cluster = clusters.get(map.cluster[index]);
    chunk += `<node id="w${id}">${data({
      title: exportedTitle(map.titles[index], map.retracted[index]),
      authors: map.authors[index],
      year: map.years[index],
      citationsHere: map.size[index],
      pageRank: map.pageRank[index],
      rank: map.rank[index],
      catalogued: map.catalogued[index],
      retracted: map.retracted[index],
      cluster: cluster?.letter ?? null,
      clusterName: cluster?.name ?? null,
      firmness: map.firmness[index],
      x: map.x[index],
      y: map.y[index],
    })}</node>\n`;
    if (chunk.length > 65_536) {
      yield chunk;
      chunk = '';
    }
  }
  for (const [index, source] of map.links.source.entries()) {
    chunk += `<edge source="w${map.ids[source]}" target="w${map.ids[map.links.target[index]]}">${data({ weight: map.links.weight[index] })}</edge>\n`;
    if (chunk.length > 65_536) {
      yield chunk;
      chunk = '';
    }
  }
  yield `${chunk}</graph>\n</graphml>\n`;
}
