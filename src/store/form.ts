import { type Kysely, Migrator } from 'kysely';
import { RecordsTooNew } from './faults.ts';
import type { Engine } from './migrations/columns.ts';
import { stepNames, stepsFor } from './migrations/index.ts';
import type { Tables } from './tables.ts';

const STEP_TABLE = 'form_step';
const LOCK_TABLE = 'form_lock';

/** The form of the records that this program writes. */
export const KNOWN_FORM = stepNames.at(-1) ?? '';

/** What the steps leave behind for themselves; no shop's. */
export const FORM_TABLES: readonly string[] = [STEP_TABLE, LOCK_TABLE];

/** The steps the records have been through, oldest first; none where there are no records yet. */
export const stepsDone = async (db: Kysely<Tables>): Promise<readonly string[]> => {
  const tables = await db.introspection.getTables({ withInternalKyselyTables: true });
  if (!tables.some(({ name }) => name === STEP_TABLE)) return [];
  const steps = db as unknown as Kysely<{ [STEP_TABLE]: { name: string } }>;
  const rows = await steps.selectFrom(STEP_TABLE).select('name').orderBy('name').execute();
  return rows.map(({ name }) => name);
};

/**
 * Brings the records to the form this program knows, or to an older one of its own (a backup that
 * was made then). Records of a newer program are left alone and refused.
 *
 * @returns the steps that were made
 */
export const bringUp = async (
  db: Kysely<Tables>,
  engine: Engine,
  form = KNOWN_FORM,
): Promise<readonly string[]> => {
  const done = await stepsDone(db);
  const unknown = done.findLast((name) => !stepNames.includes(name));
  if (unknown !== undefined) throw new RecordsTooNew(unknown, KNOWN_FORM);
  if (done.includes(form)) return [];
  const migrator = new Migrator({
    db,
    provider: { getMigrations: () => Promise.resolve(stepsFor(engine)) },
    migrationTableName: STEP_TABLE,
    migrationLockTableName: LOCK_TABLE,
  });
  const { error, results } = await migrator.migrateTo(form);
  if (error !== undefined)
    throw error instanceof Error
      ? error
      : new Error('The form of the records could not be changed.', { cause: error });
  return (results ?? []).map(({ migrationName }) => migrationName);
};
