import type { VarianceKind } from '../../lib/domain/variance/finding';
import type { SupplierKey } from './story';

/** One way in which a demo bill departs from what was agreed and delivered. */
export interface Plant {
  readonly supplier: SupplierKey;
  readonly month: string;
  /** The ticket as our copy numbers it; for tax, the invoice. */
  readonly on: string;
  readonly kind: VarianceKind;
  readonly change:
    | { readonly do: 'quantity'; readonly charge: string; readonly quantity: string }
    | { readonly do: 'price'; readonly charge: string; readonly price: string }
    | { readonly do: 'amount'; readonly charge: string; readonly amount: string }
    | { readonly do: 'mix'; readonly mixCode: string; readonly price: string }
    | { readonly do: 'leaveOut' }
    | { readonly do: 'repeat'; readonly charge: string; readonly date: string }
    | { readonly do: 'taxRate'; readonly percent: string }
    | {
        readonly do: 'add';
        readonly charge: string;
        readonly description: string;
        readonly quantity: string;
        readonly unit: string;
        readonly price: string;
      }
    | { readonly do: 'phantom'; readonly like: string };
  /** How many lines of the sheet carry the finding. */
  readonly lines: number;
  readonly says: string;
}

const november = { supplier: 'cinderRidge', month: '2026-11' } as const;

/** Everything that is wrong in the demo's statements, and nothing else is. */
export const PLANTS: readonly Plant[] = [
  {
    ...november,
    on: '558703',
    kind: 'yardsDiffer',
    change: { do: 'quantity', charge: 'mix', quantity: '10.50' },
    lines: 1,
    says: 'Ticket says 10.00 yd³, the bill 10.50',
  },
  {
    ...november,
    on: '558709',
    kind: 'billedNotDelivered',
    change: { do: 'phantom', like: '558705' },
    lines: 3,
    says: 'No such ticket came to the job',
  },
  {
    ...november,
    on: '558884',
    kind: 'deliveredNotBilled',
    change: { do: 'leaveOut' },
    lines: 1,
    says: 'Delivered on the last day, not on the bill',
  },
  {
    ...november,
    on: '558731',
    kind: 'billedTwice',
    change: { do: 'repeat', charge: 'mix', date: '2026-11-09' },
    lines: 1,
    says: 'The concrete of one load billed again three days later',
  },
  {
    ...november,
    on: '558572',
    kind: 'billedTwice',
    change: { do: 'repeat', charge: 'mix', date: '2026-11-02' },
    lines: 1,
    says: 'A load of 30 October, already on the October bill',
  },
  {
    ...november,
    on: '558761',
    kind: 'priceDiffers',
    change: { do: 'price', charge: 'mix', price: '156.00' },
    lines: 1,
    says: 'Mix 3500 at 156.00, agreed 154.00',
  },
  {
    ...november,
    on: '558853',
    kind: 'shortLoadNotOwed',
    change: {
      do: 'add',
      charge: 'shortLoad',
      description: 'Short load charge',
      quantity: '1',
      unit: 'EA',
      price: '120.00',
    },
    lines: 1,
    says: '5.50 yd³ is not under 5 yd³',
  },
  {
    ...november,
    on: '558806',
    kind: 'shortLoadWrongAmount',
    change: { do: 'price', charge: 'shortLoad', price: '150.00' },
    lines: 1,
    says: 'Short load at 150.00, agreed 120.00',
  },
  {
    ...november,
    on: '558812',
    kind: 'waitingNotOwed',
    change: {
      do: 'add',
      charge: 'waiting',
      description: 'Waiting time',
      quantity: '12',
      unit: 'MIN',
      price: '2.25',
    },
    lines: 1,
    says: 'The truck was away within its free time',
  },
  {
    ...november,
    on: '558704',
    kind: 'waitingWrongMinutes',
    change: { do: 'quantity', charge: 'waiting', quantity: '25' },
    lines: 1,
    says: '15 minutes over the free time, 25 billed',
  },
  {
    ...november,
    on: '558823',
    kind: 'waitingWrongAmount',
    change: { do: 'price', charge: 'waiting', price: '2.75' },
    lines: 1,
    says: 'Waiting at 2.75 a minute, agreed 2.25',
  },
  {
    ...november,
    on: '91196',
    kind: 'taxWrong',
    change: { do: 'taxRate', percent: '7.5' },
    lines: 1,
    says: 'Taxed at 7.5 %, the rate is 6.5 %',
  },
  {
    ...november,
    on: '558840',
    kind: 'arithmeticWrong',
    change: { do: 'amount', charge: 'mix', amount: '1651.00' },
    lines: 1,
    says: '10.00 × 161.50 is 1,615.00, not 1,651.00',
  },

  {
    supplier: 'halvorsen',
    month: '2026-11',
    on: 'H-40303',
    kind: 'mixDiffers',
    change: { do: 'mix', mixCode: 'HC45', price: '161.00' },
    lines: 1,
    says: 'HC45 billed, HC35 on the ticket',
  },
  {
    supplier: 'halvorsen',
    month: '2026-11',
    on: 'H-40307',
    kind: 'shortLoadWrongAmount',
    change: { do: 'quantity', charge: 'shortLoad', quantity: '3.00' },
    lines: 1,
    says: '2 yards short of 6, 3 billed',
  },
  {
    supplier: 'halvorsen',
    month: '2026-11',
    on: 'H-40327',
    kind: 'feeNotAgreed',
    change: {
      do: 'add',
      charge: 'perYardFee',
      description: 'Winter service',
      quantity: '7.00',
      unit: 'YD',
      price: '5.00',
    },
    lines: 1,
    says: 'No winter service is agreed',
  },

  {
    supplier: 'longreach',
    month: '2026-11',
    on: 'LR-677',
    kind: 'pumpMinimumWrong',
    change: {
      do: 'add',
      charge: 'pumpMinimum',
      description: 'Pump minimum 4 hours',
      quantity: '4.00',
      unit: 'HR',
      price: '195.00',
    },
    lines: 1,
    says: 'A minimum on top of hours that already exceed it',
  },
  {
    supplier: 'longreach',
    month: '2026-11',
    on: 'LR-683',
    kind: 'pumpYardsDiffer',
    change: { do: 'quantity', charge: 'pumpYards', quantity: '60.50' },
    lines: 1,
    says: '55.50 yd³ pumped, 60.50 billed',
  },
  {
    supplier: 'triCounty',
    month: '2026-11',
    on: '8861',
    kind: 'pumpHoursDiffer',
    change: { do: 'quantity', charge: 'pumpTime', quantity: '4.50' },
    lines: 1,
    says: '3.5 hours on site, 4.5 billed',
  },

  {
    supplier: 'cinderRidge',
    month: '2026-09',
    on: '558190',
    kind: 'waitingNotOwed',
    change: {
      do: 'add',
      charge: 'waiting',
      description: 'Waiting time',
      quantity: '8',
      unit: 'MIN',
      price: '2.25',
    },
    lines: 1,
    says: 'Settled: credit asked for',
  },
  {
    supplier: 'cinderRidge',
    month: '2026-10',
    on: '558455',
    kind: 'yardsDiffer',
    change: { do: 'quantity', charge: 'mix', quantity: '10.25' },
    lines: 1,
    says: 'Settled: credit asked for',
  },
  {
    supplier: 'halvorsen',
    month: '2026-10',
    on: 'H-40284',
    kind: 'priceDiffers',
    change: { do: 'price', charge: 'mix', price: '155.00' },
    lines: 1,
    says: 'Settled: accepted with a reason',
  },
];
