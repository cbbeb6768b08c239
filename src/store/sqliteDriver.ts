import type Database from 'better-sqlite3';
import {
  CompiledQuery,
  type DatabaseConnection,
  type Dialect,
  type Driver,
  type Kysely,
  type QueryResult,
  SqliteAdapter,
  SqliteIntrospector,
  SqliteQueryCompiler,
} from 'kysely';
import { type Guards, guarded } from './guard.ts';
import { patiently } from './patience.ts';

export type SqliteUse = {
  readonly db: Database.Database;
  /** How a transaction begins: one that will write takes the lock at once, and cannot lose it. */
  readonly begin: 'begin' | 'begin immediate';
  readonly waitMs?: number | undefined;
  /** Throws when the file is no longer the one that was opened. */
  readonly stillThere: () => void;
};

/** SQLite for the query builder: one connection, used by one at a time, waiting without blocking. */
export const sqliteDialect = (use: SqliteUse, guards: Guards): Dialect => ({
  createAdapter: () => new TransactionalSqlite(),
  createDriver: () => guarded(new SqliteDriver(use, guards.translate), guards),
  createIntrospector: (db: Kysely<unknown>) => new SqliteIntrospector(db),
  createQueryCompiler: () => new SqliteQueryCompiler(),
});

/** SQLite can change its form inside a transaction, so that a step is made whole or not at all. */
class TransactionalSqlite extends SqliteAdapter {
  override get supportsTransactionalDdl(): boolean {
    return true;
  }
}

class SqliteDriver implements Driver {
  readonly #use: SqliteUse;
  readonly #connection: SqliteConnection;
  #last: Promise<void> = Promise.resolve();
  #release: () => void = () => undefined;

  constructor(use: SqliteUse, translate: Guards['translate']) {
    this.#use = use;
    this.#connection = new SqliteConnection(use, translate);
  }

  init(): Promise<void> {
    return Promise.resolve();
  }

  /** In the order of asking: each waits for the one before it. */
  async acquireConnection(): Promise<DatabaseConnection> {
    const before = this.#last;
    let release = (): void => undefined;
    this.#last = new Promise((resolve) => {
      release = resolve;
    });
    await before;
    this.#release = release;
    try {
      this.#use.stillThere();
    } catch (error) {
      release();
      throw error;
    }
    return this.#connection;
  }

  async beginTransaction(connection: DatabaseConnection): Promise<void> {
    await connection.executeQuery(CompiledQuery.raw(this.#use.begin));
  }

  async commitTransaction(connection: DatabaseConnection): Promise<void> {
    await connection.executeQuery(CompiledQuery.raw('commit'));
  }

  async rollbackTransaction(connection: DatabaseConnection): Promise<void> {
    // A full disk or a failed write has already taken the whole change back.
    if (!this.#use.db.inTransaction) return;
    await connection.executeQuery(CompiledQuery.raw('rollback'));
  }

  releaseConnection(): Promise<void> {
    this.#release();
    return Promise.resolve();
  }

  /** Who opened the file closes it. */
  destroy(): Promise<void> {
    return Promise.resolve();
  }
}

class SqliteConnection implements DatabaseConnection {
  readonly #use: SqliteUse;
  readonly #translate: Guards['translate'];

  constructor(use: SqliteUse, translate: Guards['translate']) {
    this.#use = use;
    this.#translate = translate;
  }

  executeQuery<R>(query: CompiledQuery): Promise<QueryResult<R>> {
    const attempt = (): QueryResult<R> => {
      try {
        return this.#run<R>(query);
      } catch (error) {
        throw this.#translate(error);
      }
    };
    return patiently(attempt, this.#use.waitMs);
  }

  #run<R>({ sql, parameters }: CompiledQuery): QueryResult<R> {
    const statement = this.#use.db.prepare<unknown[], R>(sql);
    if (statement.reader) return { rows: statement.all(...parameters) };
    const { changes } = statement.run(...parameters);
    return { rows: [], numAffectedRows: BigInt(changes) };
  }

  streamQuery<R>(): AsyncIterableIterator<QueryResult<R>> {
    throw new Error('Rows are read in portions by their key, not streamed.');
  }
}
