import type { Encoding } from '../core/layout';

export interface EncodingGuess {
  readonly encoding: Encoding;
  /** True where a byte order mark says so; otherwise it was inferred. */
  readonly stated: boolean;
  /** Plain ASCII reads the same in UTF-8 and Windows-1252: nothing to warn of. */
  readonly sure: boolean;
}

/** Share of zero bytes at even and odd places of the head: UTF-16 text has one side full. */
function zeroShares(bytes: Uint8Array): { even: number; odd: number } {
  const head = bytes.subarray(0, 4096 - (4096 % 2));
  let even = 0;
  let odd = 0;
  for (let index = 0; index < head.length; index += 1) {
    if (head[index] !== 0) continue;
    if (index % 2 === 0) even += 1;
    else odd += 1;
  }
  const pairs = Math.max(1, head.length / 2);
  return { even: even / pairs, odd: odd / pairs };
}

function isValidUtf8(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return true;
  } catch {
    return false;
  }
}

/** Tells the encoding by byte order mark, then by zero bytes, then by whether it is valid UTF-8. */
export function detectEncoding(bytes: Uint8Array): EncodingGuess {
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) {
    return { encoding: 'utf-8', stated: true, sure: true };
  }
  if (bytes[0] === 0xff && bytes[1] === 0xfe) {
    return { encoding: 'utf-16le', stated: true, sure: true };
  }
  if (bytes[0] === 0xfe && bytes[1] === 0xff) {
    return { encoding: 'utf-16be', stated: true, sure: true };
  }
  const zeros = zeroShares(bytes);
  if (zeros.odd > 0.7 && zeros.even < 0.1) {
    return { encoding: 'utf-16le', stated: false, sure: false };
  }
  if (zeros.even > 0.7 && zeros.odd < 0.1) {
    return { encoding: 'utf-16be', stated: false, sure: false };
  }
  if (isValidUtf8(bytes)) return { encoding: 'utf-8', stated: false, sure: true };
  return { encoding: 'windows-1252', stated: false, sure: false };
}

/**
 * The 32 places at which Windows-1252 differs from Latin-1, from 0x80 on. Kept here because
 * Node 20's TextDecoder reads "windows-1252" as Latin-1, which turns "€" into a control
 * character.
 */
const WINDOWS_1252_HIGH = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ';

function decodeWindows1252(bytes: Uint8Array): string {
  return new TextDecoder('latin1').decode(bytes).replace(/[\u0080-\u009f]/g, (character) => {
    return WINDOWS_1252_HIGH[character.charCodeAt(0) - 0x80] ?? character;
  });
}

export interface DecodedText {
  /** Line ends are all "\n"; the byte order mark is gone. */
  readonly text: string;
  /** How many characters could not be read and became U+FFFD. */
  readonly replaced: number;
}

/** Bytes to text. Never fails: what is not valid becomes the replacement character, counted. */
export function decodeText(bytes: Uint8Array, encoding: Encoding): DecodedText {
  const decoded =
    encoding === 'windows-1252'
      ? decodeWindows1252(bytes)
      : new TextDecoder(encoding).decode(bytes);
  const text = decoded.replace(/\r\n?/g, '\n');
  let replaced = 0;
  for (const character of text) if (character === '\ufffd') replaced += 1;
  return { text, replaced };
}
