declare const idBrand: unique symbol;

/** A UUID that says which kind of record it names, so that ids can't be mixed up. */
export type Id<Kind extends string> = string & { readonly [idBrand]: Kind };

export type CompanyId = Id<'company'>;
export type PersonId = Id<'person'>;
export type SupplierId = Id<'supplier'>;
export type JobId = Id<'job'>;
export type PlacementId = Id<'placement'>;
export type OrderId = Id<'order'>;
export type TicketId = Id<'ticket'>;
export type PumpTicketId = Id<'pumpTicket'>;
export type BillLineId = Id<'billLine'>;
export type StatementId = Id<'statement'>;
export type RateSheetId = Id<'rateSheet'>;
export type ClauseId = Id<'clause'>;
