import { portionsOf, type Row, TABLES, type TableFacts } from '../store/index.ts';
import type { Sheet } from './csv/columns.ts';
import { MACHINE_SHEET } from './csv/machineSheet.ts';
import { csvText } from './csv/text.ts';
import { WHEEL_SHEET } from './csv/wheelSheet.ts';
import { MACHINES } from './machines.ts';
import { listOf } from './register.ts';
import type { ShopView } from './view.ts';
import { WHEELS } from './wheels.ts';

/** A file of an export, in pieces: a shop may have a million cards. */
export type ExportFile = { readonly name: string; readonly pieces: AsyncIterable<string> };

/** Everything the records hold of this shop, as one JSON text: a list for every table. */
export async function* exportJson(view: ShopView): AsyncGenerator<string> {
  yield '{\n  "wholetooth": "shop"';
  for (const table of TABLES) {
    yield `,\n  ${JSON.stringify(table.name)}: [`;
    let isFirst = true;
    for await (const rows of portionsOf(view.db, table, view.id)) {
      for (const row of rows) {
        yield `${isFirst ? '' : ','}\n    ${JSON.stringify(withContent(table, row))}`;
        isFirst = false;
      }
    }
    yield isFirst ? ']' : '\n  ]';
  }
  yield '\n}\n';
}

/** JSON inside the JSON is shown as what it is. */
const withContent = ({ json }: TableFacts, row: Row): Record<string, unknown> =>
  Object.fromEntries(
    Object.entries(row).map(([name, value]) => [
      name,
      json.includes(name) && typeof value === 'string' ? (JSON.parse(value) as unknown) : value,
    ]),
  );

/** Everything, once as JSON and once as tables. */
export const exportFiles = (view: ShopView): readonly ExportFile[] => [
  { name: 'shop.json', pieces: exportJson(view) },
  ...exportCsv(view),
];

/** The same as tables; wheels and machines in the form in which they can be read in again. */
export const exportCsv = (view: ShopView): readonly ExportFile[] =>
  TABLES.map((table) => ({ name: `${table.name}.csv`, pieces: piecesOf(view, table) }));

const piecesOf = (view: ShopView, table: TableFacts): AsyncIterable<string> => {
  if (table.name === 'wheel') return once(() => wheelsCsv(view));
  if (table.name === 'machine') return once(() => machinesCsv(view));
  return tablePieces(view, table);
};

async function* once(text: () => Promise<string>): AsyncGenerator<string> {
  yield await text();
}

async function* tablePieces(view: ShopView, table: TableFacts): AsyncGenerator<string> {
  let isFirst = true;
  for await (const rows of portionsOf(view.db, table, view.id)) {
    const [row] = rows;
    if (isFirst && row !== undefined) yield csvText([Object.keys(row)]);
    isFirst = false;
    yield csvText(rows.map((one) => Object.values(one).map((cell) => String(cell ?? ''))));
  }
}

/** The crib as a file that can be taken in again. */
export const wheelsCsv = async (view: ShopView): Promise<string> =>
  sheetCsv(WHEEL_SHEET, await listOf(view, WHEELS));

/** The machines as a file that can be taken in again. */
export const machinesCsv = async (view: ShopView): Promise<string> =>
  sheetCsv(MACHINE_SHEET, await listOf(view, MACHINES));

const sheetCsv = <T>({ columns }: Sheet<T>, items: readonly T[]): string =>
  csvText([
    columns.map(({ heading }) => heading),
    ...items.map((item) => columns.map(({ write }) => write(item))),
  ]);
