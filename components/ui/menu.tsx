'use client';

import { DropdownMenu } from 'radix-ui';
import Link from 'next/link';
import { type ReactNode } from 'react';

const item = 'flex min-h-9 cursor-pointer items-center gap-2 px-3 py-1.5 text-table text-ink no-underline outline-none data-[highlighted]:bg-weld-wash data-[disabled]:opacity-50';

/** A menu on a button. The trigger is one focusable element. */
export function Menu({ trigger, label, children, align = 'end' }: { trigger: ReactNode; label: string; children: ReactNode; align?: 'start' | 'end' }) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      {/* Where its button stands, not at the end of the page: within a landmark, and next for Tab. */}
      <DropdownMenu.Content align={align} sideOffset={6} collisionPadding={8} aria-label={label} className="z-50 max-h-[80dvh] min-w-44 overflow-y-auto rounded-sm border border-thread bg-paper py-1 font-sans font-normal shadow-float">
        {children}
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}

export function MenuItem({ onSelect, children, disabled }: { onSelect: () => void; children: ReactNode; disabled?: boolean }) {
  return (
    <DropdownMenu.Item className={item} onSelect={onSelect} disabled={disabled}>
      {children}
    </DropdownMenu.Item>
  );
}

/** `download` links leave the page alone: the browser saves what comes. */
export function MenuLink({ href, children, download }: { href: string; children: ReactNode; download?: boolean }) {
  return (
    <DropdownMenu.Item className={item} asChild>
      {download ? <a href={href} download>{children}</a> : <Link href={href}>{children}</Link>}
    </DropdownMenu.Item>
  );
}

export function MenuCheckbox({ checked, onCheckedChange, children }: { checked: boolean; onCheckedChange: (checked: boolean) => void; children: ReactNode }) {
  return (
    <DropdownMenu.CheckboxItem className={item} checked={checked} onCheckedChange={onCheckedChange} onSelect={(event) => event.preventDefault()}>
      <span aria-hidden="true" className="grid size-4 place-items-center border border-thread-strong">{checked && <span className="size-2.5 bg-indigo" />}</span>
      {children}
    </DropdownMenu.CheckboxItem>
  );
}

/** One of a few: the scheme, the order. */
export function MenuChoice<Value extends string>({ value, options, onChange }: { value: Value; options: readonly { value: Value; label: ReactNode }[]; onChange: (value: Value) => void }) {
  return (
    <DropdownMenu.RadioGroup value={value} onValueChange={(next) => onChange(next as Value)}>
      {options.map((option) => (
        <DropdownMenu.RadioItem key={option.value} value={option.value} className={item} onSelect={(event) => event.preventDefault()}>
          <span aria-hidden="true" className="grid size-4 place-items-center rounded-full border border-thread-strong">{option.value === value && <span className="size-2 rounded-full bg-indigo" />}</span>
          {option.label}
        </DropdownMenu.RadioItem>
      ))}
    </DropdownMenu.RadioGroup>
  );
}

export function MenuLabel({ children }: { children: ReactNode }) {
  return <DropdownMenu.Label className="px-3 py-1.5 text-head font-semibold text-ink-soft">{children}</DropdownMenu.Label>;
}

export function MenuSeparator() {
  return <DropdownMenu.Separator className="my-1 border-t border-thread" />;
}
