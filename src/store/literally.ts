import { type RawBuilder, sql } from 'kysely';

/** A word or a number written into the statement itself, for conditions that an index was made for. */
export const literally = <T extends string | number>(word: T): RawBuilder<T> => sql.lit(word);
