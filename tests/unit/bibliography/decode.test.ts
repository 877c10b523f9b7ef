import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { createDecoder, createUtf8Validator, detectEncoding, looksBinary } from '@/lib/bibliography/decode';
import { detectFormat } from '@/lib/bibliography/detect';
import { decodeBytes } from '@/tests/unit/bibliography/corpus';

const utf8 = (text: string) => new TextEncoder().encode(text);
const utf16 = (text: string, big: boolean, mark: boolean) => {
  const units = [...(mark ? [0xfeff] : []), ...Array.from({ length: text.length }, (_, at) => text.charCodeAt(at))];
  return Uint8Array.from(units.flatMap((unit) => (big ? [unit >> 8, unit & 255] : [unit & 255, unit >> 8])));
};

describe('decoding', () => {
  it('reads UTF-8 with and without mark', () => {
    expect(decodeBytes(utf8('\ufeff@misc{ä}'))).toEqual({ text: '@misc{ä}', encoding: 'utf-8' });
    expect(decodeBytes(utf8('ä'))).toEqual({ text: 'ä', encoding: 'utf-8' });
  });

  it.each([[true, true], [true, false], [false, true], [false, false]])('reads UTF-16 (big-endian: %s, mark: %s)', (big, mark) => {
    expect(decodeBytes(utf16('TY  - JOUR\nAU  - Müller, Ж\n', big, mark)).text).toBe('TY  - JOUR\nAU  - Müller, Ж\n');
  });

  it('falls back to windows-1252, with its own quotes, dashes and euro sign', () => {
    const bytes = Uint8Array.from([...utf8('title {'), 0x93, 0xe9, 0x94, 0x20, 0x96, 0x20, 0x80, ...utf8('}')]);
    expect(decodeBytes(bytes)).toEqual({ text: 'title {“é” – €}', encoding: 'windows-1252' });
    expect(decodeBytes(Uint8Array.from([0xef, 0xbb, 0xbf, 0x61, 0xe9])).text).toBe('aé');
  });

  it('validates UTF-8 across chunks, also a character that is cut short at the end', () => {
    const validator = createUtf8Validator();
    expect(validator.push(Uint8Array.of(0xc3))).toBe(true);
    expect(validator.push(Uint8Array.of(0xa4))).toBe(true);
    expect(validator.end()).toBe(true);
    const cut = createUtf8Validator();
    expect(cut.push(Uint8Array.of(0x61, 0xc3))).toBe(true);
    expect(cut.end()).toBe(false);
    expect(createUtf8Validator().push(Uint8Array.of(0xc3, 0x28))).toBe(false);
  });

  it('makes one LF of CR, CRLF and LF however the bytes are cut', () => {
    fc.assert(fc.property(fc.array(fc.constantFrom('a', 'ä', '𝔘', '\r', '\n', '\r\n'), { maxLength: 40 }), fc.integer({ min: 1, max: 7 }), (pieces, size) => decodeBytes(utf8(pieces.join('')), size).text === pieces.join('').replace(/\r\n?/g, '\n')));
  });

  it('tells text from archives, documents and zero bytes', () => {
    expect(looksBinary(utf8('@article{a}'))).toBe(false);
    expect(looksBinary(utf16('TY  - JOUR', false, true))).toBe(false);
    expect(looksBinary(Uint8Array.from([0x50, 0x4b, 3, 4, 20, 0]))).toBe(true);
    expect(looksBinary(utf8('%PDF-1.7 and so on'))).toBe(true);
    expect(looksBinary(new Uint8Array(1_000))).toBe(true);
    expect(looksBinary(new Uint8Array(0))).toBe(false);
  });

  it('survives any bytes', () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 300 }), fc.integer({ min: 1, max: 9 }), (bytes, size) => {
      const { encoding } = detectEncoding(bytes);
      const decoder = createDecoder(encoding);
      let text = '';
      for (let at = 0; at < bytes.length; at += size) text += decoder.write(bytes.subarray(at, at + size));
      expect(/[\r\u0000]/.test(text + decoder.end())).toBe(false);
    }));
  });
});

describe('telling the format', () => {
  it.each([
    ['bibtex', '% a comment\n@article{a,\n  title = {X}\n}'],
    ['bibtex', '@string{x = "y"}\n@preamble{"z"}'],
    ['ris', 'Record 1 of 2\n\nTY  - JOUR\nAU  - A\nER  - \n'],
    ['ris', 'TY - BOOK\nTI - X\nER -'],
    ['tagged', 'FN Export\nVR 1.0\nPT J\nAU A, B\nTI x\nER\nEF'],
    ['tagged', 'PT\tAU\tTI\tSO\tCR\tPY\nJ\tA\tx\ty\tz\t2001'],
    ['nbib', 'PMID- 123\nTI  - X\nAB  - y\nFAU - A, B\n'],
    ['refer', '%0 Journal Article\n%A A, B\n%T X\n'],
    ['csl-json', '[{"id": "a", "type": "book", "title": "x"}]'],
    ['csl-json', '{"items": [{"title": "x"}]}'],
    ['registry-json', '{"status":"ok","message-type":"work","message":{"DOI":"10.1/x"}}'],
    ['registry-json', '{"DOI":"10.1000/x","title":["y"]}'],
  ])('%s: %#', (format, text) => expect(detectFormat(text)?.format).toBe(format));

  it('gives no answer rather than a wrong one', () => {
    for (const text of ['', 'Dear reader,\nthis is prose.', '<?xml version="1.0"?><a>@article{x,</a>', '<html>TY  - JOUR</html>', '{"name": "package", "version": "1.0"}', 'a,b,c\n1,2,3']) expect(detectFormat(text)).toBeNull();
  });

  it('says how sure it is', () => {
    expect(detectFormat('@article{a,\n title={X}}')?.certainty).toBe(1);
    const mixed = detectFormat('TY  - JOUR\nTI  - x\nER  - \n@article{a,\n');
    expect(mixed?.certainty).toBeLessThan(1);
    expect(mixed?.certainty).toBeGreaterThan(0);
  });

  it('survives any text', () => {
    fc.assert(fc.property(fc.string(), (text) => {
      const guess = detectFormat(text);
      expect(guess === null || (guess.certainty > 0 && guess.certainty <= 1)).toBe(true);
    }));
  });
});
