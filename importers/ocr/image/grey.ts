/** A picture of one channel, row by row, 0 black to 255 white. */
export interface Grey {
  readonly data: Uint8Array;
  readonly width: number;
  readonly height: number;
}

export interface Rect {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Below this share of the paper's brightness a pixel of an evened picture counts as ink. */
export const INK_BELOW = 150;

export function meanOf(picture: Grey): number {
  let sum = 0;
  for (const value of picture.data) sum += value;
  return sum / Math.max(1, picture.data.length);
}

/**
 * How sharp a picture is: the variance of its Laplacian over the places that hold an edge at
 * all, so that a half-empty sheet does not count as blurred.
 */
export function sharpnessOf({ data, width, height }: Grey): number {
  let sum = 0;
  let count = 0;
  for (let y = 1; y < height - 1; y += 1) {
    for (let x = 1; x < width - 1; x += 1) {
      const at = y * width + x;
      const here = data[at] ?? 0;
      const left = data[at - 1] ?? 0;
      const right = data[at + 1] ?? 0;
      const above = data[at - width] ?? 0;
      const below = data[at + width] ?? 0;
      if (Math.abs(left - right) + Math.abs(above - below) < 40) continue;
      sum += (left + right + above + below - 4 * here) ** 2;
      count += 1;
    }
  }
  return count === 0 ? 0 : sum / count;
}
