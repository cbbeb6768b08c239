import { type Kysely, sql } from 'kysely';
import type { Columns } from './columns.ts';

/** Questions, what was answered to them, and by which thread an effect's place is found again. */
export const questions = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await asked(db, c);
  await answers(db, c);
  await places(db, c);
};

const asked = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('question')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('code', c.text, (col) => col.notNull())
    .addColumn('text', c.text, (col) => col.notNull())
    .addColumn('card', c.text)
    .addColumn('state', c.text, (col) => col.notNull())
    .addColumn('version', c.whole, (col) => col.notNull())
    .addColumn('asked_at', c.whole, (col) => col.notNull())
    .addColumn('asked_by', c.text, (col) => col.notNull())
    .addColumn('place', c.text, (col) => col.notNull())
    .addColumn('waits_since', c.whole, (col) => col.notNull())
    .addColumn('round', c.whole, (col) => col.notNull())
    .addColumn('reminders', c.whole, (col) => col.notNull())
    .addColumn('remind_at', c.whole)
    .addColumn('accepted', c.whole)
    .addColumn('solved_at', c.whole)
    .addColumn('solved_by', c.text)
    .addPrimaryKeyConstraint('question_key', ['shop', 'id'])
    .addUniqueConstraint('question_code', ['shop', 'code'])
    .addForeignKeyConstraint('question_card', ['shop', 'card'], 'card', ['shop', 'id'])
    .addForeignKeyConstraint('question_asked_by', ['shop', 'asked_by'], 'person', ['shop', 'id'])
    .modifyEnd(c.end)
    .execute();
  await db.schema
    .createIndex('question_due')
    .on('question')
    .columns(['remind_at', 'id'])
    .where(sql.ref('remind_at'), 'is not', null)
    .execute();
  await db.schema
    .createIndex('question_by_card')
    .on('question')
    .columns(['shop', 'card', 'id'])
    .where(sql.ref('card'), 'is not', null)
    .execute();
  await db.schema
    .createIndex('question_unsolved')
    .on('question')
    .columns(['shop', 'id'])
    .where(sql.ref('solved_at'), 'is', null)
    .execute();
};

const answers = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema
    .createTable('answer')
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('question', c.text, (col) => col.notNull())
    .addColumn('number', c.whole, (col) => col.notNull())
    .addColumn('text', c.text, (col) => col.notNull())
    .addColumn('given_at', c.whole, (col) => col.notNull())
    .addColumn('given_by', c.text, (col) => col.notNull())
    .addPrimaryKeyConstraint('answer_key', ['shop', 'id'])
    .addUniqueConstraint('answer_number', ['shop', 'question', 'number'])
    .addForeignKeyConstraint('answer_question', ['shop', 'question'], 'question', ['shop', 'id'])
    .addForeignKeyConstraint('answer_given_by', ['shop', 'given_by'], 'person', ['shop', 'id'])
    .modifyEnd(c.end)
    .execute();
};

/** Where an effect took place, beside the rest of its outcome: a thread is looked up by it. */
const places = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await db.schema.alterTable('effect').addColumn('place', c.text).execute();
  await db.schema
    .createIndex('effect_place')
    .on('effect')
    .columns(['shop', 'place'])
    .where(sql.ref('place'), 'is not', null)
    .execute();
};
