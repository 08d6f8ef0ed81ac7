import { Evidence as EvidenceReply, type Evidence as EvidenceOfContract } from '../contract';
import { type Evidence, evidenceOf, openFit, type Specification } from '../stats';
import { goldenPanel, plainSpecification, sha256 } from '../stats/testing/golden-panels';
import { toEvidence } from './evidence-reply';

type Plain<Value> = { -readonly [Key in keyof Value]: Plain<Value[Key]> };

type Complete<Value> = { -readonly [Key in keyof Value]-?: Complete<Value[Key]> };

/** Compiles only while the contract's members and the engine's are the same. */
const asContract = (evidence: Plain<Evidence>): EvidenceOfContract => evidence;
const asEngine = (evidence: EvidenceOfContract): Evidence => evidence;

/** An optional member that one of them lacks is assignable all the same: these take every member as there. */
export const completeInContract = (evidence: Complete<Evidence>): Complete<EvidenceOfContract> =>
  evidence;
export const completeInEngine = (evidence: Complete<EvidenceOfContract>): Complete<Evidence> =>
  evidence;

const specifications: readonly Partial<Specification>[] = [
  {},
  { effects: 'company,year' },
  { form: 'log' },
  { lag: 1 },
  { slopes: 'wild', seed: 1 },
];

describe('the contract’s evidence', () => {
  for (const specification of specifications)
    it(`takes every member of the engine’s and loses none (${JSON.stringify(specification)})`, () => {
      for (const own of ['C06', null]) {
        const open = openFit(
          {
            data: goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']),
            specification: { ...plainSpecification, ...specification },
            own,
            members: undefined,
          },
          { sha256 },
        );
        const sent: unknown = JSON.parse(JSON.stringify(toEvidence(evidenceOf(open))));
        const read = asEngine(asContract(EvidenceReply.parse(sent)));
        expect(read).toEqual(sent as Evidence);
      }
    });
});
