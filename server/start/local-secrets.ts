import { randomBytes } from 'node:crypto';
import { readJsonFile, writePrivateJson } from './private-files.ts';

/** Secrets made on the first start and kept, so that a restart signs nobody out. */
export interface LocalSecrets {
  sessionSecret: string;
  engineKey: string;
}

/** Reads the secrets, making those that are missing. Only the owner can read the file. */
export function readLocalSecrets(path: string): LocalSecrets {
  const kept = readJsonFile(path) as Partial<LocalSecrets> | null;
  if (kept?.sessionSecret && kept.engineKey) {
    return { sessionSecret: kept.sessionSecret, engineKey: kept.engineKey };
  }
  const secrets = {
    sessionSecret: kept?.sessionSecret ?? randomBytes(32).toString('hex'),
    engineKey: kept?.engineKey ?? randomBytes(32).toString('hex'),
  };
  writePrivateJson(path, secrets);
  return secrets;
}
