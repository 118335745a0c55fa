'use client';

import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/button';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import { useWhere } from '@/components/ui/where';
import type { Account } from '@/lib/contracts/account';
import { endOtherSessionsOutput } from '@/lib/contracts/account';
import { apiSend } from '@/lib/queries/api';
import { momentText } from '@/lib/text/format';
import { accountMessages } from '@/lib/text/messages/account';

export function SessionsSection({ account }: { account: Account }) {
  const locale = useLocale();
  const words = accountMessages(locale);
  const where = { ...useWhere(), locale };
  const router = useRouter();
  const end = useMutation({
    mutationFn: () => apiSend('DELETE', '/api/account/other-sessions', {}, endOtherSessionsOutput),
    onSuccess: () => router.refresh(),
  });
  return (
    <Section title={words.sessions}>
      <ul>
        {account.sessions.map((session) => (
          <li key={session.startedAt} className="border-b border-cured py-2 text-[15px]">
            <span className={session.isThisOne ? 'font-semibold' : undefined}>
              {session.isThisOne ? words.thisDevice : words.otherDevice}
            </span>{' '}
            {words.since(momentText(session.startedAt, where))}
            <span className="block text-[13px] text-ink-soft">
              {words.until(momentText(session.expiresAt, where))}
            </span>
          </li>
        ))}
      </ul>
      {account.sessions.length > 1 && (
        <Button
          variant="quiet"
          className="mt-3"
          pending={end.isPending}
          onClick={() => end.mutate()}
        >
          {words.endOthers}
        </Button>
      )}
      {end.data && (
        <Notice tone="done" className="mt-3">
          {words.endedOthers(end.data.endedSessions)}
        </Notice>
      )}
      {end.error && (
        <Notice tone="error" className="mt-3">
          {end.error.message}
        </Notice>
      )}
    </Section>
  );
}
