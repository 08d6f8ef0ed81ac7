import { type Role, roles } from '@contract';

export interface RoleWords {
  readonly role: Role;
  readonly name: string;
  /** What the role opens and what it never does, in one line. */
  readonly explanation: string;
}

const words: Readonly<Record<Role, Omit<RoleWords, 'role'>>> = {
  analyst: {
    name: 'Analyst',
    explanation:
      'Builds panels and peer groups, fits, runs scenarios, publishes editions. Never signs one.',
  },
  cfo: {
    name: 'CFO',
    explanation: 'Reads the whole model, signs editions or returns them. Never changes data.',
  },
  reader: {
    name: 'Reader',
    explanation: 'Reads signed editions and where their figures come from. Never sees drafts.',
  },
  billing_admin: {
    name: 'Billing admin',
    explanation: 'Seats, members and invoices. Never sees panel data, fits or scenarios.',
  },
};

/** Every role, in the order of the work. */
export const roleWords: readonly RoleWords[] = roles.map((role) => ({ role, ...words[role] }));

/** `Analyst, billing admin`. */
export function rolesText(held: readonly Role[]): string {
  return roleWords
    .filter(({ role }) => held.includes(role))
    .map(({ name }, index) => (index === 0 || name === 'CFO' ? name : name.toLowerCase()))
    .join(', ');
}
