import { classNames } from '../ui/class-names';

/** The product's name with the strike-off line drawn through it. */
export function Wordmark({ className }: { className?: string }) {
  return (
    <span
      className={classNames('relative inline-block font-head font-semibold text-ink', className)}
    >
      Strikeoff
      <span aria-hidden className="absolute inset-x-0 top-[58%] h-[2px] bg-carbon" />
    </span>
  );
}
