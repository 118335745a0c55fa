import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { Dialog } from '../ui/dialog';

export function Key({ children }: { children: string }) {
  return (
    <kbd className="inline-block min-w-5 rounded-[3px] border border-current px-1 text-center font-code text-[12px]">
      {children}
    </kbd>
  );
}

/** The list of keys, opened with "?". */
export function KeysDialog({ open, onClose }: { open: boolean; onClose: () => void }) {
  return (
    <Dialog open={open} onClose={onClose} title={words.keysTitle}>
      <dl className="grid grid-cols-[auto_1fr] gap-x-5 gap-y-2">
        {words.keyList.map(([key, does]) => (
          <div key={key} className="contents">
            <dt className="whitespace-nowrap">
              <Key>{key}</Key>
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}
