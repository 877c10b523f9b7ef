import { type Metadata } from 'next';
import Link from 'next/link';

export const metadata: Metadata = { title: 'Not found' };

export default function WorkspaceNotFound() {
  return (
    <div className="grid max-w-prose gap-4 px-4 py-6 sm:px-7">
      <h1 className="text-[31px] leading-[35px]">There is nothing here</h1>
      <p>Either it was removed, or you were not given access to it. Whoever manages the portfolio can give it to you.</p>
      <p>
        <Link href="/portfolios" className="text-indigo underline underline-offset-2">
          To your portfolios
        </Link>
      </p>
    </div>
  );
}
