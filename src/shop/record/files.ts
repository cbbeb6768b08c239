import { growthInterval } from '../../calc/index.ts';
import { csvText } from '../csv/text.ts';
import type { ExportFile } from '../export.ts';
import type { ShopView } from '../view.ts';
import { recordedFamilies, recordedParts } from './growth.ts';
import { type Outcomes, outcomesByMaterial, outcomesByWheel, standardUses } from './outcomes.ts';

type Rows = readonly (readonly (string | number)[])[];

async function* file(rows: () => Promise<Rows>): AsyncGenerator<string> {
  yield csvText((await rows()).map((row) => row.map(String)));
}

const growthRows = async (view: ShopView): Promise<Rows> => {
  const families = await recordedFamilies(view, await recordedParts(view));
  const heading = ['family', 'results', 'mean share of static growth', '10 %', '90 %', 'waiting'];
  return [
    heading,
    ...families.map(({ family, growth, doubted }) => {
      const { low, high } = growthInterval(growth);
      return [family, growth.ofFamily, growth.mean, low, high, doubted.join(' ')];
    }),
  ];
};

const outcomeRows = (by: string, all: readonly Outcomes[]): Rows =>
  all.flatMap(({ name, good, others }) => [
    [by, name ?? '', 'good', good],
    ...others.map(({ outcome, count }) => [by, name ?? '', outcome, count]),
  ]);

const outcomesRows = async (view: ShopView): Promise<Rows> => [
  ['by', 'name', 'outcome', 'results'],
  ...outcomeRows('wheel', await outcomesByWheel(view)),
  ...outcomeRows('material', await outcomesByMaterial(view)),
];

const standardRows = async (view: ShopView): Promise<Rows> => [
  ['part', 'results', 'parts run'],
  ...(await standardUses(view)).map(({ part, results, partsRun }) => [part, results, partsRun]),
];

/** What the shop's own results show, as tables. */
export const recordFiles = (view: ShopView): readonly ExportFile[] => [
  { name: 'record-growth.csv', pieces: file(() => growthRows(view)) },
  { name: 'record-outcomes.csv', pieces: file(() => outcomesRows(view)) },
  { name: 'record-standards.csv', pieces: file(() => standardRows(view)) },
];
