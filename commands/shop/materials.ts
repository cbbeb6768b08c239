import { z } from 'zod';
import { brinellFromRockwellC } from '../../src/calc/index.ts';
import { type Command, defineCommand, said } from '../../src/desk/index.ts';
import { MATERIALS_OF_SHOP, type ShopMaterial } from '../../src/shop/index.ts';
import {
  freeMaterial,
  type HardnessWords,
  type Names,
  NO_NAMES,
  numberOfKind,
  type Reader,
  textOf,
  vocabularyOf,
} from '../../src/words/index.ts';
import * as knurl from '../knurl/parameters.ts';
import { added, changed, renameField } from './changes.ts';
import { materialFacts } from './facts.ts';
import { type Listed, lookAt, removeCommand } from './lists.ts';
import { nameField, newName, oldName, recordsOf } from './named.ts';

/** A material of the table only: one of the shop's own cannot stand for another. */
const readBase: Reader<string> = (cursor) => {
  const reading = freeMaterial(cursor, NO_NAMES);
  if (reading === null || 'refusal' in reading) return reading;
  const { usual } = reading.value;
  return usual === null ? null : { value: usual, used: reading.used };
};

const base = said<string>({
  name: 'base',
  read: readBase,
  keywords: ['as', 'is', 'like'],
  suggests: 'materials',
  examples: ['as 1018', 'as 304'],
});

const elongation = said<number>({
  name: 'elongation',
  read: numberOfKind('elongation', [0, 100], 'share', '%'),
  keywords: ['elongation'],
  examples: ['elongation 15'],
});

const note = said<string>({
  name: 'note',
  read: textOf(() => vocabularyOf(records())),
  keywords: ['note'],
  text: true,
  examples: ['note "from the yellow rack"'],
});

const fields = { base, hardness: knurl.hardness, elongation, note };
const records = recordsOf(fields);
type MaterialSaid = z.infer<z.ZodObject<typeof fields>>;

const brinell = ({ scale, value }: HardnessWords): number =>
  scale === 'HB' ? value : brinellFromRockwellC(value);

const patch = (given: MaterialSaid): Partial<ShopMaterial> => ({
  ...(given.base === undefined ? {} : { base: given.base }),
  ...(given.hardness === undefined ? {} : { hardness: brinell(given.hardness) }),
  ...(given.elongation === undefined ? {} : { elongation: given.elongation }),
  ...(given.note === undefined ? {} : { note: given.note }),
});

const NAME = 'yellow bar';
const ownNames = ({ materials: own = [] }: Names): readonly string[] =>
  own.map(({ name: called }) => called);
const known = oldName(records, ownNames);

export const materialList: Listed<'material', ShopMaterial> = {
  register: MATERIALS_OF_SHOP,
  what: 'material',
  verb: 'materials',
  name: NAME,
  addLine: `/shop materials add ${NAME} as 1018 HB 180`,
  lead: known,
  suggests: 'ownMaterials',
  inShort: () => Promise.resolve(materialFacts),
  facts: (_, material) => Promise.resolve(materialFacts(material)),
};

const name = nameField(records, [NAME]);
const listed = nameField(records, [NAME], 'ownMaterials');

/** The shop's own name for a material, and what it has measured of it. */
const add = defineCommand({
  path: ['shop', 'materials', 'add'],
  examples: [materialList.addLine],
  parameters: z.object({ name, ...fields }),
  lead: { name: 'name', read: newName(records) },
  allowed: 'supervisor',
  run: (context, given) =>
    added(context, materialList, given.name, (called) =>
      given.base === undefined
        ? { code: 'missing', parameter: 'material', examples: ['as 1018', 'as 304'] }
        : {
            hardness: null,
            elongation: null,
            note: null,
            ...patch(given),
            name: called,
            base: given.base,
          },
    ),
});

const rename = renameField(records);

const change = defineCommand({
  path: ['shop', 'materials', 'change'],
  examples: [`/shop materials change ${NAME} HB 195`],
  parameters: z.object({ name: listed, newName: rename, ...fields }),
  lead: { name: 'name', read: known },
  allowed: 'supervisor',
  run: (context, given) =>
    changed(context, materialList, given.name, {
      ...patch(given),
      ...(given.newName === undefined ? {} : { name: given.newName }),
    }),
});

export const materials: readonly Command[] = [
  ...lookAt(materialList),
  add,
  change,
  removeCommand(materialList, (others) => oldName(others, ownNames)),
];
