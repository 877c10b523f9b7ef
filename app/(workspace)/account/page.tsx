import { type Metadata } from 'next';

import { NameForm } from '@/app/(workspace)/account/name-form';
import { PasswordForm } from '@/app/(workspace)/account/password-form';
import { TokenForm } from '@/app/(workspace)/account/token-form';
import { TokenTable } from '@/app/(workspace)/account/token-table';
import { actorForPageOf } from '@/lib/access/actor';
import { listTokens } from '@/lib/access/tokens';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage() {
  const actor = await actorForPageOf('account.use');
  const tokens = await listTokens(actor, { page: 1, pageSize: 200 });
  return (
    <div className="grid max-w-[60rem] gap-10 px-4 py-6 sm:px-7">
      <header>
        <h1 className="text-[31px] leading-[35px]">Account</h1>
        <p className="text-ink-soft">
          {actor.email}, {actor.role}
        </p>
      </header>
      <section aria-labelledby="name" className="grid max-w-md gap-3">
        <h2 id="name" className="text-[21px] leading-[25px]">
          Name
        </h2>
        <NameForm name={actor.name} />
      </section>
      <section aria-labelledby="password" className="grid max-w-md gap-3">
        <h2 id="password" className="text-[21px] leading-[25px]">
          Password
        </h2>
        <PasswordForm email={actor.email} />
      </section>
      <section aria-labelledby="tokens" className="grid gap-3">
        <h2 id="tokens" className="text-[21px] leading-[25px]">
          Tokens for scripts
        </h2>
        <p className="max-w-prose text-ink-soft">
          A script that sends <code className="font-mono text-ink">Authorization: Bearer hdl_...</code> may do what you may do. Give each script its own token, so that you can revoke one without the others.
        </p>
        <TokenTable tokens={tokens.items} />
        <TokenForm />
      </section>
    </div>
  );
}
