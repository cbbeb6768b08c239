import { degrees, type Mm, type Rad, within } from '../units.ts';

/** Relative rounding noise under which an argument still counts as standing on its limit. */
export const SLACK = 1e-12;
/** No length in this room is longer: a kilometre, only to keep endless numbers out. */
export const LONGEST = 1e6;
/** Flatter or sharper than this is no tooth. */
const SHARPEST = degrees(1);
const BLUNTEST = degrees(179);

/** A length that has to be there: a pitch, a diameter, a sharp height. */
export const positive = (what: string, value: Mm): Mm =>
  within(what, value, Number.MIN_VALUE, LONGEST, 'mm');

/** A length from nothing up to a limit; noise above the limit is taken for the limit itself. */
export const upTo = (what: string, value: Mm, most: Mm): Mm =>
  value > most && value <= most * (1 + SLACK) ? most : within(what, value, 0, most, 'mm');

/** Half the included tooth angle, the angle every formula of the tooth is written in. */
export const halfAngle = (included: Rad): number =>
  within('included', included, SHARPEST, BLUNTEST, 'rad') / 2;
