import { expect, test } from 'vitest';
import { spotView, topView, wholeView } from './photo-view';

const photo = { width: 1500, height: 2000 };
const frame = { width: 360, height: 240 };

test('the whole photo fits and is centred', () => {
  expect(wholeView(photo, frame)).toEqual({ scale: 0.12, x: 90, y: 0 });
  expect(topView(photo, frame)).toEqual({ scale: 0.24, x: 0, y: 0 });
});

test('a spot stands in the middle, larger than in the whole photo', () => {
  const spot = { x: 700, y: 900, width: 100, height: 40 };
  const view = spotView(spot, photo, frame);
  expect(view.scale).toBeGreaterThan(0.24);
  expect(view.x + 750 * view.scale).toBeCloseTo(180);
  expect(view.y + 920 * view.scale).toBeCloseTo(120);
});

test('a spot in a corner does not pull the photo’s edge into the frame', () => {
  const view = spotView({ x: 0, y: 0, width: 80, height: 30 }, photo, frame);
  expect([view.x, view.y]).toEqual([0, 0]);
  const end = spotView({ x: 1450, y: 1980, width: 50, height: 20 }, photo, frame);
  expect(end.x).toBeCloseTo(360 - 1500 * end.scale);
  expect(end.y).toBeCloseTo(240 - 2000 * end.scale);
});
