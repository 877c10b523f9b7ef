import { describe, expect, it } from 'vitest';

import { body, formatName, formatNames, isOthers, parseInvertedName, parseListedName, parseName } from '@/lib/bibliography/names';

describe('names', () => {
  it.each([
    ['Ostrakova, Jana', { family: 'Ostrakova', given: 'Jana' }],
    ['Jana Ostrakova', { family: 'Ostrakova', given: 'Jana' }],
    ['van der Meer, Jan', { particle: 'van der', family: 'Meer', given: 'Jan' }],
    ['Jan van der Meer', { particle: 'van der', family: 'Meer', given: 'Jan' }],
    ['De Vries, Anna', { family: 'De Vries', given: 'Anna' }],
    ['Ford, Jr., Henry', { family: 'Ford', given: 'Henry', suffix: 'Jr.' }],
    ['Ford, Henry, Jr.', { family: 'Ford', given: 'Henry', suffix: 'Jr.' }],
    ['Henry Ford III', { family: 'Ford', given: 'Henry', suffix: 'III' }],
    ['Charles Louis Xavier Joseph de la Vallée Poussin', { particle: 'de la', family: 'Vallée Poussin', given: 'Charles Louis Xavier Joseph' }],
    ['J LEE', { family: 'LEE', given: 'J' }],
    ['LEE J', { family: 'LEE', given: 'J' }],
    ['Meer JA', { family: 'Meer', given: 'JA' }],
    ['Plato', { family: 'Plato' }],
    ['Sjöberg, A., B., C.', { family: 'Sjöberg', given: 'A., B., C.' }],
    [', Anna Ek', { family: 'Ek', given: 'Anna' }],
  ])('%s is taken apart', (text, name) => expect(parseName(text)).toEqual(name));

  it('of nothing are none', () => {
    for (const text of ['', ' ', ',', ' , , ', '.']) expect(parseName(text)).toBeUndefined();
  });

  it.each([
    ['MACARTHUR RH', { family: 'MACARTHUR', given: 'RH' }],
    ['LI X', { family: 'LI', given: 'X' }],
    ['WU YX', { family: 'WU', given: 'YX' }],
    ['SMITH J JR', { family: 'SMITH', given: 'J', suffix: 'JR' }],
    ['VAN DER MEER J', { family: 'VAN DER MEER', given: 'J' }],
    ['de Vries, J.', { particle: 'de', family: 'Vries', given: 'J.' }],
    ['VANMOURIK', { family: 'VANMOURIK' }],
  ])('%s is family first in lists', (text, name) => expect(parseListedName(text)).toEqual(name));

  it('get a particle back that stands behind the given name', () => expect(parseInvertedName('Meer, Jan van der')).toEqual({ particle: 'van der', family: 'Meer', given: 'Jan' }));

  it('tell "others" and "et al." from people', () => {
    for (const text of ['others', 'et al.', 'Et Al', 'and others']) expect(isOthers({ literal: text })).toBe(true);
    expect(isOthers({ family: 'Others', given: 'Ann' })).toBe(false);
  });

  it('are shown with particle, and lists cut with "et al."', () => {
    expect(formatName({ particle: 'van der', family: 'Meer', given: 'Jan' })).toBe('van der Meer');
    expect(formatName(body('World  Health Organization'))).toBe('World Health Organization');
    const names = [{ family: 'Ostrakova' }, { family: 'Lindqvist' }, { family: 'Ek' }];
    expect(formatNames(names, 3)).toBe('Ostrakova, Lindqvist, Ek');
    expect(formatNames(names, 2)).toBe('Ostrakova et al.');
    expect(formatNames([], 2)).toBe('');
  });
});
