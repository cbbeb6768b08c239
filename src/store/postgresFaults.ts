import { Collision, codeOf, StoreUnavailable, type UnavailableReason } from './faults.ts';

/** PostgreSQL's SQLSTATE codes. Source: PostgreSQL documentation, appendix A, "Error Codes". */
const REASONS: Readonly<Record<string, UnavailableReason>> = {
  '25006': 'readOnly', // read_only_sql_transaction
  '42501': 'readOnly', // insufficient_privilege
  '53100': 'full', // disk_full
  '53200': 'full', // out_of_memory
  '53300': 'busy', // too_many_connections
  '55P03': 'busy', // lock_not_available
  '57014': 'busy', // query_canceled, by the time limit
  '25P03': 'gone', // idle_in_transaction_session_timeout
  '57P01': 'gone', // admin_shutdown
  '57P02': 'gone', // crash_shutdown
  '57P03': 'gone', // cannot_connect_now
  '58030': 'gone', // io_error
  '55000': 'gone', // object_not_in_prerequisite_state: a database that takes no connections
  '3D000': 'gone', // invalid_catalog_name
  '28P01': 'gone', // invalid_password
  '28000': 'gone', // invalid_authorization_specification
  XX001: 'gone', // data_corrupted
};

/** unique_violation, serialization_failure, deadlock_detected. */
const COLLISIONS = new Set(['23505', '40001', '40P01']);

/** Below the protocol: what the operating system says of a connection. */
const NETWORK = new Set([
  ...['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT', 'ENOTFOUND', 'EAI_AGAIN', 'ENOENT'],
  ...['EHOSTUNREACH', 'ENETUNREACH', 'EACCES'],
]);

/** The driver reports a lost or slow connection in words only. */
const LOST =
  /connection terminated|connection error|connection timeout|timeout exceeded|query read timeout|not queryable|connection is closed|been discarded|after calling end/i;

/** A driver's error as ours; what is neither is a fault of the program and passes unchanged. */
export const fromPostgres = (error: unknown): unknown => {
  const code = codeOf(error);
  if (COLLISIONS.has(code)) return new Collision(error);
  const reason = REASONS[code];
  if (reason !== undefined) return new StoreUnavailable(reason, error);
  const lost = code.startsWith('08') || NETWORK.has(code) || isLost(error);
  return lost ? new StoreUnavailable('gone', error) : error;
};

const isLost = (error: unknown): boolean => {
  // Several addresses of one host were tried, and each refused.
  if (error instanceof AggregateError) return error.errors.some((e) => NETWORK.has(codeOf(e)));
  return error instanceof Error && codeOf(error) === '' && LOST.test(error.message);
};
