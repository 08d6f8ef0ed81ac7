import * as z from 'zod';
import { FitResult, IntervalEstimate, ModelForm } from './fits';
import { CellDifference, ColumnRole, NewerPanelVersion, PanelVersionSummary, Unit } from './panels';
import { PeerGroupReply } from './peers';
import { Plan, PlanOutlook, PlanUncertainty, RegressorPlan, ScenarioYear } from './scenarios';

export const Confidentiality = z.enum(['confidential', 'inside-information']);
export type Confidentiality = z.infer<typeof Confidentiality>;

/** What an analyst composes: the choices of an edition, before it has a number. */
export const ComposeEdition = z.strictObject({
  fitId: z.uuid(),
  /** With the versions that the publisher saw: one stored meanwhile is a conflict. The first one leads. */
  scenarios: z.array(z.strictObject({ id: z.uuid(), version: z.number().int() })).max(4),
  confidentiality: Confidentiality,
  /** What the publisher wants the CFO to know. */
  comment: z.string().trim().max(4000),
  /** The headline as edited, its amounts written in `unit`; null for the one made from the figures. */
  headline: z.string().trim().min(1, 'expected a sentence').max(600).nullable().default(null),
  /** The unit that the publisher sees money in. */
  unit: Unit.default('millions'),
  /** A returned edition that this one answers: its thread goes on here. */
  answersEditionId: z.uuid().nullable().default(null),
});
export type ComposeEdition = z.infer<typeof ComposeEdition>;

export const PublishEdition = ComposeEdition;
export type PublishEdition = ComposeEdition;

export const ReturnEdition = z.strictObject({
  comment: z.string().trim().min(1, 'expected a comment that says what to change').max(4000),
});
export type ReturnEdition = z.infer<typeof ReturnEdition>;

/** Signing is given the password again. */
export const SignEdition = z.strictObject({ password: z.string().min(1).max(128) });
export type SignEdition = z.infer<typeof SignEdition>;

/** As it was when it was frozen: editions published before versions said what made them do not say it. */
const FrozenPanelVersion = PanelVersionSummary.partial({
  parentId: true,
  origin: true,
  restoredNumber: true,
});

/**
 * A number within a sentence that is tied to a figure, so that it can be written in any unit and never parts from it.
 * Written as `value` (its size where `isSize`) in the unit asked for, with `digits` after the point where the unit is
 * the panel's.
 */
export const SentenceFigure = z.object({
  /** Key of the figure's lineage, as `standing`, `slope.0`, `expected.2026`; null where it has none (a count, a year). */
  figure: z.string().nullable(),
  /** `money` follows the unit, `percent` is a share (0.62 for 62 %), `plain` and `count` are written as they are. */
  kind: z.enum(['money', 'percent', 'plain', 'count']),
  /** In the panel's unit. */
  value: z.number(),
  digits: z.number().int(),
  /** Written without its sign, where words say above or below. */
  isSize: z.boolean(),
});
export type SentenceFigure = z.infer<typeof SentenceFigure>;

/** Words and figures in the order they are read; `unit` stands for the currency with the unit, as `EUR m`. */
export const Sentence = z.array(
  z.union([
    z.object({ text: z.string() }),
    z.object({ unit: z.literal(true) }),
    z.object({ own: z.string() }),
    SentenceFigure,
  ]),
);
export type Sentence = z.infer<typeof Sentence>;

export const EditionLine = z.object({
  kind: z.enum(['fine', 'caution']),
  sentence: Sentence,
  /** The figure whose lineage the line leads to. */
  figure: z.string().nullable(),
});
export type EditionLine = z.infer<typeof EditionLine>;

/**
 * What a reader should know before relying on an edition. Whoever signs has to have opened each serious one; `id` names
 * it within the edition.
 */
export const EditionWarning = z.object({
  id: z.string(),
  code: z.enum([
    'outside-familiar-range',
    'few-companies',
    'dominated',
    'stale-data',
    'sign-change',
    'many-groups-tried',
    'fit',
  ]),
  isSerious: z.boolean(),
  title: z.string(),
  sentence: Sentence,
});
export type EditionWarning = z.infer<typeof EditionWarning>;

