import { fork } from 'node:child_process';
import type {
  ColumnChoice,
  FileCheck,
  FilePreview,
  FileRows,
  ParseAnswer,
  ParseRequest,
} from './parse-messages';

const memoryLimitMb = 256;
const timeLimitMs = 30_000;
const mostAtOnce = 2;

/** A file that cannot be read, with the reader's code and its sentence for a person. */
export class ParseRefused extends Error {
  override readonly name = 'ParseRefused';
  constructor(
    readonly code: string,
    detail: string,
  ) {
    super(detail);
  }
}

/** Reads uploads in a process of its own, with a limit on memory and time: a hostile file ends that process alone. */
export class ParseProcess {
  #running = 0;
  readonly #waiting: (() => void)[] = [];

  /** @param childFile  path of the child's entry, TypeScript under tsx or the built file. */
  constructor(private readonly childFile: string) {}

  /** @throws {ParseRefused} */
  async preview(bytes: Uint8Array): Promise<FilePreview> {
    const answer = await this.#ask({ kind: 'preview', bytes });
    return expectKind(answer, 'preview').preview;
  }

  /** @throws {ParseRefused} */
  async check(bytes: Uint8Array, choice: ColumnChoice): Promise<FileCheck> {
    const answer = await this.#ask({ kind: 'check', bytes, choice });
    return expectKind(answer, 'check').check;
  }

  /** @throws {ParseRefused} */
  async read(bytes: Uint8Array, choice: ColumnChoice): Promise<FileRows> {
    const answer = await this.#ask({ kind: 'read', bytes, choice });
    return expectKind(answer, 'read').rows;
  }

  async #ask(request: ParseRequest): Promise<ParseAnswer> {
    if (this.#running >= mostAtOnce)
      await new Promise<void>((resolve) => this.#waiting.push(resolve));
    this.#running++;
    try {
      return await this.#run(request);
    } finally {
      this.#running--;
      this.#waiting.shift()?.();
    }
  }

  #run(request: ParseRequest): Promise<ParseAnswer> {
    return new Promise((resolve, reject) => {
      const child = fork(this.childFile, [], {
        serialization: 'advanced',
        stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
        env: { PATH: process.env['PATH'] },
        execArgv: [
          `--max-old-space-size=${memoryLimitMb}`,
          ...(this.childFile.endsWith('.ts') ? ['--import', 'tsx'] : []),
        ],
      });
      const timer = setTimeout(() => {
        child.kill('SIGKILL');
        reject(
          new ParseRefused(
            'parse_timeout',
            `The file could not be read within ${timeLimitMs / 1000} seconds.`,
          ),
        );
      }, timeLimitMs);
      child.once('error', (error) => {
        clearTimeout(timer);
        reject(error);
      });
      child.once('message', (answer: ParseAnswer) => {
        clearTimeout(timer);
        child.disconnect();
        resolve(answer);
      });
      child.once('exit', (code, signal) => {
        clearTimeout(timer);
        // Out of memory, the process aborts; any other end without an answer is a fault of ours.
        if (signal === 'SIGABRT' || code === 134)
          reject(
            new ParseRefused(
              'parse_memory',
              `The file takes more than the ${memoryLimitMb} MB of memory allowed to read it.`,
            ),
          );
        else reject(new Error(`the reader ended with status ${String(code)} and no answer`));
      });
      child.send(request);
    });
  }
}

function expectKind<K extends ParseAnswer['kind']>(
  answer: ParseAnswer,
  kind: K,
): Extract<ParseAnswer, { readonly kind: K }> {
  if (answer.kind === 'refused') throw new ParseRefused(answer.code, answer.detail);
  if (answer.kind !== kind) throw new Error(`expected an answer ${kind}; found ${answer.kind}`);
  return answer as Extract<ParseAnswer, { readonly kind: K }>;
}
