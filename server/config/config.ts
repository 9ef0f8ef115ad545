import * as z from 'zod';

export interface Config {
  /** Real use: strong secret, no demo data, no demo sign-ins. */
  readonly production: boolean;
  readonly port: number;
  readonly host: string;
  readonly dataDir: string;
  /** Origin under which browsers reach the product, without a slash at the end. */
  readonly publicUrl: string;
  /** Absent in the demo: then one is made and kept in the data directory. */
  readonly sessionSecret: string | undefined;
  /** Proxies whose forwarding headers are believed. */
  readonly trustedProxies: readonly string[];
  readonly logLevel: string;
  /** Multiplies every request limit; the login limit stays. */
  readonly rateLimitFactor: number;
}

/** The environment does not allow a start; the message says what to set. */
export class ConfigError extends Error {
  override readonly name = 'ConfigError';
}

const environmentSchema = z.object({
  NODE_ENV: z.string().default('development'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(4200),
  HOST: z.string().min(1).default('127.0.0.1'),
  DATA_DIR: z.string().min(1).default('./data'),
  PUBLIC_URL: z.url({ protocol: /^https?$/ }).optional(),
  SESSION_SECRET: z.string().optional(),
  TRUSTED_PROXIES: z.string().default('loopback'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
});

const MIN_SECRET_BYTES = 32;
const MIN_DISTINCT_CHARACTERS = 10;

export function readConfig(environment: Readonly<Record<string, string | undefined>>): Config {
  const parsed = environmentSchema.safeParse(environment);
  if (!parsed.success) {
    const problems = parsed.error.issues.map(
      (issue) => `${issue.path.join('.')}: ${issue.message}`,
    );
    throw new ConfigError(`The environment is not usable. ${problems.join('. ')}.`);
  }
  const env = parsed.data;
  const production = env.NODE_ENV === 'production';
  const publicUrl = new URL(env.PUBLIC_URL ?? `http://localhost:${env.PORT}`);
  if (production) {
    requireStrongSecret(env.SESSION_SECRET);
    requireSafeAddress(env.PUBLIC_URL === undefined ? undefined : publicUrl);
  }
  return {
    production,
    port: env.PORT,
    host: env.HOST,
    dataDir: env.DATA_DIR,
    publicUrl: publicUrl.origin,
    sessionSecret: env.SESSION_SECRET,
    trustedProxies:
      publicUrl.protocol === 'https:' ? env.TRUSTED_PROXIES.split(',').map((it) => it.trim()) : [],
    logLevel: env.LOG_LEVEL,
    rateLimitFactor: 1,
  };
}

/** Cookies are `Secure` and named `__Host-…` only where the public address is https. */
export function isHttps(config: Config): boolean {
  return config.publicUrl.startsWith('https:');
}

function requireStrongSecret(secret: string | undefined): void {
  const weak =
    secret === undefined ||
    Buffer.byteLength(secret) < MIN_SECRET_BYTES ||
    new Set(secret).size < MIN_DISTINCT_CHARACTERS ||
    /change.?me|default|example|secret|password/i.test(secret);
  if (!weak) return;
  throw new ConfigError(
    `SESSION_SECRET must be a random text of at least ${MIN_SECRET_BYTES} bytes in production, ` +
      'for example the output of: openssl rand -base64 48',
  );
}

function requireSafeAddress(publicUrl: URL | undefined): void {
  const safe =
    publicUrl?.protocol === 'https:' ||
    publicUrl?.hostname === 'localhost' ||
    publicUrl?.hostname === '127.0.0.1';
  if (safe) return;
  throw new ConfigError(
    'PUBLIC_URL must be the https address of this site in production, for example ' +
      'https://limen.institute.example',
  );
}
