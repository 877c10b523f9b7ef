import { readTableHead } from '@/lib/bibliography/readers/delimited-columns';
import { splitCells } from '@/lib/bibliography/readers/delimited-rows';
import { type Format } from '@/lib/bibliography/record';

interface Guess {
  format: Format;
  /** 0..1 */
  certainty: number;
}

/** Characters that are looked at. */
const looked = 200_000;
/** Names that only the DOI registry writes, or that hold a list there and a text in CSL-JSON. */
const registrySigns = [/"message-type"\s{0,9}:\s{0,9}"work/, /"(?:references-count|reference-count|is-referenced-by-count)"\s{0,9}:/, /"(?:container-title|title)"\s{0,9}:\s{0,9}\[/, /"reference"\s{0,9}:\s{0,9}\[\s{0,200}\{/];
const cslSigns = /"(?:container-title|issued|date-parts|citation-label|citation-key|title|author|DOI)"\s{0,9}:|"type"\s{0,9}:\s{0,9}"(?:article|book|chapter|paper|thesis|report|webpage|entry|post|review|speech|patent|song|motion|legal|bill|map|figure|graphic|inter|manuscript|pamphlet|personal|treaty|broadcast|dataset|legislation)/;

function detectJson(text: string): Guess | null {
  if (!/^[[{]/.test(text)) return null;
  if (registrySigns.some((sign) => sign.test(text))) return { format: 'registry-json', certainty: 0.95 };
  if (cslSigns.test(text)) return { format: 'csl-json', certainty: 0.9 };
  return /^\[\s{0,999}(?:\]|\{\s{0,999}"id"\s{0,9}:)/.test(text) ? { format: 'csl-json', certainty: 0.4 } : null;
}

/** Scores by lines that begin as each format's lines do. */
function scoreLines(text: string): Map<Format, number> {
  const count = (pattern: RegExp) => text.match(pattern)?.length ?? 0;
  const padded = Math.min(count(/^[A-Z][A-Z0-9 ]{3}- ?/gm), 200);
  const types = count(/^[ \t]{0,3}TY {0,3}- ?/gm);
  const pubmed = count(/^PM(?:ID|C )- ?\S/gm);
  const header = /^(?:[A-Z][A-Z0-9]\t){4,}/m.test(text) && /^(?:PT\t|.{0,2000}\tTI\t)/m.test(text);
  return new Map<Format, number>([
    ['ris', types * 5 + (types > 0 ? padded : pubmed > 0 ? 0 : padded / 4)],
    ['nbib', pubmed > 0 ? pubmed * 5 + padded : 0],
    ['tagged', count(/^PT [A-Z]/gm) * 5 + count(/^(?:FN|VR) /gm) * 3 + Math.min(count(/^(?:AU|TI|SO|CR|PY|UT|DI) \S/gm), 200) + (header ? 50 : 0)],
    ['refer', count(/^%0 \S/gm) * 5 + Math.min(count(/^%[ATJDBI] \S/gm), 200)],
    ['bibtex', count(/^[ \t]{0,99}@[ \t]{0,9}[A-Za-z]{1,60}\s{0,99}[{(]/gm) * 6 + (/@[A-Za-z]{1,60}\s{0,99}[{(]/.test(text) ? 1 : 0)],
  ]);
}

/** A first line that names the title, or the DOI, and two columns more; or one more, with a row below that has as many cells. */
function looksLikeTable(text: string): boolean {
  const lines = /^(?:\s{0,99}"?sep=.{1,2}\n)?\s{0,99}(\S[^\n]{0,20000})(?:\n([^\n]{1,20000}))?/i.exec(text);
  const head = lines && readTableHead(lines[1]);
  if (!head) return false;
  const known = head.columns.filter((kind) => kind !== null).length;
  return known >= 3 || (lines[2] !== undefined && head.heads.length > 2 && splitCells(lines[2], head.delimiter)?.length === head.heads.length);
}

/** The format by what the text holds; the name of a file is not asked. Null when nothing fits. Pass the first 64 KiB or more. */
export function detectFormat(head: string): Guess | null {
  const text = head.replace(/^\uFEFF/, '').slice(0, looked);
  const json = detectJson(text.trimStart());
  if (json) return json;
  // Markup may quote entries of any format in its text.
  if (/^\s{0,999}<(?:[?!]|[a-z])/i.test(text)) return null;
  if (looksLikeTable(text)) return { format: 'delimited', certainty: 0.9 };
  const scores = [...scoreLines(text)];
  const [format, score] = scores.reduce((best, one) => (one[1] > best[1] ? one : best));
  if (score < 1) return null;
  return { format, certainty: score / scores.reduce((sum, one) => sum + one[1], 0) };
}
