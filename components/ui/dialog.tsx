'use client';

import type { ReactNode } from 'react';
import { useEffect, useId, useRef } from 'react';
import { useCommon } from './locale';

interface DialogProps {
  open: boolean;
  /** Called for Escape, the close button and a press beside the sheet. */
  onClose: () => void;
  title: ReactNode;
  children: ReactNode;
  /** Buttons, the main one first. */
  footer?: ReactNode;
}

/** A slip laid on top of the page: the browser's own modal dialog, which keeps and returns focus. */
export function Dialog({ open, onClose, title, children, footer }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  const words = useCommon();
  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (open && !element.open) {
      element.showModal();
      element.querySelector<HTMLElement>('[data-first-focus]')?.focus();
    }
    if (!open && element.open) element.close();
  }, [open]);
  return (
    // biome-ignore lint/a11y/useKeyWithClickEvents: Escape closes a native dialog; the press beside it is an extra
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === dialog.current) onClose();
      }}
      className="m-auto w-[min(100vw-2rem,34rem)] border border-wet bg-sheet p-0 text-ink"
    >
      {open && (
        <div className="relative flex max-h-[85dvh] flex-col">
          <header className="double-rule py-3.5 pr-14 pl-5">
            <h2 id={titleId} className="text-xl">
              {title}
            </h2>
          </header>
          <div className="min-h-0 overflow-y-auto px-5 py-4">{children}</div>
          {footer && (
            <footer className="flex flex-row-reverse flex-wrap justify-start gap-2 border-t border-cured bg-band px-5 py-3">
              {footer}
            </footer>
          )}
          {/* Last, so that focus starts at what the slip is about. */}
          <button
            type="button"
            onClick={onClose}
            aria-label={words.close}
            className="absolute top-2 right-2 grid size-11 place-content-center text-2xl leading-none text-ink-soft hover:text-ink"
          >
            <span aria-hidden>×</span>
          </button>
        </div>
      )}
    </dialog>
  );
}
