import type excel from 'exceljs';
import { type FrozenScenario, type PlanOutlook, type EditionContent } from '../../contract';
import { tQuantile } from '../../stats';
import {
  atConfidence,
  bandErrors,
  chosenYearEffect,
  predict,
  type PredictedYear,
  type PredictionBasis,
  twoSidedQuantile,
} from '../../stats/prediction';
import { labelsOf } from '../content/edition-terms';
import { modelNames as name } from './model-sheet';
import { address, amountFormat, bold, columnName, markInput, quiet } from './workbook-cells';

export const scenarioSheetName = 'Scenarios';

/** Whether formulas come with their values, as for readers that do not compute, or alone, to be computed. */
export type FormulaValues = 'with-values' | 'formulas-alone';

type Readable = Exclude<PredictedYear, { readonly expected: null }>;

interface Block {
  readonly sheet: excel.Worksheet;
  readonly basis: PredictionBasis;
  readonly outlook: PlanOutlook;
  readonly columns: Columns;
  readonly values: FormulaValues;
}

/** Where things stand in a scenario's block, columns from 1. */
interface Columns {
  readonly inputs: number;
  readonly expected: number;
  readonly low: number;
  readonly high: number;
  readonly difference: number;
  readonly differenceLow: number;
  readonly differenceHigh: number;
  readonly bandLow: number;
  readonly bandHigh: number;
  /** What the model reads, in its scale. */
  readonly read: number;
  /** Share of the last gap, year effect, h. */
  readonly share: number;
  readonly yearEffect: number;
  readonly point: number;
  /** w over the centred basis. */
  readonly weights: number;
  readonly standardError: number;
  readonly delta: number;
  readonly pairs: number;
  readonly deltaError: number;
  readonly deltaDegrees: number;
  readonly end: number;
}

/**
 * Writes the scenarios with live formulas: change an input, a figure on a light ground, and expected value, interval,
 * difference to the base and band follow, by the same formulas as the product's. Differences of a log form are shares.
 */
export function writeScenarioSheet(
  workbook: excel.Workbook,
  content: EditionContent,
  values: FormulaValues = 'with-values',
): void {
  const { prediction } = content.fit;
  if (prediction === null) return;
  const sheet = workbook.addWorksheet(scenarioSheetName, {
    views: [{ state: 'frozen', xSplit: 1 }],
  });
  sheet.getColumn(1).width = 26;
  const columns = columnsOf(prediction);
  for (let column = 2; column <= columns.bandHigh; column += 1) sheet.getColumn(column).width = 16;
  for (let column = columns.read; column < columns.end; column += 1) {
    sheet.getColumn(column).width = 13;
    // How it is computed, folded away: open the group to see it.
    sheet.getColumn(column).outlineLevel = 1;
    sheet.getColumn(column).hidden = true;
  }
  const { currency, unit } = content.panelVersion;
  sheet.getCell(1, 1).value =
    `Amounts in ${currency}, ${unit}. Inputs stand on a light ground; everything else follows them.`;
  let row = 3;
  for (const scenario of content.scenarios)
    row = writeBlock(sheet, row, scenario, content, columns, values);
}

function columnsOf(basis: PredictionBasis): Columns {
  const count = basis.regressors.length;
  const ofYears = basis.yearEffects === undefined || basis.yearEffects === null ? 0 : 4;
  let next = 2;
  const take = (width: number): number => {
    const at = next;
    next += width;
    return at;
  };
  return {
    inputs: take(count),
    expected: take(1),
    low: take(1),
    high: take(1),
    difference: take(1),
    differenceLow: take(1),
    differenceHigh: take(1),
    bandLow: take(1),
    bandHigh: take(2),
    read: take(count),
    share: take(1),
    yearEffect: take(1),
    point: take(1),
    weights: take(1 + count + ofYears),
    standardError: take(1),
    delta: take(count),
    pairs: take((count * (count + 1)) / 2),
    deltaError: take(1),
    deltaDegrees: take(1),
    end: next,
  };
}

