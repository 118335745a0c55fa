import type { CompanyId, PersonId } from '../domain/ids';
import type { Role } from './policy';

/** Who is asking: a person's session, or a script with an access key. */
export interface Actor {
  readonly personId: PersonId;
  readonly companyId: CompanyId;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly locale: 'en' | 'es';
  /** Field-level: without it, no answer may carry a price, an amount or a cost. */
  readonly seesPrices: boolean;
  /** Without it, only jobs of the person's own crew exist. */
  readonly seesAllJobs: boolean;
  readonly via: 'session' | 'accessKey';
  /** The stored id of the session the request came with; null for an access key. */
  readonly sessionId: string | null;
}
