import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getSupplier } from '@/lib/services/suppliers/get-supplier';
import { supplierWords as words } from '@/lib/text/messages/en/suppliers';
import { SupplierForm } from '../../_components/supplier-form';

export const metadata: Metadata = { title: words.edit };

export default async function EditSupplierPage({
  params,
}: {
  params: Promise<{ supplierId: string }>;
}) {
  const actor = await requirePage('suppliers.write');
  const { supplierId } = await params;
  const supplier = await ask(getSupplier, actor, { supplierId });
  return (
    <>
      <DocumentHead kind={`${words.kindOf} ${supplier.name}`} title={words.edit} />
      <SupplierForm supplier={supplier} />
    </>
  );
}
