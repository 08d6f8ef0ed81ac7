import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { replicationFiles } from '../../backend/fits/replication/replication-reply';
import { rowsUsed } from '../../backend/fits/replication/rows-used';
import type { Specification } from '../../backend/stats';
import { covarianceTable } from '../../backend/stats/slopes/covariance-table';
import { type OutsideCase, outsideCases } from './cases';
import { openCase, openData } from './check-engine';
import type { CheckSurroundings } from './check-surroundings';
import type { DifferenceRow } from './difference-table';
import { furthestBy } from './furthest-by';

const packTolerance = 1e-8;

type SlopeCovarianceName = Specification['slopes'];

interface PackedFit {
  readonly outside: OutsideCase;
  readonly slopes: SlopeCovarianceName;
  readonly folder: string;
}

/** What `replicate-packs.R` answers, a pack after the other: the figure furthest from the results, and how far. */
interface ReplicatedPack {
  readonly figure: string;
  readonly difference: string;
}

/**
 * Writes the pack of each fit as the server would and runs its script: the first pack by itself, as a reader of it does,
 * the others in one process.
 */
export async function replicatePacks(surroundings: CheckSurroundings): Promise<DifferenceRow[]> {
  const { root, folder, runR } = surroundings;
  const script = await readFile(new URL('backend/fits/replication/replication.R', root), 'utf8');
  const fits = packedFits(folder);
  for (const fit of fits) await writePack(root, fit, script);
  await runR(['replication.R'], { cwd: fits[0].folder });
  const answer = join(folder, 'packs.json');
  await runR(['tools/outside/replicate-packs.R', answer, ...fits.map((fit) => fit.folder)]);
  const replicated = JSON.parse(await readFile(answer, 'utf8')) as readonly ReplicatedPack[];
  const packs = fits.map((fit, index) => {
    const { figure, difference } = replicated[index];
    return { ...fit, figure, difference: Number(difference) };
  });
  return furthestBy(packs, ({ slopes }) => slopes).map(({ key, count, furthest }) => ({
    figure: `replication pack, ${key}`,
    cases: count,
    dataSet: `${furthest.outside.id} (${furthest.figure})`,
    difference: furthest.difference,
    tolerance: packTolerance,
  }));
}

/** Every case with the default covariance and with another in turn; the demo panel's plain fit with all of them. */
function packedFits(folder: string): readonly PackedFit[] {
  const names = Object.keys(covarianceTable) as SlopeCovarianceName[];
  const others = names.filter((name) => name !== 'cr2');
  const pairs = outsideCases.flatMap((outside, index) => {
    const isDemo = outside.id === 'demo: company';
    const methods = isDemo ? names : (['cr2', others[index % others.length]] as const);
    return methods.map((slopes) => ({ outside, slopes }));
  });
  return pairs.map((pair, index) => ({ ...pair, folder: join(folder, `pack-${index}`) }));
}

async function writePack(
  root: URL,
  { outside, slopes, folder }: PackedFit,
  script: string,
): Promise<void> {
  const { data } = await openCase(root, outside);
  const { result } = openData(data, outside, slopes);
  const files = replicationFiles({
    rows: rowsUsed(data, result),
    names: { company: outside.company, year: outside.year, regressors: outside.regressors },
    ownCompany: outside.own,
    currency: null,
    unit: null,
    result,
    evidence: null,
    lineage: null,
    script,
  });
  await mkdir(folder);
  for (const { name, text } of files) await writeFile(join(folder, name), text);
}
