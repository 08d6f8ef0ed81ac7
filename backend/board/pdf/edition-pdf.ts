import type { EditionContent, EditionSummary } from '../../contract';
import { NumberWriter, sentenceText } from '../../figures';
import type { MoneyUnit } from '../edition-parts';
import { labelsOf } from '../content/edition-terms';
import { drawExpectedPath, drawGapPath, drawStanding } from './charts';
import { levelsData, pathData, shownGaps, shownStanding } from './chart-data';
import { PageFlow, type Paper } from './page-flow';
import { copper, hairline, ink, ochre, plum, softInk } from './print-colours';
import {
  changeLines,
  confidentialityWords,
  factsLine,
  lineageLine,
  specificationWords,
} from './sheet-words';
import { drawTable, type TableColumn } from './table';

export interface PrintedEdition {
  readonly edition: EditionSummary;
  readonly content: EditionContent;
  /** Oldest first. */
  readonly comments: readonly {
    readonly editionNumber: number;
    readonly block: string;
    readonly text: string;
    readonly by: string;
    readonly at: string;
  }[];
}

export interface PrintSetting {
  readonly paper: Paper;
  readonly unit: MoneyUnit;
  /** Who takes it out, and when. */
  readonly printedBy: string;
  readonly printedAt: Date;
}

/**
 * An edition on paper: the same sentences, figures and charts as on the screen, page numbers, its state, hash, cautions
 * and confidentiality on every page. Figures are in the unit asked for.
 *
 * @returns the bytes of a PDF with embedded fonts and vector charts.
 */
export function editionPdf(printed: PrintedEdition, setting: PrintSetting): Promise<Buffer> {
  const { edition, content } = printed;
  const { currency, unit: panelUnit } = content.panelVersion;
  const numbers = new NumberWriter({
    currency,
    panelUnit,
    unit: setting.unit,
    negatives: 'minus',
    locale: 'en',
  });
  const flow = new PageFlow(setting.paper, {
    Title: `Edition ${edition.number}, ${content.ownCompany}`,
    Author: content.publishedBy,
    Subject: `${content.workspaceName}, SHA-256 ${edition.sha256}`,
    Creator: 'Kinvale',
    CreationDate: setting.printedAt,
  });
  const sheet = new Sheet(flow, content, numbers, setting.unit);
  sheet.top(edition);
  sheet.standing();
  sheet.path();
  sheet.scenarios();
  sheet.evidence();
  sheet.warnings();
  sheet.changes();
  sheet.peers();
  sheet.comments(printed);
  sheet.cautions();
  sheet.signature(edition);
  sheet.origin(edition);
  return flow.finish((page, pages) => {
    frame(flow, printed, setting, page, pages);
  });
}

class Sheet {
  constructor(
    private readonly flow: PageFlow,
    private readonly content: EditionContent,
    private readonly numbers: NumberWriter,
    private readonly unit: MoneyUnit,
  ) {}

  top(edition: EditionSummary): void {
    const { content, flow } = this;
    flow.paragraph(
      `Edition ${edition.number} · published ${day(content.publishedAt)} by ${content.publishedBy} · ${content.workspaceName}`,
      { size: 8.5, colour: softInk },
    );
    flow.space(6);
    flow.paragraph(this.#sentence(content.headline), { size: 17, face: 'strong' });
    flow.space(4);
    flow.paragraph(factsLine(content, this.numbers), { colour: softInk });
    if (content.comment !== '') {
      flow.space(6);
      flow.paragraph(`From ${content.publishedBy}: ${content.comment}`);
    }
  }

  standing(): void {
    const { content, numbers, flow } = this;
    this.#heading(
      `Company levels, ${labelsOf(content).join(' and ')} taken out`,
      this.#unitCaption(),
    );
    const { kind, data } = levelsData(content);
    drawStanding(flow, data, { numbers, kind });
    const gaps = shownGaps(content);
    if (gaps === null) return;
    const { kind: gapKind, standing } = shownStanding(content);
    this.#heading('Gap to the peers, year by year', this.#unitCaption());
    drawGapPath(flow, gaps, standing, { numbers, kind: gapKind });
  }

  path(): void {
    const data = pathData(this.content);
    if (data === null) return;
    this.#heading(
      'Actual and expected market value',
      `${this.#unitCaption()}${data.plans.length > 0 ? ' · plans to the right of the hairline, the base holds the last observed values' : ''}`,
    );
    drawExpectedPath(this.flow, data, { numbers: this.numbers, kind: 'money' });
    this.flow.space(4);
    for (const { sentence } of this.content.slopesInWords)
      this.flow.paragraph(this.#sentence(sentence));
  }

