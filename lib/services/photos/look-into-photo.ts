import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import { MAX_PHOTO_BYTES, MAX_PHOTO_PIXELS } from '../../contracts/photos';
import type { Result } from '../../domain/result';
import { fail, ok } from '../../domain/result';
import type { Failure } from '../failure';
import { failure } from '../failure';

export const PHOTO_MEDIA_TYPES = ['image/jpeg', 'image/png', 'image/webp'] as const;
export type PhotoMediaType = (typeof PHOTO_MEDIA_TYPES)[number];

export interface PhotoFacts {
  readonly mediaType: PhotoMediaType;
  /** Upright, as the photo is shown. */
  readonly widthPx: number;
  readonly heightPx: number;
}

/** Smaller than this no ticket can be read, whatever is on it. */
const MIN_SIDE_PX = 200;

/**
 * What kind of picture the bytes are, found in the bytes themselves: neither the name nor the
 * sender's word is believed.
 */
export async function lookIntoPhoto(bytes: Uint8Array): Promise<Result<PhotoFacts, Failure>> {
  if (bytes.length === 0) return refuse('invalid', 'The file is empty. Take the photo again.');
  if (bytes.length > MAX_PHOTO_BYTES) {
    return refuse('tooLarge', 'The photo is larger than 20 MB. Take it again, or send a JPEG.');
  }
  const found = await fileTypeFromBuffer(bytes);
  const mediaType = PHOTO_MEDIA_TYPES.find((type) => type === found?.mime);
  if (!mediaType) return refuse('wrongType', whyNot(found?.mime));
  return measure(bytes, mediaType);
}

function whyNot(mime: string | undefined): string {
  if (mime === 'image/heic' || mime === 'image/heif') {
    return 'This photo is HEIC, which cannot be read here. Set the camera to “Most compatible” (JPEG), or send a screenshot of it.';
  }
  if (mime === 'application/pdf') {
    return 'This is a PDF, not a photo. Photograph the ticket, or send a picture of the page.';
  }
  const what = mime ? ` (it is ${mime})` : '';
  return `This is not a photo${what}. Send a JPEG, PNG or WebP picture of the ticket.`;
}

async function measure(
  bytes: Uint8Array,
  mediaType: PhotoMediaType,
): Promise<Result<PhotoFacts, Failure>> {
  let size: { width: number; height: number };
  try {
    const { autoOrient } = await sharp(bytes, { limitInputPixels: false }).metadata();
    size = autoOrient;
  } catch {
    return refuse('invalid', 'The picture is damaged and cannot be opened. Take it again.');
  }
  if (size.width * size.height > MAX_PHOTO_PIXELS) {
    return refuse('tooLarge', 'The photo has more than 50 megapixels. Send a smaller one.');
  }
  if (Math.min(size.width, size.height) < MIN_SIDE_PX) {
    return refuse('invalid', 'The picture is too small to read a ticket from. Take it again.');
  }
  return ok({ mediaType, widthPx: size.width, heightPx: size.height });
}

function refuse(code: Failure['code'], message: string): Result<PhotoFacts, Failure> {
  return fail(failure(code, message));
}
