import { formatDecimal, formatNumber, formatShare } from '@/components/ui/numbers';
import { type PortfolioDetail } from '@/lib/api/types';

type Coverage = PortfolioDetail['coverage'];
export const coverageFigures = ['works', 'with-references', 'references', 'linked', 'cited-only'] as const;
export type CoverageFigure = (typeof coverageFigures)[number];

export interface FigureEvidence {
  label: string;
  value: string;
  /** Beside the figure on the page. */
  beside: string | null;
  definition: string;
  counted: { label: string; value: string }[];
  caution: string | null;
  /** List of the works behind it: query of the works page. */
  worksQuery: string | null;
  worksLabel: string | null;
}

const share = (part: number, whole: number) => (whole === 0 ? null : part / whole);

/** What each figure of coverage says and how it is counted. Shares without a base have no value. */
export function explainFigure(figure: CoverageFigure, coverage: Coverage): FigureEvidence {
  const { cataloguedWorks, worksWithReferences, references, linkedReferences, citedOnlyWorks } = coverage;
  switch (figure) {
    case 'works':
      return {
        label: 'catalogued works',
        value: formatNumber(cataloguedWorks),
        beside: null,
        definition: 'Works of this portfolio on which at least one record of an accepted import stands. Several records of one work count once; works taken out by hand do not count.',
        counted: [{ label: 'Catalogued works', value: formatNumber(cataloguedWorks) }],
        caution: null,
        worksQuery: '',
        worksLabel: 'Show the works',
      };
    case 'with-references':
      return {
        label: 'carry references',
        value: formatShare(share(worksWithReferences, cataloguedWorks)),
        beside: `${formatNumber(worksWithReferences)} of ${formatNumber(cataloguedWorks)} works`,
        definition: 'Catalogued works whose records hold a reference list, over all catalogued works.',
        counted: [
          { label: 'With a reference list', value: formatNumber(worksWithReferences) },
          { label: 'Without one', value: formatNumber(cataloguedWorks - worksWithReferences) },
        ],
        caution: 'Works without a reference list cite nobody here, whatever they cite in print.',
        worksQuery: '?sort=references',
        worksLabel: 'Show works, fewest references first',
      };
    case 'references':
      return {
        label: 'references',
        value: formatNumber(references),
        beside: worksWithReferences > 0 ? `${formatDecimal(references / worksWithReferences, 1)} a list` : null,
        definition: 'Entries of the reference lists by which the catalogued works cite. Of several records of one work, the one with the fullest list counts.',
        counted: [
          { label: 'References', value: formatNumber(references) },
          { label: 'Reference lists', value: formatNumber(worksWithReferences) },
        ],
        caution: null,
        worksQuery: '?sort=-references',
        worksLabel: 'Show works, most references first',
      };
    case 'linked':
      return {
        label: 'of references linked',
        value: formatShare(share(linkedReferences, references)),
        beside: `${formatNumber(linkedReferences)} of ${formatNumber(references)}`,
        definition: 'References that lead to a catalogued work, of this portfolio or of another, over all references. The others lead to works that are known from references alone.',
        counted: [
          { label: 'Linked to catalogued works', value: formatNumber(linkedReferences) },
          { label: 'To cited-only works', value: formatNumber(references - linkedReferences) },
        ],
        caution: 'A low share is usual where a portfolio holds one unit’s works: most of what they cite was written elsewhere.',
        worksQuery: '?sort=-citationsHere',
        worksLabel: 'Show works, most cited here first',
      };
    case 'cited-only':
      return {
        label: 'cited-only works',
        value: formatNumber(citedOnlyWorks),
        beside: null,
        definition: 'Distinct works known only because works of this portfolio cite them. Variants of one reference are drawn together before they are counted.',
        counted: [{ label: 'Cited-only works', value: formatNumber(citedOnlyWorks) }],
        caution: 'References too thin to be told apart stay separate works, so this number is rather too high than too low.',
        worksQuery: '?catalogued=false&sort=-citationsHere',
        worksLabel: 'Show them, most cited first',
      };
  }
}
