import { type Kysely, sql } from 'kysely';
import type { Columns } from './columns.ts';

/** How it went, part by part, and what was learned of the growth from it. */
export const results = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await result(db, c);
  await growth(db, c);
};

const result = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('result')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('number', c.whole, (col) => col.notNull())
    .addColumn('card', c.text, (col) => col.notNull())
    .addColumn('wheel', c.text)
    .addColumn('base', c.text)
    .addColumn('version', c.whole, (col) => col.notNull())
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addColumn('made_by', c.text, (col) => col.notNull())
    .addColumn('changed_at', c.whole, (col) => col.notNull())
    .addColumn('changed_by', c.text, (col) => col.notNull())
    .addColumn('withdrawn_at', c.whole)
    .addColumn('withdrawn_by', c.text)
    .addColumn('outcome', c.text, (col) => col.notNull())
    .addColumn('symptom', c.text)
    .addColumn('teeth', c.whole)
    .addColumn('blank', c.real)
    .addColumn('crest', c.real)
    .addColumn('tooth_height', c.real)
    .addColumn('flat', c.real)
    .addColumn('parts_run', c.whole, (col) => col.notNull())
    .addColumn('cause', c.text)
    .addColumn('note', c.text)
    .addColumn('family', c.text)
    .addColumn('share', c.real)
    .addColumn('learned', c.whole, (col) => col.notNull())
    .addColumn('confirmed_at', c.whole)
    .addColumn('confirmed_by', c.text)
    .addPrimaryKeyConstraint('result_key', ['shop', 'id'])
    .addUniqueConstraint('result_number', ['shop', 'number'])
    .addForeignKeyConstraint('result_card', ['shop', 'card'], 'card', ['shop', 'id'])
    .addForeignKeyConstraint('result_wheel', ['shop', 'wheel'], 'wheel', ['shop', 'id'])
    .addForeignKeyConstraint('result_made_by', ['shop', 'made_by'], 'person', ['shop', 'id'])
    .modifyEnd(c.end)
    .execute();
  for (const column of ['card', 'wheel']) {
    await db.schema
      .createIndex(`result_by_${column}`)
      .on('result')
      .columns(['shop', column, 'id'])
      .where(sql.ref(column), 'is not', null)
      .execute();
  }
  await db.schema
    .createIndex('result_causes')
    .on('result')
    .columns(['shop', 'symptom', 'cause'])
    .where(sql.ref('cause'), 'is not', null)
    .execute();
  // Few ever wait: what speaks of growth, stands, and is not learned from.
  await db.schema
    .createIndex('result_doubted')
    .on('result')
    .columns(['shop', 'id'])
    .where(sql<boolean>`family is not null and withdrawn_at is null and learned = 0`)
    .execute();
};

/** What the learned results of each family add up to, so that a set-up does not read them all. */
const growth = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('growth')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('family', c.text, (col) => col.notNull())
    .addColumn('count', c.whole, (col) => col.notNull())
    .addColumn('sum', c.real, (col) => col.notNull())
    .addColumn('first', c.text, (col) => col.notNull())
    .addPrimaryKeyConstraint('growth_key', ['shop', 'family'])
    .modifyEnd(c.end)
    .execute();
};