function writeBlock(
  sheet: excel.Worksheet,
  top: number,
  scenario: FrozenScenario,
  content: EditionContent,
  columns: Columns,
  values: FormulaValues,
): number {
  const basis = content.fit.prediction as PredictionBasis;
  const outlook = scenario.outlook ?? usual(basis);
  const block: Block = { sheet, basis, outlook, columns, values };
  const labels = labelsOf(content);
  sheet.getCell(top, 1).value = scenario.name;
  sheet.getCell(top, 1).font = bold;
  sheet.getCell(top, 2).value = outlookWords(outlook);
  sheet.getCell(top, 2).font = quiet;
  heads(block, top + 1, labels);
  const atLevel = atConfidence(basis, outlook.confidence, tQuantile);
  const { start, yearEffect, bandConfidence } = outlook;
  const years = scenario.plan.map(({ year, values: regressors }) => ({ year, regressors }));
  predict(atLevel, { years, start, yearEffect, bandConfidence }, tQuantile).forEach(
    (predicted, index) => {
      const row = top + 2 + index;
      sheet.getCell(row, 1).value = `FY${predicted.year}`;
      scenario.plan[index].values.forEach((value, k) => {
        const cell = sheet.getCell(row, columns.inputs + k);
        cell.value = value;
        markInput(cell);
        cell.numFmt = amountFormat;
      });
      if (predicted.expected !== null)
        writeYear({ ...block, basis: atLevel }, row, index, predicted);
    },
  );
  return top + scenario.plan.length + 4;
}

function usual({ confidence }: PredictionBasis): PlanOutlook {
  return { start: 'model-level', yearEffect: 'last', confidence, bandConfidence: 0.8 };
}

function outlookWords({ start, yearEffect, confidence, bandConfidence }: PlanOutlook): string {
  const from = start === 'model-level' ? 'from the model level' : 'carrying the last gap';
  const effect =
    typeof yearEffect === 'object'
      ? 'a given year effect'
      : `year effect ${yearEffect.replaceAll('-', ' ')}`;
  return `${from}, ${effect}, intervals ${confidence * 100} %, band of the market value ${bandConfidence * 100} %`;
}

function heads({ sheet, columns, basis }: Block, row: number, labels: readonly string[]): void {
  const write = (column: number, text: string) => {
    sheet.getCell(row, column).value = text;
    sheet.getCell(row, column).font = bold;
  };
  write(1, 'fiscal year');
  labels.forEach((label, k) => {
    write(columns.inputs + k, label);
    write(columns.read + k, `${label}, as read`);
    write(columns.delta + k, `${label}, against the base`);
  });
  write(columns.expected, 'expected value');
  write(columns.low, 'low');
  write(columns.high, 'high');
  const share = basis.form === 'log' ? ', share' : '';
  write(columns.difference, `against the base${share}`);
  write(columns.differenceLow, 'low');
  write(columns.differenceHigh, 'high');
  write(columns.bandLow, 'band low');
  write(columns.bandHigh, 'band high');
  write(columns.share, 'share of the last gap');
  write(columns.yearEffect, 'year effect');
  write(columns.point, 'expected, model scale');
  write(columns.weights, 'weights');
  write(columns.standardError, 'standard error');
  write(columns.pairs, 'pairs');
  write(columns.deltaError, 'standard error of the difference');
  write(columns.deltaDegrees, 'its degrees of freedom');
}

