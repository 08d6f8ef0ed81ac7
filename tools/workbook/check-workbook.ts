import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { readFile, writeFile } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import excel from 'exceljs';
import { writeModelSheet } from '../../backend/board/workbook/model-sheet';
import { scenarioSheetName, writeScenarioSheet } from '../../backend/board/workbook/scenario-sheet';
import type { EditionContent, FrozenScenario, PlanOutlook } from '../../backend/contract';
import { tQuantile } from '../../backend/stats';
import {
  atConfidence,
  heldRegressors,
  predict,
  type PredictionBasis,
} from '../../backend/stats/prediction';
import { openCase } from '../outside/check-engine';
import { type OutsideCase, outsideCases } from '../outside/cases';

/** Relative to the size of the figure, or to one where it is smaller. */
const tolerance = 1e-9;

interface Expectation {
  readonly cell: string;
  readonly figure: string;
  readonly value: number;
}

interface Prepared {
  readonly id: string;
  readonly file: string;
  readonly expected: readonly Expectation[];
}

/**
 * Writes scenario workbooks of the reference panels without any computed value, with inputs changed after they were
 * written, has LibreOffice compute them, and holds every figure to the prediction code.
 *
 * @returns whether all are within the tolerance.
 */
export async function checkWorkbooks({
  root,
  folder,
  soffice,
  say,
}: {
  readonly root: URL;
  readonly folder: string;
  readonly soffice: string;
  readonly say: (text: string) => void;
}): Promise<boolean> {
  const prepared: Prepared[] = [];
  for (const [index, outside] of outsideCases.entries()) {
    const basis = (await openCase(root, outside)).result.prediction;
    if (basis === null) continue;
    prepared.push(await writeCase({ folder, index, outside, basis }));
  }
  const out = join(folder, 'computed');
  await compute(
    soffice,
    folder,
    out,
    prepared.map(({ file }) => file),
  );
  let worst = { difference: 0, where: '' };
  let figures = 0;
  for (const { id, file, expected } of prepared) {
    const workbook = new excel.Workbook();
    const bytes = await readFile(join(out, basename(file)));
    await workbook.xlsx.load(bytes as unknown as ArrayBuffer);
    const sheet = workbook.getWorksheet(scenarioSheetName);
    for (const { cell, figure, value } of expected) {
      figures += 1;
      const found = computedValue(sheet?.getCell(cell));
      const difference =
        found === undefined ? Infinity : Math.abs(found - value) / Math.max(1, Math.abs(value));
      if (difference > worst.difference) worst = { difference, where: `${id}, ${figure}, ${cell}` };
      if (difference > tolerance) say(`${id}: ${figure} in ${cell} is ${found}, expected ${value}`);
    }
  }
  say(
    `${figures} figures of ${prepared.length} workbooks; largest difference ${worst.difference.toExponential(1)} (${worst.where}); tolerance ${tolerance}`,
  );
  return figures > 0 && worst.difference <= tolerance;
}

async function writeCase({
  folder,
  index,
  outside,
  basis,
}: {
  readonly folder: string;
  readonly index: number;
  readonly outside: OutsideCase;
  readonly basis: PredictionBasis;
}): Promise<Prepared> {
  const scenarios = outlooks(basis).map((outlook, place) => scenarioOf(basis, outlook, place));
  const content = {
    panelVersion: { currency: 'EUR', unit: 'millions' },
    regressorRoles: basis.regressors.map(() => 'other'),
    fit: {
      prediction: basis,
      slopes: basis.regressors.map((name) => ({ name })),
      specification: { form: outside.form },
    },
    scenarios,
  } as unknown as EditionContent;
  const workbook = new excel.Workbook();
  writeScenarioSheet(workbook, content, 'formulas-alone');
  writeModelSheet(workbook, basis);
  const sheet = workbook.getWorksheet(scenarioSheetName);
  if (sheet === undefined) throw new Error('the workbook has no scenario sheet');
  const expected: Expectation[] = [];
  let top = 3;
  for (const scenario of scenarios) {
    // Other inputs than those it was written with: only formulas can follow them.
    const changed = scenario.plan.map(({ year, values }, h) => ({
      year,
      values: values.map((value, k) => value * (1 + 0.03 * (h + 1) * (k % 2 === 0 ? 1 : -1))),
    }));
    changed.forEach(({ values }, h) => {
      values.forEach((value, k) => {
        sheet.getCell(top + 2 + h, 2 + k).value = value;
      });
    });
    expected.push(...expectations(basis, { ...scenario, plan: changed }, top));
    top += scenario.plan.length + 4;
  }
  const file = join(folder, `case-${index}.xlsx`);
  await writeFile(file, Buffer.from(await workbook.xlsx.writeBuffer()));
  return { id: outside.id, file, expected };
}

