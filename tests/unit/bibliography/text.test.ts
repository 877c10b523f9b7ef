import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { texToUnicode, texVerbatim } from '@/lib/bibliography/latex';
import { findYear, firstPage, normaliseFamily, normaliseText } from '@/lib/bibliography/normalise';
import { tidyText, withoutTags } from '@/lib/bibliography/plain-text';

describe('TeX text', () => {
  it.each([
    ['M{\\"u}ller', 'Müller'], ['M\\"{u}ller', 'Müller'], ['M\\"uller', 'Müller'], ['Garc{\\\'\\i}a', 'García'], ["Garc\\'{\\i}a", 'García'], ['Erd{\\H o}s', 'Erdős'], ['\\v{S}koda', 'Škoda'], ['{\\v S}koda', 'Škoda'], ['Fran\\c{c}ois', 'François'], ['\\c cedilla', 'çedilla'],
    ['S{\\o}rensen', 'Sørensen'], ['\\O stergaard', 'Østergaard'], ['Stra{\\ss}e', 'Straße'], ['\\AA ngstr\\"om', 'Ångström'], ["Nguy\\~{\\^e}n", 'Nguyễn'], ["\\'{\\^o}", 'ố'], ['na\\"{\\i}ve', 'naïve'], ["A\\a'o", 'Aó'], ['\\.Istanbul', 'İstanbul'], ['\\k{a}', 'ą'], ['\\t{oo}', 'o͡o'],
  ])('%s becomes %s', (tex, text) => expect(texToUnicode(tex)).toBe(text));

  it.each([
    ['The {DNA} of {$\\alpha$}-helices', 'The DNA of α-helices'], ['H$_2$O and $x^{2}$', 'H2O and x2'], ['pages 1--10 --- or so', 'pages 1–10 — or so'], ['``quoted\'\' words', '“quoted” words'], ['R\\&D at 5\\% \\#1 a\\_b', 'R&D at 5% #1 a_b'], ['one~two\\ three', 'one two three'],
    ['{\\noopsort{1973a}}1981', '1981'], ['\\emph{in} \\textit{vivo}', 'in vivo'], ['\\href{http://x.y}{Title}', 'Title'], ['\\LaTeX{} and \\TeX', 'LaTeX and TeX'], ['costs $5', 'costs $5'], ['{\\relax unknown}', 'unknown'], ['two\n  lines', 'two lines'], ['a^b', 'a^b'],
  ])('%s becomes %s', (tex, text) => expect(texToUnicode(tex)).toBe(text));

  it('keeps addresses and DOIs verbatim but for escapes', () => {
    expect(texVerbatim('10.1000/a\\_b--c~d')).toBe('10.1000/a_b--c~d');
    expect(texVerbatim('\\url{http://x.y/~z\\%20}')).toBe('http://x.y/~z%20');
  });

  it('leaves text without markup as it is, but for blanks and composition', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme' }).map((text) => text.replace(/[\\{}$~`'-]/g, '')), (text) => texToUnicode(text) === text.replace(/\s+/g, ' ').trim().normalize('NFC')));
  });

  it('never throws and never leaves a brace of balanced markup', () => {
    fc.assert(fc.property(fc.array(fc.constantFrom('{', '}', '\\', "\\'", '\\v', '\\i', 'a', ' ', '$', '--', '\\noopsort', '\\href'), { maxLength: 60 }), (parts) => !/(?<!\\)[{}]/.test(texToUnicode(parts.join('')).replace(/[^{}]/g, '')) || parts.includes('\\')));
  });
});

describe('text from the web', () => {
  it('loses known tags and keeps other angle brackets', () => {
    expect(withoutTags('<i>In vivo</i> CO<sub>2</sub> &amp; p &lt; 0.05')).toBe('In vivo CO2 & p < 0.05');
    expect(withoutTags('a < b > c')).toBe('a < b > c');
    expect(withoutTags('caf&#233; &#xe9; &unknown;')).toBe('café é &unknown;');
  });

  it('is composed and has single blanks', () => expect(tidyText('  Mu\u0308ller\u00a0 and\tco ')).toBe('Müller and co'));
});

describe('normal forms', () => {
  it.each([
    ['The Gödel–Escher "Link" & Bach', 'the godel escher link and bach'], ['ﬁnding Straße', 'finding strasse'], ['Sørensen Łódź Ærø', 'sorensen lodz aero'], ['量子力学 の', '量子力学 の'], ['{\\"U}ber {DNA}s', 'uber dnas'], ['Ὀδυσσεύς', 'οδυσσευσ'], ['  ', ''], ['C++ & C#', 'c and c'],
  ])('of a title: %s -> %s', (text, normal) => expect(normaliseText(text)).toBe(normal));

  it('is the same again when normalised again', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme' }), (text) => normaliseText(normaliseText(text)) === normaliseText(text)));
  });

  it('does not depend on composition', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme' }), (text) => normaliseText(text.normalize('NFD')) === normaliseText(text.normalize('NFC'))));
  });

  it.each([['van der Meer', 'vandermeer'], ["O'Neill", 'oneill'], ['Muñoz-López', 'munozlopez'], ['MÜLLER', 'muller']])('of a family name: %s -> %s', (name, normal) => expect(normaliseFamily(name)).toBe(normal));

  it('of a year is the first one between 1500 and 2100', () => {
    expect(findYear('c. 2001/2003')).toBe(2001);
    expect(findYear('10234 pages, 1999a')).toBe(1999);
    expect(findYear('1234, 45')).toBeUndefined();
  });

  it('of a first page keeps its letter and drops leading zeros', () => {
    expect(firstPage('pp. 0283A-290')).toBe('283a');
    expect(firstPage('E123')).toBe('e123');
    expect(firstPage('none')).toBeUndefined();
  });
});
