'use client';

import { useId, useMemo, useState, type KeyboardEvent } from 'react';

import { workName } from '@/components/analyses/work-name';
import { findWorks } from '@/components/map/map-state';
import { controlClass } from '@/components/ui/field';
import { type AnalysisMap } from '@/lib/api/types';

const mostFound = 8;

/** Finds a work among those shown and goes there. */
export function MapSearch({ map, visible, onFind }: { map: AnalysisMap; visible: Uint8Array; onFind: (work: number) => void }) {
  const [typed, setTyped] = useState('');
  const [active, setActive] = useState(0);
  const [open, setOpen] = useState(false);
  const list = useId();
  const found = useMemo(() => findWorks(map, visible, typed, mostFound), [map, visible, typed]);
  const choose = (work: number | undefined) => {
    if (work === undefined) return;
    setOpen(false);
    setTyped('');
    onFind(work);
  };
  const press = (event: KeyboardEvent) => {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step !== undefined && found.length > 0) {
      event.preventDefault();
      setActive((active + step + found.length) % found.length);
    } else if (event.key === 'Enter') {
      event.preventDefault();
      choose(found[active]);
    } else if (event.key === 'Escape' && open) {
      event.stopPropagation();
      setOpen(false);
    }
  };
  const shown = open && typed.trim() !== '';
  return (
    <div className="relative">
      <input
        type="search"
        role="combobox"
        aria-label="Find a work on the map"
        placeholder="Find a work on the map"
        aria-expanded={shown}
        aria-controls={list}
        aria-autocomplete="list"
        aria-activedescendant={shown && found.length > 0 ? `${list}-${active}` : undefined}
        value={typed}
        maxLength={200}
        autoComplete="off"
        onChange={(event) => {
          setTyped(event.target.value);
          setActive(0);
          setOpen(true);
        }}
        onFocus={() => setOpen(true)}
        onBlur={() => setOpen(false)}
        onKeyDown={press}
        className={controlClass}
      />
      <ul id={list} role="listbox" aria-label="Works found" hidden={!shown} className="absolute inset-x-0 top-full z-20 mt-1 max-h-80 overflow-y-auto rounded-sm border border-thread-strong bg-paper shadow-float">
        {found.map((work, index) => (
          // Pressed before the field loses the focus, which would close the list.
          <li key={work} id={`${list}-${index}`} role="option" aria-selected={index === active} onPointerDown={(event) => event.preventDefault()} onClick={() => choose(work)} className="cursor-pointer px-3 py-2 hover:bg-weld-wash aria-selected:bg-weld-wash">
            <span className="block font-serif text-table font-medium">{map.retracted[work] && 'Retracted: '}{workName({ title: map.titles[work], authors: map.authors[work], year: map.years[work] })}</span>
            <span className="block text-small text-ink-soft">{[map.authors[work], map.years[work], `rank ${map.rank[work]}`].filter((part) => part !== null).join(' · ')}</span>
          </li>
        ))}
      </ul>
      {shown && found.length === 0 && <p role="status" className="absolute inset-x-0 top-full z-20 mt-1 rounded-sm border border-thread-strong bg-paper px-3 py-2 text-small text-ink-soft shadow-float">No work shown has these words.</p>}
    </div>
  );
}
