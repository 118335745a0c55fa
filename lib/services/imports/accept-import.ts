import type { z } from 'zod';
import {
  findImport,
  rememberLayout,
  type StoredImport,
  updateImport,
} from '../../../db/queries/imports';
import {
  findStatement,
  insertBillLines,
  insertInvoices,
  insertStatement,
  type NewBillLine,
} from '../../../db/queries/statements';
import type { BillCsvPreview, ImportItem } from '../../../importers/core/plan';
import { acceptImportInput, acceptImportOutput } from '../../contracts/imports';
import type { Result } from '../../domain/result';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { getBlob } from '../../storage/blob-store';
import type { Ctx } from '../context';
import type { Failure } from '../failure';
import { failure, notFound } from '../failure';
import { keepFindings } from '../statements/keep-findings';
import { defineVerb } from '../verb';
import { noLongerWaiting } from './internal';
import { readImport } from './read-file';

type Input = z.output<typeof acceptImportInput>;
type Prepared = Input & { readonly bytes?: Uint8Array };

const LINE_KINDS = { line: 'charge', tax: 'tax', credit: 'credit', payment: 'payment' } as const;

/** What the importer's plan item becomes in the ledger; null for what is not a billed line. */
function lineOf(
  item: ImportItem,
  chosen: Input['chargeKinds'],
): Omit<NewBillLine, 'id' | 'supplierId' | 'statementId' | 'position' | 'invoiceId'> | null {
  const { values, rowKind } = item;
  if (item.action !== 'create' || values.amount === null) return null;
  if (rowKind !== 'line' && rowKind !== 'tax' && rowKind !== 'credit' && rowKind !== 'payment') {
    return null;
  }
  return {
    sourceLine: item.sourceLine,
    rowKey: item.rowKey,
    lineKind: LINE_KINDS[rowKind],
    chargeKind: chosen[item.rowKey] ?? item.chargeKind,
    date: values.date,
    ticketNumber: values.ticketNumber,
    jobName: values.jobName,
    truck: values.truck,
    description: values.description,
    mixCode: values.mixCode,
    quantity: values.quantity,
    unit: values.unit,
    unitPrice: values.unitPrice,
    amount: values.amount,
  };
}

function refusedPreview(preview: BillCsvPreview, input: Input): Failure | null {
  const { failed, toCreate } = preview.totals;
  if (!preview.readable || toCreate === 0) {
    return failure(
      'conflict',
      `${preview.fileName} has no new line to take in. Nothing was written.`,
    );
  }
  if (failed > 0 && !input.leaveOutUnreadable) {
    const rows = failed === 1 ? 'One row' : `${failed} rows`;
    return failure(
      'conflict',
      `${rows} of ${preview.fileName} could not be read. Correct the columns, or say that they ` +
        'are to be left out. Nothing was written.',
      [{ path: 'leaveOutUnreadable', message: 'rows would be left out' }],
    );
  }
  return null;
}

async function store(
  ctx: Ctx,
  input: Input,
  stored: StoredImport,
  preview: BillCsvPreview,
): Promise<Result<{ statementId: string; lines: number }, Failure>> {
  const { supplierId } = stored;
  const statementId = newId<'statement'>();
  const { number, periodStart, periodEnd, openingBalance, closingBalance } = input;
  const facts = { supplierId, number, periodStart, periodEnd, openingBalance, closingBalance };
  if (!(await insertStatement(ctx.scope, statementId, facts))) {
    return fail(
      failure(
        'conflict',
        `${stored.supplierName} has a statement ${number} already. Give this one another number.`,
        [{ path: 'number', message: 'already used' }],
      ),
    );
  }
  const items = preview.items.flatMap((item) => {
    const line = lineOf(item, input.chargeKinds);
    return line ? [{ line, invoiceNumber: item.values.invoiceNumber }] : [];
  });
  const dates = new Map<string, string | null>();
  for (const { line, invoiceNumber } of items) {
    if (invoiceNumber && !dates.has(invoiceNumber)) dates.set(invoiceNumber, line.date ?? null);
  }
  const invoiceIds = await insertInvoices(
    ctx.scope,
    { id: statementId, supplierId },
    [...dates].map(([number, date]) => ({ number, date })),
  );
  const added = await insertBillLines(
    ctx.scope,
    items.map(({ line, invoiceNumber }, index) => ({
      ...line,
      id: newId<'billLine'>(),
      supplierId,
      statementId,
      position: index + 1,
      invoiceId: invoiceIds.get(invoiceNumber ?? '') ?? null,
    })),
  );
  if (added !== items.length) {
    return fail(
      failure(
        'conflict',
        'Some of these lines were taken in from another file at the same moment. ' +
          'Look at the preview again; nothing of this file was written.',
      ),
    );
  }
  return ok({ statementId, lines: added });
}

export const acceptImport = defineVerb({
  name: 'imports.accept',
  says: 'Take a looked-at file into the ledger as a statement, all of it or nothing',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/imports/{importId}/accept' },
  input: acceptImportInput,
  output: acceptImportOutput,
  async prepare(input): Promise<Result<Prepared, Failure>> {
    const bytes = await getBlob(input.fileSha256);
    return ok(bytes ? { ...input, bytes } : input);
  },
  async run(ctx, { bytes, ...input }: Prepared) {
    const stored = await findImport(ctx.scope, input.importId, true);
    if (!stored) return fail(notFound('upload'));
    // Whose file it is was settled above: the hash alone opens nobody's statement.
    if (stored.sha256 !== input.fileSha256 || !bytes) {
      return fail(failure('conflict', 'This is not the file of the preview. Load the page again.'));
    }
    if (stored.status === 'accepted' && stored.statementId) {
      ctx.unchanged();
      return ok({ statementId: stored.statementId, lines: 0, repeated: true });
    }
    const waiting = noLongerWaiting(stored);
    if (waiting) return fail(waiting);
    const { preview } = await readImport(ctx.scope, stored, bytes);
    const refused = refusedPreview(preview, input);
    if (refused) return fail(refused);
    const written = await store(ctx, input, stored, preview);
    if (!written.ok) return written;
    const { statementId, lines } = written.value;
    await updateImport(ctx.scope, stored.id, {
      status: 'accepted',
      statementId,
      acceptedAt: ctx.clock.now(),
    });
    await rememberLayout(ctx.scope, stored.supplierId, preview.layout);
    const statement = await findStatement(ctx.scope, statementId);
    if (!statement) throw new Error('The statement just added is missing');
    await keepFindings(ctx.scope, statement, ctx.company);
    const leftOut = preview.totals.failed;
    await ctx.record({
      action: 'imports.accept',
      entity: 'statement',
      entityId: statementId,
      summary:
        `Took in ${lines} lines of ${stored.fileName} as statement ${statement.number} of ` +
        `${stored.supplierName}${leftOut > 0 ? `, leaving out ${leftOut} unreadable rows` : ''}`,
      after: { importId: stored.id, fileSha256: stored.sha256, leftOut, totals: preview.totals },
    });
    return ok({ statementId, lines, repeated: false });
  },
});
