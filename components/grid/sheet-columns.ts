import type { ColDef, ColGroupDef } from 'ag-grid-community';
import type { SheetRow } from '@/lib/contracts/sheet';
import {
  dayWithoutYear,
  decimalFigure,
  differenceFigure,
  rateFigure,
  signOf,
  yardsFigure,
} from '@/lib/text/format';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { findingText } from '../sheet/finding-text';

type Column = ColDef<SheetRow>;

/** Decimal text in the order of its value, nothing first; never made into a float for the eye. */
function byValue(one: string | null, other: string | null): number {
  if (one === null || other === null) return Number(one !== null) - Number(other !== null);
  return Number(one) - Number(other);
}

const figure = (
  header: string,
  read: (row: SheetRow) => string | null,
  write: (text: string) => string,
  more: Partial<Column> = {},
): Column => ({
  headerName: header,
  valueGetter: ({ data }) => (data ? read(data) : null),
  valueFormatter: ({ value }) => (typeof value === 'string' ? write(value) : ''),
  comparator: byValue,
  width: 92,
  ...more,
  cellClass: `figure ${String(more.cellClass ?? '')}`,
  headerClass: `figure ${String(more.headerClass ?? '')}`,
});

const text = (
  header: string,
  read: (row: SheetRow) => string,
  more: Partial<Column> = {},
): Column => ({
  headerName: header,
  valueGetter: ({ data }) => (data ? read(data) : ''),
  ...more,
});

const delivered = { cellClass: 'copy-delivered', headerClass: 'copy-delivered' };
const billed = { cellClass: 'copy-billed', headerClass: 'copy-billed' };
const edge = (copy: string) => ({
  cellClass: `${copy} copy-edge`,
  headerClass: `${copy} copy-edge`,
});

/** The column of amounts says what they are; the sign would only take room. */
const bareRate = (text: string) => rateFigure(text).replace('$', '');

const only = (row: SheetRow) => (row.deliveries.length === 1 ? row.deliveries[0] : undefined);

/** What a row is short of on a side: said in words, never left as a hole. */
function ticketText(row: SheetRow): string {
  const [first] = row.deliveries;
  if (!first) {
    return row.kind === 'charge' && row.chargeKind !== 'tax' ? words.noTicket : '';
  }
  return row.deliveries.length === 1 ? first.number : words.loads(row.deliveries.length);
}

function lineText(row: SheetRow): string {
  if (!row.billed) return row.kind === 'unbilled' ? words.notOnBill : '';
  const { description, ticketNumber } = row.billed;
  return row.deliveries.length === 0 && ticketNumber
    ? `${description} ${ticketNumber}`
    : description;
}

/** The finding with what was decided about it, where that is more than a stroke. */
function decidedText(row: SheetRow): string {
  const { settled } = row;
  if (settled === null || settled.state === 'struck') return findingText(row);
  return `${words.states[settled.state]}: ${findingText(row)}`;
}

const orderedColumns: Column[] = [
  text(
    words.columns.job,
    (row) =>
      row.ordered?.jobName ?? row.billed?.jobName ?? (row.kind === 'charge' ? words.noOrder : ''),
    {
      flex: 3,
      minWidth: 104,
      tooltipValueGetter: ({ data }) =>
        [data?.ordered?.jobName, data?.ordered?.orderNumber].filter(Boolean).join(', '),
    },
  ),
  text(words.columns.mix, (row) => row.ordered?.mixCode ?? '', {
    width: 58,
    cellClass: 'font-code',
  }),
  figure(words.columns.orderedYards, (row) => row.ordered?.quantityYd3 ?? null, yardsFigure, {
    width: 64,
  }),
];

const deliveredColumns: Column[] = [
  text(words.columns.ticket, ticketText, {
    width: 74,
    cellClass: 'copy-delivered copy-edge font-code',
    headerClass: 'copy-delivered copy-edge',
  }),
  text(words.columns.date, (row) => row.deliveries[0]?.date ?? '', {
    width: 62,
    valueFormatter: ({ value }) => (value ? dayWithoutYear(value) : ''),
    ...delivered,
  }),
  figure(words.columns.deliveredYards, (row) => only(row)?.quantityYd3 ?? null, yardsFigure, {
    width: 58,
    ...delivered,
  }),
  text(
    words.columns.onSite,
    (row) => {
      const minutes = only(row)?.onSiteMinutes ?? null;
      return minutes === null ? '' : words.minutes(minutes);
    },
    {
      width: 66,
      comparator: (_one, _other, left, right) =>
        (left.data?.deliveries[0]?.onSiteMinutes ?? -1) -
        (right.data?.deliveries[0]?.onSiteMinutes ?? -1),
      cellClass: 'figure copy-delivered',
      headerClass: 'figure copy-delivered',
    },
  ),
];

const billedColumns: Column[] = [
  text(words.columns.line, lineText, {
    flex: 3,
    minWidth: 108,
    tooltipValueGetter: ({ data }) => data?.billed?.description ?? '',
    ...edge('copy-billed'),
  }),
  figure(words.columns.quantity, (row) => row.billed?.quantity ?? null, decimalFigure, {
    width: 60,
    ...billed,
  }),
  figure(words.columns.rate, (row) => row.billed?.unitPrice ?? null, bareRate, {
    width: 70,
    ...billed,
  }),
  figure(words.columns.amount, (row) => row.billed?.amount ?? null, decimalFigure, {
    width: 78,
    ...billed,
  }),
];

const findingColumns: Column[] = [
  text(words.columns.finding, decidedText, {
    flex: 3,
    minWidth: 124,
    ...edge(''),
    cellClassRules: { 'font-semibold': ({ data }) => data?.verdict === 'finding' },
    tooltipValueGetter: ({ data }) => data?.findings[0]?.sentence ?? data?.sentence ?? '',
  }),
  figure(words.columns.expected, (row) => row.expected, decimalFigure, { width: 78 }),
  figure(words.columns.difference, (row) => row.difference, differenceFigure, {
    // Room for the scrollbar, which lies over the last column.
    width: 98,
    cellClass: 'pr-5!',
    headerClass: 'pr-5!',
    cellClassRules: {
      'text-keel font-semibold': ({ data }) =>
        data !== undefined && data.verdict === 'finding' && signOf(data.difference) === 'positive',
      'text-moss font-semibold': ({ data }) =>
        data !== undefined && data.verdict === 'finding' && signOf(data.difference) === 'negative',
    },
  }),
];

/** The three copies side by side, and what comes of holding them against each other. */
export const SHEET_COLUMNS: ColGroupDef<SheetRow>[] = [
  { headerName: words.groups.ordered, children: orderedColumns },
  {
    headerName: words.groups.delivered,
    headerClass: 'copy-delivered copy-edge',
    children: deliveredColumns,
  },
  {
    headerName: words.groups.billed,
    headerClass: 'copy-billed copy-edge',
    children: billedColumns,
  },
  { headerName: words.groups.finding, headerClass: 'copy-edge', children: findingColumns },
];
