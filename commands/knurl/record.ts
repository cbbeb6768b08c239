import { z } from 'zod';
import { growthInterval } from '../../src/calc/index.ts';
import { line, type Part, type RecordPart, type Row, row } from '../../src/card/index.ts';
import { cardReply, defineCommand, type Visit } from '../../src/desk/index.ts';
import {
  type Outcomes,
  outcomesByMaterial,
  outcomesByWheel,
  type RecordedFamily,
  recordedFamilies,
  recordedParts,
  recordFiles,
  standardUses,
} from '../../src/shop/index.ts';
import { shopCard, visiting } from '../shop/visit.ts';
import { recordPictures } from './recordPictures.ts';

/** Most of each part that the card shows. Judgement: the files have all. */
const SHOWN = 6;
/** Most results that are named as waiting. Judgement. */
const NAMED = 8;

const growthRow = ({ pattern, material, growth }: RecordedFamily): Row =>
  row('recordGrowth', {
    pattern,
    group: material,
    mean: growth.mean,
    ...growthInterval(growth),
    results: growth.ofFamily,
  });

const outcomesRow =
  (about: 'wheels' | 'materials') =>
  (outcomes: Outcomes): Row =>
    row('recordOutcomes', { about, ...outcomes });

/** A part with its heading; nothing where there is nothing to say. */
const part = (about: RecordPart, rows: readonly Row[]): readonly Part[] => {
  if (rows.length === 0) return [];
  const more = Math.max(0, rows.length - SHOWN);
  return [
    { part: 'lines', lines: [line('recordPart', { about, more })] },
    { part: 'rows', rows: rows.slice(0, SHOWN) },
  ];
};

const growthParts = (families: readonly RecordedFamily[]): readonly Part[] => {
  if (families.length === 0) return [];
  const doubted = families.flatMap((family) => family.doubted);
  const more = Math.max(0, doubted.length - NAMED);
  const waiting = { results: doubted.slice(0, NAMED), more };
  const said = doubted.length === 0 ? [] : [line('recordDoubted', waiting)];
  return [
    ...part('growth', families.map(growthRow)),
    { part: 'lines', lines: [line('recordGrowthHow', {}), ...said] },
  ];
};

const sum = (all: readonly Outcomes[], of: 'count' | 'good'): number =>
  all.reduce((total, each) => total + each[of], 0);

const told = async ({ shop }: Visit) => {
  const parts = await recordedParts(shop);
  const families = await recordedFamilies(shop, parts);
  const materials = await outcomesByMaterial(shop);
  const wheels = await outcomesByWheel(shop);
  return { parts, families, materials, wheels, standards: await standardUses(shop) };
};

/** What the shop's own results show: growth, outcomes by wheel and material, standards in use. */
export const record = defineCommand({
  path: ['knurl', 'record'],
  examples: ['/knurl record'],
  parameters: z.object({}),
  allowed: 'supervisor',
  run: (context) =>
    visiting(context, async (visit) => {
      const { parts, families, materials, wheels, standards } = await told(visit);
      const results = sum(materials, 'count');
      if (results === 0) {
        const example = '/knurl result good 65 teeth';
        const headline = line('recordNone', { line: example });
        return cardReply(shopCard(context, { verb: 'record', headline }));
      }
      const files = recordFiles(visit.shop).map(({ name }) => name);
      const card = shopCard(context, {
        verb: 'record',
        headline: line('record', { results, good: sum(materials, 'good') }),
        after: [line('recordFiles', { files })],
        lists: { families, wheels, materials, standards },
      });
      const shown: readonly Part[] = [
        ...growthParts(families),
        ...part('wheels', wheels.map(outcomesRow('wheels'))),
        ...part('materials', materials.map(outcomesRow('materials'))),
        ...part(
          'standards',
          standards.map((use) => row('recordStandard', use)),
        ),
      ];
      return {
        card: { ...card, parts: [...shown, ...card.parts], pictures: recordPictures(parts) },
        effects: [],
        files,
      };
    }),
});
