import { type Format } from '@/lib/bibliography/record';
import { type Publication, type VariantCounts } from '@/lib/demonstration/publication';

export interface FileStatistics {
  name: string;
  format: Format;
  /** All entries that the file opens, broken ones among them. */
  entries: number;
  /** Of which nothing can be read. */
  rejected: number;
  /** References that stand in readable entries. */
  references: number;
  characters: number;
}

/** What was generated, for comparing with what a reader or a network makes of it. */
export interface DemonstrationStatistics {
  /** True works of the faculty. */
  works: number;
  worksWithoutDoi: number;
  retracted: number;
  /** Works that are only cited. */
  outsideWorks: number;
  /** True citations, each pair once: of works of the faculty, and of works outside. */
  citations: { inside: number; outside: number };
  /** The ten highest numbers of citations from within the faculty. */
  mostCited: number[];
  entries: number;
  references: number;
  /** Further records of works; the doubtful ones are for a person to settle. */
  duplicates: { total: number; doubtful: number; differences: Record<string, number> };
  broken: { total: number; rejected: number; kinds: Record<string, number> };
  /**
   * Cited works as they were written: `cited` distinct works, `texts` distinct texts, `written` distinct pairs of citing and cited work
   * that stand in some file, `writtenInside` those among works of the faculty.
   */
  variants: { cited: number; texts: number; written: number; writtenInside: number; kinds: VariantCounts };
  files: FileStatistics[];
}

export function emptyStatistics(): DemonstrationStatistics {
  return {
    works: 0,
    worksWithoutDoi: 0,
    retracted: 0,
    outsideWorks: 0,
    citations: { inside: 0, outside: 0 },
    mostCited: [],
    entries: 0,
    references: 0,
    duplicates: { total: 0, doubtful: 0, differences: {} },
    broken: { total: 0, rejected: 0, kinds: {} },
    variants: { cited: 0, texts: 0, written: 0, writtenInside: 0, kinds: {} },
    files: [],
  };
}

/** Keeps account of the texts under which each work is cited. */
export class VariantLedger {
  private readonly texts = new Map<Publication, Set<string>>();
  private readonly pairs = new Map<number, Set<Publication>>();
  private readonly inside = new Set<Publication>();

  note(citing: number, cited: Publication, citedNumber: number | undefined, text: string): void {
    const texts = this.texts.get(cited);
    if (texts) texts.add(text);
    else this.texts.set(cited, new Set([text]));
    const pairs = this.pairs.get(citing);
    if (pairs) pairs.add(cited);
    else this.pairs.set(citing, new Set([cited]));
    if (citedNumber !== undefined) this.inside.add(cited);
  }

  summarise(): { cited: number; texts: number; written: number; writtenInside: number } {
    let texts = 0;
    for (const set of this.texts.values()) texts += set.size;
    let written = 0;
    let writtenInside = 0;
    for (const set of this.pairs.values()) {
      written += set.size;
      for (const cited of set) if (this.inside.has(cited)) writtenInside += 1;
    }
    return { cited: this.texts.size, texts, written, writtenInside };
  }
}
