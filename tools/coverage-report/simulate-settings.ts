import { Worker } from 'node:worker_threads';
import type { Setting } from './setting';
import type { SettingResult } from './shortfalls';
import type { Block } from './simulate-block';
import { addTallies, type Tallies } from './tally';

const threads = 2;
const blockLength = 250;

export interface SimulationOptions {
  readonly replications: number;
  /** The worker's script. */
  readonly worker: URL;
  /** Told each setting that is done, in the order of settings. */
  readonly onSetting: (result: SettingResult) => void;
}

/**
 * Simulates every setting in two worker threads. Sums go block by block in their order, so that the figures do not
 * depend on which thread was faster.
 */
export async function simulateSettings(
  settings: readonly Setting[],
  { replications, worker, onSetting }: SimulationOptions,
): Promise<SettingResult[]> {
  const blocks = settings.flatMap((setting) => blocksOf(setting, replications));
  const done = new Map<Block, Tallies>();
  const results: SettingResult[] = [];
  const collect = (block: Block, tallies: Tallies): void => {
    done.set(block, tallies);
    while (results.length < settings.length) {
      const setting = settings[results.length];
      const result = resultOf(
        setting,
        blocks.filter((it) => it.setting === setting),
        done,
      );
      if (result === null) return;
      results.push(result);
      onSetting(result);
    }
  };
  const waiting = blocks.values();
  await Promise.all(Array.from({ length: threads }, () => work(worker, waiting, collect)));
  return results;
}

function blocksOf(setting: Setting, replications: number): Block[] {
  return Array.from({ length: Math.ceil(replications / blockLength) }, (_, index) => ({
    setting,
    from: index * blockLength,
    to: Math.min(replications, (index + 1) * blockLength),
  }));
}

/** Null while one of the blocks is still being worked on. */
function resultOf(
  setting: Setting,
  blocks: readonly Block[],
  done: ReadonlyMap<Block, Tallies>,
): SettingResult | null {
  const tallies: Tallies = new Map();
  for (const block of blocks) {
    const more = done.get(block);
    if (more === undefined) return null;
    addTallies(tallies, more);
  }
  return { setting, tallies };
}

/** One thread takes blocks until none is left. */
function work(
  script: URL,
  waiting: IterableIterator<Block>,
  collect: (block: Block, tallies: Tallies) => void,
): Promise<void> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(script);
    let current: Block | null = null;
    const next = (): void => {
      const taken = waiting.next();
      if (taken.done === true) {
        void worker.terminate().then(() => {
          resolve();
        }, reject);
        return;
      }
      current = taken.value;
      worker.postMessage(current);
    };
    worker.on('message', (tallies: Tallies) => {
      if (current !== null) collect(current, tallies);
      next();
    });
    worker.on('error', reject);
    next();
  });
}