  scenarios(): void {
    const { content, numbers, flow } = this;
    if (content.scenarios.length === 0) return;
    this.#heading('Scenarios by year', this.#unitCaption());
    const labels = labelsOf(content);
    for (const scenario of content.scenarios) {
      flow.need(60);
      flow.paragraph(`${scenario.name}, version ${scenario.version}`, {
        face: 'strong',
        colour: plum,
      });
      if (scenario.note !== '') flow.paragraph(scenario.note, { colour: softInk });
      const isLog = content.fit.specification.form === 'log';
      const columns: TableColumn[] = [
        { label: 'year', align: 'left' },
        ...labels.map((label): TableColumn => ({ label, align: 'right' })),
        { label: 'expected value', align: 'right' },
        { label: 'against the base', align: 'right' },
        {
          label: `band of the market value, ${Math.round((scenario.outlook?.bandConfidence ?? 0.8) * 100)} %`,
          align: 'right',
        },
        { label: 'familiar range', align: 'left' },
      ];
      const rows = scenario.years.map((year, index) => [
        `FY${year.year}`,
        ...scenario.plan[index].values.map((value, k) =>
          numbers.figure(value, k < 2 ? 'money' : 'plain'),
        ),
        numbers.interval(year.expected),
        isLog
          ? numbers.interval(
              {
                estimate: Math.expm1(year.difference.estimate),
                low: year.difference.low === null ? null : Math.expm1(year.difference.low),
                high: year.difference.high === null ? null : Math.expm1(year.difference.high),
              },
              'percent',
            )
          : numbers.interval(year.difference),
        year.band?.low == null || year.band.high === null
          ? 'none'
          : numbers.bounds({
              estimate: year.expected.estimate,
              low: year.band.low,
              high: year.band.high,
            }),
        year.familiar,
      ]);
      drawTable(flow, columns, rows);
      flow.space(6);
    }
  }

  evidence(): void {
    this.#heading('Evidence in five lines');
    for (const { kind, sentence } of this.content.evidence)
      this.#remark(kind, this.#sentence(sentence));
  }

  warnings(): void {
    const { warnings } = this.content;
    if (warnings.length === 0) return;
    this.#heading(warnings.length === 1 ? '1 warning' : `${warnings.length} warnings`);
    for (const { title, sentence } of warnings)
      this.#remark('caution', `${title}. ${this.#sentence(sentence)}`);
  }

