'use client';

import { useActionState } from 'react';

import { addUnit, saveUnit } from '@/app/(workspace)/admin/actions';
import { SelectField, TextField } from '@/components/access/fields';
import { FormMessage } from '@/components/access/form-message';
import { SubmitButton } from '@/components/access/submit-button';
import { untouchedForm } from '@/lib/access/form-state';
import { unitKinds } from '@/lib/access/unit-kinds';
import { type UnitView } from '@/lib/api/types';

interface UnitFormProps {
  units: (UnitView & { depth: number })[];
  /** The unit to change; null to add one. */
  unit: UnitView | null;
}

export function UnitForm({ units, unit }: UnitFormProps) {
  const [state, submit] = useActionState(unit ? saveUnit : addUnit, untouchedForm);
  return (
    <form action={submit} className="grid gap-3">
      {unit && <input type="hidden" name="id" value={unit.id} />}
      <TextField label="Name of the unit" name="name" required maxLength={200} autoComplete="off" defaultValue={unit?.name} state={state} />
      <SelectField label="Kind" name="kind" defaultValue={unit?.kind ?? 'department'} state={state}>
        {unitKinds.map((kind) => (
          <option key={kind}>{kind}</option>
        ))}
      </SelectField>
      <SelectField label="Stands below" name="parentId" defaultValue={unit?.parentId ?? ''} state={state}>
        <option value="">nothing, it stands at the top</option>
        {units
          .filter((other) => other.id !== unit?.id)
          .map((other) => (
            <option key={other.id} value={other.id}>
              {'\u2003'.repeat(other.depth) + other.name}
            </option>
          ))}
      </SelectField>
      <div>
        <SubmitButton kind="secondary">{unit ? 'Save the unit' : 'Add the unit'}</SubmitButton>
      </div>
      <FormMessage state={state} />
    </form>
  );
}
