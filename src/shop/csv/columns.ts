import type { Cell, CellContext } from './cells.ts';

/** One column of a list: how it is headed, read and written. */
export type Column<T> = {
  /** As it is written; with the unit that the cells below it are in. */
  readonly heading: string;
  /** Other headings it may have when it is read, in the same plain form. */
  readonly also: readonly string[];
  readonly field: keyof T & string;
  /** Has to be there when a list is read. */
  readonly needed: boolean;
  readonly read: (text: string, context: CellContext) => Cell<T[keyof T]>;
  readonly write: (content: T) => string;
};

/** A list as a file: its columns, and what a line is that says nothing. */
export type Sheet<T> = {
  readonly columns: readonly Column<T>[];
  readonly bare: Omit<T, 'name'>;
};

type Definition<V> = {
  readonly heading: string;
  readonly read: (text: string, context: CellContext) => Cell<V>;
  readonly write: (value: V) => string;
  readonly also?: readonly string[];
  readonly needed?: boolean;
};

/** Makes the columns of one kind of thing: what is read into a field is what the field takes. */
export const columnsOf =
  <T>() =>
  <F extends keyof T & string>(field: F, definition: Definition<NonNullable<T[F]>>): Column<T> => ({
    heading: definition.heading,
    also: definition.also ?? [],
    field,
    needed: definition.needed ?? false,
    read: definition.read,
    write: (content) => {
      const value = content[field];
      return value === null || value === undefined ? '' : definition.write(value);
    },
  });

/** The heading's words and its unit apart: `Face (mm)`, `face mm` and `face, MM` are one. */
export const headingParts = (
  heading: string,
  { words }: Pick<CellContext, 'words'>,
): { readonly name: string; readonly unit: string | null } => {
  const plain = words
    .plainText(heading)
    .replaceAll(/[()[\],;:_]+/gu, ' ')
    .trim();
  const all = plain.split(/\s+/u);
  const last = all.at(-1) ?? '';
  const isUnit = all.length > 1 && (words.unitOf(last) !== null || POWER.has(last));
  const name = (isUnit ? all.slice(0, -1) : all).join(' ').replaceAll('-', ' ');
  return { name, unit: isUnit ? last : null };
};

const POWER = new Set(['w', 'kw', 'hp']);

/** The column a heading is for. */
export const columnNamed = <T>(
  sheet: Sheet<T>,
  name: string,
  context: Pick<CellContext, 'words'>,
): Column<T> | undefined =>
  sheet.columns.find(
    ({ heading, also }) => headingParts(heading, context).name === name || also.includes(name),
  );
