import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { IANAZone } from 'luxon';
import { z } from 'zod';

/** The service's settings. Everything has a default that works; the environment changes it. */
export interface Config {
  readonly production: boolean;
  readonly host: string;
  readonly port: number;
  /** database, trend files and the generated secret live here */
  readonly dataDir: string;
  readonly jwtSecret: string;
  /** the refresh cookie is sent over TLS only */
  readonly cookieSecure: boolean;
  /** hops of reverse proxies in front of the service */
  readonly trustProxy: number;
  readonly logLevel: 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'trace' | 'silent';
  /** bytes */
  readonly maxUpload: number;
  /** threads that read files and assess valves */
  readonly workers: number;
  /** bring in the demo plant when the database is empty */
  readonly demo: boolean;
  readonly demoPassword: string;
  /** the site a first start without the demo plant makes, and who may sign in to it */
  readonly firstStart: {
    readonly siteName: string;
    readonly zone: string;
    readonly admin: { readonly email: string; readonly password: string } | null;
  };
}

export const CONFIG = Symbol('config');

const repository = fileURLToPath(new URL('../../../', import.meta.url));
const onOff = z.enum(['on', 'off'], { error: 'must be on or off' });
const wholeNumber = (least: number, most: number) =>
  z.coerce
    .number({ error: `must be a whole number from ${least} to ${most}` })
    .int(`must be a whole number from ${least} to ${most}`)
    .min(least, `must be ${least} or more`)
    .max(most, `must be ${most} or less`);

const environment = z.object({
  NODE_ENV: z.enum(['production', 'development', 'test']).default('production'),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: wholeNumber(0, 65_535).default(4600),
  DATA_DIR: z.string().min(1).default('.data'),
  JWT_SECRET: z.string().min(32, 'must have 32 characters or more').optional(),
  COOKIE_SECURE: onOff.default('off'),
  TRUST_PROXY: wholeNumber(0, 10).default(0),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
  MAX_UPLOAD_MB: wholeNumber(1, 1_000_000).default(4096),
  WORKERS: wholeNumber(1, 64).default(2),
  DEMO: onOff.default('off'),
  SITE_NAME: z.string().min(1).max(60).default('Site'),
  SITE_ZONE: z
    .string()
    .refine((zone) => IANAZone.isValidZone(zone), 'must be a zone such as Europe/Vienna')
    .default('UTC'),
  ADMIN_EMAIL: z.email('must be an e-mail address').optional(),
  ADMIN_PASSWORD: z.string().min(10, 'must have 10 characters or more').optional(),
  DEMO_PASSWORD: z.string().min(10, 'must have 10 characters or more').default('tailrace-demo'),
});

/** The environment holds a value the service cannot work with. The message names each, and what it must be. */
export class ConfigError extends Error {}

/**
 * Reads and checks the settings.
 *
 * @throws ConfigError naming every variable that is not right
 */
export function readConfig(env: Readonly<Record<string, string | undefined>>): Config {
  const given = Object.fromEntries(
    Object.entries(env).filter(([, value]) => value !== undefined && value !== ''),
  );
  const parsed = environment.safeParse(given);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')} ${issue.message}`);
    throw new ConfigError(`Tailrace cannot start; these settings are not right:\n${lines.join('\n')}`);
  }
  const values = parsed.data;
  const dataDir = resolve(repository, values.DATA_DIR);
  makeFolder(dataDir);
  return {
    production: values.NODE_ENV === 'production',
    host: values.HOST,
    port: values.PORT,
    dataDir,
    jwtSecret: values.JWT_SECRET ?? keptSecret(dataDir),
    cookieSecure: values.COOKIE_SECURE === 'on',
    trustProxy: values.TRUST_PROXY,
    logLevel: values.LOG_LEVEL,
    maxUpload: values.MAX_UPLOAD_MB * 1024 * 1024,
    workers: values.WORKERS,
    demo: values.DEMO === 'on',
    demoPassword: values.DEMO_PASSWORD,
    firstStart: {
      siteName: values.SITE_NAME,
      zone: values.SITE_ZONE,
      admin:
        values.ADMIN_EMAIL && values.ADMIN_PASSWORD
          ? { email: values.ADMIN_EMAIL.toLowerCase(), password: values.ADMIN_PASSWORD }
          : null,
    },
  };
}

function makeFolder(path: string): void {
  try {
    mkdirSync(path, { recursive: true, mode: 0o700 });
  } catch (cause) {
    throw new ConfigError(`Tailrace cannot start; DATA_DIR cannot be made or written: ${path}`, { cause });
  }
}

/** A secret made once and kept beside the data, so that sessions outlive a restart without anybody setting one. */
function keptSecret(dataDir: string): string {
  const path = join(dataDir, 'jwt-secret');
  if (!existsSync(path))
    writeFileSync(path, randomBytes(48).toString('base64url'), { mode: 0o600, flag: 'wx' });
  return readFileSync(path, 'utf8').trim();
}
