import { type Format } from '@/lib/bibliography/record';

interface Guess {
  format: Format;
  /** 0..1 */
  certainty: number;
}

function detectJson(text: string): Guess | null {
  if (!/^[[{]/.test(text)) return null;
  const registry = /"(?:message-type|reference-count|references-count|is-referenced-by-count|container-title)"\s*:\s*(?:"work|\d|\[)/.test(text) || /"reference"\s*:\s*\[/.test(text) || /"DOI"[\s\S]{0,5000}"title"\s*:\s*\[/.test(text);
  if (registry) return { format: 'registry-json', certainty: 0.95 };
  const csl = /"(?:container-title|issued|date-parts|citation-label|DOI|type|id|title)"\s*:/.test(text);
  return csl || /^\[\s*\]/.test(text) ? { format: 'csl-json', certainty: csl ? 0.9 : 0.4 } : null;
}

/** The format by what the text holds; the name of a file is not asked. Null when nothing fits. */
export function detectFormat(head: string): Guess | null {
  const text = head.replace(/^\uFEFF/, '').slice(0, 200_000);
  const start = text.trimStart();
  const json = detectJson(start);
  if (json) return json;
  const scores = new Map<Format, number>();
  const matches = (pattern: RegExp) => (text.match(pattern) ?? []).length;
  scores.set('ris', matches(/^[ \t]*TY {0,2}- ?/gm) * 5 + Math.min(matches(/^[A-Z][A-Z0-9] {2}- /gm), 200));
  scores.set('tagged', matches(/^PT [A-Z]/gm) * 5 + matches(/^(?:FN|VR) /gm) * 3 + Math.min(matches(/^(?:AU|TI|SO|CR|PY|UT|DI) \S/gm), 200) + (/^(?:\S{2}\t){5,}/.test(start) && /^PT\t|\tTI\t/.test(start) ? 50 : 0));
  scores.set('bibtex', matches(/^[ \t]*@[ \t]*[A-Za-z]+[ \t]*[{(]/gm) * 6 + (matches(/@[A-Za-z]+\s*[{(]/g) > 0 ? 1 : 0));
  const [best] = [...scores].sort((a, b) => b[1] - a[1]);
  if (best[1] < 1) return null;
  const total = [...scores.values()].reduce((sum, score) => sum + score, 0);
  return { format: best[0], certainty: best[1] / total };
}
