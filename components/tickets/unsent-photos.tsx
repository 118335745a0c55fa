'use client';

import Image from 'next/image';
import { useEffect, useState } from 'react';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { failureText } from '@/lib/text/problems';
import { Button } from '../ui/button';
import { useLocale } from '../ui/locale';
import type { Sent, Shot } from './shots';
import { dropShot, sendShot, useShots } from './shots';

const FINAL: readonly string[] = ['wrongType', 'tooLarge', 'invalid', 'conflict', 'notFound'];

/** Photos on their way, and those that could not be sent: kept here until they are. */
export function UnsentPhotos({ onSent }: { onSent: (sent: Sent) => void }) {
  const shots = useShots();
  if (shots.length === 0) return null;
  return (
    <ul className="grid gap-2 px-4 pt-3">
      {shots.map((shot) => (
        <UnsentPhoto key={shot.clientId} shot={shot} onSent={onSent} />
      ))}
    </ul>
  );
}

function UnsentPhoto({ shot, onSent }: { shot: Shot; onSent: (sent: Sent) => void }) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const preview = usePreview(shot.picture);
  const [broken, setBroken] = useState(false);
  // What the server refuses for what it is, it will refuse again.
  const refused = FINAL.includes(shot.problem?.code ?? '');
  async function again() {
    const sent = await sendShot(shot.clientId);
    if (sent) onSent(sent);
  }
  return (
    <li className="relative flex gap-3 overflow-hidden border border-canary-deep bg-canary p-3">
      {preview && !broken && (
        <Image
          unoptimized
          src={preview}
          alt=""
          onError={() => setBroken(true)}
          width={64}
          height={64}
          className="size-16 shrink-0 object-cover"
        />
      )}
      {shot.state === 'failed' && shot.problem ? (
        <div className="min-w-0 flex-1" role="alert">
          <p className="font-semibold">{words.notSent}</p>
          <p className="text-[14px]">
            {failureText(locale, shot.problem)} {!refused && words.kept}
          </p>
          <div className="mt-2 flex flex-wrap gap-2">
            {!refused && (
              <Button className="min-h-14" onClick={again}>
                {words.sendAgain}
              </Button>
            )}
            <Button variant="quiet" className="min-h-14" onClick={() => dropShot(shot.clientId)}>
              {refused ? words.dropFile : words.dropPhoto}
            </Button>
          </div>
        </div>
      ) : (
        <p role="status" className="self-center font-semibold">
          {shot.state === 'preparing' ? words.preparing : words.sending}
          <span aria-hidden className="busy-rule absolute inset-x-0 bottom-0 h-1" />
        </p>
      )}
    </li>
  );
}

/** An address of the picture for this page, given back when it is no longer shown. */
function usePreview(picture: Blob): string | null {
  const [address, setAddress] = useState<string | null>(null);
  useEffect(() => {
    const made = URL.createObjectURL(picture);
    setAddress(made);
    return () => URL.revokeObjectURL(made);
  }, [picture]);
  return address;
}
