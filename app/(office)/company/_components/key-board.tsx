'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import { ApiForm } from '@/components/forms/api-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { EmptyState } from '@/components/ui/empty';
import { TextField } from '@/components/ui/field';
import { Section } from '@/components/ui/section';
import type { KeyRow, listKeysOutput } from '@/lib/contracts/keys';
import { issueKeyInput, issueKeyOutput, keyRow } from '@/lib/contracts/keys';
import { apiSend } from '@/lib/queries/api';
import { keysQuery } from '@/lib/queries/company';
import { company } from '@/lib/text/messages/en/company';
import { KeyTable } from './key-table';
import { NewKey } from './new-key';

const words = company.keys;

export function KeyBoard({ first }: { first: z.output<typeof listKeysOutput> }) {
  const queries = useQueryClient();
  const { data } = useQuery({ ...keysQuery(), initialData: first });
  const [issued, setIssued] = useState<string | null>(null);
  const [revoking, setRevoking] = useState<KeyRow | null>(null);
  const refresh = () => queries.invalidateQueries({ queryKey: keysQuery().queryKey });
  const state = useApiForm({
    schema: issueKeyInput,
    defaultValues: { name: '' },
    send: (values) => apiSend('POST', '/api/keys', values, issueKeyOutput),
    async onDone({ key }) {
      setIssued(key);
      state.form.reset();
      await refresh();
    },
  });
  async function revoke() {
    if (!revoking) return;
    await apiSend('DELETE', `/api/keys/${revoking.id}`, {}, keyRow);
    await refresh();
  }
  return (
    <>
      <Section title={words.title} className="max-w-4xl">
        <p className="max-w-2xl text-[14.5px] text-ink-soft">
          {words.says} <code className="font-code text-ink">Authorization: Bearer …</code> ·{' '}
          <a href="/api/openapi.json">{words.description}</a>
        </p>
        {issued && <NewKey secret={issued} />}
        <ApiForm state={state} className="mt-4 flex flex-wrap items-start gap-3">
          <TextField
            label={words.name}
            hint={words.nameHint}
            autoComplete="off"
            fieldClassName="w-full md:w-96"
            {...state.register('name')}
            error={state.errorOf('name')}
          />
          <Button type="submit" pending={state.pending} className="md:mt-[1.45rem]">
            {words.issueSubmit}
          </Button>
        </ApiForm>
      </Section>
      {data.rows.length === 0 ? (
        <div className="px-4 md:px-6">
          <EmptyState title={words.emptyTitle}>{words.emptySays}</EmptyState>
        </div>
      ) : (
        <div className="mt-4 max-w-4xl">
          <KeyTable rows={data.rows} onRevoke={setRevoking} />
        </div>
      )}
      <ConfirmDialog
        open={revoking !== null}
        onClose={() => setRevoking(null)}
        title={words.revokeTitle(revoking?.name ?? '')}
        confirm={words.revoke}
        danger
        onConfirm={revoke}
      >
        {words.revokeSays}
      </ConfirmDialog>
    </>
  );
}
