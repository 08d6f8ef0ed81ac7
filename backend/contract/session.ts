import * as z from 'zod';
import { Role } from './roles';

const email = z
  .email('expected an e-mail address')
  .max(254)
  .transform((text) => text.toLowerCase());

/** At least 12 characters, at most 128, any characters. */
export const Password = z
  .string()
  .min(12, 'expected at least 12 characters')
  .max(128, 'expected at most 128 characters');

const name = z
  .string()
  .trim()
  .min(1, 'expected a name')
  .max(120)
  .regex(/^[^\r\n]*$/, 'expected one line');

export const SignIn = z.strictObject({ email, password: z.string().min(1).max(128) });
export type SignIn = z.infer<typeof SignIn>;

/** Creates a person and a workspace; its founder holds `billing_admin` and `analyst`. */
export const SignUp = z.strictObject({
  name,
  email,
  password: Password,
  workspaceName: name,
});
export type SignUp = z.infer<typeof SignUp>;

export const Preferences = z.strictObject({
  theme: z.enum(['system', 'light', 'dark']),
  /** Factor in which money is shown. */
  unit: z.enum(['units', 'thousands', 'millions', 'billions']),
  negatives: z.enum(['minus', 'parentheses']),
});
export type Preferences = z.infer<typeof Preferences>;

/** Who is signed in, and with what rights; `null` when nobody is. */
export const SessionReply = z.object({
  session: z
    .object({
      person: z.object({ id: z.uuid(), name: z.string(), email: z.string() }),
      workspace: z.object({ id: z.uuid(), name: z.string() }),
      roles: z.array(Role),
      preferences: Preferences,
    })
    .nullable(),
});
export type SessionReply = z.infer<typeof SessionReply>;
export type Session = NonNullable<SessionReply['session']>;

export { email as EmailAddress, name as PersonName };
