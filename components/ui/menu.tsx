'use client';

import { DropdownMenu } from 'radix-ui';
import Link from 'next/link';
import { type ReactNode } from 'react';

const item = 'flex min-h-9 cursor-pointer items-center gap-2 px-3 py-1.5 text-[14px] text-ink no-underline outline-none data-[highlighted]:bg-weld-wash data-[disabled]:opacity-50';

/** A menu on a button. The trigger is one focusable element. */
export function Menu({ trigger, label, children, align = 'end' }: { trigger: ReactNode; label: string; children: ReactNode; align?: 'start' | 'end' }) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content align={align} sideOffset={6} aria-label={label} className="z-50 min-w-44 rounded-sm border border-thread bg-paper py-1 shadow-[0_8px_28px_rgb(20_22_26/0.18)]">
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
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

export function MenuLabel({ children }: { children: ReactNode }) {
  return <DropdownMenu.Label className="px-3 py-1.5 text-[12.5px] font-semibold text-ink-soft">{children}</DropdownMenu.Label>;
}

export function MenuSeparator() {
  return <DropdownMenu.Separator className="my-1 border-t border-thread" />;
}
