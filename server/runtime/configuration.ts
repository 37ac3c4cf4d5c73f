import { z } from 'zod';

const port = z.coerce.number().int().min(1).max(65_535);
const secret = z.string().min(32, 'must have at least 32 characters');
const databaseUrl = z
  .url({ protocol: /^(mysql|mariadb)$/ })
  .refine((text) => !/:\/\/(root|admin)(:|@)/.test(text), 'must not use an administrator’s account');

const settings = z.strictObject({
  NODE_ENV: z.enum(['development', 'test', 'production']),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: port.default(8080),
  /** Scheme and host under which browsers reach the server; https in production. */
  PUBLIC_ORIGIN: z
    .url({ protocol: /^https?$/ })
    .refine((text) => URL.canParse(text) && new URL(text).origin === text, 'must be an origin without a path'),
  DATABASE_URL: databaseUrl,
  SESSION_SECRET: secret,
  PASSWORD_PEPPER: secret,
  BCRYPT_COST: z.coerce.number().int().min(4).max(15).default(12),
  OPEN_SIGN_UP: z.enum(['yes', 'no']),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  TRUST_PROXY_HOPS: z.coerce.number().int().min(0).max(5).default(0),
  /** Folder of the exported web client. */
  WEB_ROOT: z.string().min(1).default('dist'),
});

const production = settings.superRefine((value, context) => {
  if (value.NODE_ENV !== 'production') return;
  const refuse = (key: string, message: string) => void context.addIssue({ code: 'custom', path: [key], message });
  if (!value.PUBLIC_ORIGIN.startsWith('https://')) refuse('PUBLIC_ORIGIN', 'must be https in production');
  if (value.BCRYPT_COST < 12) refuse('BCRYPT_COST', 'must be 12 or more in production');
  for (const key of ['SESSION_SECRET', 'PASSWORD_PEPPER'] as const) {
    if (/^(.)\1*$/.test(value[key]) || /(changeme|secret|password|example)/i.test(value[key]))
      refuse(key, 'must be random');
  }
  if (value.SESSION_SECRET === value.PASSWORD_PEPPER) refuse('PASSWORD_PEPPER', 'must differ from SESSION_SECRET');
});

export type Configuration = z.output<typeof settings>;

/** A setting is missing or wrong; the message names the key and never its value. */
export class ConfigurationError extends Error {}

/** Names that may stand in the environment beside ours; any other with our prefix is a typing error. */
const OUR_PREFIX = /^(BRIERBOOK_|SESSION_|PASSWORD_|BCRYPT_|OPEN_SIGN|TRUST_PROXY|WEB_ROOT|PUBLIC_ORIGIN|DATABASE_)/;

/**
 * Reads the configuration from environment variables.
 * @throws {ConfigurationError} naming every key that is missing, unknown or wrong.
 */
export function readConfiguration(environment: Readonly<Record<string, string | undefined>>): Configuration {
  const keys = Object.keys(settings.shape);
  const unknown = Object.keys(environment).filter((key) => OUR_PREFIX.test(key) && !keys.includes(key));
  if (environment.NODE_ENV === 'production' && unknown.length > 0) {
    throw new ConfigurationError(`Unknown setting: ${unknown.join(', ')}. Remove it or correct its name.`);
  }
  const own = Object.fromEntries(
    keys.flatMap((key) => (environment[key] === undefined ? [] : [[key, environment[key]]])),
  );
  const result = production.safeParse(own);
  if (result.success) return result.data;
  const problems = result.error.issues.map((issue) => `${issue.path.join('.')}: ${safeMessage(issue)}`);
  throw new ConfigurationError(`The configuration is not usable. ${problems.join('; ')}. See the table in README.md.`);
}

/** zod's own messages can quote the input; ours do not. */
function safeMessage({ code, message }: z.core.$ZodIssue): string {
  return code === 'custom' || code === 'too_small'
    ? message
    : code === 'invalid_type'
      ? 'is missing or of the wrong type'
      : 'is not allowed';
}
