import { type Transaction } from 'sequelize';

import { keyHash } from '@/lib/catalogue/key-hash';
import { parseFields, planGroups, type Plan } from '@/lib/catalogue/plan';
import { insertRows, run, select, selectIn, type Cell } from '@/lib/db/bulk';
import { neighbouringBlocks, recordKeys } from '@/lib/linking/keys';
import { reviewThreshold, scorePair, type MatchReason, type ScoreInput } from '@/lib/linking/score';
import { normaliseFamily } from '@/lib/bibliography/normalise';
import { type RecordFields } from '@/lib/bibliography/record';
import { type ImportCounts } from '@/models/import';

export type Outcome = 'new' | 'known' | 'review' | 'rejected';

/** Blocks with more records than this say too little to be searched pair by pair. */
const largestBlock = 200;
const proposalsPerRecord = 3;

function outcomesOf(plan: Plan, importId: number): { outcomes: Map<number, Outcome>; groupOf: Map<number, number> } {
  const outcomes = new Map<number, Outcome>();
  const groupOf = new Map<number, number>();
  plan.groups.forEach((group, index) => {
    const members = group.recordIds.map((id) => plan.records.get(id)).filter((record) => record !== undefined);
    for (const member of members) groupOf.set(member.id, index);
    const own = members.filter((record) => record.importId === importId).sort((a, b) => a.position - b.position);
    const known = members.some((record) => record.importId !== importId && record.catalogued);
    // Of several entries of the file that are one work, the first counts as new and the others as known.
    own.forEach((record, place) => outcomes.set(record.id, known || place > 0 ? 'known' : 'new'));
  });
  return { outcomes, groupOf };
}

function scoreInput(fields: RecordFields): ScoreInput {
  const keys = recordKeys(fields);
  const first = fields.authors[0];
  return { title: keys.title, family: normaliseFamily(first?.family ?? first?.literal ?? ''), year: fields.year ?? null, volumePage: keys.volumePage, doi: fields.identifiers.doi ?? null };
}

interface Proposal {
  left: number;
  right: number;
  score: number;
  weight: number;
  reasons: MatchReason[];
}

/** Near matches of new records among catalogued records and among the file's own. */
async function proposeMatches(transaction: Transaction, importId: number, fresh: number[], groupOf: Map<number, number>): Promise<Proposal[]> {
  const proposals: Proposal[] = [];
  for (let from = 0; from < fresh.length; from += 1_000) {
    const rows = await selectIn<{ id: number; fields: string }, number>(transaction, 'SELECT id, fields FROM import_records WHERE id IN (?)', fresh.slice(from, from + 1_000));
    const inputs = new Map<number, ScoreInput>();
    const seekers = new Map<string, number[]>();
    for (const row of rows) {
      const fields = parseFields(row.fields);
      inputs.set(row.id, scoreInput(fields));
      for (const block of neighbouringBlocks(recordKeys(fields).blocks)) {
        const hash = keyHash(block).toString('hex');
        seekers.set(hash, [...(seekers.get(hash) ?? []), row.id]);
      }
    }
    const found = await selectIn<{ keyHash: Buffer; recordId: number }, Buffer>(
      transaction,
      'SELECT own.keyHash, own.recordId FROM record_keys own JOIN import_records record ON record.id = own.recordId WHERE own.kind = 4 AND own.keyHash IN (?) AND (record.catalogued = 1 OR record.importId = ?)',
      [...seekers.keys()].map((hash) => Buffer.from(hash, 'hex')),
      [importId],
    );
    const blocks = new Map<string, number[]>();
    for (const row of found) blocks.set(row.keyHash.toString('hex'), [...(blocks.get(row.keyHash.toString('hex')) ?? []), row.recordId]);
    const candidates = new Map<number, Set<number>>();
    for (const [hash, members] of blocks) {
      if (members.length > largestBlock) continue;
      for (const seeker of seekers.get(hash) ?? []) {
        const set = candidates.get(seeker) ?? new Set();
        for (const member of members) if (member !== seeker && groupOf.get(member) !== groupOf.get(seeker)) set.add(member);
        if (set.size > 0) candidates.set(seeker, set);
      }
    }
    const missing = [...new Set([...candidates.values()].flatMap((set) => [...set]))].filter((id) => !inputs.has(id));
    for (const row of await selectIn<{ id: number; fields: string }, number>(transaction, 'SELECT id, fields FROM import_records WHERE fields IS NOT NULL AND id IN (?)', missing)) inputs.set(row.id, scoreInput(parseFields(row.fields)));
    const ownRecords = new Set(fresh);
    for (const [seeker, members] of candidates) {
      const scored: Proposal[] = [];
      for (const member of members) {
        // A pair within the file is proposed once, by the later of the two.
        if (ownRecords.has(member) && member > seeker) continue;
        const other = inputs.get(member);
        const pair = other && scorePair(inputs.get(seeker) as ScoreInput, other);
        if (pair && pair.score >= reviewThreshold) scored.push({ left: seeker, right: member, ...pair });
      }
      scored.sort((a, b) => b.weight - a.weight || a.right - b.right);
      const groups = new Set<number | undefined>();
      for (const proposal of scored) {
        const group = groupOf.get(proposal.right) ?? -proposal.right;
        if (groups.has(group) || groups.size >= proposalsPerRecord) continue;
        groups.add(group);
        proposals.push(proposal);
      }
    }
  }
  return proposals;
}