function writeYear(block: Block, row: number, index: number, predicted: Readable): void {
  const { sheet, basis, columns, outlook } = block;
  const at = (column: number) => address(column, row);
  const range = (column: number, width: number) =>
    `${at(column)}:${columnName(column + width - 1)}${row}`;
  const count = basis.regressors.length;
  const isLog = basis.form === 'log';
  const write = (column: number, formula: string, value: number | null) => {
    sheet.getCell(row, column).value =
      block.values === 'with-values' && value !== null ? { formula, result: value } : { formula };
    const isShare = isLog && column >= columns.difference && column <= columns.differenceHigh;
    sheet.getCell(row, column).numFmt = isShare ? '0.0%' : amountFormat;
  };
  const regressorsRead = isLog ? predicted.regressors.map(Math.log) : predicted.regressors;
  for (let k = 0; k < count; k += 1) {
    const source =
      basis.lag !== 1
        ? at(columns.inputs + k)
        : index === 0
          ? null
          : address(columns.inputs + k, row - 1);
    const value = regressorsRead[k];
    if (source === null) write(columns.read + k, `INDEX(${name.held},1,${k + 1})`, value);
    else write(columns.read + k, isLog ? `LN(${source})` : source, value);
  }
  const share =
    outlook.start === 'carry-the-gap'
      ? (basis.ownErrors?.persistence ?? 0) ** predicted.stepsAhead
      : 0;
  write(
    columns.share,
    outlook.start === 'carry-the-gap' ? `${name.persistence}^${predicted.stepsAhead}` : '0',
    share,
  );
  const { effects, yearWeights } = yearPart(basis, outlook);
  sheet.getCell(row, columns.yearEffect).value = effects;
  const read = range(columns.read, count);
  write(
    columns.point,
    `${name.level}+SUMPRODUCT(${name.slopes},${read}-${name.means})+${at(columns.yearEffect)}+${at(columns.share)}*${name.lastError}`,
    null,
  );
  write(columns.weights, `1-${at(columns.share)}`, 1 - share);
  for (let k = 0; k < count; k += 1)
    write(
      columns.weights + 1 + k,
      `${at(columns.read + k)}-INDEX(${name.means},1,${k + 1})-${at(columns.share)}*(INDEX(${name.last},1,${k + 1})-INDEX(${name.means},1,${k + 1}))`,
      null,
    );
  yearWeights.forEach((formula, offset) => {
    write(columns.weights + 1 + count + offset, formula(at(columns.share)), null);
  });
  const w = range(columns.weights, 1 + count + yearWeights.length);
  const form = (matrix: string) => `SUMPRODUCT(MMULT(${w},${matrix}),${w})`;
  const hasInterval = predicted.expected.low !== null;
  if (hasInterval)
    write(
      columns.standardError,
      `SQRT(${name.years}*${form(name.lambdaSquare)}*MAX(1,${form(name.a)}/(${name.years}*${form(name.d)})))`,
      null,
    );
  const factor = isLog && outlook.start !== 'carry-the-gap' ? `*${name.smear}` : '';
  const out = (inScale: string) => (isLog ? `EXP(${inScale})${factor}` : inScale);
  const { expected } = predicted;
  write(columns.expected, out(at(columns.point)), expected.estimate);
  if (hasInterval) {
    const reach = `${basis.quantile}*${at(columns.standardError)}`;
    write(columns.low, out(`${at(columns.point)}-${reach}`), expected.low);
    write(columns.high, out(`${at(columns.point)}+${reach}`), expected.high);
  }
  writeDifference(block, predicted, { write, at, range });
  writeBand(block, predicted, { write, at });
}

interface Writer {
  readonly write: (column: number, formula: string, value: number | null) => void;
  readonly at: (column: number) => string;
  readonly range: (column: number, width: number) => string;
}

