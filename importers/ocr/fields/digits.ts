const LOOKALIKES: Readonly<Record<string, string>> = {
  O: '0',
  o: '0',
  Q: '0',
  D: '0',
  I: '1',
  l: '1',
  i: '1',
  '|': '1',
  S: '5',
  s: '5',
  B: '8',
  G: '6',
  Z: '2',
  z: '2',
};

/**
 * Turns letters that stand where only digits can into the digits that they resemble. Only for
 * text that already holds a digit: a word is not a misread number.
 */
export function asDigits(text: string): { text: string; repaired: boolean } {
  if (!/\d/.test(text)) return { text, repaired: false };
  const digits = text.replace(/[OoQDIli|SsBGZz]/g, (letter) => LOOKALIKES[letter] ?? letter);
  return { text: digits, repaired: digits !== text };
}
