import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { WhereProvider } from '@/components/ui/where';
import { ask, requirePage } from '@/lib/http/page';
import { getAccount } from '@/lib/services/account/get-account';
import { accountMessages } from '@/lib/text/messages/account';
import { commonMessages } from '@/lib/text/messages/common';
import { PasswordSection } from './_components/password-section';
import { SessionsSection } from './_components/sessions-section';
import { YouSection } from './_components/you-section';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage() {
  const actor = await requirePage('self.use');
  const account = await ask(getAccount, actor, {});
  const words = accountMessages(actor.locale);
  return (
    <WhereProvider where={{ timeZone: account.timeZone, clock: account.clock }}>
      <DocumentHead
        kind={words.kind}
        title={account.name}
        facts={[
          { label: words.company, value: account.companyName },
          { label: words.role, value: commonMessages(actor.locale).roles[account.role] },
          { label: words.email, value: <span className="break-all">{account.email}</span> },
        ]}
      />
      <div className="grid max-w-5xl pb-10 lg:grid-cols-2">
        <YouSection account={account} />
        <PasswordSection email={account.email} />
        <SessionsSection account={account} />
      </div>
    </WhereProvider>
  );
}
