import { type PersonName } from '@/lib/bibliography/record';

/** Family name and first initial, without case and marks; null for bodies and names without either part. */
function identityOf(name: PersonName): string | null {
  const initial = name.given?.normalize('NFKD').match(/\p{L}/u)?.[0];
  if (!name.family || !initial) return null;
  const family = name.family.normalize('NFKD').replace(/[^\p{L}]/gu, '');
  return family === '' ? null : `${family.toLowerCase()} ${initial.toLowerCase()}`;
}

const identitiesOf = (names: readonly PersonName[]): Set<string> => new Set(names.map(identityOf).filter((one) => one !== null));

/**
 * How many of the citing works share an author with the cited one, by family name and first initial (which overstates where names are
 * common). Works that name no person on either side cannot be told.
 */
export function countSameAuthor(cited: readonly PersonName[], citing: readonly (readonly PersonName[])[]): { same: number; undetermined: number } {
  const own = identitiesOf(cited);
  if (own.size === 0) return { same: 0, undetermined: citing.length };
  let same = 0;
  let undetermined = 0;
  for (const names of citing) {
    const others = identitiesOf(names);
    if (others.size === 0) undetermined += 1;
    else if ([...others].some((one) => own.has(one))) same += 1;
  }
  return { same, undetermined };
}
