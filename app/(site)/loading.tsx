'use client';

import { useCommon } from '@/components/ui/locale';

/** A form whose lines are not filled in yet. */
export default function Loading() {
  const words = useCommon();
  return (
    <div role="status" aria-label={words.loading}>
      <div aria-hidden className="busy-rule h-[3px]" />
      <div aria-hidden className="double-rule px-4 pt-4 pb-3 md:px-6">
        <div className="h-3 w-24 bg-tab" />
        <div className="mt-2 h-6 w-64 max-w-full bg-tab" />
      </div>
      <div aria-hidden className="grid gap-9 px-4 pt-9 md:px-6">
        {['a', 'b', 'c', 'd', 'e', 'f'].map((line) => (
          <span key={line} className="border-b border-cured" />
        ))}
      </div>
    </div>
  );
}
