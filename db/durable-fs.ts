import fs from 'node:fs';
import { NodeFS } from '@electric-sql/pglite/nodefs';

interface EmscriptenStream {
  readonly nfd: number;
}
interface EmscriptenModule {
  NODEFS: { stream_ops: { fsync?: (stream: EmscriptenStream) => number } };
}

/**
 * The embedded database's files, with commits that reach the disk. The engine's own fsync is a
 * stub; this hook makes it real. `wal_sync_method=fsync` (in client.ts) is essential: the
 * default method never reaches the hook.
 */
export class DurableNodeFS extends NodeFS {
  /** How often the engine asked for a flush; the start-up self-test reads it. */
  syncCount = 0;

  override async init(...args: Parameters<NodeFS['init']>): ReturnType<NodeFS['init']> {
    const started = await super.init(...args);
    started.emscriptenOpts.preRun = [
      ...(started.emscriptenOpts.preRun ?? []),
      (module: unknown) => {
        (module as EmscriptenModule).NODEFS.stream_ops.fsync = (stream) => {
          fs.fsyncSync(stream.nfd);
          this.syncCount += 1;
          return 0;
        };
      },
    ] as typeof started.emscriptenOpts.preRun;
    return started;
  }
}
