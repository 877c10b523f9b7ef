import { buildNetwork, buildWeightedNetwork } from '@/lib/network/compressed-rows';
import { type DirectedNetwork, type WeightedNetwork } from '@/lib/network/types';

/** A network whose works have names, as check files give them. */
export interface NamedNetwork {
  names: string[];
  network: DirectedNetwork;
  numberOf(name: string | number): number;
}

export function nameNetwork(pairs: readonly (readonly (string | number)[])[], given: readonly (string | number)[] = []): NamedNetwork {
  const numbers = new Map<string, number>();
  for (const name of [...given, ...pairs.flatMap(([citing, cited]) => [citing, cited])]) if (!numbers.has(String(name))) numbers.set(String(name), numbers.size);
  const numberOf = (name: string | number): number => {
    const number = numbers.get(String(name));
    if (number === undefined) throw new Error(`No work is called ${name}.`);
    return number;
  };
  const { network } = buildNetwork(numbers.size, pairs.map(([citing]) => numberOf(citing)), pairs.map(([, cited]) => numberOf(cited)));
  return { names: [...numbers.keys()], network, numberOf };
}

/** Undirected links, weight 1 or the third entry. */
export function weighNetwork(nodes: readonly (string | number)[], links: readonly (readonly (string | number)[])[], weighted = false): { network: WeightedNetwork; numberOf(name: string | number): number } {
  const numbers = new Map(nodes.map((name, number) => [String(name), number]));
  const numberOf = (name: string | number): number => numbers.get(String(name)) as number;
  const rows = links.map(([one, other, weight]) => {
    const ends = [numberOf(one), numberOf(other)].sort((a, b) => a - b);
    return { from: ends[0], to: ends[1], weight: weighted ? Number(weight) : 1 };
  });
  rows.sort((one, other) => one.from - other.from || one.to - other.to);
  const offsets = new Uint32Array(nodes.length + 1);
  for (const { from } of rows) offsets[from + 1] += 1;
  for (let node = 0; node < nodes.length; node += 1) offsets[node + 1] += offsets[node];
  return {
    network: buildWeightedNetwork({ size: nodes.length, offsets, partners: Uint32Array.from(rows, ({ to }) => to), weights: Float64Array.from(rows, ({ weight }) => weight) }),
    numberOf,
  };
}
