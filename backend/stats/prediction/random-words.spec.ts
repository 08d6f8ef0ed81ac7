import { randomWords, seededWords, splitMix64 } from './random-words';

describe('random words', () => {
  it('are those of the authors’ xoshiro128** from the state 1, 2, 3, 4', () => {
    // Outputs of xoshiro128starstar.c (prng.di.unimi.it, version 1.1), as the tests of the Rust package rand_xoshiro have them.
    const next = randomWords(Uint32Array.of(1, 2, 3, 4));
    expect(Array.from({ length: 10 }, next)).toEqual([
      11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597,
      4258142804,
    ]);
  });

  it('are seeded by the authors’ SplitMix64', () => {
    // Outputs of splitmix64.c for the seed 1234567, published on Rosetta Code.
    let state = 1234567n;
    const values = [1, 2, 3, 4, 5].map(() => {
      const step = splitMix64(state);
      state = step.state;
      return step.value;
    });
    expect(values).toEqual([
      6457827717110365317n,
      3203168211198807973n,
      9817491932198370423n,
      4593380528125082431n,
      16408922859458223821n,
    ]);
    const words = [...seededWords(1234567)].map(BigInt);
    expect(words[0] + (words[1] << 32n)).toBe(values[0]);
    expect(words[2] + (words[3] << 32n)).toBe(values[1]);
  });

  it('differ between seeds, the largest whole number among them', () => {
    const firsts = [0, 1, 2, 2 ** 32, Number.MAX_SAFE_INTEGER].map((seed) =>
      randomWords(seededWords(seed))(),
    );
    expect(new Set(firsts).size).toBe(firsts.length);
  });
});
