/**
 * Which records are the same work. A function of the set of records and of people's decisions, never of the order in which the records
 * came: that is what makes undoing an import exact.
 *
 * Rules, strongest first:
 * 1. People's decisions: "same" joins, "different" keeps apart whatever follows.
 * 2. A shared identifier joins, unless the titles have next to nothing in common (token Jaccard < 0.3; wrong DOIs are common).
 * 3. An equal fingerprint joins, unless it would put two different DOIs, or two different volume-and-page pairs, into one work.
 *
 * Cost: near-linear in the number of records; classes of one identifier are compared pairwise, and are small.
 */
export interface GroupInput {
  id: number;
  identifiers: string[];
  fingerprint: string | null;
  volumePage: string | null;
  /** Normalised title. */
  title: string;
  /** Unique text to name a work that has neither identifier nor fingerprint, e.g. file hash and position. */
  fallback: string;
}

export interface Group {
  /** Natural key of the work: smallest DOI, else smallest other identifier, else fingerprint, else fallback. */
  key: string;
  /** Ascending. */
  recordIds: number[];
}

/** Share of words in common, 0..1; 1 when either has none (nothing contradicts). */
export function tokenJaccard(a: string, b: string): number {
  if (a === '' || b === '') return 1;
  const left = new Set(a.split(' '));
  const right = new Set(b.split(' '));
  let common = 0;
  for (const word of left) if (right.has(word)) common += 1;
  return common / (left.size + right.size - common);
}

class Forest {
  private readonly parent: Int32Array;
  readonly dois: Set<string>[];
  readonly pages: Set<string>[];
  readonly foes: Set<number>[];
  constructor(inputs: GroupInput[]) {
    this.parent = Int32Array.from(inputs.keys());
    this.dois = inputs.map((input) => new Set(input.identifiers.filter((value) => value.startsWith('doi:'))));
    this.pages = inputs.map((input) => new Set(input.volumePage ? [input.volumePage] : []));
    this.foes = inputs.map(() => new Set());
  }
  find(node: number): number {
    let root = node;
    while (this.parent[root] !== root) root = this.parent[root];
    while (this.parent[node] !== root) [this.parent[node], node] = [root, this.parent[node]];
    return root;
  }
  parted(a: number, b: number): boolean {
    const [left, right] = [this.find(a), this.find(b)];
    for (const foe of this.foes[left]) if (this.find(foe) === right) return true;
    for (const foe of this.foes[right]) if (this.find(foe) === left) return true;
    return false;
  }
  join(a: number, b: number): void {
    const [left, right] = [this.find(a), this.find(b)];
    if (left === right || this.parted(left, right)) return;
    const [into, from] = left < right ? [left, right] : [right, left];
    this.parent[from] = into;
    for (const value of this.dois[from]) this.dois[into].add(value);
    for (const value of this.pages[from]) this.pages[into].add(value);
    for (const value of this.foes[from]) this.foes[into].add(value);
  }
}

/** Members by key, keys ascending, so that what follows does not depend on the order of the input. */
function classes(inputs: GroupInput[], keysOf: (input: GroupInput) => string[]): [string, number[]][] {
  const byKey = new Map<string, number[]>();
  inputs.forEach((input, index) => {
    for (const key of keysOf(input)) {
      const members = byKey.get(key);
      if (members) members.push(index);
      else byKey.set(key, [index]);
    }
  });
  return [...byKey].filter(([, members]) => members.length > 1).sort(([a], [b]) => (a < b ? -1 : 1));
}

function joinFingerprints(forest: Forest, inputs: GroupInput[]): void {
  for (const [, members] of classes(inputs, (input) => (input.fingerprint ? [input.fingerprint] : []))) {
    const dois = new Set(members.flatMap((member) => [...forest.dois[forest.find(member)]]));
    const pages = new Set(members.flatMap((member) => [...forest.pages[forest.find(member)]]));
    if (dois.size <= 1 && pages.size <= 1) {
      for (const member of members) forest.join(members[0], member);
      continue;
    }
    // Somebody contradicts somebody: join only those that say exactly the same.
    const alike = new Map<string, number>();
    for (const member of members) {
      const root = forest.find(member);
      const saying = `${[...forest.dois[root]].sort().join(' ')}#${[...forest.pages[root]].sort().join(' ')}`;
      const first = alike.get(saying);
      if (first === undefined) alike.set(saying, member);
      else forest.join(first, member);
    }
  }
}

