import { type Role, roles } from '@contract';

/** What a person who joins will do here, role by role. */
export const roleSentences: Readonly<Record<Role, string>> = {
  analyst: 'Analyst: you build panels and peer groups, fit, run scenarios and publish editions.',
  cfo: 'CFO: you read the whole model, and sign editions or return them.',
  reader: 'Reader: you read signed editions and where their figures come from.',
  billing_admin: 'Billing admin: you look after members, seats and invoices.',
};

/** The sentences of the roles held, in the order of the work. */
export function sentencesOf(held: readonly Role[]): readonly string[] {
  return roles.filter((role) => held.includes(role)).map((role) => roleSentences[role]);
}
