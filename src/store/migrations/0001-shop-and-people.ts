import type { Kysely } from 'kysely';
import type { Columns } from './columns.ts';

/** Shops, what they have set, and who works in them. */
export const shopAndPeople = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('shop')
    .addColumn('id', c.text, (col) => col.primaryKey().notNull())
    .addColumn('platform', c.text, (col) => col.notNull())
    .addColumn('outside', c.text, (col) => col.notNull())
    .addColumn('name', c.text, (col) => col.notNull())
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addUniqueConstraint('shop_outside', ['platform', 'outside'])
    .modifyEnd(c.end)
    .execute();
  await db.schema
    .createTable('setting')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('name', c.text, (col) => col.notNull())
    .addColumn('value', c.text, (col) => col.notNull())
    .addColumn('changed_at', c.whole, (col) => col.notNull())
    .addColumn('changed_by', c.text, (col) => col.notNull())
    .addPrimaryKeyConstraint('setting_key', ['shop', 'name'])
    .modifyEnd(c.end)
    .execute();
  await people(db, c);
  await groups(db, c);
};

const people = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('person')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('outside', c.text, (col) => col.notNull())
    .addColumn('name', c.text, (col) => col.notNull())
    .addColumn('name_key', c.text, (col) => col.notNull())
    .addColumn('role', c.text, (col) => col.notNull())
    .addColumn('version', c.whole, (col) => col.notNull())
    .addColumn('met_at', c.whole, (col) => col.notNull())
    .addColumn('removed_at', c.whole)
    .addPrimaryKeyConstraint('person_key', ['shop', 'id'])
    .addUniqueConstraint('person_outside', ['shop', 'outside'])
    .modifyEnd(c.end)
    .execute();
  await db.schema.createIndex('person_name').on('person').columns(['shop', 'name_key']).execute();
};

const groups = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('person_group')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('outside', c.text, (col) => col.notNull())
    .addColumn('name', c.text, (col) => col.notNull())
    .addColumn('name_key', c.text, (col) => col.notNull())
    .addColumn('role', c.text, (col) => col.notNull())
    .addColumn('version', c.whole, (col) => col.notNull())
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addColumn('removed_at', c.whole)
    .addPrimaryKeyConstraint('person_group_key', ['shop', 'id'])
    .addUniqueConstraint('person_group_outside', ['shop', 'outside'])
    .modifyEnd(c.end)
    .execute();
};
