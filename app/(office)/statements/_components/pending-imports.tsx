import Link from 'next/link';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { Section } from '@/components/ui/section';
import type { PendingImport } from '@/lib/contracts/imports';
import { routes } from '@/lib/routes';
import { preview, statements as words } from '@/lib/text/messages/en/statements';

/** Files that were uploaded and not yet taken in; nothing where there are none. */
export function PendingImports({ rows }: { rows: readonly PendingImport[] }) {
  if (rows.length === 0) return null;
  return (
    <Section title={words.waiting} says={words.waitingSays} bleed>
      <RuledTable caption={words.waiting} slipsOnPhone>
        <thead>
          <tr>
            <Th>{preview.file}</Th>
            <Th>{words.columns.supplier}</Th>
            <Th align="right">{words.uploaded}</Th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id}>
              <Td>
                <Link href={routes.importPreview(row.id)} className="font-semibold">
                  {row.fileName}
                </Link>{' '}
                <span className="text-[13px] text-ink-soft">{words.size(row.sizeBytes)}</span>
              </Td>
              <Td>{row.supplierName}</Td>
              <Td align="right">{row.uploadedBy ?? '–'}</Td>
            </tr>
          ))}
        </tbody>
      </RuledTable>
    </Section>
  );
}
