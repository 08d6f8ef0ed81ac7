import { roles } from '@contract';
import { roleWords, rolesText } from './role-words';

describe('roles in words', () => {
  it('explains every role in one line', () => {
    expect(roleWords.map(({ role }) => role)).toEqual([...roles]);
    for (const { explanation } of roleWords) expect(explanation).not.toContain('\n');
  });

  it('lists the roles a person holds in the order of the work', () => {
    expect(rolesText(['billing_admin', 'analyst'])).toBe('Analyst, billing admin');
    expect(rolesText(['reader', 'cfo', 'analyst'])).toBe('Analyst, CFO, reader');
    expect(rolesText(['billing_admin'])).toBe('Billing admin');
  });
});
