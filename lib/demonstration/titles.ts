import { type Chance } from '@/lib/demonstration/chance';
import { type Topic } from '@/lib/demonstration/topics';

/** Invented sites. */
export const places = 'Aldersyke|Brannock Moor|Oldmere|Quarrel Moss|Ebbwick Sands|the Tarn basin|the Lunden estuary|Skarne|Hollin Fen|Veitsa Bog|the Ister Beck|Kettle Ness|Marrow Bay|Sallow Carr|the river Wend|Great Scaur|Fennoy Island|Drummel Flow|Thornsea|the Ouzel Levels|Lake Hjelm|Cranmoor|the Selwick coast|Nether Holm'.split('|');

type Slot = 'S' | 's' | 'P' | 'p' | 'D' | 'd' | 'L' | 'M' | 'm' | 'X' | 'N';

/**
 * Patterns of titles. {S} subjects, {P} process, {D} driver, {L} setting, {M} method, {X} site, {N} a number of years in words;
 * a small letter takes a second, different phrase of the same kind.
 */
const patterns = [
  'The {P} of {S} in {L}',
  '{P} of {S} under {D}',
  'Effects of {D} on the {P} of {S}',
  '{D} and the {P} of {S} in {L}',
  '{S} in {L}: {P} along a gradient in {D}',
  'What controls the {P} of {S} in {L}?',
  '{N} years of change in {S} at {X}',
  'Measuring the {P} of {S} with {M}',
  'Evidence from {M} for {D} as a control on {S}',
  '{P} and {p} of {S} at {X}',
  'A model of {P} in {S} exposed to {D}',
  '{S} as indicators of {D} in {L}',
  'A comparison of {M} and {m} for {S} in {L}',
  'Recovery of {S} after {D}: evidence from {X}',
  'Spatial pattern in the {P} of {S} across {L}',
  'Scaling the {P} of {S} from plot to region',
  'How {S} respond to {D} in {L}',
  'Predicting the {P} of {S} from {D}',
  '{S} and {s} in {L}',
  'Limits to the {P} of {S} in {L}',
  'The role of {D} in the {P} of {S}',
  'Uncertainty in estimates of the {P} of {S}',
  'Interacting effects of {D} and {d} on {S}',
  'Year-to-year variability in the {P} of {S} at {X}',
  '{D}, {d} and the fate of {S} in {L}',
  'Using {M} to follow the {P} of {S}',
  'Thresholds in the response of {S} to {D}',
  '{P} of {S}: an experiment with {D}',
  'Seasonality of {P} in {S} at {X}',
  'Do {S} depend on {D}?',
  'Linking {P} to {p} in {S}',
  '{M} in {L}: what they tell about {S}',
  'Disentangling {D} from {d} in records of {S}',
  'Long-term {P} of {S} at {X} in relation to {D}',
  'Towards a general account of {P} in {S}',
  'Small-scale variation in {S} and its bearing on {P}',
  'Legacy of {D} in {S} of {L}',
  'A budget for {S} at {X}, with emphasis on {P}',
];

const subtitles = ['a field experiment', 'results from {X}', 'a comparison of {N} sites', 'insights from {M}', 'a case study at {X}', 'consequences for {P}', 'a synthesis', 'implications for management', 'lessons of {N} years', 'the importance of {D}'];
const numbers = ['three', 'five', 'six', 'eight', 'ten', 'twelve', 'fifteen', 'twenty', 'thirty'];

function another(list: readonly string[], taken: string, chance: Chance): string {
  const place = list.indexOf(taken);
  return list[(place + 1 + chance.below(list.length - 1)) % list.length];
}

function fillSlots(pattern: string, topic: Topic, chance: Chance): string {
  const chosen = new Map<Slot, string>();
  const lists: Partial<Record<Slot, readonly string[]>> = { S: topic.subjects, P: topic.processes, D: topic.drivers, L: topic.settings, M: topic.methods, X: places, N: numbers };
  return pattern.replace(/\{([A-Za-z])\}/g, (_, letter: string) => {
    const slot = letter as Slot;
    const first = chosen.get(slot.toUpperCase() as Slot);
    const list = lists[slot.toUpperCase() as Slot] as readonly string[];
    const phrase = first !== undefined ? another(list, first, chance) : chance.pick(list);
    chosen.set(slot, phrase);
    return phrase;
  });
}

export const capitalise = (text: string): string => text[0].toUpperCase() + text.slice(1);

/** One readable title of a topic, in sentence case. */
export function writeTitle(topic: Topic, chance: Chance): string {
  const main = fillSlots(chance.pick(patterns), topic, chance);
  if (main.includes(':') || main.endsWith('?') || !chance.happens(0.28)) return capitalise(main);
  // A subtitle that says again what the title says would read as a slip.
  const subtitle = fillSlots(chance.pick(subtitles), topic, chance);
  return capitalise(main.includes(subtitle.split(' ').slice(-2).join(' ')) ? main : `${main}: ${subtitle}`);
}

/** Draws titles until one is new; the normal form decides, so that no two titles differ in signs alone. */
export class TitleRegister {
  private readonly taken = new Set<string>();

  take(topic: Topic, chance: Chance): string {
    for (;;) {
      const title = writeTitle(topic, chance);
      if (this.claim(title)) return title;
    }
  }

  /** False when the title stands already. */
  claim(title: string): boolean {
    const key = title.toLowerCase().replace(/[^a-z0-9]+/g, ' ').trim();
    if (this.taken.has(key)) return false;
    this.taken.add(key);
    return true;
  }
}

/** Two or three sentences of the kind that stand in front of an article. */
export function writeAbstract(topic: Topic, chance: Chance): string {
  const opening = chance.pick([
    'The {P} of {S} is often estimated but seldom measured in {L}.',
    'Little is known of how {S} respond to {D}.',
    'We studied the {P} of {S} at {X} over {N} years.',
    'Managers of {L} need to know whether {D} alters the {P} of {S}.',
  ]);
  const middle = chance.pick([
    'We combined {M} with records of {D} from {N} sites.',
    'Observations with {M} were set against a simple model of {P}.',
    'Using {M}, we compared {L} with and without {D}.',
  ]);
  const end = chance.pick([
    'Differences between sites were larger than those between years, and {D} explained most of them.',
    'The {P} changed with {D}, whereas {d} had no effect that could be shown.',
    'The results suggest that {P} and {p} should be considered together.',
    'We discuss what this means for {S} where {D} is likely to increase.',
  ]);
  return [opening, middle, end].map((sentence) => capitalise(fillSlots(sentence, topic, chance))).join(' ');
}

/** Three to six terms, the first two from the subjects. */
export function chooseKeywords(topic: Topic, chance: Chance): string[] {
  const words = [...chance.shuffled(topic.subjects).slice(0, 2), ...chance.shuffled([...topic.processes, ...topic.drivers, ...topic.methods]).slice(0, chance.between(1, 4))];
  return [...new Set(words)];
}
