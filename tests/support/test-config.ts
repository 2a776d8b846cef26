import { type Config, readConfig } from '../../server/config.ts';

/** Settings for tests and tools: nothing they name is there unless the caller says so. */
export function testConfig(overrides: Partial<Config> = {}): Config {
  const config = readConfig({
    NODE_ENV: 'test',
    PUBLIC_URL: 'http://127.0.0.1',
    // The application is given its database; these are never opened unless a test says so.
    DATABASE_URL: 'mysql://nobody@127.0.0.1:1/none',
    MEILI_URL: 'http://127.0.0.1:1',
    SMTP_URL: 'smtp://127.0.0.1:1',
    SESSION_SECRET: 'a-secret-for-tests-only-0123456789abcdef',
    LOG_LEVEL: 'info',
  });
  return { ...config, ...overrides };
}
