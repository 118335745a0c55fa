declare const idBrand: unique symbol;

/** A UUID that says which kind of record it names, so that ids can't be mixed up. */
export type Id<Kind extends string> = string & { readonly [idBrand]: Kind };

export type CompanyId = Id<'company'>;
export type PersonId = Id<'person'>;
