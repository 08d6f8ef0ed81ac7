/**
 * Runs jasmine specs of the server, the engine and the tools: `node --import tsx tools/run-specs.mjs unit|db`.
 * Those on a database run as many files at a time as there are processors, at most four; each has a database of its own.
 * Writes how many passed and failed to the file named by KINVALE_COUNTS.
 */
import { readFile, writeFile } from 'node:fs/promises';
import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import Jasmine from 'jasmine';
import ParallelRunner from 'jasmine/parallel';
import { SlowestSpecs } from './slowest-specs.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const processes = Math.min(availableParallelism(), 4);
const kinds = {
  unit: {
    keeps: (pattern) => [pattern, '!**/*.db.spec.ts'],
    limitMs: 30_000,
    runner: () => new Jasmine({ projectBaseDir: root }),
  },
  db: {
    keeps: (pattern) => [pattern.replace('.spec.', '.db.spec.')],
    limitMs: 120_000,
    runner: () => new ParallelRunner({ projectBaseDir: root, numWorkers: processes }),
  },
};
const { keeps, limitMs, runner } = kinds[process.argv[2]];
process.env.KINVALE_SPEC_LIMIT_MS = String(limitMs);

const settings = JSON.parse(await readFile(join(root, 'jasmine.json'), 'utf8'));
const jasmine = runner();
jasmine.loadConfig({
  ...settings,
  spec_files: settings.spec_files.flatMap(keeps),
  helpers: ['tools/spec-limit.mjs'],
});

jasmine.showColors(!process.env.NO_COLOR);

const counts = { passed: 0, failed: 0 };
jasmine.addReporter({
  reporterCapabilities: { parallel: true },
  specDone({ status }) {
    if (status === 'passed') counts.passed += 1;
    else counts.failed += 1; // a skipped spec proves nothing
  },
  suiteDone({ failedExpectations }) {
    if (failedExpectations.length > 0) counts.failed += 1; // an afterAll that failed
  },
  jasmineDone({ failedExpectations }) {
    if (failedExpectations.length > 0) counts.failed += 1; // a spec file that did not load
  },
});
jasmine.addReporter(new SlowestSpecs());
jasmine.exitOnCompletion = false;
const { overallStatus } = await jasmine.execute();
if (process.env.KINVALE_COUNTS) await writeFile(process.env.KINVALE_COUNTS, JSON.stringify(counts));
process.exit(overallStatus === 'passed' && counts.failed === 0 ? 0 : 1);
