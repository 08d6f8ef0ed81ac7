import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { type ParseOptions, ParseProcess, ParseRefused } from './parse-process';

const file = { owner: 'one', bytes: new Uint8Array(), name: 'peers.csv' };

describe('a reader in a process of its own', () => {
  let folder: string;
  let count = 0;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'kinvale-reader-'));
  });

  afterAll(async () => {
    await rm(folder, { recursive: true });
  });

  async function readerThat(does: string, options?: ParseOptions): Promise<ParseProcess> {
    count += 1;
    const childFile = join(folder, `${count}.mjs`);
    await writeFile(
      childFile,
      `import { writeFileSync } from 'node:fs'; process.once('message', (request) => { ${does} });`,
    );
    return new ParseProcess(childFile, options);
  }

  const preview = (reader: ParseProcess, signal?: AbortSignal): Promise<unknown> =>
    reader.preview(file, null, signal);
  const previewFor = (owner: string, reader: ParseProcess): Promise<unknown> =>
    reader.preview({ ...file, owner }, null);

  const rejection = async (work: Promise<unknown>): Promise<unknown> =>
    work.then(
      () => undefined,
      (error: unknown) => error,
    );

  /** The process writes its id and then never ends by itself. */
  async function endlessReader(timeLimitMs?: number): Promise<{
    readonly reader: ParseProcess;
    readonly processId: () => Promise<number>;
  }> {
    const idFile = join(folder, `id-${count}`);
    const does = `writeFileSync(${JSON.stringify(idFile)}, String(process.pid)); for (;;);`;
    const processId = async (): Promise<number> => {
      for (;;) {
        const text = await readFile(idFile, 'utf8').catch(() => '');
        if (text !== '') return Number(text);
        await wait(20);
      }
    };
    return { reader: await readerThat(does, { timeLimitMs }), processId };
  }

  async function isGone(id: number): Promise<boolean> {
    for (let tries = 0; tries < 100; tries += 1) {
      try {
        process.kill(id, 0);
      } catch {
        return true;
      }
      await wait(20);
    }
    return false;
  }

  it('ends alone when a file takes too much memory, and says so', async () => {
    const lines: string[] = [];
    const reader = await readerThat(
      'const kept = []; for (;;) kept.push(Array.from({ length: 1e6 }, (_, i) => ({ i })));',
      { onStderr: (line) => lines.push(line) },
    );
    const error = await rejection(preview(reader));
    expect(error).toBeInstanceOf(ParseRefused);
    expect((error as ParseRefused).code).toBe('parse_memory');
    while (lines.length === 0) await wait(20);
    expect(lines).toEqual([jasmine.stringMatching(/^FATAL ERROR: .*out of memory$/u)]);
  });

  it('passes on the first line of what it writes to its standard error, and no more', async () => {
    const lines: string[] = [];
    const reader = await readerThat(
      "process.stderr.write('first\\nsecond\\n' + 'x'.repeat(1e6), () => process.exit(3));",
      { onStderr: (line) => lines.push(line) },
    );
    await expectAsync(preview(reader)).toBeRejectedWithError(/status 3/);
    while (lines.length === 0) await wait(20);
    expect(lines).toEqual(['first']);
  });

  it('is ended when a file takes too long', async () => {
    const { reader, processId } = await endlessReader(2000);
    const work = rejection(preview(reader));
    const id = await processId();
    const error = await work;
    expect((error as ParseRefused).code).toBe('parse_timeout');
    expect(await isGone(id)).toBeTrue();
  });

  it('is ended when its caller wants no answer any more', async () => {
    const { reader, processId } = await endlessReader();
    const controller = new AbortController();
    const work = rejection(preview(reader, controller.signal));
    const id = await processId();
    controller.abort(new Error('changed my mind'));
    expect(await work).toEqual(new Error('changed my mind'));
    expect(await isGone(id)).toBeTrue();
  });

  it('that ends without an answer is a fault of ours, not of the file', async () => {
    const reader = await readerThat('process.exit(3);');
    await expectAsync(preview(reader)).toBeRejectedWithError(/status 3/);
  });

  it('passes on what is refused, with its code', async () => {
    const reader = await readerThat(
      "process.send({ kind: 'refused', code: 'zip_limit', detail: 'too many parts' });",
    );
    const error = await rejection(preview(reader));
    expect(error).toBeInstanceOf(ParseRefused);
    expect([(error as ParseRefused).code, (error as ParseRefused).message]).toEqual([
      'zip_limit',
      'too many parts',
    ]);
  });

  it('reads a file of another owner while one has files that take their time', async () => {
    const reader = await readerThat(
      "setTimeout(() => { process.send({ kind: 'preview', preview: request.name }); }, 400);",
    );
    const order: string[] = [];
    const work = ['one', 'one', 'one', 'other'].map((owner) =>
      previewFor(owner, reader).then(() => order.push(owner)),
    );
    await Promise.all(work);
    expect(order.slice(0, 2).sort()).toEqual(['one', 'other']);
  });

  it('answers two files at once and lets a third wait', async () => {
    const reader = await readerThat(
      "setTimeout(() => { process.send({ kind: 'preview', preview: { headers: [] } }); }, 50);",
    );
    const all = await Promise.all(['a', 'b', 'c'].map((owner) => previewFor(owner, reader)));
    expect(all.length).toBe(3);
  });

  it('begins nothing for a caller that gave up while it waited', async () => {
    const { reader, processId } = await endlessReader();
    const busy = new AbortController();
    const running = ['a', 'b'].map((owner) =>
      rejection(reader.preview({ ...file, owner }, null, busy.signal)),
    );
    await processId();
    const waiting = new AbortController();
    const third = rejection(preview(reader, waiting.signal));
    waiting.abort(new Error('left'));
    expect(await third).toEqual(new Error('left'));
    busy.abort(new Error('over'));
    expect(await Promise.all(running)).toEqual([new Error('over'), new Error('over')]);
    expect(await rejection(preview(reader, AbortSignal.abort(new Error('late'))))).toEqual(
      new Error('late'),
    );
  });
});
