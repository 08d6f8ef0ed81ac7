import { benchPanel } from './bench-panel';
import { fitSizes } from './fit-sizes';
import { barePass, evidence, estimates, wholeFit } from './fit-subjects';
import { interleavedMedians } from './interleaved';
import { bytesOf, peakGrowth } from './memory';
import { outsideMs } from './outside-time';

const [folder, scripts] = process.argv.slice(2);

const small = benchPanel(12, 20);
const [whole, facts] = interleavedMedians(
  [
    { name: 'fit', run: () => wholeFit(small) },
    { name: 'evidence', run: () => evidence(small) },
  ],
  120,
);
console.log('12 × 20, median milliseconds');
console.log(`  whole fit, CR2, standing, rank set, goodness  ${text(whole)}   aim: below 5`);
console.log(
  `  evidence without bootstraps by draws          ${text(facts - whole)}   aim: below 50`,
);
console.log('');
console.log(
  'Estimates: sample, slopes, classical and CR1 covariance, intercepts, standing with interval',
);
console.log(
  [
    'companies × years',
    'bare pass ms',
    'estimates ms',
    'passes',
    'ns a row',
    'R plm ms',
    'R / ours',
    'memory / columns',
  ]
    .map((head, index) => (index === 0 ? head.padEnd(18) : head.padStart(17)))
    .join(''),
);
for (const { companies, years, rounds, isForR } of fitSizes) {
  const data = benchPanel(companies, years);
  const rows = companies * years;
  const [pass, fit] = interleavedMedians(
    [
      { name: 'bare pass', run: () => barePass(data) },
      { name: 'estimates', run: () => estimates(data) },
    ],
    rounds,
  );
  const outside = isForR ? outsideMs(data, { folder, scripts }) : null;
  const memory = peakGrowth(() => estimates(data)) / bytesOf(data);
  const cells = [
    text(pass),
    text(fit),
    text(fit / pass),
    text((fit * 1e6) / rows),
    outside === null ? '–' : text(outside),
    outside === null ? '–' : text(outside / fit),
    text(memory),
  ];
  console.log(
    `${companies} × ${years}`.padEnd(18) + cells.map((cell) => cell.padStart(17)).join(''),
  );
}
console.log(
  'Aims: at 8000 × 25 at most 25 bare passes, at least 50 times R, memory at most 3 times the columns.',
);

function text(value: number): string {
  return value >= 100 ? value.toFixed(0) : value.toPrecision(3);
}
