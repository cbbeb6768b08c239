/**
 * Quantities as the trade measures them. Inside the program a length is always millimetres, an
 * angle radians, a surface speed m/min, a rotation rev/min. The brand makes a swapped argument a
 * compile error; the number itself stays a plain number.
 */
declare const unit: unique symbol;
type Branded<U extends string> = number & { readonly [unit]: U };

export type Mm = Branded<'mm'>;
export type Rad = Branded<'rad'>;
export type MPerMin = Branded<'m/min'>;
export type RevPerMin = Branded<'rev/min'>;
export type MmPerRev = Branded<'mm/rev'>;
export type Seconds = Branded<'s'>;
export type Newton = Branded<'N'>;
export type NewtonMm = Branded<'N·mm'>;
export type Watt = Branded<'W'>;
export type MPa = Branded<'MPa'>;
export type Kelvin = Branded<'K'>;

export const mm = (value: number): Mm => value as Mm;
export const rad = (value: number): Rad => value as Rad;
export const mPerMin = (value: number): MPerMin => value as MPerMin;
export const revPerMin = (value: number): RevPerMin => value as RevPerMin;
export const mmPerRev = (value: number): MmPerRev => value as MmPerRev;
export const seconds = (value: number): Seconds => value as Seconds;
export const newton = (value: number): Newton => value as Newton;
export const newtonMm = (value: number): NewtonMm => value as NewtonMm;
export const watt = (value: number): Watt => value as Watt;
export const mpa = (value: number): MPa => value as MPa;
export const kelvin = (value: number): Kelvin => value as Kelvin;

/** Exact by definition of the international inch. */
export const MM_PER_INCH = 25.4;
/** Exact: 12 in of 25.4 mm. */
export const M_PER_FOOT = 0.3048;

/** A length printed in inches. */
export const inch = (value: number): Mm => mm(value * MM_PER_INCH);
/** A surface speed printed in ft/min. */
export const feetPerMinute = (value: number): MPerMin => mPerMin(value * M_PER_FOOT);
/** An angle printed in degrees. */
export const degrees = (value: number): Rad => rad((value * Math.PI) / 180);

/** The units a formula card or a figure may name. */
export const UNITS = [
  '1',
  'mm',
  'rad',
  'm/min',
  'rev/min',
  'mm/rev',
  's',
  'N',
  'N·mm',
  'N/mm',
  'W',
  'W/mm²',
  'MPa',
  'K',
  'mm²',
  'mm³',
  'mm⁴',
  'm/s',
  'HB',
  'HRC',
  '%',
] as const;
export type UnitName = (typeof UNITS)[number];

/**
 * An argument that makes no sense (a negative pitch, a fill of 3). Arguments that make sense and
 * end badly are not this: they come back as checks.
 */
export class OutOfRange extends RangeError {
  readonly what: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  readonly unit: UnitName;

  constructor(what: string, value: number, min: number, max: number, unit: UnitName) {
    super(`${what} ${value} ${unit} is outside ${min} to ${max} ${unit}`);
    this.name = 'OutOfRange';
    this.what = what;
    this.value = value;
    this.min = min;
    this.max = max;
    this.unit = unit;
  }
}

/** Gives the value back, or throws OutOfRange when it is outside its limits or not a number. */
export const within = <T extends number>(
  what: string,
  value: T,
  min: number,
  max: number,
  unitName: UnitName = '1',
): T => {
  if (!(value >= min && value <= max)) throw new OutOfRange(what, value, min, max, unitName);
  return value;
};
