export type Scheme = 'light' | 'dark';

/** The cluster dyes of app/globals.css as numbers: WebGL and exported pictures cannot read custom properties. A test keeps both alike. */
const dyes: Record<Scheme, readonly string[]> = {
  light: ['#3430c1', '#b93e15', '#c0c100', '#017c6e', '#b564bb', '#792713', '#5ab7f4', '#899a58', '#fd80ab', '#5d3c72'],
  dark: ['#6459ee', '#df6c5f', '#bae814', '#21a4a2', '#9058a5', '#b74859', '#76deff', '#abbd1c', '#feb5b1', '#d778f4'],
};

export interface Inks {
  ground: string;
  ink: string;
  inkSoft: string;
  thread: string;
  none: string;
  selected: string;
  retracted: string;
}

export const inks: Record<Scheme, Inks> = {
  light: { ground: '#fffdf8', ink: '#20242b', inkSoft: '#565b63', thread: '#8b816d', none: '#b9b09b', selected: '#b58010', retracted: '#a23b2e' },
  dark: { ground: '#202329', ink: '#ece7db', inkSoft: '#b3b0a6', thread: '#7d8390', none: '#8d8676', selected: '#d3a43a', retracted: '#f0917f' },
};

/** Clusters beyond the tenth, and works without one, are left undyed. */
export function dyeOf(cluster: number, scheme: Scheme): string {
  return dyes[scheme][cluster] ?? inks[scheme].none;
}

/** "#rrggbb" with an opacity of 0..1 as rgba(). */
export function withOpacity(hex: string, opacity: number): string {
  const [red, green, blue] = [1, 3, 5].map((from) => Number.parseInt(hex.slice(from, from + 2), 16));
  return `rgba(${red},${green},${blue},${opacity})`;
}

/** A colour part of the way towards another; what is not looked at steps back so. */
export function mixed(hex: string, towards: string, share: number): string {
  const parts = [1, 3, 5].map((from) => {
    const [own, other] = [hex, towards].map((colour) => Number.parseInt(colour.slice(from, from + 2), 16));
    return Math.round(own + (other - own) * share).toString(16).padStart(2, '0');
  });
  return `#${parts.join('')}`;
}

/** Lines of the weave that tells patches apart without colour: degrees, and pixels between threads. */
export interface Weave {
  angles: readonly number[];
  spacing: number;
}

const weaves: readonly Weave[] = [
  { angles: [45], spacing: 6 },
  { angles: [0], spacing: 6 },
  { angles: [135], spacing: 6 },
  { angles: [90], spacing: 6 },
  { angles: [0, 90], spacing: 8 },
  { angles: [45], spacing: 10 },
  { angles: [0], spacing: 10 },
  { angles: [135], spacing: 10 },
  { angles: [90], spacing: 10 },
  { angles: [45, 135], spacing: 10 },
];

export function weaveOf(cluster: number): Weave | null {
  return weaves[cluster] ?? null;
}
