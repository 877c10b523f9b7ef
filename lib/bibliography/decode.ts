/** From bytes to text: the encoding is decided before reading, line ends become LF, so that line numbers are right whatever the file's origin. */

export const encodings = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
export type Encoding = (typeof encodings)[number];

/** The encoding as far as the first bytes tell it: a byte order mark, or the zero bytes of UTF-16 text. 'utf-8' is a guess to be validated. */
export function detectEncoding(head: Uint8Array): { encoding: Encoding; bom: boolean } {
  if (head[0] === 0xef && head[1] === 0xbb && head[2] === 0xbf) return { encoding: 'utf-8', bom: true };
  if (head[0] === 0xff && head[1] === 0xfe) return { encoding: 'utf-16le', bom: true };
  if (head[0] === 0xfe && head[1] === 0xff) return { encoding: 'utf-16be', bom: true };
  const length = Math.min(head.length & ~1, 4_096);
  let even = 0;
  let odd = 0;
  for (let at = 0; at < length; at += 2) {
    if (head[at] === 0) even += 1;
    if (head[at + 1] === 0) odd += 1;
  }
  // Mostly Latin text has its zero bytes on one side only.
  if (length >= 4 && odd > length / 5 && even < odd / 20) return { encoding: 'utf-16le', bom: false };
  if (length >= 4 && even > length / 5 && odd < even / 20) return { encoding: 'utf-16be', bom: false };
  return { encoding: 'utf-8', bom: false };
}

/** Zero bytes in text that is not UTF-16, or the signature of an archive, a document or a picture. */
export function looksBinary(head: Uint8Array): boolean {
  const signatures = [[0x50, 0x4b, 3, 4], [0x25, 0x50, 0x44, 0x46], [0x89, 0x50, 0x4e, 0x47], [0xff, 0xd8, 0xff], [0x1f, 0x8b], [0xd0, 0xcf, 0x11, 0xe0]];
  if (signatures.some((signature) => signature.every((byte, at) => head[at] === byte))) return true;
  if (detectEncoding(head).encoding.startsWith('utf-16')) return false;
  const length = Math.min(head.length, 8_192);
  let zeros = 0;
  for (let at = 0; at < length; at += 1) if (head[at] === 0) zeros += 1;
  return zeros > 8 || zeros > length / 100;
}

/** Tells, chunk by chunk, whether bytes are valid UTF-8. */
export function createUtf8Validator(): { push(chunk: Uint8Array): boolean; end(): boolean } {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  const attempt = (work: () => void) => {
    try {
      work();
      return true;
    } catch {
      return false;
    }
  };
  return { push: (chunk) => attempt(() => decoder.decode(chunk, { stream: true })), end: () => attempt(() => decoder.decode()) };
}

/** Turns chunks of bytes into text with LF line ends, without byte order mark; zero characters become spaces. */
export function createDecoder(encoding: string): { write(chunk: Uint8Array): string; end(): string } {
  const decoder = new TextDecoder(encoding);
  let pending = '';
  let begun = false;
  const settle = (text: string, last: boolean): string => {
    let whole = pending + text;
    pending = '';
    if (!begun && whole !== '') {
      begun = true;
      // A file with the mark of UTF-8 that is none keeps the mark's three bytes as letters.
      if (whole.startsWith('ï»¿')) whole = whole.slice(3);
    }
    // A CR at the end of a chunk may be half of a CRLF.
    if (!last && whole.endsWith('\r')) {
      pending = '\r';
      whole = whole.slice(0, -1);
    }
    if (whole.includes('\r')) whole = whole.replace(/\r\n?/g, '\n');
    return whole.includes('\u0000') ? whole.replaceAll('\u0000', ' ') : whole;
  };
  return { write: (chunk) => settle(decoder.decode(chunk, { stream: true }), false), end: () => settle(decoder.decode(), true) };
}
