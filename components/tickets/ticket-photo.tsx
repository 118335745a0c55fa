'use client';

import Image from 'next/image';
import type { PointerEvent } from 'react';
import { useEffect, useRef, useState } from 'react';
import type { Photo } from '@/lib/contracts/photos';
import { photoAddress } from '@/lib/queries/tickets';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { classNames } from '../ui/class-names';
import { useLocale } from '../ui/locale';
import type { PhotoView } from './photo-view';
import { spotView, topView, wholeView, within } from './photo-view';

export interface PhotoSpot {
  readonly field: string;
  readonly box: { x: number; y: number; width: number; height: number };
  readonly doubtful: boolean;
}

interface TicketPhotoProps {
  photo: Pick<Photo, 'id' | 'widthPx' | 'heightPx'>;
  spots: readonly PhotoSpot[];
  /** The field that is being looked at: the photo moves to its spot. */
  focus: string | null;
  className?: string;
}

/** A ticket's photo with what was read framed on it; it follows the form, and can be dragged. */
export function TicketPhoto({ photo, spots, focus, className }: TicketPhotoProps) {
  const words = pourDayMessages(useLocale()).check;
  const { frame, size } = useFrameSize();
  const [whole, setWhole] = useState(false);
  const { moved, drag } = useDrag(`${photo.id} ${focus} ${whole}`);
  const natural = { width: photo.widthPx, height: photo.heightPx };
  const spot = spots.find((one) => one.field === focus);
  const view = size && place(size);
  function place(inside: { width: number; height: number }): PhotoView {
    const start = whole
      ? wholeView(natural, inside)
      : spot
        ? spotView(spot.box, natural, inside)
        : topView(natural, inside);
    return {
      scale: start.scale,
      x: within(start.x + moved.x, natural.width * start.scale, inside.width),
      y: within(start.y + moved.y, natural.height * start.scale, inside.height),
    };
  }
  return (
    <div
      ref={frame}
      {...drag}
      className={classNames('relative touch-none overflow-hidden bg-desk', className)}
    >
      <div
        className="absolute top-0 left-0 origin-top-left motion-safe:transition-transform"
        style={{
          width: natural.width,
          height: natural.height,
          visibility: view ? 'visible' : 'hidden',
          transform: view ? `translate(${view.x}px, ${view.y}px) scale(${view.scale})` : undefined,
        }}
      >
        <Image
          unoptimized
          priority
          src={photoAddress(photo.id)}
          alt={words.photo}
          draggable={false}
          width={natural.width}
          height={natural.height}
          className="block size-full max-w-none select-none"
        />
        {view && <Spots spots={spots} focus={focus} scale={view.scale} size={natural} />}
      </div>
      <button
        type="button"
        onClick={() => setWhole(!whole)}
        className="absolute right-2 bottom-2 min-h-11 border border-wet bg-sheet px-3 text-[14px] font-semibold text-carbon"
      >
        {whole ? words.closer : words.wholePhoto}
      </button>
    </div>
  );
}

interface SpotsProps {
  spots: readonly PhotoSpot[];
  focus: string | null;
  scale: number;
  size: { width: number; height: number };
}

/** Frames around what was read: dashed and red where it is doubtful, so that colour is not alone. */
function Spots({ spots, focus, scale, size }: SpotsProps) {
  const margin = 4 / scale;
  return (
    <svg
      aria-hidden="true"
      viewBox={`0 0 ${size.width} ${size.height}`}
      className="pointer-events-none absolute inset-0 size-full overflow-visible"
    >
      {spots.map(({ field, box, doubtful }) => {
        const width = (field === focus ? 3.5 : doubtful ? 2.5 : 1.25) / scale;
        const edges = {
          x: box.x - margin,
          y: box.y - margin,
          width: box.width + 2 * margin,
          height: box.height + 2 * margin,
        };
        return (
          <g key={field} fill="none">
            {field === focus && <rect {...edges} className="fill-canary-deep" fillOpacity={0.18} />}
            {/* The paper under the line keeps it visible on the photo in either theme. */}
            <rect {...edges} className="stroke-paper" strokeWidth={2.2 * width} />
            <rect
              {...edges}
              className={doubtful ? 'stroke-keel' : 'stroke-carbon'}
              strokeWidth={width}
              strokeDasharray={doubtful ? `${7 / scale} ${4 / scale}` : undefined}
            />
          </g>
        );
      })}
    </svg>
  );
}

function useFrameSize() {
  const frame = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState<{ width: number; height: number } | null>(null);
  useEffect(() => {
    if (!frame.current) return;
    const watcher = new ResizeObserver(([entry]) => {
      if (entry) setSize({ width: entry.contentRect.width, height: entry.contentRect.height });
    });
    watcher.observe(frame.current);
    return () => watcher.disconnect();
  }, []);
  return { frame, size };
}

/** How far a finger has dragged the photo since `scene` began. */
function useDrag(scene: string) {
  const [state, setState] = useState({ scene, x: 0, y: 0 });
  const from = useRef<{ x: number; y: number } | null>(null);
  const moved = state.scene === scene ? state : { scene, x: 0, y: 0 };
  const drag = {
    onPointerDown(event: PointerEvent) {
      from.current = { x: event.clientX - moved.x, y: event.clientY - moved.y };
    },
    onPointerMove(event: PointerEvent) {
      if (!from.current || event.buttons === 0) return;
      setState({ scene, x: event.clientX - from.current.x, y: event.clientY - from.current.y });
    },
    onPointerUp() {
      from.current = null;
    },
  };
  return { moved, drag };
}
