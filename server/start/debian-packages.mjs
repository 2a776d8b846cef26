import { findProgram } from './find-program.mjs';
import { say, step } from './progress.mjs';
import { lastLines, runProgram } from './run-program.mjs';
import { StartFailure } from './start-failure.mjs';

/** Waits for another installation to finish instead of failing at once. */
const OPTIONS = ['-y', '--no-install-recommends', '-o', 'DPkg::Lock::Timeout=120'];
const ENVIRONMENT = { DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C' };

/**
 * Installs one package of the system with apt-get, as root or through sudo without a password. It is
 * tried without doing it first, and left alone if anything would be removed.
 * @param {string} name the package
 * @param {string} purpose what Spyhole needs it for, such as "keeps the notes"
 * @param {string} otherwise what to do instead of installing it, as the end of a sentence
 */
export async function installDebianPackage(name, purpose, otherwise) {
  const advice = `install the package ${name}${otherwise === '' ? '' : `, or ${otherwise}`}.`;
  if (findProgram('apt-get') === null) {
    throw new StartFailure(`A program is missing that ${purpose}: ${advice}`);
  }
  const elevated = await findElevation();
  if (elevated === null) {
    throw new StartFailure(
      `A program is missing that ${purpose}, and this user may not install it: ` +
        `${advice} (sudo apt-get install ${name})`,
    );
  }
  if (!(await hasCandidate(name))) {
    const { code, output } = await step("Reading Debian's list of packages", () =>
      apt(elevated, ['update']),
    );
    if (code !== 0) throw aptFailure(name, output, advice);
  }
  await refuseRemovals(name, advice);
  say(`  Installing Debian's package ${name}, which ${purpose}.`);
  let result = await step(`Installing ${name}`, () => apt(elevated, ['install', ...OPTIONS, name]));
  if (result.code !== 0) {
    // An old list names files that the mirror no longer has.
    await step("Reading Debian's list of packages", () => apt(elevated, ['update']));
    await refuseRemovals(name, advice);
    result = await step(`Installing ${name}`, () => apt(elevated, ['install', ...OPTIONS, name]));
  }
  if (result.code !== 0) throw aptFailure(name, result.output, advice);
}

/** @returns {Promise<string[] | null>} what to put before a command to run it as root, or null */
async function findElevation() {
  if (process.getuid?.() === 0) return [];
  const { code } = await runProgram('sudo', ['-n', 'true']);
  return code === 0 ? ['sudo', '-n'] : null;
}

/**
 * @param {string[]} elevated
 * @param {string[]} args
 */
function apt(elevated, args) {
  const assignments = Object.entries(ENVIRONMENT).map(([key, value]) => `${key}=${value}`);
  const [command, ...rest] = [...elevated, 'env', ...assignments, 'apt-get', ...args];
  return runProgram(/** @type {string} */ (command), rest);
}

/** @param {string} name */
async function hasCandidate(name) {
  const { output } = await runProgram('apt-cache', ['policy', name], { env: ENVIRONMENT });
  return /Candidate: (?!\(none\))\S/.test(output);
}

/**
 * @param {string} name
 * @param {string} advice
 */
async function refuseRemovals(name, advice) {
  const { code, output } = await apt([], ['install', '-s', ...OPTIONS, name]);
  if (code !== 0) throw aptFailure(name, output, advice);
  const removed = [...output.matchAll(/^Remv (\S+)/gm)].map((match) => match[1]);
  if (removed.length > 0) {
    throw new StartFailure(
      `Installing ${name} would remove ${removed.join(', ')}, so it was left alone: ${advice}`,
    );
  }
}

/**
 * @param {string} name
 * @param {string} output
 * @param {string} advice
 */
function aptFailure(name, output, advice) {
  return new StartFailure(`apt-get could not install ${name}: ${advice}\n${lastLines(output, 6)}`);
}
