import { type ReactNode } from 'react';

import { AccountMenu, type AccountMenuProps } from '@/components/frame/account-menu';
import { Brand } from '@/components/frame/brand';
import { KeyboardHelp } from '@/components/frame/keyboard-help';
import { SearchBox } from '@/components/frame/search-box';

interface HeaderProps extends AccountMenuProps {
  /** Another search box; the catalogue's unless given. */
  search?: ReactNode;
}

/** The header of every page behind sign-in: mark, name, search, account; `Place` fills its middle. 56 px; on narrow screens the search has a line of its own. */
export function Header({ search, person, signOut }: HeaderProps) {
  return (
    <header className="no-print flex min-h-14 flex-wrap items-center gap-x-4 border-b border-thread bg-paper px-4 md:flex-nowrap md:px-7">
      <div className="flex h-14 flex-1 items-center">
        <Brand />
      </div>
      <div className="order-last w-full pb-2.5 md:order-none md:w-[13.75rem] md:pb-0 lg:w-[18.25rem]">{search ?? <SearchBox />}</div>
      <AccountMenu person={person} signOut={signOut} />
      <KeyboardHelp />
    </header>
  );
}
