import type { PeerTrialReply, TrialFigures, TrialOutcome } from '@contract';
import { type Bounded, asDifference } from '../../ui/model-form';
import { regressorWord } from './regressor-word';

/** A slope of one group, beside that of the group as chosen. */
export interface SlopeChange {
  readonly name: string;
  readonly after: Bounded;
  /** Null where the group as chosen has no figures. */
  readonly change: number | null;
}

/** What one choice would change; figures are as they are shown, in the panel's unit or of logs as shares. */
export interface TrialChange {
  readonly company: string;
  /** Why there are no figures; empty where there are. */
  readonly why: string;
  readonly standing: Bounded | null;
  readonly standingReason: string;
  /** Null where one of the two standings is not there. */
  readonly change: number | null;
  readonly places: Places | null;
  readonly slopes: readonly SlopeChange[];
  /** What a reader should notice, in words. */
  readonly marks: readonly string[];
}

/** Places that the data cannot rule out, of so many companies. */
export interface Places {
  readonly first: number;
  readonly last: number;
  readonly of: number;
}

/** The group as it was chosen. */
export interface TrialBase {
  readonly figures: TrialFigures | null;
  readonly why: string;
  readonly standing: Bounded | null;
  readonly places: Places | null;
}

export interface TrialChanges {
  readonly base: TrialBase;
  readonly without: readonly TrialChange[];
  readonly taking: readonly TrialChange[];
}

/** What each choice changes against the group as chosen. */
export function trialChanges(trial: PeerTrialReply): TrialChanges {
  const base = baseOf(trial);
  const changes = (list: PeerTrialReply['without']): readonly TrialChange[] =>
    list.map(({ company, outcome }) => changeOf({ company, outcome }, base, trial));
  return { base, without: changes(trial.without), taking: changes(trial.taking) };
}

/** Money, or the share that a difference of logs is. */
type Form = PeerTrialReply['asked']['specification']['form'];

function baseOf(trial: PeerTrialReply): TrialBase {
  const figures = figuresOf(trial.chosen);
  return {
    figures,
    why: figures === null ? whyNone(trial.chosen, trial) : '',
    standing: standingOf(figures, trial.asked.specification.form),
    places: placesOf(figures),
  };
}

function changeOf(
  { company, outcome }: PeerTrialReply['without'][number],
  base: TrialBase,
  trial: PeerTrialReply,
): TrialChange {
  const figures = figuresOf(outcome);
  const standing = standingOf(figures, trial.asked.specification.form);
  const places = placesOf(figures);
  const slopes = (figures?.slopes ?? []).map((slope, index) => ({
    name: slope.name,
    after: slope,
    change: base.figures === null ? null : slope.estimate - base.figures.slopes[index].estimate,
  }));
  return {
    company,
    why: figures === null ? whyNone(outcome, trial) : '',
    standing,
    standingReason: figures?.standingReason ?? '',
    change:
      standing === null || base.standing === null
        ? null
        : standing.estimate - base.standing.estimate,
    places,
    slopes,
    marks: [
      ...signMarks(slopes, base),
      ...zeroMarks(standing, base.standing),
      ...placeMarks(places, base.places),
    ],
  };
}

/** A slope that goes up in one group and down in the other. */
function signMarks(slopes: readonly SlopeChange[], { figures }: TrialBase): readonly string[] {
  return slopes.flatMap(({ name, after }, index) => {
    const before = figures?.slopes[index].estimate ?? 0;
    return before * after.estimate < 0
      ? [`slope of ${regressorWord(index, name)} changes sign`]
      : [];
  });
}

function zeroMarks(after: Bounded | null, before: Bounded | null): readonly string[] {
  const [now, then] = [holdsZero(after), holdsZero(before)];
  if (now === null || then === null || now === then) return [];
  return [
    now
      ? 'interval of the standing starts to hold zero'
      : 'interval of the standing no longer holds zero',
  ];
}

/** That there is one company fewer, or more, alone moves an end by one place: nobody has to notice that. */
function placeMarks(after: Places | null, before: Places | null): readonly string[] {
  if (after === null || before === null) return [];
  const oneCompany = after.of - before.of;
  const isExplained = (moved: number): boolean => moved === 0 || moved === oneCompany;
  return isExplained(after.first - before.first) && isExplained(after.last - before.last)
    ? []
    : ['places move'];
}

/** Null where there is no interval. */
function holdsZero(standing: Bounded | null): boolean | null {
  const { low, high } = standing ?? { low: null, high: null };
  return low === null || high === null ? null : low <= 0 && high >= 0;
}

function figuresOf(outcome: TrialOutcome | null): TrialFigures | null {
  return outcome?.kind === 'fitted' ? outcome.figures : null;
}

function standingOf(figures: TrialFigures | null, form: Form): Bounded | null {
  const standing = figures?.standing ?? null;
  return standing === null ? null : asDifference(standing, form);
}

function placesOf(figures: TrialFigures | null): Places | null {
  if (figures?.rankSet == null) return null;
  const [first, last] = figures.rankSet;
  return { first, last, of: figures.ranked };
}

/** A trial that ended will bring no more. */
function whyNone(outcome: TrialOutcome | null, { state }: PeerTrialReply): string {
  if (outcome?.kind === 'refused')
    return [
      outcome.detail,
      ...(outcome.subjects.length > 0 ? [`(${outcome.subjects.join(', ')})`] : []),
    ].join(' ');
  return state === 'queued' || state === 'running' ? 'not computed yet' : 'not computed';
}
