import { describe, expect, it } from 'vitest';

import { ConfigError, readConfig } from './config';

const PRODUCTION = {
  NODE_ENV: 'production',
  PUBLIC_URL: 'https://limen.institute.example',
  SESSION_SECRET: 'k7Zt2vQp9xWm4RsB8nLc6yHd3gFj5aTe',
};

describe('configuration', () => {
  it('has defaults that suit the demo', () => {
    expect(readConfig({})).toMatchObject({
      production: false,
      port: 4200,
      host: '127.0.0.1',
      dataDir: './data',
      publicUrl: 'http://localhost:4200',
      trustedProxies: [],
    });
  });

  it('takes the real thing', () => {
    expect(readConfig(PRODUCTION)).toMatchObject({
      production: true,
      publicUrl: 'https://limen.institute.example',
      trustedProxies: ['loopback'],
    });
  });

  it.each([
    ['no secret', { SESSION_SECRET: undefined }],
    ['a short secret', { SESSION_SECRET: 'k7Zt2vQp9xWm4RsB8nLc6yHd3gFj5aT' }],
    ['a secret of one letter', { SESSION_SECRET: 'a'.repeat(64) }],
    ['a secret that is a placeholder', { SESSION_SECRET: 'please-change-me-0123456789-abcdef' }],
    ['no public address', { PUBLIC_URL: undefined }],
    ['a public address without TLS', { PUBLIC_URL: 'http://limen.institute.example' }],
    ['a public address that is none', { PUBLIC_URL: 'javascript:alert(1)' }],
    ['a port that is none', { PORT: '99999' }],
    ['a log level that is none', { LOG_LEVEL: 'loud' }],
  ])('refuses production with %s', (_name, change) => {
    expect(() => readConfig({ ...PRODUCTION, ...change })).toThrow(ConfigError);
  });
});
