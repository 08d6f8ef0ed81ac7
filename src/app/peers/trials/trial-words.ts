import type { PeerTrialReply } from '@contract';
import { covarianceShort } from '../../ui/covariance-words';
import { differenceKind, differenceUnit, modelNotes } from '../../ui/model-form';
import type { NumberFormat } from '../../ui/number-format';
import { confidenceText, counted, lagText, listed, shortHash } from '../../ui/phrases';
import { regressorWord } from './regressor-word';
import type { TriedGroup } from './trial-question';
import type { Places, TrialChange, TrialChanges } from './trial-changes';

/** The section's finding: who moves the standing most; before there are figures, what they will say. */
export function trialFinding({ without, taking }: TrialChanges): string {
  const most = largest(without);
  const next = largest(taking);
  if (most === null && next === null) return 'What each choice would change';
  const parts = [
    ...(most === null ? [] : [`leaving ${most.company} out`]),
    ...(next === null ? [] : [`taking ${next.company} in`]),
  ];
  return `The standing moves most by ${listed(parts)}`;
}

function largest(changes: readonly TrialChange[]): TrialChange | null {
  return changes
    .filter(({ change }) => change !== null)
    .reduce<TrialChange | null>(
      (most, each) =>
        most === null || Math.abs(each.change ?? 0) > Math.abs(most.change ?? 0) ? each : most,
      null,
    );
}

/** What the figures are of: unit, confidence, model, panel and the digest that saving and fitting would give. */
export function trialCaption(
  { asked, chosen }: PeerTrialReply,
  source: string,
  numbers: NumberFormat,
): string {
  const { form, lag, slopes, confidence, effects, furtherRegressors } = asked.specification;
  const regressors = ['capex', 'book equity', ...furtherRegressors];
  return [
    `Standing in ${differenceUnit(form, numbers)}`,
    `${confidenceText(confidence)} intervals, ${covarianceShort(slopes)}`,
    [`market value on ${listed(regressors)}${lagText(lag)}`, ...modelNotes({ effects, form })].join(
      ', ',
    ),
    source,
    ...(chosen?.kind === 'fitted' ? [`as fit ${shortHash(chosen.figures.hash)} would be`] : []),
  ]
    .filter((part) => part !== '')
    .join(' · ');
}

/** The group as chosen, in one line: standing, places, slopes; or why there is none. */
export function baseText(
  { asked }: PeerTrialReply,
  { base }: TrialChanges,
  numbers: NumberFormat,
): string {
  if (base.figures === null) return `As chosen: ${base.why}`;
  const { form } = asked.specification;
  const standing =
    base.standing === null
      ? (base.figures.standingReason ?? 'no standing')
      : `standing ${numbers.interval(base.standing, differenceKind(form))}`;
  const slopes = base.figures.slopes.map(
    ({ name, ...slope }, index) =>
      `slope of ${regressorWord(index, name)} ${numbers.interval(slope, 'plain')}`,
  );
  const { places } = base;
  const range = places === null ? [] : [`places ${placesText(places)}`];
  return `As chosen: ${[standing, ...range, ...slopes].join('; ')}`;
}

export function placesText({ first, last, of }: Places): string {
  return `${first === last ? first : `${first} to ${last}`} of ${of}`;
}

/** What is said of the whole where it is not simply there; empty where it is. */
export function trialState(
  trial: PeerTrialReply,
  overtakenBy: 'choice' | 'nearest' | null,
): string {
  if (trial.state === 'failed') return trial.failure ?? 'This could not be computed.';
  const ended =
    trial.state === 'cancelled' ? 'Cancelled: what was computed until then is shown.' : '';
  const overtaken =
    overtakenBy === 'choice'
      ? 'These figures are of an earlier choice.'
      : overtakenBy === 'nearest'
        ? 'Other companies are the nearest candidates now.'
        : '';
  return [ended, overtaken].filter((part) => part !== '').join(' ');
}

/** Which groups are fitted, in words: as it is, without each member, with each of the nearest candidates. */
export function groupsFitted({
  peers,
  candidates,
}: Pick<TriedGroup, 'peers' | 'candidates'>): string {
  const out = peers.length === 1 ? 'its only member' : `each of its ${peers.length} members`;
  const near =
    candidates.length === 1
      ? 'the nearest candidate'
      : `each of the nearest ${candidates.length} candidates`;
  return candidates.length === 0
    ? `as it is, and without ${out}`
    : `as it is, without ${out}, and with ${near}`;
}

/** Says where not every member was left out; empty where each was. */
export function notTriedText({ asked, without }: PeerTrialReply): string {
  if (without.length === asked.peers.length) return '';
  const all = counted(asked.peers.length, 'member');
  return `Of ${all} the nearest ${without.length} are left out in turn; all of them are in the group.`;
}
