/** Departments of the invented faculty; 'faculty' owns the topics that bridge them. */
export const departments = ['freshwater', 'peat', 'coast'] as const;
export type Department = (typeof departments)[number];
export type Owner = Department | 'faculty';

/** A field of work: the words its titles are made of, how its output moves over the years, and whom it cites. */
export interface Topic {
  key: string;
  owner: Owner;
  /** Plural noun phrases: "mayfly larvae". */
  subjects: string[];
  /** Nouns that take "of {subject}": "drift". */
  processes: string[];
  /** What acts upon the subjects: "acid episodes". */
  drivers: string[];
  /** Where: "upland streams". */
  settings: string[];
  /** Noun phrases for methods: "kick sampling". */
  methods: string[];
  /** Share of the faculty's output, relative to other topics. */
  weight: number;
  /** Year in which the topic's share of the output is greatest. */
  peak: number;
  /** Years within which the share falls to about 0.6 of the peak. */
  width: number;
  /** Keys of the topics it draws on besides itself. */
  neighbours: string[];
}

type Words = Record<'subjects' | 'processes' | 'drivers' | 'settings' | 'methods', string>;

/** Word lists are written with "|" between phrases, which keeps them readable in one place. */
export function describeTopic(key: string, owner: Owner, [weight, peak, width]: [number, number, number], neighbours: string[], words: Words): Topic {
  const list = (text: string) => text.split('|').map((phrase) => phrase.trim());
  return {
    key,
    owner,
    weight,
    peak,
    width,
    neighbours,
    subjects: list(words.subjects),
    processes: list(words.processes),
    drivers: list(words.drivers),
    settings: list(words.settings),
    methods: list(words.methods),
  };
}
