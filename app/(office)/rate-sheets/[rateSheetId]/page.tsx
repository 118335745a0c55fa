import type { Metadata } from 'next';
import { roleMay } from '@/lib/auth/policy';
import { ask, requirePage } from '@/lib/http/page';
import { listJobs } from '@/lib/services/jobs/list-jobs';
import { getRateSheet } from '@/lib/services/rate-sheets/get-rate-sheet';
import { rateWords as words } from '@/lib/text/messages/en/suppliers';
import { RateSheetScreen } from './_components/rate-sheet-screen';

export const metadata: Metadata = { title: words.clauses };

export default async function RateSheetPage({
  params,
}: {
  params: Promise<{ rateSheetId: string }>;
}) {
  const actor = await requirePage('rates.read');
  const { rateSheetId } = await params;
  const sheet = await ask(getRateSheet, actor, { rateSheetId });
  const { rows } = await ask(listJobs, actor, { status: 'open', limit: 500 });
  return (
    <RateSheetScreen
      key={`${sheet.id} ${sheet.status}`}
      sheet={sheet}
      jobs={rows}
      mayApprove={roleMay(actor.role, 'rates.approve')}
    />
  );
}
