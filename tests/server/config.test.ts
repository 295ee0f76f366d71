// The settings: each has its default, and an invalid one stops the start with its name.
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { ConfigFault, readConfig } from '../../server/config';

const LEAST = { DATABASE_URL: 'postgres://u:p@127.0.0.1:5432/x' };
const PRODUCTION = {
  ...LEAST,
  GAPWRIGHT_MODE: 'production',
  GAPWRIGHT_SECRET: 'k'.repeat(32),
  BASE_URL: 'https://gaps.example',
  GAPWRIGHT_MAIL: 'smtp',
  SMTP_URL: 'smtp://mail.example:25',
};
const S3 = { ...LEAST, GAPWRIGHT_STORAGE: 's3', S3_BUCKET: 'b', S3_ACCESS_KEY: 'a', S3_SECRET_KEY: 's' };

function faultOf(env: Record<string, string | undefined>): string {
  try {
    readConfig(env);
  } catch (error) {
    if (error instanceof ConfigFault) return error.message;
    throw error;
  }
  return 'taken';
}

test('the database alone is enough on one’s own machine', () => {
  expect(readConfig(LEAST)).toMatchObject({
    mode: 'local',
    port: 4180,
    host: '127.0.0.1',
    baseUrl: 'http://127.0.0.1:4180',
    storage: { kind: 'local' },
    mail: { kind: 'shelf' },
    trustProxy: [],
    maxMeshBytes: 256 * 1024 * 1024,
    dryFitWorkers: 1,
  });
});

test('an empty setting counts as left out', () => {
  expect(readConfig({ ...LEAST, PORT: '', BASE_URL: '', TRUST_PROXY: '' })).toEqual(readConfig(LEAST));
});

describe('an invalid setting is named:', () => {
  test.each<[string, string]>([
    ['GAPWRIGHT_MODE', 'prod'],
    ['PORT', '0'],
    ['PORT', '65536'],
    ['PORT', '80a'],
    ['PORT', '80.5'],
    ['BASE_URL', 'gaps.example'],
    ['BASE_URL', 'ftp://gaps.example'],
    ['BASE_URL', 'https://gaps.example/app'],
    ['GAPWRIGHT_ORIGINS', 'https://a.example, b.example'],
    ['DATABASE_URL', 'mysql://x'],
    ['DATABASE_URL', 'postgres://bad host'],
    ['DATABASE_POOL', '1'],
    ['GAPWRIGHT_SECRET', 'short'],
    ['GAPWRIGHT_STORAGE', 'floppy'],
    ['S3_ENDPOINT', 'minio:9000'],
    ['GAPWRIGHT_MAIL', 'pigeon'],
    ['SMTP_URL', 'http://mail.example'],
    ['MAIL_FROM', 'nobody'],
    ['MAIL_FROM', 'a@b.example\r\nBcc: c@d.example'],
    ['TRUST_PROXY', 'true'],
    ['TRUST_PROXY', 'loopback, 10.0.0.0/33'],
    ['TRUST_PROXY', '10.0.0'],
    ['LOG_LEVEL', 'loud'],
    ['MAX_MESH_BYTES', '268435457'],
    ['DRY_FIT_WORKERS', '-1'],
  ])('%s=%s', (name, value) => {
    expect(faultOf({ ...LEAST, [name]: value })).toMatch(
      new RegExp(`^The setting ${name} is not valid: .+\\.env\\.example\\.$`),
    );
  });

  test('DATABASE_URL, when it is missing', () => {
    expect(faultOf({})).toMatch(/^The setting DATABASE_URL is missing/);
  });

  test.each(['S3_BUCKET', 'S3_ACCESS_KEY', 'S3_SECRET_KEY'])('%s, when it is missing with object storage', (name) => {
    expect(faultOf(S3)).toBe('taken');
    expect(faultOf({ ...S3, [name]: undefined })).toMatch(new RegExp(`^The setting ${name} is missing`));
  });

  test('SMTP_URL, when mail is to be sent', () => {
    expect(faultOf({ ...LEAST, GAPWRIGHT_MAIL: 'smtp' })).toMatch(/^The setting SMTP_URL is missing/);
  });

  test('no value of a setting stands in the message: it may be a secret', () => {
    expect(faultOf({ ...LEAST, GAPWRIGHT_SECRET: 'hunter2' })).not.toContain('hunter2');
    expect(faultOf({ ...LEAST, SMTP_URL: 'http://user:hunter2@x' })).not.toContain('hunter2');
  });
});

describe('production', () => {
  test('takes settings that are whole', () => {
    expect(readConfig(PRODUCTION)).toMatchObject({ mode: 'production', baseUrl: 'https://gaps.example' });
  });

  const example = readFileSync(path.resolve(import.meta.dirname, '../../.env.example'), 'utf8');
  const printed = /^GAPWRIGHT_SECRET=(.*)$/m.exec(example)![1];
  test.each<[string, string | undefined]>([
    ['GAPWRIGHT_SECRET', undefined],
    ['GAPWRIGHT_SECRET', printed],
    ['BASE_URL', undefined],
    ['GAPWRIGHT_MAIL', 'shelf'],
    ['GAPWRIGHT_MAIL', undefined],
  ])('refuses %s=%s', (name, value) => {
    expect(faultOf({ ...PRODUCTION, [name]: value })).toMatch(new RegExp(`^The setting ${name} must be`));
  });
});

test('.env.example lists every setting that the server reads, and its defaults are taken', () => {
  const text = readFileSync(path.resolve(import.meta.dirname, '../../.env.example'), 'utf8');
  const source = readFileSync(path.resolve(import.meta.dirname, '../../server/config.ts'), 'utf8');
  const listed = Object.fromEntries([...text.matchAll(/^([A-Z0-9_]+)=(.*)$/gm)].map((m) => [m[1]!, m[2]!]));
  const read = [...source.matchAll(/^ {2}([A-Z][A-Z0-9_]+):/gm)].map((m) => m[1]!);
  expect(read.length).toBeGreaterThan(20);
  for (const name of read) expect(Object.keys(listed)).toContain(name);
  expect(readConfig({ ...listed, ...LEAST })).toEqual(readConfig(LEAST));
});
