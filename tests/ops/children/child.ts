import { type ChildProcess, spawn } from 'node:child_process';
import path from 'node:path';
import { createInterface } from 'node:readline';

export interface Child {
  readonly process: ChildProcess;
  readonly lines: string[];
  /** Resolves when a line fits, and rejects when the child ends without one. */
  line(fits: (line: string) => boolean): Promise<string>;
  readonly ended: Promise<{ code: number | null; stderr: string }>;
}

/** Runs a TypeScript file of the product or the tests in a process of its own. */
export function runChild(
  file: string,
  args: readonly string[],
  env: Record<string, string> = {},
): Child {
  const root = path.resolve(import.meta.dirname, '../../..');
  const child = spawn(process.execPath, ['--import', 'tsx', path.join(root, file), ...args], {
    cwd: root,
    env: { ...process.env, LOG_LEVEL: 'silent', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const lines: string[] = [];
  const waiting = new Set<() => void>();
  const wake = () => {
    for (const one of [...waiting]) one();
  };
  createInterface({ input: child.stdout }).on('line', (line) => {
    lines.push(line);
    wake();
  });
  let stderr = '';
  child.stderr.on('data', (part) => {
    stderr += part;
  });
  let isOver = false;
  const ended = new Promise<{ code: number | null; stderr: string }>((resolve) => {
    child.once('close', (code) => {
      isOver = true;
      resolve({ code, stderr });
      wake();
    });
  });
  const line = (fits: (line: string) => boolean) =>
    new Promise<string>((resolve, reject) => {
      const look = () => {
        const found = lines.find(fits);
        if (found === undefined && !isOver) return;
        waiting.delete(look);
        if (found === undefined) reject(new Error(`no such line: ${lines.join('\n')}${stderr}`));
        else resolve(found);
      };
      waiting.add(look);
      look();
    });
  return { process: child, lines, line, ended };
}
