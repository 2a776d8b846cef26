import { pino, type Logger } from 'pino';
import type { Config } from './config.ts';

/** One JSON line an event, times in UTC. What is secret by its name never gets into a line. */
export function createLog(config: Pick<Config, 'logLevel'>): Logger {
  return pino({
    level: config.logLevel,
    base: null,
    timestamp: () => `,"at":"${new Date().toISOString()}"`,
    redact: {
      paths: SECRET_NAMES.flatMap((name) => [name, `*.${name}`, `*.*.${name}`]),
      censor: '[kept out]',
    },
  });
}

const SECRET_NAMES = ['password', 'newPassword', 'token', 'cookie', 'authorization', 'secret'];
