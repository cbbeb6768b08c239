import { type Kysely, sql } from 'kysely';
import type { Columns } from './columns.ts';

/** What a shop has decided to be its way of making a part, revision by revision. */
export const standards = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('standard')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('part', c.text, (col) => col.notNull())
    .addColumn('part_key', c.text, (col) => col.notNull())
    .addColumn('version', c.whole, (col) => col.notNull())
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addColumn('made_by', c.text, (col) => col.notNull())
    .addColumn('changed_at', c.whole, (col) => col.notNull())
    .addColumn('changed_by', c.text, (col) => col.notNull())
    .addPrimaryKeyConstraint('standard_key', ['shop', 'id'])
    .addUniqueConstraint('standard_part', ['shop', 'part_key'])
    .modifyEnd(c.end)
    .execute();
  await db.schema
    .createIndex('standard_changed')
    .on('standard')
    .columns(['shop', 'changed_at', 'id'])
    .execute();
  await revisions(db, c);
};

const revisions = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('standard_revision')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('standard', c.text, (col) => col.notNull())
    .addColumn('number', c.whole, (col) => col.notNull())
    .addColumn('state', c.text, (col) => col.notNull())
    .addColumn('card', c.text, (col) => col.notNull())
    .addColumn('pattern', c.text, (col) => col.notNull())
    .addColumn('base', c.text, (col) => col.notNull())
    .addColumn('scope', c.text, (col) => col.notNull())
    .addColumn('basis', c.text)
    .addColumn('why', c.text)
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addColumn('made_by', c.text, (col) => col.notNull())
    .addColumn('proposed_at', c.whole)
    .addColumn('proposed_by', c.text)
    .addColumn('approved_at', c.whole)
    .addColumn('approved_by', c.text)
    .addColumn('review_at', c.whole)
    .addColumn('ended_at', c.whole)
    .addColumn('ended_by', c.text)
    .addColumn('ended_why', c.text)
    .addPrimaryKeyConstraint('standard_revision_key', ['shop', 'id'])
    .addUniqueConstraint('standard_revision_number', ['shop', 'standard', 'number'])
    .addForeignKeyConstraint('standard_revision_of', ['shop', 'standard'], 'standard', [
      'shop',
      'id',
    ])
    .addForeignKeyConstraint('standard_revision_card', ['shop', 'card'], 'card', ['shop', 'id'])
    .modifyEnd(c.end)
    .execute();
  // Whatever is done at the same moment, a part never has two approved revisions.
  await db.schema
    .createIndex('standard_revision_approved')
    .unique()
    .on('standard_revision')
    .columns(['shop', 'standard'])
    .where(sql.ref('state'), '=', sql.lit('approved'))
    .execute();
  await db.schema
    .createIndex('standard_revision_covers')
    .on('standard_revision')
    .columns(['shop', 'base', 'pattern', 'id'])
    .where(sql.ref('state'), '=', sql.lit('approved'))
    .execute();
};
