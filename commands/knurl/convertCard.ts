import type { Converted, Mm, Pitch, PitchSystem, Rad } from '../../src/calc/index.ts';
import { type Card, type Choice, type Line, label, line, row } from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import type { ConvertWords } from './convertFields.ts';
import { type Crib, cribLine } from './shopCrib.ts';
import { reworded } from './words.ts';

/** The systems a pitch is told in, the metric one first. */
export const SYSTEMS: readonly PitchSystem[] = ['metric', 'tpi', 'dp', 'module'];

/** A wheel of the crib, its pitch square to the tooth, and how much coarser that is. */
export type Near = { readonly wheel: string; readonly pitch: Mm; readonly error: number };

type Converting = {
  readonly context: Context;
  readonly said: ConvertWords;
  readonly pitch: Pitch;
  readonly normal: Mm;
  readonly helix: Rad;
  readonly tolerance: number;
  /** No pattern was said: DP is told as for a straight knurl. */
  readonly straightTaken: boolean;
  readonly systems: readonly Converted[];
  readonly crib: Crib;
  readonly wheels: readonly Near[];
  /** The wheel that comes nearest of all, whatever the tolerance. */
  readonly nearest: Near | null;
};

/** Wheels told on the card; programs get all of them. */
const SHOWN = 5;

const otherUnits = ({ context, said }: Converting): Choice => {
  const turned = (said.units ?? context.units) === 'in' ? 'mm' : 'in';
  return {
    label: label('otherUnits', { units: turned }),
    words: reworded(context, ['units'], `show ${turned}`),
  };
};

/** A tolerance in whole per cent that takes the nearest wheel in. */
const widerChoice = ({ context, wheels, nearest }: Converting): readonly Choice[] => {
  if (wheels.length > 0 || nearest === null) return [];
  const percent = Math.ceil(Math.abs(nearest.error) * 100);
  return percent > 50
    ? []
    : [
        {
          label: label('within', { tolerance: percent / 100 }),
          words: reworded(context, ['tolerance'], `within ${String(percent)}%`),
        },
      ];
};

const wheelLines = (c: Converting): readonly Line[] => {
  const { wheels, tolerance, nearest } = c;
  if (wheels.length === 0)
    return nearest === null ? [] : [line('noWheelWithin', { tolerance, ...nearest })];
  return [line('wheelsWithin', { tolerance, wheels: wheels.length })];
};

/** The pitch in all systems, and the wheels that come near it. */
export const convertCard = (c: Converting): Card => ({
  verb: 'convert',
  headline: line('pitchIs', { pitch: c.pitch, systems: c.systems }),
  parts: [
    {
      part: 'lines',
      lines: [
        ...(c.helix === 0 ? [] : [line('alongRim', { helix: c.helix })]),
        ...(c.straightTaken ? [line('straightTaken', {})] : []),
      ],
    },
    { part: 'rows', rows: c.systems.map((each) => row('inSystem', each)) },
    { part: 'lines', lines: [...wheelLines(c), cribLine(c.crib)] },
    {
      part: 'rows',
      rows: c.wheels
        .slice(0, SHOWN)
        .map((wheel, index) => row('nearWheel', { ...wheel, place: index + 1 })),
    },
    { part: 'footing' },
  ],
  choices: [...widerChoice(c), otherUnits(c)],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  lists: {
    pitches: c.systems.map(({ exact, nearest, error }) => ({
      system: exact.system,
      exact: exact.value,
      nearest: nearest.value,
      error,
    })),
    wheels: c.wheels,
  },
  units: c.said.units ?? c.context.units,
});
