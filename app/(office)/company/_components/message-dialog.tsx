'use client';

import { useQuery } from '@tanstack/react-query';
import { Dialog } from '@/components/ui/dialog';
import { useCommon } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { Moment } from '@/components/ui/where';
import { mailQuery } from '@/lib/queries/company';
import { company } from '@/lib/text/messages/en/company';

const words = company.outbox;

interface MessageDialogProps {
  mailId: string | null;
  onClose: () => void;
}

/** One message as its reader gets it. */
export function MessageDialog({ mailId, onClose }: MessageDialogProps) {
  const common = useCommon();
  const { data, error } = useQuery({ ...mailQuery(mailId ?? ''), enabled: mailId !== null });
  return (
    <Dialog open={mailId !== null} onClose={onClose} title={data?.subject ?? common.loading}>
      {error && <Notice tone="error">{error.message}</Notice>}
      {data && (
        <>
          <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-0.5 border-b border-cured pb-3 text-[14.5px]">
            <dt className="text-ink-soft">{words.to}</dt>
            <dd className="break-all">{data.to}</dd>
            <dt className="text-ink-soft">{words.written}</dt>
            <dd>
              <Moment at={data.writtenAt} />
            </dd>
            <dt className="text-ink-soft">{words.state}</dt>
            <dd>{words.states[data.state]}</dd>
          </dl>
          {data.error && (
            <Notice tone="warning" className="mt-3">
              {words.failedBecause(data.error)}
            </Notice>
          )}
          <Letter text={data.text} />
        </>
      )}
    </Dialog>
  );
}

/** Plain text whose addresses can be followed. */
function Letter({ text }: { text: string }) {
  const parts = text.split(/(https?:\/\/[^\s<>"]+)/);
  let at = 0;
  return (
    <div className="pt-3 text-[15px] leading-relaxed break-words whitespace-pre-wrap">
      {parts.map((part) => {
        const key = `${at}`;
        at += part.length + 1;
        return /^https?:\/\//.test(part) ? (
          <a
            key={key}
            href={part}
            target="_blank"
            rel="noreferrer"
            className="font-code text-[14px]"
          >
            {part}
          </a>
        ) : (
          <span key={key}>{part}</span>
        );
      })}
    </div>
  );
}
