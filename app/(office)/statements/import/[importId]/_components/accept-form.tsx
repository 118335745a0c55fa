'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { ApiForm } from '@/components/forms/api-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { CheckField, TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { ImportPreview } from '@/lib/contracts/imports';
import { acceptForm, acceptImportOutput } from '@/lib/contracts/imports';
import type { ChargeKind } from '@/lib/domain/facts';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { preview as words } from '@/lib/text/messages/en/statements';

interface AcceptFormProps {
  data: ImportPreview;
  chargeKinds: Readonly<Record<string, ChargeKind>>;
}

/** What the document says of itself, and the one button that writes: all of it or nothing. */
export function AcceptForm({ data, chargeKinds }: AcceptFormProps) {
  const router = useRouter();
  const queries = useQueryClient();
  const [leaveOut, setLeaveOut] = useState(false);
  const { importId, preview, proposed } = data;
  const { failed, toCreate } = preview.totals;
  const state = useApiForm({
    schema: acceptForm,
    defaultValues: proposed,
    send: (values) =>
      apiSend(
        'POST',
        `/api/imports/${importId}/accept`,
        {
          ...values,
          fileSha256: preview.fileSha256,
          leaveOutUnreadable: leaveOut,
          chargeKinds,
        },
        acceptImportOutput,
      ),
    onDone: async ({ statementId }) => {
      queries.removeQueries({ queryKey: ['statements', 'list'] });
      queries.removeQueries({ queryKey: ['imports'] });
      router.push(routes.statement(statementId));
    },
  });
  const { register, errorOf, pending } = state;
  return (
    <Section title={words.about}>
      <ApiForm state={state} className="grid max-w-4xl gap-4">
        <div className="grid gap-4 sm:grid-cols-3">
          <TextField label={words.number} error={errorOf('number')} {...register('number')} />
          <TextField
            label={words.from}
            type="date"
            error={errorOf('periodStart')}
            {...register('periodStart')}
          />
          <TextField
            label={words.to}
            type="date"
            error={errorOf('periodEnd')}
            {...register('periodEnd')}
          />
          <TextField
            label={words.opening}
            hint={words.optional}
            inputMode="decimal"
            error={errorOf('openingBalance')}
            {...register('openingBalance')}
          />
          <TextField
            label={words.closing}
            hint={words.optional}
            inputMode="decimal"
            error={errorOf('closingBalance')}
            {...register('closingBalance')}
          />
        </div>
        {failed > 0 && (
          <CheckField
            label={words.leaveOut(failed)}
            checked={leaveOut}
            onChange={(event) => setLeaveOut(event.target.checked)}
          />
        )}
        {toCreate === 0 ? (
          <Notice tone="info">{words.nothingNew}</Notice>
        ) : (
          <Button type="submit" pending={pending} className="justify-self-start">
            {words.accept(toCreate)}
          </Button>
        )}
      </ApiForm>
    </Section>
  );
}
