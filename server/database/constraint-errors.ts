/** What the driver tells about a refused statement. */
interface DatabaseError {
  code?: string;
  errno?: number;
  sqlMessage?: string;
}

/** MariaDB's numbers for errors after which the whole transaction may simply be tried again. */
const CONTENTION = new Set([
  1213, // deadlock
  1205, // waited too long for a lock
  1020, // the row has changed since it was read
]);

/** The driver's and the pool's words for a database that is gone, or does not answer in time. */
const UNREACHABLE = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ETIMEDOUT',
  'EHOSTUNREACH',
  'ENOTFOUND',
  'PROTOCOL_CONNECTION_LOST',
  'PROTOCOL_SEQUENCE_TIMEOUT',
]);

/** The server's own numbers for the same. The driver does not know MariaDB's names for all of them. */
const UNREACHABLE_NUMBERS = new Set([
  1021, // the disk is full
  1040, // too many connections
  1053, // the server is shutting down
  1114, // the table is full
  1927, // the connection was killed
  1969, // the statement took longer than max_statement_time
]);

/** True when a row was refused because it is already in the unique index `indexName`. */
export function isDuplicate(error: unknown, indexName: string): boolean {
  const { code, sqlMessage } = asDatabaseError(error);
  if (code !== 'ER_DUP_ENTRY' || sqlMessage === undefined) return false;
  // "Duplicate entry '...' for key 'name'": the entry is the user's text and may contain anything,
  // so only the end of the message counts. Some servers put the table before the name.
  const name = /for key '(?:[^']*\.)?([^'.]+)'$/.exec(sqlMessage)?.[1];
  return name === indexName;
}

/** True when trying the whole transaction again is the right answer. */
export function isContention(error: unknown): boolean {
  const { errno } = asDatabaseError(error);
  return errno !== undefined && CONTENTION.has(errno);
}

/** True when the database is not there, is overloaded or has no room: an answer for 503. */
export function isUnreachable(error: unknown): boolean {
  if (error instanceof Error && error.name === 'KnexTimeoutError') return true;
  const { code, errno } = asDatabaseError(error);
  if (errno !== undefined && UNREACHABLE_NUMBERS.has(errno)) return true;
  return code !== undefined && UNREACHABLE.has(code);
}

function asDatabaseError(error: unknown): DatabaseError {
  return typeof error === 'object' && error !== null ? error : {};
}
