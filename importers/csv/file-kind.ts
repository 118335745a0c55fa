/**
 * Names what a file is when it is not delimited text. Judged by content, never by name: an
 * export called "statement.csv" is often a workbook or a web page.
 */

interface Signature {
  readonly name: string;
  readonly bytes: readonly number[];
  readonly offset?: number;
}

const SIGNATURES: readonly Signature[] = [
  { name: 'a PDF document', bytes: [0x25, 0x50, 0x44, 0x46, 0x2d] },
  {
    name: 'an Excel workbook of the old kind (.xls)',
    bytes: [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1],
  },
  { name: 'a PNG picture', bytes: [0x89, 0x50, 0x4e, 0x47] },
  { name: 'a JPEG picture', bytes: [0xff, 0xd8, 0xff] },
  { name: 'a GIF picture', bytes: [0x47, 0x49, 0x46, 0x38] },
  { name: 'a WebP picture', bytes: [0x57, 0x45, 0x42, 0x50], offset: 8 },
  { name: 'a TIFF picture', bytes: [0x49, 0x49, 0x2a, 0x00] },
  { name: 'a TIFF picture', bytes: [0x4d, 0x4d, 0x00, 0x2a] },
  { name: 'a phone picture or video (HEIC or MP4)', bytes: [0x66, 0x74, 0x79, 0x70], offset: 4 },
  { name: 'a gzip archive', bytes: [0x1f, 0x8b] },
  { name: 'a 7-Zip archive', bytes: [0x37, 0x7a, 0xbc, 0xaf, 0x27, 0x1c] },
  { name: 'a RAR archive', bytes: [0x52, 0x61, 0x72, 0x21] },
  { name: 'a bzip2 archive', bytes: [0x42, 0x5a, 0x68] },
  { name: 'a Zstandard archive', bytes: [0x28, 0xb5, 0x2f, 0xfd] },
];

function startsWith(bytes: Uint8Array, wanted: readonly number[], offset: number): boolean {
  return wanted.every((byte, index) => bytes[offset + index] === byte);
}

/** The bytes as one character each, for looking for ASCII words in any encoding. */
function asciiHead(bytes: Uint8Array, length: number): string {
  return String.fromCharCode(...bytes.subarray(0, length));
}

function zipKind(bytes: Uint8Array): string {
  const head = asciiHead(bytes, 4096) + asciiHead(bytes.subarray(-4096), 4096);
  if (head.includes('xl/')) return 'an Excel workbook (.xlsx)';
  if (head.includes('word/')) return 'a Word document (.docx)';
  if (head.includes('opendocument.spreadsheet')) return 'an OpenDocument spreadsheet (.ods)';
  return 'a ZIP archive';
}

function textKind(bytes: Uint8Array): string | null {
  const head = asciiHead(bytes, 512)
    .replace(/^\u00ef\u00bb\u00bf/, '')
    .trimStart()
    .toLowerCase();
  if (head.startsWith('{\\rtf')) return 'a rich-text document (.rtf)';
  if (/^(<!doctype html|<html|<table|<head|<body)/.test(head)) return 'a web page (HTML)';
  if (head.startsWith('<?xml')) return 'an XML file';
  if (/^(\{\s*"|\[\s*[{[])/.test(head)) return 'a JSON file';
  return null;
}

/** Plain control characters do not occur in text; a few percent of them mean a binary file. */
function looksBinary(bytes: Uint8Array): boolean {
  const head = bytes.subarray(0, 4096);
  let odd = 0;
  for (const byte of head) {
    if (byte === 0) return true;
    if (byte < 32 && byte !== 9 && byte !== 10 && byte !== 13 && byte !== 12) odd += 1;
  }
  return odd > head.length * 0.02;
}

/**
 * What the file is, with its article ("a PDF document"), or null where it can be read as text.
 * `wide` says that the bytes were already recognised as UTF-16, whose zero bytes are no sign
 * of a binary file.
 */
export function nameOfOtherKind(bytes: Uint8Array, wide: boolean): string | null {
  for (const signature of SIGNATURES) {
    if (startsWith(bytes, signature.bytes, signature.offset ?? 0)) return signature.name;
  }
  if (startsWith(bytes, [0x50, 0x4b, 0x03, 0x04], 0)) return zipKind(bytes);
  if (wide) return null;
  return textKind(bytes) ?? (looksBinary(bytes) ? 'a binary file of an unknown kind' : null);
}
