import { type Metadata } from 'next';
import { redirect } from 'next/navigation';
import { connection } from 'next/server';

import { FirstRunForm } from '@/app/(auth)/first-run/first-run-form';
import { needsFirstRun } from '@/lib/access/first-run';

export const metadata: Metadata = { title: 'Set up Heddle' };

export default async function FirstRunPage() {
  await connection();
  if (!(await needsFirstRun())) redirect('/sign-in');
  return (
    <>
      <h1 className="text-[31px] leading-[35px]">Set up Heddle</h1>
      <p className="text-ink-soft">Nobody has an account here yet. Yours will be the administrator&apos;s; with it you invite everybody else.</p>
      <FirstRunForm />
    </>
  );
}
