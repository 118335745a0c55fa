'use client';

import type { SheetRow } from '@/lib/contracts/sheet';
import { LedgerGrid, type LedgerGridProps } from './ledger-grid';

const keyOf = (row: SheetRow) => row.key;
const CLASSES = { struck: ({ data }: { data: SheetRow | undefined }) => data?.settled != null };

/** The ledger grid with the rows of a strike-off sheet, in a part of its own: phones don't load it. */
export function SheetGrid(props: Omit<LedgerGridProps<SheetRow>, 'keyOf' | 'rowClasses'>) {
  return <LedgerGrid<SheetRow> {...props} keyOf={keyOf} rowClasses={CLASSES} />;
}
