import { readFile } from 'node:fs/promises';
import { createTicketReader } from '../../importers/ocr/read-ticket';

/**
 * `npm run --silent read-ticket -- PHOTO…`: one JSON line a photo on standard output, with its
 * fields or with the reason why there are none. Exit code 1 when any photo could not be read.
 */
interface Refusal {
  readonly code: string;
  readonly message: string;
}

async function fileBytes(file: string): Promise<Buffer | Refusal> {
  try {
    return await readFile(file);
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    return { code: 'noFile', message: `The file cannot be opened: ${reason}` };
  }
}

function print(line: unknown): void {
  process.stdout.write(`${JSON.stringify(line)}\n`);
}

async function main(files: readonly string[]): Promise<number> {
  if (files.length === 0) {
    console.error('Usage: npm run --silent read-ticket -- PHOTO…');
    return 2;
  }
  const reader = createTicketReader({ onEngineError: (error) => console.error(String(error)) });
  let failed = false;
  for (const file of files) {
    const bytes = await fileBytes(file);
    if (!Buffer.isBuffer(bytes)) {
      print({ file, error: bytes });
      failed = true;
      continue;
    }
    const result = await reader.read(bytes);
    if (result.ok) print({ file, fields: result.value.fields });
    else print({ file, error: { code: result.error.code, message: result.error.sentence } });
    failed ||= !result.ok;
  }
  await reader.close();
  return failed ? 1 : 0;
}

process.exitCode = await main(process.argv.slice(2));
