import { fail, ok, type Result } from '../../lib/domain/result';
import { type Candidate, candidateIn, candidatesOf, type LookResult } from './candidates';
import type { Grey, Rect } from './image/grey';
import { around } from './lines';
import {
  asCutPng,
  asPng,
  type PreparedPicture,
  prepare,
  type Survey,
  survey,
  turned,
  uprightPhoto,
} from './prepare';
import {
  type Box,
  READING_NOTES,
  type ReadContext,
  type ReadFailure,
  type ReadFailureCode,
  type ReadingNote,
  TICKET_FIELDS,
  type TicketField,
  type TicketFields,
  type TicketReading,
} from './reading';
import { isAgreed, type Settled, settle } from './settle';
import { failure, sniffPhoto } from './sniff';
import { supplierOf } from './supplier';
import { EngineError, type Word, WordReader } from './words';

export interface TicketReaderOptions {
  /** Hears of faults inside the engine that no reading reports. */
  readonly onEngineError?: (error: unknown) => void;
}

export interface TicketReader {
  /**
   * Reads a photographed delivery ticket (JPEG, PNG or WebP, at most 20 MB and 50 megapixels).
   * Expected failures are returned with what to do about them.
   */
  read(bytes: Uint8Array, context?: ReadContext): Promise<Result<TicketReading, ReadFailure>>;
  /** Ends the engine. A later read starts it again. */
  close(): Promise<void>;
}

/** Fewer labels than this, and the picture is taken for something other than a ticket. */
const FEWEST_LABELS = 4;
const FEWEST_FIELDS = 3;
const SECOND_LOOK_WIDTH_PX = 1250;
/** Below these a failed picture is called dark or blurred, from the demo's own photographs. */
const DARK_BELOW = 45;
const BLURRED_BELOW = 300;

/** Makes a reader with one engine behind it; readings wait for one another. */
export function createTicketReader(options: TicketReaderOptions = {}): TicketReader {
  const engine = new WordReader(options.onEngineError ?? (() => undefined));
  return {
    async read(bytes, context = {}) {
      const kind = sniffPhoto(bytes);
      if (!kind.ok) return kind;
      const photo = await uprightPhoto(bytes);
      if (!photo.ok) return photo;
      try {
        return await readPhoto(engine, photo.value, context);
      } catch (error) {
        if (!(error instanceof EngineError)) throw error;
        options.onEngineError?.(error);
        return fail(failure('engine'));
      }
    },
    close: () => engine.stop(),
  };
}

interface Looked {
  readonly survey: Survey;
  readonly prepared: PreparedPicture;
  readonly first: LookResult;
}

async function lookAt(engine: WordReader, upright: Grey): Promise<Looked> {
  const surveyed = await survey(upright);
  const prepared = await prepare(surveyed);
  const words = await engine.read(await asPng(prepared.picture), 'block');
  return { survey: surveyed, prepared, first: candidatesOf(words) };
}

async function secondLook(engine: WordReader, { picture }: PreparedPicture): Promise<LookResult> {
  const width = Math.min(SECOND_LOOK_WIDTH_PX, picture.width);
  const words = await engine.read(await asPng(picture, width), 'scattered');
  return candidatesOf(words.map((word) => scaled(word, picture.width / width)));
}

function scaled(word: Word, factor: number): Word {
  const { x, y, width, height } = word.box;
  const box = {
    x: x * factor,
    y: y * factor,
    width: width * factor,
    height: height * factor,
  };
  return { ...word, box };
}