function outlooks(basis: PredictionBasis): readonly PlanOutlook[] {
  const level: PlanOutlook = {
    start: 'model-level',
    yearEffect: 'last',
    confidence: basis.confidence,
    bandConfidence: 0.8,
  };
  const carried: PlanOutlook = {
    start: 'carry-the-gap',
    yearEffect: 'mean-of-last-three',
    confidence: 0.8,
    bandConfidence: 0.9,
  };
  const canCarry = (basis.ownErrors?.persistence ?? null) !== null;
  return canCarry ? [level, carried] : [level];
}

function scenarioOf(basis: PredictionBasis, outlook: PlanOutlook, place: number): FrozenScenario {
  const held = heldRegressors(basis);
  const plan = [1, 2, 3].map((h) => ({
    year: basis.last.year + h,
    values: held.map((value) => value * (1 + 0.05 * h)),
  }));
  return {
    id: '00000000-0000-4000-8000-000000000000',
    name: `Plan ${place}`,
    note: '',
    version: 1,
    plan,
    years: [],
    outlook,
  };
}

/** What every figure has to be, by the prediction code, and the cell it stands in. */
function expectations(
  basis: PredictionBasis,
  { plan, outlook }: FrozenScenario,
  top: number,
): readonly Expectation[] {
  if (outlook === undefined) return [];
  const { start, yearEffect, bandConfidence, confidence } = outlook;
  const years = plan.map(({ year, values }) => ({ year, regressors: values }));
  const first = 2 + basis.regressors.length;
  const isLog = basis.form === 'log';
  const share = (value: number | null) => (value === null || !isLog ? value : Math.expm1(value));
  return predict(
    atConfidence(basis, confidence, tQuantile),
    { years, start, yearEffect, bandConfidence },
    tQuantile,
  ).flatMap((year, h): readonly Expectation[] => {
    if (year.expected === null) return [];
    const { expected, difference, band } = year;
    const figures: readonly (readonly [string, number | null])[] = [
      ['expected value', expected.estimate],
      ['low', expected.low],
      ['high', expected.high],
      ['difference', share(difference.estimate)],
      ['difference low', share(difference.low)],
      ['difference high', share(difference.high)],
      ['band low', band.low],
      ['band high', band.high],
    ];
    return figures.flatMap(([figure, value], offset) =>
      value === null
        ? []
        : [{ figure, value, cell: `${columnLetter(first + offset)}${top + 2 + h}` }],
    );
  });
}

function columnLetter(column: number): string {
  return String.fromCharCode(64 + column);
}

/** A computed number; `cell.result` has it also where it is zero, which the value leaves out. */
function computedValue(cell: excel.Cell | undefined): number | undefined {
  const { result } = cell ?? {};
  return typeof result === 'number' ? result : undefined;
}

/** Opens each workbook in LibreOffice without a screen and stores it again, computed. */
async function compute(
  soffice: string,
  folder: string,
  out: string,
  files: readonly string[],
): Promise<void> {
  const profile = pathToFileURL(join(folder, 'profile')).href;
  const child = spawn(
    soffice,
    [
      `-env:UserInstallation=${profile}`,
      '--headless',
      '--norestore',
      '--convert-to',
      'xlsx:Calc MS Excel 2007 XML',
      '--outdir',
      out,
      ...files,
    ],
    { stdio: ['ignore', 'ignore', 'inherit'] },
  );
  const [status] = (await once(child, 'exit')) as [number | null];
  if (status !== 0) throw new Error(`LibreOffice ended with ${status}`);
}
