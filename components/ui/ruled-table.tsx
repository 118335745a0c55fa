import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names';

type Align = 'left' | 'right' | 'center';
type Copy = 'ordered' | 'delivered' | 'billed';

const ALIGN: Record<Align, string> = {
  left: 'text-left',
  right: 'text-right',
  center: 'text-center',
};
const COPY: Record<Copy, string> = {
  ordered: 'bg-paper',
  delivered: 'bg-canary',
  billed: 'bg-pink',
};

interface RuledTableProps {
  /** What the table lists; read out, and shown only with `showCaption`. */
  caption: ReactNode;
  showCaption?: boolean;
  children: ReactNode;
  /** On a phone each row becomes a slip of its own lines, for lists that are read, not compared. */
  slipsOnPhone?: boolean;
  className?: string;
}

const SLIPS =
  'max-md:block [&_thead]:max-md:hidden [&_tbody]:max-md:block [&_tr]:max-md:block [&_tr]:max-md:border-b [&_tr]:max-md:border-cured [&_tr]:max-md:py-2 [&_td]:max-md:block [&_td]:max-md:border-0 [&_td]:max-md:px-4 [&_td]:max-md:py-0.5 [&_td]:max-md:text-left';

/** A ledger's table: rules between rows, figures right-aligned; scrolls sideways by itself. */
export function RuledTable({
  caption,
  showCaption = false,
  slipsOnPhone = false,
  children,
  className,
}: RuledTableProps) {
  return (
    <section
      className="relative overflow-x-auto"
      // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard
      tabIndex={0}
      aria-label={typeof caption === 'string' ? caption : undefined}
    >
      <table
        className={classNames(
          'w-full border-collapse text-[14.5px] [&_tfoot_td]:border-t-[3px] [&_tfoot_td]:border-double [&_tfoot_td]:border-wet [&_tfoot_td]:font-semibold',
          slipsOnPhone && SLIPS,
          className,
        )}
      >
        <caption
          className={showCaption ? 'py-2 text-left font-head text-lg font-semibold' : 'sr-only'}
        >
          {caption}
        </caption>
        {children}
      </table>
    </section>
  );
}

interface CellStyle {
  align?: Align;
  /** Which of the three copies the column belongs to: tints it. The word must stand in its head. */
  copy?: Copy;
}

export function Th({
  align = 'left',
  copy,
  className,
  ...rest
}: Omit<ComponentProps<'th'>, 'align'> & CellStyle) {
  return (
    <th
      scope="col"
      {...rest}
      className={classNames(
        'border-b border-wet px-2.5 py-1.5 align-bottom text-xs font-semibold text-ink-soft first:pl-4 last:pr-4 md:first:pl-6 md:last:pr-6',
        ALIGN[align],
        copy && COPY[copy],
        className,
      )}
    />
  );
}

export function Td({
  align = 'left',
  copy,
  className,
  ...rest
}: Omit<ComponentProps<'td'>, 'align'> & CellStyle) {
  return (
    <td
      {...rest}
      className={classNames(
        'border-b border-cured px-2.5 py-2 align-top first:pl-4 last:pr-4 md:first:pl-6 md:last:pr-6',
        ALIGN[align],
        copy && COPY[copy],
        className,
      )}
    />
  );
}
