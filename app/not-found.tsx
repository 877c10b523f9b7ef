import Link from 'next/link';

import { Brand } from '@/components/frame/brand';

export default function NotFound() {
  return (
    <main id="main" className="mx-auto grid max-w-[36rem] gap-3 px-6 py-24">
      <div className="mb-6"><Brand /></div>
      <h1 className="text-title">There is nothing here</h1>
      <p>The address may be mistyped, the thing may be gone, or it was not given to you.</p>
      <p>
        <Link href="/portfolios">Go to the portfolios</Link>
      </p>
    </main>
  );
}
