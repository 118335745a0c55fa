'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button, LinkButton } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { DocumentHead } from '@/components/ui/document-head';
import { Section } from '@/components/ui/section';
import { StatusText } from '@/components/ui/status-text';
import { Moment, WhereProvider } from '@/components/ui/where';
import type { RateSheetDetail } from '@/lib/contracts/rate-sheets';
import { deletedRateSheet, rateSheetDetail } from '@/lib/contracts/rate-sheets';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { dayText } from '@/lib/text/format';
import { rateWords as words } from '@/lib/text/messages/en/suppliers';
import { SheetEditor } from './sheet-editor';

interface RateSheetScreenProps {
  sheet: RateSheetDetail;
  jobs: readonly { id: string; number: string; name: string }[];
  mayApprove: boolean;
}

/** An approved sheet as the form that was agreed; a draft with its editor. */
export function RateSheetScreen({ sheet, jobs, mayApprove }: RateSheetScreenProps) {
  const router = useRouter();
  const [asking, setAsking] = useState<'approve' | 'remove' | null>(null);
  const [dirty, setDirty] = useState(false);
  const isDraft = sheet.status === 'draft';
  const close = () => setAsking(null);
  async function approve() {
    await apiSend('POST', `/api/rate-sheets/${sheet.id}/approve`, {}, rateSheetDetail);
    router.refresh();
  }
  async function remove() {
    await apiSend('DELETE', `/api/rate-sheets/${sheet.id}`, {}, deletedRateSheet);
    router.push(routes.supplier(sheet.supplierId));
    router.refresh();
  }
  return (
    <WhereProvider where={sheet.times}>
      <DocumentHead
        kind={
          <>
            {words.kind} <Link href={routes.supplier(sheet.supplierId)}>{sheet.supplierName}</Link>
          </>
        }
        title={sheet.name}
        facts={[
          { label: words.version, value: String(sheet.version) },
          { label: words.forJob, value: sheet.jobName ?? words.general },
          {
            label: words.period,
            value: `${dayText(sheet.effectiveFrom)} – ${sheet.effectiveTo ? dayText(sheet.effectiveTo) : words.open}`,
          },
          {
            label: words.status,
            value: (
              <StatusText look={isDraft ? 'waiting' : 'done'}>
                {words.statuses[sheet.status]}
              </StatusText>
            ),
          },
          ...(sheet.approvedAt
            ? [
                {
                  label: words.approvedBy,
                  value: (
                    <>
                      {sheet.approvedBy}, <Moment at={sheet.approvedAt} />
                    </>
                  ),
                },
              ]
            : []),
        ]}
        actions={
          isDraft ? (
            <>
              {mayApprove && dirty && (
                <span className="self-center text-[14px] text-ink-soft">{words.saveFirst}</span>
              )}
              {mayApprove ? (
                // What would be approved is what is saved, never what only stands on the screen.
                <Button disabled={dirty} onClick={() => setAsking('approve')}>
                  {words.approve}
                </Button>
              ) : (
                <span className="self-center text-[14px] text-ink-soft">{words.ownerApproves}</span>
              )}
              <Button variant="quiet" onClick={() => setAsking('remove')}>
                {words.remove}
              </Button>
            </>
          ) : (
            <LinkButton href={routes.newRateSheet(sheet.supplierId)}>{words.newVersion}</LinkButton>
          )
        }
      />
      {isDraft ? (
        <SheetEditor sheet={sheet} jobs={jobs} dirty={dirty} onDirty={setDirty} />
      ) : (
        <Agreed sheet={sheet} />
      )}
      <ConfirmDialog
        open={asking === 'approve'}
        onClose={close}
        title={words.approveTitle}
        confirm={words.approve}
        onConfirm={approve}
      >
        <p>{words.approveSays}</p>
      </ConfirmDialog>
      <ConfirmDialog
        open={asking === 'remove'}
        onClose={close}
        title={words.removeTitle}
        confirm={words.remove}
        danger
        onConfirm={remove}
      >
        <p>{words.removeSays}</p>
      </ConfirmDialog>
    </WhereProvider>
  );
}

function Agreed({ sheet }: { sheet: RateSheetDetail }) {
  return (
    <Section title={words.clauses}>
      <ol className="max-w-3xl border-b-[3px] border-double border-wet">
        {sheet.lines.map(({ says }, index) => (
          <li key={says} className="flex gap-4 border-b border-cured py-2 last:border-0">
            <span className="w-6 text-right text-ink-soft">{index + 1}</span>
            <span>{says}</span>
          </li>
        ))}
      </ol>
    </Section>
  );
}
