import type { Rect } from './image/grey';
import type { Word } from './words';

/** Words that stand side by side with no more than a space between: one label or one value. */
export interface Segment {
  readonly words: readonly Word[];
  readonly box: Rect;
}

/** Words on one height, from left to right. */
export interface Line {
  readonly words: readonly Word[];
  readonly box: Rect;
}

export function right(box: Rect): number {
  return box.x + box.width;
}

export function bottom(box: Rect): number {
  return box.y + box.height;
}

function middleY(box: Rect): number {
  return box.y + box.height / 2;
}

/**
 * How far apart in height two words stand: by their feet where one box is stretched upwards by
 * the remains of a rule, by their middles where letters hang below the line.
 */
function heightApart(a: Rect, b: Rect): number {
  return Math.min(Math.abs(middleY(a) - middleY(b)), Math.abs(bottom(a) - bottom(b)));
}

export function around(words: readonly Word[]): Rect {
  const x = Math.min(...words.map((word) => word.box.x));
  const y = Math.min(...words.map((word) => word.box.y));
  const width = Math.max(...words.map((word) => right(word.box))) - x;
  const height = Math.max(...words.map((word) => bottom(word.box))) - y;
  return { x, y, width, height };
}

export function textOf(words: readonly Word[]): string {
  return words.map((word) => word.text).join(' ');
}

/** Cuts "Truck:41" in two; a clock time is left whole. */
function splitAtColon(word: Word): Word[] {
  const found = /^([A-Za-z][A-Za-z.#]+:)(\S+)$/.exec(word.text);
  if (!found) return [word];
  const [, label = '', value = ''] = found;
  const cut = Math.round((word.box.width * label.length) / word.text.length);
  const { x, y, width, height } = word.box;
  return [
    { ...word, text: label, box: { x, y, width: cut, height } },
    { ...word, text: value, box: { x: x + cut, y, width: width - cut, height } },
  ];
}

/** Leaves out the specks and remains of rules that the engine takes for characters. */
function isWriting(word: Word): boolean {
  return /[A-Za-z0-9]/.test(word.text) && word.confidence > 0.1 && word.box.height >= 6;
}

/**
 * Gathers words into lines by height. Each word is compared with its left neighbour, so that a
 * line which still slopes a little stays one line.
 */
export function linesOf(words: readonly Word[]): Line[] {
  const lines: Word[][] = [];
  const writing = words.filter(isWriting).flatMap(splitAtColon);
  for (const word of writing.sort((a, b) => a.box.x - b.box.x)) {
    let best: { line: Word[]; distance: number } | null = null;
    for (const line of lines) {
      const last = line[line.length - 1];
      if (!last || right(last.box) > word.box.x + word.box.height) continue;
      const distance = heightApart(last.box, word.box);
      if (distance > 0.5 * Math.min(last.box.height, word.box.height)) continue;
      if (!best || distance < best.distance) best = { line, distance };
    }
    if (best) best.line.push(word);
    else lines.push([word]);
  }
  return lines
    .map((line) => ({ words: line, box: around(line) }))
    .sort((a, b) => middleY(a.box) - middleY(b.box));
}

/** A gap wider than this many letter heights parts two cells of a form. */
const CELL_GAP_HEIGHTS = 1.6;

/** Parts words of a line where the gap is wider than a space. */
export function segmentsOf(words: readonly Word[]): Segment[] {
  const segments: Word[][] = [];
  for (const word of words) {
    const segment = segments[segments.length - 1];
    const last = segment?.[segment.length - 1];
    const height = last ? Math.max(last.box.height, word.box.height) : 0;
    const near = last && word.box.x - right(last.box) <= CELL_GAP_HEIGHTS * height;
    if (segment && near) segment.push(word);
    else segments.push([word]);
  }
  return segments.map((segment) => ({ words: segment, box: around(segment) }));
}
