import { mm, mmPerRev, revPerMin, type Steps, watt } from '../../calc/index.ts';
import { BARE_MACHINE, DIALS, type Machine } from '../machines.ts';
import { choice, plain, quantity, steps } from './cells.ts';
import { columnsOf, type Sheet } from './columns.ts';
import { numberText, wordsOf } from './write.ts';

const UNIT_WORDS: Readonly<Record<string, 'in' | 'mm'>> = {
  in: 'in',
  mm: 'mm',
  inch: 'in',
  inches: 'in',
  metric: 'mm',
};

const inUnits = (units: 'in' | 'mm'): string => units;
const perTurn = (units: 'in' | 'mm'): string => `${units}/rev`;

const stepsText = (given: Steps<number>): string =>
  'list' in given
    ? given.list.map(numberText).join(' ')
    : `${numberText(given.slowest)} to ${numberText(given.fastest)}`;

const machine = columnsOf<Machine>();

export const MACHINE_SHEET: Sheet<Machine> = {
  bare: BARE_MACHINE,
  columns: [
    machine('name', {
      heading: 'name',
      read: plain,
      write: String,
      also: ['machine', 'lathe'],
      needed: true,
    }),
    machine('speeds', {
      heading: 'speeds rpm',
      read: steps('rotation', revPerMin, () => 'rpm', ['60 90 140', '40 to 2000']),
      write: stepsText,
      also: ['spindle speeds', 'speed', 'spindle speed'],
    }),
    machine('feeds', {
      heading: 'feeds mm/rev',
      read: steps('feed', mmPerRev, perTurn, ['0.05 0.1 0.2 mm/rev', '0.002 to 0.03 in/rev']),
      write: stepsText,
      also: ['feed'],
    }),
    machine('dial', {
      heading: 'dial',
      read: choice(wordsOf(DIALS)),
      write: String,
      also: ['dial reads', 'cross slide', 'cross slide dial'],
    }),
    machine('units', { heading: 'units', read: choice(UNIT_WORDS), write: String, also: ['unit'] }),
    machine('largestDiameter', {
      heading: 'largest diameter mm',
      read: quantity('length', mm, inUnits, ['250 mm', '10 in']),
      write: numberText,
      also: ['swing', 'max diameter', 'diameter'],
    }),
    machine('turningSpread', {
      heading: 'turning spread mm',
      read: quantity('length', mm, inUnits, ['0.006 mm']),
      write: numberText,
      also: ['spread'],
    }),
    machine('topSpeed', {
      heading: 'top speed rpm',
      read: quantity('rotation', revPerMin, () => 'rpm', ['2000']),
      write: numberText,
      also: ['max speed', 'largest speed'],
    }),
    machine('power', {
      heading: 'power W',
      read: quantity('power', watt, () => 'kw', ['5.5 kW', '7.5 hp']),
      write: numberText,
      also: ['motor'],
    }),
  ],
};
