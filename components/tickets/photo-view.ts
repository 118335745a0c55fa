/** A size or a place in pixels. */
interface Size {
  readonly width: number;
  readonly height: number;
}
interface Place extends Size {
  readonly x: number;
  readonly y: number;
}

/** How a photo lies in its frame: first scaled, then moved by x and y. */
export interface PhotoView {
  readonly scale: number;
  readonly x: number;
  readonly y: number;
}

const LARGEST_SCALE = 1.1;
/** Share of the frame that a looked-at spot may fill: enough around it to see where one is. */
const SPOT_WIDTH = 0.5;
const SPOT_HEIGHT = 0.25;

/** The whole photo, centred. */
export function wholeView(photo: Size, frame: Size): PhotoView {
  const scale = Math.min(frame.width / photo.width, frame.height / photo.height);
  return centred(scale, { x: 0, y: 0, ...photo }, photo, frame);
}

/** The photo as wide as the frame, from its top: what a person sees before pointing anywhere. */
export function topView(photo: Size, frame: Size): PhotoView {
  const scale = frame.width / photo.width;
  if (photo.height * scale <= frame.height) return wholeView(photo, frame);
  return { scale, x: 0, y: 0 };
}

/** So close that the spot can be read, and never past the photo's edges. */
export function spotView(spot: Place, photo: Size, frame: Size): PhotoView {
  const least = wholeView(photo, frame).scale;
  const wanted = Math.min(
    (frame.width * SPOT_WIDTH) / spot.width,
    (frame.height * SPOT_HEIGHT) / spot.height,
  );
  const scale = Math.max(least, Math.min(LARGEST_SCALE, wanted));
  return centred(scale, spot, photo, frame);
}

function centred(scale: number, spot: Place, photo: Size, frame: Size): PhotoView {
  return {
    scale,
    x: within(
      frame.width / 2 - (spot.x + spot.width / 2) * scale,
      photo.width * scale,
      frame.width,
    ),
    y: within(
      frame.height / 2 - (spot.y + spot.height / 2) * scale,
      photo.height * scale,
      frame.height,
    ),
  };
}

/** An offset at which the frame is filled, or the photo centred where it is the smaller. */
export function within(offset: number, length: number, frameLength: number): number {
  if (length <= frameLength) return (frameLength - length) / 2;
  return Math.min(0, Math.max(frameLength - length, offset));
}
