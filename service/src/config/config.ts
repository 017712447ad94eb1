import { existsSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';

const portSchema = z.coerce.number().int().min(0).max(65_535);
const blankIsAbsent = (value: unknown): unknown => (value === '' ? undefined : value);
const optional = <Schema extends z.ZodType>(schema: Schema) => z.preprocess(blankIsAbsent, schema.optional());
const withDefault = <Schema extends z.ZodType>(schema: Schema, value: z.input<Schema>) =>
  z.preprocess((given) => blankIsAbsent(given) ?? value, schema);

const existingFile = z.string().refine((file) => existsSync(file), { message: 'there is no such file' });

const environmentSchema = z
  .object({
    PORT: withDefault(portSchema, 4600),
    HOST: withDefault(z.string(), '127.0.0.1'),
    PUBLIC_URL: optional(z.url({ protocol: /^https?$/, message: 'not an http or https address' })),
    TLS_CERT: optional(existingFile),
    TLS_KEY: optional(existingFile),
    TRUST_PROXY: optional(z.string()),
    DATA_DIR: optional(z.string()),
    DEMO: optional(z.enum(['live', 'off'], { message: 'must be live or off' })),
    ADMIN_EMAIL: optional(z.email()),
    ADMIN_PASSWORD: optional(z.string().min(8).max(128)),
    SESSION_SECRET: optional(z.string().min(32, 'must have at least 32 characters')),
    SMTP_URL: optional(z.url({ protocol: /^smtps?$/, message: 'not an smtp or smtps address' })),
    MAIL_FROM: optional(z.email()),
    SMS_ACCOUNT: optional(z.string()),
    SMS_TOKEN: optional(z.string()),
    SMS_FROM: optional(z.string()),
    SMS_API_URL: optional(z.url({ protocol: /^https?$/, message: 'not an http or https address' })),
    LOG_LEVEL: withDefault(z.enum(['silent', 'fatal', 'error', 'warn', 'info', 'debug', 'trace']), 'info'),
  })
  .refine((env) => (env.TLS_CERT === undefined) === (env.TLS_KEY === undefined), {
    path: ['TLS_CERT'],
    message: 'TLS_CERT and TLS_KEY go together',
  })
  .refine((env) => (env.ADMIN_EMAIL === undefined) === (env.ADMIN_PASSWORD === undefined), {
    path: ['ADMIN_EMAIL'],
    message: 'ADMIN_EMAIL and ADMIN_PASSWORD go together',
  })
  .refine(
    (env) =>
      new Set([env.SMS_ACCOUNT, env.SMS_TOKEN, env.SMS_FROM].map((value) => value === undefined)).size === 1,
    { path: ['SMS_ACCOUNT'], message: 'SMS_ACCOUNT, SMS_TOKEN and SMS_FROM go together' },
  );

/** Paths that follow from where the service is installed. */
const serviceFolder = path.resolve(__dirname, '../..');
const repositoryFolder = path.resolve(serviceFolder, '..');

/** The account by which text messages leave. */
export interface SmsAccount {
  account: string;
  token: string;
  /** Number or name the messages come from. */
  from: string;
  /** Where the provider's interface is; null is the provider's own address. */
  apiUrl: string | null;
}

/** Everything the environment decides, read once at start. Also the token by which it is injected. */
export class Config {
  readonly port: number;
  readonly host: string;
  /** Where people reach the service; links are built from it. No slash at its end. */
  readonly publicUrl: string;
  /** Whether people reach it by https: decides cookie name, HSTS and upgrade-insecure-requests. */
  readonly isSecure: boolean;
  readonly tls: { cert: string; key: string } | null;
  /** Value of Express's `trust proxy`: an address, a list, a number of hops; null trusts nobody. */
  readonly trustProxy: string | number | boolean | null;
  readonly dataDir: string;
  /** What the environment asks for; undefined is "live on an empty database". */
  readonly demo: 'live' | 'off' | undefined;
  readonly firstAdministrator: { email: string; password: string } | null;
  readonly sessionSecret: string | null;
  /** The mail server that takes our mail; null keeps it in the local box. */
  readonly smtpUrl: string | null;
  /** Address that mail comes from. */
  readonly mailFrom: string;
  /** Null keeps text messages in the local box. */
  readonly sms: SmsAccount | null;
  readonly logLevel: string;
  /** Built user interface; served when it is there. */
  readonly uiFolder: string;
  readonly version: string;

  constructor(values: Config) {
    this.port = values.port;
    this.host = values.host;
    this.publicUrl = values.publicUrl;
    this.isSecure = values.isSecure;
    this.tls = values.tls;
    this.trustProxy = values.trustProxy;
    this.dataDir = values.dataDir;
    this.demo = values.demo;
    this.firstAdministrator = values.firstAdministrator;
    this.sessionSecret = values.sessionSecret;
    this.smtpUrl = values.smtpUrl;
    this.mailFrom = values.mailFrom;
    this.sms = values.sms;
    this.logLevel = values.logLevel;
    this.uiFolder = values.uiFolder;
    this.version = values.version;
  }
}

/** Thrown when the environment cannot be used; its message lists everything that is wrong, not just the first. */
export class ConfigProblem extends Error {}

/** Reads the environment into a configuration, or throws `ConfigProblem` with the full list of what is wrong. */
export function readConfig(environment: NodeJS.ProcessEnv): Config {
  const parsed = environmentSchema.safeParse(environment);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new ConfigProblem(`The environment cannot be used:\n${lines.join('\n')}`);
  }
  const env = parsed.data;
  const scheme = env.TLS_CERT === undefined ? 'http' : 'https';
  const publicUrl = (env.PUBLIC_URL ?? `${scheme}://${hostInUrl(env.HOST)}:${env.PORT}`).replace(/\/+$/, '');
  return new Config({
    port: env.PORT,
    host: env.HOST,
    publicUrl,
    isSecure: publicUrl.startsWith('https:'),
    tls: env.TLS_CERT && env.TLS_KEY ? { cert: env.TLS_CERT, key: env.TLS_KEY } : null,
    trustProxy: parseTrustProxy(env.TRUST_PROXY),
    dataDir: path.resolve(env.DATA_DIR ?? path.join(repositoryFolder, 'data')),
    demo: env.DEMO,
    firstAdministrator:
      env.ADMIN_EMAIL && env.ADMIN_PASSWORD
        ? { email: env.ADMIN_EMAIL.toLowerCase(), password: env.ADMIN_PASSWORD }
        : null,
    sessionSecret: env.SESSION_SECRET ?? null,
    smtpUrl: env.SMTP_URL ?? null,
    mailFrom: env.MAIL_FROM ?? `stubpost@${mailHost(publicUrl)}`,
    sms:
      env.SMS_ACCOUNT && env.SMS_TOKEN && env.SMS_FROM
        ? {
            account: env.SMS_ACCOUNT,
            token: env.SMS_TOKEN,
            from: env.SMS_FROM,
            apiUrl: env.SMS_API_URL ?? null,
          }
        : null,
    logLevel: env.LOG_LEVEL,
    uiFolder: path.join(repositoryFolder, 'ui', 'dist'),
    version: packageVersion(),
  });
}

/** A name with a dot in it, for addresses: bare host names and numbers are refused by mail servers. */
function mailHost(publicUrl: string): string {
  const { hostname } = new URL(publicUrl);
  return /[a-z]/i.test(hostname) && hostname.includes('.') ? hostname : 'stubpost.invalid';
}

function hostInUrl(host: string): string {
  if (host === '0.0.0.0' || host === '::') return '127.0.0.1';
  return host.includes(':') ? `[${host}]` : host;
}

function parseTrustProxy(text: string | undefined): string | number | boolean | null {
  if (text === undefined) return null;
  if (/^\d+$/.test(text)) return Number(text);
  if (text === 'true' || text === 'false') return text === 'true';
  return text;
}

function packageVersion(): string {
  // eslint-disable-next-line @typescript-eslint/no-require-imports -- the version stands in one place, the package file
  const file = require(path.join(serviceFolder, 'package.json')) as { version: string };
  return file.version;
}
