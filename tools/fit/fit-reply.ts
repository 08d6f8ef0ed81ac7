import type { DroppedRow, FitResult } from '../../backend/stats';

type Json = string | number | boolean | null | readonly Json[] | { readonly [key: string]: Json };

/**
 * What the command prints of a fit: the documented keys, and beside every null a `…Reason`.
 *
 * @param leftOut  rows that name no company or no year and therefore never reached the engine.
 */
export function fitReply(result: FitResult, leftOut: readonly DroppedRow[]): Json {
  const { sample, standing } = result;
  const dropped = [...sample.dropped, ...leftOut].sort((left, right) => left.row - right.row);
  const figures = withReasons({
    sample: {
      companies: sample.companies,
      years: sample.years,
      observations: sample.observations,
      balanced: sample.balanced,
      dropped,
      singleRow: sample.singleRow,
    },
    slopes: result.slopes,
    slopeCovariance: result.slopeCovariance,
    intercepts: result.intercepts,
    yearEffects: null,
    yearEffectsReason: 'The specification has no year effects.',
    standing:
      standing === null
        ? null
        : {
            ...standing,
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
  } as unknown as Json);
  return {
    engine: result.engine,
    hash: result.hash,
    specification: { ...result.specification },
    ...(figures as Readonly<Record<string, Json>>),
  };
}

/** Gives every null its own `…Reason`, taken from the reason that its object states. */
function withReasons(value: Json): Json {
  if (Array.isArray(value)) return value.map(withReasons);
  if (value === null || typeof value !== 'object') return value;
  const object = value as Readonly<Record<string, Json>>;
  const stated = object['intervalReason'] ?? object['pValueReason'];
  const result: Record<string, Json> = {};
  for (const [key, entry] of Object.entries(object)) {
    if (entry === undefined || key === 'intervalReason') continue;
    result[key] = withReasons(entry);
    const own = `${key}Reason`;
    if (entry === null && !(own in object) && stated !== undefined) result[own] = stated;
  }
  return result;
}
