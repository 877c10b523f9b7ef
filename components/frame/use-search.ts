'use client';

import { useEffect, useState } from 'react';

import { type Search, type SearchHits } from '@/components/frame/search-catalogue';
import { messageOf } from '@/lib/api/client';

export interface SearchState {
  /** The words that the hits belong to. */
  query: string;
  hits: SearchHits | null;
  problem: string | null;
}

const nothing: SearchState = { query: '', hits: null, problem: null };
const pauseMs = 160;
export const shortestQuery = 2;

/** Asks after a short pause in typing; an answer that was overtaken is dropped. */
export function useSearch(search: Search, typed: string): SearchState {
  const query = typed.trim();
  const [state, setState] = useState<SearchState>(nothing);
  useEffect(() => {
    if (query.length < shortestQuery) return;
    const controller = new AbortController();
    const timer = setTimeout(() => {
      search(query, controller.signal).then(
        (hits) => !controller.signal.aborted && setState({ query, hits, problem: null }),
        (error: unknown) => !controller.signal.aborted && setState({ query, hits: null, problem: messageOf(error) }),
      );
    }, pauseMs);
    return () => {
      clearTimeout(timer);
      controller.abort();
    };
  }, [query, search]);
  return query.length < shortestQuery ? nothing : state;
}
