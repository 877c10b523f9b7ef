'use client';

import { clsx } from 'clsx';
import { useRouter } from 'next/navigation';
import { useId, useRef, useState, type KeyboardEvent } from 'react';

import { searchCatalogue, type Search, type SearchHit } from '@/components/frame/search-catalogue';
import { shortestQuery, useSearch } from '@/components/frame/use-search';
import { controlClass } from '@/components/ui/field';
import { Icon } from '@/components/ui/icons';
import { useKeys } from '@/components/ui/use-keys';

interface OptionProps {
  hit: SearchHit;
  id: string;
  active: boolean;
  serif: boolean;
  onPick: () => void;
}

function Option({ hit, id, active, serif, onPick }: OptionProps) {
  return (
    // The input keeps the focus and its keys reach the options through aria-activedescendant.
    <div id={id} role="option" aria-selected={active} onPointerDown={(event) => event.preventDefault()} onClick={onPick} className={clsx('cursor-pointer px-3 py-1.5', active ? 'bg-weld-wash' : 'hover:bg-linen')}>
      <span className={clsx('block truncate', serif ? 'font-serif text-work' : 'text-table')}>{hit.title}</span>
      {hit.subtitle && <span className="block truncate text-small text-ink-soft">{hit.subtitle}</span>}
    </div>
  );
}

/** Finds works, authors, DOIs and portfolios from anywhere; `/` goes there. */
export function SearchBox({ search = searchCatalogue, className }: { search?: Search; className?: string }) {
  const id = useId();
  const router = useRouter();
  const input = useRef<HTMLInputElement>(null);
  const [typed, setTyped] = useState('');
  const [open, setOpen] = useState(false);
  const [active, setActive] = useState(-1);
  const { query, hits, problem } = useSearch(search, typed);
  const groups = hits ? [{ title: 'Portfolios', items: hits.portfolios, serif: false }, { title: 'Works', items: hits.works, serif: true }].filter((group) => group.items.length > 0) : [];
  const all = groups.flatMap((group) => group.items);
  const shown = open && typed.trim().length >= shortestQuery && (hits !== null || problem !== null);
  useKeys({ '/': () => input.current?.focus() });

  const pick = (hit: SearchHit) => {
    setOpen(false);
    setTyped('');
    setActive(-1);
    input.current?.blur();
    router.push(hit.href);
  };
  const press = (event: KeyboardEvent) => {
    if (event.key === 'Escape') {
      if (open && typed !== '') setOpen(false);
      else input.current?.blur();
      return;
    }
    if (event.key === 'Enter') {
      // Enter on hits of older words would open something else than was typed.
      const hit = shown && query === typed.trim() ? all[Math.max(active, 0)] : undefined;
      if (hit) pick(hit);
      return;
    }
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    event.preventDefault();
    setOpen(true);
    if (all.length > 0) setActive((current) => (event.key === 'ArrowDown' ? (current + 1) % all.length : (current <= 0 ? all.length : current) - 1));
  };
  const optionId = (index: number) => `${id}-option-${index}`;
  const said = !shown ? '' : problem ?? (all.length === 0 ? 'Nothing found' : `${all.length} found`);

  return (
    <div role="search" className={clsx('relative', className)}>
      <label htmlFor={id} className="sr-only">Search works, authors, DOIs and portfolios</label>
      <input
        ref={input}
        id={id}
        type="text"
        role="combobox"
        aria-expanded={shown && all.length > 0}
        aria-controls={`${id}-list`}
        aria-autocomplete="list"
        aria-activedescendant={shown && active >= 0 ? optionId(active) : undefined}
        aria-keyshortcuts="/"
        autoComplete="off"
        spellCheck={false}
        maxLength={300}
        placeholder="Search works, authors, DOIs"
        value={typed}
        onChange={(event) => {
          setTyped(event.target.value);
          setOpen(true);
          setActive(-1);
        }}
        onFocus={() => setOpen(true)}
        onBlur={() => setOpen(false)}
        onKeyDown={press}
        className={clsx(controlClass, 'pr-9 text-table')}
      />
      <Icon name="search" className="pointer-events-none absolute top-1/2 right-3 -translate-y-1/2 text-ink-soft" />
      <div className={clsx('absolute top-full right-0 left-0 z-40 mt-1.5 max-h-[70dvh] overflow-y-auto rounded-sm border border-thread bg-paper py-1 shadow-float md:left-auto md:w-[26rem]', !shown && 'hidden')}>
        <div id={`${id}-list`} role="listbox" aria-label="Found">
          {groups.map((group, groupIndex) => {
            const before = groups.slice(0, groupIndex).reduce((sum, one) => sum + one.items.length, 0);
            return (
              <div key={group.title} role="group" aria-label={group.title}>
                <p aria-hidden="true" className="px-3 pt-2 pb-1 text-head font-semibold text-ink-soft">{group.title}</p>
                {group.items.map((hit, index) => (
                  <Option key={hit.id} hit={hit} id={optionId(before + index)} active={active === before + index} serif={group.serif} onPick={() => pick(hit)} />
                ))}
              </div>
            );
          })}
        </div>
        {all.length === 0 && <p className="px-3 py-2 text-table text-ink-soft">{problem ?? `Nothing found for “${query}” among what you were given.`}</p>}
      </div>
      <p role="status" className="sr-only">{said}</p>
    </div>
  );
}
