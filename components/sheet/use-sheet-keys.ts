'use client';

import { useEffect, useRef } from 'react';

export type SheetKeys = Readonly<Record<string, () => void>>;

const TYPING = 'input, textarea, select, [contenteditable="true"]';

/** "shift s", "space", "c": how the keys of the sheet are written down. */
function nameOf(event: KeyboardEvent): string {
  const name = event.key === ' ' ? 'space' : event.key.toLowerCase();
  return event.shiftKey && /^[a-z]$/.test(name) ? `shift ${name}` : name;
}

/**
 * The sheet's keys, wherever on the page the focus is; not while something is typed, a dialog is
 * open, or a button has the key that it is pressed with.
 */
export function useSheetKeys(keys: SheetKeys): void {
  const current = useRef(keys);
  useEffect(() => {
    current.current = keys;
  });
  useEffect(() => {
    function press(event: KeyboardEvent) {
      if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return;
      if (document.querySelector('dialog[open]')) return;
      const target = event.target instanceof Element ? event.target : null;
      if (target?.closest(TYPING)) return;
      const name = nameOf(event);
      if (name === 'space' && target?.closest('button, a, summary')) return;
      const act = current.current[name];
      if (!act) return;
      event.preventDefault();
      act();
    }
    // Before the grid, which has uses of its own for some of these keys.
    document.addEventListener('keydown', press, true);
    return () => document.removeEventListener('keydown', press, true);
  }, []);
}
