import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { listSuppliersInput } from '@/lib/contracts/suppliers';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { listSuppliers } from '@/lib/services/suppliers/list-suppliers';
import { supplierWords as words } from '@/lib/text/messages/en/suppliers';
import { SupplierList } from './_components/supplier-list';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<Record<string, string | string[]>>;
}

export default async function SuppliersPage({ searchParams }: PageProps) {
  const actor = await requirePage('suppliers.read');
  const given = listQuery(await searchParams);
  // An address with a filter that makes no sense shows the whole list instead of nothing.
  const query = listSuppliersInput.safeParse(given).success ? given : {};
  const first = await ask(listSuppliers, actor, query);
  return (
    <>
      <DocumentHead
        kind={words.list}
        title={words.title}
        actions={<LinkButton href={routes.newSupplier()}>{words.add}</LinkButton>}
      />
      <SupplierList first={first} firstQuery={query} />
    </>
  );
}
