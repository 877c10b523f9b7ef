/**
 * Which work a cited reference means. Decided once for each variant (all references that say exactly the same), as a function of the
 * catalogue and of the variants in use, never of the order in which they came.
 *
 * 1. its DOI (or PMID) is that of a catalogued work;
 * 2. its author, year, volume and first page (else source, year and page) are those of exactly one catalogued work, no DOI contradicting;
 * 3. its title, year and author are those of exactly one catalogued work, no DOI contradicting;
 * 4. it has a DOI: the cited-only work of that DOI;
 * 5. exactly one DOI occurs among the variants that share its field key (else its title key): as that DOI would be resolved;
 * 6. the cited-only work of its field key, else of its title key, else of its own text.
 */
export interface VariantInput {
  /** Key of the variant row, any text. */
  id: string;
  doi: string | null;
  /** Key of its DOI, else of its PMID. */
  identifierKey: string | null;
  fieldKey: string | null;
  titleKey: string | null;
  ownKey: string;
}

export interface CataloguedTarget {
  workId: number;
  /** Natural key of the work; settles what several works claim. */
  key: string;
  /** DOI of the work, null where it has none. */
  doi: string | null;
}

export type Resolution = { workId: number; how: 'doi' | 'fields' | 'title' } | { citedOnlyKey: string; how: 'drawn' };

/** Catalogued works by key; a key that several works share gives all of them. */
export type CatalogueLookup = (key: string) => readonly CataloguedTarget[];

function add<Key>(map: Map<Key, Set<string>>, key: Key, value: string): void {
  const values = map.get(key);
  if (values) values.add(value);
  else map.set(key, new Set([value]));
}

/**
 * @param variants all variants of each DOI, and all variants of each key that decides one without a DOI, must be among them
 * @returns for each variant's id where it leads
 */
export function resolveVariants(variants: readonly VariantInput[], catalogue: CatalogueLookup): Map<string, Resolution> {
  const identifiersByKey = new Map<string, Set<string>>();
  const keysByIdentifier = new Map<string, { fieldKeys: Set<string>; titleKeys: Set<string>; doi: string | null }>();
  for (const { identifierKey, doi, fieldKey, titleKey } of variants) {
    if (!identifierKey) continue;
    const keys = keysByIdentifier.get(identifierKey) ?? { fieldKeys: new Set(), titleKeys: new Set(), doi };
    keysByIdentifier.set(identifierKey, keys);
    if (fieldKey) {
      keys.fieldKeys.add(fieldKey);
      add(identifiersByKey, fieldKey, identifierKey);
    }
    if (titleKey) {
      keys.titleKeys.add(titleKey);
      add(identifiersByKey, titleKey, identifierKey);
    }
  }
  const byKeys = (keys: Iterable<string>, doi: string | null, how: 'fields' | 'title'): Resolution | null => {
    for (const key of [...keys].sort()) {
      const works = catalogue(key);
      if (works.length === 1 && !(doi && works[0].doi && works[0].doi !== doi)) return { workId: works[0].workId, how };
    }
    return null;
  };
  // A DOI is resolved once for all its variants, so that no variant of one cited work goes astray.
  const byIdentifier = new Map<string, Resolution>();
  for (const [identifierKey, keys] of keysByIdentifier) {
    const works = catalogue(identifierKey);
    // One DOI on several works is a conflict among records; the smallest key is a rule, not a judgement.
    const chosen = works.reduce<CataloguedTarget | null>((best, work) => (!best || work.key < best.key ? work : best), null);
    byIdentifier.set(
      identifierKey,
      chosen ? { workId: chosen.workId, how: 'doi' } : (byKeys(keys.fieldKeys, keys.doi, 'fields') ?? byKeys(keys.titleKeys, keys.doi, 'title') ?? { citedOnlyKey: identifierKey, how: 'drawn' }),
    );
  }
  const resolutions = new Map<string, Resolution>();
  for (const { id, identifierKey, fieldKey, titleKey, ownKey } of variants) {
    let resolution = identifierKey ? byIdentifier.get(identifierKey) : (byKeys(fieldKey ? [fieldKey] : [], null, 'fields') ?? byKeys(titleKey ? [titleKey] : [], null, 'title'));
    if (!resolution) {
      const shared = fieldKey ?? titleKey;
      const dois = shared ? identifiersByKey.get(shared) : undefined;
      const [onlyIdentifier] = dois?.size === 1 ? dois : [];
      const ofIdentifier = onlyIdentifier ? byIdentifier.get(onlyIdentifier) : undefined;
      if (ofIdentifier) resolution = 'workId' in ofIdentifier ? { workId: ofIdentifier.workId, how: 'fields' } : ofIdentifier;
      else resolution = { citedOnlyKey: shared ?? ownKey, how: 'drawn' };
    }
    resolutions.set(id, resolution);
  }
  return resolutions;
}
