import 'server-only';

/** Deadlock, lock wait timeout, snapshot too old, node not ready (Galera): the transaction may simply be run again. */
const RETRY_ERRNOS: ReadonlySet<number> = new Set([1213, 1205, 1020, 1047]);

/** Too many connections, server shutting down, connection killed, disk or table full, read-only. */
const UNAVAILABLE_ERRNOS: ReadonlySet<number> = new Set([1040, 1053, 1226, 1927, 1021, 1114, 1290, 1836, 3024, 1969]);

/** No connection could be had at all: nothing has begun, so asking again at once would only queue up. */
const NO_CONNECTION = /^SequelizeConnection|^SequelizeHostNotFound/;

/** The connection broke while it was in use. */
const LOST_CODES: ReadonlySet<string> = new Set([
  'ECONNRESET',
  'EPIPE',
  'ER_CMD_CONNECTION_CLOSED',
  'ER_SOCKET_UNEXPECTED_CLOSE',
  'ER_CONNECTION_ALREADY_CLOSED',
  'ER_SOCKET_TIMEOUT',
  'ER_UNEXPECTED_PACKET',
]);

/** The error the connector reported, beneath Sequelize's wrapping. */
function causeOf(error: Error): object {
  for (const key of ['parent', 'original']) {
    const cause: unknown = Reflect.get(error, key);
    if (cause && typeof cause === 'object') return cause;
  }
  return error;
}

/** MariaDB's number of a database error, or null. */
export function errnoOf(error: unknown): number | null {
  if (!(error instanceof Error)) return null;
  const errno: unknown = Reflect.get(causeOf(error), 'errno');
  return typeof errno === 'number' ? errno : null;
}

function isConnectionLost(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  const code: unknown = Reflect.get(causeOf(error), 'code');
  return typeof code === 'string' && LOST_CODES.has(code);
}

/** Is it worth running the whole transaction again? */
export function isRetryable(error: unknown): boolean {
  const errno = errnoOf(error);
  return (errno !== null && RETRY_ERRNOS.has(errno)) || isConnectionLost(error);
}

/** Is the database away or full, so that the client should come back later? */
export function isUnavailable(error: unknown): boolean {
  const errno = errnoOf(error);
  if (isRetryable(error) || (errno !== null && UNAVAILABLE_ERRNOS.has(errno))) return true;
  return error instanceof Error && NO_CONNECTION.test(error.name);
}

/** Did a row with this key exist already? */
export function isDuplicateKey(error: unknown): boolean {
  return errnoOf(error) === 1062;
}
