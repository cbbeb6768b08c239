import type { Kysely } from 'kysely';
import type { Columns } from './columns.ts';

/**
 * What can be found by words: the things themselves, the terms each is found by, the newest of a
 * term together, and the ways in which a term may come out with a letter missing. Ordinary tables
 * and not an engine's own search, so that both engines find the same in the same order.
 */
export const find = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('find_entry')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('kind', c.text, (col) => col.notNull())
    .addColumn('subject_id', c.text, (col) => col.notNull())
    .addColumn('code', c.text)
    .addColumn('at', c.whole, (col) => col.notNull())
    .addColumn('approved', c.whole, (col) => col.notNull())
    .addColumn('place', c.whole, (col) => col.notNull())
    .addColumn('terms', c.text, (col) => col.notNull())
    .addPrimaryKeyConstraint('find_entry_key', ['shop', 'id'])
    .addUniqueConstraint('find_entry_place', ['shop', 'place'])
    .modifyEnd(c.end)
    .execute();
  // No references here: a row is made with its entry, and there are many of them.
  await db.schema
    .createTable('find_term')
    .addColumn('shop', c.text, (col) => col.notNull())
    .addColumn('term', c.text, (col) => col.notNull())
    .addColumn('place', c.whole, (col) => col.notNull())
    .addPrimaryKeyConstraint('find_term_key', ['shop', 'term', 'place'])
    .modifyEnd(c.keyOnly)
    .execute();
  await db.schema
    .createTable('find_spelling')
    .addColumn('shop', c.text, (col) => col.notNull())
    .addColumn('spelling', c.text, (col) => col.notNull())
    .addColumn('term', c.text, (col) => col.notNull())
    .addPrimaryKeyConstraint('find_spelling_key', ['shop', 'spelling', 'term'])
    .modifyEnd(c.keyOnly)
    .execute();
};
