/** How often a long step says that it is still going. */
const REMINDER_MILLISECONDS = 5_000;

/**
 * Tells the person at the terminal.
 * @param {string} line
 */
export function say(line) {
  process.stdout.write(`${line}\n`);
}

/**
 * Runs one step, telling when it is done and how long it took; a long one says that it is going on.
 * @template T
 * @param {string} label what is being done, such as "Starting the database"
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(label, work) {
  const startedAt = performance.now();
  const seconds = () => ((performance.now() - startedAt) / 1000).toFixed(1);
  const reminder = setInterval(
    () => say(`  ${label}, still at it (${seconds()} s)`),
    REMINDER_MILLISECONDS,
  );
  try {
    const result = await work();
    say(`  ${label}: done in ${seconds()} s`);
    return result;
  } finally {
    clearInterval(reminder);
  }
}
