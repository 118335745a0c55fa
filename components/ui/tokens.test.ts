import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

/** The colour tokens of one theme, read from the style sheet that people get. */
function tokensOf(theme: 'light' | 'dark' | 'print'): Map<string, string> {
  const css = readFileSync(path.resolve('app/globals.css'), 'utf8');
  const starts = {
    light: css.indexOf(':root {'),
    dark: css.indexOf('@media (prefers-color-scheme: dark)'),
    print: css.indexOf('@media print'),
  };
  const from = css.indexOf(':root {', starts[theme]);
  const block = css.slice(from, css.indexOf('}', from));
  const found = new Map<string, string>();
  for (const [, name, value] of block.matchAll(/--([a-z-]+): #([0-9a-f]{3,6});/g)) {
    if (name && value) found.set(name, value.length === 3 ? value.replace(/./g, '$&$&') : value);
  }
  return found;
}

/** Relative luminance of a colour: WCAG 2.2, "relative luminance". */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [0, 2, 4].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** Contrast ratio of two colours: WCAG 2.2, "contrast ratio". */
function contrast(one: string, other: string): number {
  const [dark = 0, light = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

const PAPERS = [
  'paper',
  'sheet',
  'desk',
  'band',
  'tab',
  'canary',
  'canary-soft',
  'pink',
  'pink-soft',
];
const TEXTS = ['ink', 'ink-soft', 'carbon', 'keel', 'moss'];

describe.each(['light', 'dark', 'print'] as const)('the %s theme', (theme) => {
  const tokens = tokensOf(theme);
  const colour = (name: string) => {
    const hex = tokens.get(name) ?? tokensOf('light').get(name);
    if (!hex) throw new Error(`no token ${name}`);
    return hex;
  };

  it.each(TEXTS)('has %s text of at least 4.5:1 on every paper', (text) => {
    const short = PAPERS.filter((paper) => contrast(colour(text), colour(paper)) < 4.5);
    expect(short.map((p) => `${p} ${contrast(colour(text), colour(p)).toFixed(2)}`)).toEqual([]);
  });

  it('has the words of the main action at 4.5:1', () => {
    expect(contrast(colour('carbon-on'), colour('carbon'))).toBeGreaterThanOrEqual(4.5);
    expect(contrast(colour('paper'), colour('ink'))).toBeGreaterThanOrEqual(4.5);
    expect(contrast(colour('paper'), colour('keel'))).toBeGreaterThanOrEqual(4.5);
  });

  it('has the edges of controls at 3:1 on every paper', () => {
    const short = PAPERS.filter((paper) => contrast(colour('wet'), colour(paper)) < 3);
    expect(short).toEqual([]);
  });
});

it('knows a bad pair when it sees one', () => {
  expect(contrast('ffffff', '000000')).toBeCloseTo(21, 5);
  expect(contrast('56607a', '27418f')).toBeLessThan(4.5);
});
