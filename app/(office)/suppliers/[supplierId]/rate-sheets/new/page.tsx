import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { listJobs } from '@/lib/services/jobs/list-jobs';
import { getSupplier } from '@/lib/services/suppliers/get-supplier';
import { rateWords as words } from '@/lib/text/messages/en/suppliers';
import { NewSheetForm } from '../../../_components/new-sheet-form';

export const metadata: Metadata = { title: words.newTitle };

export default async function NewRateSheetPage({
  params,
}: {
  params: Promise<{ supplierId: string }>;
}) {
  const actor = await requirePage('rates.write');
  const { supplierId } = await params;
  const supplier = await ask(getSupplier, actor, { supplierId });
  const { rows } = await ask(listJobs, actor, { status: 'open', limit: 500 });
  return (
    <>
      <DocumentHead kind={`${words.kind} ${supplier.name}`} title={words.newTitle} />
      <NewSheetForm supplierId={supplierId} jobs={rows} />
    </>
  );
}
