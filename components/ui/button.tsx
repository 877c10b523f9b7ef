import { clsx } from 'clsx';
import Link from 'next/link';
import { type ComponentProps, type ReactNode } from 'react';

export type ButtonKind = 'primary' | 'secondary' | 'quiet' | 'destructive';

const looks: Record<ButtonKind, string> = {
  primary: 'border-indigo bg-indigo text-on-indigo hover:border-indigo-strong hover:bg-indigo-strong',
  secondary: 'border-indigo bg-transparent text-indigo hover:bg-paper',
  quiet: 'border-transparent bg-transparent text-ink-soft hover:text-ink',
  destructive: 'border-madder bg-transparent text-madder hover:bg-madder-wash',
};
const shape = 'inline-flex min-h-9 items-center justify-center gap-2 rounded-sm border px-3.5 py-1.5 text-table font-semibold whitespace-nowrap no-underline disabled:opacity-60 aria-disabled:opacity-60';

export function Button({ kind = 'secondary', type = 'button', className, ...props }: { kind?: ButtonKind } & ComponentProps<'button'>) {
  return <button type={type} className={clsx(shape, looks[kind], className)} {...props} />;
}

export function ButtonLink({ kind = 'secondary', className, ...props }: { kind?: ButtonKind } & ComponentProps<typeof Link>) {
  return <Link className={clsx(shape, looks[kind], className)} {...props} />;
}

/** A square button that shows a sign only; the label is read out and shown as a tip. */
export function IconButton({ label, children, className, type = 'button', ...props }: { label: string; children: ReactNode } & Omit<ComponentProps<'button'>, 'aria-label' | 'title'>) {
  return (
    <button type={type} aria-label={label} title={label} className={clsx('inline-grid size-9 place-items-center rounded-sm border border-thread-strong bg-paper text-ink hover:border-ink disabled:opacity-50', className)} {...props}>
      {children}
    </button>
  );
}
