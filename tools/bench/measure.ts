import { benchPanel } from './bench-panel';
import { fitSizes } from './fit-sizes';
import { barePass, estimates, wholeFit } from './fit-subjects';
import { interleavedMedians } from './interleaved';

for (const { companies, years, rounds } of fitSizes) {
  const data = benchPanel(companies, years);
  const bare = { name: 'bare pass', run: () => barePass(data) };
  const [pass, fit] = interleavedMedians([bare, { name: 'estimates', run: () => estimates(data) }], rounds);
  const [, whole] = interleavedMedians([bare, { name: 'whole', run: () => wholeFit(data) }], Math.max(3, Math.round(rounds / 5)));
  console.log(companies, years, pass.toFixed(4), fit.toFixed(3), (fit / pass).toFixed(1), whole.toFixed(2));
}
