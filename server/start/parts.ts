import { lastLines } from './run-program.mjs';
import { readLog, type Ending } from './processes.ts';
import { StartFailure } from './start-failure.mjs';

/** Something that was started and must be stopped again. */
export interface Part {
  name: string;
  /** Lower ones are stopped first; equal ones together. */
  stopOrder: number;
  stop: () => Promise<void>;
  /** Ends when the part ends; null for one that lives in this process. */
  ended: Promise<Ending> | null;
  logPath?: string;
  /** True for a part that does its work and ends, such as the build. */
  isTask?: boolean;
}

/** Everything started so far, and the first reason to stop it all. */
export interface Parts {
  /** Takes note of a part. When a stop is under way already, the part is stopped at once. */
  add: (part: Part) => Promise<void>;
  /** Stops all, in order. */
  stopAll: () => Promise<void>;
  /** Settles with the failure of the first part that ends by itself. */
  failure: Promise<StartFailure>;
  isStopping: () => boolean;
}

/** Keeps account of the parts of a running Spyhole. */
export function keepParts(): Parts {
  const parts: Part[] = [];
  let stopping: Promise<void> | null = null;
  let fail: (failure: StartFailure) => void = () => undefined;
  const failure = new Promise<StartFailure>((resolve) => (fail = resolve));

  const stopInOrder = async (): Promise<void> => {
    const orders = [...new Set(parts.map((part) => part.stopOrder))].sort((a, b) => a - b);
    for (const order of orders) {
      const together = parts.filter((part) => part.stopOrder === order);
      await Promise.all(together.map((part) => part.stop()));
    }
  };

  return {
    failure,
    isStopping: () => stopping !== null,
    async add(part) {
      parts.push(part);
      if (stopping !== null) {
        await part.stop();
        return;
      }
      if (part.isTask === true) return;
      part.ended?.then(
        (ending) => {
          if (stopping === null) fail(describeEnd(part, ending));
        },
        (error: unknown) =>
          fail(new StartFailure(`The ${part.name} did not start: ${String(error)}`)),
      );
    },
    stopAll() {
      stopping ??= stopInOrder();
      return stopping;
    },
  };
}

function describeEnd(part: Part, ending: Ending): StartFailure {
  const how = ending.signal === null ? `code ${ending.code}` : `signal ${ending.signal}`;
  const log = part.logPath === undefined ? '' : lastLines(readLog(part.logPath), 8);
  const tail = log === '' ? '' : ` The end of ${part.logPath}:\n${log}`;
  return new StartFailure(`The ${part.name} has ended (${how}), so Spyhole stops.${tail}`);
}
