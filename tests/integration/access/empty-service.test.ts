import mariadb from 'mariadb';
import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest';

/** These tests need a service without users; other tests fill theirs. They make a database of their own and drop it. */
const own = new URL(process.env.DATABASE_URL ?? '');
const server = new URL(own);
own.pathname += '_empty';
const name = own.pathname.slice(1);
process.env.DATABASE_URL = own.href;
process.env.HEDDLE_DEMO = 'on';

async function onServer(statement: string): Promise<void> {
  const connection = await mariadb.createConnection(server.href.replace(/^mysql:/, 'mariadb:'));
  await connection.query(statement);
  await connection.end();
}

const load = async () => ({
  ...(await import('../factories')),
  ...(await import('@/lib/access/first-run')),
  ...(await import('@/lib/access/seeding')),
  ...(await import('@/lib/access/sign-in')),
  ...(await import('@/models/portfolio')),
  ...(await import('@/models/setting')),
  ...(await import('@/models/user')),
  ...(await import('@/seeders/demonstration')),
});
let modules: Awaited<ReturnType<typeof load>>;

beforeAll(async () => {
  await onServer(`DROP DATABASE IF EXISTS \`${name}\``);
  await onServer(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4`);
  const { migrations } = await import('@/lib/db/migrate');
  await (await migrations()).up();
  modules = await load();
});

beforeEach(async () => {
  await modules.User.destroy({ where: {} });
});

afterAll(async () => {
  const { closeDatabase } = await import('@/lib/db/connection');
  await closeDatabase();
  await onServer(`DROP DATABASE IF EXISTS \`${name}\``);
});

const person = { email: 'first@test.example', name: 'First', password: 'eight blue kettles' };

it('makes the first person administrator, and closes for ever after', async () => {
  const { needsFirstRun, createFirstAdministrator, User } = modules;
  expect(await needsFirstRun()).toBe(true);
  await expect(createFirstAdministrator({ ...person, password: 'short' }, new Headers())).rejects.toMatchObject({ status: 422 });
  await createFirstAdministrator(person, new Headers());
  expect(await User.findOne({ where: { email: person.email } })).toMatchObject({ role: 'administrator', demonstration: false });
  expect(await needsFirstRun()).toBe(false);
  await expect(createFirstAdministrator({ ...person, email: 'second@test.example' }, new Headers())).rejects.toMatchObject({ status: 410 });
});

it('makes one administrator when several people come at the same moment', async () => {
  const { createFirstAdministrator, User } = modules;
  const outcomes = await Promise.allSettled(Array.from({ length: 6 }, (_value, index) => createFirstAdministrator({ ...person, email: `number-${index}@test.example` }, new Headers())));
  expect(outcomes.filter((outcome) => outcome.status === 'fulfilled')).toHaveLength(1);
  expect(await User.count()).toBe(1);
});

it('makes the demonstration accounts once, each able to sign in, and leaves them as they are the next time', async () => {
  const { createDemonstrationAccounts, demonstrationAccounts, demonstrationPassword, authenticate, User } = modules;
  const ids = await createDemonstrationAccounts();
  await User.update({ name: 'Renamed' }, { where: { role: 'reader' } });
  expect(await createDemonstrationAccounts()).toEqual(ids);
  expect(await User.count()).toBe(5);
  expect(await User.count({ where: { name: 'Renamed' } })).toBe(1);
  for (const { email, role } of demonstrationAccounts) expect(await authenticate(email, demonstrationPassword, new Headers())).toMatchObject({ userId: ids?.[role] });
});

it('makes no demonstration accounts where real people are', async () => {
  const { createDemonstrationAccounts, createUser, User } = modules;
  await createUser('administrator');
  expect(await createDemonstrationAccounts()).toBeNull();
  expect(await User.count()).toBe(1);
});

it('keeps the last administrator, even when two demote each other at the same moment', async () => {
  const { createUser, User } = modules;
  const { changeUser } = await import('@/lib/access/users');
  const [one, two] = [await createUser('administrator'), await createUser('administrator')];
  const actor = (user: typeof one) => ({ userId: user.id, name: user.name, email: user.email, role: user.role, via: 'session' as const });
  const outcomes = await Promise.allSettled([changeUser(actor(one), two.id, { role: 'reader' }, new Headers()), changeUser(actor(two), one.id, { disabled: true }, new Headers())]);
  expect(outcomes.filter((outcome) => outcome.status === 'fulfilled')).toHaveLength(1);
  expect(await User.count({ where: { role: 'administrator', disabledAt: null } })).toBe(1);
});

it('leaves a demonstration that stands to its people, whatever they have undone or deleted', async () => {
  const { seedDemonstration, Portfolio, Setting } = modules;
  await Setting.upsert({ name: 'demonstration.ready', value: true });
  const said: string[] = [];
  expect(await seedDemonstration((line) => said.push(line))).toBe(true);
  expect(said).toEqual(['The demonstration is there.']);
  expect(await Portfolio.count()).toBe(0);
});

it('adds no demonstration where real people are, and says so', async () => {
  const { createUser, seedDemonstration, Portfolio } = modules;
  await createUser('administrator');
  const said: string[] = [];
  expect(await seedDemonstration((line) => said.push(line))).toBe(false);
  expect(said.join()).toContain('people of its own');
  expect(await Portfolio.count()).toBe(0);
});
