import type { Pitch, PitchSystem } from '../../calc/index.ts';
import type { ConvertLabels, ConvertLines, ConvertRows } from '../../card/convertLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { pitchName } from './names.ts';

const SYSTEM: { readonly [S in PitchSystem]: string } = {
  metric: 'Metric',
  tpi: 'TPI',
  dp: 'DP',
  module: 'Module',
};

/** Decimals a converted pitch is told with: a tenth of a per cent of a usual one or finer. */
const DECIMALS: { readonly [S in PitchSystem]: number } = { metric: 4, tpi: 2, dp: 2, module: 4 };

const rounded = ({ system, value }: Pitch): Pitch => ({
  system,
  value: Number(value.toFixed(DECIMALS[system])),
});

const off = (error: number): string =>
  Math.abs(error) < 5e-4
    ? 'the same'
    : `${(Math.abs(error) * 100).toFixed(1)} % ${error > 0 ? 'coarser' : 'finer'}`;

const share = (tolerance: number): string => `${String(Number((tolerance * 100).toFixed(2)))} %`;

export const convertLines: {
  readonly [K in keyof ConvertLines]: (values: ConvertLines[K], show: Show) => string;
} = {
  pitchIs: ({ pitch, systems }) =>
    `${pitchName(pitch)} is ${systems
      .filter(({ exact }) => exact.system !== pitch.system)
      .map(({ exact }) => pitchName(rounded(exact)))
      .join(', ')}`,
  alongRim: ({ helix }, show) =>
    `At a helix of ${show.angle(helix)}: DP along the rim, the others square to the teeth.`,
  straightTaken: () => 'DP as on a straight knurl; say diagonal or diamond for one with a helix.',
  wheelsWithin: ({ tolerance, wheels }) =>
    `${String(wheels)} ${wheels === 1 ? 'wheel comes' : 'wheels come'} within ${share(tolerance)}.`,
  noWheelWithin: ({ tolerance, wheel, pitch, error }, show) =>
    `No wheel comes within ${share(tolerance)}; the nearest is ${wheel}, ${show.both(pitch)}, ${off(error)}.`,
};

export const convertRows: {
  readonly [K in keyof ConvertRows]: (values: ConvertRows[K], show: Show) => LabelledText;
} = {
  inSystem: ({ exact, nearest, error }) => ({
    label: SYSTEM[exact.system],
    text: `${pitchName(rounded(exact))}; nearest made ${pitchName(rounded(nearest))}, ${off(error)}`,
  }),
  nearWheel: ({ place, wheel, pitch, error }, show) => ({
    label: `${String(place)}.`,
    text: `${wheel}: ${show.both(pitch)}, ${off(error)}`,
  }),
};

export const convertLabels: {
  readonly [K in keyof ConvertLabels]: (values: ConvertLabels[K], show: Show) => string;
} = {
  within: ({ tolerance }) => `Within ${share(tolerance)}`,
};
