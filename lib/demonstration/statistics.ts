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

/** Keeps account of what was cited, and under how many texts. */
export class VariantLedger {
  private readonly texts = new Set<string>();
  private readonly cited = new Set<number>();
  private readonly pairs = new Set<number>();

  /**
   * @param numbers of all publications, those of the faculty first
   * @param insideCount how many of them are the faculty's
   */
  constructor(private readonly numbers: ReadonlyMap<Publication, number>, private readonly insideCount: number) {}

  note(citing: number, publication: Publication, text: string): void {
    const cited = this.numbers.get(publication);
    if (cited === undefined) throw new Error(`"${publication.title}" is cited but was never made.`);
    this.texts.add(text);
    this.cited.add(cited);
    this.pairs.add(citing * this.numbers.size + cited);
  }

  summarise(): { cited: number; texts: number; written: number; writtenInside: number } {
    let writtenInside = 0;
    for (const pair of this.pairs) if (pair % this.numbers.size < this.insideCount) writtenInside += 1;
    return { cited: this.cited.size, texts: this.texts.size, written: this.pairs.size, writtenInside };
  }
}
