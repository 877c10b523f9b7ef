/** Invented works, as on every example of the product. */
export interface ExampleWork {
  id: string;
  rank: number;
  low: number;
  high: number;
  title: string;
  authors: string;
  cluster: number;
  citations: number;
  pageRank: number;
  percentile: number;
  uncertain?: boolean;
}

const rows: [string, string, number, number, number, number, number, number][] = [
  ['Water-table depth as a first-order control on peat oxidation', 'Aldervik, Ruuska · 2009', 0, 212, 8.41, 1, 2, 96],
  ['A stream index from family-level invertebrate counts', 'Tolland, Brae · 2004', 1, 187, 7.92, 1, 4, 99],
  ['Wave damping over vegetated foreshores: a flume study', 'Ostrakova et al. · 2012', 4, 164, 5.2, 2, 7, 91],
  ['Nitrogen retention in constructed reed beds, a synthesis', 'Marchetti, Oyelaran · 2011', 3, 158, 5.07, 2, 6, 94],
  ['Breach sites and sediment supply after realignment', 'Fenwick-Ito · 2015', 2, 131, 4.66, 3, 11, 88],
  ['Temperature response of soil respiration revisited', 'Haldane, Quist · 2001', 5, 128, 3.98, 5, 9, 97],
  ['Ditch blocking and vegetation succession, ten years on', 'Aldervik · 2018', 0, 97, 3.71, 5, 14, 72],
  ['Drift of mayfly larvae after low-flow events', 'Brae, Sundqvist · 2010', 1, 95, 3.4, 6, 15, 90],
];

export const exampleWorks: ExampleWork[] = rows.map(([title, authors, cluster, citations, pageRank, low, high, percentile], index) => ({
  id: String(index + 1),
  rank: index + 1,
  low,
  high,
  title,
  authors,
  cluster,
  citations,
  pageRank,
  percentile,
  uncertain: index === 6,
}));

export const exampleYears = [2, 0, 2, 3, 5, 7, 11, 15, 20, 22, 17, 14, 10, 6].map((count, index) => ({ year: 2012 + index, count }));

export const exampleBins = [420, 310, 190, 95, 60, 31, 18, 9, 4, 2].map((count, index) => ({ from: index * 25, to: index * 25 + 25, count }));

export const examplePortfolio = [
  { href: '/components', label: 'Overview' },
  { href: '/components/imports', label: 'Imports' },
  { href: '/components/works', label: 'Works' },
  { href: '/components/rankings', label: 'Rankings' },
  { href: '/components/clusters', label: 'Clusters' },
  { href: '/components/map', label: 'Map' },
];
