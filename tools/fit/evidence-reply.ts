import type { Alternative, EstimatorSummary, Evidence } from '../../backend/stats';
import { slopeReasons } from './slope-reasons';
import { reasonsOf } from './with-reasons';

const noStudentised = 'No residual is left to judge this row by.';

/** The evidence with the reasons of what its types define as null; other nulls have theirs beside them. */
export function evidenceReply(evidence: Evidence): object {
  const { residuals } = evidence;
  const rows = (points: Evidence['residuals']['points']): object[] =>
    points.map((point) => ({
      ...point,
      ...reasonsOf(point, { studentised: noStudentised, cook: noStudentised }),
    }));
  return {
    ...evidence,
    estimators: evidence.estimators.map((estimator) => ({
      ...estimator,
      ...reasonsOf(estimator, estimatorReasons(estimator)),
    })),
    covariances: evidence.covariances.map((row) => ({
      ...row,
      slopes: row.slopes?.map((slope) => ({ ...slope, ...slopeReasons(slope) })) ?? null,
    })),
    alternatives: evidence.alternatives.map(alternativeReply),
    tests: {
      ...evidence.tests,
      list: evidence.tests.list.map((test) => ({
        ...test,
        ...(test.reason === undefined &&
          reasonsOf(test, {
            distribution: 'Only the statistic is looked at.',
            pValue: 'Only the statistic is looked at.',
          })),
      })),
    },
    residuals: { ...residuals, points: rows(residuals.points), largest: rows(residuals.largest) },
  };
}

/** What is said beside slopes that exist is no reason for what the estimator lacks. */
function estimatorReasons({
  code,
  slopes,
  reason,
}: EstimatorSummary): Readonly<Partial<Record<'constant' | 'degreesOfFreedom', string>>> {
  if (slopes === null) return { constant: reason, degreesOfFreedom: reason };
  return {
    constant: 'The estimator has no constant.',
    degreesOfFreedom:
      code === 'random-effects'
        ? 'The normal distribution is used.'
        : 'Each slope has its own, if any.',
  };
}

function alternativeReply({ rankReason, ...model }: Alternative): object {
  const { standing } = model;
  const none = model.standingReason ?? model.reason ?? 'No own company was named.';
  return {
    ...model,
    standing:
      standing === null
        ? null
        : {
            ...standing,
            ...((standing.low !== null || standing.high !== null) &&
              reasonsOf(standing, {
                standardError: 'The interval is that of the logarithms, put into percent.',
              })),
          },
    ...reasonsOf(model, {
      effects: 'The model takes no effects out of the variables.',
      standing: none,
      rankSet: rankReason ?? (standing === null ? none : 'The model gives no rank set.'),
    }),
  };
}
