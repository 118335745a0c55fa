import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { Page } from '@playwright/test';
import sharp from 'sharp';
import type { TicketForm } from './forms/form';
import type { Printer } from './printed-ticket';

/** What a hand-held camera does to a ticket. Angles in degrees, lengths in photo pixels. */
export interface Faults {
  readonly tiltDeg?: number;
  readonly leanXDeg?: number;
  readonly leanYDeg?: number;
  readonly shadow?: 'none' | 'soft' | 'hand';
  readonly blurPx?: number;
  readonly noise?: number;
  readonly table?: 'wood' | 'hood' | 'clipboard';
  /** A wet patch or glare over a spot of the paper, in percent of its size. */
  readonly smudge?: { readonly xPercent: number; readonly yPercent: number; readonly css: string };
  /** The phone was held sideways: stored turned, with the EXIF mark that says so. */
  readonly sideways?: boolean;
}

export const PHOTO = { widthPx: 1440, heightPx: 1920 } as const;

const FONTS = [
  ['Courier Prime', '@fontsource/courier-prime/files/courier-prime-latin-400-normal.woff2', '400'],
  ['Courier Prime', '@fontsource/courier-prime/files/courier-prime-latin-700-normal.woff2', '700'],
  ['VT323', '@fontsource/vt323/files/vt323-latin-400-normal.woff2', '400'],
  ['Besley', '@fontsource-variable/besley/files/besley-latin-wght-normal.woff2', '400 900'],
  [
    'Public Sans',
    '@fontsource-variable/public-sans/files/public-sans-latin-wght-normal.woff2',
    '100 900',
  ],
  [
    'Sometype Mono',
    '@fontsource-variable/sometype-mono/files/sometype-mono-latin-wght-normal.woff2',
    '400 700',
  ],
] as const;

/** Fonts come with the packages and travel inside the page, so any machine draws the same. */
function fontFaces(): string {
  return FONTS.map(([family, file, weight]) => {
    const bytes = readFileSync(path.join(process.cwd(), 'node_modules', file));
    return `@font-face { font-family: '${family}'; font-weight: ${weight}; src: url(data:font/woff2;base64,${bytes.toString('base64')}) }`;
  }).join('\n');
}

const PAPERS = { white: '#f4f2ec', canary: '#f6e9a6', pink: '#f3c9cf' } as const;

const TABLES = {
  wood: 'repeating-linear-gradient(91deg, #6b4d33 0 38px, #77573a 38px 90px, #614429 90px 130px)',
  hood: 'linear-gradient(160deg, #20262c, #47525c 55%, #2b3239)',
  clipboard: 'radial-gradient(circle at 30% 20%, #8a6a48, #6f5236)',
} as const;

const SHADOWS = {
  none: 'none',
  soft: 'linear-gradient(115deg, rgba(0,0,0,0) 35%, rgba(0,0,0,.34) 85%)',
  hand: 'radial-gradient(ellipse 700px 900px at 82% 78%, rgba(0,0,0,.5), rgba(0,0,0,.42) 55%, rgba(0,0,0,0) 75%)',
} as const;

function pageHtml(form: TicketForm, printer: Printer, faults: Faults): string {
  const lean = `rotateX(${faults.leanXDeg ?? 0}deg) rotateY(${faults.leanYDeg ?? 0}deg) rotateZ(${faults.tiltDeg ?? 0}deg)`;
  const smudge = faults.smudge
    ? `<div style="position:absolute; left:${faults.smudge.xPercent}%; top:${faults.smudge.yPercent}%; ${faults.smudge.css}"></div>`
    : '';
  return `<!doctype html><style>${fontFaces()}
    body { margin: 0; width: ${PHOTO.widthPx}px; height: ${PHOTO.heightPx}px; overflow: hidden; position: relative; background: ${TABLES[faults.table ?? 'wood']} }
    .scene { position: absolute; inset: 0; display: grid; place-items: center; perspective: 4200px }
    .paper { position: relative; width: ${form.widthPx}px; box-sizing: border-box; padding: 54px 50px; background: ${PAPERS[form.paper]}; color: #23232b; box-shadow: 12px 16px 30px rgba(0,0,0,.5); transform: ${lean} }
    .shadow { position: absolute; inset: 0; background: ${SHADOWS[faults.shadow ?? 'none']} }
    ${form.css}</style>
    <div class="scene"><div class="paper">${form.html(printer)}${smudge}</div></div><div class="shadow"></div>`;
}

/** A small generator of even pseudo-random numbers, so that the same photo comes out twice. */
function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** Grain of a sensor: the sum of three even numbers is close enough to a bell curve. */
function addGrain(pixels: Buffer, strength: number, seed: number): void {
  const random = seededRandom(seed);
  for (let index = 0; index < pixels.length; index += 3) {
    const grain = (random() + random() + random() - 1.5) * strength;
    for (let channel = 0; channel < 3; channel += 1) {
      const value = (pixels[index + channel] ?? 0) + grain;
      pixels[index + channel] = Math.max(0, Math.min(255, Math.round(value)));
    }
  }
}

/** The JPEG bytes of one ticket as a phone would have taken it. */
export async function photograph(
  page: Page,
  form: TicketForm,
  printer: Printer,
  faults: Faults,
  seed: number,
): Promise<Buffer> {
  await page.setContent(pageHtml(form, printer, faults));
  await page.evaluate(() => document.fonts.ready);
  const shot = await page.screenshot({ type: 'png' });
  const { data, info } = await sharp(shot)
    .removeAlpha()
    .blur(faults.blurPx ?? 0.6)
    .raw()
    .toBuffer({ resolveWithObject: true });
  addGrain(data, faults.noise ?? 14, seed);
  const raw = { width: info.width, height: info.height, channels: 3 } as const;
  const taken = sharp(data, { raw });
  // Orientation 6: the camera was turned a quarter clockwise, so the stored picture lies left.
  const turned = faults.sideways ? taken.rotate(270).withMetadata({ orientation: 6 }) : taken;
  return turned.jpeg({ quality: 62, mozjpeg: true }).toBuffer();
}
