'use client';

import type { SheetRow } from '@/lib/contracts/sheet';
import { LedgerGrid, type LedgerGridProps } from './ledger-grid';
import { SHEET_COLUMNS } from './sheet-columns';

const keyOf = (row: SheetRow) => row.key;
const CLASSES = { struck: ({ data }: { data: SheetRow | undefined }) => data?.settled != null };

/** The ledger grid with the rows of a strike-off sheet, in a part of its own: phones don't load it. */
export function SheetGrid(
  props: Omit<LedgerGridProps<SheetRow>, 'keyOf' | 'rowClasses' | 'columns'>,
) {
  return (
    <LedgerGrid<SheetRow> {...props} columns={SHEET_COLUMNS} keyOf={keyOf} rowClasses={CLASSES} />
  );
}
