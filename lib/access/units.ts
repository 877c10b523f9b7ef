import { recordAudit } from '@/lib/access/audit';
import { type Actor } from '@/lib/access/permissions';
import { type UnitKind } from '@/lib/access/unit-kinds';
import { type UnitView } from '@/lib/api/types';
import { database } from '@/lib/db/connection';
import { conflict, invalid, notFound } from '@/lib/errors';
import { Portfolio } from '@/models/portfolio';
import { Unit } from '@/models/unit';

export interface UnitFields {
  name: string;
  kind: UnitKind;
  parentId: number | null;
}

function presentUnit(unit: Unit): UnitView {
  return { id: String(unit.id), parentId: unit.parentId === null ? null : String(unit.parentId), name: unit.name, kind: unit.kind };
}

/** A page of the units, by name. */
export async function listUnits({ page, pageSize }: { page: number; pageSize: number }) {
  const { rows, count } = await Unit.findAndCountAll({ order: [['name', 'ASC'], ['id', 'ASC']], limit: pageSize, offset: (page - 1) * pageSize });
  return { items: rows.map(presentUnit), total: count, page, pageSize };
}

/** Every unit in the order of the tree, each with its depth; for choosing one and for drawing the tree. */
export async function unitTree(): Promise<(UnitView & { depth: number })[]> {
  const units = (await Unit.findAll({ order: [['name', 'ASC'], ['id', 'ASC']] })).map(presentUnit);
  const children = new Map<string | null, UnitView[]>();
  for (const unit of units) children.set(unit.parentId, [...(children.get(unit.parentId) ?? []), unit]);
  const tree: (UnitView & { depth: number })[] = [];
  const walk = (parentId: string | null, depth: number) => {
    for (const unit of children.get(parentId) ?? []) {
      tree.push({ ...unit, depth });
      walk(unit.id, depth + 1);
    }
  };
  walk(null, 0);
  return tree;
}

/** Throws where the parent is missing, or stands below the unit itself. */
function assertParent(units: Unit[], unitId: number | null, parentId: number | null): void {
  const parents = new Map(units.map((unit) => [unit.id, unit.parentId]));
  if (parentId !== null && !parents.has(parentId)) throw invalid('There is no such unit to stand below.', { parentId: 'There is no such unit.' });
  for (let above = parentId; above !== null; above = parents.get(above) ?? null) {
    if (above === unitId) throw invalid('A unit cannot stand below itself.', { parentId: 'A unit cannot stand below itself.' });
  }
}

export async function createUnit(actor: Actor, fields: UnitFields, headers: Headers): Promise<UnitView> {
  const unit = await database().transaction(async (transaction) => {
    assertParent(await Unit.findAll({ lock: true, transaction }), null, fields.parentId);
    return Unit.create(fields, { transaction });
  });
  await recordAudit(actor, { headers }, { action: 'unit.created', subjectType: 'unit', subjectId: String(unit.id), details: { name: unit.name } });
  return presentUnit(unit);
}

/** The tree is locked as a whole (it is small): two moves at once could otherwise close a circle that neither made alone. */
export async function changeUnit(actor: Actor, unitId: number, fields: Partial<UnitFields>, headers: Headers): Promise<UnitView> {
  const unit = await database().transaction(async (transaction) => {
    const units = await Unit.findAll({ order: [['id', 'ASC']], lock: true, transaction });
    const unit = units.find((candidate) => candidate.id === unitId);
    if (!unit) throw notFound();
    if (fields.parentId !== undefined) assertParent(units, unitId, fields.parentId);
    return unit.update(fields, { transaction });
  });
  await recordAudit(actor, { headers }, { action: 'unit.changed', subjectType: 'unit', subjectId: String(unitId), details: { ...fields } });
  return presentUnit(unit);
}

/** Removes a unit that nothing rests on; 409 while units stand below it or portfolios belong to it. */
export async function deleteUnit(actor: Actor, unitId: number, headers: Headers): Promise<void> {
  const name = await database().transaction(async (transaction) => {
    const unit = await Unit.findByPk(unitId, { lock: true, transaction });
    if (!unit) throw notFound();
    const below = await Unit.count({ where: { parentId: unitId }, transaction });
    if (below > 0) throw conflict(`${below} unit${below === 1 ? ' stands' : 's stand'} below it. Move or remove ${below === 1 ? 'it' : 'them'} first.`);
    const portfolios = await Portfolio.count({ where: { unitId, deletedAt: null }, transaction });
    if (portfolios > 0) throw conflict(`${portfolios} portfolio${portfolios === 1 ? ' belongs' : 's belong'} to it. Give ${portfolios === 1 ? 'it' : 'them'} another unit first.`);
    await unit.destroy({ transaction });
    return unit.name;
  });
  await recordAudit(actor, { headers }, { action: 'unit.deleted', subjectType: 'unit', subjectId: String(unitId), details: { name } });
}
