'use client';

import { useCallback, useMemo } from 'react';

import { useAddress } from '@/components/ui/use-address';

interface AddressDefaults<Filter extends string> {
  /** Order when the address names none: 'title' ascending, '-pageRank' descending. */
  sort?: string;
  pageSize?: number;
  /** Names of the filters in the address; one that is absent reads ''. */
  filters?: readonly Filter[];
  /** The server draws the rows: every change asks it for the page. Otherwise the browser reads them, and the change is at once. */
  fromServer?: boolean;
}

export interface AddressChange<Filter extends string> {
  sort?: string | null;
  page?: number;
  pageSize?: number;
  filters?: Partial<Record<Filter, string | null>>;
}

/** The API takes at most this many rows on a page. */
const largestPage = 200;

function wholeFrom(text: string | null, otherwise: number, largest = Number.MAX_SAFE_INTEGER): number {
  const value = Number(text);
  return text !== null && Number.isInteger(value) && value >= 1 && value <= largest ? value : otherwise;
}

/**
 * The state of a list in the address: `?sort=&page=&pageSize=` and the filters by name. A new order, size or filter goes back to page 1;
 * what equals its default is left out, so that one view has one address. `query` is what the API takes.
 */
export function useAddressState<Filter extends string = never>({ sort: firstSort = '', pageSize: firstSize = 50, filters: names, fromServer = false }: AddressDefaults<Filter> = {}) {
  const { search, href, go, show } = useAddress();
  const sort = search.get('sort') ?? firstSort;
  const page = wholeFrom(search.get('page'), 1);
  const pageSize = wholeFrom(search.get('pageSize'), firstSize, largestPage);
  // The names are listed in place by callers, anew on every render; their text is what matters.
  const nameList = (names ?? []).join(' ');
  const filters = useMemo(() => Object.fromEntries(nameList.split(' ').filter(Boolean).map((name) => [name, search.get(name) ?? ''])) as Record<Filter, string>, [nameList, search]);

  const changes = useCallback(
    (change: AddressChange<Filter>): Record<string, string | number | null> => {
      const fields: Record<string, string | number | null> = { ...(change.filters as Record<string, string | null> | undefined) };
      if (change.sort !== undefined) fields.sort = change.sort === firstSort ? null : change.sort;
      if (change.pageSize !== undefined) fields.pageSize = change.pageSize === firstSize ? null : change.pageSize;
      fields.page = change.page !== undefined && change.page > 1 ? change.page : null;
      return fields;
    },
    [firstSort, firstSize],
  );
  const hrefOf = useCallback((change: AddressChange<Filter>) => href(changes(change)), [href, changes]);
  const set = useCallback((change: AddressChange<Filter>, how: 'push' | 'replace' = 'push') => (fromServer ? go : show)(changes(change), how), [fromServer, go, show, changes]);
  const query = useMemo(() => ({ sort: sort || undefined, page, pageSize, ...filters }), [sort, page, pageSize, filters]);
  const filtered = Object.values<string>(filters).some((value) => value !== '');
  return { sort, page, pageSize, filters, filtered, query, hrefOf, set };
}
