import { mm, type Pitch, rad } from '../../calc/index.ts';
import {
  BARE_WHEEL,
  EDGES,
  PIN_MATERIALS,
  WHEEL_STATES,
  type Wheel,
  type WheelForm,
} from '../wheels.ts';
import { choice, count, pitch, plain, quantity } from './cells.ts';
import { columnsOf, type Sheet } from './columns.ts';
import { angleText, numberText, wordOf, wordsOf, YES_NO } from './write.ts';

/** How the form of a wheel is written in a file; the first word for a form is written out. */
const FORMS: Readonly<Record<string, WheelForm>> = {
  straight: 'straight',
  'left helical': 'leftHelical',
  'right helical': 'rightHelical',
  'one piece raised': 'onePieceRaised',
  'one piece sunk': 'onePieceSunk',
  'helical left': 'leftHelical',
  'helical right': 'rightHelical',
  left: 'leftHelical',
  right: 'rightHelical',
  lh: 'leftHelical',
  rh: 'rightHelical',
  raised: 'onePieceRaised',
  sunk: 'onePieceSunk',
};
const EDGE_WORDS = { ...wordsOf(EDGES), beveled: 'bevelled' } as const;

const inUnits = (units: 'in' | 'mm'): string => units;
const size = (heading: string, example: string, also: readonly string[] = []) => ({
  heading: `${heading} mm`,
  read: quantity('length', mm, inUnits, [example]),
  write: numberText,
  also,
});
const angle = (heading: string, example: string, also: readonly string[]) => ({
  heading: `${heading} deg`,
  read: quantity('angle', rad, () => 'deg', [example]),
  write: angleText,
  also,
});
const text = (heading: string, also: readonly string[]) => ({
  heading,
  read: plain,
  write: String,
  also,
});
const whole = (heading: string, example: string, also: readonly string[]) => ({
  heading,
  read: count([example]),
  write: String,
  also,
});
const word = <T extends string>(
  heading: string,
  choices: Readonly<Record<string, T>>,
  also: readonly string[] = [],
) => ({ heading, read: choice(choices), write: (value: T) => wordOf(choices, value), also });

const pitchText = ({ system, value }: Pitch): string =>
  `${numberText(value)} ${system === 'metric' ? 'mm' : system}`;
const PITCH_EXAMPLES = ['21 tpi', '0.8 mm', '96 dp', 'm0.3'];

const wheel = columnsOf<Wheel>();

export const WHEEL_SHEET: Sheet<Wheel> = {
  bare: { ...BARE_WHEEL, form: 'straight' },
  columns: [
    wheel('name', { ...text('name', ['wheel']), needed: true }),
    wheel('form', { ...word('form', FORMS, ['kind', 'pattern', 'type']), needed: true }),
    wheel('pitch', {
      heading: 'pitch',
      read: pitch(PITCH_EXAMPLES),
      write: pitchText,
      also: ['label'],
    }),
    wheel('alongRim', {
      heading: 'along rim',
      read: choice(YES_NO),
      write: (yes) => wordOf(YES_NO, yes),
    }),
    wheel('teeth', whole('teeth', '63', ['counted teeth', 'tooth count'])),
    wheel('diameter', size('diameter', '20 mm', ['measured diameter', 'outside diameter', 'od'])),
    wheel('proven', size('proven pitch', '1.21 mm')),
    wheel('face', size('face', '8 mm', ['width', 'face width'])),
    wheel('bore', size('bore', '6 mm', ['hole'])),
    wheel('bevel', size('bevel', '1 mm')),
    wheel('included', angle('included angle', '90', ['included', 'tooth angle', 'angle'])),
    wheel('helix', angle('helix', '30', ['helix angle'])),
    wheel('toothDepth', size('tooth depth', '0.5 mm')),
    wheel('edge', word('edge', EDGE_WORDS, ['edges'])),
    wheel('pinDiameter', size('pin diameter', '6 mm', ['pin'])),
    wheel('pinMaterial', word('pin material', wordsOf(PIN_MATERIALS))),
    wheel('place', text('place', ['location', 'where', 'drawer'])),
    wheel('partsRun', whole('parts run', '1200', ['parts'])),
    wheel('state', word('state', wordsOf(WHEEL_STATES), ['condition'])),
  ],
};
