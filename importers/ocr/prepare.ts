import sharp, { type Sharp } from 'sharp';
import { fail, ok, type Result } from '../../lib/domain/result';
import { evenLight } from './image/even-light';
import { type Grey, meanOf, type Rect, sharpnessOf } from './image/grey';
import { inkBox, inkPoints, slopeDeg } from './image/ink';
import { withoutRules } from './image/rules';
import type { Box, ReadFailure } from './reading';
import { failure } from './sniff';

export const MAX_PHOTO_PIXELS = 50_000_000;
const SMALLEST_SIDE_PX = 120;
const SURVEY_WIDTH_PX = 1000;
/** Wider gains nothing and costs time and memory that the engine never gives back. */
const READ_WIDTH_PX = 1400;

/** A photo turned upright by its EXIF mark, with what a first look at it shows. */
export interface Survey {
  readonly upright: Grey;
  /** Where the writing is, in pixels of the upright photo. */
  readonly writing: Rect;
  readonly slopeDeg: number;
  readonly brightness: number;
  readonly sharpness: number;
}

/** A picture ready for the engine, and the way back from its pixels to the photo's. */
export interface PreparedPicture {
  readonly picture: Grey;
  toPhoto(rect: Rect): Box;
}

async function greyOf(pipeline: Sharp): Promise<Grey> {
  // Without the colour space sharp gives three equal channels after a resize.
  const { data, info } = await pipeline
    .toColourspace('b-w')
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { data, width: info.width, height: info.height };
}

function fromGrey(picture: Grey): Sharp {
  const raw = { width: picture.width, height: picture.height, channels: 1 } as const;
  return sharp(picture.data, { raw });
}

/** Decodes a photo, refusing pictures that are damaged, tiny, or bombs. */
export async function uprightPhoto(bytes: Uint8Array): Promise<Result<Grey, ReadFailure>> {
  const open = () => sharp(bytes, { limitInputPixels: MAX_PHOTO_PIXELS, failOn: 'error' });
  try {
    const { width, height } = await sharp(bytes, { limitInputPixels: false }).metadata();
    if (width * height > MAX_PHOTO_PIXELS) return fail(failure('tooManyPixels'));
    if (Math.min(width, height) < SMALLEST_SIDE_PX) return fail(failure('tooSmall'));
    const opaque = open().autoOrient().flatten({ background: '#ffffff' });
    return ok(await greyOf(opaque.greyscale()));
  } catch {
    // sharp says in many words the one thing that matters: the file cannot be decoded whole.
    return fail(failure('damaged'));
  }
}

/** Turns a photo by quarters, for one whose EXIF mark is missing or wrong. */
export function turned(photo: Grey, quarters: 1 | 2 | 3): Promise<Grey> {
  return greyOf(fromGrey(photo).rotate(quarters * 90));
}

/** Finds the writing and its slope on a small copy. */
export async function survey(upright: Grey): Promise<Survey> {
  const width = Math.min(SURVEY_WIDTH_PX, upright.width);
  const small = await greyOf(fromGrey(upright).resize({ width }));
  const scale = upright.width / small.width;
  const even = evenLight(small);
  const points = inkPoints(even);
  const box = inkBox(even, points);
  const inside = points.filter(
    ({ x, y }) => x >= box.x && y >= box.y && x < box.x + box.width && y < box.y + box.height,
  );
  const left = Math.floor(box.x * scale);
  const top = Math.floor(box.y * scale);
  return {
    upright,
    writing: {
      x: left,
      y: top,
      width: Math.min(upright.width - left, Math.ceil(box.width * scale)),
      height: Math.min(upright.height - top, Math.ceil(box.height * scale)),
    },
    slopeDeg: slopeDeg(inside),
    brightness: meanOf(small),
    sharpness: sharpnessOf(even),
  };
}

/** Cuts out the writing, scales it, evens the light, straightens it and takes the rules out. */
export async function prepare({ upright, writing, slopeDeg }: Survey): Promise<PreparedPicture> {
  // A tall, narrow slip is not blown up beyond what its height allows.
  const wanted = READ_WIDTH_PX * Math.min(1, Math.sqrt((1.5 * writing.width) / writing.height));
  const scale = Math.min(2, wanted / writing.width);
  const width = Math.max(1, Math.round(writing.width * scale));
  const cut = await greyOf(
    fromGrey(upright)
      .extract({ left: writing.x, top: writing.y, width: writing.width, height: writing.height })
      .resize({ width }),
  );
  const even = evenLight(cut);
  const straight =
    Math.abs(slopeDeg) < 0.1
      ? even
      : await greyOf(fromGrey(even).rotate(-slopeDeg, { background: '#ffffff' }));
  return {
    picture: withoutRules(straight),
    toPhoto: wayBack(upright, writing, cut, straight, slopeDeg),
  };
}

function wayBack(
  upright: Grey,
  writing: Rect,
  cut: Grey,
  straight: Grey,
  slope: number,
): (rect: Rect) => Box {
  const sin = Math.sin((slope * Math.PI) / 180);
  const cos = Math.cos((slope * Math.PI) / 180);
  const scale = writing.width / cut.width;
  const point = (x: number, y: number): [number, number] => {
    const dx = x - straight.width / 2;
    const dy = y - straight.height / 2;
    const cutX = dx * cos - dy * sin + cut.width / 2;
    const cutY = dx * sin + dy * cos + cut.height / 2;
    return [writing.x + cutX * scale, writing.y + cutY * scale];
  };
  return (rect) => {
    const corners = [
      point(rect.x, rect.y),
      point(rect.x + rect.width, rect.y),
      point(rect.x, rect.y + rect.height),
      point(rect.x + rect.width, rect.y + rect.height),
    ];
    const within = (value: number, most: number) => Math.max(0, Math.min(most, Math.round(value)));
    const left = within(Math.min(...corners.map(([x]) => x)), upright.width - 1);
    const top = within(Math.min(...corners.map(([, y]) => y)), upright.height - 1);
    const right = within(Math.max(...corners.map(([x]) => x)), upright.width);
    const bottom = within(Math.max(...corners.map(([, y]) => y)), upright.height);
    return { x: left, y: top, width: Math.max(1, right - left), height: Math.max(1, bottom - top) };
  };
}

/** The picture as a file that the engine can load, narrowed to `width` where it is wider. */
export function asPng(picture: Grey, width = picture.width): Promise<Buffer> {
  const narrowed = width < picture.width ? fromGrey(picture).resize({ width }) : fromGrey(picture);
  return narrowed.png({ compressionLevel: 1 }).toBuffer();
}

/** One word or field cut out with a margin and enlarged, for a second look at it. */
export async function asCutPng(picture: Grey, rect: Rect, enlarge: number): Promise<Buffer> {
  const margin = Math.round(rect.height * 0.45);
  const left = Math.max(0, Math.round(rect.x) - margin);
  const top = Math.max(0, Math.round(rect.y) - margin);
  const width = Math.min(picture.width - left, Math.round(rect.width) + 2 * margin);
  const height = Math.min(picture.height - top, Math.round(rect.height) + 2 * margin);
  return fromGrey(picture)
    .extract({ left, top, width, height })
    .resize({ width: Math.max(1, Math.round(width * enlarge)) })
    .extend({ top: 12, bottom: 12, left: 12, right: 12, background: '#ffffff' })
    .png({ compressionLevel: 1 })
    .toBuffer();
}
