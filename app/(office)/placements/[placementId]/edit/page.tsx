import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getPlacement } from '@/lib/services/placements/get-placement';
import { placementWords as words } from '@/lib/text/messages/en/jobs';
import { PlacementForm } from '../../../_components/placement-form';

export const metadata: Metadata = { title: words.edit };

export default async function EditPlacementPage({
  params,
}: {
  params: Promise<{ placementId: string }>;
}) {
  const actor = await requirePage('jobs.write');
  const { placementId } = await params;
  const placement = await ask(getPlacement, actor, { placementId });
  return (
    <>
      <DocumentHead kind={`${words.kind} ${placement.name}`} title={words.edit} />
      <PlacementForm jobId={placement.jobId} placement={placement} />
    </>
  );
}
