import excel from 'exceljs';
import type { EditionContent, EditionSummary } from '../../contract';
import { sentenceText } from '../../figures';
import { labelsOf } from '../content/edition-terms';
import type { MoneyUnit } from '../edition-parts';
import { confidentialityWords, lineageLine, specificationWords } from '../pdf/sheet-words';
import { writeModelSheet } from './model-sheet';
import { type FormulaValues, writeScenarioSheet } from './scenario-sheet';
import { amountFormat, bold, finishSheet, widths } from './workbook-cells';

export interface WorkbookEdition {
  readonly edition: EditionSummary;
  readonly content: EditionContent;
  /** The rows of the panel that the fit was computed from. */
  readonly rows: readonly {
    readonly company: string;
    readonly year: number;
    readonly outcome: number;
    readonly regressors: readonly number[];
    readonly fileRow: number;
    readonly isUsed: boolean;
  }[];
}

/**
 * An edition as a workbook: what it says, the rows it stands on, slopes, intercepts, and scenarios with live formulas
 * over the named numbers of the model. Amounts in the panel's unit, at full precision; sentences in the unit asked for.
 */
export async function editionWorkbook(
  { edition, content, rows }: WorkbookEdition,
  setting: { readonly unit: MoneyUnit; readonly createdAt: Date; readonly values?: FormulaValues },
): Promise<Buffer> {
  const workbook = new excel.Workbook();
  workbook.creator = 'Kinvale';
  workbook.created = setting.createdAt;
  workbook.modified = setting.createdAt;
  workbook.calcProperties.fullCalcOnLoad = true;
  writeEditionSheet(workbook, edition, content, setting.unit);
  writeScenarioSheet(workbook, content, setting.values);
  writeRows(workbook, content, rows);
  writeSlopes(workbook, content);
  writeIntercepts(workbook, content);
  if (content.fit.prediction !== null) writeModelSheet(workbook, content.fit.prediction);
  workbook.worksheets.forEach(finishSheet);
  return Buffer.from(await workbook.xlsx.writeBuffer());
}

/** Wrapped text gets the height of its lines: not every program finds it by itself. */
const lettersInLine = 140;
const lineHeight = 13.5;

function writeEditionSheet(
  workbook: excel.Workbook,
  edition: EditionSummary,
  content: EditionContent,
  unit: MoneyUnit,
): void {
  const sheet = workbook.addWorksheet('Edition');
  widths(sheet, [26, 110]);
  const { currency, unit: panelUnit } = content.panelVersion;
  const written = (sentence: EditionContent['headline']) =>
    sentenceText(sentence, { currency, panelUnit, unit });
  const { decision } = edition;
  const lines: readonly (readonly [string, string])[] = [
    ['Edition', `${edition.number}, ${edition.state}`],
    ['Own company', content.ownCompany],
    ['Headline', written(content.headline)],
    ['Shared as', confidentialityWords[content.confidentiality]],
    ['Published', `${content.publishedAt} by ${content.publishedBy}, ${content.workspaceName}`],
    [
      'Decision',
      decision === null
        ? 'waits for a signature'
        : `${decision.kind} by ${decision.by}, ${decision.at}`,
    ],
    ...content.evidence.map(({ sentence }) => ['Evidence', written(sentence)] as const),
    ...content.slopesInWords.map(({ sentence }) => ['Slopes', written(sentence)] as const),
    ...content.warnings.map(
      ({ title, sentence }) => ['Warning', `${title}. ${written(sentence)}`] as const,
    ),
    ...content.cautions.map((caution) => ['Caution', caution] as const),
    ['Where from', lineageLine(content)],
    ['Specification', specificationWords(content)],
    ['SHA-256', edition.sha256],
  ];
  for (const line of lines) {
    const row = sheet.addRow([...line]);
    row.getCell(1).font = bold;
    row.getCell(2).alignment = { wrapText: true, vertical: 'top' };
    row.getCell(1).alignment = { vertical: 'top' };
    row.height = lineHeight * Math.ceil(line[1].length / lettersInLine);
  }
}

function table(
  workbook: excel.Workbook,
  name: string,
  headers: readonly string[],
  rows: readonly (readonly (string | number | null)[])[],
): void {
  const sheet = workbook.addWorksheet(name, { views: [{ state: 'frozen', ySplit: 1 }] });
  widths(
    sheet,
    headers.map((header) => Math.max(14, header.length + 2)),
  );
  sheet.addRow([...headers]).font = bold;
  for (const row of rows)
    sheet.addRow([...row]).eachCell((cell) => {
      if (typeof cell.value === 'number' && !Number.isInteger(cell.value))
        cell.numFmt = amountFormat;
    });
}

function writeRows(
  workbook: excel.Workbook,
  content: EditionContent,
  rows: WorkbookEdition['rows'],
): void {
  const { currency, unit } = content.panelVersion;
  const money = `${currency}, ${unit}`;
  const lag = content.fit.specification.lag === 1 ? ' of the year before' : '';
  const labels = labelsOf(content).map((label, k) => `${label}${lag}${k < 2 ? `, ${money}` : ''}`);
  table(
    workbook,
    'Panel rows',
    ['company', 'fiscal year', `market value, ${money}`, ...labels, 'line of the file', 'used'],
    rows.map((row) => [
      row.company,
      row.year,
      row.outcome,
      ...row.regressors,
      row.fileRow,
      row.isUsed ? 'yes' : 'single row',
    ]),
  );
}

function writeSlopes(workbook: excel.Workbook, content: EditionContent): void {
  const labels = labelsOf(content);
  const share = Math.round(content.fit.specification.confidence * 1000) / 10;
  table(
    workbook,
    'Slopes',
    [
      'regressor',
      'slope',
      'standard error',
      't',
      'degrees of freedom',
      'p',
      `low, ${share} %`,
      `high, ${share} %`,
    ],
    content.fit.slopes.map((slope, index) => [
      labels[index],
      slope.estimate,
      slope.standardError,
      slope.statistic,
      slope.degreesOfFreedom,
      slope.pValue,
      slope.low,
      slope.high,
    ]),
  );
}

function writeIntercepts(workbook: excel.Workbook, content: EditionContent): void {
  const { currency, unit } = content.panelVersion;
  const { form, confidence } = content.fit.specification;
  const measure = form === 'log' ? 'natural logs' : `${currency}, ${unit}`;
  const share = Math.round(confidence * 1000) / 10;
  table(
    workbook,
    'Intercepts',
    [
      'company',
      `intercept, ${measure}`,
      'standard error',
      `low, ${share} %`,
      `high, ${share} %`,
      'less the mean of all',
      'rows',
    ],
    content.fit.intercepts.map((row) => [
      row.company,
      row.estimate,
      row.standardError,
      row.low,
      row.high,
      row.deviation,
      row.rows,
    ]),
  );
}
