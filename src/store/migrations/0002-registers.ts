import { type CreateTableBuilder, type Kysely, sql } from 'kysely';
import type { Columns } from './columns.ts';

/** Wheels, machines, materials and rules: what a shop keeps lists of. */
export const registers = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await wheels(db, c);
  await machines(db, c);
  await materials(db, c);
  await rules(db, c);
};

/** The columns every list has, before the list's own. */
const register = (
  db: Kysely<unknown>,
  c: Columns,
  name: string,
): CreateTableBuilder<string, 'shop'> =>
  db.schema
    .createTable(name)
    .addColumn('shop', c.text, (col) => col.notNull().references('shop.id'))
    .addColumn('id', c.text, (col) => col.notNull())
    .addColumn('name', c.text, (col) => col.notNull())
    .addColumn('name_key', c.text, (col) => col.notNull())
    .addColumn('version', c.whole, (col) => col.notNull())
    .addColumn('made_at', c.whole, (col) => col.notNull())
    .addColumn('made_by', c.text, (col) => col.notNull())
    .addColumn('changed_at', c.whole, (col) => col.notNull())
    .addColumn('changed_by', c.text, (col) => col.notNull())
    .addColumn('removed_at', c.whole)
    .addColumn('removed_by', c.text)
    .addPrimaryKeyConstraint(`${name}_key`, ['shop', 'id'])
    .modifyEnd(c.end);

/** A name is taken while its holder is there; one that was removed gives it free. */
const uniqueName = async (db: Kysely<unknown>, name: string): Promise<void> => {
  await db.schema
    .createIndex(`${name}_name`)
    .unique()
    .on(name)
    .columns(['shop', 'name_key'])
    .where(sql.ref('removed_at'), 'is', null)
    .execute();
};

const wheels = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await register(db, c, 'wheel')
    .addColumn('kind', c.text, (col) => col.notNull())
    .addColumn('pitch_system', c.text)
    .addColumn('pitch_value', c.real)
    .addColumn('along_rim', c.whole, (col) => col.notNull())
    .addColumn('proven', c.real)
    .addColumn('teeth', c.whole)
    .addColumn('diameter', c.real)
    .addColumn('face', c.real)
    .addColumn('bore', c.real)
    .addColumn('bevel', c.real)
    .addColumn('included', c.real)
    .addColumn('helix', c.real)
    .addColumn('tooth_depth', c.real)
    .addColumn('edge', c.text)
    .addColumn('pin_diameter', c.real)
    .addColumn('pin_material', c.text)
    .addColumn('place', c.text)
    .addColumn('parts_run', c.whole, (col) => col.notNull())
    .addColumn('state', c.text, (col) => col.notNull())
    .execute();
  await uniqueName(db, 'wheel');
};

const machines = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await register(db, c, 'machine')
    .addColumn('speeds', c.text)
    .addColumn('feeds', c.text)
    .addColumn('dial', c.text, (col) => col.notNull())
    .addColumn('units', c.text)
    .addColumn('largest_diameter', c.real)
    .addColumn('turning_spread', c.real)
    .addColumn('top_speed', c.real)
    .addColumn('power', c.real)
    .execute();
  await uniqueName(db, 'machine');
};

const materials = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await register(db, c, 'material')
    .addColumn('base', c.text, (col) => col.notNull())
    .addColumn('hardness', c.real)
    .addColumn('elongation', c.real)
    .addColumn('note', c.text)
    .execute();
  await uniqueName(db, 'material');
};

const rules = async (db: Kysely<unknown>, c: Columns): Promise<void> => {
  await register(db, c, 'rule')
    .addColumn('text', c.text, (col) => col.notNull())
    .addColumn('machine', c.text)
    .addColumn('material', c.text)
    .addColumn('base', c.text)
    .addForeignKeyConstraint('rule_machine', ['shop', 'machine'], 'machine', ['shop', 'id'])
    .addForeignKeyConstraint('rule_material', ['shop', 'material'], 'material', ['shop', 'id'])
    .execute();
  await uniqueName(db, 'rule');
};
