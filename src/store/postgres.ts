import {
  type Dialect,
  Kysely,
  PostgresAdapter,
  PostgresDriver,
  PostgresIntrospector,
  PostgresQueryCompiler,
} from 'kysely';
import pg from 'pg';
import { type Guards, guarded, type Watch } from './guard.ts';
import { fromPostgres } from './postgresFaults.ts';
import type { Tables } from './tables.ts';

/**
 * Limits on waiting, so that a server that hangs ends in a sentence and not in silence.
 * Judgement: each is far above what a request of this program takes on a healthy server.
 */
const CONNECT_MS = 5_000;
const LOCK_MS = 10_000;
const STATEMENT_MS = 30_000;
const IDLE_IN_TRANSACTION_MS = 30_000;

const BIGINT = 20;
const NUMERIC = 1700;

export type PostgresOptions = {
  readonly watch?: Watch | undefined;
  /** A change of form or a backup takes as long as it takes. */
  readonly unhurried?: boolean;
  readonly connections?: number | undefined;
};

export type PostgresStore = {
  readonly db: Kysely<Tables>;
  readonly close: () => Promise<void>;
};

export const openPostgres = (url: string, options: PostgresOptions = {}): PostgresStore => {
  const pool = newPool(url, options);
  const guards: Guards = { translate: fromPostgres, watch: options.watch };
  const db = new Kysely<Tables>({ dialect: postgresDialect(pool, guards) });
  return {
    db,
    close: async () => {
      await db.destroy();
      // What was never used the query builder does not close.
      if (!pool.ended) await pool.end();
    },
  };
};

const newPool = (url: string, options: PostgresOptions): pg.Pool => {
  const limits = options.unhurried
    ? {}
    : {
        statement_timeout: STATEMENT_MS,
        lock_timeout: LOCK_MS,
        idle_in_transaction_session_timeout: IDLE_IN_TRANSACTION_MS,
        query_timeout: STATEMENT_MS + CONNECT_MS,
      };
  const pool = new pg.Pool({
    connectionString: url,
    application_name: 'wholetooth',
    connectionTimeoutMillis: CONNECT_MS,
    keepAlive: true,
    max: options.connections ?? 10,
    types: { getTypeParser: parserOf },
    ...limits,
  });
  // A connection that is lost while nobody waits on it is replaced when the next one asks; without
  // these two the driver would end the whole process for it.
  pool.on('error', () => undefined);
  pool.on('connect', (client) => {
    client.on('error', () => undefined);
    // Queued before anything else on this connection; if it fails so does what comes after it.
    client.query(KEEP_WHAT_IS_ACKNOWLEDGED).catch(() => undefined);
  });
  return pool;
};

/** A server may be set to acknowledge before it has written. A shop's records are not for that. */
const KEEP_WHAT_IS_ACKNOWLEDGED =
  "select set_config('synchronous_commit', 'on', false) where current_setting('synchronous_commit') = 'off'";

type Parser = (text: string) => unknown;
type ParserOf = (oid: number, format?: 'text' | 'binary') => Parser;
const usualParser = pg.types.getTypeParser as ParserOf;

/** Whole numbers and sums as numbers, as the other engine gives them. */
const parserOf: ParserOf = (oid, format) =>
  format !== 'binary' && (oid === BIGINT || oid === NUMERIC)
    ? exactNumber
    : usualParser(oid, format);

const exactNumber = (text: string): number => {
  const value = Number(text);
  if (Number.isInteger(value) && !Number.isSafeInteger(value)) {
    throw new RangeError(`${text} is too large to be kept exactly`);
  }
  return value;
};

const postgresDialect = (pool: pg.Pool, guards: Guards): Dialect => ({
  createAdapter: () => new PostgresAdapter(),
  createDriver: () => guarded(new PostgresDriver({ pool }), guards),
  createIntrospector: (db: Kysely<unknown>) => new PostgresIntrospector(db),
  createQueryCompiler: () => new PostgresQueryCompiler(),
});
