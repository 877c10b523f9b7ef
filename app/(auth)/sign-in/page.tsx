import { type Metadata } from 'next';
import { redirect } from 'next/navigation';

import { SignInForm } from '@/app/(auth)/sign-in/sign-in-form';
import { optionalActor } from '@/lib/access/actor';
import { needsFirstRun } from '@/lib/access/first-run';
import { localPath } from '@/lib/access/local-path';
import { waitInWords } from '@/lib/access/rate-limits';
import { demonstrationHint } from '@/lib/access/seeding';
import { signInRefusal } from '@/lib/access/sign-in';

export const metadata: Metadata = { title: 'Sign in' };

type SearchParams = Record<string, string | string[] | undefined>;

/** What next-auth's handler has to say to a browser that came through it. */
function messageOf({ error, wait }: SearchParams): string | null {
  if (error === undefined) return null;
  if (error === 'too-many') return `There were too many tries. Try again in ${waitInWords(Number(wait) || 900)}.`;
  if (error === 'CredentialsSignin') return signInRefusal;
  return 'Signing in did not work. Try it again here.';
}

export default async function SignInPage({ searchParams }: { searchParams: Promise<SearchParams> }) {
  const query = await searchParams;
  const next = localPath(query.next ?? query.callbackUrl);
  if (await optionalActor()) redirect(next);
  if (await needsFirstRun()) redirect('/first-run');
  const demonstration = await demonstrationHint();
  return (
    <>
      <h1 className="text-[31px] leading-[35px]">Sign in</h1>
      <SignInForm next={next} message={messageOf(query)} />
      {demonstration && (
        <section aria-labelledby="demonstration" className="border-t border-thread pt-4 text-[13px]">
          <h2 id="demonstration" className="font-semibold">
            This is a demonstration
          </h2>
          <p className="text-ink-soft">
            Its university, people and works are invented. Look around as any of these, all with the password <code className="font-mono text-ink">{demonstration.password}</code>
          </p>
          <ul className="mt-2 grid gap-1 font-mono">
            {demonstration.emails.map((email) => (
              <li key={email}>{email}</li>
            ))}
          </ul>
        </section>
      )}
    </>
  );
}
