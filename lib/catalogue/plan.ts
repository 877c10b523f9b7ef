import { type Transaction } from 'sequelize';

import { run, select, selectIn } from '@/lib/db/bulk';
import { groupRecords, type Group, type GroupInput } from '@/lib/linking/group';
import { recordKeys } from '@/lib/linking/keys';
import { type RecordFields } from '@/lib/bibliography/record';

/** A record as the catalogue needs it for grouping. */
export interface PlannedRecord {
  id: number;
  importId: number;
  position: number;
  catalogued: boolean;
  citing: boolean;
  workId: number | null;
}

export interface Plan {
  groups: Group[];
  records: Map<number, PlannedRecord>;
}

interface Row extends PlannedRecord {
  fields: string;
  sha256: string;
}

/** Stored fields; references live in a table of their own. */
export function parseFields(json: string): RecordFields {
  return { ...(JSON.parse(json) as Omit<RecordFields, 'references'>), references: [] };
}

/**
 * Fills the temporary table touched_records with the given records and everything that shares an identity key or a decision with them,
 * and with what shares one with those, until nothing is added: grouping needs whole classes.
 */
async function touchRecords(transaction: Transaction, seedSql: string, replacements: unknown[]): Promise<void> {
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS touched_records');
  await run(transaction, 'CREATE TEMPORARY TABLE touched_records (id BIGINT UNSIGNED NOT NULL PRIMARY KEY, round INT UNSIGNED NOT NULL, KEY (round)) ENGINE = InnoDB');
  await run(transaction, `INSERT IGNORE INTO touched_records (id, round) SELECT id, 0 FROM import_records WHERE ${seedSql}`, replacements);
  for (let round = 0; ; round += 1) {
    // Through the work as well: records once joined by a chain must be looked at again when a link of the chain goes.
    for (const source of [
      `SELECT DISTINCT other.recordId AS id FROM touched_records touched
       JOIN record_keys own ON own.recordId = touched.id AND own.kind IN (1, 2)
       JOIN record_keys other ON other.keyHash = own.keyHash AND other.kind = own.kind
       JOIN import_records record ON record.id = other.recordId AND record.catalogued = 1
       WHERE touched.round = ${round}`,
      `SELECT DISTINCT sibling.id FROM touched_records touched
       JOIN import_records own ON own.id = touched.id AND own.workId IS NOT NULL
       JOIN import_records sibling ON sibling.workId = own.workId AND sibling.catalogued = 1
       WHERE touched.round = ${round}`,
      `SELECT DISTINCT matches.rightRecordId AS id FROM touched_records touched
       JOIN matches ON matches.leftRecordId = touched.id AND matches.state IN ('same', 'different')
       JOIN import_records record ON record.id = matches.rightRecordId AND record.catalogued = 1 WHERE touched.round = ${round}`,
      `SELECT DISTINCT matches.leftRecordId AS id FROM touched_records touched
       JOIN matches ON matches.rightRecordId = touched.id AND matches.state IN ('same', 'different')
       JOIN import_records record ON record.id = matches.leftRecordId AND record.catalogued = 1 WHERE touched.round = ${round}`,
    ]) {
      await run(transaction, `INSERT IGNORE INTO touched_records (id, round) SELECT found.id, ${round + 1} FROM (${source}) found`);
    }
    const [{ added }] = await select<{ added: number }>(transaction, 'SELECT COUNT(*) AS added FROM touched_records WHERE round = ?', [round + 1]);
    if (added === 0) return;
  }
}

/**
 * How the records stand in works once the records of `seedSql` and all catalogued records that they touch are grouped.
 *
 * @param seedSql condition on import_records, e.g. "importId = ?"
 * @param counted which of the touched records take part: condition on `record`, e.g. "record.catalogued = 1"
 */
export async function planGroups(transaction: Transaction, seedSql: string, replacements: unknown[], counted: string, countedReplacements: unknown[] = []): Promise<Plan> {
  await touchRecords(transaction, seedSql, replacements);
  const inputs: GroupInput[] = [];
  const records = new Map<number, PlannedRecord>();
  for (let after = 0; ; ) {
    const rows = await select<Row>(
      transaction,
      `SELECT record.id, record.importId, record.position, record.catalogued, record.citing, record.workId, record.fields, import.sha256
       FROM touched_records touched JOIN import_records record ON record.id = touched.id JOIN imports import ON import.id = record.importId
       WHERE touched.id > ? AND record.fields IS NOT NULL AND (${counted}) ORDER BY touched.id LIMIT 2000`,
      [after, ...countedReplacements],
    );
    for (const row of rows) {
      const { identifiers, fingerprint, volumePage, title } = recordKeys(parseFields(row.fields));
      inputs.push({ id: row.id, identifiers, fingerprint, volumePage, title, fallback: `rec:${row.sha256}:${row.position}` });
      records.set(row.id, { id: row.id, importId: row.importId, position: row.position, catalogued: Boolean(row.catalogued), citing: Boolean(row.citing), workId: row.workId });
    }
    if (rows.length < 2000) break;
    after = rows[rows.length - 1].id;
  }
  const decisions = await selectIn<{ leftRecordId: number; rightRecordId: number; state: string }, number>(
    transaction,
    "SELECT leftRecordId, rightRecordId, state FROM matches WHERE state IN ('same', 'different') AND leftRecordId IN (?)",
    [...records.keys()],
  );
  const pairs = (state: string) => decisions.filter((row) => row.state === state).map((row) => [row.leftRecordId, row.rightRecordId] as const);
  return { groups: groupRecords(inputs, pairs('same'), pairs('different')), records };
}
