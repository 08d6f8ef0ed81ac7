import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ParseProcess, ParseRefused } from './parse-process';

describe('a reader in a process of its own', () => {
  let folder: string;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'kinvale-reader-'));
  });

  afterAll(async () => {
    await rm(folder, { recursive: true });
  });

  async function readerThat(does: string): Promise<ParseProcess> {
    const file = join(folder, `${String(does.length)}.mjs`);
    await writeFile(file, `process.once('message', () => { ${does} });`);
    return new ParseProcess(file);
  }

  it('ends alone when a file takes too much memory, and says so', async () => {
    const reader = await readerThat(
      'const kept = []; for (;;) kept.push(Array.from({ length: 1e6 }, (_, i) => ({ i })));',
    );
    const error: unknown = await reader
      .preview(new Uint8Array())
      .catch((caught: unknown) => caught);
    expect(error).toBeInstanceOf(ParseRefused);
    expect((error as ParseRefused).code).toBe('parse_memory');
  });

  it('that ends without an answer is a fault of ours, not of the file', async () => {
    const reader = await readerThat('process.exit(3);');
    await expectAsync(reader.preview(new Uint8Array())).toBeRejectedWithError(/status 3/);
  });

  it('answers two files at once and lets a third wait', async () => {
    const reader = await readerThat(
      "setTimeout(() => { process.send({ kind: 'preview', preview: { headers: [] } }); }, 50);",
    );
    const all = await Promise.all([1, 2, 3].map(() => reader.preview(new Uint8Array())));
    expect(all.length).toBe(3);
  });
});
