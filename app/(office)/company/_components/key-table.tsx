'use client';

import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { Moment, useWhere } from '@/components/ui/where';
import type { KeyRow } from '@/lib/contracts/keys';
import { dayOfMoment, dayText } from '@/lib/text/format';
import { company } from '@/lib/text/messages/en/company';

const words = company.keys;

interface KeyTableProps {
  rows: readonly KeyRow[];
  onRevoke: (key: KeyRow) => void;
}

export function KeyTable({ rows, onRevoke }: KeyTableProps) {
  const { timeZone } = useWhere();
  const day = (moment: string) => dayText(dayOfMoment(moment, timeZone));
  return (
    <RuledTable caption={words.title} slipsOnPhone>
      <thead>
        <tr>
          <Th>{words.column.name}</Th>
          <Th>{words.column.ends}</Th>
          <Th>{words.column.issued}</Th>
          <Th>{words.column.used}</Th>
          <Th>
            <span className="sr-only">{words.revoke}</span>
          </Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((key) => (
          <tr key={key.id} className={classNames(key.revokedAt && 'text-ink-soft')}>
            <Td className="font-semibold">{key.name}</Td>
            <Td className="font-code">…{key.lastFour}</Td>
            <Td className="whitespace-nowrap">
              {day(key.issuedAt)} · {key.issuedBy}
            </Td>
            <Td>
              <span className="text-ink-soft md:hidden">{words.column.used}: </span>
              {key.lastUsedAt ? <Moment at={key.lastUsedAt} /> : words.never}
            </Td>
            <Td align="right" className="whitespace-nowrap">
              {key.revokedAt ? (
                words.revokedOn(day(key.revokedAt))
              ) : (
                <Button variant="danger" onClick={() => onRevoke(key)}>
                  {words.revoke}
                </Button>
              )}
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
