import { describe, expect, it } from 'vitest';

import { buildNetwork } from '@/lib/network/compressed-rows';
import { countBackwardLinks, countCitations } from '@/lib/network/degrees';
import { findStrongComponents, findWeakComponents } from '@/lib/network/components';
import { nameNetwork } from '@/tests/checks/network/named-network';
import graphs from '@/tests/fixtures/checks/graphs.json';
import checks from '@/tests/fixtures/checks/misc.json';

describe('citations inside the set (misc.json: in_degree, networkx)', () => {
  const check = checks.in_degree;
  const names = Object.keys(check.years);
  const inside = check.raw_citations.filter(([, cited]) => names.includes(cited));
  const built = buildNetwork(names.length, inside.map(([citing]) => names.indexOf(citing)), inside.map(([, cited]) => names.indexOf(cited)));

  it('count each citing work once and no work for itself, and say what was dropped', () => {
    expect(Object.fromEntries(names.map((name, work) => [name, countCitations(built.network)[work]]))).toEqual(check.in_degree_networkx);
    expect(built.selfLinks).toBe(check.dropped.self_loop.length);
    expect(built.duplicates).toBe(check.dropped.duplicate.length);
    expect(built.network.targets.length).toBe(check.distinct_inside_set_without_self_loops.length);
  });

  it('keep links against time and count them apart, leaving unknown years out', () => {
    expect(countBackwardLinks(built.network, Object.values(check.years))).toBe(check.citations_older_citing_newer.length);
  });
});

describe('components and degrees of the unix family (graphs.json, networkx)', () => {
  const { unix } = graphs;
  const { network, numberOf } = nameNetwork(unix.edges, unix.nodes);

  it('find its one weak and 41 strong components', () => {
    expect(findWeakComponents(network.size, network.offsets, network.targets).count).toBe(unix.weak_components);
    expect(findStrongComponents(network).count).toBe(unix.strong_components);
  });

  it('find its in-degrees', () => {
    const degrees = countCitations(network);
    for (const [name, degree] of Object.entries(unix.in_degree)) expect(degrees[numberOf(name)]).toBe(degree);
  });
});
