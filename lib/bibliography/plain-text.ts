/** What every reader does to text in the end: one blank between words, none around, canonical composition (NFC). */

/** Blanks that are not a single space: only then is a rewrite worth its time. */
const untidyBlanks = /[^\S ]| {2}/;
/** Below U+0300 every character is its own NFC form. */
const beyondLatin = /[^\u0000-\u02ff]/;

export function tidyBlanks(text: string): string {
  return (untidyBlanks.test(text) ? text.replace(/\s+/g, ' ') : text).trim();
}

export function tidyText(text: string): string {
  const tidy = tidyBlanks(text);
  return beyondLatin.test(tidy) ? tidy.normalize('NFC') : tidy;
}

const entities = new Map([['amp', '&'], ['lt', '<'], ['gt', '>'], ['quot', '"'], ['apos', "'"], ['nbsp', ' ']]);

/** Text in which exporters leave pieces of HTML or JATS: known tags go, entities become characters. Unknown tags stay, for "<" is a sign of its own. */
export function withoutTags(text: string): string {
  if (!/[<&]/.test(text)) return text;
  return text
    .replace(/<\/?(?:i|b|u|em|strong|sub|sup|sc|scp|span|p|br|title|italic|bold|jats:[a-z]{1,20}|mml:[a-z]{1,20})(?:\s[^<>]{0,200})?\/?>/gi, '')
    .replace(/&(?:#(\d{1,7})|#x([0-9a-f]{1,6})|([a-z]{2,5}));/gi, (whole, decimal: string | undefined, hexadecimal: string | undefined, name: string | undefined) => {
      if (name !== undefined) return entities.get(name.toLowerCase()) ?? whole;
      const code = decimal !== undefined ? Number(decimal) : parseInt(hexadecimal as string, 16);
      return code >= 32 && code <= 0x10ffff && !(code >= 0xd800 && code <= 0xdfff) ? String.fromCodePoint(code) : whole;
    });
}
