import { type Metadata } from 'next';

import { removeUnit } from '@/app/(workspace)/admin/actions';
import { UnitForm } from '@/app/(workspace)/admin/units/unit-form';
import { ConfirmedAction } from '@/components/access/confirmed-action';
import { actorForPageOf } from '@/lib/access/actor';
import { unitTree } from '@/lib/access/units';

export const metadata: Metadata = { title: 'Units' };

export default async function UnitsPage() {
  await actorForPageOf('unit.manage');
  const units = await unitTree();
  return (
    <>
      <header>
        <h1 className="text-[31px] leading-[35px]">Units</h1>
        <p className="text-ink-soft">Faculties, departments and groups of the institution. Portfolios belong to them.</p>
      </header>
      {units.length === 0 ? (
        <p>There are no units yet. Add the institution or its first faculty below.</p>
      ) : (
        <ul className="max-w-2xl divide-y divide-thread border-y border-thread">
          {units.map((unit) => (
            <li key={unit.id} className="py-2" style={{ paddingInlineStart: `${unit.depth * 1.5}rem` }}>
              <details className="group">
                <summary className="cursor-pointer">
                  <span className="font-semibold">{unit.name}</span> <span className="text-[13px] text-ink-soft">{unit.kind}</span>
                </summary>
                <div className="grid max-w-md gap-4 py-3">
                  <UnitForm units={units} unit={unit} />
                  <ConfirmedAction action={removeUnit} fields={{ id: unit.id }} label="Remove" subject={unit.name} question={`${unit.name} is removed from the list of units. This cannot be undone.`} />
                </div>
              </details>
            </li>
          ))}
        </ul>
      )}
      <section aria-labelledby="add" className="grid max-w-md gap-3">
        <h2 id="add" className="text-[21px] leading-[25px]">
          Add a unit
        </h2>
        <UnitForm units={units} unit={null} />
      </section>
    </>
  );
}
