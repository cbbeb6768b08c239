import { type RawBuilder, sql } from 'kysely';

/** A word written into the statement itself, for conditions that an index was made for. */
export const literally = <T extends string>(word: T): RawBuilder<T> => sql.lit(word);
