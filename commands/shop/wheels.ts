import { z } from 'zod';
import { type Command, defineCommand } from '../../src/desk/index.ts';
import { BARE_WHEEL, WHEELS, type Wheel } from '../../src/shop/index.ts';
import { added, changed, renameField } from './changes.ts';
import { wheelFacts, wheelInShort } from './facts.ts';
import { importCommand } from './imports.ts';
import { type Listed, lookAt, removeCommand } from './lists.ts';
import { nameField, newName, oldName } from './named.ts';
import { wheelFields, wheelPatch, wheelRecords } from './wheelFields.ts';

const NAME = 'Old Faithful';

const known = oldName(wheelRecords, ({ wheels }) => wheels);

export const wheelList: Listed<'wheel', Wheel> = {
  register: WHEELS,
  what: 'wheel',
  verb: 'wheels',
  name: NAME,
  addLine: `/shop wheels add ${NAME} straight 21 tpi 63 teeth diameter 19.05 mm place drawer 3`,
  lead: known,
  suggests: 'wheels',
  inShort: () => Promise.resolve(wheelInShort),
  facts: (_, wheel) => Promise.resolve(wheelFacts(wheel)),
};

const name = nameField(wheelRecords, [NAME]);
const listed = nameField(wheelRecords, [NAME], 'wheels');

/** A wheel comes into the crib. */
const add = defineCommand({
  path: ['shop', 'wheels', 'add'],
  examples: [wheelList.addLine],
  parameters: z.object({ name, ...wheelFields }),
  lead: { name: 'name', read: newName(wheelRecords) },
  allowed: 'supervisor',
  run: (context, given) =>
    added(context, wheelList, given.name, (called) => {
      const { form } = given;
      if (form === undefined) {
        return { code: 'missing', parameter: 'form', examples: ['straight', 'left', 'right'] };
      }
      return { ...BARE_WHEEL, ...wheelPatch(given), name: called, form };
    }),
});

const rename = renameField(wheelRecords);

/** Something about a wheel is different now, or better known. */
const change = defineCommand({
  path: ['shop', 'wheels', 'change'],
  examples: [`/shop wheels change ${NAME} worn parts 3000`],
  parameters: z.object({ name: listed, newName: rename, ...wheelFields }),
  lead: { name: 'name', read: known },
  allowed: 'supervisor',
  run: (context, given) =>
    changed(context, wheelList, given.name, {
      ...wheelPatch(given),
      ...(given.newName === undefined ? {} : { name: given.newName }),
    }),
});

export const wheels: readonly Command[] = [
  ...lookAt(wheelList),
  add,
  change,
  removeCommand(wheelList, (others) => oldName(others, (names) => names.wheels)),
  importCommand('wheel'),
];
