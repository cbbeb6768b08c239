import type { CellFault, FileFault } from '../../card/index.ts';
import type { Refusal } from '../../refusal.ts';
import { type RegisterName } from '../../store/index.ts';
import { cleaned, keyOf } from '../names.ts';
import { addRows, changeIn, faultOf, type Kept, listOf, type Register } from '../register.ts';
import type { ShopChange } from '../view.ts';
import type { CellContext } from './cells.ts';
import { type Column, columnNamed, headingParts, type Sheet } from './columns.ts';
import { readTable, type Table, type TableRow } from './readTable.ts';

export type RowReport = {
  /** The line of the file, the headings being line 1. */
  readonly line: number;
  readonly name: string;
  readonly outcome: 'added' | 'replaced' | 'same' | 'refused';
  /** What is wrong, where it was refused. */
  readonly faults: readonly CellFault[];
};

export type ImportReport = {
  readonly added: number;
  readonly replaced: number;
  readonly same: number;
  readonly refused: number;
  readonly rows: readonly RowReport[];
  /** Headings that belong to nothing, each with the ones that may have been meant. */
  readonly ignored: readonly { readonly heading: string; readonly nearest: readonly string[] }[];
};

export type Imported =
  | { readonly ok: true; readonly report: ImportReport }
  | { readonly ok: false; readonly fault: FileFault };

export type ImportOptions = {
  /** What bare lengths are in. */
  readonly units: 'in' | 'mm';
  /** Writes over those of the same name; otherwise they stay and the row says so. */
  readonly replace?: boolean;
};

type Thing = { readonly name: string };
/** A column of the file that the list has: where it stands and what its heading says it is in. */
type Placed<T> = {
  readonly column: Column<T>;
  readonly at: number;
  readonly headed: string | null;
};
/** A row as it was read: what it says, or what is wrong with it. */
type ReadRow<T> = { readonly line: number; readonly name: string } & (
  | { readonly said: Partial<T> }
  | { readonly faults: readonly CellFault[] }
);

/**
 * Takes a list in from a file. Each row is judged by itself: what can be taken is taken, and the
 * report says of every line what became of it. A file whose columns cannot be told is not touched.
 */
export const importSheet = async <N extends RegisterName, T extends Thing>(
  change: ShopChange,
  register: Register<N, T>,
  sheet: Sheet<T>,
  text: string,
  options: ImportOptions,
): Promise<Imported> => {
  const table = readTable(text);
  if ('why' in table) return { ok: false, fault: table };
  const placed = placedColumns(change, sheet, table);
  if ('why' in placed) return { ok: false, fault: placed };
  const known = await knownByKey(change, register);
  const read = readRows(change, sheet, table, placed, options.units);
  const rows = await settle(change, register, sheet, placed, known, read, options.replace === true);
  const count = (outcome: RowReport['outcome']) =>
    rows.filter((row) => row.outcome === outcome).length;
  return {
    ok: true,
    report: {
      added: count('added'),
      replaced: count('replaced'),
      same: count('same'),
      refused: count('refused'),
      rows,
      ignored: ignoredHeadings(change, sheet, table),
    },
  };
};

const knownByKey = async <N extends RegisterName, T extends Thing>(
  change: ShopChange,
  register: Register<N, T>,
): Promise<ReadonlyMap<string, Kept<T>>> =>
  new Map((await listOf(change, register)).map((item) => [keyOf(change.words, item.name), item]));

const placedColumns = <T>(
  change: ShopChange,
  sheet: Sheet<T>,
  { headings }: Table,
): readonly Placed<T>[] | FileFault => {
  const placed: Placed<T>[] = [];
  for (const [at, heading] of headings.entries()) {
    const { name, unit } = headingParts(heading, change);
    const column = columnNamed(sheet, name, change);
    if (column === undefined) continue;
    if (placed.some((other) => other.column === column)) {
      return { why: 'columnTwice', column: heading };
    }
    placed.push({ column, at, headed: unit });
  }
  const missing = sheet.columns
    .filter((column) => column.needed && !placed.some((other) => other.column === column))
    .map(({ heading }) => heading);
  return missing.length > 0 ? { why: 'columns', missing, found: headings } : placed;
};

const ignoredHeadings = <T>(
  change: ShopChange,
  sheet: Sheet<T>,
  { headings }: Table,
): ImportReport['ignored'] => {
  const known = sheet.columns.flatMap(({ heading, also }) => [
    headingParts(heading, change).name,
    ...also,
  ]);
  return headings.flatMap((heading) => {
    const { name } = headingParts(heading, change);
    if (name === '' || columnNamed(sheet, name, change) !== undefined) return [];
    return [{ heading, nearest: change.words.nearestOf(name, known) }];
  });
};

const readRows = <T extends Thing>(
  change: ShopChange,
  sheet: Sheet<T>,
  { rows }: Table,
  placed: readonly Placed<T>[],
  units: 'in' | 'mm',
): readonly ReadRow<T>[] => {
  const lines = new Map<string, number>();
  return rows.map((row) => {
    const read = readRow(change, sheet, placed, units, row);
    const key = keyOf(change.words, read.name);
    const earlier = lines.get(key);
    if (earlier !== undefined && read.name !== '') {
      const fault: CellFault = { column: 'name', cell: read.name, why: 'twice', line: earlier };
      return { line: row.line, name: read.name, faults: [fault] };
    }
    lines.set(key, row.line);
    return read;
  });
};

