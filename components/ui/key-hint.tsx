import { clsx } from 'clsx';

/** The key that does what the words beside it say. Give the control `aria-keyshortcuts`; the sign itself is not read out. */
export function KeyHint({ children, boxed = false }: { children: string; boxed?: boolean }) {
  return (
    <kbd aria-hidden={boxed ? undefined : 'true'} className={clsx('font-sans text-head font-semibold', boxed ? 'inline-grid min-w-6 place-items-center rounded-xs border border-thread-strong bg-paper px-1.5 py-px text-ink' : 'opacity-80')}>
      {children}
    </kbd>
  );
}
