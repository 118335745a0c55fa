import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { listStatementsInput } from '@/lib/contracts/statements';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { listImports } from '@/lib/services/imports/list-imports';
import { listStatements } from '@/lib/services/statements/list-statements';
import { statements as words } from '@/lib/text/messages/en/statements';
import { PendingImports } from './_components/pending-imports';
import { StatementList } from './_components/statement-list';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<Record<string, string | string[]>>;
}

export default async function StatementsPage({ searchParams }: PageProps) {
  const actor = await requirePage('statements.read');
  const given = listQuery(await searchParams);
  // An address with a filter that makes no sense shows the whole list instead of nothing.
  const query = listStatementsInput.safeParse(given).success ? given : {};
  const first = await ask(listStatements, actor, query);
  const waiting = await ask(listImports, actor, {});
  return (
    <>
      <DocumentHead
        kind={words.kind}
        title={words.title}
        actions={
          <LinkButton variant="primary" href={routes.importStatement()}>
            {words.import}
          </LinkButton>
        }
      />
      <PendingImports rows={waiting.rows} />
      <StatementList first={first} firstQuery={query} />
    </>
  );
}
