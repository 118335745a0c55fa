import { createHash } from 'node:crypto';
import type { FoundPumpTicket } from '../../../db/queries/pump-tickets';
import { isPumpNumberTaken } from '../../../db/queries/pump-tickets';
import { findOrderTie, findPlacement, isJobOf } from '../../../db/queries/ticket-ties';
import { holdTicketNumbers } from '../../../db/queries/tickets';
import type { PumpTicketRow } from '../../contracts/pump-tickets';
import type { Ctx } from '../context';
import type { Failure } from '../failure';
import { failure, notFound } from '../failure';
import { crewLimit } from '../tickets/internal';

/** A pump ticket as screens get it, under a revision that changes whenever any field does. */
export function pumpTicketAnswer(found: FoundPumpTicket): PumpTicketRow {
  const revision = createHash('sha256').update(JSON.stringify(found)).digest('hex').slice(0, 16);
  return { ...found, revision };
}

interface PumpTies {
  readonly number: string;
  readonly supplierId: string;
  readonly jobId: string;
  readonly placementId: string | null;
  readonly orderId: string | null;
}

/** Whether a pump ticket may be tied to what it names, and its number is free; null when so. */
export async function checkPumpTies(
  { scope, actor }: Ctx,
  ties: PumpTies,
  exceptId: string | null,
): Promise<Failure | null> {
  if (!(await isJobOf(scope, ties.jobId, crewLimit(actor)))) return notFound('job');
  if (ties.placementId !== null) {
    const placement = await findPlacement(scope, ties.placementId, crewLimit(actor));
    if (!placement) return notFound('placement');
    if (placement.jobId !== ties.jobId) {
      return mismatch('placementId', 'The placement belongs to another job.');
    }
  }
  const supplier = await holdTicketNumbers(scope, ties.supplierId);
  if (!supplier) return notFound('supplier');
  if (supplier.kind !== 'pump') return mismatch('supplierId', `${supplier.name} does not pump.`);
  if (ties.orderId !== null) {
    const order = await findOrderTie(scope, ties.orderId);
    if (!order) return notFound('order');
    if (order.jobId !== ties.jobId || order.supplierId !== ties.supplierId) {
      return mismatch('orderId', 'The order is for another job or supplier.');
    }
  }
  if (await isPumpNumberTaken(scope, ties.supplierId, ties.number, exceptId)) {
    return failure(
      'conflict',
      `Pump ticket ${ties.number} of ${supplier.name} is here already. Open that one, or check the number.`,
      [{ path: 'number', message: 'already used by another pump ticket' }],
    );
  }
  return null;
}

function mismatch(path: string, message: string): Failure {
  return failure('invalid', message, [{ path, message }]);
}
