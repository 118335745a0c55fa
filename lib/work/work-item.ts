import type { Store } from '../../db/client';
import type { Clock } from '../clock';

export type WorkKind = 'readPhoto' | 'sendMail';

/** One piece of work as its handler gets it. */
export interface WorkItem {
  readonly id: string;
  readonly companyId: string;
  readonly kind: WorkKind;
  /** The photo, the message: what the work is about. */
  readonly subjectId: string;
  /** 1 at the first try. */
  readonly attempt: number;
}

/**
 * Does one piece of work. It may run twice for one item (a crash after the work, before the item
 * is marked done), so it must be harmless to repeat. It throws to be tried again later, and
 * throws `GiveUp` where trying again can't help.
 */
export type Handler = (item: WorkItem, store: Store, clock: Clock) => Promise<void>;

export class GiveUp extends Error {
  override readonly name = 'GiveUp';
}
