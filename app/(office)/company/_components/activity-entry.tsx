'use client';

import Link from 'next/link';
import { fieldDifferences } from '@/components/evidence/differences';
import { Moment, useWhere } from '@/components/ui/where';
import type { ActivityRow } from '@/lib/contracts/activity';
import { clockOfMoment } from '@/lib/text/format';
import { company } from '@/lib/text/messages/en/company';
import { entityName, entityPage } from './entities';

const words = company.activity;

/** "tolerances.priceDiffers.absolute" → "tolerances › price differs › absolute" */
function fieldName(path: string): string {
  return path
    .split('.')
    .map((part) => part.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase())
    .join(' › ');
}

const ISO_MOMENT = /^\d{4}-\d{2}-\d{2}T[\d:.]+Z$/;

function Value({ text }: { text: string | null }) {
  if (text === null) return <span className="text-ink-soft">{words.nothing}</span>;
  if (text === 'true') return words.yes;
  if (text === 'false') return words.no;
  if (ISO_MOMENT.test(text)) return <Moment at={text} />;
  return <span className="break-words">{text}</span>;
}

export function ActivityEntry({ row }: { row: ActivityRow }) {
  const where = useWhere();
  const differences = fieldDifferences(row.before, row.after).filter(({ path }) => path !== 'id');
  const page = entityPage(row.entity, row.entityId);
  return (
    <li className="grid grid-cols-[5.2rem_1fr] gap-x-3 border-b border-cured py-2 text-[14.5px]">
      <time dateTime={row.at} className="text-ink-soft">
        {clockOfMoment(row.at, where)}
      </time>
      <div className="min-w-0">
        <p>{row.summary}</p>
        <p className="text-[13px] text-ink-soft">
          {row.actorName} ·{' '}
          {page ? <Link href={page}>{entityName(row.entity)}</Link> : entityName(row.entity)}
        </p>
        {differences.length > 0 && (
          <details className="mt-1">
            <summary className="w-fit py-1 text-[13px] text-carbon">
              {words.changes(differences.length)}
            </summary>
            <div className="overflow-x-auto">
              <table className="mt-1 mb-1 w-full max-w-2xl border-collapse text-[13.5px] [&_td]:border-t [&_td]:border-cured [&_td]:py-1 [&_td]:pr-4 [&_td]:align-top [&_th]:py-1 [&_th]:pr-4 [&_th]:text-left [&_th]:text-xs [&_th]:font-semibold [&_th]:text-ink-soft">
                <thead>
                  <tr>
                    <th scope="col">{words.field}</th>
                    <th scope="col">{words.before}</th>
                    <th scope="col">{words.after}</th>
                  </tr>
                </thead>
                <tbody>
                  {differences.map((field) => (
                    <tr key={field.path}>
                      <td>{fieldName(field.path)}</td>
                      <td>
                        <Value text={field.before} />
                      </td>
                      <td>
                        <Value text={field.after} />
                      </td>
                    </tr>
                  ))}
                </tbody>
              </table>
            </div>
          </details>
        )}
      </div>
    </li>
  );
}
