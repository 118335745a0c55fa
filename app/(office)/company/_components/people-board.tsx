'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { listPeopleOutput } from '@/lib/contracts/people';
import { peopleQuery } from '@/lib/queries/company';
import { company } from '@/lib/text/messages/en/company';
import { InvitationRow } from './invitation-row';
import { InviteDialog } from './invite-dialog';
import { PersonRow } from './person-row';

const words = company.people;

export function PeopleBoard({ first }: { first: z.output<typeof listPeopleOutput> }) {
  const queries = useQueryClient();
  const { data } = useQuery({ ...peopleQuery(), initialData: first });
  const [inviting, setInviting] = useState(false);
  const [done, setDone] = useState<string | null>(null);
  async function changed(says: string | null) {
    setDone(says);
    await queries.invalidateQueries({ queryKey: peopleQuery().queryKey });
  }
  return (
    <div className="max-w-4xl">
      <Section
        title={words.title}
        action={
          <Button className="mb-1" onClick={() => setInviting(true)}>
            {words.invite}
          </Button>
        }
      >
        {done && (
          <Notice tone="done" className="mb-3">
            {done}
          </Notice>
        )}
        <ul>
          {data.people.map((person) => (
            <PersonRow key={person.id} person={person} onChanged={() => changed(null)} />
          ))}
        </ul>
      </Section>
      {data.invitations.length > 0 && (
        <Section title={words.invitations}>
          <ul>
            {data.invitations.map((invitation) => (
              <InvitationRow
                key={invitation.id}
                invitation={invitation}
                onWithdrawn={() => changed(words.withdrawn(invitation.name))}
              />
            ))}
          </ul>
        </Section>
      )}
      <InviteDialog
        open={inviting}
        onClose={() => setInviting(false)}
        onInvited={(name, email) => changed(words.invited(name, email))}
      />
    </div>
  );
}
