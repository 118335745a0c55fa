import { access } from 'node:fs/promises';
import path from 'node:path';
import { createWorker, type PSM, type Worker } from 'tesseract.js';
import type { Rect } from './image/grey';

/** One word as the engine saw it, in pixels of the picture that was read. */
export interface Word {
  readonly text: string;
  /** The engine's own 0 to 1. Even near 1 a number is wrong one time in fourteen. */
  readonly confidence: number;
  readonly box: Rect;
}

/** How the engine looks at a picture: as one block of lines, as scattered words, as one line. */
export type Look = 'block' | 'scattered' | 'line';

const SEGMENTATION: Record<Look, string> = { block: '6', scattered: '11', line: '7' };

/** The engine is started afresh after so many pictures: its memory only ever grows. */
const PICTURES_A_WORKER = 600;
const START_TIMEOUT_MS = 30_000;
const READ_TIMEOUT_MS = 60_000;

/** The engine did not start or answer; it is not the photo's fault. */
export class EngineError extends Error {}

function within<T>(work: Promise<T>, timeoutMs: number, what: string): Promise<T> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new EngineError(`${what} took too long`)), timeoutMs);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
}

async function startWorker(onError: (error: unknown) => void): Promise<Worker> {
  const folder = path.join(
    process.cwd(),
    'node_modules',
    '@tesseract.js-data',
    'eng',
    '4.0.0_best_int',
  );
  const model = path.join(folder, 'eng.traineddata.gz');
  // Without its file the engine never answers and reports the loss as an uncaught exception.
  await access(model).catch(() => {
    throw new EngineError(`The reading model is missing: ${model}`);
  });
  const started = createWorker('eng', 1, {
    langPath: folder,
    gzip: true,
    cacheMethod: 'none',
    errorHandler: onError,
  });
  const worker = await within(started, START_TIMEOUT_MS, 'Starting the engine');
  // Learning from earlier pictures would make a reading depend on what was read before it.
  await worker.setParameters({ user_defined_dpi: '300', classify_enable_learning: '0' });
  return worker;
}

/** The engine behind one small door: pictures in, words out, one at a time. */
export class WordReader {
  private worker: Promise<Worker> | null = null;
  private pictures = 0;
  private turn: Promise<unknown> = Promise.resolve();

  constructor(private readonly onError: (error: unknown) => void) {}

  /** Reads a PNG or JPEG. Throws EngineError where the engine does not answer. */
  read(picture: Buffer, look: Look): Promise<Word[]> {
    const mine = this.turn.then(() => this.readNow(picture, look));
    this.turn = mine.catch(() => undefined);
    return mine;
  }

  private async readNow(picture: Buffer, look: Look): Promise<Word[]> {
    if (this.pictures >= PICTURES_A_WORKER) await this.stop();
    this.pictures += 1;
    try {
      this.worker ??= startWorker(this.onError);
      const worker = await this.worker;
      await worker.setParameters({ tessedit_pageseg_mode: SEGMENTATION[look] as PSM });
      const reading = worker.recognize(picture, {}, { text: false, blocks: true });
      const { data } = await within(reading, READ_TIMEOUT_MS, 'Reading a picture');
      return (data.blocks ?? []).flatMap((block) =>
        block.paragraphs.flatMap((paragraph) =>
          paragraph.lines.flatMap((line) => line.words.map(wordOf)),
        ),
      );
    } catch (error) {
      await this.stop();
      throw error instanceof EngineError ? error : new EngineError(String(error));
    }
  }

  /** Ends the engine; the next picture starts a new one. */
  async stop(): Promise<void> {
    const worker = this.worker;
    this.worker = null;
    this.pictures = 0;
    if (worker) await worker.then((one) => one.terminate()).catch(() => undefined);
  }
}

function wordOf(word: {
  text: string;
  confidence: number;
  bbox: { x0: number; y0: number; x1: number; y1: number };
}): Word {
  const { x0, y0, x1, y1 } = word.bbox;
  return {
    text: word.text,
    confidence: word.confidence / 100,
    box: { x: x0, y: y0, width: x1 - x0, height: y1 - y0 },
  };
}
