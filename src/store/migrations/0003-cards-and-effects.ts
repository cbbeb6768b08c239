import { type Kysely, sql } from 'kysely';
import type { Columns } from './columns.ts';

/** Cards, what happened because of them, and what was changed by whom. */
export const cardsAndEffects = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await cards(db, c);
  await interactions(db, c);
  await effects(db, c);
  await history(db, c);
};

const cards = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('card')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('code', c.text, (col) => col.notNull())
    .addColumn('kind', c.text, (col) => col.notNull())
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addColumn('made_by', c.text, (col) => col.notNull())
    .addColumn('place', c.text, (col) => col.notNull())
    .addColumn('words', c.text, (col) => col.notNull())
    .addColumn('request', c.text, (col) => col.notNull())
    .addColumn('figures', c.text, (col) => col.notNull())
    .addColumn('card', c.text, (col) => col.notNull())
    .addColumn('program', c.text, (col) => col.notNull())
    .addColumn('wheel', c.text)
    .addColumn('machine', c.text)
    .addColumn('material', c.text)
    .addPrimaryKeyConstraint('card_key', ['shop', 'id'])
    .addUniqueConstraint('card_code', ['shop', 'code'])
    .addForeignKeyConstraint('card_made_by', ['shop', 'made_by'], 'person', ['shop', 'id'])
    .addForeignKeyConstraint('card_wheel', ['shop', 'wheel'], 'wheel', ['shop', 'id'])
    .addForeignKeyConstraint('card_machine', ['shop', 'machine'], 'machine', ['shop', 'id'])
    .addForeignKeyConstraint('card_material', ['shop', 'material'], 'material', ['shop', 'id'])
    .modifyEnd(c.end)
    .execute();
  // An id begins with its moment: the last of an index is the newest.
  const newestOf = async (column: string) => {
    await db.schema
      .createIndex(`card_by_${column}`)
      .on('card')
      .columns(['shop', column, 'id'])
      .where(sql.ref(column), 'is not', null)
      .execute();
  };
  for (const column of ['made_by', 'wheel', 'machine', 'material']) await newestOf(column);
  await db.schema
    .createIndex('card_in_place')
    .on('card')
    .columns(['shop', 'place', 'made_by', 'id'])
    .execute();
};

const interactions = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('interaction')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('at', c.whole, (col) => col.notNull())
    .addColumn('answer', c.text)
    .addPrimaryKeyConstraint('interaction_key', ['shop', 'id'])
    .modifyEnd(c.end)
    .execute();
  await db.schema.createIndex('interaction_at').on('interaction').column('at').execute();
};

const effects = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('effect')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('key', c.text, (col) => col.notNull())
    .addColumn('effect', c.text, (col) => col.notNull())
    .addColumn('state', c.text, (col) => col.notNull())
    .addColumn('after', c.text)
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addColumn('due_at', c.whole, (col) => col.notNull())
    .addColumn('attempts', c.whole, (col) => col.notNull())
    .addColumn('first_at', c.whole)
    .addColumn('worker', c.text)
    .addColumn('delivered_at', c.whole)
    .addColumn('given_up_at', c.whole)
    .addColumn('seen_at', c.whole)
    .addColumn('last_fault', c.text)
    .addColumn('outcome', c.text)
    .addPrimaryKeyConstraint('effect_id', ['shop', 'id'])
    .addUniqueConstraint('effect_key', ['shop', 'key'])
    .modifyEnd(c.end)
    .execute();
  await db.schema
    .createIndex('effect_due')
    .on('effect')
    .columns(['due_at', 'id'])
    .where(sql.ref('state'), '=', sql.lit('waiting'))
    .execute();
  await db.schema
    .createIndex('effect_held')
    .on('effect')
    .columns(['shop', 'after'])
    .where(sql.ref('state'), '=', sql.lit('held'))
    .execute();
  await db.schema
    .createIndex('effect_given_up')
    .on('effect')
    .columns(['shop', 'id'])
    .where(sql.ref('state'), '=', sql.lit('givenUp'))
    .execute();
};

const history = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('history')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('at', c.whole, (col) => col.notNull())
    .addColumn('by', c.text, (col) => col.notNull())
    .addColumn('subject', c.text, (col) => col.notNull())
    .addColumn('subject_id', c.text, (col) => col.notNull())
    .addColumn('verb', c.text, (col) => col.notNull())
    .addColumn('before', c.text)
    .addColumn('after', c.text)
    .addPrimaryKeyConstraint('history_key', ['shop', 'id'])
    .modifyEnd(c.end)
    .execute();
  await db.schema
    .createIndex('history_subject')
    .on('history')
    .columns(['shop', 'subject', 'subject_id', 'id'])
    .execute();
};
