import type { ReactNode } from 'react';
import type { Sheet } from '@/lib/contracts/sheet';
import { moneyFigure, periodText, signOf } from '@/lib/text/format';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { DocumentHead } from '../ui/document-head';
import { Difference } from '../ui/figures';
import { Moment } from '../ui/where';
import type { SheetSums } from './sums';

interface SheetHeadProps {
  statement: Sheet['statement'];
  sums: SheetSums;
  actions: ReactNode;
}

/** The document's head: who billed, which days, and what it comes to. */
export function SheetHead({ statement, sums, actions }: SheetHeadProps) {
  const { number, periodStart, periodEnd, supplierName, closedAt, closedBy } = statement;
  return (
    <DocumentHead
      kind={words.kind}
      title={supplierName}
      facts={[
        {
          label: words.numberPeriod,
          value: (
            <>
              <span className="font-code">{number}</span> · {periodText(periodStart, periodEnd)}
            </>
          ),
        },
        ...(closedAt
          ? [
              {
                label: words.closedLabel,
                value: (
                  <>
                    {closedBy && `${closedBy}, `}
                    <Moment at={closedAt} />
                  </>
                ),
              },
            ]
          : []),
      ]}
      figures={[
        { label: words.billed, value: moneyFigure(sums.billed) },
        { label: words.expected, value: moneyFigure(sums.expected) },
        { label: words.against, value: <Difference value={sums.openAgainst} /> },
        ...(signOf(sums.openFavour) === 'zero'
          ? []
          : [{ label: words.favour, value: <Difference value={sums.openFavour} /> }]),
      ]}
      actions={actions}
    />
  );
}
