'use client';

import { useQuery } from '@tanstack/react-query';
import { demoFile, demoFilesQuery } from '@/lib/queries/demo';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { Button } from '../ui/button';
import { useLocale } from '../ui/locale';

/** In the demo company: photographs of today's tickets, for whoever has none at hand. */
export function DemoPhotos({ onFile }: { onFile: (file: File) => void }) {
  const words = pourDayMessages(useLocale());
  const { data } = useQuery(demoFilesQuery());
  const photos = data?.rows.filter((file) => file.kind === 'ticket') ?? [];
  if (photos.length === 0) return null;
  return (
    <section aria-label={words.demoTitle} className="px-4 pt-4">
      <p className="text-[14px] text-ink-soft">{words.demoTitle}</p>
      <ul className="mt-2 grid grid-cols-2 gap-2">
        {photos.map(({ name }) => (
          <li key={name}>
            <Button
              variant="quiet"
              className="min-h-14 w-full font-code"
              onClick={async () => onFile(await demoFile(name))}
            >
              {name.replace(/\.\w+$/, '')}
            </Button>
          </li>
        ))}
      </ul>
    </section>
  );
}
