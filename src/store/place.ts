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

/** The address of the database is none of a PostgreSQL server. It may hold a password: not shown. */
export class AddressWrong extends Error {
  constructor() {
    super('DATABASE_URL does not begin with postgres://');
    this.name = 'AddressWrong';
  }
}

/** A database address wins over a folder; without either the records are kept in .data. */
export const storePlace = (settings: StoreSettings): StorePlace => {
  const url = settings.DATABASE_URL?.trim();
  if (url !== undefined && url !== '') {
    if (!/^postgres(ql)?:\/\//u.test(url)) throw new AddressWrong();
    return { engine: 'postgres', url };
  }
  return { engine: 'sqlite', file: path.resolve(settings.WHOLETOOTH_DATA || '.data', FILE) };
};
