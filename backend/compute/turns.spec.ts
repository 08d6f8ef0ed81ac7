import { Turns } from './turns';

describe('turns', () => {
  it('let so many run at once, first come first served', async () => {
    const turns = new Turns(2);
    const begun: number[] = [];
    const ends: (() => void)[] = [];
    const work = [0, 1, 2, 3].map((index) =>
      turns.take(() => {
        begun.push(index);
        return new Promise<void>((resolve) => ends.push(resolve));
      }),
    );
    expect(begun).toEqual([0, 1]);
    ends[1]();
    await work[1];
    expect(begun).toEqual([0, 1, 2]);
    ends[0]();
    await work[0];
    ends[2]();
    ends[3]();
    await Promise.all(work);
    expect(begun).toEqual([0, 1, 2, 3]);
  });

  it('go on after work that fails and after one who leaves the queue', async () => {
    const turns = new Turns(1);
    const failing = turns.take(() => Promise.reject(new Error('failed')));
    const controller = new AbortController();
    const leaving = turns.take(() => Promise.resolve('never'), controller.signal);
    const last = turns.take(() => Promise.resolve('done'));
    controller.abort(new Error('left'));
    await expectAsync(failing).toBeRejectedWithError('failed');
    await expectAsync(leaving).toBeRejectedWithError('left');
    expect(await last).toBe('done');
    expect(await turns.take(() => Promise.resolve('again'))).toBe('again');
  });
});