async function readPhoto(
  engine: WordReader,
  photo: Grey,
  context: ReadContext,
): Promise<Result<TicketReading, ReadFailure>> {
  let looked = await lookAt(engine, photo);
  let toPhoto = looked.prepared.toPhoto;
  if (looked.first.labelCount < FEWEST_LABELS) {
    for (const quarters of [1, 3, 2] as const) {
      const other = await lookAt(engine, await turned(photo, quarters));
      if (other.first.labelCount <= looked.first.labelCount) continue;
      looked = other;
      toPhoto = (rect) => turnedBack(other.prepared.toPhoto(rect), quarters, photo);
      if (other.first.labelCount >= FEWEST_LABELS) break;
    }
  }
  const looks = [looked.first, await secondLook(engine, looked.prepared)];
  if (Math.max(...looks.map((look) => look.labelCount)) < FEWEST_LABELS) {
    return fail(failure(whyUnreadable(looked.survey)));
  }
  const votes = votesOf(looks, context);
  await thirdLooks(engine, looked.prepared, votes);
  const { fields, checks } = settle(votes, context);
  if (fields.length < FEWEST_FIELDS) return fail(failure(whyUnreadable(looked.survey)));
  const notes = [...photoNotes(looked.survey), ...checks.notes];
  const image = { widthPx: photo.width, heightPx: photo.height };
  return ok({ fields: namedFields(fields, toPhoto), notes, image });
}

function whyUnreadable({ brightness, sharpness }: Survey): ReadFailureCode {
  if (brightness < DARK_BELOW) return 'dark';
  return sharpness > 0 && sharpness < BLURRED_BELOW ? 'blurred' : 'noTicket';
}

function photoNotes({ brightness, sharpness }: Survey): ReadingNote[] {
  if (brightness < DARK_BELOW) return [{ code: 'dark', sentence: READING_NOTES.dark }];
  if (sharpness >= BLURRED_BELOW) return [];
  return [{ code: 'blurred', sentence: READING_NOTES.blurred }];
}

function votesOf(
  looks: readonly LookResult[],
  context: ReadContext,
): Map<TicketField, Candidate[]> {
  const votes = new Map<TicketField, Candidate[]>();
  for (const look of looks) {
    const supplier = supplierOf(look, context);
    const found = supplier ? [...look.candidates.values(), supplier] : look.candidates.values();
    for (const candidate of found) {
      votes.set(candidate.field, [...(votes.get(candidate.field) ?? []), candidate]);
    }
  }
  return votes;
}

/** Looks once more, closely, at every value that the first two looks do not agree on. */
async function thirdLooks(
  engine: WordReader,
  { picture }: PreparedPicture,
  votes: Map<TicketField, Candidate[]>,
): Promise<void> {
  for (const [field, seen] of votes) {
    if (isAgreed(seen)) continue;
    for (const box of distinctBoxes(seen)) {
      const enlarge = Math.max(0.8, Math.min(2, 44 / Math.max(1, box.height)));
      const words = await engine.read(await asCutPng(picture, box, enlarge), 'line');
      const writing = words.filter((word) => /[A-Za-z0-9]/.test(word.text));
      if (writing.length === 0) continue;
      const read = candidateIn(field, { words: writing, box: around(writing) });
      if (read) votes.set(field, [...(votes.get(field) ?? []), { ...read, box }]);
    }
  }
}

function overlap(a: Rect, b: Rect): number {
  const width = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const height = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  if (width <= 0 || height <= 0) return 0;
  return (width * height) / Math.max(a.width * a.height, b.width * b.height);
}

function distinctBoxes(candidates: readonly Candidate[]): Rect[] {
  const boxes: Rect[] = [];
  for (const { box } of candidates) {
    if (boxes.every((other) => overlap(box, other) < 0.6)) boxes.push(box);
  }
  return boxes;
}

function namedFields(fields: readonly Settled[], toPhoto: (rect: Rect) => Box): TicketFields {
  const named: TicketFields = {};
  for (const name of TICKET_FIELDS) {
    const found = fields.find((one) => one.field === name);
    if (!found) continue;
    const { value, confidence, doubtful } = found;
    named[name] = { value, confidence, doubtful, box: toPhoto(found.box) };
  }
  return named;
}

/** A box on the photo turned by quarters, brought back to the photo as it is shown. */
function turnedBack(box: Box, quarters: 1 | 2 | 3, photo: Grey): Box {
  const { x, y, width, height } = box;
  if (quarters === 2) {
    return { x: photo.width - x - width, y: photo.height - y - height, width, height };
  }
  if (quarters === 1) {
    return { x: y, y: photo.height - x - width, width: height, height: width };
  }
  return { x: photo.width - y - height, y: x, width: height, height: width };
}
