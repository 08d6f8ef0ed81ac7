import * as fc from 'fast-check';
import { Turns } from './turns';

/** Work that begins when its turn comes and ends when it is told to. */
class Pieces {
  readonly begun: string[] = [];
  readonly #ends = new Map<string, () => void>();

  constructor(private readonly turns: Turns) {}

  /** @param name  the owner's letter and a number. */
  begin(name: string): Promise<void> {
    return this.turns.take(name[0], () => {
      this.begun.push(name);
      return new Promise((resolve) => this.#ends.set(name, resolve));
    });
  }

  async end(name: string): Promise<void> {
    this.#ends.get(name)?.();
    this.#ends.delete(name);
    await new Promise(setImmediate);
  }

  get running(): string[] {
    return [...this.#ends.keys()];
  }
}

describe('turns', () => {
  it('let so many run at once, first come first served', async () => {
    const pieces = new Pieces(new Turns(2));
    const work = ['a', 'b', 'c', 'd'].map((name) => pieces.begin(name));
    expect(pieces.begun).toEqual(['a', 'b']);
    await pieces.end('b');
    expect(pieces.begun).toEqual(['a', 'b', 'c']);
    for (const name of ['a', 'c', 'd']) await pieces.end(name);
    await Promise.all(work);
    expect(pieces.begun).toEqual(['a', 'b', 'c', 'd']);
  });

  it('leave an owner with slow work one turn, so that others get theirs', async () => {
    const pieces = new Pieces(new Turns(2));
    const work = ['a1', 'a2', 'a3', 'b1'].map((name) => pieces.begin(name));
    expect(pieces.begun).toEqual(['a1', 'b1']);
    await pieces.end('b1');
    expect(pieces.running).toEqual(['a1']);
    for (const name of ['a1', 'a2', 'a3']) await pieces.end(name);
    await Promise.all(work);
    expect(pieces.begun).toEqual(['a1', 'b1', 'a2', 'a3']);
  });

  it('let owners who wait take turns, whoever ended last behind the others', async () => {
    const pieces = new Pieces(new Turns(1));
    const names = ['a1', 'a2', 'a3', 'b1', 'b2', 'c1'];
    const work = names.map((name) => pieces.begin(name));
    for (const name of ['a1', 'b1', 'c1', 'a2', 'b2', 'a3']) await pieces.end(name);
    await Promise.all(work);
    expect(pieces.begun).toEqual(['a1', 'b1', 'c1', 'a2', 'b2', 'a3']);
  });

  it('go on after work that fails and after one who leaves the queue', async () => {
    const turns = new Turns(1);
    const failing = turns.take('a', () => Promise.reject(new Error('failed')));
    const controller = new AbortController();
    const leaving = turns.take('b', () => Promise.resolve('never'), controller.signal);
    const last = turns.take('b', () => Promise.resolve('done'));
    controller.abort(new Error('left'));
    await expectAsync(failing).toBeRejectedWithError('failed');
    await expectAsync(leaving).toBeRejectedWithError('left');
    expect(await last).toBe('done');
    expect(await turns.take('a', () => Promise.resolve('again'))).toBe('again');
  });

  it('never stand idle while somebody could have one, and never give an owner two', async () => {
    const steps = fc.array(
      fc.oneof(
        fc.record({ begins: fc.constantFrom('a', 'b', 'c', 'd') }),
        fc.record({ ends: fc.nat(1) }),
      ),
      { maxLength: 30 },
    );
    await fc.assert(
      fc.asyncProperty(steps, async (list) => {
        const pieces = new Pieces(new Turns(2));
        const waiting = new Map<string, string[]>();
        const work: Promise<void>[] = [];
        const look = (): void => {
          const running = pieces.running.map(([owner]) => owner);
          expect(new Set(running).size).toBe(running.length);
          for (const name of pieces.begun)
            waiting.set(name[0], waiting.get(name[0])?.filter((other) => other !== name) ?? []);
          const ready = [...waiting].filter(([owner, names]) => {
            return names.length > 0 && !running.includes(owner);
          });
          if (running.length < 2) expect(ready).toEqual([]);
        };
        for (const [index, step] of list.entries()) {
          if ('begins' in step) {
            const name = `${step.begins}${index}`;
            waiting.set(step.begins, [...(waiting.get(step.begins) ?? []), name]);
            work.push(pieces.begin(name));
          } else {
            await pieces.end(pieces.running[step.ends] ?? '');
          }
          look();
        }
        while (pieces.running.length > 0) await pieces.end(pieces.running[0]);
        await Promise.all(work);
        expect(pieces.begun.length).toBe(work.length);
      }),
    );
  });
});
