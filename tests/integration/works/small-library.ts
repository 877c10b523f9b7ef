import { type Actor, type GrantLevel, type Role } from '@/lib/access/permissions';
import { type Portfolio } from '@/models/portfolio';
import { type User } from '@/models/user';
import { accept, emptyCatalogue, upload } from '@/tests/integration/pipeline';
import { createPortfolio, createUser, grant } from '@/tests/integration/factories';

export const actorOf = (user: User): Actor => ({ userId: user.id, name: user.name, email: user.email, role: user.role, via: 'session' });

interface Entry {
  title: string;
  author: string;
  year?: number;
  journal?: string;
  doi?: string;
  cites?: string[];
}

/** A tagged export of invented works. */
export function taggedFile(entries: Entry[]): string {
  const records = entries.map(({ title, author, year, journal = 'Annals of Wetness', doi, cites = [] }) =>
    ['PT J', `AU ${author}`, `TI ${title}`, `SO ${journal}`, ...(year ? [`PY ${year}`] : []), ...(doi ? [`DI ${doi}`] : []), ...cites.map((raw, index) => `${index === 0 ? 'CR' : '  '} ${raw}`), 'ER', ''].join('\n'),
  );
  return `FN Export\nVR 1.0\n${records.join('\n')}\nEF\n`;
}

export interface SmallLibrary {
  librarian: User;
  /** Holds `reeds` only. */
  reader: User;
  /** Holds nothing. */
  stranger: User;
  administrator: User;
  reeds: Portfolio;
  peat: Portfolio;
}

/**
 * Two portfolios. In `reeds`, three works cite: Brae's "Water table" twice over (a catalogued work, DOI 10.5555/table), Tolland's book
 * (cited-only) once, and Quist once. In `peat`, one work cites the water table too.
 */
export async function makeSmallLibrary(): Promise<SmallLibrary> {
  await emptyCatalogue();
  const person = (role: Role) => createUser(role);
  const [librarian, reader, stranger, administrator] = [await person('librarian'), await person('reader'), await person('evaluator'), await person('administrator')];
  const give = async (portfolio: Portfolio, user: User, level: GrantLevel) => grant(portfolio, user, level);
  const reeds = await createPortfolio({ createdById: librarian.id });
  const peat = await createPortfolio({ createdById: librarian.id });
  await give(reeds, librarian, 'manage');
  await give(peat, librarian, 'manage');
  await give(reeds, reader, 'view');
  const table = 'BRAE B, 2009, J REED STUD, V4, P11, DOI 10.5555/table';
  const book = 'TOLLAND T, 2004, STREAM INDEX BOOK';
  await accept(
    actorOf(librarian),
    await upload(actorOf(librarian), reeds.id, 'reeds.txt', taggedFile([
      { title: 'Water table and oxidation of the peat', author: 'Brae, B', year: 2009, doi: '10.5555/table', cites: [book] },
      { title: 'Reed beds of the north, 100% flooded', author: 'García, A', year: 2012, doi: '10.5555/reed', cites: [table, book] },
      { title: 'Ditch blocking of pH in reed beds', author: 'Quist, C', year: 2018, doi: '10.5555/ditch', cites: [table, 'GARCIA A, 2012, J REED STUD, DOI 10.5555/reed', 'LATER L, 2020, UNSEEN J, V1, P1'] },
      { title: 'An undated note', author: 'Quist, C', doi: '10.5555/note' },
    ])),
  );
  await accept(
    actorOf(librarian),
    await upload(actorOf(librarian), peat.id, 'peat.txt', taggedFile([
      { title: 'Soil respiration revisited', author: 'Haldane, H', year: 2001, doi: '10.5555/soil', cites: [table, 'ONLY P, 1999, PEAT ONLY J, V2, P3'] },
      { title: 'Water table and oxidation of the peat', author: 'Brae, B', year: 2009, doi: '10.5555/table', cites: [] },
    ])),
  );
  return { librarian, reader, stranger, administrator, reeds, peat };
}
