// Every setting, with its default. An invalid one stops the start with its name.
import { isIP } from 'node:net';
import path from 'node:path';
import { z } from 'zod';

const DEFAULT_SECRET = 'local-only-secret-that-production-refuses';

const list = z.string().transform((s) =>
  s
    .split(',')
    .map((x) => x.trim())
    .filter((x) => x !== ''),
);

/** Words that Express knows for networks. */
const NETWORKS = ['loopback', 'linklocal', 'uniquelocal'];

function isNetwork(text: string): boolean {
  if (NETWORKS.includes(text)) return true;
  const [address = '', bits, ...rest] = text.split('/');
  const version = isIP(address);
  if (version === 0 || rest.length > 0) return false;
  return bits === undefined || (/^\d{1,3}$/.test(bits) && Number(bits) <= (version === 4 ? 32 : 128));
}

/** Scheme, host and port, nothing behind. */
const isOrigin = (text: string): boolean =>
  URL.canParse(text) && /^https?:$/.test(new URL(text).protocol) && new URL(text).origin === text.replace(/\/$/, '');

const address =
  (schemes: RegExp) =>
  (text: string): boolean =>
    schemes.test(text) && URL.canParse(text);

const settings = z.object({
  GAPWRIGHT_MODE: z.enum(['local', 'production']).default('local'),
  PORT: z.coerce.number().int().min(1).max(65535).default(4180),
  HOST: z.string().min(1).default('127.0.0.1'),
  /** The address people use; links in mails and share links are built from it. */
  BASE_URL: z.string().refine(isOrigin, 'must be like https://gapwright.example, without a path').optional(),
  /** Further origins that may call the API with cookies, comma-separated. */
  GAPWRIGHT_ORIGINS: list
    .default([])
    .refine((all) => all.every(isOrigin), 'must be origins like https://shop.example, comma-separated')
    .transform((all) => all.map((origin) => origin.replace(/\/$/, ''))),
  DATABASE_URL: z.string().refine(address(/^postgres(ql)?:\/\//), 'must be an address that begins with postgres://'),
  DATABASE_POOL: z.coerce.number().int().min(2).max(200).default(12),
  /** Signs cookies and tokens; 32 characters or more, at random. */
  GAPWRIGHT_SECRET: z.string().min(32, 'must have at least 32 characters').default(DEFAULT_SECRET),
  /** Folder for meshes and pictures with local storage, and for uploads on their way. */
  GAPWRIGHT_FILES: z.string().min(1).default('.local/files'),
  GAPWRIGHT_STORAGE: z.enum(['local', 's3']).default('local'),
  S3_ENDPOINT: z
    .string()
    .refine(address(/^https?:\/\//), 'must be an address that begins with https://')
    .optional(),
  S3_REGION: z.string().default('us-east-1'),
  S3_BUCKET: z.string().optional(),
  S3_ACCESS_KEY: z.string().optional(),
  S3_SECRET_KEY: z.string().optional(),
  GAPWRIGHT_MAIL: z.enum(['shelf', 'smtp']).default('shelf'),
  SMTP_URL: z
    .string()
    .refine(address(/^smtps?:\/\//), 'must be an address that begins with smtp:// or smtps://')
    .optional(),
  MAIL_FROM: z
    .string()
    .regex(/^[^@\r\n]+@[^@\r\n]+$/, 'must be a mail address, or a name with one in <>')
    .default('Gapwright <noreply@gapwright.example>'),
  /** Addresses or networks of the reverse proxies in front, comma-separated (`loopback` for one on this machine). */
  TRUST_PROXY: list.default([]).refine((all) => all.every(isNetwork), 'must be addresses or networks, comma-separated'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  MAX_MESH_BYTES: z.coerce
    .number()
    .int()
    .min(1)
    .max(256 * 1024 * 1024)
    .default(256 * 1024 * 1024),
  /** Dry fits that this process works on at a time; 0 leaves all jobs to other servers. */
  DRY_FIT_WORKERS: z.coerce.number().int().min(0).max(64).default(1),
});

export interface Config {
  readonly mode: 'local' | 'production';
  readonly port: number;
  readonly host: string;
  readonly baseUrl: string;
  readonly origins: readonly string[];
  readonly databaseUrl: string;
  readonly databasePool: number;
  readonly secret: string;
  readonly files: string;
  readonly storage:
    | { readonly kind: 'local' }
    | {
        readonly kind: 's3';
        readonly endpoint: string | undefined;
        readonly region: string;
        readonly bucket: string;
        readonly accessKey: string;
        readonly secretKey: string;
      };
  readonly mail: { readonly kind: 'shelf' } | { readonly kind: 'smtp'; readonly url: string };
  readonly mailFrom: string;
  readonly trustProxy: readonly string[];
  readonly logLevel: string;
  readonly maxMeshBytes: number;
  readonly dryFitWorkers: number;
}

/** A setting that is wrong; the message names it. */
export class ConfigFault extends Error {}

const fault = (name: string, reason: string): never => {
  throw new ConfigFault(`The setting ${name} ${reason}. See .env.example.`);
};

/** An empty variable counts as left out. */
function given(env: NodeJS.ProcessEnv): Record<string, string> {
  return Object.fromEntries(
    Object.entries(env).filter((e): e is [string, string] => e[1] !== undefined && e[1] !== ''),
  );
}

export function readConfig(env: NodeJS.ProcessEnv): Config {
  const parsed = settings.safeParse(given(env));
  if (!parsed.success) {
    const issue = parsed.error.issues[0];
    const name = String(issue?.path[0] ?? 'unknown');
    const missing = given(env)[name] === undefined;
    return fault(name, missing ? 'is missing' : `is not valid: ${issue?.message ?? 'see the list'}`);
  }
  const s = parsed.data;
  const production = s.GAPWRIGHT_MODE === 'production';
  if (production && s.GAPWRIGHT_SECRET === DEFAULT_SECRET) fault('GAPWRIGHT_SECRET', 'must be set in production');
  if (production && s.BASE_URL === undefined) fault('BASE_URL', 'must be set in production');
  if (production && s.GAPWRIGHT_MAIL === 'shelf') {
    fault('GAPWRIGHT_MAIL', 'must be smtp in production: the shelf shows everybody’s mail to anybody');
  }
  return {
    mode: s.GAPWRIGHT_MODE,
    port: s.PORT,
    host: s.HOST,
    baseUrl: (s.BASE_URL ?? `http://${s.HOST}:${s.PORT}`).replace(/\/+$/, ''),
    origins: s.GAPWRIGHT_ORIGINS,
    databaseUrl: s.DATABASE_URL,
    databasePool: s.DATABASE_POOL,
    secret: s.GAPWRIGHT_SECRET,
    files: path.resolve(s.GAPWRIGHT_FILES),
    storage: s.GAPWRIGHT_STORAGE === 'local' ? { kind: 'local' } : s3Settings(s),
    mail:
      s.GAPWRIGHT_MAIL === 'shelf'
        ? { kind: 'shelf' }
        : { kind: 'smtp', url: s.SMTP_URL ?? fault('SMTP_URL', 'is missing') },
    mailFrom: s.MAIL_FROM,
    trustProxy: s.TRUST_PROXY,
    logLevel: s.LOG_LEVEL,
    maxMeshBytes: s.MAX_MESH_BYTES,
    dryFitWorkers: s.DRY_FIT_WORKERS,
  };
}

function s3Settings(s: z.infer<typeof settings>): Extract<Config['storage'], { kind: 's3' }> {
  const need = (name: 'S3_BUCKET' | 'S3_ACCESS_KEY' | 'S3_SECRET_KEY'): string =>
    s[name] ?? fault(name, 'is missing, and GAPWRIGHT_STORAGE is s3');
  return {
    kind: 's3',
    endpoint: s.S3_ENDPOINT,
    region: s.S3_REGION,
    bucket: need('S3_BUCKET'),
    accessKey: need('S3_ACCESS_KEY'),
    secretKey: need('S3_SECRET_KEY'),
  };
}
