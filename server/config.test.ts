import { describe, expect, test } from 'vitest';
import { configProblem, readConfig } from './config.ts';

function configOf(env: Record<string, string>) {
  const read = readConfig(env);
  if (!read.ok) throw new Error(configProblem(read.problems));
  return read.value;
}
function problemOf(env: Record<string, string>): string {
  const read = readConfig(env);
  return read.ok ? '' : configProblem(read.problems);
}

test('an empty environment gives a server on loopback with its own database', () => {
  expect(configOf({ PORT: '', DATABASE_URL: '' })).toMatchObject({
    databaseUrl: null,
    host: '127.0.0.1',
    port: 8420,
    publicUrl: null,
    trustProxy: 0,
    smtpUrl: null,
    logLevel: 'info',
  });
});

test('values are taken over; closing slashes of the site go', () => {
  const value = configOf({
    DATABASE_URL: 'postgresql://u:p@db.example:5433/bench',
    HOST: '::1',
    PORT: '0',
    DATA_DIR: '/srv/data',
    PUBLIC_URL: 'https://example.org/tools/bench//',
    SMTP_URL: 'smtps://u:p@mail.example',
  });
  expect(value).toMatchObject({
    host: '::1',
    port: 0,
    dataDir: '/srv/data',
    publicUrl: 'https://example.org/tools/bench',
    smtpUrl: 'smtps://u:p@mail.example',
  });
});

test.each([
  ['1', 1],
  ['10.0.0.0/8, loopback', ['10.0.0.0/8', 'loopback']],
  ['::1', ['::1']],
])('TRUST_PROXY %s is understood', (text, trust) => {
  expect(configOf({ TRUST_PROXY: text }).trustProxy).toEqual(trust);
});

describe('a wrong value is named with what is allowed', () => {
  test.each([
    ['PORT', '65536', /PORT is "65536": it must be a whole number from 0 to 65535/],
    ['PORT', '80.5', /PORT is "80\.5"/],
    ['PORT', '-1', /PORT is "-1"/],
    ['HOST', 'example.org', /HOST is "example\.org": it must be localhost or an IP address/],
    ['DATA_DIR', './data', /DATA_DIR is "\.\/data": it must be an absolute path/],
    ['PUBLIC_URL', 'example.org', /PUBLIC_URL is "example\.org": it must be the address people type/],
    ['PUBLIC_URL', 'https://example.org/?a=1', /PUBLIC_URL .* must have no \? or # part/],
    ['PUBLIC_URL', 'javascript:alert(1)', /PUBLIC_URL/],
    ['TRUST_PROXY', 'true', /TRUST_PROXY is "true": it must be the number of proxies/],
    ['TRUST_PROXY', '10.0.0.0/99', /TRUST_PROXY/],
    ['LOG_LEVEL', 'loud', /LOG_LEVEL is "loud": it must be one of debug, info, warn, error, silent/],
  ])('%s=%s', (name, value, words) => {
    expect(problemOf({ [name]: value })).toMatch(words);
  });

  test('secrets are never repeated, and all problems come at once', () => {
    const words = problemOf({ DATABASE_URL: 'ftp://u:hidden@x', SMTP_URL: 'http://u:hidden@x', PORT: 'x' });
    expect(words).toMatch(/DATABASE_URL must be.*SMTP_URL must be|PORT.*/);
    expect(words).toContain('SMTP_URL must be');
    expect(words).toContain('PORT is "x"');
    expect(words).not.toContain('hidden');
  });
});
