import type { CellFault, FileFault, ShopLabels, ShopLines, ShopRows } from '../../card/index.ts';
import type { LabelledText } from '../book.ts';
import { type Show, showIn } from '../show.ts';
import { figureName, figureText } from './figureNames.ts';
import {
  amountText,
  counted,
  factName,
  factText,
  momentText,
  SHOP_THINGS,
  shopWord,
} from './shopNames.ts';

const list = (items: readonly string[]): string => items.join(', ');
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** What stands in a cell, as the report repeats it. */
const cellText = (fault: CellFault): string => {
  const { column, cell } = fault;
  const there = cell === '' ? `${column} is empty` : `${column} "${cell}"`;
  switch (fault.why) {
    case 'missing':
      return fault.examples.length === 0
        ? `${column} is missing`
        : `${column} is missing; write ${list(fault.examples)}`;
    case 'unreadable':
      return `${there} is no number; write ${list(fault.examples)}`;
    case 'wrongUnit':
      return `${there} has the wrong unit; write ${list(fault.wanted)}`;
    case 'notOneOf':
      return `${there} is none of ${list(fault.choices)}`;
    case 'unclear':
      return `${there} is not clear; write ${fault.readings.join(' or ')}`;
    case 'outOfRange': {
      const amount = (value: number): string =>
        `${String(Number(value.toPrecision(6)))} ${fault.unit}`;
      return `${there}: ${amount(fault.value)} is outside ${amount(fault.min)} to ${amount(fault.max)}`;
    }
    case 'twice':
      return `${there} stands in line ${String(fault.line)} already`;
    case 'differs':
      return `${there} is there with other values (${list(fault.columns)}); add the word replace to write over it`;
  }
};

const fileText = (fault: FileFault): string => {
  switch (fault.why) {
    case 'empty':
      return 'The file has no rows. The first line names the columns, each line after it is one.';
    case 'tooLong':
      return `The file is too long. Take it in in parts of at most ${String(Math.round(fault.most / 1_000_000))} million characters.`;
    case 'tooManyRows':
      return `The file has more than ${String(fault.most)} rows. Take it in in parts.`;
    case 'notATable':
      return `The file is no table: a quotation mark does not close near line ${String(fault.line)}.`;
    case 'columns':
      return `The file has no column ${list(fault.missing)}. Its columns are ${list(fault.found)}.`;
    case 'columnTwice':
      return `Two columns of the file say the same: ${fault.column} is the second. Leave one out.`;
  }
};

const GIVEN_UP: Readonly<Record<ShopLines['givenUp']['what'], string>> = {
  post: 'A message could not be posted',
  pin: 'A message could not be pinned',
  unpin: 'A pin could not be taken off',
  thread: 'A thread could not be opened',
  notify: 'Somebody could not be told',
  edit: 'A message could not be brought up to date',
};

export const shopLines: {
  readonly [K in keyof ShopLines]: (values: ShopLines[K], show: Show) => string;
} = {
  listed: ({ what, count }) => `${capital(counted(what, count))}:`,
  listedNone: ({ what, line }) => `No ${SHOP_THINGS[what].many} yet. Add one: ${line}`,
  listedMore: ({ more }) => `and ${String(more)} more; export has all of them.`,
  shown: ({ what, name }) => `${capital(SHOP_THINGS[what].one)} ${name}`,
  done: ({ did, what, name }) => `${capital(SHOP_THINGS[what].one)} ${name} ${did}.`,
  lastChanged: ({ by, ...moment }) => `Last changed by ${by}, ${momentText(moment)}.`,
  roleNamed: ({ name, role }) => `${name} is ${shopWord(role)} now.`,
  imported: ({ what, added, replaced, same, refused }) =>
    [
      `${capital(counted(what, added))} added`,
      ...(replaced > 0 ? [`${String(replaced)} replaced`] : []),
      ...(same > 0 ? [`${String(same)} as they were`] : []),
      ...(refused > 0 ? [`${String(refused)} not taken`] : []),
    ].join(', ') + '.',
  importedRow: ({ line, name, faults }) =>
    `Line ${String(line)}${name === '' ? '' : `, ${name}`}: ${faults.map(cellText).join('; ')}.`,
  importedIgnored: ({ heading, nearest }) =>
    nearest.length === 0
      ? `Column "${heading}" was not read.`
      : `Column "${heading}" was not read. Did you mean ${list(nearest)}?`,
  importRefused: ({ fault }) => fileText(fault),
  settings: () => 'What this shop has set:',
  settingChanged: ({ fact }, show) =>
    `${capital(factName(fact.name))}: ${amountText(fact.amount, show)}.`,
  exported: ({ files }) => `Everything this shop has kept: ${list(files)}.`,
  cardCode: ({ code }) => `Card ${code}`,
  cardAgain: ({ code, by, program, ...moment }) =>
    `Card ${code}, made for ${by}, ${momentText(moment)}, with Wholetooth ${program}.`,
  cardSame: () => 'Worked out today it is the same.',
  cardDiffers: ({ count }) =>
    `Worked out today ${count === 1 ? 'one figure differs' : `${String(count)} figures differ`}:`,
  cardNotToday: () =>
    'What it was worked out from cannot be read today: something it names has changed.',
  machineTaken: ({ machine }) => `For ${machine}.`,
  wheelTakenFrom: ({ wheel, place }) =>
    place === null ? `Wheel ${wheel}.` : `Wheel ${wheel}, in ${place}.`,
  wheelInState: ({ wheel, state }) => `Wheel ${wheel} is ${shopWord(state)}. Look at it first.`,
  shopMaterialTaken: ({ material, hardness }) =>
    hardness === null
      ? `${material} as the shop knows it.`
      : `${material} as the shop knows it, HB ${hardness.toFixed(0)}.`,
  undelivered: ({ count, fault }) =>
    count === 1
      ? `One message could not be delivered: ${fault}.`
      : `${String(count)} messages could not be delivered; the last because: ${fault}.`,
  givenUp: ({ what, attempts, fault }) =>
    attempts === 1
      ? `${GIVEN_UP[what]}: ${fault}.`
      : `${GIVEN_UP[what]}, ${String(attempts)} times tried: ${fault}.`,
  planCribOfShop: ({ wheels }) => `From ${counted('wheel', wheels)} of the shop's own crib.`,
  invented: () => 'This shop, its people and its parts are invented.',
};

export const shopRows: {
  readonly [K in keyof ShopRows]: (values: ShopRows[K], show: Show) => LabelledText;
} = {
  fact: ({ name, amount }, show) => ({
    label: capital(factName(name)),
    text: amount.kind === 'length' ? show.both(amount.value) : amountText(amount, show),
  }),
  listItem: ({ name, facts }, show) => ({
    label: name,
    text: facts.map((fact) => factText(fact, show)).join(', '),
  }),
  onDial: ({ dial, units, infeed, firstBite }) => {
    // The dial is read in its own unit, whatever the card is in.
    const show = showIn(units);
    const first = show.length(firstBite, 'up');
    return {
      label: 'On the dial',
      text: `${show.length(infeed)}, first turn ${first} or more (it reads ${shopWord(dial)})`,
    };
  },
  figureChanged: ({ name, before, after }, show) => ({
    label: capital(figureName(name)),
    text: `${before === null ? 'none' : figureText(name, before, show)}, today ${after === null ? 'none' : figureText(name, after, show)}`,
  }),
};

export const shopLabels: {
  readonly [K in keyof ShopLabels]: (values: ShopLabels[K], show: Show) => string;
} = {
  removeAnyway: ({ name }) => `Remove ${name} all the same`,
  today: () => 'Work it out today',
};
