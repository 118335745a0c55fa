import type { Metadata } from 'next';
import { ask, requirePage } from '@/lib/http/page';
import { listKeys } from '@/lib/services/keys/list-keys';
import { company as words } from '@/lib/text/messages/en/company';
import { KeyBoard } from '../_components/key-board';

export const metadata: Metadata = { title: words.sections.keys };

export default async function KeysPage() {
  const actor = await requirePage('keys.manage');
  return <KeyBoard first={await ask(listKeys, actor, {})} />;
}
