import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { toleranceOf } from '../../backend/stats/testing/outside/tolerances';
import { type OutsideCase, outsideCases } from './cases';
import type { CheckSurroundings } from './check-surroundings';
import { checkCase, type FigureCheck, openCase, type OutsideAnswer } from './check-engine';
import { differenceTable, type DifferenceRow } from './difference-table';
import { freezeOutside } from './freeze-outside';
import { furthestBy } from './furthest-by';
import { replicatePacks } from './replicate-packs';

/** R processes at once: each loads its packages in a second or two, so more would not pay. */
const processes = 2;

/** Runs R and the engine on every case, prints the table, and says whether every difference is within its tolerance. */
export async function checkOutside(surroundings: CheckSurroundings): Promise<boolean> {
  const { root, say, freeze } = surroundings;
  say(`R computes ${outsideCases.length} cases`);
  const answer = await askR(surroundings);
  const versions = Object.entries(answer.packages).map(([name, version]) => `${name} ${version}`);
  say(`R ${answer.r} with ${versions.join(', ')}`);
  const checks: FigureCheck[] = [];
  for (const outside of outsideCases) {
    const found = answer.cases.find(({ id }) => id === outside.id);
    if (found === undefined) throw new Error(`R gave no answer for ${outside.id}`);
    checks.push(...checkCase(await openCase(root, outside), found));
  }
  if (freeze) await freezeOutside(root, answer);
  say('R runs the replication packs');
  const packs = await replicatePacks(surroundings);
  const rows = [...figureRows(checks), ...packs];
  process.stdout.write(`${differenceTable(rows)}\n`);
  const failed = rows.filter(({ difference, tolerance }) => !(difference <= tolerance));
  say(
    failed.length === 0
      ? `${rows.length} figures of ${outsideCases.length} cases agree with R.`
      : `Beyond their tolerance: ${failed.map(({ figure }) => figure).join(', ')}.`,
  );
  return failed.length === 0;
}

async function askR({ folder, runR }: CheckSurroundings): Promise<OutsideAnswer> {
  const parts = Array.from({ length: processes }, (_, part) =>
    outsideCases.filter((__, index) => index % processes === part),
  );
  const answers = await Promise.all(
    parts.map(async (cases, part) => {
      const request = join(folder, `request-${part}.json`);
      const reply = join(folder, `answer-${part}.json`);
      await writeFile(request, JSON.stringify(cases satisfies readonly OutsideCase[]));
      await runR(['tools/outside/compute.R', request, reply]);
      return JSON.parse(await readFile(reply, 'utf8')) as OutsideAnswer;
    }),
  );
  const [first] = answers;
  return { ...first, cases: answers.flatMap(({ cases }) => cases) };
}

/** A row a figure: the case where the engine is furthest from R. */
function figureRows(checks: readonly FigureCheck[]): DifferenceRow[] {
  return furthestBy(checks, ({ figure }) => figure).map(({ key, count, furthest }) => ({
    figure: key,
    cases: count,
    dataSet: furthest.caseId,
    difference: furthest.difference,
    tolerance: toleranceOf(key),
  }));
}
