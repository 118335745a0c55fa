import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { requirePage } from '@/lib/http/page';
import { supplierWords as words } from '@/lib/text/messages/en/suppliers';
import { SupplierForm } from '../_components/supplier-form';

export const metadata: Metadata = { title: words.add };

export default async function NewSupplierPage() {
  await requirePage('suppliers.write');
  return (
    <>
      <DocumentHead kind={words.kindOf} title={words.add} />
      <SupplierForm supplier={null} />
    </>
  );
}
