import * as peopleQueries from '../../../db/queries/people';
import { listPeopleInput, listPeopleOutput } from '../../contracts/people';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listPeople = defineVerb({
  name: 'people.list',
  says: 'List the company’s people and its unanswered invitations',
  kind: 'read',
  permission: 'people.manage',
  http: { method: 'GET', path: '/api/people' },
  input: listPeopleInput,
  output: listPeopleOutput,
  async run({ scope, actor, clock }) {
    const people = await peopleQueries.listPeople(scope);
    const invitations = await peopleQueries.listInvitations(scope, clock.now());
    return ok({
      people: people.map((person) => ({ ...person, isYou: person.id === actor.personId })),
      invitations,
    });
  },
});
