import { type PersonName } from '@/lib/bibliography/record';
import { type Chance } from '@/lib/demonstration/chance';

const givenNames = 'Ada|Aino|Amara|Anders|Anneli|Arvid|Ayşe|Beatriz|Bram|Caoimhe|Carlos|Chidi|Chloé|Daan|Darya|Dilip|Eira|Elif|Elin|Emeka|Émile|Esra|Farida|Fen|Gareth|Giulia|Gökhan|Hanna|Haruto|Helga|Hilde|Ines|Ingrid|Ioana|Ivan|Jana|Jean-Luc|Jiří|Joana|Jorge|Kaisa|Karel|Katarzyna|Kenji|Kofi|Lars|Leila|Liesbeth|Lin|Lucía|Magnus|Małgorzata|Marek|Marie-Ève|Marta|Mateus|Mei|Miriam|Nadia|Naomi|Nils|Noor|Olga|Olu|Oskar|Paolo|Pavel|Petra|Pilar|Pradeep|Rafael|Rasmus|Rhian|Rosa|Ruth|Samir|Sanna|Seán|Sigrid|Sofía|Søren|Sunita|Tadeusz|Tamsin|Tariq|Tereza|Tomás|Ulrike|Vera|Viktor|Wanjiru|Wei|Yara|Yusuf|Zanele|Zoë'.split('|');
const familyNames = 'Abara|Achterberg|Adeyemo|Aldersey|Almeida|Andrzejczak|Arkwright|Aubertin|Bakalov|Banerji|Barrowclough|Bąkowski|Bellweather|Bergqvist|Bhandari|Björnsdal|Blackthorne|Bogaert|Brandvold|Brânză|Brennand|Carrasquilla|Castellani|Černohorský|Chakrabarty|Chen-Whitlow|Chukwuma|Clachan|Corvalán|Dahlström|Dąbek|Delacourt|Demirkan|Dewhirst|Dlamaze|Dobrev|Drummey|Dunmorrow|Eikeland|Ekwueme|Elverson|Engelhart|Erdogmus|Espinal|Fairweather|Fennimore|Ferreirinha|Forsgren|Fukuhara|Galloway-Price|Garrick|Gillespey|Gorecki|Grönvall|Guérinot|Hailemichael|Halloway|Hämeenkoski|Haverkort|Hedgecoe|Hirose|Holmqvist|Horváthy|Ibarguren|Iversdal|Jagiełka|Jankovic|Järvelin|Jovanek|Kaczmarz|Kalyani|Karlsbad|Keswick|Kimathi|Kjærstad|Klimova|Kobayakawa|Kowalewska|Kristoffer|Lachapelle|Lagerlund|Lamptey|Larkspur|Leclerq|Lehtovaara|Lindenau|Löfgren|Lumbwa|Mackeral|Maduka|Malvestiti|Marchetta|Mbeki-Sound|Mensah-Long|Mikkelborg|Moreau-Petit|Mortlake|Muñiz|Nakagome|Ndiaye|Nørby|Novotna|Nwachuku|Obuya|Okonjo|Ólafsdal|Ormerod|Ortuño|Östling|Paardekooper|Palmgren|Peñalver|Petrenko|Pickersgill|Popescu-Vale|Quaye|Quillfeldt|Radcliff|Rantanen|Rasmusdal|Rathbone|Rosenlund|Ruusuvuori|Sääskilahti|Saltmarshe|Santoro|Schellenberg|Šimánek|Skovgaard|Sørlund|Stavrou|Strandberg|Szymborek|Takemura|Tanyeri|Teixeira|Thackeray|Tőkés|Tranmere|Tsubaki|Uddin|Underhay|Valdivieso|Vasconcel|Venkatesan|Villadsen|Wainscott|Waltersdorf|Wetherfold|Winterbourne|Wójtowicz|Xanthakis|Yamaoka|Yilmazer|Zabala|Zeleňák|Zhao-Martin|Żukowski'.split('|');
const particles: [string, string][] = [['van der', 'Meulen'], ['van', 'Oosterzee'], ['de', 'Groote'], ['von', 'Altenmoor'], ['del', 'Castaño'], ['da', 'Ribeira'], ['ter', 'Veen'], ['den', 'Boogaard'], ['di', 'Lagunari'], ['de la', 'Cruzada']];
const suffixes = ['Jr.', 'III', 'Jr.', 'II'];

export const corporateAuthors: PersonName[] = [{ literal: 'Tarnholm Water Board' }, { literal: 'Northern Peat Survey' }, { literal: 'Joint Working Group on Coastal Defence' }];

/** The demonstration's own author, who signs in as author@tarnholm.example. */
export const ownAuthor: PersonName = { family: 'Marwick', given: 'Ilse', orcid: completeOrcid('000000005000417') };

/**
 * ISO/IEC 7064 MOD 11-2 over fifteen digits. The demonstration uses 0000-0000-5..., which lies outside the block from which iDs of
 * researchers are given out: the check character is right, and nobody's iD is used.
 */
export function completeOrcid(fifteen: string): string {
  let total = 0;
  for (let at = 0; at < 15; at += 1) total = (total + Number(fifteen[at])) * 2;
  const check = (12 - (total % 11)) % 11;
  const digits = `${fifteen}${check === 10 ? 'X' : check}`;
  return `${digits.slice(0, 4)}-${digits.slice(4, 8)}-${digits.slice(8, 12)}-${digits.slice(12)}`;
}

const letters = 'ABCDEFGHJKLMNPRSTVW';

/** People with stable, distinct names (given and family name together occur once). */
export class NameRegister {
  private readonly taken = new Set<string>(['Ilse Marwick']);
  private count = 0;

  make(chance: Chance, orcidShare: number): PersonName {
    for (;;) {
      const roll = chance.unit();
      let given = chance.pick(givenNames);
      if (chance.happens(0.3)) given = `${given} ${letters[chance.below(letters.length)]}.`;
      const name: PersonName = { family: chance.pick(familyNames), given };
      if (roll < 0.06) [name.particle, name.family] = chance.pick(particles);
      else if (roll < 0.08) name.suffix = chance.pick(suffixes);
      const whole = `${given} ${name.particle ?? ''}${name.family}`;
      if (this.taken.has(whole)) continue;
      this.taken.add(whole);
      this.count += 1;
      if (chance.happens(orcidShare)) name.orcid = completeOrcid(`000000005${String(100_000 + this.count * 37)}`);
      return name;
    }
  }
}

/** "Jean-Luc P." -> "J.-L. P." */
export function initialsOf(given: string | undefined): string {
  return (given ?? '').split(' ').filter(Boolean).map((word) => word.split('-').map((part) => `${[...part][0]}.`).join('-')).join(' ');
}

/** "J.-L. P." -> "JLP" */
export const bareInitials = (given: string | undefined): string => initialsOf(given).replace(/[^\p{L}]/gu, '');

/** Latin letters without marks, as old databases write them. */
export function foldMarks(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}+/gu, '').replace(/ø/g, 'o').replace(/Ø/g, 'O').replace(/ł/g, 'l').replace(/Ł/g, 'L').replace(/æ/g, 'ae').replace(/ı/g, 'i').replace(/ß/g, 'ss');
}

/** Particle and family name. */
export const familyWithParticle = (name: PersonName): string => [name.particle, name.family].filter(Boolean).join(' ');
