import { type ChildProcess, fork } from 'node:child_process';
import type { FileRecipe, TableReading } from './file-recipe';
import type {
  FileCheck,
  FilePanel,
  FilePreview,
  PanelBlock,
  ParseAnswer,
  ParseRequest,
} from './parse-messages';
import { tellingLine } from './telling-line';
import { Turns } from './turns';

const memoryLimitMb = 256;
const usualTimeLimitMs = 30_000;
const mostAtOnce = 2;
/** Of what a reader writes to its standard error, so many characters are looked at. */
const keptOfStderr = 65_536;

/** An upload as it is read. */
export interface OwnedFile {
  /** Whose file it is: readers take up the files of one owner one after another. */
  readonly owner: string;
  readonly bytes: Uint8Array;
  readonly name: string;
}

export interface ParseOptions {
  readonly timeLimitMs?: number;
  /** Is told one line of what a reader wrote to its standard error; by default this process writes it to its own. */
  readonly onStderr?: (line: string) => void;
}

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

/**
 * Reads uploads in a process of its own, with a limit on memory and time: a hostile file ends that process alone. Every
 * call rejects with {ParseRefused}, or with the reason of a signal that is aborted, which ends the process too.
 */
export class ParseProcess {
  readonly #turns = new Turns(mostAtOnce);
  readonly #timeLimitMs: number;
  readonly #onStderr: (line: string) => void;

  /** @param childFile  path of the child's entry, TypeScript under tsx or the built file. */
  constructor(
    private readonly childFile: string,
    { timeLimitMs = usualTimeLimitMs, onStderr = writeLine }: ParseOptions = {},
  ) {
    this.#timeLimitMs = timeLimitMs;
    this.#onStderr = onStderr;
  }

  /** @param reading  null to have it recognised. */
  async preview(
    { owner, bytes, name }: OwnedFile,
    reading: TableReading | null,
    signal?: AbortSignal,
  ): Promise<FilePreview> {
    const answer = await this.#ask(owner, { kind: 'preview', bytes, name, reading }, signal);
    return expectKind(answer, 'preview').preview;
  }

  /** @param current  the newest version of the panel that the file would become the next of. */
  async check(
    { owner, bytes, name }: OwnedFile,
    recipe: FileRecipe,
    current: PanelBlock | null,
    signal?: AbortSignal,
  ): Promise<FileCheck> {
    const request: ParseRequest = { kind: 'check', bytes, name, recipe, current };
    const answer = await this.#ask(owner, request, signal);
    return expectKind(answer, 'check').check;
  }

  async read(
    { owner, bytes, name }: OwnedFile,
    recipe: FileRecipe,
    signal?: AbortSignal,
  ): Promise<FilePanel> {
    const answer = await this.#ask(owner, { kind: 'read', bytes, name, recipe }, signal);
    return expectKind(answer, 'read').panel;
  }

  #ask(owner: string, request: ParseRequest, signal?: AbortSignal): Promise<ParseAnswer> {
    return this.#turns.take(owner, () => this.#run(request, signal), signal);
  }

  #run(request: ParseRequest, signal?: AbortSignal): Promise<ParseAnswer> {
    return new Promise((resolve, reject) => {
      const child = this.#start();
      const end = (reason: Error): void => {
        child.kill('SIGKILL');
        settle();
        reject(reason);
      };
      const timer = setTimeout(() => {
        end(tooSlow(this.#timeLimitMs));
      }, this.#timeLimitMs);
      const cancel = (): void => {
        end(reasonOf(signal));
      };
      const settle = (): void => {
        clearTimeout(timer);
        signal?.removeEventListener('abort', cancel);
      };
      signal?.addEventListener('abort', cancel);
      child.once('error', (error) => {
        settle();
        reject(error);
      });
      child.once('message', (answer: ParseAnswer) => {
        settle();
        if (child.connected) child.disconnect();
        resolve(answer);
      });
      child.once('exit', (code, ending) => {
        settle();
        reject(endedWithoutAnswer(code, ending));
      });
      // A child that is gone before it has the whole file tells so by its exit.
      child.send(request, () => undefined);
    });
  }

  #start(): ChildProcess {
    const child = fork(this.childFile, [], {
      serialization: 'advanced',
      stdio: ['ignore', 'ignore', 'pipe', 'ipc'],
      env: { PATH: process.env['PATH'] },
      execArgv: [
        `--max-old-space-size=${memoryLimitMb}`,
        ...(this.childFile.endsWith('.ts') ? ['--import', 'tsx'] : []),
      ],
    });
    let written = '';
    child.stderr?.setEncoding('utf8').on('data', (text: string) => {
      written += text.slice(0, keptOfStderr - written.length);
    });
    child.once('close', () => {
      const line = tellingLine(written);
      if (line !== undefined) this.#onStderr(line);
    });
    return child;
  }
}

function writeLine(line: string): void {
  process.stderr.write(`file reader: ${line}\n`);
}

function tooSlow(limitMs: number): ParseRefused {
  const detail = `The file could not be read within ${limitMs / 1000} seconds.`;
  return new ParseRefused('parse_timeout', detail);
}

/** Out of memory, a process aborts or is killed by the system; any other end without an answer is a fault of ours. */
function endedWithoutAnswer(code: number | null, ending: NodeJS.Signals | null): Error {
  if (ending === 'SIGABRT' || ending === 'SIGKILL' || code === 134)
    return new ParseRefused(
      'parse_memory',
      `The file takes more than the ${memoryLimitMb} MB of memory allowed to read it.`,
    );
  return new Error(`the reader ended with status ${String(code ?? ending)} and no answer`);
}

function reasonOf(signal: AbortSignal | undefined): Error {
  const reason: unknown = signal?.reason;
  return reason instanceof Error ? reason : new Error('reading the file was cancelled');
}

function expectKind<K extends ParseAnswer['kind']>(
  answer: ParseAnswer,
  kind: K,
): Extract<ParseAnswer, { readonly kind: K }> {
  if (answer.kind === 'refused') throw new ParseRefused(answer.code, answer.detail);
  if (answer.kind !== kind) throw new Error(`expected an answer ${kind}; found ${answer.kind}`);
  return answer as Extract<ParseAnswer, { readonly kind: K }>;
}