const readRow = <T extends Thing>(
  change: ShopChange,
  sheet: Sheet<T>,
  placed: readonly Placed<T>[],
  units: 'in' | 'mm',
  { line, cells }: TableRow,
): ReadRow<T> => {
  const said: Record<string, unknown> = {};
  const faults: CellFault[] = [];
  for (const { column, at, headed } of placed) {
    const cell = cleaned(cells[at] ?? '');
    const bare: unknown = (sheet.bare as Partial<T>)[column.field];
    if (cell === '') {
      if (column.needed) faults.push({ column: column.heading, cell, ...NOTHING_THERE });
      said[column.field] = bare;
      continue;
    }
    const context: CellContext = { words: change.words, units, headed };
    const read = column.read(cell, context);
    if ('fault' in read) faults.push({ column: column.heading, cell: shown(cell), ...read.fault });
    else said[column.field] = read.value;
  }
  const name = typeof said['name'] === 'string' ? said['name'] : '';
  return faults.length > 0 ? { line, name, faults } : { line, name, said: said as Partial<T> };
};

const NOTHING_THERE = { why: 'missing', examples: [] } as const;

/** Longest piece of a cell that a report repeats. Judgement: enough to find it by. */
const LONGEST_SHOWN = 60;
const shown = (cell: string): string =>
  cell.length > LONGEST_SHOWN ? `${cell.slice(0, LONGEST_SHOWN)}…` : cell;

/** Writes what can be written, and says of every row what became of it. */
const settle = async <N extends RegisterName, T extends Thing>(
  change: ShopChange,
  register: Register<N, T>,
  sheet: Sheet<T>,
  placed: readonly Placed<T>[],
  known: ReadonlyMap<string, Kept<T>>,
  read: readonly ReadRow<T>[],
  replace: boolean,
): Promise<readonly RowReport[]> => {
  const fresh: { id: string; content: T; row: ReadRow<T> }[] = [];
  const reports = new Map<ReadRow<T>, RowReport>();
  const report = (
    row: ReadRow<T>,
    outcome: RowReport['outcome'],
    faults: readonly CellFault[] = [],
  ) => reports.set(row, { line: row.line, name: shown(row.name), outcome, faults });
  for (const row of read) {
    if ('faults' in row) {
      report(row, 'refused', row.faults);
      continue;
    }
    const old = known.get(keyOf(change.words, row.name));
    const content = {
      ...sheet.bare,
      ...(old === undefined ? {} : contentOf(sheet, old)),
      ...row.said,
    } as unknown as T;
    const fault = faultOf(register, content);
    if (fault !== null) {
      report(row, 'refused', [cellFault(sheet, placed, content, fault)]);
    } else if (old === undefined) {
      fresh.push({ id: change.db.newId(change.at), content, row });
    } else {
      report(row, ...(await meetOld(change, register, placed, old, row.said, replace)));
    }
  }
  const added = await addRows(change, register, fresh);
  for (const { id, row } of fresh) {
    // Somebody else took the name while this was being read.
    const columns = placed.map(({ column }) => column.heading);
    if (added.has(id)) report(row, 'added');
    else report(row, 'refused', [{ column: 'name', cell: row.name, why: 'differs', columns }]);
  }
  return read.flatMap((row) => reports.get(row) ?? []);
};

/** Only what the list's columns hold, without what the store knows of it. */
const contentOf = <T>(sheet: Sheet<T>, item: T): Partial<T> =>
  Object.fromEntries(sheet.columns.map(({ field }) => [field, item[field]])) as Partial<T>;

const meetOld = async <N extends RegisterName, T extends Thing>(
  change: ShopChange,
  register: Register<N, T>,
  placed: readonly Placed<T>[],
  old: Kept<T>,
  said: Partial<T>,
  replace: boolean,
): Promise<[RowReport['outcome'], readonly CellFault[]]> => {
  const differing = placed
    .filter(({ column }) => column.field !== 'name')
    .filter(({ column }) => !alike(old[column.field], said[column.field]))
    .map(({ column }) => column.heading);
  if (differing.length === 0) return ['same', []];
  if (!replace) {
    return ['refused', [{ column: 'name', cell: old.name, why: 'differs', columns: differing }]];
  }
  const changed = await changeIn(change, register, old.id, said);
  if (changed.ok) return ['replaced', []];
  throw new Error(`a row that was judged good was refused: ${changed.refusal.code}`);
};

/** Numbers that differ only in how they were written are alike. */
const NEGLIGIBLE = 1e-9;

const alike = (a: unknown, b: unknown): boolean => {
  if (typeof a === 'number' && typeof b === 'number') {
    return Math.abs(a - b) <= NEGLIGIBLE * Math.max(1, Math.abs(a));
  }
  if (Array.isArray(a) && Array.isArray(b)) {
    return a.length === b.length && a.every((item, at) => alike(item, b[at]));
  }
  if (isRecord(a) && isRecord(b)) {
    const keys = new Set([...Object.keys(a), ...Object.keys(b)]);
    return [...keys].every((key) => alike(a[key], b[key]));
  }
  return a === b;
};

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null;

/** What is wrong with the whole of a row, at the column it is about. */
const cellFault = <T>(
  sheet: Sheet<T>,
  placed: readonly Placed<T>[],
  content: T,
  refusal: Refusal,
): CellFault => {
  const field =
    refusal.code === 'missing'
      ? refusal.parameter
      : 'what' in refusal && typeof refusal.what === 'string'
        ? refusal.what
        : 'name';
  const column = sheet.columns.find((one) => one.field === field);
  const isThere = placed.some((one) => one.column === column);
  const cell = column === undefined || !isThere ? '' : shown(column.write(content));
  const where = { column: column?.heading ?? field, cell };
  if (refusal.code === 'outOfRange') {
    const { value, min, max, unit } = refusal;
    return { ...where, why: 'outOfRange', value, min, max, unit };
  }
  return { ...where, why: 'missing', examples: refusal.code === 'missing' ? refusal.examples : [] };
};
