import { parseArgs } from 'node:util';
import { mostReplications, type Setting } from './setting';
import { settings } from './settings';

export interface ReportOptions {
  readonly settings: readonly Setting[];
  readonly replications: number;
  /** Whether it is the whole report, whose tables are kept. */
  readonly isWhole: boolean;
}

export const usualReplications = 2500;

/**
 * `--settings NAME,…` and `--replications N`, for a quick look.
 *
 * @throws {RangeError} for a setting there is none of, or a number of replications out of bounds.
 * @throws {TypeError} for another option.
 */
export function reportOptions(args: readonly string[]): ReportOptions {
  const { values } = parseArgs({
    args: [...args],
    options: { settings: { type: 'string' }, replications: { type: 'string' } },
  });
  const replications = Number(values.replications ?? usualReplications);
  if (!Number.isInteger(replications) || replications < 1 || replications > mostReplications) {
    throw new RangeError(
      `expected a number of replications between 1 and ${mostReplications}; found ${values.replications}`,
    );
  }
  const chosen = values.settings === undefined ? settings : values.settings.split(',').map(named);
  const isWhole = values.settings === undefined && replications === usualReplications;
  return { settings: chosen, replications, isWhole };
}

function named(name: string): Setting {
  const setting = settings.find((it) => it.name === name);
  if (setting !== undefined) return setting;
  const names = settings.map((it) => it.name).join(', ');
  throw new RangeError(`expected a setting among ${names}; found ${name}`);
}
