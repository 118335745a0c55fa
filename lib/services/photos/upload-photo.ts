import type { z } from 'zod';
import { findPhotoByClient, findSamePhoto, insertPhoto } from '../../../db/queries/photos';
import { findPlacement } from '../../../db/queries/ticket-ties';
import { findTicket, insertTicket, type StoredTicket } from '../../../db/queries/tickets';
import { uploadPhotoInput, uploadPhotoOutput } from '../../contracts/photos';
import type { Result } from '../../domain/result';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { putBlob } from '../../storage/blob-store';
import type { Ctx } from '../context';
import type { Failure } from '../failure';
import { failure, notFound } from '../failure';
import { crewLimit, ticketInWords } from '../tickets/internal';
import { defineVerb } from '../verb';
import type { PhotoFacts } from './look-into-photo';
import { lookIntoPhoto } from './look-into-photo';

type Upload = z.output<typeof uploadPhotoInput>;
type Prepared = Upload & { readonly facts?: PhotoFacts; readonly sha256?: string };
type Answer = z.output<typeof uploadPhotoOutput>;

export const uploadPhoto = defineVerb({
  name: 'photos.upload',
  says: 'Send a ticket’s photo: it begins a ticket to check, and is read in the background',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'POST', path: '/api/placements/{placementId}/photos' },
  input: uploadPhotoInput,
  output: uploadPhotoOutput,
  async prepare(input): Promise<Result<Prepared, Failure>> {
    const facts = await lookIntoPhoto(input.bytes);
    if (!facts.ok) return facts;
    return ok({ ...input, facts: facts.value, sha256: await putBlob(input.bytes) });
  },
  async run(ctx, input: Prepared) {
    const { facts, sha256 } = input;
    if (!facts || !sha256) throw new Error('The photo was not looked into');
    const placement = await findPlacement(ctx.scope, input.placementId, crewLimit(ctx.actor));
    if (!placement) return fail(notFound('placement'));
    const known = (await sentBefore(ctx, input)) ?? (await sameBytes(ctx, input, sha256));
    if (known) return repeated(ctx, known);
    const ticket = await ticketOf(ctx, input, placement);
    // Lost the race against the same upload: its answer is ours too.
    if (!ticket) return repeated(ctx, (await sentBefore(ctx, input)) ?? fail(notFound('photo')));
    if (!ticket.ok) return ticket;
    const photoId = newId<'photo'>();
    await insertPhoto(
      ctx.scope,
      {
        id: photoId,
        ticketId: ticket.value.id,
        clientId: input.clientId,
        sha256,
        ...facts,
        sizeBytes: input.bytes.length,
        takenBy: ctx.actor.personId,
      },
      { readingId: newId<'reading'>(), workItemId: newId<'workItem'>() },
      ctx.clock.now(),
    );
    await ctx.record({
      action: 'photos.upload',
      entity: 'ticket',
      entityId: ticket.value.id,
      summary: `Photographed ${ticketInWords(ticket.value.number)} at ${placement.name}`,
      after: { photoId, sha256 },
    });
    return ok({ ticketId: ticket.value.id, photoId, repeated: false });
  },
});

function repeated(ctx: Ctx, answer: Result<Answer, Failure>): Result<Answer, Failure> {
  if (answer.ok) ctx.unchanged();
  return answer;
}

/** The answer to a repeat of an upload whose first answer was lost; null for a new one. */
async function sentBefore(ctx: Ctx, input: Upload): Promise<Result<Answer, Failure> | null> {
  const photo = await findPhotoByClient(ctx.scope, input.clientId);
  if (!photo) return null;
  const ticket =
    photo.ticketId && (await findTicket(ctx.scope, photo.ticketId, crewLimit(ctx.actor)));
  if (!ticket) return fail(notFound('photo'));
  return ok({ ticketId: ticket.id, photoId: photo.id, repeated: true });
}

/**
 * The very same picture, chosen again: its ticket is opened instead of a second one begun. On
 * another placement's ticket, or on one that is not theirs to see, it is refused.
 */
async function sameBytes(
  ctx: Ctx,
  input: Upload,
  sha256: string,
): Promise<Result<Answer, Failure> | null> {
  const same = await findSamePhoto(ctx.scope, sha256);
  if (!same) return null;
  const ticket = await findTicket(ctx.scope, same.ticket.id, crewLimit(ctx.actor));
  const wanted = input.ticketId === undefined || input.ticketId === ticket?.id;
  if (ticket && ticket.placementId === input.placementId && wanted) {
    return ok({ ticketId: ticket.id, photoId: same.photoId, repeated: true });
  }
  const where = ticket
    ? `${ticketInWords(ticket.number)} at ${ticket.placementName ?? ticket.jobName}`
    : 'another job';
  return fail(
    failure('conflict', `This very photo is here already, on ${where}. Nothing was added.`, [
      { path: 'bytes', message: 'the same photo again' },
    ]),
  );
}

/** The photo's ticket: the one named, or a new one to check; null where that was just begun. */
async function ticketOf(
  ctx: Ctx,
  input: Upload,
  placement: { readonly id: string; readonly jobId: string; readonly pourDate: string },
): Promise<Result<Pick<StoredTicket, 'id' | 'number'>, Failure> | null> {
  if (input.ticketId !== undefined) {
    const named = await findTicket(ctx.scope, input.ticketId, crewLimit(ctx.actor));
    return named && named.placementId === placement.id ? ok(named) : fail(notFound('ticket'));
  }
  const id = newId<'ticket'>();
  const added = await insertTicket(ctx.scope, id, input.clientId, {
    jobId: placement.jobId,
    placementId: placement.id,
    status: 'toCheck',
    date: placement.pourDate,
  });
  return added ? ok({ id, number: '' }) : null;
}
