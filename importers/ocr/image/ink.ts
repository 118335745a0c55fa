import { type Grey, INK_BELOW, type Rect } from './grey';

interface Point {
  readonly x: number;
  readonly y: number;
}

/** Every ink pixel, thinned to at most `most` so that later steps take bounded time. */
export function inkPoints({ data, width }: Grey, most = 40_000): Point[] {
  const places: number[] = [];
  data.forEach((value, at) => {
    if (value < INK_BELOW) places.push(at);
  });
  const step = Math.max(1, Math.ceil(places.length / most));
  const points: Point[] = [];
  for (let index = 0; index < places.length; index += step) {
    const at = places[index] ?? 0;
    points.push({ x: at % width, y: Math.floor(at / width) });
  }
  return points;
}

function shareAt(sorted: readonly number[], share: number): number {
  return sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))] ?? 0;
}

/**
 * The part of a picture that holds writing: all but the outermost half percent of its ink,
 * with a margin. What lies about on the table at worst makes the part larger.
 */
export function inkBox(picture: Grey, points: readonly Point[]): Rect {
  const whole = { x: 0, y: 0, width: picture.width, height: picture.height };
  if (points.length < 200) return whole;
  const xs = points.map((point) => point.x).sort((a, b) => a - b);
  const ys = points.map((point) => point.y).sort((a, b) => a - b);
  const margin = Math.round(picture.width * 0.03);
  const left = Math.max(0, shareAt(xs, 0.004) - margin);
  const top = Math.max(0, shareAt(ys, 0.004) - margin);
  const right = Math.min(picture.width, shareAt(xs, 0.996) + margin);
  const bottom = Math.min(picture.height, shareAt(ys, 0.996) + margin);
  const box = { x: left, y: top, width: right - left, height: bottom - top };
  return box.width < picture.width * 0.15 || box.height < picture.height * 0.08 ? whole : box;
}

const WIDEST_DEG = 12;
const STEP_DEG = 0.2;

/**
 * The slope of the lines of writing in degrees, positive when they fall to the right: the
 * angle at which the ink, seen along the lines, gathers into the sharpest rows.
 */
export function slopeDeg(points: readonly Point[]): number {
  let best = { angle: 0, score: -1 };
  for (let angle = -WIDEST_DEG; angle <= WIDEST_DEG + 1e-9; angle += STEP_DEG) {
    const sin = Math.sin((angle * Math.PI) / 180);
    const cos = Math.cos((angle * Math.PI) / 180);
    const rows = new Map<number, number>();
    for (const { x, y } of points) {
      const row = Math.round(y * cos - x * sin);
      rows.set(row, (rows.get(row) ?? 0) + 1);
    }
    let score = 0;
    for (const count of rows.values()) score += count * count;
    if (score > best.score) best = { angle, score };
  }
  return best.angle;
}
