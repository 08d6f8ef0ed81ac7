import type { DroppedRow, Evidence, FitResult, Standing } from '../../backend/stats';
import { evidenceReply } from './evidence-reply';
import { slopeReasons } from './slope-reasons';
import { type Json, withReasons } from './with-reasons';

/** A missing cell by its line of the file, which holds one row of the panel. */
export type DroppedCell = Pick<DroppedRow, 'row' | 'column' | 'reason'>;

/**
 * What the command prints of a fit: the documented keys, and beside every null a `…Reason`.
 *
 * @param leftOut  rows that name no company or no year and therefore never reached the engine.
 * @param evidence  where it was asked for.
 */
export function fitReply(
  result: FitResult,
  leftOut: readonly DroppedCell[],
  evidence?: Evidence,
): Json {
  const { sample, standing } = result;
  const dropped = [...sample.dropped, ...leftOut]
    .map(({ row, column, reason }): DroppedCell => ({ row, column, reason }))
    .sort((left, right) => left.row - right.row);
  const figures = withReasons({
    sample: {
      companies: sample.companies,
      years: sample.years,
      observations: sample.observations,
      balanced: sample.balanced,
      dropped,
      singleRow: sample.singleRow,
    },
    slopes: result.slopes.map((slope) => ({ ...slope, ...slopeReasons(slope) })),
    slopeCovariance: result.slopeCovariance,
    ...(result.slopeCovariance === null && {
      slopeCovarianceReason: result.slopeCovarianceReason,
    }),
    intercepts: result.intercepts,
    yearEffects: result.yearEffects,
    ...(result.yearEffects === null && {
      yearEffectsReason: 'The specification has no year effects.',
    }),
    standing:
      standing === null
        ? null
        : {
            ...withoutRankReason(standing),
            ...(standing.rankSet === null && { rankSetReason: standing.rankReason }),
            ...(standing.ownPersistence === null && {
              ownPersistenceReason:
                'The own company has fewer than 8 rows, or no two fiscal years in a row.',
            }),
          },
    ...(standing === null && {
      standingReason: result.standingReason ?? 'No own company was named.',
    }),
    goodness: result.goodness,
    pooled: result.pooled,
    poolability: result.poolability,
    warnings: result.warnings.map(({ code, detail, subjects }) => ({ code, detail, subjects })),
    ...(evidence !== undefined && { evidence: evidenceReply(evidence) }),
  } as unknown as Json);
  return {
    engine: result.engine,
    hash: result.hash,
    specification: { ...result.specification },
    ...(figures as Readonly<Record<string, Json>>),
  };
}

/** A rank that is known has no reason to be missing; why its set is stands beside the set. */
function withoutRankReason({ rankReason, ...standing }: Standing): object {
  return standing.rank === null ? { ...standing, rankReason } : standing;
}
