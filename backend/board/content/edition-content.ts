import {
  cautions,
  type EditionContent,
  EditionContentBefore,
  EditionContent as EditionContentSchema,
} from '../../contract';
import { sentenceText } from '../../figures';
import { toFitResultReply } from '../../fits/fit-replies';
import { toPanelVersionSummary } from '../../panels/panel-replies';
import { toPeerGroupReply } from '../../peers/peer-replies';
import { toReading, toYears } from '../../scenarios/scenario-replies';
import type { ComposedEdition, EditionParts, EditionWriter, ReadEdition } from '../edition-parts';
import { editionChanges } from './edition-changes';
import type { EditionFacts } from './edition-terms';
import { editionWarnings } from './edition-warnings';
import { fiveLines } from './five-lines';
import { madeHeadline } from './headline';
import { linkHeadline } from './link-headline';
import { slopesInWords } from './slopes-in-words';

/** Editions in the words of the contract: nothing shown on one is read from anywhere else later. */
export const editionWriter: EditionWriter = { compose: composeEdition, read: readEdition };

function composeEdition(parts: EditionParts): ComposedEdition {
  const facts = factsOf(parts);
  const { currency, unit: panelUnit } = facts.panelVersion;
  const made = madeHeadline(facts);
  const suggestedHeadline = sentenceText(made, { currency, panelUnit, unit: parts.unit });
  const isEdited = parts.headline !== null && parts.headline !== suggestedHeadline;
  const linked =
    parts.headline !== null && isEdited
      ? linkHeadline(parts.headline, facts, parts.unit)
      : undefined;
  const before = parts.before && {
    content: readEdition(parts.before.text).content,
    row: parts.before.row,
    panelDifferences: parts.before.panelDifferences,
  };
  const content: EditionContent = {
    schema: 2,
    ...facts,
    unit: parts.unit,
    headline: linked?.sentence ?? made,
    isHeadlineEdited: isEdited,
    ...sentencesOf(facts),
    changes: before && editionChanges(facts, before),
    answers: parts.answers,
  };
  return { content, suggestedHeadline, headlineFaults: linked?.problems ?? [] };
}

/** What was frozen, as it is shown: of an edition of schema 1 the sentences are made here, from its frozen figures. */
export function readEdition(text: string): ReadEdition & { readonly content: EditionContent } {
  const stored: unknown = JSON.parse(text);
  const content = isOfSchemaOne(stored)
    ? upgraded(EditionContentBefore.parse(stored))
    : EditionContentSchema.parse(stored);
  return { content, warnings: content.warnings };
}

function isOfSchemaOne(stored: unknown): boolean {
  return typeof stored === 'object' && stored !== null && 'schema' in stored && stored.schema === 1;
}

function upgraded({ schema, ...facts }: EditionContentBefore): EditionContent {
  return {
    schema,
    ...facts,
    unit: facts.panelVersion.unit,
    headline: madeHeadline(facts),
    isHeadlineEdited: false,
    ...sentencesOf(facts),
    changes: null,
    answers: null,
  };
}

function sentencesOf(
  facts: EditionFacts,
): Pick<EditionContent, 'evidence' | 'slopesInWords' | 'warnings'> {
  return {
    evidence: [...fiveLines(facts)],
    slopesInWords: [...slopesInWords(facts)],
    warnings: [...editionWarnings(facts)],
  };
}

function factsOf(parts: EditionParts): EditionFacts {
  const { fit, result, panelVersion, peerGroup } = parts.ground;
  return {
    number: parts.number,
    workspaceName: parts.workspaceName,
    ownCompany: peerGroup.ownCompany,
    publishedBy: parts.publishedBy,
    publishedAt: parts.publishedAt.toISOString(),
    confidentiality: parts.confidentiality,
    comment: parts.comment,
    fitId: fit.id,
    fitCreatedAt: fit.createdAt.toISOString(),
    fitCreatedBy: fit.createdByName,
    panelVersion: toPanelVersionSummary(panelVersion),
    regressorRoles: fit.specification.regressors.map(
      (name) => panelVersion.columns.find((column) => column.name === name)?.role ?? 'other',
    ),
    peerGroup: toPeerGroupReply(peerGroup),
    fit: toFitResultReply(result),
    scenarios: parts.scenarios.map((scenario) => ({
      id: scenario.id,
      name: scenario.name,
      note: scenario.note,
      version: scenario.version,
      ...toReading(scenario),
      years: toYears(scenario.years),
    })),
    peerGroupsTried: parts.peerGroupsTried,
    peerGroupsTriedOut: parts.peerGroupsTriedOut,
    cautions: [...cautions],
  };
}
