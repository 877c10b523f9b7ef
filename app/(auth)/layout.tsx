import { type ReactNode } from 'react';

/** Pages for people who are not signed in: one narrow sheet. */
export default function AuthLayout({ children }: { children: ReactNode }) {
  return (
    <main id="main" className="grid min-h-dvh content-start justify-items-center gap-6 px-4 py-10 sm:py-20">
      <p className="font-serif text-[25px] font-semibold">Heddle</p>
      <div className="grid w-full max-w-[26rem] gap-5 border border-thread bg-paper p-6 sm:p-8">{children}</div>
    </main>
  );
}