  changes(): void {
    const { changes } = this.content;
    if (changes === null) return;
    this.#heading(
      `What changed since edition ${changes.since.number}, signed ${day(changes.since.signedAt)}`,
    );
    for (const line of changeLines(this.content, changes, this.numbers)) this.flow.paragraph(line);
  }

  peers(): void {
    const { peerGroup, ownCompany } = this.content;
    this.#heading('Peers and why', `Own company: ${ownCompany}`);
    const columns: TableColumn[] = [
      { label: 'company', align: 'left' },
      { label: '', align: 'left' },
      { label: 'reason', align: 'left', isWide: true },
    ];
    const peers = [...peerGroup.peers].sort((a, b) => Number(b.isIncluded) - Number(a.isIncluded));
    drawTable(
      this.flow,
      columns,
      peers.map(({ company, isIncluded, reason }) => [company, isIncluded ? 'in' : 'out', reason]),
    );
  }

  comments({ comments }: PrintedEdition): void {
    if (comments.length === 0) return;
    this.#heading('Comments');
    for (const { by, at, block, text, editionNumber } of comments)
      this.flow.paragraph(`${by}, ${day(at)}, edition ${editionNumber}, on ${block}: ${text}`);
  }

  cautions(): void {
    this.#heading('Cautions');
    for (const caution of this.content.cautions) this.flow.paragraph(`– ${caution}`);
  }

  signature({ decision, state, publishedBy }: EditionSummary): void {
    this.#heading('Signature');
    if (decision === null) {
      this.flow.paragraph('Draft: it waits for a signature. Whoever published it cannot sign it.');
      return;
    }
    const verb = decision.kind === 'signed' ? 'Signed' : 'Returned';
    this.flow.paragraph(
      `${verb} by ${decision.by}, ${minute(decision.at)}; published by ${publishedBy}.${state === 'superseded' ? ' A later edition supersedes it.' : ''}`,
      { face: 'strong' },
    );
    if (decision.comment !== '') this.flow.paragraph(decision.comment);
  }

  origin({ sha256 }: EditionSummary): void {
    this.#heading('Where the figures come from');
    this.flow.paragraph(lineageLine(this.content), { size: 8.5 });
    this.flow.paragraph(specificationWords(this.content), { size: 8.5 });
    this.flow.paragraph(`SHA-256 of the frozen content: ${sha256}`, { size: 8, face: 'figures' });
  }

  #heading(title: string, caption = ''): void {
    this.flow.space(14);
    this.flow.need(64);
    this.flow.rule(hairline);
    this.flow.space(8);
    this.flow.paragraph(title, { size: 11.5, face: 'strong' });
    if (caption !== '') this.flow.paragraph(caption, { size: 8.5, colour: softInk });
    this.flow.space(4);
  }

  /** Its mark is a shape, so that grey paper tells it. */
  #remark(kind: 'fine' | 'caution', text: string): void {
    const { flow } = this;
    flow.paragraph(text, { indent: 16 }, (top) => {
      const y = top + 7;
      if (kind === 'fine')
        flow.document
          .circle(flow.left + 4, y, 2.6)
          .lineWidth(1)
          .undash()
          .strokeColor(softInk)
          .stroke();
      else
        flow.document
          .polygon([flow.left + 4, y - 3.6], [flow.left + 8, y + 3], [flow.left, y + 3])
          .fill(ochre);
    });
    flow.space(2);
  }

  #unitCaption(): string {
    const { confidence } = this.content.fit.specification;
    return `${this.numbers.unitLabel} · ${Math.round(confidence * 1000) / 10} % intervals`;
  }

  #sentence(sentence: EditionContent['headline']): string {
    const { currency, unit: panelUnit } = this.content.panelVersion;
    return sentenceText(sentence, { currency, panelUnit, unit: this.unit });
  }
}

/** What stands on every page: whose edition it is, its state, confidentiality, hash, page and who took it out. */
function frame(
  flow: PageFlow,
  { edition, content }: PrintedEdition,
  { printedBy, printedAt }: PrintSetting,
  page: number,
  pages: number,
): void {
  const isSigned = edition.state === 'signed' || edition.state === 'superseded';
  const state = isSigned ? 'SIGNED' : edition.state === 'returned' ? 'DRAFT, RETURNED' : 'DRAFT';
  const { left, right, document } = flow;
  const head = 44;
  flow.line(`${content.ownCompany} · edition ${edition.number}`, left, head, {
    size: 8.5,
    colour: copper,
    face: 'strong',
  });
  flow.line(state, right, head, { size: 8.5, face: 'strong', colour: ink, anchor: 'end' });
  document
    .moveTo(left, head + 6)
    .lineTo(right, head + 6)
    .lineWidth(0.5)
    .undash()
    .strokeColor(hairline)
    .stroke();
  const foot = document.page.height - 50;
  document
    .moveTo(left, foot - 12)
    .lineTo(right, foot - 12)
    .strokeColor(hairline)
    .stroke();
  flow.line(confidentialityWords[content.confidentiality], left, foot, { size: 8, face: 'strong' });
  flow.line(`page ${page} of ${pages}`, right, foot, { size: 8, anchor: 'end' });
  flow.line(
    'Statistical associations, not causes. No appraisal, fairness opinion, investment advice or share price forecast.',
    left,
    foot + 11,
    { size: 7.5, colour: softInk },
  );
  flow.line(
    `SHA-256 ${edition.sha256.slice(0, 16)}… · taken out by ${printedBy}, ${minute(printedAt.toISOString())}`,
    left,
    foot + 21,
    { size: 7.5, colour: softInk },
  );
  if (!isSigned) watermark(flow);
}

function watermark(flow: PageFlow): void {
  const { document } = flow;
  const { width, height } = document.page;
  document.save();
  document.rotate(-38, { origin: [width / 2, height / 2] }).opacity(0.07);
  flow.line('DRAFT', width / 2, height / 2 + 45, { size: 130, face: 'strong', anchor: 'middle' });
  document.restore();
}

function day(iso: string): string {
  return iso.slice(0, 10);
}

function minute(iso: string): string {
  return `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;
}
