import { send } from '@/lib/api/client';

export interface SearchHit {
  id: string;
  title: string;
  subtitle?: string;
  href: string;
}

export interface SearchHits {
  works: SearchHit[];
  portfolios: SearchHit[];
}

/** Finds the hits for what was typed; rejects when the signal aborts. */
export type Search = (query: string, signal: AbortSignal) => Promise<SearchHits>;

interface Answer {
  works: { id: string; title: string | null; authors: string | null; year: number | null; venue: string | null }[];
  portfolios: { id: string; name: string }[];
}

/** GET /api/search: works by words or DOI, portfolios by name. */
export const searchCatalogue: Search = async (query, signal) => {
  const answer = await send<Answer>('GET', `/api/search?q=${encodeURIComponent(query)}`, undefined, signal);
  return {
    works: answer.works.map((work) => ({
      id: work.id,
      title: work.title ?? 'Untitled',
      subtitle: [work.authors, work.year, work.venue].filter((part) => part !== null && part !== '').join(' · '),
      href: `/works/${work.id}`,
    })),
    portfolios: answer.portfolios.map((portfolio) => ({ id: portfolio.id, title: portfolio.name, href: `/portfolios/${portfolio.id}` })),
  };
};
