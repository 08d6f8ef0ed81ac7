import { writeFile } from 'node:fs/promises';
import { type OutsideCase, outsideCases } from './cases';
import type { OutsideAnswer } from './check-engine';

/** The cases that the specs hold: what the other golden files lack, on panels that lie beside them. */
const frozenCases: readonly string[] = [
  'grunfeld10_unbalanced: company',
  'grunfeld10_unbalanced: company, year',
  'grunfeld10_unbalanced: lag',
  'grunfeld10_short_own: company',
  'grunfeld10_short_own: company, year',
  'grunfeld11_value_on_inv_capital: log',
  'grunfeld11_value_on_inv_capital: log, year, lag',
  'usairlines: company, year',
];

/** Writes `golden/outside.json`, a line a figure. */
export async function freezeOutside(root: URL, answer: OutsideAnswer): Promise<void> {
  const versions = Object.entries(answer.packages).map(([name, version]) => `${name} ${version}`);
  const about = `npm run check-outside -- --freeze: R ${answer.r} with ${versions.join(', ')}; own code is tools/outside/*.R and backend/fits/replication/replication.R`;
  const cases = frozenCases.map((id) => {
    const outside = outsideCases.find((one) => one.id === id);
    const found = answer.cases.find((one) => one.id === id);
    if (outside === undefined || found === undefined) throw new Error(`there is no case ${id}`);
    return caseText(outside, found);
  });
  const text = `{\n"about": ${JSON.stringify(about)},\n"cases": [\n${cases.join(',\n')}\n]}\n`;
  await writeFile(new URL('backend/stats/golden/outside.json', root), text);
}

function caseText(
  outside: OutsideCase,
  { plans, figures }: OutsideAnswer['cases'][number],
): string {
  const lines = Object.entries(figures).map(
    ([figure, value]) => `  ${JSON.stringify(figure)}: ${JSON.stringify(value)}`,
  );
  const head = JSON.stringify({ ...outside, plans }).slice(0, -1);
  return `${head}, "figures": {\n${lines.join(',\n')}\n}}`;
}
