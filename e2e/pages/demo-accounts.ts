import type { Role } from '@contract';

export interface Account {
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

/** The demo person with this role. */
export function demoAccount(role: Role): Account {
  const accounts = JSON.parse(process.env['KINVALE_ACCOUNTS'] ?? '[]') as (Account & {
    readonly role: Role;
  })[];
  const found = accounts.find((account) => account.role === role);
  if (found === undefined) throw new Error(`KINVALE_ACCOUNTS names nobody with the role ${role}`);
  return found;
}

/** A person that nobody else in this run is. */
export function invented(name: string): Account {
  const local = name.toLowerCase().replace(/[^a-z]+/g, '.');
  const unique = `${Date.now().toString(36)}${Math.floor(Math.random() * 1e6).toString(36)}`;
  return {
    name,
    email: `${local}.${unique}@orlamere.example`,
    password: 'lantern over quiet water',
  };
}
