import path from 'node:path';

/** Where the records are kept: a file, or a PostgreSQL server. */
export type StorePlace =
  | { readonly engine: 'sqlite'; readonly file: string }
  | { readonly engine: 'postgres'; readonly url: string };

/** The two settings that decide it, as the environment holds them. */
export type StoreSettings = {
  readonly WHOLETOOTH_DATA?: string | undefined;
  readonly DATABASE_URL?: string | undefined;
};

const FILE = 'wholetooth.db';

/** A database address wins over a folder; without either the records are kept in .data. */
export const storePlace = (settings: StoreSettings): StorePlace => {
  const url = settings.DATABASE_URL?.trim();
  if (url !== undefined && url !== '') {
    if (!/^postgres(ql)?:\/\//.test(url)) {
      throw new Error(
        'DATABASE_URL does not begin with postgres://. Give the address of a PostgreSQL database, or leave it out to keep the records in a file.',
      );
    }
    return { engine: 'postgres', url };
  }
  return { engine: 'sqlite', file: path.resolve(settings.WHOLETOOTH_DATA || '.data', FILE) };
};
