import { Collision, codeOf, StoreUnavailable, type UnavailableReason } from './faults.ts';

/**
 * SQLite's result codes by their beginnings; extended codes (SQLITE_IOERR_WRITE …) begin alike.
 * Source: SQLite documentation, "Result and Error Codes".
 */
const REASONS: readonly (readonly [beginning: string, reason: UnavailableReason])[] = [
  ['SQLITE_BUSY', 'busy'],
  ['SQLITE_LOCKED', 'busy'],
  ['SQLITE_PROTOCOL', 'busy'],
  ['SQLITE_READONLY_DBMOVED', 'gone'],
  ['SQLITE_READONLY', 'readOnly'],
  ['SQLITE_PERM', 'readOnly'],
  ['SQLITE_FULL', 'full'],
  ['SQLITE_IOERR', 'gone'],
  ['SQLITE_CANTOPEN', 'gone'],
  ['SQLITE_NOTADB', 'gone'],
  ['SQLITE_CORRUPT', 'gone'],
  ['SQLITE_NOMEM', 'gone'],
];

const UNIQUE = new Set(['SQLITE_CONSTRAINT_UNIQUE', 'SQLITE_CONSTRAINT_PRIMARYKEY']);

/** The driver's own word for a connection that was closed under a waiting request. */
const isClosed = (error: unknown): boolean =>
  error instanceof TypeError && error.message.includes('connection is not open');

/** A driver's error as ours; what is neither is a fault of the program and passes unchanged. */
export const fromSqlite = (error: unknown): unknown => {
  const code = codeOf(error);
  if (UNIQUE.has(code)) return new Collision(error);
  const reason = REASONS.find(([beginning]) => code.startsWith(beginning))?.[1];
  if (reason !== undefined) return new StoreUnavailable(reason, error);
  return isClosed(error) ? new StoreUnavailable('gone', error) : error;
};
