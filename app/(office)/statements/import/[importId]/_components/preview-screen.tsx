'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { DocumentHead } from '@/components/ui/document-head';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { ImportLayout } from '@/importers/core/layout';
import type { ImportPreview } from '@/lib/contracts/imports';
import { discardImportOutput, setImportLayoutOutput } from '@/lib/contracts/imports';
import type { ChargeKind } from '@/lib/domain/facts';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import { importPreviewQuery } from '@/lib/queries/statements';
import { routes } from '@/lib/routes';
import { moneyFigure } from '@/lib/text/format';
import { preview as words } from '@/lib/text/messages/en/statements';
import { failureText } from '@/lib/text/problems';
import { AcceptForm } from './accept-form';
import { ColumnTable } from './column-table';
import { Diagnostics } from './diagnostics';
import { LayoutFields } from './layout-fields';
import { LineTable } from './line-table';

/** What a file would become: to be corrected, taken in whole, or discarded. */
export function PreviewScreen({ first }: { first: ImportPreview }) {
  const router = useRouter();
  const locale = useLocale();
  const queries = useQueryClient();
  const { data } = useQuery({ ...importPreviewQuery(first.importId), initialData: first });
  const [discarding, setDiscarding] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const [kinds, setKinds] = useState<Readonly<Record<string, ChargeKind>>>({});
  const { importId, preview, status } = data;
  const waiting = status === 'preview';

  async function setLayout(layout: ImportLayout | null): Promise<void> {
    setProblem(null);
    try {
      const address = `/api/imports/${importId}/layout`;
      await apiSend('PUT', address, { layout }, setImportLayoutOutput);
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      setProblem(failureText(locale, error));
    }
    await queries.invalidateQueries({ queryKey: importPreviewQuery(importId).queryKey });
  }

  async function discard(): Promise<void> {
    await apiSend('DELETE', `/api/imports/${importId}`, {}, discardImportOutput);
    router.push(routes.statements());
    router.refresh();
  }

  const { totals } = preview;
  return (
    <>
      <DocumentHead
        kind={words.kind}
        title={data.supplier.name}
        facts={[{ label: words.file, value: preview.fileName }]}
        figures={[
          { label: words.totals.toCreate, value: String(totals.toCreate) },
          { label: words.totals.charges, value: moneyFigure(totals.charges) },
          { label: words.totals.tax, value: moneyFigure(totals.tax) },
          { label: words.totals.net, value: moneyFigure(totals.net) },
        ]}
        actions={
          waiting && (
            <Button variant="quiet" onClick={() => setDiscarding(true)}>
              {words.discard}
            </Button>
          )
        }
      />
      {problem && (
        <Notice tone="error" className="mx-4 mt-4 md:mx-6">
          {problem}
        </Notice>
      )}
      {data.statement && (
        <Notice tone="done" className="mx-4 mt-4 md:mx-6">
          <Link href={routes.statement(data.statement.id)}>
            {words.accepted(data.statement.number)}
          </Link>
        </Notice>
      )}
      {status === 'discarded' && (
        <Notice tone="info" className="mx-4 mt-4 md:mx-6">
          {words.discarded}
        </Notice>
      )}
      <Diagnostics preview={preview} />
      {waiting && <AcceptForm key={preview.fileSha256} data={data} chargeKinds={kinds} />}
      {preview.readable && (
        <>
          <Section
            title={words.columns}
            says={words.columnsSays[data.layoutFrom]}
            action={
              waiting &&
              data.layoutFrom !== 'guessed' && (
                <Button variant="quiet" onClick={() => setLayout(null)}>
                  {words.guessAgain}
                </Button>
              )
            }
            bleed
          >
            <ColumnTable preview={preview} readOnly={!waiting} onLayout={setLayout} />
          </Section>
          {waiting && <LayoutFields preview={preview} onLayout={setLayout} />}
          <LineTable
            preview={preview}
            kinds={kinds}
            readOnly={!waiting}
            onKind={(rowKey, kind) => setKinds({ ...kinds, [rowKey]: kind })}
          />
        </>
      )}
      <ConfirmDialog
        open={discarding}
        onClose={() => setDiscarding(false)}
        title={words.discardTitle}
        confirm={words.discard}
        danger
        onConfirm={discard}
      >
        <p>{words.discardSays}</p>
      </ConfirmDialog>
    </>
  );
}
