import { setImmediate } from 'node:timers/promises';

/** Done at once: some milliseconds of the cheap work that is meant. */
const sliceLength = 2000;

/** Calls `work` with each of many items, in order; between slices of them this process answers others. */
export async function inSlices<T>(
  items: readonly T[],
  work: (item: T, index: number) => void,
): Promise<void> {
  for (let start = 0; start < items.length; start += sliceLength) {
    if (start > 0) await setImmediate();
    const end = Math.min(start + sliceLength, items.length);
    for (let index = start; index < end; index += 1) work(items[index], index);
  }
}
