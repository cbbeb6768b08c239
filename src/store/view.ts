import type { Kysely } from 'kysely';
import type { Tables } from './tables.ts';

/** What can be asked of the records. */
export type Reader = Pick<Kysely<Tables>, 'selectFrom' | 'with'>;

/** The records as they were at one moment, for as long as they are looked at. */
export type View = { readonly db: Reader; readonly close: () => Promise<void> };

export const openView = async (
  db: Kysely<Tables>,
  after: () => void = () => undefined,
  kind: (
    begin: ReturnType<Kysely<Tables>['startTransaction']>,
  ) => ReturnType<Kysely<Tables>['startTransaction']> = (begin) => begin,
): Promise<View> => {
  const open = await kind(db.startTransaction()).execute();
  return {
    db: open,
    close: async () => {
      try {
        await open.rollback().execute();
      } finally {
        after();
      }
    },
  };
};
