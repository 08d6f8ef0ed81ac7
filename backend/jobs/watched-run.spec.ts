import { watchedRun } from './watched-run';

/** A run that ends when it is told to, or with its signal. */
function startable(signal: AbortSignal): { answer: Promise<string>; progress: () => number } {
  const answer = new Promise<string>((_, reject) => {
    signal.addEventListener('abort', () => {
      reject(new Error('aborted'));
    });
  });
  return { answer, progress: () => 0.25 };
}

describe('a watched run', () => {
  beforeEach(() => jasmine.clock().install());
  afterEach(() => {
    jasmine.clock().uninstall();
  });

  it('answers with what it ran, and is told of no more', async () => {
    const told: number[] = [];
    const ended = await watchedRun(
      () => ({ answer: Promise.resolve('answer'), progress: () => 1 }),
      (share) => {
        told.push(share);
        return Promise.resolve(true);
      },
    );
    expect(ended).toBe('answer');
    jasmine.clock().tick(5000);
    expect(told).toEqual([]);
  });

  it('tells how far it is, and ends when it was cancelled', async () => {
    const told: number[] = [];
    const ended = watchedRun(startable, (share) => {
      told.push(share);
      return Promise.resolve(told.length < 2);
    });
    jasmine.clock().tick(500);
    jasmine.clock().tick(500);
    expect(await ended).toBeUndefined();
    expect(told).toEqual([0.25, 0.25]);
  });

  it('goes on while nobody can be told', async () => {
    let finish: (answer: string) => void = () => undefined;
    const answer = new Promise<string>((resolve) => (finish = resolve));
    const ended = watchedRun(
      () => ({ answer, progress: () => 0 }),
      () => Promise.reject(new Error('the database is away')),
    );
    jasmine.clock().tick(500);
    finish('answer');
    expect(await ended).toBe('answer');
  });

  it('fails as the run fails', async () => {
    const failing = { answer: Promise.reject(new Error('worker died')), progress: () => 0 };
    const ended = watchedRun(
      () => failing,
      () => Promise.resolve(true),
    );
    await expectAsync(ended).toBeRejectedWithError('worker died');
  });
});
