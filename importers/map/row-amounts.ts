import { extend, money, moneyText, quantity } from '@/lib/domain/money/money';
import type { RowKind } from '../core/plan';
import type { RowCells, RowInput } from './row-cells';

export interface Amounts {
  readonly quantity: { text: string; unit: string | null } | null;
  readonly unitPrice: string | null;
  readonly charge: string | null;
  readonly credit: string | null;
  readonly tax: string | null;
}

export function isZero(text: string | null): boolean {
  return text === null || money(text).isZero();
}

export function readAmounts(cells: RowCells): Amounts {
  return {
    quantity: cells.number('quantity'),
    unitPrice: cells.number('unitPrice')?.text ?? null,
    charge: cells.number('amount')?.text ?? null,
    credit: cells.number('creditAmount')?.text ?? null,
    tax: cells.number('taxAmount')?.text ?? null,
  };
}

function product(amounts: Amounts): string | null {
  if (amounts.quantity === null || amounts.unitPrice === null) return null;
  return moneyText(extend(quantity(amounts.quantity.text), money(amounts.unitPrice)));
}

/** The signed amount of a line, as printed; says what is missing or contradictory. */
export function printedAmount(cells: RowCells, row: RowInput, amounts: Amounts): string | null {
  const { charge, credit } = amounts;
  if (!isZero(charge) && !isZero(credit)) {
    cells.observe('creditAmount', {
      code: 'cell.bothAmounts',
      severity: 'error',
      expected: 'an amount in one of the two columns',
      got: `${charge} and ${credit}`,
      sentence: `Line ${row.line} has ${charge} as a charge and ${credit} as a credit.`,
      hint: 'Split it into two lines in the file, or map only one of the columns.',
    });
    return null;
  }
  if (credit !== null && !isZero(credit)) return moneyText(money(credit).abs().negated());
  if (charge !== null) return moneyText(money(charge));
  if (credit !== null) return moneyText(money(credit));
  return cells.columnOf('amount') === null && cells.columnOf('creditAmount') === null
    ? product(amounts)
    : null;
}

export function observeMissingAmount(cells: RowCells, row: RowInput, amounts: Amounts): void {
  const alreadySaid = cells.observations.some((found) => found.severity === 'error');
  if (alreadySaid) return;
  const column = cells.columnOf('amount');
  const worked = product(amounts);
  const short = column !== null && row.cells.length <= column;
  cells.observe('amount', {
    code: short ? 'row.missingColumns' : 'cell.amountMissing',
    severity: 'error',
    ...(worked === null ? {} : { expected: worked }),
    got: short ? `${row.cells.length} cells` : 'an empty cell',
    sentence: short
      ? `Line ${row.line} ends before the amount: it has only ${row.cells.length} cells.`
      : `Line ${row.line} has no amount.`,
    hint:
      worked === null
        ? 'Ask the supplier for the amount, or leave the line out.'
        : `Quantity × unit price would be ${worked}: write it into the file if that is right.`,
  });
}

/** Credits and payments count as negative, however they are printed. */
export function signedAmount(
  cells: RowCells,
  row: RowInput,
  kind: RowKind,
  amount: string,
): string {
  const value = money(amount);
  if ((kind !== 'credit' && kind !== 'payment') || value.lte(0)) return amount;
  cells.observe('amount', {
    code: 'row.signTurned',
    severity: 'guess',
    got: amount,
    expected: moneyText(value.negated()),
    sentence: `Line ${row.line} reads as a ${kind} and is counted as −${moneyText(value)}.`,
    hint: 'If it is a charge, correct its description in the file.',
  });
  return moneyText(value.negated());
}

/** Whether quantity × price shows the tax to be inside the amount, outside it, or neither. */
function taxInside(worked: string | null, amount: string, tax: string): boolean | null {
  if (worked === null) return null;
  const beyond = money(amount).minus(worked);
  if (beyond.abs().lte('0.01')) return false;
  return beyond.minus(tax).abs().lte('0.01') ? true : null;
}

export function withoutTax(
  cells: RowCells,
  row: RowInput,
  amounts: Amounts,
  amount: string,
): string {
  const { tax } = amounts;
  if (tax === null || isZero(tax)) return amount;
  const inside = taxInside(product(amounts), amount, tax);
  if (inside === true) return moneyText(money(amount).minus(tax));
  if (inside === null) {
    cells.observe('taxAmount', {
      code: 'line.taxIncludedGuessed',
      severity: 'guess',
      sentence: `Line ${row.line}: the tax of ${tax} is taken to come on top of ${amount}.`,
      hint: 'If the amount includes it, do not map the tax column.',
    });
  }
  return amount;
}

export function checkExtension(
  cells: RowCells,
  row: RowInput,
  amounts: Amounts,
  amount: string,
): void {
  const worked = product(amounts);
  if (worked === null || money(amount).abs().minus(money(worked).abs()).abs().lte('0.01')) return;
  cells.observe('amount', {
    code: 'line.extensionDiffers',
    severity: 'warning',
    expected: worked,
    got: amount,
    sentence: `Line ${row.line}: ${amounts.quantity?.text} × ${amounts.unitPrice} is ${worked}, the bill says ${amount}.`,
    hint: 'The line is imported as billed; the difference will stand on the strike-off sheet.',
  });
}
