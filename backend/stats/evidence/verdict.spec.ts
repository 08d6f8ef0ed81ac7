import { sound, withResult, withStanding, withWarning } from '../testing/verdict-inputs';
import { verdictOf } from './verdict';

const notable = { code: 'spelling', detail: 'Two names.' } as const;
const few = { code: 'few-companies', detail: 'Only 6 companies.' } as const;
const drift = { estimate: 1, standardError: 0.1, low: 0.8, high: 1.2, pValue: 0.001 };

describe('verdictOf', () => {
  it('carries a statement with care where something notable speaks against it', () => {
    const { grade, sentence } = verdictOf(withResult({ warnings: [notable] }));
    expect(grade).toBe('carries-with-care');
    expect(sentence).toBe(
      'This fit can carry the statement that K00 lies above its peers’ mean, with care: one point speaks against it.',
    );
  });

  it('carries it with care with one serious objection, which comes first', () => {
    const { grade, sentence, against } = verdictOf(withResult({ warnings: [notable, few] }));
    expect(grade).toBe('carries-with-care');
    expect(sentence).toContain('with care: two points speak against it.');
    expect(against).toEqual([
      { code: 'few-companies', weight: 'serious', detail: 'Only 6 companies.' },
      { code: 'spelling', weight: 'notable', detail: 'Two names.' },
    ]);
  });

  it('does not carry it with two serious ones', () => {
    const { grade, sentence } = verdictOf(withResult({ warnings: [notable, few], drift }));
    expect(grade).toBe('does-not-carry');
    expect(sentence).toBe(
      'This fit cannot carry a statement on K00’s standing: two serious points speak against it.',
    );
  });

  it('does not carry it where one objection leaves nothing to state', () => {
    const { grade, sentence } = verdictOf(withWarning('perfect-fit'));
    expect(grade).toBe('does-not-carry');
    expect(sentence).toBe(
      'This fit cannot carry a statement on K00’s standing: one serious point speaks against it.',
    );
  });

  it('speaks of a board statement where there is no own company', () => {
    expect(verdictOf(withResult({ standing: null })).sentence).toBe(
      'This fit cannot carry a board statement: one serious point speaks against it.',
    );
  });

  it('says on which side of the peers the own company lies, or that the data do not show it', () => {
    const { low, high, estimate } = sound.result.standing!;
    const below = withStanding({ low: -high!, high: -low!, estimate: -estimate });
    const without = { ...below, result: { ...below.result, withoutCompany: [] } };
    const sentence = verdictOf({ ...without, withoutYear: [], alternatives: [] }).sentence;
    expect(sentence).toBe('This fit can carry the statement that K00 lies below its peers’ mean.');
    expect(verdictOf(withStanding({ low: -1 })).sentence).toBe(
      'This fit can carry the statement that the data do not show whether K00 lies above or below its peers’ mean.',
    );
  });
});
