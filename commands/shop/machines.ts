import { z } from 'zod';
import { MM_PER_INCH, mm, mmPerRev, revPerMin, type Steps, watt } from '../../src/calc/index.ts';
import { type Command, defineCommand, said } from '../../src/desk/index.ts';
import { BARE_MACHINE, type Dial, MACHINES, type Machine } from '../../src/shop/index.ts';
import { lengthOf, numberOfKind, type Parameter, smallLengthOf } from '../../src/words/index.ts';
import { added, changed, renameField } from './changes.ts';
import { machineFacts, machineInShort } from './facts.ts';
import { importCommand } from './imports.ts';
import { type Listed, lookAt, removeCommand } from './lists.ts';
import { nameField, newName, oldName, recordsOf } from './named.ts';
import { readPower, stepsOf } from './steps.ts';

const wordsOnly = <T>(parameter: Omit<Parameter<T>, 'read'>) =>
  said<T>({ ...parameter, read: () => null, closed: true });

const speeds = said<Steps<number>>({
  name: 'speeds',
  read: stepsOf('speeds', 'rotation', [1, 20_000, 'rev/min'], { in: 1, mm: 1 }),
  keywords: ['speeds', 'spindle speeds', 'gears'],
  examples: ['speeds 60 90 140 215', 'speeds 40 to 2500'],
});

const feeds = said<Steps<number>>({
  name: 'feeds',
  read: stepsOf('feeds', 'feed', [0.001, 10, 'mm/rev'], { in: MM_PER_INCH, mm: 1 }),
  keywords: ['feeds', 'feed'],
  examples: ['feeds 0.002 0.004 0.008', 'feeds 0.05 to 0.4 mm/rev'],
});

const dial = wordsOnly<Dial>({
  name: 'dial',
  values: (['diameter', 'radius'] as const).flatMap((reads) =>
    [`dial ${reads}`, `dial reads ${reads}`, `reads ${reads}`, `${reads} dial`].map(
      (phrase) => [phrase, reads] as const,
    ),
  ),
  examples: ['dial reads diameter', 'dial reads radius'],
});

const dialUnits = wordsOnly<'in' | 'mm'>({
  name: 'dialUnits',
  values: [
    ...['inch dials', 'dials in inches', 'dials in inch', 'inches'].map(
      (phrase) => [phrase, 'in'] as const,
    ),
    ...['metric dials', 'mm dials', 'dials in mm', 'metric'].map(
      (phrase) => [phrase, 'mm'] as const,
    ),
  ],
  examples: ['inch dials', 'metric dials'],
});

const largestDiameter = said<number>({
  name: 'largestDiameter',
  read: lengthOf('largestDiameter', [5, 3000], { in: [0.2, 118], mm: [5, 3000] }),
  keywords: ['swing', 'largest', 'largest diameter', 'up to'],
  examples: ['swing 13 in'],
});

const turningSpread = said<number>({
  name: 'turningSpread',
  read: smallLengthOf('turningSpread', [0.0005, 0.5]),
  keywords: ['spread', 'turning spread'],
  examples: ['spread 0.0003'],
});

const topSpeed = said<number>({
  name: 'topSpeed',
  read: numberOfKind('topSpeed', [10, 20_000], 'rotation', 'rev/min'),
  keywords: ['top speed', 'max speed', 'top', 'max'],
  examples: ['top speed 2000 rpm'],
});

const power = said<number>({
  name: 'power',
  read: readPower,
  keywords: ['power', 'motor'],
  examples: ['power 5.5 kW', 'power 7.5 hp'],
});

const fields = {
  speeds,
  feeds,
  dial,
  dialUnits,
  largestDiameter,
  turningSpread,
  topSpeed,
  power,
};
const records = recordsOf(fields);
type MachineSaid = z.infer<z.ZodObject<typeof fields>>;

const branded = <T>(steps: Steps<number>, brand: (value: number) => T): Steps<T> =>
  'list' in steps
    ? { list: steps.list.map(brand) }
    : { slowest: brand(steps.slowest), fastest: brand(steps.fastest) };

/** What was said of a machine, and nothing of what was not. */
const patch = (given: MachineSaid): Partial<Machine> => ({
  ...(given.speeds === undefined ? {} : { speeds: branded(given.speeds, revPerMin) }),
  ...(given.feeds === undefined ? {} : { feeds: branded(given.feeds, mmPerRev) }),
  ...(given.dial === undefined ? {} : { dial: given.dial }),
  ...(given.dialUnits === undefined ? {} : { units: given.dialUnits }),
  ...(given.largestDiameter === undefined ? {} : { largestDiameter: mm(given.largestDiameter) }),
  ...(given.turningSpread === undefined ? {} : { turningSpread: mm(given.turningSpread) }),
  ...(given.topSpeed === undefined ? {} : { topSpeed: revPerMin(given.topSpeed) }),
  ...(given.power === undefined ? {} : { power: watt(given.power) }),
});

const NAME = 'Big lathe';
const known = oldName(records, ({ machines: names }) => names);

export const machineList: Listed<'machine', Machine> = {
  register: MACHINES,
  what: 'machine',
  verb: 'machines',
  name: NAME,
  addLine: `/shop machines add ${NAME} speeds 60 90 140 215 330 500 rpm dial reads diameter inch dials`,
  lead: known,
  suggests: 'machines',
  inShort: () => Promise.resolve(machineInShort),
  facts: (_, machine) => Promise.resolve(machineFacts(machine)),
};

const name = nameField(records, [NAME]);
const listed = nameField(records, [NAME], 'machines');

/** A machine that cards can be made for. */
const add = defineCommand({
  path: ['shop', 'machines', 'add'],
  examples: [machineList.addLine],
  parameters: z.object({ name, ...fields }),
  lead: { name: 'name', read: newName(records) },
  allowed: 'supervisor',
  run: (context, given) =>
    added(context, machineList, given.name, (called) => ({
      ...BARE_MACHINE,
      ...patch(given),
      name: called,
    })),
});

const rename = renameField(records);

/** Something about a machine is different now, or better known. */
const change = defineCommand({
  path: ['shop', 'machines', 'change'],
  examples: [`/shop machines change ${NAME} dial reads radius`],
  parameters: z.object({ name: listed, newName: rename, ...fields }),
  lead: { name: 'name', read: known },
  allowed: 'supervisor',
  run: (context, given) =>
    changed(context, machineList, given.name, {
      ...patch(given),
      ...(given.newName === undefined ? {} : { name: given.newName }),
    }),
});

export const machines: readonly Command[] = [
  ...lookAt(machineList),
  add,
  change,
  removeCommand(machineList, (others) => oldName(others, (names) => names.machines)),
  importCommand('machine'),
];