/** Counts of an import from its stored rows: records = new + known + review + rejected. */
export async function countImport(transaction: Transaction | null, importId: number): Promise<ImportCounts> {
  const rows = await select<{ outcome: Outcome; records: number; referenceCount: number }>(
    transaction,
    'SELECT outcome, COUNT(*) AS records, SUM(referenceCount) AS referenceCount FROM import_records WHERE importId = ? GROUP BY outcome',
    [importId],
  );
  const of = (outcome: Outcome) => Number(rows.find((row) => row.outcome === outcome)?.records ?? 0);
  const [{ problems }] = await select<{ problems: number }>(transaction, 'SELECT COUNT(*) AS problems FROM import_problems WHERE importId = ?', [importId]);
  const [{ linked }] = await select<{ linked: number }>(
    transaction,
    `SELECT COUNT(*) AS linked FROM import_records record JOIN cited_references reference ON reference.recordId = record.id
     JOIN reference_variants variant ON variant.hash = reference.variantHash AND variant.how IN ('doi', 'fields', 'title')
     WHERE record.importId = ? AND record.catalogued = 1`,
    [importId],
  );
  return {
    records: rows.reduce((sum, row) => sum + Number(row.records), 0),
    new: of('new'),
    known: of('known'),
    review: of('review'),
    rejected: of('rejected'),
    problems,
    references: rows.reduce((sum, row) => sum + Number(row.referenceCount ?? 0), 0),
    linked,
  };
}

/** Settles what each record of an import would do (new, known, to review), and proposes matches for the near ones. Changes nothing in the catalogue. */
export async function checkImport(transaction: Transaction, importId: number): Promise<void> {
  const plan = await planGroups(transaction, 'importId = ? AND fields IS NOT NULL', [importId], 'record.catalogued = 1 OR record.importId = ?', [importId]);
  const { outcomes, groupOf } = outcomesOf(plan, importId);
  const fresh = [...outcomes].filter(([, outcome]) => outcome === 'new').map(([id]) => id).sort((a, b) => a - b);
  const proposals = await proposeMatches(transaction, importId, fresh, groupOf);
  await run(transaction, "DELETE matches FROM matches JOIN import_records record ON record.id = matches.leftRecordId WHERE record.importId = ? AND matches.state = 'open'", [importId]);
  await insertRows(
    transaction,
    'INSERT IGNORE INTO matches (kind, leftRecordId, rightRecordId, score, weight, reasons, state)',
    proposals.map((proposal) => ['work', proposal.left, proposal.right, proposal.score, proposal.weight, JSON.stringify(proposal.reasons), 'open']),
  );
  const open = await select<{ id: number }>(
    transaction,
    "SELECT DISTINCT record.id FROM import_records record JOIN matches ON matches.leftRecordId = record.id AND matches.state IN ('open', 'later') WHERE record.importId = ?",
    [importId],
  );
  for (const { id } of open) if (outcomes.get(id) === 'new') outcomes.set(id, 'review');
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS settled_records');
  await run(transaction, 'CREATE TEMPORARY TABLE settled_records (id BIGINT UNSIGNED NOT NULL PRIMARY KEY, outcome VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL) ENGINE = InnoDB');
  await insertRows(transaction, 'INSERT INTO settled_records (id, outcome)', [...outcomes] as Cell[][]);
  await run(transaction, 'UPDATE import_records record JOIN settled_records settled ON settled.id = record.id SET record.outcome = settled.outcome');
  await run(transaction, 'DROP TEMPORARY TABLE settled_records');
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS touched_records');
}
