import { type PersonName } from '@/lib/bibliography/record';

const suffix = /^(?:jr|sr|ii|iii|iv|2nd|3rd|junior|senior|filho|neto|md|phd|esq)\.?$/i;
/** Without a comma "MD" are initials rather than a title. */
const trailingSuffix = /^(?:jr|sr|ii|iii|iv|2nd|3rd|junior|senior|filho|neto|phd|esq)\.?$/i;
const particle = /^(?:van|von|vom|der|den|de|del|della|dello|di|da|do|dos|das|du|des|la|le|les|los|las|lo|ten|ter|te|zu|zum|zur|af|av|auf|el|al|bin|ibn|ben|'t|y|d'|dal|dalla|degli|dei|mac)$/;
const initials = /^(?:\p{Lu}\.?-?){1,4}$/u;
const others = /^(?:and\s)?(?:others|et\.?\s*al\.?(?:ii)?)$/i;

const tidy = (text: string) => text.replace(/\s+/g, ' ').trim();

/** "others" and "et al." stand in lists of names and are none. */
export function isOthers(name: PersonName): boolean {
  return !name.given && others.test(name.literal ?? name.family ?? '');
}

/** Moves leading lower-case particles ("van der Meer") out of a family name. */
function splitParticle(family: string): { particle?: string; family: string } {
  if (!family.includes(' ')) return { family };
  const words = family.split(' ');
  let taken = 0;
  while (taken < words.length - 1 && particle.test(words[taken])) taken += 1;
  return taken === 0 ? { family } : { particle: words.slice(0, taken).join(' '), family: words.slice(taken).join(' ') };
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
 * A name as reference formats write it: "Family, Given", "Family, Suffix, Given", "Family, Given, Suffix", "Given von Family", "Family II".
 * A body is for the caller to tell (see `body`). Undefined for an empty text. Particles are found by a list of the common ones, in lower case.
 */
export function parseName(text: string): PersonName | undefined {
  const whole = tidy(text);
  if (!/[\p{L}\p{N}]/u.test(whole)) return undefined;
  if (!whole.includes(',')) return parseUninverted(whole);
  const parts = whole.split(',').map(tidy).filter((part, index) => part !== '' || index === 0);
  if (parts[0] === '') return parseUninverted(tidy(parts.slice(1).join(' ')));
  if (parts.length === 1) return parseUninverted(parts[0]);
  if (parts.length === 2) return suffix.test(parts[1]) ? withSuffix(parts[0], parts[1]) : person({ family: parts[0], given: parts[1] });
  if (suffix.test(parts[1])) return person({ family: parts[0], suffix: parts[1], given: parts.slice(2).join(', ') });
  if (suffix.test(parts[2])) return person({ family: parts[0], given: parts[1], suffix: parts[2] });
  return person({ family: parts[0], given: parts.slice(1).join(', ') });
}

function withSuffix(rest: string, end: string): PersonName {
  const name = parseUninverted(rest);
  return name.family ? { ...name, suffix: end } : name;
}

/** A last word of capitals alone are initials behind the family name ("Meer JA", "LEE J") unless the first word looks more like initials ("J LEE"). */
function endsInInitials(words: string[]): boolean {
  const last = words[words.length - 1];
  if (words.length < 2 || !initials.test(last)) return false;
  return !initials.test(words[0]) || last.replace(/[.-]/g, '').length < words[0].replace(/[.-]/g, '').length;
}

/** "Given Middle von Family Jr.": the particle is the first lower-case one between given name and family name. */
function parseUninverted(text: string): PersonName {
  const words = text.split(' ');
  if (words.length === 1) return { family: words[0] };
  let end: string | undefined;
  if (words.length > 2 && trailingSuffix.test(words[words.length - 1])) end = words.pop();
  if (endsInInitials(words)) return person({ family: words.slice(0, -1).join(' '), given: words[words.length - 1], suffix: end });
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

/** Names of tagged exports and of cited references: family first, initials behind it, with or without a comma ("MACARTHUR RH", "de Vries, J.", "SMITH J JR"). */
export function parseListedName(text: string): PersonName | undefined {
  const whole = tidy(text);
  if (whole === '' || whole.includes(',')) return parseInvertedName(whole);
  const words = whole.split(' ');
  let end: string | undefined;
  if (words.length > 2 && trailingSuffix.test(words[words.length - 1]) && initials.test(words[words.length - 2])) end = words.pop();
  if (words.length > 1 && initials.test(words[words.length - 1])) return person({ family: words.slice(0, -1).join(' '), given: words[words.length - 1], suffix: end });
  return parseInvertedName(whole);
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
