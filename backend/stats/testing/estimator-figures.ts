import { estimatorSummaries } from '../estimators/estimator-summaries';
import type { EstimatorCode, EstimatorSlope, EstimatorSummary } from '../evidence/evidence';
import { openFit, type PanelColumns, type Specification } from '../index';
import { plainSpecification, sha256 } from './golden-panels';

/** What each estimator says of a panel, by its code; under the plain specification unless told otherwise. */
export function summariesOfPanel(
  data: PanelColumns,
  specification: Partial<Specification>,
): (code: EstimatorCode) => EstimatorSummary {
  const open = openFit(
    {
      data,
      specification: { ...plainSpecification, ...specification },
      own: null,
      members: undefined,
    },
    { sha256 },
  );
  const summaries = estimatorSummaries(open);
  return (code) => {
    const found = summaries.find((summary) => summary.code === code);
    if (found === undefined) throw new Error(`no estimator ${code}`);
    return found;
  };
}

/** @throws {Error} with the estimator's reason where it has none. */
export function slopesOf({ slopes, reason }: EstimatorSummary): readonly EstimatorSlope[] {
  if (slopes === null) throw new Error(reason);
  return slopes;
}

/** @throws {Error} with the estimator's reason where it has none. */
export function componentsOf({
  components,
  reason,
}: EstimatorSummary): NonNullable<EstimatorSummary['components']> {
  if (components === undefined) throw new Error(reason);
  return components;
}
