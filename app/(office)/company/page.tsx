import type { Metadata } from 'next';
import { ask, requirePage } from '@/lib/http/page';
import { getCompany } from '@/lib/services/company/get-company';
import { company as words } from '@/lib/text/messages/en/company';
import { SettingsForm } from './_components/settings-form';

export const metadata: Metadata = { title: words.sections.settings };

export default async function CompanySettingsPage() {
  const actor = await requirePage('company.read');
  return <SettingsForm company={await ask(getCompany, actor, {})} />;
}
