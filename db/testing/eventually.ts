const pauseMs = 50;
/** Of the runner's own limit: late enough for a slow machine, and before the runner ends the spec without a word. */
const patienceShare = 0.9;

/**
 * Looks again and again until there is something, however slow the machine: only the runner's limit for one spec ends it.
 *
 * @param awaited  what is looked for, in words for the error.
 * @param look  answers undefined or false until it is there.
 * @throws when it is not there in nine tenths of the runner's limit.
 */
export async function eventually<T>(
  awaited: string,
  look: () => Promise<T | undefined | false> | T | undefined | false,
): Promise<T> {
  const patienceMs = jasmine.DEFAULT_TIMEOUT_INTERVAL * patienceShare;
  const began = performance.now();
  for (;;) {
    const found = await look();
    if (found !== undefined && found !== false) return found;
    if (performance.now() - began > patienceMs)
      throw new Error(`expected ${awaited} within ${patienceMs / 1000} s; there was none`);
    await new Promise((resolve) => setTimeout(resolve, pauseMs));
  }
}
