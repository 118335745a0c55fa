import type { Store } from '../../db/client';
import { companies } from '../../db/schema/companies';
import { people } from '../../db/schema/people';
import type { Actor } from '../../lib/auth/actor';
import type { Role } from '../../lib/auth/policy';
import { actorOfPerson } from '../../lib/auth/session';
import type { CompanyId, PersonId } from '../../lib/domain/ids';
import { newId } from '../../lib/ids';

export interface TestCompany {
  readonly companyId: CompanyId;
  readonly owner: Actor;
  readonly bookkeeper: Actor;
  readonly foreman: Actor;
}

/** A company of the test's own with one person of each role; no test shares one. */
export async function testCompany(store: Store): Promise<TestCompany> {
  const companyId = newId<'company'>();
  await store.handle
    .insert(companies)
    .values({ id: companyId, name: 'Test Flatwork', timeZone: 'America/Chicago' });
  const person = async (role: Role): Promise<Actor> => {
    const id = newId<'person'>();
    await store.handle.insert(people).values({
      id,
      companyId,
      email: `${role}-${id}@example.test`,
      name: `Test ${role}`,
      role,
      passwordHash: 'not a hash: nobody signs in with it',
    });
    const actor = await actorOfPerson(store.handle, id as PersonId, 'session');
    if (!actor) throw new Error('the person just made is missing');
    return actor;
  };
  return {
    companyId,
    owner: await person('owner'),
    bookkeeper: await person('bookkeeper'),
    foreman: await person('foreman'),
  };
}
