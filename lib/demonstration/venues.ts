import { type WorkType } from '@/lib/bibliography/record';
import { type Chance } from '@/lib/demonstration/chance';
import { type Owner } from '@/lib/demonstration/topics';

/** A journal of the invented world. */
export interface Venue {
  key: string;
  name: string;
  /** "J. Littoral Process." */
  short: string;
  /** As cited-reference lines have it: "J LITTORAL PROCESS". */
  cited: string;
  issn: string;
  publisher: string;
  place: string;
  /** Year of volume 1. */
  firstYear: number;
  issues: number;
  /** From this year on, articles carry numbers in place of pages. */
  numberedFrom: number;
  owner: Owner;
}

/** ISO 3297 check character over seven digits. */
export function completeIssn(seven: string): string {
  let sum = 0;
  for (let at = 0; at < 7; at += 1) sum += Number(seven[at]) * (8 - at);
  const check = (11 - (sum % 11)) % 11;
  return `${seven.slice(0, 4)}-${seven.slice(4)}${check === 10 ? 'X' : check}`;
}

const publishers: [string, string][] = [['Wendale Press', 'Tarnholm'], ['Oriel & Stane', 'Kettle Ness'], ['Society for Wet Land Studies', 'Oldmere'], ['Halden Academic', 'Skarne'], ['Union of Coast and Estuary Engineers', 'Thornsea']];

// Name | abbreviation | first year | issues a year | numbered from (or "-") | owner
const rows = `
Annals of Running Waters|Ann. Run. Waters|1951|4|-|freshwater
Inland Water Ecology|Inland Water Ecol.|1970|6|2015|freshwater
Benthos and Bed|Benthos Bed|1982|4|-|freshwater
River Habitat Review|River Habitat Rev.|1984|4|-|freshwater
Lake Physics and Plankton|Lake Phys. Plankton|1963|6|-|freshwater
Journal of Constructed Wetlands Practice|J. Constr. Wetl. Pract.|1985|4|2018|freshwater
Fish Movement|Fish Mov.|1979|4|-|freshwater
Bulletin of Diatom Studies|Bull. Diatom Stud.|1958|2|-|freshwater
Peat and Moor|Peat Moor|1949|4|-|peat
Journal of Organic Soils|J. Org. Soils|1968|6|2012|peat
Mire Hydrology Letters|Mire Hydrol. Lett.|1985|4|-|peat
Soil Breath|Soil Breath|1976|12|2014|peat
Bog Ecology|Bog Ecol.|1965|4|-|peat
Fungal Soil Communities|Fungal Soil Communities|1983|4|2016|peat
Quaternary Mires|Quat. Mires|1972|4|-|peat
Wet Farming Systems|Wet Farming Syst.|1998|4|2011|peat
Journal of Shore Processes|J. Shore Process.|1966|6|-|coast
Transactions on Coastal Structures|Trans. Coast. Struct.|1957|4|-|coast
Estuary and Saltmarsh|Estuary Saltmarsh|1973|8|-|coast
Dune and Beach Research|Dune Beach Res.|1981|4|-|coast
Sediment Mechanics|Sediment Mech.|1969|6|2017|coast
Tidal Basin Studies|Tidal Basin Stud.|1978|4|-|coast
Waves in Shallow Water|Waves Shallow Water|1974|6|2013|coast
Nature-based Coastal Design|Nat.-based Coast. Des.|2004|4|2009|coast
Water and Land|Water Land|1961|12|-|faculty
Proceedings of the Northern Environment Academy|Proc. North. Environ. Acad.|1921|24|-|faculty
Global Wetland Budgets|Glob. Wetl. Budg.|1992|6|2010|faculty
Flood Hazard and Society|Flood Hazard Soc.|1989|4|-|faculty
Journal of Environmental Sensing|J. Environ. Sens.|1980|12|2008|faculty
Environmental Inference|Environ. Inference|1955|6|-|faculty
Catchment Biogeochemistry|Catchment Biogeochem.|1986|6|-|faculty
Landscape Observations|Landsc. Obs.|1975|4|-|faculty`;

export const venues: Venue[] = rows.trim().split('\n').map((row, place) => {
  const [name, short, firstYear, issues, numberedFrom, owner] = row.split('|');
  const [publisher, city] = publishers[place % publishers.length];
  return {
    key: short.toLowerCase().replace(/[^a-z]+/g, ''),
    name,
    short,
    cited: short.replace(/[.]/g, '').replace(/-/g, ' ').toUpperCase(),
    issn: completeIssn(`9990${String(101 + place * 17)}`),
    publisher,
    place: city,
    firstYear: Number(firstYear),
    issues: Number(issues),
    numberedFrom: numberedFrom === '-' ? 9999 : Number(numberedFrom),
    owner: owner as Owner,
  };
});

/** Where a work stands within its venue. */
export interface Placement {
  volume: string;
  issue: string;
  month: number;
  firstPage?: string;
  lastPage?: string;
  articleNumber?: string;
}

/** Hands out pages: within a venue and year no two articles overlap, and issue and month follow from the page. */
export class PageLedger {
  private readonly nextPage = new Map<string, number>();

  place(venue: Venue, year: number, chance: Chance): Placement {
    const key = `${venue.key}|${year}`;
    const first = this.nextPage.get(key) ?? 1 + chance.below(60);
    const length = chance.between(5, 24);
    this.nextPage.set(key, first + length + chance.below(100));
    return placeAt(venue, year, first, length);
  }
}

/** Volume by year, issue and month by page: a volume of 720 pages is shared evenly among its issues. What others wrote stands between. */
export function placeAt(venue: Venue, year: number, first: number, length: number): Placement {
  const issue = Math.min(venue.issues, 1 + Math.floor((first * venue.issues) / 720));
  const placement = { volume: String(year - venue.firstYear + 1), issue: String(issue), month: Math.max(1, Math.round((issue * 12) / venue.issues)) };
  if (year >= venue.numberedFrom) return { ...placement, articleNumber: String(100_000 + first * 7).slice(1) };
  return { ...placement, firstPage: String(first), lastPage: String(first + length - 1) };
}

/** Mostly a venue of the owner's own field, at times a general one. Only venues that exist in the year. */
export function chooseVenue(owner: Owner, home: number, year: number, chance: Chance): Venue {
  const standing = venues.filter((venue) => venue.firstYear <= year);
  const own = standing.filter((venue) => venue.owner === owner);
  const general = standing.filter((venue) => venue.owner === 'faculty');
  const roll = chance.unit();
  if (own.length > 0 && roll < 0.45) return own[home % own.length];
  if (own.length > 0 && roll < 0.78) return chance.pick(own);
  return chance.pick(general.length > 0 ? general : standing);
}

/** What is no article: mostly older or grey literature. */
export const otherTypes: { type: WorkType; share: number }[] = [
  { type: 'thesis', share: 0.22 },
  { type: 'report', share: 0.3 },
  { type: 'chapter', share: 0.2 },
  { type: 'conference-paper', share: 0.18 },
  { type: 'dataset', share: 0.06 },
  { type: 'book', share: 0.04 },
];
