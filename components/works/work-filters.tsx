'use client';

import { FilterField } from '@/components/tables/filter-field';
import { SelectField } from '@/components/ui/field';
import { typeWords } from '@/components/works/work-words';
import { workTypes } from '@/lib/bibliography/record';

type FilterName = 'q' | 'type' | 'yearFrom' | 'yearTo' | 'catalogued' | 'retracted';

interface WorkFiltersProps {
  filters: Record<FilterName, string>;
  onChange: (change: Partial<Record<FilterName, string | null>>, how: 'push' | 'replace') => void;
}

/** A year is sent once it is whole; half a year narrows nothing. */
const wholeYear = (text: string) => text === '' || /^\d{4}$/.test(text);

/** What narrows the list of works; all of it stands in the address. */
export function WorkFilters({ filters, onChange }: WorkFiltersProps) {
  const pick = (name: FilterName, fallback: string) => (event: { target: { value: string } }) => onChange({ [name]: event.target.value === fallback ? null : event.target.value }, 'push');
  const year = (name: 'yearFrom' | 'yearTo') => (text: string) => wholeYear(text) && onChange({ [name]: text || null }, 'replace');
  return (
    <div className="grid w-full grid-cols-2 gap-2 md:flex md:w-auto md:flex-wrap md:items-end">
      <div className="col-span-2 md:w-[17rem]">
        <FilterField label="Title, author, venue or DOI" value={filters.q} onChange={(text) => onChange({ q: text || null }, 'replace')} />
      </div>
      <SelectField label="Which works" labelHidden value={filters.catalogued || 'true'} onChange={pick('catalogued', 'true')} className="text-table md:w-[12.5rem]">
        <option value="true">Catalogued here</option>
        <option value="false">Cited only</option>
        <option value="all">Catalogued and cited</option>
      </SelectField>
      <SelectField label="Type" labelHidden value={filters.type} onChange={pick('type', '')} className="text-table md:w-[9.5rem]">
        <option value="">All types</option>
        {workTypes.map((type) => <option key={type} value={type}>{typeWords[type]}</option>)}
      </SelectField>
      <div className="col-span-2 flex items-center gap-1.5 md:w-[15rem]">
        <div className="min-w-0 flex-1"><FilterField label="Published from" placeholder="from year" value={filters.yearFrom} onChange={year('yearFrom')} className="min-w-0!" /></div>
        <span aria-hidden="true" className="text-ink-soft">–</span>
        <div className="min-w-0 flex-1"><FilterField label="Published to" placeholder="to year" value={filters.yearTo} onChange={year('yearTo')} className="min-w-0!" /></div>
      </div>
      <SelectField label="Retraction" labelHidden value={filters.retracted} onChange={pick('retracted', '')} className="text-table md:w-[11rem]">
        <option value="">Retracted or not</option>
        <option value="true">Retracted</option>
        <option value="false">Not retracted</option>
      </SelectField>
    </div>
  );
}
