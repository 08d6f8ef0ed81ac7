import { execFileSync } from 'node:child_process';
import { benchPanel } from './bench-panel';
import { fitSizes } from './fit-sizes';
import { barePass, evidence, estimates, wholeFit } from './fit-subjects';
import { interleavedTimes, subject } from './interleaved';
import { OutsideFit } from './outside-fit';

const [folder, scripts, memoryScript] = process.argv.slice(2);

const small = benchPanel(12, 20);
const [whole, facts] = await interleavedTimes(
  [subject('fit', () => wholeFit(small)), subject('evidence', () => evidence(small))],
  120,
);
const factsAlone = facts.median - whole.median;
console.log('12 × 20, median milliseconds');
console.log(`  whole fit, CR2, standing, rank set, goodness  ${text(whole.median)}   aim: below 5`);
console.log(`  evidence without bootstraps by draws          ${text(factsAlone)}   aim: below 50`);
console.log('');
console.log(
  'Estimates: sample, slopes, classical and CR1 covariance, intercepts, standing with interval',
);
console.log('Medians of interleaved rounds, in brackets the least; memory in times the columns');
const heads = ['companies × years', 'bare pass ms', 'estimates ms', 'passes', 'ns a row'];
console.log(line([...heads, 'R plm ms', 'R / ours', 'memory']));
for (const { companies, years, rounds, everyForR } of fitSizes) {
  const data = benchPanel(companies, years);
  const outside = everyForR === null ? null : await OutsideFit.open(data, { folder, scripts });
  const [pass, fit, plm] = await interleavedTimes(
    [
      subject('bare pass', () => barePass(data)),
      subject('estimates', () => estimates(data)),
      ...(outside === null || everyForR === null
        ? []
        : [{ name: 'plm', time: () => outside.time(), every: everyForR }]),
    ],
    rounds,
  );
  outside?.close();
  console.log(
    line([
      `${companies} × ${years}`,
      both(pass.median, pass.least),
      both(fit.median, fit.least),
      both(fit.median / pass.median, fit.least / pass.least),
      text((fit.median * 1e6) / (companies * years)),
      outside === null ? '–' : both(plm.median, plm.least),
      outside === null ? '–' : both(plm.median / fit.median, plm.least / fit.least),
      text(memoryOf(companies, years)),
    ]),
  );
}
console.log(
  'Aims: at 8000 × 25 at most 25 bare passes, at least 50 times R, memory at most 3 times the columns.',
);

function memoryOf(companies: number, years: number): number {
  const sizes = [String(companies), String(years)];
  return Number(execFileSync(process.execPath, ['--expose-gc', memoryScript, ...sizes]));
}

function line(cells: readonly string[]): string {
  return cells.map((cell, index) => (index === 0 ? cell.padEnd(18) : cell.padStart(18))).join('');
}

function both(median: number, least: number): string {
  return `${text(median)} (${text(least)})`;
}

function text(value: number): string {
  return value >= 100 ? value.toFixed(0) : value.toPrecision(3);
}
