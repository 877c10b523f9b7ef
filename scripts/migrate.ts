import { closeDatabase } from '@/lib/db/connection';
import { migrations } from '@/lib/db/migrate';

try {
  const done = await (await migrations()).up();
  console.log(done.length === 0 ? 'The database is up to date.' : `${done.length} migrations run, the last: ${done[done.length - 1].name}`);
} catch (error) {
  // The driver's error drags the whole connection pool along when printed as it is.
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
} finally {
  await closeDatabase();
}
