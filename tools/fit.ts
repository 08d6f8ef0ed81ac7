/**
 * Prints one fit of a panel file as JSON, by the same engine as the server:
 * `npm run --silent fit -- --panel FILE.csv --company COL --year COL --outcome COL --regressors A,B [--own NAME]`.
 * Bad input exits 2 with one problem object on standard error and nothing on standard output.
 */
import { problemOf } from './fit/fit-problem';
import { runFit } from './fit/run-fit';

try {
  // npm runs scripts in the project's folder; the caller's own stands in INIT_CWD.
  const reply = await runFit(process.argv.slice(2), process.env['INIT_CWD']);
  process.stdout.write(`${JSON.stringify(reply, null, 2)}\n`);
} catch (error) {
  const problem = problemOf(error);
  if (problem === undefined) throw error;
  process.stderr.write(`${JSON.stringify(problem.toJson(), null, 2)}\n`);
  process.exitCode = 2;
}
