import type { Metadata } from 'next';
import { SheetScreen } from '@/components/sheet/sheet-screen';
import { roleMay } from '@/lib/auth/policy';
import { ask, requirePage } from '@/lib/http/page';
import { getSheet } from '@/lib/services/statements/get-sheet';
import { statements as words } from '@/lib/text/messages/en/statements';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  params: Promise<{ statementId: string }>;
  searchParams: Promise<{ row?: string | string[] }>;
}

export default async function StatementPage({ params, searchParams }: PageProps) {
  const actor = await requirePage('statements.read');
  const { statementId } = await params;
  const { row } = await searchParams;
  const sheet = await ask(getSheet, actor, { statementId });
  const startKey = typeof row === 'string' ? row : null;
  return (
    <SheetScreen
      first={sheet}
      me={actor.name}
      mayReopen={roleMay(actor.role, 'statements.reopen')}
      startKey={startKey}
    />
  );
}
