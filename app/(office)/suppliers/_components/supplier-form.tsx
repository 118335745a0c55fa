'use client';

import { useRouter } from 'next/navigation';
import { z } from 'zod';
import { ApiForm } from '@/components/forms/api-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { CheckField, SelectField, TextField } from '@/components/ui/field';
import type { SupplierRow } from '@/lib/contracts/suppliers';
import { SUPPLIER_KINDS, supplierFields, supplierRow } from '@/lib/contracts/suppliers';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { supplierWords as words } from '@/lib/text/messages/en/suppliers';

const form = z.object({ ...supplierFields, archived: z.boolean() });

/** A new supplier, or a change to one. */
export function SupplierForm({ supplier }: { supplier: SupplierRow | null }) {
  const router = useRouter();
  const state = useApiForm({
    schema: form,
    defaultValues: supplier ?? {
      name: '',
      kind: 'readyMix' as const,
      dispatchEmail: '',
      creditEmail: '',
      phone: '',
      accountNumber: '',
      archived: false,
    },
    send: ({ archived, ...values }) =>
      supplier
        ? apiSend('PUT', `/api/suppliers/${supplier.id}`, { ...values, archived }, supplierRow)
        : apiSend('POST', '/api/suppliers', values, supplierRow),
    onDone: ({ id }) => {
      router.push(routes.supplier(id));
      router.refresh();
    },
  });
  const { register, errorOf } = state;
  return (
    <ApiForm state={state} className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <div className="grid gap-4 sm:grid-cols-[1fr_12rem]">
        <TextField label={words.name} {...register('name')} error={errorOf('name')} />
        <SelectField label={words.kind} {...register('kind')} error={errorOf('kind')}>
          {SUPPLIER_KINDS.map((kind) => (
            <option key={kind} value={kind}>
              {words.kinds[kind]}
            </option>
          ))}
        </SelectField>
        <TextField
          label={words.dispatchEmail}
          hint={words.dispatchHint}
          inputMode="email"
          {...register('dispatchEmail')}
          error={errorOf('dispatchEmail')}
        />
        <TextField label={words.phone} {...register('phone')} error={errorOf('phone')} />
        <TextField
          label={words.creditEmail}
          inputMode="email"
          {...register('creditEmail')}
          error={errorOf('creditEmail')}
        />
        <TextField
          label={words.accountNumber}
          {...register('accountNumber')}
          error={errorOf('accountNumber')}
        />
      </div>
      {supplier && <CheckField label={words.archived} {...register('archived')} />}
      <Button type="submit" pending={state.pending} className="justify-self-start">
        {words.save}
      </Button>
    </ApiForm>
  );
}