/** What changed since the edition signed last. */
export const EditionChanges = z.object({
  since: z.object({ id: z.uuid(), number: z.number().int(), signedAt: z.iso.datetime() }),
  figures: z.array(
    z.object({
      label: z.string(),
      figure: z.string().nullable(),
      kind: z.enum(['money', 'percent', 'plain', 'count', 'text']),
      before: IntervalEstimate.nullable(),
      after: IntervalEstimate.nullable(),
      /** Of what is no estimate, as a rank set. */
      beforeText: z.string().nullable(),
      afterText: z.string().nullable(),
    }),
  ),
  peersAdded: z.array(z.string()),
  peersRemoved: z.array(z.string()),
  /** Null where the two stand on panels that cannot be compared. */
  panelCells: z
    .object({
      addedRows: z.number().int(),
      removedRows: z.number().int(),
      changedCells: z.number().int(),
      /** Those of the own company and the peers, at most 20. */
      listed: z.array(CellDifference),
    })
    .nullable(),
  specification: z.array(z.object({ what: z.string(), before: z.string(), after: z.string() })),
});
export type EditionChanges = z.infer<typeof EditionChanges>;

/** A scenario as an edition froze it; what is optional is missing in editions of schema 1. */
export const FrozenScenario = z.object({
  id: z.uuid(),
  name: z.string(),
  note: z.string(),
  version: z.number().int(),
  plan: Plan,
  years: z.array(ScenarioYear),
  outlook: PlanOutlook.optional(),
  rules: z.array(RegressorPlan).optional(),
  uncertainty: PlanUncertainty.nullable().optional(),
});
export type FrozenScenario = z.infer<typeof FrozenScenario>;

const frozen = {
  number: z.number().int(),
  workspaceName: z.string(),
  ownCompany: z.string(),
  publishedBy: z.string(),
  publishedAt: z.iso.datetime(),
  confidentiality: Confidentiality,
  comment: z.string(),
  fitId: z.uuid(),
  fitCreatedAt: z.iso.datetime(),
  fitCreatedBy: z.string(),
  panelVersion: FrozenPanelVersion,
  /** What each regressor of the fit is, in its order. */
  regressorRoles: z.array(ColumnRole),
  peerGroup: PeerGroupReply,
  fit: FitResult,
  scenarios: z.array(FrozenScenario),
  /** Peer group versions saved in the workspace up to the publication. */
  peerGroupsTried: z.number().int(),
  /** Other groups whose figures were looked at before or without saving them; missing in editions of schema 1. */
  peerGroupsTriedOut: z.number().int().optional(),
  cautions: z.array(z.string()),
};

/** Editions published before sentences were frozen with the figures. They stay readable: see `EditionContent`. */
export const EditionContentBefore = z.object({ schema: z.literal(1), ...frozen });
export type EditionContentBefore = z.infer<typeof EditionContentBefore>;

/**
 * All that an edition shows; what is frozen and hashed is this with schema 2. Of an edition of schema 1 the server makes
 * the sentences when it is read.
 */
export const EditionContent = z.object({
  schema: z.union([z.literal(1), z.literal(2)]),
  ...frozen,
  /** The unit that the publisher saw money in. */
  unit: Unit,
  headline: Sentence,
  isHeadlineEdited: z.boolean(),
  /** Evidence in five lines. */
  evidence: z.array(EditionLine),
  /** What 1 more of each regressor goes with. */
  slopesInWords: z.array(EditionLine),
  warnings: z.array(EditionWarning),
  /** Null for the first that is signed. */
  changes: EditionChanges.nullable(),
  /** The returned edition that this one answers. */
  answers: z.object({ id: z.uuid(), number: z.number().int() }).nullable(),
});
export type EditionContent = z.infer<typeof EditionContent>;

/** A place in an edited headline that says what no figure says. Offsets count UTF-16 units. */
export const HeadlineProblem = z.object({
  start: z.number().int(),
  end: z.number().int(),
  found: z.string(),
  detail: z.string(),
});
export type HeadlineProblem = z.infer<typeof HeadlineProblem>;

/** The edition as publishing would freeze it now. */
export const EditionPreviewReply = z.object({
  content: EditionContent,
  /** The headline made from the figures, in the unit asked for. */
  suggestedHeadline: z.string(),
  headlineProblems: z.array(HeadlineProblem),
  /** What keeps it from being published, in words. */
  hindrances: z.array(z.string()),
});
export type EditionPreviewReply = z.infer<typeof EditionPreviewReply>;

