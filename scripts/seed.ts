import { closeDatabase } from '@/lib/db/connection';
import { environment } from '@/lib/environment';
import { seedDemonstration } from '@/seeders/demonstration';

/** Ended well, but without demonstration accounts; `npm start` then announces none. */
const nothingSeeded = 3;

try {
  if (environment().HEDDLE_DEMO === 'off') console.log('HEDDLE_DEMO=off: nothing is seeded.');
  else if (!(await seedDemonstration((line) => console.log(line)))) process.exitCode = nothingSeeded;
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
} finally {
  await closeDatabase();
}
