import { existsSync } from 'node:fs';
import { readFile } from 'node:fs/promises';

const node = process.execPath;
const specs = (kind) => [node, '--import', 'tsx', 'tools/run-specs.mjs', kind];
const minutes = 60_000;

/**
 * The suites in the order of their output.
 *
 * - `command`: what to run; several commands run one after the other and stop at the first that fails.
 * - `withoutBuild`: what to run where the build is not among the chosen suites, for what it checks too.
 * - `countsSpecs`: the runner writes its counts to KINVALE_COUNTS; otherwise the suite as a whole counts as one.
 * - `alone`: suites that measure time or use much of the machine have it to themselves.
 * - `seconds`: about how long it takes on two processors, for the order in which suites start.
 */
export const suites = [
  {
    name: 'format',
    title: 'Format (prettier)',
    commands: [
      [node, 'node_modules/prettier/bin/prettier.cjs', '--check', '--log-level', 'warn', '.'],
    ],
    limitMs: 3 * minutes,
    seconds: 35,
  },
  {
    name: 'lint',
    title: 'Lint (eslint)',
    commands: [[node, 'node_modules/eslint/bin/eslint.js', '.', '--max-warnings', '0']],
    limitMs: 4 * minutes,
    seconds: 95,
  },
  {
    name: 'types',
    title: 'Types of all projects (tsc, ngc)',
    commands: [[node, 'tools/typecheck.mjs', '--build-follows']],
    withoutBuild: [[node, 'tools/typecheck.mjs']],
    limitMs: 4 * minutes,
    seconds: 60,
  },
  {
    name: 'imports',
    title: 'Import rules',
    commands: [[node, 'tools/check-imports.mjs']],
    limitMs: 2 * minutes,
    seconds: 5,
  },
  {
    name: 'unit',
    title: 'Unit specs of engine, server, stubs and tools (jasmine)',
    commands: [specs('unit')],
    countsSpecs: true,
    limitMs: 5 * minutes,
    seconds: 50,
  },
  {
    name: 'build',
    title: 'Build and bundle budget',
    commands: [
      [node, 'tools/build.mjs'],
      [node, 'tools/check-bundle.mjs'],
    ],
    limitMs: 5 * minutes,
    seconds: 55,
  },
  {
    name: 'angular',
    title: 'Angular specs (Karma in Chromium)',
    commands: [
      [node, 'node_modules/@angular/cli/bin/ng.js', 'test', '--watch=false', '--no-progress'],
    ],
    countsSpecs: true,
    needs: ['chromium'],
    limitMs: 5 * minutes,
    seconds: 56,
  },
  {
    name: 'db',
    title: 'Database and API specs on PostgreSQL (jasmine)',
    commands: [specs('db')],
    countsSpecs: true,
    needs: ['postgres'],
    alone: true,
    limitMs: 6 * minutes,
    seconds: 115,
  },
  {
    name: 'browser',
    title: 'Browser journeys over HTTPS (Playwright)',
    commands: [
      [node, 'tools/build.mjs'],
      [node, 'node_modules/@playwright/test/cli.js', 'test'],
    ],
    countsSpecs: true,
    needs: ['postgres', 'chromium'],
    alone: true,
    limitMs: 8 * minutes,
    seconds: 250,
  },
];

/** The suites of these names, or all; each with the commands that this choice asks for. */
export function chosenSuites(names = suites.map(({ name }) => name)) {
  return suites
    .filter(({ name }) => names.includes(name))
    .map(({ withoutBuild, ...suite }) =>
      withoutBuild === undefined || names.includes('build')
        ? suite
        : { ...suite, commands: withoutBuild },
    );
}

/** The longest start first, so that no long one is left to run by itself; those that want the machine come last. */
export function inStartOrder(chosen) {
  const together = chosen.filter(({ alone = false }) => !alone);
  return [
    ...together.sort((one, other) => other.seconds - one.seconds),
    ...chosen.filter(({ alone = false }) => alone),
  ];
}

/**
 * How many passed and failed, by what the runner wrote and how it ended. A runner that failed without a failed
 * spec, wrote nothing, or ran nothing counts as one failure more: silence is no success.
 *
 * @param countsFile  what the runner wrote: our own `{ passed, failed }`, or Playwright's report.
 */
export async function countOf({ countsSpecs = false }, hasPassed, countsFile) {
  if (!countsSpecs) return hasPassed ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
  if (!existsSync(countsFile))
    return { passed: 0, failed: 1, remark: 'the runner reported no counts' };
  const report = JSON.parse(await readFile(countsFile, 'utf8'));
  const { passed, failed } = report.stats === undefined ? report : ofPlaywright(report);
  if (passed + failed === 0) return { passed, failed: 1, remark: 'no spec ran' };
  if (!hasPassed && failed === 0)
    return { passed, failed: 1, remark: 'the runner failed outside its specs' };
  return { passed, failed };
}

/** A journey that did not run, or passed only on a second try, has not passed. */
function ofPlaywright({ stats, errors }) {
  return {
    passed: stats.expected,
    failed: stats.unexpected + stats.flaky + stats.skipped + errors.length,
  };
}
