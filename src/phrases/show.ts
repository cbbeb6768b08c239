import { M_PER_FOOT, MM_PER_INCH, type Mm } from '../calc/units.ts';

export type ShopUnits = 'in' | 'mm';

/** Which way a shown figure may be rounded without telling more than is true. */
export type Rounding = 'nearest' | 'up' | 'down';

const DECIMALS: Readonly<Record<ShopUnits, number>> = { in: 4, mm: 3 };

const rounded = (value: number, decimals: number, rounding: Rounding): string => {
  const scale = 10 ** decimals;
  // A hair of slack, so that 25.4 is not rounded down to 25.399 for its last binary digit.
  const steps = value * scale;
  const whole =
    rounding === 'up'
      ? Math.ceil(steps - 1e-6)
      : rounding === 'down'
        ? Math.floor(steps + 1e-6)
        : Math.round(steps);
  // Adding 0 turns a minus zero into a plain one.
  return (whole / scale + 0).toFixed(decimals);
};

/** Significant figures for numbers whose size varies widely, without exponents. */
const significant = (value: number, figures: number): string => {
  if (value === 0) return '0';
  const decimals = Math.max(0, figures - 1 - Math.floor(Math.log10(Math.abs(value))));
  return value.toFixed(Math.min(decimals, 6));
};

/**
 * Numbers as a shop reads them: inch with four decimals, metric with three, the shop's unit first
 * and the other beside it.
 */
export type Show = {
  readonly units: ShopUnits;
  /** `0.9852 in` */
  readonly length: (value: Mm | number, rounding?: Rounding) => string;
  /** `25.025 mm`: the same in the other system. */
  readonly other: (value: Mm | number, rounding?: Rounding) => string;
  /** `0.9852 in [25.025 mm]` */
  readonly both: (value: Mm | number, rounding?: Rounding) => string;
  /** `0.9838 to 0.9867` rounded inward. */
  readonly span: (low: Mm | number, high: Mm | number) => string;
  /** Without its unit. */
  readonly bare: (value: Mm | number, rounding?: Rounding) => string;
  readonly speed: (value: number) => string;
  readonly otherSpeed: (value: number) => string;
  readonly rotation: (value: number) => string;
  readonly feed: (value: number) => string;
  readonly feedSpan: (low: number, high: number) => string;
  readonly otherFeed: (value: number) => string;
  readonly angle: (value: number) => string;
  readonly percent: (value: number) => string;
  readonly teeth: (value: number) => string;
  readonly count: (value: number) => string;
  readonly time: (value: number) => string;
  readonly number: (value: number) => string;
};

const otherOf = (units: ShopUnits): ShopUnits => (units === 'in' ? 'mm' : 'in');
const scaleOf = (units: ShopUnits): number => (units === 'in' ? MM_PER_INCH : 1);

const lengthIn = (units: ShopUnits, value: number, rounding: Rounding): string =>
  rounded(value / scaleOf(units), DECIMALS[units], rounding);
const speedIn = (units: ShopUnits, value: number): string =>
  units === 'in' ? `${(value / M_PER_FOOT).toFixed(0)} ft/min` : `${significant(value, 3)} m/min`;
const feedIn = (units: ShopUnits, value: number): string =>
  rounded(value / scaleOf(units), units === 'in' ? 4 : 3, 'nearest');

/** Whole revolutions where that is fine enough, tenths for slow spindles. */
const rotation = (value: number): string =>
  `${value >= 100 ? value.toFixed(0) : significant(value, 3)} rev/min`;

/** Tenths of a degree, and finer where a swivel is that small. */
const degreesText = (value: number): string =>
  `${String(Number(value.toFixed(Math.abs(value) < 1 ? 2 : 1)))}°`;

const time = (value: number): string => {
  if (value < 10) return `${significant(value, 1)} s`;
  if (value < 90) return `${value.toFixed(0)} s`;
  if (value < 5400) return `${significant(value / 60, 2)} min`;
  return `${significant(value / 3600, 2)} h`;
};

export const showIn = (units: ShopUnits): Show => {
  const other = otherOf(units);
  const length = (value: number, rounding: Rounding = 'nearest'): string =>
    `${lengthIn(units, value, rounding)} ${units}`;
  const inOther = (value: number, rounding: Rounding = 'nearest'): string =>
    `${lengthIn(other, value, rounding)} ${other}`;
  return {
    units,
    length,
    other: inOther,
    both: (value, rounding = 'nearest') =>
      `${length(value, rounding)} [${inOther(value, rounding)}]`,
    span: (low, high) => `${lengthIn(units, low, 'up')} to ${lengthIn(units, high, 'down')}`,
    bare: (value, rounding = 'nearest') => lengthIn(units, value, rounding),
    speed: (value) => speedIn(units, value),
    otherSpeed: (value) => speedIn(other, value),
    rotation,
    feed: (value) => `${feedIn(units, value)} ${units}/rev`,
    feedSpan: (low, high) => `${feedIn(units, low)} to ${feedIn(units, high)}`,
    otherFeed: (value) => `${feedIn(other, value)} ${other}/rev`,
    angle: (value) => degreesText((value * 180) / Math.PI),
    percent: (value) => `${String(Number((value * 100).toFixed(1)))} %`,
    teeth: (value) => Math.abs(value).toFixed(2),
    count: (value) => String(Number(value.toFixed(1))),
    time,
    number: (value) => String(Number(significant(value, 4))),
  };
};
