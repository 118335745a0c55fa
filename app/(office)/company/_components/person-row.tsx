'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { useWhere } from '@/components/ui/where';
import type { PersonRow as Person } from '@/lib/contracts/people';
import { personRow, removePersonOutput, role as roleSchema } from '@/lib/contracts/people';
import { apiSend } from '@/lib/queries/api';
import { dayOfMoment, dayText } from '@/lib/text/format';
import { common } from '@/lib/text/messages/en/common';
import { company } from '@/lib/text/messages/en/company';

const words = company.people;

interface PersonRowProps {
  person: Person;
  onChanged: () => Promise<void>;
}

export function PersonRow({ person, onChanged }: PersonRowProps) {
  const { timeZone } = useWhere();
  const [newRole, setNewRole] = useState<Person['role'] | null>(null);
  const [removing, setRemoving] = useState(false);
  async function changeRole() {
    await apiSend('PUT', `/api/people/${person.id}/role`, { role: newRole }, personRow);
    await onChanged();
  }
  async function remove() {
    await apiSend('DELETE', `/api/people/${person.id}`, {}, removePersonOutput);
    await onChanged();
  }
  return (
    <li className="grid grid-cols-[1fr_auto] items-center gap-x-4 gap-y-2 border-b border-cured py-2.5 md:grid-cols-[1fr_11rem_6rem]">
      <div className="col-span-2 min-w-0 md:col-span-1">
        <p className="font-semibold">
          {person.name}
          {person.isYou && <span className="font-normal text-ink-soft"> · {words.you}</span>}
        </p>
        <p className="text-[14px] break-words text-ink-soft">
          {person.email} · {words.since(dayText(dayOfMoment(person.joinedAt, timeZone)))}
        </p>
      </div>
      {person.isYou ? (
        <p className="text-[15px]">{common.roles[person.role]}</p>
      ) : (
        <>
          <select
            aria-label={words.roleOf(person.name)}
            value={person.role}
            onChange={(event) => setNewRole(roleSchema.parse(event.target.value))}
            className="min-h-11 rounded-[2px] border border-wet bg-sheet px-2 md:min-h-9"
          >
            {roleSchema.options.map((one) => (
              <option key={one} value={one}>
                {common.roles[one]}
              </option>
            ))}
          </select>
          <Button variant="danger" onClick={() => setRemoving(true)}>
            {words.remove}
          </Button>
        </>
      )}
      <ConfirmDialog
        open={newRole !== null}
        onClose={() => setNewRole(null)}
        title={words.changeTitle(person.name, newRole ? common.roles[newRole] : '')}
        confirm={words.change}
        onConfirm={changeRole}
      >
        {words.changeSays(person.name)}
      </ConfirmDialog>
      <ConfirmDialog
        open={removing}
        onClose={() => setRemoving(false)}
        title={words.removeTitle(person.name)}
        confirm={words.remove}
        danger
        onConfirm={remove}
      >
        {words.removeSays(person.name)}
      </ConfirmDialog>
    </li>
  );
}
