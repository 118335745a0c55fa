import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { chromium } from '@playwright/test';
import type { TicketForm } from './forms/form';
import { halvorsenBeside } from './forms/halvorsen-beside';
import { halvorsenDots } from './forms/halvorsen-dots';
import { ridgeBoxes } from './forms/ridge-boxes';
import { ridgeColumns } from './forms/ridge-columns';
import { sawtoothRoll } from './forms/sawtooth-roll';
import { type Faults, PHOTO, photograph } from './photograph';
import { type FieldText, type PrintedTicket, Printer } from './printed-ticket';
import { foundryTickets, larkspurTickets, sawtoothTickets, todaysTickets } from './tickets';

/**
 * Draws the ticket photographs of tests and demo: `npm run ticket-photos`. The pictures are
 * committed; this runs only when a form or a ticket changes, and needs Chromium.
 */
interface Shot {
  readonly form: TicketForm;
  readonly ticket: PrintedTicket;
  readonly faults: Faults;
}

function shots(
  form: TicketForm,
  tickets: readonly PrintedTicket[],
  faults: readonly Faults[],
): Shot[] {
  return tickets.map((ticket, index) => ({ form, ticket, faults: faults[index] ?? {} }));
}

/** A wet thumb over the yards of the load: its digits have run and nobody can be sure of them. */
const WET_THUMB =
  'width:96px; height:50px; border-radius:50%; background:rgba(58,54,60,.9); filter:blur(6px)';

function allShots(): Shot[] {
  const larkspur = larkspurTickets();
  return [
    ...shots(ridgeBoxes, foundryTickets(), [
      { tiltDeg: 0.8, table: 'wood' },
      { tiltDeg: -1.6, leanYDeg: 3, shadow: 'soft' },
      { tiltDeg: 2.2, leanXDeg: 6, table: 'hood' },
      { tiltDeg: -0.6, shadow: 'hand', table: 'clipboard' },
      { tiltDeg: 1.2, noise: 26, blurPx: 0.8 },
      { tiltDeg: -2.8, leanXDeg: 4, leanYDeg: -4, shadow: 'soft', table: 'hood' },
    ]),
    ...shots(halvorsenBeside, larkspur.slice(0, 2), [
      { tiltDeg: 1.5, leanXDeg: 5, table: 'clipboard' },
      { tiltDeg: -2, shadow: 'soft', sideways: true },
    ]),
    ...shots(halvorsenDots, larkspur.slice(2), [
      { tiltDeg: 0.7, leanYDeg: -3 },
      { tiltDeg: -1.4, shadow: 'soft', noise: 20, table: 'hood' },
    ]),
    ...shots(ridgeColumns, todaysTickets(), [
      { tiltDeg: -1, leanXDeg: 4 },
      { tiltDeg: 1.8, shadow: 'soft', table: 'hood' },
      { tiltDeg: 0.5, smudge: { xPercent: 14.5, yPercent: 53.6, css: WET_THUMB } },
      { tiltDeg: -1.5, leanYDeg: 4, noise: 20, table: 'clipboard' },
    ]),
    ...shots(sawtoothRoll, sawtoothTickets(), [
      { tiltDeg: 1 },
      { tiltDeg: -2.5, leanXDeg: 6, shadow: 'hand' },
      { tiltDeg: 3.5, noise: 24, table: 'hood' },
      { tiltDeg: -0.8, blurPx: 1.3, shadow: 'soft', table: 'clipboard' },
    ]),
  ];
}

/** What a test may know of a photo besides its picture. */
interface PhotoTruth {
  readonly form: string;
  readonly fields: FieldText;
}

async function generate(folder: string): Promise<void> {
  mkdirSync(folder, { recursive: true });
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium' });
  const page = await browser.newPage({
    viewport: { width: PHOTO.widthPx, height: PHOTO.heightPx },
  });
  const truth: Record<string, PhotoTruth> = {};
  for (const [index, shot] of allShots().entries()) {
    const printer = new Printer(shot.ticket, shot.form.notation);
    const bytes = await photograph(page, shot.form, printer, shot.faults, index + 1);
    const file = `${shot.ticket.fields.ticketNumber}.jpg`;
    writeFileSync(path.join(folder, file), bytes);
    truth[file] = { form: shot.form.name, fields: printer.truth() };
    console.error(`${file} ${shot.form.name} ${Math.round(bytes.length / 1024)} kB`);
  }
  await browser.close();
  writeFileSync(path.join(folder, 'truth.json'), `${JSON.stringify(truth, null, 2)}\n`);
}

await generate(path.join(process.cwd(), 'tests/fixtures/tickets'));
