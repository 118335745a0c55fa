'use client';

import { Button } from './button';
import { useCommon } from './locale';

interface PagerProps {
  offset: number;
  limit: number;
  total: number;
  onGo: (offset: number) => void;
}

/** "101–200 of 431", one page back and forth; nothing where all rows fit on one page. */
export function Pager({ offset, limit, total, onGo }: PagerProps) {
  const words = useCommon();
  if (total <= limit && offset === 0) return null;
  const last = Math.min(offset + limit, total);
  return (
    <nav
      aria-label={words.showingRows(offset + 1, last, total)}
      className="flex items-center gap-3 px-4 py-3 md:px-6"
    >
      <Button
        variant="quiet"
        disabled={offset === 0}
        onClick={() => onGo(Math.max(0, offset - limit))}
      >
        {words.previous}
      </Button>
      <span className="text-[14px] text-ink-soft">
        {words.showingRows(Math.min(offset + 1, total), last, total)}
      </span>
      <Button variant="quiet" disabled={last >= total} onClick={() => onGo(offset + limit)}>
        {words.next}
      </Button>
    </nav>
  );
}
