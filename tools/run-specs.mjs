/**
 * Runs jasmine specs of the server, the engine and the tools: `node --import tsx tools/run-specs.mjs unit|db`.
 * Writes how many passed and failed to the file named by KINVALE_COUNTS.
 */
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import Jasmine from 'jasmine';

const root = fileURLToPath(new URL('..', import.meta.url));
const kinds = {
  unit: { keeps: (pattern) => [pattern, '!**/*.db.spec.ts'], timeoutMs: 30_000 },
  db: { keeps: (pattern) => [pattern.replace('.spec.', '.db.spec.')], timeoutMs: 120_000 },
};
const { keeps, timeoutMs } = kinds[process.argv[2]];

const settings = JSON.parse(await readFile(join(root, 'jasmine.json'), 'utf8'));
const jasmine = new Jasmine({ projectBaseDir: root });
jasmine.loadConfig({ ...settings, spec_files: settings.spec_files.flatMap(keeps) });
jasmine.jasmine.DEFAULT_TIMEOUT_INTERVAL = timeoutMs;

jasmine.showColors(!process.env.NO_COLOR);

const counts = { passed: 0, failed: 0 };
jasmine.addReporter({
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
jasmine.exitOnCompletion = false;
const { overallStatus } = await jasmine.execute();
if (process.env.KINVALE_COUNTS) await writeFile(process.env.KINVALE_COUNTS, JSON.stringify(counts));
process.exit(overallStatus === 'passed' && counts.failed === 0 ? 0 : 1);
