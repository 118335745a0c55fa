import { readFileSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTicketReader, type TicketReader } from './read-ticket';

const FOLDER = path.join('tests', 'fixtures', 'tickets');
const TRUTH = JSON.parse(readFileSync(path.join(FOLDER, 'truth.json'), 'utf8')) as Record<
  string,
  { form: string; fields: Record<string, string> }
>;
/** Three of the forms: a ruled one in shade, one with dotted lines and grain, a paper roll. */
const PHOTOS = ['558902.jpg', 'H-40314.jpg', '70937.jpg'];

let reader: TicketReader;
beforeAll(() => {
  reader = createTicketReader();
});
afterAll(() => reader.close());

const plain = (text: string) => text.toLowerCase().replace(/\s+/g, ' ');

async function fieldsOf(file: string) {
  const result = await reader.read(readFileSync(path.join(FOLDER, file)));
  if (!result.ok) throw new Error(`${file}: ${result.error.sentence}`);
  return result.value.fields as Record<string, { value: string; doubtful: boolean }>;
}

describe('the ticket reader', () => {
  it('reads differently laid-out tickets, invents nothing, and doubts what it has wrong', async () => {
    expect(new Set(PHOTOS.map((file) => TRUTH[file]?.form)).size).toBe(3);
    let [printed, right] = [0, 0];
    for (const file of PHOTOS) {
      const truth = TRUTH[file]?.fields ?? {};
      const fields = await fieldsOf(file);
      printed += Object.keys(truth).length;
      for (const [name, { value, doubtful }] of Object.entries(fields)) {
        expect(Object.keys(truth), `${file} ${name}`).toContain(name);
        const isRight = plain(value) === plain(truth[name] ?? '');
        if (!doubtful) expect(isRight, `${file} ${name}: ${value}`).toBe(true);
        if (isRight) right += 1;
      }
    }
    expect(right / printed).toBeGreaterThan(0.95);
  }, 240_000);

  it('says nothing of yards that a wet thumb has washed out', async () => {
    const { quantityYd3, ticketNumber } = await fieldsOf('558903.jpg');
    expect(ticketNumber?.value).toBe('558903');
    expect(quantityYd3 === undefined || quantityYd3.doubtful).toBe(true);
  }, 120_000);

  it('refuses what is no picture and what has no words, each in a sentence', async () => {
    const blank = { width: 1000, height: 1300, channels: 3, background: '#777' } as const;
    for (const bytes of [
      Buffer.from('%PDF-1.7'),
      Buffer.alloc(0),
      await sharp({ create: blank }).png().toBuffer(),
    ]) {
      const result = await reader.read(bytes);
      expect(result.ok).toBe(false);
      if (!result.ok) expect(result.error.sentence).toMatch(/\.$/);
    }
  }, 120_000);
});
