import { type PersonName } from '@/lib/bibliography/record';

/** Family name and first initial, without case and marks; null for bodies and names without either part. */
function identityOf(name: PersonName): string | null {
  const initial = name.given?.normalize('NFKD').match(/\p{L}/u)?.[0];
  if (!name.family || !initial) return null;
  const family = name.family.normalize('NFKD').replace(/[^\p{L}]/gu, '');
  return family === '' ? null : `${family.toLowerCase()} ${initial.toLowerCase()}`;
}

const identitiesOf = (names: readonly PersonName[]): Set<string> => new Set(names.map(identityOf).filter((one) => one !== null));

/** Names of a work as far as they are known; `partly` where a reference gave no more than its first author. */
export interface KnownNames {
  names: readonly PersonName[];
  partly: boolean;
}

/**
 * How many of the citing works share an author with the cited one, by family name and first initial (which overstates where names are
 * common). Works that name no person on either side cannot be told, nor can a work known by its first author alone whom nobody shares.
 */
export function countSameAuthor(cited: KnownNames, citing: readonly KnownNames[]): { same: number; undetermined: number } {
  const own = identitiesOf(cited.names);
  let same = 0;
  let undetermined = 0;
  for (const { names, partly } of citing) {
    const others = identitiesOf(names);
    if ([...others].some((one) => own.has(one))) same += 1;
    else if (own.size === 0 || others.size === 0 || cited.partly || partly) undetermined += 1;
  }
  return { same, undetermined };
}
