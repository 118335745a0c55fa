import {
  insertInvitation,
  isColleague,
  listInvitations,
  withdrawEarlier,
} from '../../../db/queries/people';
import { hashToken, newToken } from '../../auth/tokens';
import { invitationRow, invitePersonInput } from '../../contracts/people';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { linkTo } from '../../mail/link';
import { invitationMail } from '../../mail/templates';
import { writeMail } from '../../mail/write-mail';
import { routes } from '../../routes';
import { failure } from '../failure';
import { defineVerb } from '../verb';

const LINK_DAYS = 7;

export const invitePerson = defineVerb({
  name: 'people.invite',
  says: 'Invite someone by e-mail; a second invitation replaces the first',
  kind: 'write',
  permission: 'people.manage',
  http: { method: 'POST', path: '/api/people/invitations' },
  input: invitePersonInput,
  output: invitationRow,
  async run(ctx, { email, name, role }) {
    // Only colleagues are looked at: the answer must not tell who works for another company.
    if (await isColleague(ctx.scope, email)) {
      return fail(
        failure('conflict', `${email} is in the company already.`, [
          { path: 'email', message: 'already in the company' },
        ]),
      );
    }
    const id = newId<'invitation'>();
    const token = newToken();
    const now = ctx.clock.now();
    await insertInvitation(ctx.scope, {
      id,
      email,
      name,
      role,
      tokenHash: hashToken(token),
      createdAt: now,
      expiresAt: new Date(now.getTime() + LINK_DAYS * 24 * 60 * 60_000),
      invitedBy: ctx.actor.personId,
    });
    await withdrawEarlier(ctx.scope, email, id, now);
    const mail = invitationMail({
      companyName: ctx.company.name,
      invitedBy: ctx.actor.name,
      name,
      role,
      link: linkTo(routes.invite(token)),
      days: LINK_DAYS,
    });
    await writeMail(ctx, { ...mail, to: email });
    const made = (await listInvitations(ctx.scope, now)).find((row) => row.id === id);
    if (!made) throw new Error('The invitation just made is missing');
    await ctx.record({
      action: 'people.invite',
      entity: 'invitation',
      entityId: id,
      summary: `Invited ${name} (${email}) as ${role}`,
      after: made,
    });
    return ok(made);
  },
});
