import { type ComposeEdition, Confidentiality, type ScenarioReply, Unit } from '@contract';
import * as z from 'zod';

/** What the analyst chose for an edition of one fit. */
export const Composition = z.object({
  /** In the order of the edition; the first one leads. */
  scenarioIds: z.array(z.string()),
  confidentiality: Confidentiality,
  comment: z.string(),
  /** The headline as edited, with the unit that its amounts are written in; null for the one made from the figures. */
  headline: z.object({ text: z.string(), unit: Unit }).nullable(),
  /** The returned edition that this one answers. */
  answersEditionId: z.string().nullable(),
});
export type Composition = z.infer<typeof Composition>;

export const emptyComposition: Composition = {
  scenarioIds: [],
  confidentiality: 'confidential',
  comment: '',
  headline: null,
  answersEditionId: null,
};

/** As the server is asked; scenarios that are gone are left out, the others go with the version seen. */
export function composeRequest(
  fitId: string,
  composition: Composition,
  scenarios: readonly Pick<ScenarioReply, 'id' | 'version'>[],
  unit: Unit,
): ComposeEdition {
  const { scenarioIds, confidentiality, comment, headline, answersEditionId } = composition;
  const isWritten = headline !== null && headline.text.trim() !== '';
  return {
    fitId,
    scenarios: scenarioIds.flatMap((id) =>
      scenarios.filter((each) => each.id === id).map(({ version }) => ({ id, version })),
    ),
    confidentiality,
    comment,
    headline: isWritten ? headline.text.trim() : null,
    unit: isWritten ? headline.unit : unit,
    answersEditionId,
  };
}

/** With a scenario one place nearer to the front or to the end. */
export function withMoved(ids: readonly string[], id: string, by: -1 | 1): string[] {
  const from = ids.indexOf(id);
  const to = from + by;
  const moved = [...ids];
  if (from === -1 || to < 0 || to >= ids.length) return moved;
  [moved[from], moved[to]] = [moved[to], moved[from]];
  return moved;
}