/** Slopes times differences with the interval of the covariance of the slopes, its degrees of freedom those of it. */
function writeDifference(
  { basis, columns, outlook }: Block,
  { difference }: Readable,
  { write, at, range }: Writer,
): void {
  const count = basis.regressors.length;
  const isLog = basis.form === 'log';
  const shown = (inScale: string) => (isLog ? `EXP(${inScale})-1` : inScale);
  const value = (inScale: number | null) =>
    inScale === null || !isLog ? inScale : Math.expm1(inScale);
  for (let k = 0; k < count; k += 1)
    write(columns.delta + k, `${at(columns.read + k)}-INDEX(${name.held},1,${k + 1})`, null);
  const delta = range(columns.delta, count);
  const sum = `SUMPRODUCT(${name.slopes},${delta})`;
  write(columns.difference, shown(sum), value(difference.estimate));
  if (basis.slopeCovariance === null || basis.slopeDegreesOfFreedom === null) return;
  if (difference.low === null) return;
  // Scaled by the largest of them, so that fourth powers neither overflow nor vanish; all zero have no error.
  const largest = `MAX(MAX(${delta}),-MIN(${delta}),1E-300)`;
  write(
    columns.deltaError,
    `SQRT(SUMPRODUCT(MMULT(${delta},${name.slopeCovariance}),${delta}))`,
    null,
  );
  const degrees = basis.slopeDegreesOfFreedom;
  if (degrees.kind === 'fixed') write(columns.deltaDegrees, String(degrees.value), degrees.value);
  else {
    let place = 0;
    for (let k = 0; k < count; k += 1)
      for (let l = k; l < count; l += 1) {
        const twice = k === l ? '' : '2*';
        write(
          columns.pairs + place,
          `${twice}${at(columns.delta + k)}*${at(columns.delta + l)}/${largest}^2`,
          null,
        );
        place += 1;
      }
    const pairs = range(columns.pairs, place);
    const s = `SUMPRODUCT(MMULT(${delta},${name.satterthwaite}),${delta})/${largest}^2`;
    write(
      columns.deltaDegrees,
      `IF(${at(columns.deltaError)}=0,1,(${s})^2/SUMPRODUCT(MMULT(${pairs},${name.quartic}),${pairs}))`,
      null,
    );
  }
  // The quantile of t at any degrees of freedom, whole or not: t² = ν(1/x − 1), x the beta quantile at ν/2 and 1/2.
  const df = at(columns.deltaDegrees);
  const t = `SQRT(${df}*(1/BETAINV(${1 - outlook.confidence},${df}/2,0.5)-1))`;
  write(
    columns.differenceLow,
    shown(`${sum}-${t}*${at(columns.deltaError)}`),
    value(difference.low),
  );
  write(
    columns.differenceHigh,
    shown(`${sum}+${t}*${at(columns.deltaError)}`),
    value(difference.high),
  );
}

function writeBand(
  { basis, columns, outlook }: Block,
  predicted: Readable,
  { write, at }: Pick<Writer, 'write' | 'at'>,
): void {
  const { band, year } = predicted;
  if (band.low === null) return;
  const errors = bandErrors(basis, { ...outlook, year });
  if (errors.reason !== undefined) return;
  const quantile = twoSidedQuantile(tQuantile, outlook.bandConfidence, errors.degreesOfFreedom);
  const reach = `${quantile}*SQRT(MAX(${errors.around}+${at(columns.standardError)}^2,${errors.ahead}))`;
  const out = (inScale: string) => (basis.form === 'log' ? `EXP(${inScale})` : inScale);
  write(columns.bandLow, out(`${at(columns.point)}-${reach}`), band.low);
  write(columns.bandHigh, out(`${at(columns.point)}+${reach}`), band.high);
}

/** c_h less the own mean of the year effects, and the year weights as formulas of the gap's share; none without them. */
function yearPart(
  { yearEffects }: PredictionBasis,
  { yearEffect }: PlanOutlook,
): {
  readonly effects: number;
  readonly yearWeights: readonly ((share: string) => string)[];
} {
  if (yearEffects === undefined || yearEffects === null) return { effects: 0, yearWeights: [] };
  const { effect, estimated } = chosenYearEffect(yearEffects, yearEffect);
  return {
    effects: effect - yearEffects.ownMean,
    yearWeights: [
      (share) => `${share}-1`,
      () => (estimated === 'last' ? '1' : '0'),
      () => (estimated === 'lastThree' ? '1' : '0'),
      (share) => `-${share}`,
    ],
  };
}
