import type { CompanyId } from '../lib/domain/ids';
import type { Handle } from './client';

/**
 * The only way to the tables: a company and a connection together. Every function in db/queries
 * takes one, so no query can be written that forgets whose rows it may see.
 */
export interface Scope {
  readonly companyId: CompanyId;
  readonly handle: Handle;
}

/** Runs `work` in a transaction of `scope`; inside one already, in a savepoint. */
export function inTx<T>(scope: Scope, work: (scope: Scope) => Promise<T>): Promise<T> {
  return scope.handle.transaction((handle) =>
    work({ companyId: scope.companyId, handle: handle as unknown as Handle }),
  );
}
