import type { SheetRow } from '@/lib/contracts/sheet';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { varianceKinds } from '@/lib/text/messages/en/variance-kinds';

/** "Yards differ", "agrees": the finding's name, or that there is none. */
export function findingText(row: SheetRow): string {
  if (row.kind === 'credit') return words.credit;
  if (row.kind === 'payment') return words.payment;
  if (row.findings.length === 0) return words.verdicts[row.verdict];
  return row.findings.map((finding) => varianceKinds[finding.kind]).join(', ');
}