function keyOf(members: GroupInput[], taken: Map<string, string>): string {
  const identifiers = [...new Set(members.flatMap((member) => member.identifiers))].sort();
  const identifier = identifiers.find((value) => value.startsWith('doi:')) ?? identifiers[0];
  const title = members.map((member) => member.title).sort()[0];
  const fingerprint = members.map((member) => member.fingerprint).filter((value): value is string => value !== null).sort()[0];
  const plain = identifier ?? fingerprint ?? members.map((member) => member.fallback).sort()[0];
  // Several works may claim one key (one DOI on two titles, one fingerprint on two page numbers): the claim alone is no name then.
  if (taken.get(plain) === 'several') return `${plain}#${identifier ? title : [...new Set(members.map((member) => member.volumePage ?? ''))].sort().join(' ')}`;
  return plain;
}

/**
 * Groups records into works.
 *
 * @param inputs records, any order; all records that share a key with one of them must be among them
 * @param same pairs of record ids that people declared the same
 * @param different pairs of record ids that people declared different
 * @returns groups in order of key; each record stands in exactly one
 */
export function groupRecords(inputs: GroupInput[], same: readonly (readonly [number, number])[] = [], different: readonly (readonly [number, number])[] = []): Group[] {
  const ordered = [...inputs].sort((a, b) => {
    const left = a.fallback;
    const right = b.fallback;
    return left < right ? -1 : left > right ? 1 : a.id - b.id;
  });
  const forest = new Forest(ordered);
  const index = new Map(ordered.map((input, position) => [input.id, position]));
  const positions = (pairs: readonly (readonly [number, number])[]) =>
    pairs.flatMap(([a, b]) => {
      const [left, right] = [index.get(a), index.get(b)];
      return left === undefined || right === undefined ? [] : [[Math.min(left, right), Math.max(left, right)] as const];
    }).sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  for (const [a, b] of positions(different)) {
    forest.foes[a].add(b);
    forest.foes[b].add(a);
  }
  for (const [a, b] of positions(same)) forest.join(a, b);
  for (const [, members] of classes(ordered, (input) => input.identifiers)) {
    // Compared with the distinct titles met so far, which stay few however often an identifier recurs.
    const titles: { title: string; member: number }[] = [];
    for (const member of members) {
      const title = ordered[member].title;
      const friend = titles.filter((other) => tokenJaccard(other.title, title) >= 0.3);
      for (const other of friend) forest.join(other.member, member);
      if (!titles.some((other) => other.title === title) && titles.length < 200) titles.push({ title, member });
    }
  }
  joinFingerprints(forest, ordered);

  const byRoot = new Map<number, GroupInput[]>();
  ordered.forEach((input, position) => {
    const root = forest.find(position);
    const members = byRoot.get(root);
    if (members) members.push(input);
    else byRoot.set(root, [input]);
  });
  const claims = new Map<string, string>();
  for (const members of byRoot.values()) {
    const plain = keyOf(members, new Map());
    claims.set(plain, claims.has(plain) ? 'several' : 'one');
  }
  const groups: Group[] = [];
  const names = new Map<string, number>();
  for (const members of byRoot.values()) {
    let key = keyOf(members, claims);
    // Kept apart by a decision although nothing tells them apart: numbered in the order of their fallbacks.
    const count = (names.get(key) ?? 0) + 1;
    names.set(key, count);
    if (count > 1) key = `${key}#${count}`;
    groups.push({ key, recordIds: members.map((member) => member.id).sort((a, b) => a - b) });
  }
  return groups.sort((a, b) => (a.key < b.key ? -1 : 1));
}
