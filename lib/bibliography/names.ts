import { type PersonName } from '@/lib/bibliography/record';

const suffix = /^(?:jr|sr|ii|iii|iv|junior|senior|filho|neto|md|phd)\.?$/i;
const particle = /^(?:van|von|der|den|de|del|della|di|da|do|dos|das|du|des|la|le|les|los|las|ten|ter|te|zu|zum|zur|af|av|el|al|bin|ibn|'t|y|e)$/;

const tidy = (text: string) => text.replace(/\s+/g, ' ').trim();

/** Moves leading lower-case particles ("van der Meer") out of a family name. */
function splitParticle(family: string): { particle?: string; family: string } {
  const words = family.split(' ');
  let count = 0;
  while (count < words.length - 1 && particle.test(words[count])) count += 1;
  return count === 0 ? { family } : { particle: words.slice(0, count).join(' '), family: words.slice(count).join(' ') };
}

function person(fields: { family: string; given?: string; suffix?: string; particle?: string }): PersonName {
  const split = fields.particle ? { particle: fields.particle, family: fields.family } : splitParticle(fields.family);
  const name: PersonName = { family: split.family };
  if (split.particle) name.particle = split.particle;
  if (fields.given) name.given = fields.given;
  if (fields.suffix) name.suffix = fields.suffix;
  return name;
}

/**
 * A name as reference formats write it: "Family, Given", "Family, Suffix, Given", "Family, Given, Suffix", "Given von Family", or a body.
 * Undefined for an empty text.
 */
export function parseName(text: string): PersonName | undefined {
  const whole = tidy(text);
  if (whole === '') return undefined;
  const parts = whole.split(',').map(tidy).filter((part, index) => part !== '' || index === 0);
  if (parts.length >= 2 && parts[0] !== '') {
    if (parts.length >= 3) {
      if (suffix.test(parts[1])) return person({ family: parts[0], suffix: parts[1], given: parts.slice(2).join(', ') });
      if (suffix.test(parts[2])) return person({ family: parts[0], given: parts[1], suffix: parts[2] });
      return person({ family: parts[0], given: parts.slice(1).join(', ') });
    }
    return suffix.test(parts[1]) ? withSuffix(parts[0], parts[1]) : person({ family: parts[0], given: parts[1] });
  }
  return parseUninverted(parts[0] === '' ? tidy(parts.slice(1).join(' ')) : parts[0]);
}

function withSuffix(rest: string, end: string): PersonName {
  const name = parseUninverted(rest);
  if (name.family) name.suffix = end;
  return name;
}

/** "Given Middle von Family Jr.": the particle is the first lower-case word between given name and family name. */
function parseUninverted(text: string): PersonName {
  const words = text.split(' ');
  if (words.length === 1) return { family: words[0] };
  let end: string | undefined;
  if (words.length > 2 && suffix.test(words[words.length - 1])) end = words.pop();
  // "Meer J" or "Meer JA": a last word of capitals alone are initials behind the family name.
  const last = words[words.length - 1];
  if (/^(?:\p{Lu}\.?-?){1,4}$/u.test(last) && !/^(?:\p{Lu}\.?-?){1,4}$/u.test(words[0])) return person({ family: words.slice(0, -1).join(' '), given: last, suffix: end });
  const first = words.findIndex((word, index) => index > 0 && index < words.length - 1 && particle.test(word));
  if (first > 0) {
    let stop = first;
    while (stop < words.length - 1 && particle.test(words[stop])) stop += 1;
    return person({ family: words.slice(stop).join(' '), particle: words.slice(first, stop).join(' '), given: words.slice(0, first).join(' '), suffix: end });
  }
  if (particle.test(words[0])) return person({ family: words.join(' '), suffix: end });
  return person({ family: words[words.length - 1], given: words.slice(0, -1).join(' '), suffix: end });
}

/** "Meer, J. van der": a particle behind the given name goes to its place. */
export function parseInvertedName(text: string): PersonName | undefined {
  const name = parseName(text);
  if (!name?.given || name.particle) return name;
  const words = name.given.split(' ');
  let at = words.length;
  while (at > 1 && particle.test(words[at - 1])) at -= 1;
  if (at === words.length) return name;
  return { ...name, given: words.slice(0, at).join(' '), particle: words.slice(at).join(' ') };
}

/** A corporate author. */
export function body(text: string): PersonName {
  return { literal: tidy(text) };
}

/** Family name with its particle, or the body's name: what lists show. */
export function formatName(name: PersonName): string {
  if (name.literal && !name.family) return name.literal;
  return [name.particle, name.family].filter(Boolean).join(' ');
}

/** "Ostrakova", "Ostrakova, Lindqvist", "Ostrakova et al." beyond `limit`. */
export function formatNames(names: readonly PersonName[], limit: number): string {
  if (names.length > limit) return `${formatName(names[0])} et al.`;
  return names.map(formatName).join(', ');
}
