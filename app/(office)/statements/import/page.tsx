import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { listDemoFiles } from '@/lib/services/demo/list-demo-files';
import { listStatements } from '@/lib/services/statements/list-statements';
import { importing as words } from '@/lib/text/messages/en/statements';
import { ImportForm } from './_components/import-form';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<{ supplierId?: string | string[] }>;
}

export default async function ImportPage({ searchParams }: PageProps) {
  const actor = await requirePage('statements.write');
  const { supplierId } = await searchParams;
  const { suppliers } = await ask(listStatements, actor, { limit: 1 });
  const demo = await ask(listDemoFiles, actor, {});
  return (
    <>
      <DocumentHead kind={words.kind} title={words.title} />
      <ImportForm
        suppliers={suppliers}
        startSupplierId={typeof supplierId === 'string' ? supplierId : ''}
        demoFiles={demo.rows.filter((file) => file.kind === 'statement')}
      />
    </>
  );
}
