import { type RawBuilder, sql } from 'kysely';

export type Engine = 'sqlite' | 'postgres';

/**
 * The three kinds of column, chosen so that both engines store and hand back the same values.
 * Text is compared byte by byte on both: a server's language must not change what comes first.
 */
export type Columns = {
  readonly text: RawBuilder<unknown>;
  readonly whole: RawBuilder<unknown>;
  readonly real: RawBuilder<unknown>;
  /** What stands after a table's closing bracket. */
  readonly end: RawBuilder<unknown>;
  /** The same for a table that is nothing but its key. */
  readonly keyOnly: RawBuilder<unknown>;
};

export const columnsOf = (engine: Engine): Columns =>
  engine === 'sqlite'
    ? {
        text: sql`text`,
        whole: sql`integer`,
        real: sql`real`,
        end: sql`strict`,
        keyOnly: sql`strict, without rowid`,
      }
    : {
        text: sql`text collate "C"`,
        whole: sql`bigint`,
        real: sql`double precision`,
        end: sql``,
        keyOnly: sql``,
      };
