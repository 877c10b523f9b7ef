'use client';

import { SelectField, TextArea, TextField } from '@/components/ui/field';
import { type UnitView } from '@/lib/api/types';

export interface PortfolioDraft {
  name: string;
  description: string;
  unitId: string;
  periodFrom: string;
  periodTo: string;
}

export const emptyDraft: PortfolioDraft = { name: '', description: '', unitId: '', periodFrom: '', periodTo: '' };

/** What the API takes; an empty year or unit is none. A year that is no number is sent as it is, so that the service says what is wrong with it. */
export function draftBody(draft: PortfolioDraft): Record<string, unknown> {
  const year = (text: string) => (text.trim() === '' ? null : /^\d+$/.test(text.trim()) ? Number(text) : text);
  return { name: draft.name, description: draft.description, unitId: draft.unitId || null, periodFrom: year(draft.periodFrom), periodTo: year(draft.periodTo) };
}

interface PortfolioFieldsProps {
  draft: PortfolioDraft;
  onChange: (draft: PortfolioDraft) => void;
  errors: Record<string, string>;
  units: (UnitView & { depth: number })[];
}

/** Name, purpose, unit and period of a portfolio. */
export function PortfolioFields({ draft, onChange, errors, units }: PortfolioFieldsProps) {
  const set = (field: keyof PortfolioDraft) => (event: { target: { value: string } }) => onChange({ ...draft, [field]: event.target.value });
  return (
    <>
      <TextField label="Name" value={draft.name} onChange={set('name')} error={errors.name} required maxLength={200} autoComplete="off" />
      <TextArea label="What it is for" value={draft.description} onChange={set('description')} error={errors.description} maxLength={2000} hint="Shown to everybody who is given the portfolio." />
      <SelectField label="Unit" value={draft.unitId} onChange={set('unitId')} error={errors.unitId}>
        <option value="">No unit</option>
        {units.map((unit) => (
          <option key={unit.id} value={unit.id}>{`${'\u2003'.repeat(unit.depth)}${unit.name}`}</option>
        ))}
      </SelectField>
      <div className="grid grid-cols-2 items-start gap-3">
        <TextField label="Period from" value={draft.periodFrom} onChange={set('periodFrom')} error={errors.periodFrom} inputMode="numeric" placeholder="first year" autoComplete="off" />
        <TextField label="to" value={draft.periodTo} onChange={set('periodTo')} error={errors.periodTo} inputMode="numeric" placeholder="last year" autoComplete="off" />
      </div>
    </>
  );
}
