/** Mix codes are compared without case, spaces and punctuation: "4000-A" is "4000a". */
export function sameMix(one: string, other: string): boolean {
  return mixKey(one) === mixKey(other);
}

export function mixKey(code: string): string {
  return code.toUpperCase().replace(/[^A-Z0-9]/g, '');
}
