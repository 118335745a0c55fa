import { fail, ok, type Result } from '../../lib/domain/result';
import { READ_FAILURES, type ReadFailure, type ReadFailureCode } from './reading';

export const MAX_PHOTO_BYTES = 20 * 1024 * 1024;

export function failure(code: ReadFailureCode): ReadFailure {
  return { code, sentence: READ_FAILURES[code] };
}

function ascii(bytes: Uint8Array, from: number, to: number): string {
  return String.fromCharCode(...bytes.subarray(from, to));
}

const HEIC_BRANDS = /^(heic|heix|hevc|hevx|heim|heis|mif1|msf1)$/;

/** What a refused file is, judged by its first bytes; its name says nothing. */
function refusedKind(bytes: Uint8Array): ReadFailureCode {
  if (ascii(bytes, 0, 5) === '%PDF-') return 'pdf';
  if (/^GIF8[79]a/.test(ascii(bytes, 0, 6))) return 'gif';
  const tiff = ascii(bytes, 0, 4);
  if (tiff === 'II*\0' || tiff === 'MM\0*') return 'tiff';
  if (ascii(bytes, 4, 8) === 'ftyp' && HEIC_BRANDS.test(ascii(bytes, 8, 12))) return 'heic';
  if (/<svg[\s>]/i.test(ascii(bytes, 0, 1024))) return 'svg';
  return 'notAPhoto';
}

export type PhotoKind = 'jpeg' | 'png' | 'webp';

/** The kind of picture that the bytes are, or why they are refused. */
export function sniffPhoto(bytes: Uint8Array): Result<PhotoKind, ReadFailure> {
  if (bytes.length === 0) return fail(failure('empty'));
  if (bytes.length > MAX_PHOTO_BYTES) return fail(failure('tooLarge'));
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return ok('jpeg');
  if (ascii(bytes, 0, 8) === '\x89PNG\r\n\x1a\n') return ok('png');
  if (ascii(bytes, 0, 4) === 'RIFF' && ascii(bytes, 8, 12) === 'WEBP') return ok('webp');
  return fail(failure(refusedKind(bytes)));
}
