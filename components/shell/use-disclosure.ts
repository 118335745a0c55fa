'use client';

import { usePathname } from 'next/navigation';
import { useEffect, useRef, useState } from 'react';

/** A small panel under a button: closed by Escape, by a press elsewhere and by going elsewhere. */
export function useDisclosure() {
  const [openedAt, setOpenedAt] = useState<string | null>(null);
  const pathname = usePathname();
  const area = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const open = openedAt === pathname;
  useEffect(() => {
    if (!open) return;
    function onKey(event: KeyboardEvent) {
      if (event.key !== 'Escape') return;
      setOpenedAt(null);
      button.current?.focus();
    }
    function onPress(event: PointerEvent) {
      if (event.target instanceof Node && !area.current?.contains(event.target)) setOpenedAt(null);
    }
    document.addEventListener('keydown', onKey);
    document.addEventListener('pointerdown', onPress);
    return () => {
      document.removeEventListener('keydown', onKey);
      document.removeEventListener('pointerdown', onPress);
    };
  }, [open]);
  return { open, toggle: () => setOpenedAt(open ? null : pathname), area, button, pathname };
}
