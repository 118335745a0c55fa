'use client';

import type { ChangeEvent } from 'react';
import { useRef } from 'react';
import { Button } from '../ui/button';
import { classNames } from '../ui/class-names';

interface SnapButtonsProps {
  snap: string;
  choose: string;
  onFile: (file: File) => void;
  size?: 'normal' | 'big';
  className?: string;
}

/** The camera, and a photo taken before. */
export function SnapButtons({ snap, choose, onFile, size = 'big', className }: SnapButtonsProps) {
  const camera = useRef<HTMLInputElement>(null);
  const album = useRef<HTMLInputElement>(null);
  function take(event: ChangeEvent<HTMLInputElement>) {
    const [file] = event.target.files ?? [];
    // Emptied, so that the same photo can be chosen again after it was refused.
    event.target.value = '';
    if (file) onFile(file);
  }
  return (
    <div className={classNames('grid grid-cols-[1fr_auto] gap-2', className)}>
      <input
        ref={camera}
        type="file"
        accept="image/*"
        capture="environment"
        onChange={take}
        className="sr-only"
        tabIndex={-1}
        aria-label={snap}
      />
      <input
        ref={album}
        type="file"
        accept="image/jpeg,image/png,image/webp,image/*"
        onChange={take}
        className="sr-only"
        tabIndex={-1}
        aria-label={choose}
      />
      <Button size={size} className="px-2" onClick={() => camera.current?.click()}>
        {snap}
      </Button>
      <Button
        variant="quiet"
        className="min-h-14 max-w-24 px-2 text-[15px]"
        onClick={() => album.current?.click()}
      >
        {choose}
      </Button>
    </div>
  );
}
