import { type Alternative, type Evidence, evidenceOf, openFit } from '../../backend/stats';
import { goldenPanel, plainSpecification, sha256 } from '../../backend/stats/testing/golden-panels';
import { evidenceReply } from './evidence-reply';
import { fitReply } from './fit-reply';
import { type Json, withReasons } from './with-reasons';

type Figures = Readonly<Record<string, unknown>>;

const open = openFit(
  {
    data: goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']),
    specification: plainSpecification,
    own: 'F03',
    members: undefined,
  },
  { sha256 },
);
const evidence = evidenceOf(open);

function replyOf(change: Partial<Evidence>): {
  readonly estimators: readonly Figures[];
  readonly alternatives: readonly Figures[];
} {
  return withReasons(evidenceReply({ ...evidence, ...change }) as unknown as Json) as never;
}

function estimatorOf(code: string, reason?: string): Figures | undefined {
  const estimators = evidence.estimators.map((one) => ({ ...one, reason }));
  return replyOf({ estimators }).estimators.find((one) => one['code'] === code);
}

function alternativeOf(change: Partial<Alternative>): Figures {
  return replyOf({ alternatives: [{ ...evidence.alternatives[1], ...change }] }).alternatives[0];
}

describe('the reasons in the evidence’s reply', () => {
  it('take what is said beside an estimator’s slopes for no reason of what it lacks', () => {
    const said = 'The company effects’ variance came out negative.';
    expect(estimatorOf('random-effects', said)?.['degreesOfFreedomReason']).toBe(
      'The normal distribution is used.',
    );
    expect(estimatorOf('first-differences', said)?.['constantReason']).toBe(
      'The estimator has no constant.',
    );
    const none = { slopes: null, constant: null, degreesOfFreedom: null, reason: said };
    const [first] = replyOf({
      estimators: [{ ...evidence.estimators[0], ...none }],
    }).estimators;
    expect([
      first['slopesReason'],
      first['constantReason'],
      first['degreesOfFreedomReason'],
    ]).toEqual([said, said, said]);
  });

  it('say of a model’s standing and rank set why each of them is missing', () => {
    const noStanding = alternativeOf({
      standing: null,
      standingReason: 'No standing for this.',
      rankSet: null,
      reason: 'Slopes are missing for that.',
      slopes: null,
    });
    expect(noStanding['standingReason']).toBe('No standing for this.');
    expect(noStanding['rankSetReason']).toBe('No standing for this.');
    expect(noStanding['slopesReason']).toBe('Slopes are missing for that.');
    const noRank = alternativeOf({ rankSet: null, rankReason: 'Too many pairs.' });
    expect(noRank['rankSetReason']).toBe('Too many pairs.');
    expect('rankReason' in noRank).toBe(false);
  });

  it('keep the reason of a rank only where there is none', () => {
    const { standing } = open.result;
    if (standing === null) throw new Error('expected a standing');
    const standingReply = (rank: number | null): Figures => {
      const changed = { ...standing, rank, rankSet: null, rankReason: 'Too few years.' };
      const reply = fitReply({ ...open.result, standing: changed }, []) as Figures;
      return reply['standing'] as Figures;
    };
    expect('rankReason' in standingReply(2)).toBe(false);
    expect(standingReply(2)['rankSetReason']).toBe('Too few years.');
    expect(standingReply(null)['rankReason']).toBe('Too few years.');
  });
});
