'use client';

import { classNames } from './class-names';
import { useCommon } from './locale';

const LOOKS = {
  ordered: 'bg-paper border-wet',
  delivered: 'bg-canary border-canary-deep',
  billed: 'bg-pink border-pink-deep',
} as const;

/** The name of one of the three copies on its own paper: never the colour without the word. */
export function CopyTag({ copy, className }: { copy: keyof typeof LOOKS; className?: string }) {
  const words = useCommon();
  return (
    <span
      className={classNames(
        'inline-block h-fit w-fit border px-1.5 py-px text-[12.5px] font-semibold text-ink',
        LOOKS[copy],
        className,
      )}
    >
      {words.copies[copy]}
    </span>
  );
}
