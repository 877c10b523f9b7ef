import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

import { contrastOf, leastDistance, readScheme } from './colours';

const css = readFileSync(new URL('../../../app/globals.css', import.meta.url), 'utf8');
const schemes = { light: readScheme(css, ':root'), dark: readScheme(css, '[data-scheme="dark"]') };

/** Every text on every ground that it stands on, in pages and controls. */
const texts: [text: string, grounds: string[]][] = [
  ['ink', ['linen', 'paper', 'weld-wash', 'madder-wash', 'verdigris-wash']],
  ['ink-soft', ['linen', 'paper', 'weld-wash']],
  ['indigo', ['linen', 'paper', 'weld-wash']],
  ['indigo-strong', ['linen', 'paper']],
  ['on-indigo', ['indigo', 'indigo-strong']],
  ['madder', ['linen', 'paper', 'madder-wash', 'weld-wash']],
  ['weld-ink', ['linen', 'paper', 'weld-wash']],
  ['verdigris', ['linen', 'paper', 'verdigris-wash']],
  ['paper', ['ink']],
];

/** Signs that must be seen: control borders, the focus ring, rules that carry a meaning, bars. */
const signs: [sign: string, grounds: string[]][] = [
  ['thread-strong', ['linen', 'paper', 'weld-wash']],
  ['indigo', ['linen', 'paper', 'weld-wash']],
  ['madder', ['linen', 'paper']],
  ['weld', ['linen', 'paper']],
  ['bar', ['linen', 'paper']],
];

describe.each(Object.entries(schemes))('the %s scheme', (_, scheme) => {
  it.each(texts.flatMap(([text, grounds]) => grounds.map((ground) => [text, ground] as const)))('reads %s on %s with a contrast of at least 4.5', (text, ground) => {
    expect(contrastOf(scheme[text], scheme[ground])).toBeGreaterThanOrEqual(4.5);
  });

  it.each(signs.flatMap(([sign, grounds]) => grounds.map((ground) => [sign, ground] as const)))('shows %s on %s with a contrast of at least 3', (sign, ground) => {
    expect(contrastOf(scheme[sign], scheme[ground])).toBeGreaterThanOrEqual(3);
  });

  it('keeps the ten dyes apart under normal, protan, deutan and tritan vision', () => {
    const dyes = Array.from({ length: 10 }, (_unused, index) => scheme[`dye-${index + 1}`]);
    expect(leastDistance(dyes)).toBeGreaterThanOrEqual(10);
  });
});

it('gives every colour a value in both schemes', () => {
  expect(Object.keys(schemes.dark).sort()).toEqual(Object.keys(schemes.light).sort());
});

it('shows every dye on the dark map ground with a contrast of at least 3', () => {
  for (let index = 1; index <= 10; index += 1) expect(contrastOf(schemes.dark[`dye-${index}`], schemes.dark.paper)).toBeGreaterThanOrEqual(3);
});
