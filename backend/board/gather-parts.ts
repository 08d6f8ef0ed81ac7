import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import { Conflict, Invalid } from '../errors/app-error';
import { findFinishedFit, type FinishedFit } from '../fits/fit-service';
import { differencesBetween } from '../panels/panel-history-service';
import { findScenario, type Scenario } from '../scenarios/scenario-service';
import type { EditionParts, MoneyUnit } from './edition-parts';
import { findEdition, type Reader } from './edition-reader';

/** What an analyst composed. */
export interface EditionRequest {
  readonly fitId: string;
  readonly scenarios: readonly { readonly id: string; readonly version: number }[];
  readonly confidentiality: 'confidential' | 'inside-information';
  readonly comment: string;
  readonly headline: string | null;
  readonly unit: MoneyUnit;
  readonly answersEditionId: string | null;
}

/**
 * Everything that an edition is made of, as it stands now.
 *
 * @throws {NotFound}; {Conflict} `stale-version` for another version of a scenario than seen; {Invalid} for an answer to
 *   an edition that was not returned.
 */
export async function gatherParts(
  tx: WorkspaceRepositories,
  reader: Reader,
  request: EditionRequest,
  publishedAt: Date,
): Promise<EditionParts> {
  const ground = await findFinishedFit(tx, request.fitId);
  const workspace = await tx.members.workspace();
  const publisher = await tx.members.find(reader.personId);
  return {
    number: await tx.editions.nextNumber(),
    workspaceName: workspace?.name ?? '',
    publishedBy: publisher?.name ?? '',
    publishedAt,
    confidentiality: request.confidentiality,
    comment: request.comment,
    ground,
    scenarios: await scenariosSeen(tx, request),
    peerGroupsTried: (await tx.peers.list()).length,
    peerGroupsTriedOut: await tx.peerTrials.countFitted(),
    headline: request.headline,
    unit: request.unit,
    answers: await answeredEdition(tx, reader, request.answersEditionId),
    before: await signedBefore(tx, ground),
  };
}

/** What keeps an edition from being published, in words. */
export function hindrances({ ground, scenarios }: EditionParts): readonly string[] {
  const found: string[] = [];
  if (ground.result.standing === null)
    found.push(
      ground.result.standingReason ?? 'The fit has no standing of the own company to publish.',
    );
  const silent = ground.peerGroup.choices.filter(({ reason }) => reason === '');
  if (silent.length > 0)
    found.push(
      `Every company that is in or out needs a written reason. Without one: ${silent.map(({ company }) => company).join(', ')}.`,
    );
  const foreign = scenarios.filter(({ fitId }) => fitId !== ground.fit.id);
  if (foreign.length > 0)
    found.push(
      `An edition shows scenarios of its own fit alone. Of another fit: ${foreign.map(({ name }) => name).join(', ')}.`,
    );
  return found;
}

async function scenariosSeen(
  tx: WorkspaceRepositories,
  request: EditionRequest,
): Promise<readonly Scenario[]> {
  const scenarios: Scenario[] = [];
  for (const seen of request.scenarios) {
    const scenario = await findScenario(tx, seen.id);
    if (scenario.version !== seen.version)
      throw new Conflict(
        `${scenario.updatedByName} saved version ${scenario.version} of “${scenario.name}” meanwhile. Load the page again to see what the edition would freeze.`,
        'stale-version',
      );
    scenarios.push(scenario);
  }
  return scenarios;
}

async function answeredEdition(
  tx: WorkspaceRepositories,
  reader: Reader,
  id: string | null,
): Promise<EditionParts['answers']> {
  if (id === null) return null;
  const { number, state } = await findEdition(tx, reader, id);
  if (state !== 'returned')
    throw new Invalid(`Edition ${number} was not returned, so there is nothing to answer.`);
  return { id, number };
}

/** What was signed last, and what the panel has different since. */
async function signedBefore(
  tx: WorkspaceRepositories,
  ground: FinishedFit,
): Promise<EditionParts['before']> {
  const row = await tx.editions.findSigned();
  if (row === undefined) return null;
  const text = await tx.editions.content(row.id);
  const fit = await tx.fits.find(row.fitId);
  if (text === undefined || fit === undefined)
    throw new Error(`edition ${row.id} has no content or no fit`);
  const before = await tx.panels.findVersion(fit.panelVersionId);
  const isOnePanel = before?.panelId === ground.panelVersion.panelId;
  const panelDifferences = isOnePanel
    ? await differencesBetween(tx, fit.panelVersionId, ground.panelVersion.id)
    : null;
  return { row, text, panelDifferences };
}
