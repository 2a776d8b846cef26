import { ConfigError } from '../config.ts';

/** Runs a command typed by hand; what goes wrong becomes one message and a code other than 0. */
export async function runCommand(work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    const isOurs = error instanceof ConfigError || error instanceof CommandError;
    console.error(isOurs ? error.message : error);
    process.exitCode = error instanceof ConfigError ? error.exitCode : 1;
  }
}

/** A refusal in one clear sentence, shown without a trace. */
export class CommandError extends Error {
  constructor(message: string) {
    super(message);
    this.name = 'CommandError';
  }
}

/** Tells the person at the terminal. */
export function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
