import type { ReactNode } from 'react';
import { classNames } from './class-names';

type Tone = 'info' | 'warning' | 'error' | 'done';

const TONES: Record<Tone, string> = {
  info: 'border-wet border-l-carbon',
  warning: 'border-canary-deep border-l-canary-deep bg-canary-soft',
  error: 'border-wet border-l-keel',
  done: 'border-wet border-l-moss',
};

interface NoticeProps {
  tone?: Tone;
  title?: ReactNode;
  children?: ReactNode;
  className?: string;
}

/** A message that stays until it no longer holds; errors interrupt a screen reader, others wait. */
export function Notice({ tone = 'info', title, children, className }: NoticeProps) {
  return (
    <div
      role={tone === 'error' ? 'alert' : 'status'}
      className={classNames(
        'border border-l-[7px] bg-sheet px-3.5 py-2.5 text-[15px]',
        TONES[tone],
        className,
      )}
    >
      {title && <p className="font-head text-[17px] font-semibold">{title}</p>}
      {children && <div>{children}</div>}
    </div>
  );
}
