import type { VarianceKind } from '../../../domain/variance/finding';

/** What each kind of variance is called on screens and in credit requests. */
export const varianceKinds: Record<VarianceKind, string> = {
  billedNotDelivered: 'Billed, not delivered',
  deliveredNotBilled: 'Delivered, not billed',
  billedTwice: 'Billed twice',
  yardsDiffer: 'Yards differ',
  mixDiffers: 'Mix differs',
  priceDiffers: 'Price differs',
  shortLoadNotOwed: 'Short load not owed',
  shortLoadWrongAmount: 'Short load, wrong amount',
  waitingNotOwed: 'Waiting not owed',
  waitingWrongMinutes: 'Waiting, wrong minutes',
  waitingWrongAmount: 'Waiting, wrong amount',
  waitingNotProvable: 'Waiting not provable',
  pumpMinimumWrong: 'Pump minimum wrong',
  pumpHoursDiffer: 'Pump hours differ',
  pumpYardsDiffer: 'Pump yards differ',
  feeNotAgreed: 'Fee not agreed',
  feeWrongAmount: 'Fee, wrong amount',
  taxWrong: 'Tax wrong',
  arithmeticWrong: 'Arithmetic wrong',
};
