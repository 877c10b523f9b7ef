'use client';

import { startTransition, useActionState } from 'react';

import { setKeyboardHelp } from '@/components/frame/page-keys';
import { useScheme, type SchemeChoice } from '@/components/frame/use-scheme';
import { Menu, MenuChoice, MenuItem, MenuLabel, MenuLink, MenuSeparator } from '@/components/ui/menu';
import { untouchedForm, type FormState } from '@/lib/access/form-state';

const schemes: readonly { value: SchemeChoice; label: string }[] = [
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
  { value: 'system', label: 'As the system' },
];

/** At most two letters: of the first and the last name. */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/).filter(Boolean);
  const letters = words.length > 1 ? [words[0], words[words.length - 1]] : words;
  return letters.map((word) => Array.from(word)[0].toUpperCase()).join('');
}

export interface AccountMenuProps {
  person: { name: string; email: string };
  signOut: (state: FormState, form: FormData) => Promise<FormState>;
}

/** The person's own corner: account, scheme, keys, way out. */
export function AccountMenu({ person, signOut }: AccountMenuProps) {
  const [choice, choose] = useScheme();
  const [, leave, leaving] = useActionState(signOut, untouchedForm);
  return (
    <Menu
      label="Account"
      trigger={
        <button type="button" aria-label={`Account of ${person.name}`} className="grid size-9 shrink-0 place-items-center">
          <span className="grid size-[30px] place-items-center rounded-full bg-indigo text-[0.71875rem] font-bold tracking-wide text-on-indigo">{initialsOf(person.name)}</span>
        </button>
      }
    >
      <div className="px-3 pt-1.5 pb-2 text-table">
        <p className="font-semibold">{person.name}</p>
        <p className="text-small text-ink-soft">{person.email}</p>
      </div>
      <MenuSeparator />
      <MenuLink href="/account">Your account</MenuLink>
      <MenuLink href="/methods">Methods and cautions</MenuLink>
      <MenuItem onSelect={() => setKeyboardHelp(true)}>Keys</MenuItem>
      <MenuSeparator />
      <MenuLabel>Colours</MenuLabel>
      <MenuChoice value={choice} options={schemes} onChange={choose} />
      <MenuSeparator />
      <MenuItem disabled={leaving} onSelect={() => startTransition(() => leave(new FormData()))}>
        Sign out
      </MenuItem>
    </Menu>
  );
}