/** A part of an edition that can be spoken of. */
export const EditionBlock = z.enum([
  'headline',
  'standing',
  'path',
  'slopes',
  'scenarios',
  'evidence',
  'warnings',
  'peers',
  'changes',
  'edition',
]);
export type EditionBlock = z.infer<typeof EditionBlock>;

export const WriteComment = z.strictObject({
  block: EditionBlock,
  text: z.string().trim().min(1, 'expected a comment').max(4000),
});
export type WriteComment = z.infer<typeof WriteComment>;

export const EditionComment = z.object({
  id: z.uuid(),
  /** The edition it was written on: one that this one answers, or this one. */
  editionId: z.uuid(),
  editionNumber: z.number().int(),
  block: EditionBlock,
  text: z.string(),
  by: z.string(),
  at: z.iso.datetime(),
});
export type EditionComment = z.infer<typeof EditionComment>;

/** Who looked at an edition or took it out; for analysts and CFOs. */
export const EditionAccess = z.object({
  by: z.string(),
  kind: z.enum(['viewed', 'exported']),
  /** Of an export: `pdf`, `xlsx`. */
  format: z.string().nullable(),
  at: z.iso.datetime(),
});
export type EditionAccess = z.infer<typeof EditionAccess>;

export const EditionState = z.enum(['waiting', 'signed', 'returned', 'superseded']);
export type EditionState = z.infer<typeof EditionState>;

export const EditionSummary = z.object({
  id: z.uuid(),
  number: z.number().int(),
  state: EditionState,
  publishedBy: z.string(),
  publishedAt: z.iso.datetime(),
  sha256: z.string(),
  confidentiality: Confidentiality,
  decision: z
    .object({
      kind: z.enum(['signed', 'returned']),
      by: z.string(),
      at: z.iso.datetime(),
      comment: z.string(),
    })
    .nullable(),
  supersededBy: z.number().int().nullable(),
});
export type EditionSummary = z.infer<typeof EditionSummary>;

/** Whether an edition's stored content still has the hashes recorded when it was published and signed. */
export const EditionVerification = z.object({
  isUnchanged: z.boolean(),
  number: z.number().int(),
  /** Of the content as it is stored now. */
  computedSha256: z.string(),
  storedSha256: z.string(),
  /** As the record of activity has them; null where it has no such entry. */
  publishedSha256: z.string().nullable(),
  signedSha256: z.string().nullable(),
  checkedAt: z.iso.datetime(),
  /** What was found, in words. */
  detail: z.string(),
});
export type EditionVerification = z.infer<typeof EditionVerification>;

/** The standing over the editions that were signed, oldest first. */
export const EditionHistoryReply = z.object({
  editions: z.array(
    z.object({
      id: z.uuid(),
      number: z.number().int(),
      state: z.enum(['signed', 'superseded']),
      signedAt: z.iso.datetime(),
      signedBy: z.string(),
      ownCompany: z.string(),
      currency: z.string(),
      unit: Unit,
      form: ModelForm,
      confidence: z.number(),
      standing: IntervalEstimate.nullable(),
      rankSet: z.tuple([z.number().int(), z.number().int()]).nullable(),
      companies: z.number().int(),
      lastYear: z.number().int(),
      panelVersionNumber: z.number().int(),
      peerGroupNumber: z.number().int(),
    }),
  ),
});
export type EditionHistoryReply = z.infer<typeof EditionHistoryReply>;

/** Query of an export. */
export const EditionExport = z.strictObject({
  paper: z.enum(['a4', 'letter']).default('a4'),
  unit: Unit.optional(),
});
export type EditionExport = z.infer<typeof EditionExport>;

export const EditionsReply = z.object({ editions: z.array(EditionSummary) });
export type EditionsReply = z.infer<typeof EditionsReply>;

export const EditionReply = z.object({
  edition: EditionSummary,
  content: EditionContent,
  /** Never part of what was frozen. */
  newerPanelVersion: NewerPanelVersion,
  /** Whether the person who asks may sign it, and if not, why. */
  maySign: z.boolean(),
  /** One that a later signed edition overtook can still be returned. */
  mayReturn: z.boolean(),
  whyNot: z.string().nullable(),
  /** Warnings that the person who asks has opened, by `id`. */
  openedWarnings: z.array(z.string()),
  /** Of this edition and those it answers, oldest first. */
  comments: z.array(EditionComment),
  /** Newest first; null for those it is not for. */
  access: z.array(EditionAccess).nullable(),
});
export type EditionReply = z.infer<typeof EditionReply>;
