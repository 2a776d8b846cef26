// `npm start`: from a fresh clone to a running Spyhole. Plain JavaScript without packages, because
// the packages may not be there yet; the rest is TypeScript, run from here once they are.
import { join } from 'node:path';
import { explainSystemError } from './start-failure.mjs';
import { prepare } from './prepare.mjs';

const root = join(import.meta.dirname ?? '.', '../..');
process.chdir(root);

try {
  await prepare(root, { needsMariadb: !process.env['DATABASE_URL'] });
  const { register } = await import('tsx/esm/api');
  register();
  const { supervise } = await import('./supervise.ts');
  await supervise({ dev: process.argv.includes('--dev') });
} catch (error) {
  const reason = explainSystemError(error);
  const isOurs = reason instanceof Error && 'exitCode' in reason;
  console.error(isOurs ? `\n${reason.message}` : reason);
  process.exit(isOurs ? Number(reason.exitCode) : 1);
}
