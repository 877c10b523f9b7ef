import { closeDatabase } from '@/lib/db/connection';
import { environment } from '@/lib/environment';
import { seedDemonstration } from '@/seeders/demonstration';

try {
  if (environment().HEDDLE_DEMO === 'off') console.log('HEDDLE_DEMO=off: nothing is seeded.');
  else await seedDemonstration((line) => console.log(line));
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
} finally {
  await closeDatabase();
}
