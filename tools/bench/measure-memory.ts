import { benchPanel } from './bench-panel';
import { estimates } from './fit-subjects';
import { bytesOf, peakGrowth } from './memory';

/** Prints the memory of one size's estimates as times the columns; in a process of its own, which holds nothing else. */
const [companies, years] = process.argv.slice(2).map(Number);
const data = benchPanel(companies, years);
const small = benchPanel(12, 20);
// Compiled code and what is made once are no memory of a fit.
for (let warm = 0; warm < 200; warm += 1) estimates(small, () => undefined);
const growth = peakGrowth((atStage) => estimates(data, atStage));
console.log(growth / bytesOf(data));
