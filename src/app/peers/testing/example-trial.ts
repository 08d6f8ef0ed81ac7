import type { PeerTrialReply, TrialFigures, TrialOutcome } from '@contract';
import { flowControl } from './loaded-peers';

/** A fitted group by what matters to a spec: standing with interval, places and the slope of capex. */
export function fitted(
  standing: readonly [number, number, number] | null,
  rankSet: readonly [number, number],
  capex: number,
  change: Partial<TrialFigures> = {},
): TrialOutcome {
  const slope = (name: string, estimate: number) => ({
    name,
    estimate,
    standardError: 0.5,
    low: estimate - 1,
    high: estimate + 1,
  });
  return {
    kind: 'fitted',
    figures: {
      hash: 'ab12cd'.padEnd(64, '0'),
      companies: 5,
      ranked: 5,
      slopes: [slope('outlay', capex), slope('equity', 1.5)],
      standing:
        standing === null
          ? null
          : { estimate: standing[0], low: standing[1], high: standing[2], standardError: 10 },
      rankSet: [rankSet[0], rankSet[1]],
      ...change,
    },
  };
}

export const refused: TrialOutcome = {
  kind: 'refused',
  code: 'constant-regressor',
  detail: 'A regressor never changes within a company.',
  subjects: ['outlay'],
};

/** A trial of Company 1 with four members and two candidates, all of it fitted but one that was refused. */
export function exampleTrial(change: Partial<PeerTrialReply> = {}): PeerTrialReply {
  return {
    id: '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0077',
    state: 'done',
    asked: {
      panelVersionId: flowControl.id,
      ownCompany: 'Company 1',
      peers: ['Company 2', 'Company 3', 'Company 4', 'Company 5'],
      candidates: ['Company 6', 'Company 7'],
      specification: {
        effects: 'company',
        form: 'levels',
        lag: 0,
        slopes: 'cr2',
        confidence: 0.95,
        furtherRegressors: [],
      },
    },
    progress: { done: 7, total: 7 },
    failure: null,
    chosen: fitted([100, 20, 180], [1, 3], 0.4),
    without: [
      { company: 'Company 2', outcome: fitted([110, 30, 190], [1, 3], 0.5, { ranked: 4 }) },
      { company: 'Company 3', outcome: fitted([60, -20, 140], [1, 4], 0.3, { ranked: 4 }) },
      { company: 'Company 4', outcome: fitted([130, 40, 220], [1, 2], -0.2, { ranked: 4 }) },
      { company: 'Company 5', outcome: refused },
    ],
    taking: [
      { company: 'Company 6', outcome: fitted([95, 15, 175], [1, 3], 0.45, { ranked: 6 }) },
      { company: 'Company 7', outcome: fitted([105, 25, 185], [1, 3], 0.35, { ranked: 6 }) },
    ],
    createdAt: flowControl.createdAt,
    ...change,
  };
}
