import * as z from 'zod';

const positiveInteger = z.coerce.number().int().positive();

const secret = (name: string) =>
  z.string(`${name} is not set`).min(32, `${name} is too short: expected at least 32 characters`);

const databaseUrl = z
  .string('DATABASE_URL is not set: expected the PostgreSQL address of the application role')
  .regex(/^postgres(ql)?:\/\//, 'DATABASE_URL is no PostgreSQL address');

function isSmtpUrl(text: string): boolean {
  return /^smtps?:\/\//.test(text) && URL.canParse(text) && new URL(text).hostname !== '';
}

const environment = z.object({
  NODE_ENV: z.string().optional(),
  KINVALE_MODE: z.enum(['local', 'production']).default('production'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65535).default(4300),
  DATABASE_URL: databaseUrl,
  SESSION_SECRET: secret('SESSION_SECRET'),
  /** The secret before the last change, so that nobody is signed out by it. */
  SESSION_SECRET_PREVIOUS: secret('SESSION_SECRET_PREVIOUS').optional(),
  PUBLIC_URL: z.url(
    'PUBLIC_URL is not set or no address: expected the address that browsers use, as https://kinvale.example',
  ),
  STRIPE_SECRET_KEY: z.string('STRIPE_SECRET_KEY is not set').min(1),
  STRIPE_API_URL: z.url().optional(),
  SMTP_URL: z
    .string()
    .refine(isSmtpUrl, 'SMTP_URL is no address: expected smtp://… or smtps://… with a host')
    .optional(),
  MAIL_FROM: z.email('MAIL_FROM is no address: expected one as kinvale@company.example').optional(),
  KINVALE_MAIL: z.enum(['on', 'off'], 'KINVALE_MAIL is neither on nor off').default('on'),
  HTTPS_CERT: z.string().optional(),
  HTTPS_KEY: z.string().optional(),
  TRUST_PROXY_HOPS: z.coerce.number().int().min(0).max(5).default(0),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  FIT_THREADS: positiveInteger.max(16).default(1),
});

export interface Config {
  /** Plain http on 127.0.0.1, for trying things out; never in production. */
  readonly isLocal: boolean;
  readonly host: string;
  readonly port: number;
  readonly databaseUrl: string;
  /** The current secret first. */
  readonly sessionSecrets: readonly string[];
  /** Scheme, host and port that browsers see. */
  readonly publicOrigin: string;
  readonly stripe: { readonly secretKey: string; readonly apiUrl: string | undefined };
  /** Undefined where KINVALE_MAIL=off. */
  readonly mail: { readonly url: string; readonly from: string } | undefined;
  /** Paths of certificate and key; undefined where something in front ends TLS. */
  readonly tls: { readonly certPath: string; readonly keyPath: string } | undefined;
  readonly trustProxyHops: number;
  readonly logLevel: string;
  readonly fitThreads: number;
}

/** The environment does not allow a start; the message has one line for each reason. */
export class ConfigError extends Error {
  override readonly name = 'ConfigError';
}

/**
 * Reads the environment once.
 *
 * @throws {ConfigError} naming every variable that is missing or wrong; values are never printed.
 */
export function readConfig(variables: Readonly<Record<string, string | undefined>>): Config {
  const parsed = environment.safeParse(variables);
  if (!parsed.success)
    throw new ConfigError([...new Set(parsed.error.issues.map(describe))].join('\n'));
  const env = parsed.data;
  const isLocal = env.KINVALE_MODE === 'local';
  if (isLocal && env.NODE_ENV === 'production')
    throw new ConfigError('KINVALE_MODE=local is refused with NODE_ENV=production');
  if (isLocal && env.HOST !== '127.0.0.1')
    throw new ConfigError(
      `KINVALE_MODE=local serves plain http and is refused on any address but 127.0.0.1; found HOST=${env.HOST}`,
    );
  if (!isLocal && !env.PUBLIC_URL.startsWith('https://'))
    throw new ConfigError('PUBLIC_URL must start with https:// unless KINVALE_MODE=local');
  if ((env.HTTPS_CERT === undefined) !== (env.HTTPS_KEY === undefined))
    throw new ConfigError('HTTPS_CERT and HTTPS_KEY go together: set both or neither');
  const mail = mailSettings(env);
  return {
    isLocal,
    host: env.HOST,
    port: env.PORT,
    databaseUrl: env.DATABASE_URL,
    sessionSecrets: [env.SESSION_SECRET, env.SESSION_SECRET_PREVIOUS].filter(
      (value) => value !== undefined,
    ),
    publicOrigin: new URL(env.PUBLIC_URL).origin,
    stripe: { secretKey: env.STRIPE_SECRET_KEY, apiUrl: env.STRIPE_API_URL },
    mail,
    tls:
      env.HTTPS_CERT === undefined || env.HTTPS_KEY === undefined
        ? undefined
        : { certPath: env.HTTPS_CERT, keyPath: env.HTTPS_KEY },
    trustProxyHops: env.TRUST_PROXY_HOPS,
    logLevel: env.LOG_LEVEL,
    fitThreads: env.FIT_THREADS,
  };
}

/** @throws {ConfigError} for settings that are not there, unless mail is switched off in as many words. */
function mailSettings(env: z.infer<typeof environment>): Config['mail'] {
  if (env.KINVALE_MAIL === 'off') return undefined;
  const { SMTP_URL: url, MAIL_FROM: from } = env;
  if (url !== undefined && from !== undefined) return { url, from };
  const missing = [
    ...(url === undefined ? ['SMTP_URL is not set: expected the mail server’s address'] : []),
    ...(from === undefined
      ? ['MAIL_FROM is not set: expected the address that mail comes from']
      : []),
  ];
  throw new ConfigError([...missing, 'KINVALE_MAIL=off starts without mail'].join('\n'));
}

function describe(issue: z.core.$ZodIssue): string {
  const name = issue.path.map(String).join('.');
  return issue.message.startsWith(name) ? issue.message : `${name}: ${issue.message}`;
}
