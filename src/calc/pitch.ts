import { inch, MM_PER_INCH, type Mm, mm, type Rad, within } from './units.ts';

/**
 * How a wheel says how fine it is. Each system measures something else: that is why one number is
 * never taken for another.
 */
export type PitchSystem = 'metric' | 'tpi' | 'dp' | 'module';
export type Pitch = { readonly system: PitchSystem; readonly value: number };

/** Normal: square to the tooth. Rim: along the rim, round the work. */
export type PitchBasis = 'normal' | 'rim';

/** Finest and coarsest normal pitch that is answered. Judgement: the range wheels are sold in. */
export const FINEST_PITCH: Mm = mm(0.2);
export const COARSEST_PITCH: Mm = mm(3.2);

const lengthOf = (pitch: Pitch): number => {
  switch (pitch.system) {
    case 'metric':
      return pitch.value;
    case 'tpi':
      return MM_PER_INCH / pitch.value;
    case 'dp':
      return (MM_PER_INCH * Math.PI) / pitch.value;
    case 'module':
      return Math.PI * pitch.value;
  }
};

/**
 * The pitch a label names, as a length, in whatever direction its system measures.
 *
 *     t = t;  t = 25.4 / TPI;  t = 25.4 π / DP;  t = π m
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | system | metric, tpi, dp or module | - | |
 * | value | the number on the label | - | > 0 |
 * | → t | pitch the label names | mm | |
 *
 * Assumes the label is true; a counted wheel is better.
 *
 * @source asme-b94.6 (N = P·D, so a diametral pitch is π/P in along the rim)
 * @source jis-b-0951 (t = π m)
 * @source tpi-practice (teeth per inch)
 * @example labelledPitch({ system: 'module', value: 0.3 }) // 0.942 mm
 */
export function labelledPitch(pitch: Pitch): Mm {
  within('pitch', pitch.value, Number.MIN_VALUE, Number.MAX_VALUE);
  return mm(lengthOf(pitch));
}

/**
 * Which direction a system's pitch is measured in when nothing is said.
 *
 *     metric, TPI, module: square to the tooth; DP: along the rim
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | system | metric, tpi, dp or module | - | |
 * | → basis | normal or rim | - | |
 *
 * Assumes helical wheels labelled as their standards define the pitch.
 *
 * @source din-403 (tooth counts of helical wheels are π·d·cos 30°/t: normal)
 * @source asme-b94.6 (N = P·D: along the rim)
 * @source tpi-practice (counted square to the teeth)
 * @source jis-b-0951 (D = n·m/cos 30°: normal)
 * @example basisOf('dp') // "rim"
 */
export function basisOf(system: PitchSystem): PitchBasis {
  return system === 'dp' ? 'rim' : 'normal';
}

export type WorkPitch = { readonly normal: Mm; readonly transverse: Mm };

/**
 * Pitch on the work, square to the tooth and round the rim.
 *
 *     p_t = p / cos ψ
 *
 * A straight wheel set over keeps its pitch square to the tooth, whatever its label measures.
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pitch | the label's pitch | mm | > 0 |
 * | basis | what the label measures: normal or rim | - | |
 * | ψ (helix) | helix of the teeth on the work | rad | 0 to 1.2 |
 * | setOver | a straight wheel swivelled by ψ | - | |
 * | → normal | pitch square to the tooth, p | mm | |
 * | → transverse | pitch round the rim, p_t | mm | |
 *
 * Assumes the wheel's axis lies in the plane through the work's axis and the contact.
 *
 * @source asme-b94.6 (a straight wheel set over: N = D·P·cos ψ)
 * @source tpi-practice (transverse TPI = TPI·cos ψ)
 * @example workPitch({ pitch: inch(0.05), basis: 'normal', helix: degrees(30), setOver: false }).transverse // 1.4665 mm
 * @example workPitch({ pitch: mm(1), basis: 'rim', helix: degrees(30), setOver: true }).transverse // 1.1547 mm
 */
export function workPitch(of: {
  readonly pitch: Mm;
  readonly basis: PitchBasis;
  readonly helix: Rad;
  readonly setOver: boolean;
}): WorkPitch {
  within('pitch', of.pitch, Number.MIN_VALUE, Number.MAX_VALUE, 'mm');
  within('helix', of.helix, 0, 1.2, 'rad');
  const cos = Math.cos(of.helix);
  const normal = of.basis === 'rim' && !of.setOver ? of.pitch * cos : of.pitch;
  return { normal: mm(normal), transverse: mm(normal / cos) };
}

/**
 * Rim pitch of a wheel that was counted and measured: the truth about it, whatever its label.
 *
 *     p_w = π D_w / N_w
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Dw (diameter) | outside diameter of the wheel | mm | > 0 |
 * | Nw (teeth) | teeth counted on the wheel | - | ≥ 3 |
 * | → p_w | pitch along the wheel's rim | mm | |
 *
 * Assumes the wheel rolls on its outside diameter.
 *
 * @source din-403 (some printed counts are not the nearest whole number, so labels are off by up to 2 %)
 * @example countedWheelPitch(mm(19.05), 60) // 0.997456 mm
 */
export function countedWheelPitch(diameter: Mm, teeth: number): Mm {
  within('wheelDiameter', diameter, Number.MIN_VALUE, 1000, 'mm');
  within('wheelTeeth', teeth, 3, 10000);
  return mm((Math.PI * diameter) / teeth);
}

/** Diametral pitches that the standard lists. */
export const STANDARD_DP = [64, 96, 128, 160] as const;
export type StandardDp = (typeof STANDARD_DP)[number];

const BLANK_STEP_IN: Record<StandardDp, number> = {
  64: 1 / 64,
  96: 1 / 32,
  128: 1 / 64,
  160: 1 / 32,
};

/**
 * The diametral pitch of the standard that a label's number is.
 *
 *     64, 96, 128, 160; any other: null
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | value | diametral pitch on the label | - | |
 * | → dp | the same pitch, or null | - | |
 *
 * Assumes a label prints the number as the standard lists it.
 *
 * @source asme-b94.6 (64, 96, 128 and 160 DP)
 * @example standardDp(96) // 96
 * @example standardDp(100) // null
 */
export function standardDp(value: number): StandardDp | null {
  return STANDARD_DP.find((dp) => dp === value) ?? null;
}

/**
 * Whether a blank is one of the fractional sizes a diametral pitch is made for.
 *
 *     D = k/64 in for 64 and 128 DP, k/32 in for 96 and 160 DP
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | dp | diametral pitch | - | 64, 96, 128 or 160 |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | tolerance | how far off it may be | mm | ≥ 0 |
 * | → own | true on its own fractional blanks | - | |
 *
 * Assumes the wheel is made to the standard.
 *
 * @source asme-b94.6-reported (blank steps of the pitches)
 * @example onOwnBlank(96, inch(1), mm(0.001)) // true
 * @example onOwnBlank(96, inch(0.99), mm(0.001)) // false
 */
export function onOwnBlank(dp: StandardDp, diameter: Mm, tolerance: Mm): boolean {
  const step = inch(BLANK_STEP_IN[dp]);
  // A hair of slack: a blank that is off by just the tolerance is on it in inches and millimetres.
  return Math.abs(diameter - Math.round(diameter / step) * step) <= tolerance + 1e-9;
}
