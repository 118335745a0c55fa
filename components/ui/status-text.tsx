import { classNames } from './class-names';

const LOOKS = {
  quiet: 'text-ink-soft',
  waiting: 'font-semibold text-ink',
  done: 'text-moss',
  off: 'text-ink-soft line-through',
} as const;

/** A status as a word; its look only helps the eye. */
export function StatusText({ look, children }: { look: keyof typeof LOOKS; children: string }) {
  return <span className={classNames('whitespace-nowrap', LOOKS[look])}>{children}</span>;
}
