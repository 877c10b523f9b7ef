'use client';

import { useDeferredValue, useId, useState } from 'react';

import { levelWords, roleWords } from '@/components/portfolios/level-words';
import { Button } from '@/components/ui/button';
import { controlClass, Field } from '@/components/ui/field';
import { grantLevels, type GrantLevel, type Role } from '@/lib/access/permissions';
import { apiPath, useApi } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';

export interface NamedPerson {
  userId: string;
  name: string;
  email: string;
  role: Role;
  level: GrantLevel;
}

interface PeopleFieldProps {
  people: NamedPerson[];
  onChange: (people: NamedPerson[]) => void;
  error?: string;
}

/** Who is given the portfolio: people are found by name or e-mail, each with a level. */
export function PeopleField({ people, onChange, error }: PeopleFieldProps) {
  const [typed, setTyped] = useState('');
  const q = useDeferredValue(typed.trim());
  const listId = useId();
  const found = useApi<Page<{ id: string; name: string; email: string; role: Role }>>(q.length < 2 ? null : apiPath('/api/people', { q, pageSize: 8 }));
  const offered = q.length < 2 ? [] : (found.data?.items ?? []).filter((person) => !people.some((one) => one.userId === person.id));
  const add = (person: { id: string; name: string; email: string; role: Role }) => {
    onChange([...people, { userId: person.id, name: person.name, email: person.email, role: person.role, level: 'view' }]);
    setTyped('');
  };
  return (
    <fieldset className="grid gap-2">
      <legend className="mb-1 text-small font-semibold">People</legend>
      {people.length > 0 && (
        <ul className="divide-y divide-thread border-y border-thread">
          {people.map((person) => (
            <li key={person.userId} className="flex flex-wrap items-center gap-x-3 gap-y-1 py-1.5 text-table">
              <span className="min-w-40 flex-1">
                {person.name} <span className="text-small text-ink-soft">{roleWords[person.role]}</span>
              </span>
              <select
                aria-label={`What ${person.name} may do`}
                value={person.level}
                onChange={(event) => onChange(people.map((one) => (one === person ? { ...one, level: event.target.value as GrantLevel } : one)))}
                className="min-h-8 rounded-sm border border-thread-strong bg-paper px-2 text-table"
              >
                {grantLevels.map((level) => <option key={level} value={level}>{levelWords[level]}</option>)}
              </select>
              <Button kind="quiet" className="px-1" aria-label={`Take the portfolio back from ${person.name}`} onClick={() => onChange(people.filter((one) => one !== person))}>
                Remove
              </Button>
            </li>
          ))}
        </ul>
      )}
      <Field label="Find somebody by name or e-mail" error={error}>
        {(wiring) => <input {...wiring} value={typed} onChange={(event) => setTyped(event.target.value)} className={controlClass} autoComplete="off" aria-controls={listId} />}
      </Field>
      <ul id={listId} aria-label="People found" aria-live="polite" className="grid gap-px">
        {offered.map((person) => (
          <li key={person.id}>
            <button type="button" onClick={() => add(person)} className="w-full rounded-sm px-2 py-1.5 text-left text-table hover:bg-weld-wash">
              {person.name} <span className="text-small text-ink-soft">{person.email}, {roleWords[person.role]}</span>
            </button>
          </li>
        ))}
        {q.length >= 2 && found.data && offered.length === 0 && <li className="px-2 py-1 text-small text-ink-soft">Nobody else is called that. An administrator can invite people.</li>}
        {found.error && q.length >= 2 && <li className="px-2 py-1 text-small text-madder">{found.error.message}</li>}
      </ul>
    </fieldset>
  );
}
