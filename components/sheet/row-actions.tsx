'use client';

import type { SheetRow } from '@/lib/contracts/sheet';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { Button } from '../ui/button';
import { Key } from './keys-dialog';
import { canBeStruck } from './sums';

interface RowActionsProps {
  row: SheetRow;
  onStrike: () => void;
  onClaim: () => void;
  onAccept: () => void;
  onMatch: () => void;
  onOpenAgain: () => void;
}

/** What can be done with the chosen row; the likeliest first. */
export function RowActions(props: RowActionsProps) {
  const { row, onStrike, onClaim, onAccept, onMatch, onOpenAgain } = props;
  const canMatch = row.kind === 'charge';
  if (row.settled) {
    return (
      <Button variant="quiet" onClick={onOpenAgain}>
        {words.openAgain} <Key>o</Key>
      </Button>
    );
  }
  return (
    <div className="flex flex-wrap gap-2">
      {canBeStruck(row) && (
        <Button onClick={onStrike}>
          {words.strike} <Key>space</Key>
        </Button>
      )}
      {row.verdict === 'finding' && (
        <Button onClick={onClaim}>
          {words.claim} <Key>c</Key>
        </Button>
      )}
      {!canBeStruck(row) && (
        <Button variant="quiet" onClick={onAccept}>
          {words.accept} <Key>a</Key>
        </Button>
      )}
      {canMatch && (
        <Button variant="quiet" onClick={onMatch}>
          {words.match} <Key>m</Key>
        </Button>
      )}
    </div>
  );
}
