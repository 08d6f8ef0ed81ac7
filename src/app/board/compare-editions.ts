import type { EditionReply } from '@contract';
import { NumberWriter, sentenceText } from '@figures';
import { asDifference, differenceKind } from '../ui/model-form';
import { labelsOf, modelText, placesText, shareText } from './edition-words';

/** One line of two editions side by side. */
export interface ComparedLine {
  readonly what: string;
  readonly left: string;
  readonly right: string;
  readonly isSame: boolean;
}

export interface ComparedEditions {
  readonly headlines: readonly [string, string];
  readonly figures: readonly ComparedLine[];
  readonly peers: readonly ComparedLine[];
  readonly specification: readonly ComparedLine[];
  readonly warnings: readonly ComparedLine[];
}

type Settings = NumberWriter['settings'];
type Lines = ReadonlyMap<string, string>;

/** Two editions set side by side, money of each in its own currency and in the unit shown. */
export function compareEditions(
  left: EditionReply,
  right: EditionReply,
  settings: Settings,
): ComparedEditions {
  const both = [left, right] as const;
  const lines = (of: (reply: EditionReply, settings: Settings) => Lines) =>
    sideBySide(of(left, settings), of(right, settings));
  return {
    headlines: both.map((reply) => headlineOf(reply, settings)) as [string, string],
    figures: lines(figuresOf),
    peers: lines(peersOf),
    specification: lines(specificationOf),
    warnings: lines(warningsOf),
  };
}

function sideBySide(left: Lines, right: Lines): readonly ComparedLine[] {
  const names = new Set([...left.keys(), ...right.keys()]);
  return [...names].map((what) => {
    const [before, after] = [left.get(what) ?? 'none', right.get(what) ?? 'none'];
    return { what, left: before, right: after, isSame: before === after };
  });
}

function headlineOf({ content }: EditionReply, { unit, locale }: Settings): string {
  const { currency, unit: panelUnit } = content.panelVersion;
  return sentenceText(content.headline, { currency, panelUnit, unit, locale });
}

function figuresOf({ edition, content }: EditionReply, settings: Settings): Lines {
  const { fit, panelVersion, scenarios } = content;
  const { currency, unit: panelUnit } = panelVersion;
  const writer = new NumberWriter({ ...settings, currency, panelUnit });
  const { form, confidence } = fit.specification;
  const difference = (value: Parameters<typeof asDifference>[0]) => {
    const written = writer.interval(asDifference(value, form), differenceKind(form), 3);
    return form === 'log' ? written : `${written} ${writer.unitLabel}`;
  };
  const labels = labelsOf(content);
  return new Map([
    ['state', edition.state],
    ['published', `${edition.publishedAt.slice(0, 10)} by ${edition.publishedBy}`],
    [
      'decided',
      edition.decision === null
        ? 'not yet'
        : `${edition.decision.at.slice(0, 10)} by ${edition.decision.by}`,
    ],
    ['standing', fit.standing === null ? 'none' : difference(fit.standing)],
    ['places', placesText(fit)],
    ...fit.slopes.map((slope, index): [string, string] => [
      `slope of ${labels[index]}`,
      writer.interval(slope, 'plain', 3),
    ]),
    ['intervals', shareText(confidence)],
    ...scenarios.flatMap(({ name, years }) =>
      years
        .slice(-1)
        .map(({ year, expected }): [string, string] => [
          `${name}, expected value`,
          `${writer.interval(expected, 'money', 3)} ${writer.unitLabel} in FY${year}`,
        ]),
    ),
  ]);
}

function peersOf({ content }: EditionReply): Lines {
  return new Map(
    content.peerGroup.peers.map(({ company, isIncluded, reason }) => [
      company,
      `${isIncluded ? 'in' : 'out'}: ${reason || 'no reason written'}`,
    ]),
  );
}

function specificationOf({ content }: EditionReply): Lines {
  const { fit, panelVersion, ownCompany } = content;
  const { specification, sample, engine } = fit;
  return new Map([
    ['own company', ownCompany],
    ['regressors', labelsOf(content).join(', ')],
    ['model', modelText(specification) || 'company levels taken out'],
    ['covariance of the slopes', specification.slopes],
    [
      'sample',
      `FY${sample.firstYear}–FY${sample.lastYear}, ${sample.observations} rows of ${sample.companies} companies`,
    ],
    ['panel', `${panelVersion.panelName} v${panelVersion.number}`],
    ['currency and unit', `${panelVersion.currency}, ${panelVersion.unit}`],
    ['peer group', `v${content.peerGroup.number}, ${content.peerGroup.peerCount} peers`],
    ['engine', engine],
  ]);
}

function warningsOf({ content }: EditionReply, { unit, locale }: Settings): Lines {
  const { currency, unit: panelUnit } = content.panelVersion;
  const lines = new Map<string, string>();
  for (const { title, sentence, isSerious } of content.warnings) {
    const what = isSerious ? `${title}, serious` : title;
    const words = sentenceText(sentence, { currency, panelUnit, unit, locale });
    const before = lines.get(what);
    lines.set(what, before === undefined ? words : `${before} ${words}`);
  }
  return lines;
}
