import { type PersonName, type WorkType } from '@/lib/bibliography/record';
import { type Venue } from '@/lib/demonstration/venues';

/** What a writer needs to know of a work, cited or catalogued. */
export interface Publication {
  type: WorkType;
  title: string;
  authors: PersonName[];
  year: number;
  month: number;
  /** Journal; absent for theses, reports, books. */
  venue?: Venue;
  /** Book or proceedings that holds the work, series of a report. */
  container?: string;
  volume?: string;
  issue?: string;
  firstPage?: string;
  lastPage?: string;
  articleNumber?: string;
  publisher?: string;
  place?: string;
  doi?: string;
}

/** A work as a file tells of it: the publication, its record's own matter, and its reference list. */
export interface WrittenRecord {
  key: string;
  publication: Publication;
  keywords: string[];
  abstract?: string;
  retracted: boolean;
  affiliation: string;
  /** Cited works, in the order of the reference list; a work may stand twice where the list is careless. */
  cited: Publication[];
}

/** What was done to cited references on the way into a file. */
export interface VariantCounts {
  [kind: string]: number;
}

/** How a source is named in a reference to a work. */
export function sourceOf(publication: Publication): { full: string; short: string; cited: string } {
  if (publication.venue) return { full: publication.venue.name, short: publication.venue.short, cited: publication.venue.cited };
  const full = publication.type === 'thesis' || publication.type === 'book' || publication.type === 'report' || publication.type === 'dataset' ? publication.title : (publication.container ?? publication.title);
  // Old databases cut the titles of books to some twenty characters.
  return { full, short: full, cited: full.replace(/[^A-Za-z0-9 ]+/g, ' ').replace(/\s+/g, ' ').toUpperCase().slice(0, 20).trim() };
}
