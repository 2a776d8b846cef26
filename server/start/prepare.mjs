import { findMariadbd } from './find-program.mjs';
import { installDebianPackage } from './debian-packages.mjs';
import { installPackages } from './install-packages.mjs';
import { StartFailure } from './start-failure.mjs';

/** The oldest version of Node that the tools run on. */
const NODE_NEEDED = [20, 19];

/**
 * Everything that must be there before any TypeScript can run: Node, the npm packages, and MariaDB
 * unless somebody else's is used.
 * @param {string} root the project's folder
 * @param {{ needsMariadb: boolean }} needs
 */
export async function prepare(root, needs) {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const [neededMajor = 0, neededMinor = 0] = NODE_NEEDED;
  if (major < neededMajor || (major === neededMajor && minor < neededMinor)) {
    throw new StartFailure(
      `Spyhole needs Node ${NODE_NEEDED.join('.')} or later; this is ${process.versions.node}.`,
    );
  }
  await installPackages(root);
  if (needs.needsMariadb && findMariadbd() === null) {
    await installDebianPackage(
      'mariadb-server-core',
      'keeps the notes',
      'set DATABASE_URL to a MariaDB of yours',
    );
  }
}
