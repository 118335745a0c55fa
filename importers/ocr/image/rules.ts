import type { Grey } from './grey';

/** Pre-printed rules are fainter than type. */
const FAINT_BELOW = 210;
/** A rule is thin over most of its length; a row of blurred letters is not. */
const THICKEST_PX = 9;
const THIN_SHARE = 0.8;

/** The picture seen along its rows or along its columns, so that one search serves both. */
interface View {
  readonly lines: number;
  readonly length: number;
  at(line: number, along: number): number;
}

/**
 * Takes the ruled lines of a form out of an evened, straightened picture. The engine takes a
 * ruled table for a drawing and loses the words in it. A rule is thin ink that goes on much
 * longer than any stroke of a letter; letters that touch it keep their strokes.
 */
export function withoutRules(picture: Grey): Grey {
  const { width, height } = picture;
  const data = Uint8Array.from(picture.data);
  const shortest = Math.round(width * 0.045);
  const rows: View = { lines: height, length: width, at: (line, along) => line * width + along };
  const columns: View = { lines: width, length: height, at: (line, along) => along * width + line };
  for (const view of [rows, columns]) {
    for (let line = 0; line < view.lines; line += 1) {
      wipeRulesOfLine(picture.data, data, view, line, shortest);
    }
  }
  return { data, width, height };
}

function wipeRulesOfLine(
  from: Uint8Array,
  to: Uint8Array,
  view: View,
  line: number,
  shortest: number,
): void {
  let start = -1;
  for (let along = 0; along <= view.length; along += 1) {
    const ink = along < view.length && (from[view.at(line, along)] ?? 255) < FAINT_BELOW;
    if (ink && start < 0) start = along;
    if (ink || start < 0) continue;
    if (along - start >= shortest) wipeRun(from, to, view, line, start, along);
    start = -1;
  }
}

function wipeRun(
  from: Uint8Array,
  to: Uint8Array,
  view: View,
  line: number,
  start: number,
  end: number,
): void {
  const thin: number[] = [];
  for (let along = start; along < end; along += 1) {
    if (thickness(from, view, line, along) <= THICKEST_PX) thin.push(along);
  }
  if (thin.length < (end - start) * THIN_SHARE) return;
  for (const along of thin) {
    for (let side = -2; side <= 2; side += 1) {
      const other = line + side;
      if (other >= 0 && other < view.lines) to[view.at(other, along)] = 255;
    }
  }
}

/** How many pixels of ink lie across the run at one place, counted no further than needed. */
function thickness(from: Uint8Array, view: View, line: number, along: number): number {
  let count = 1;
  for (const step of [-1, 1]) {
    for (let other = line + step; count <= THICKEST_PX; other += step) {
      if (other < 0 || other >= view.lines) break;
      if ((from[view.at(other, along)] ?? 255) >= FAINT_BELOW) break;
      count += 1;
    }
  }
  return count;
}
