import { type WorkType } from '@/lib/bibliography/record';

export const typeWords: Record<WorkType, string> = {
  article: 'article', chapter: 'chapter', book: 'book', thesis: 'thesis', report: 'report', 'conference-paper': 'conference paper', dataset: 'data set', preprint: 'preprint', patent: 'patent',
  software: 'software', web: 'web page', other: 'other',
};

/** How a reference came to its work. */
export const linkWords: Record<string, string> = { doi: 'linked by DOI', fields: 'linked by author, year, volume and page', title: 'linked by title', drawn: 'known from references alone' };

/** "38(2), 114–131" from what is known of volume, issue and pages. */
export function placeWords(work: { volume: string | null; issue: string | null; firstPage: string | null; lastPage: string | null; articleNumber: string | null }): string | null {
  const volume = work.volume ? `${work.volume}${work.issue ? `(${work.issue})` : ''}` : work.issue ? `no. ${work.issue}` : null;
  const pages = work.firstPage ? (work.lastPage && work.lastPage !== work.firstPage ? `${work.firstPage}–${work.lastPage}` : work.firstPage) : work.articleNumber;
  return [volume, pages].filter(Boolean).join(', ') || null;
}

/** A title for lists: works known from references alone often have none. */
export const titleOf = (work: { title: string | null; authors: string | null; year: number | null }): string => work.title ?? ([work.authors, work.year].filter((part) => part !== null).join(', ') || 'Untitled work');

/** Only addresses of the web become links: records come from strangers' files. */
export const webAddress = (url: string | null): string | null => (url && /^https?:\/\/[^\s]+$/i.test(url) ? url : null);
