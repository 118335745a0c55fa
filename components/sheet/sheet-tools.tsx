'use client';

import type { Ref } from 'react';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { Button } from '../ui/button';
import { classNames } from '../ui/class-names';
import { Key } from './keys-dialog';
import { SHEET_VIEWS, type SheetView } from './sums';

interface SheetToolsProps {
  view: SheetView;
  onView: (view: SheetView) => void;
  search: string;
  onSearch: (text: string) => void;
  searchRef: Ref<HTMLInputElement>;
  strikeable: number;
  onStrikeAll: () => void;
  exportHref: string;
}

/** Which rows are shown, and the one stroke that settles all that agree. */
export function SheetTools(props: SheetToolsProps) {
  const { view, onView, search, onSearch, searchRef, strikeable, onStrikeAll, exportHref } = props;
  return (
    <div
      data-no-print
      className="flex shrink-0 flex-wrap items-center gap-x-4 gap-y-2 border-b border-cured px-4 py-1.5 md:px-6"
    >
      <fieldset className="flex flex-wrap gap-1">
        <legend className="sr-only">{words.view}</legend>
        {SHEET_VIEWS.map((one) => (
          <button
            key={one}
            type="button"
            aria-pressed={one === view}
            onClick={() => onView(one)}
            className={classNames(
              'min-h-11 border px-2.5 text-[14px] md:min-h-8',
              one === view
                ? 'border-wet bg-sheet font-semibold text-ink'
                : 'border-transparent text-carbon hover:border-cured',
            )}
          >
            {words.views[one]}
          </button>
        ))}
      </fieldset>
      <input
        ref={searchRef}
        type="search"
        value={search}
        aria-label={words.search}
        placeholder={words.search}
        onChange={(event) => onSearch(event.target.value)}
        className="min-h-11 min-w-0 flex-1 border border-wet bg-sheet px-2.5 text-base md:min-h-8 md:max-w-64 md:text-[14px]"
      />
      <span className="flex items-center gap-4 md:ml-auto">
        {strikeable > 0 && (
          <Button onClick={onStrikeAll}>
            {words.strikeAll(strikeable)}
            <span className="max-md:hidden">
              <Key>shift s</Key>
            </span>
          </Button>
        )}
        <a href={exportHref} download className="text-[14px]">
          {words.export}
        </a>
      </span>
    </div>
  );
}
