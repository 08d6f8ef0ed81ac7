import { writeFile } from 'node:fs/promises';
import { type ReportOptions, reportOptions } from './report-options';
import { reportText } from './report-text';
import { breaksPromise, shortfallsOf } from './shortfalls';
import { shortfallLine } from './shortfall-line';
import { simulateSettings } from './simulate-settings';

const [target, ...args] = process.argv.slice(2);
const { settings, replications, isWhole } = optionsOrEnd(args);
const started = performance.now();
const results = await simulateSettings(settings, {
  replications,
  worker: new URL('coverage-worker.mjs', import.meta.url),
  onSetting: ({ setting }) => {
    const seconds = (performance.now() - started) / 1000;
    process.stderr.write(`${seconds.toFixed(0).padStart(5)} s  ${setting.name}\n`);
  },
});
const text = await reportText(results, replications);
if (isWhole) await writeFile(target, text);
else process.stdout.write(text);
for (const shortfall of shortfallsOf(results)) {
  process.stderr.write(`${shortfallLine(shortfall)}\n`);
}
if (isWhole) process.stderr.write(`Written to ${target}\n`);
process.exitCode = breaksPromise(results) ? 1 : 0;

/** Ends with status 2, and what was wrong, where the options cannot be read. */
function optionsOrEnd(given: readonly string[]): ReportOptions {
  try {
    return reportOptions(given);
  } catch (error) {
    if (!(error instanceof RangeError || error instanceof TypeError)) throw error;
    process.stderr.write(`${error.message}\n`);
    process.exit(2);
  }
}
