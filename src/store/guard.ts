import type {
  CompiledQuery,
  DatabaseConnection,
  Driver,
  QueryResult,
  TransactionSettings,
} from 'kysely';

/** Sees every statement before it runs; what it throws becomes that statement's fault. */
export type Watch = (statement: string) => void;

export type Guards = {
  /** Makes one of our own faults of what a driver throws. */
  readonly translate: (error: unknown) => unknown;
  readonly watch?: Watch | undefined;
};

/**
 * A driver whose faults are ours. Nothing a database says in its own words gets past here, so no
 * caller can ever show it to a person.
 */
export const guarded = (driver: Driver, { translate, watch }: Guards): Driver => {
  const watched = async <T>(statement: string, run: () => Promise<T>): Promise<T> => {
    try {
      watch?.(statement);
      return await run();
    } catch (error) {
      throw translate(error);
    }
  };
  return {
    init: () => watched('init', () => driver.init()),
    acquireConnection: async () =>
      new GuardedConnection(await watched('connect', () => driver.acquireConnection()), watched),
    beginTransaction: (connection, settings: TransactionSettings) =>
      watched('begin', () => driver.beginTransaction(inner(connection), settings)),
    commitTransaction: (connection) =>
      watched('commit', () => driver.commitTransaction(inner(connection))),
    rollbackTransaction: async (connection) => {
      // What made the transaction fail is what the caller must hear of. A connection on which even
      // this fails is thrown away by its driver, and the database then takes the change back itself.
      await driver.rollbackTransaction(inner(connection)).catch(() => undefined);
    },
    releaseConnection: (connection) => driver.releaseConnection(inner(connection)),
    destroy: () => driver.destroy(),
  };
};

type Watched = <T>(statement: string, run: () => Promise<T>) => Promise<T>;

class GuardedConnection implements DatabaseConnection {
  readonly inner: DatabaseConnection;
  readonly #watched: Watched;

  constructor(connection: DatabaseConnection, watched: Watched) {
    this.inner = connection;
    this.#watched = watched;
  }

  executeQuery<R>(query: CompiledQuery): Promise<QueryResult<R>> {
    return this.#watched(query.sql, () => this.inner.executeQuery<R>(query));
  }

  streamQuery<R>(): AsyncIterableIterator<QueryResult<R>> {
    throw new Error('Rows are read in portions by their key, not streamed.');
  }
}

const inner = (connection: DatabaseConnection): DatabaseConnection =>
  connection instanceof GuardedConnection ? connection.inner : connection;
