import type { Metadata } from 'next';
import Link from 'next/link';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { Difference } from '@/components/ui/figures';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { Section } from '@/components/ui/section';
import { StatusText } from '@/components/ui/status-text';
import type { RateSheetRow } from '@/lib/contracts/suppliers';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { getSupplier } from '@/lib/services/suppliers/get-supplier';
import { dayText } from '@/lib/text/format';
import { rateWords, supplierWords as words } from '@/lib/text/messages/en/suppliers';

export const metadata: Metadata = { title: words.title };

export default async function SupplierPage({
  params,
}: {
  params: Promise<{ supplierId: string }>;
}) {
  const actor = await requirePage('suppliers.read');
  const { supplierId } = await params;
  const supplier = await ask(getSupplier, actor, { supplierId });
  return (
    <>
      <DocumentHead
        kind={`${words.kindOf}, ${words.kinds[supplier.kind]}`}
        title={supplier.name}
        facts={[
          { label: words.dispatchEmail, value: supplier.dispatchEmail || '–' },
          { label: words.creditEmail, value: supplier.creditEmail || '–' },
          { label: words.phone, value: supplier.phone || '–' },
          { label: words.accountNumber, value: supplier.accountNumber || '–' },
        ]}
        figures={[{ label: words.openAgainst, value: <Difference value={supplier.openAgainst} /> }]}
        actions={<LinkButton href={routes.editSupplier(supplierId)}>{words.edit}</LinkButton>}
      />
      <p className="flex flex-wrap gap-x-6 gap-y-1 px-4 pt-3 text-[14.5px] md:px-6">
        <Link href={`${routes.statements()}?supplierId=${supplierId}`}>{words.seeStatements}</Link>
        <Link href={`${routes.variances()}?supplierId=${supplierId}`}>{words.seeVariances}</Link>
        <Link href={`${routes.importStatement()}?supplierId=${supplierId}`}>{words.importOne}</Link>
        <span className="text-ink-soft">{words.layouts(supplier.rememberedLayouts)}</span>
      </p>
      <Section
        title={words.rateSheets}
        action={<LinkButton href={routes.newRateSheet(supplierId)}>{words.newSheet}</LinkButton>}
        bleed
      >
        <RateSheets rows={supplier.rateSheets} />
      </Section>
    </>
  );
}

function RateSheets({ rows }: { rows: readonly RateSheetRow[] }) {
  if (rows.length === 0) {
    return <p className="px-4 pb-4 text-ink-soft md:px-6">{words.noSheets}</p>;
  }
  return (
    <RuledTable caption={words.rateSheets} slipsOnPhone>
      <thead>
        <tr>
          <Th>{rateWords.name}</Th>
          <Th>{rateWords.version}</Th>
          <Th>{rateWords.forJob}</Th>
          <Th>{rateWords.period}</Th>
          <Th>{rateWords.status}</Th>
          <Th>{rateWords.approvedBy}</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="hover:bg-band">
            <Td>
              <Link href={routes.rateSheet(row.id)} className="font-semibold">
                {row.name}
              </Link>
            </Td>
            <Td>
              <span className="md:hidden">{rateWords.version} </span>
              {row.version}
            </Td>
            <Td>{row.jobName ?? rateWords.general}</Td>
            <Td>
              {dayText(row.effectiveFrom)} –{' '}
              {row.effectiveTo ? dayText(row.effectiveTo) : rateWords.open}
            </Td>
            <Td>
              <StatusText look={row.status === 'approved' ? 'done' : 'waiting'}>
                {rateWords.statuses[row.status]}
              </StatusText>
            </Td>
            <Td>{row.approvedBy ?? '–'}</Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
