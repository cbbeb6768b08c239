import { type CheckOf, figure, type State, verdict } from './check.ts';
import { onOwnBlank, type Pitch, type StandardDp, standardDp } from './pitch.ts';
import { FEWEST_SENSIBLE_TEETH, toothCount, toothError, wholeToothDiameter } from './teeth.ts';
import { inch, type Mm, mm, within } from './units.ts';

/** Share of a tooth up to which a blank tracks. Judgement, backed by the Class I blank tolerances. */
export const TRACKS_WITHIN = 0.1;
/** Share of a tooth above which it does not. Judgement. */
export const TRACKS_NOT_ABOVE = 0.2;
/** Uncertainty in teeth above which the wheel's label is worth a seam test. Judgement. */
export const COUNT_DOUBT_LIMIT = 0.25;

export type KnurlClass = 'I' | 'II' | 'III';

/** Blank tolerance of Class I in inches, by pitch. Read, Machinery's Handbook 31 p. 1060. */
const CLASS_I_BLANK_IN: Record<StandardDp, number> = {
  64: 0.0015,
  96: 0.001,
  128: 0.0007,
  160: 0.0005,
};
/** Blank tolerance of Class III, minus only, in inches. From memory. */
const CLASS_III_BLANK_IN: Record<StandardDp, number> = {
  64: 0.0015,
  96: 0.001,
  128: 0.0007,
  160: 0.0005,
};

export type Window = { readonly low: Mm; readonly high: Mm };

/**
 * Blank tolerance that a class of diametral-pitch knurl allows, either side of the nominal blank.
 *
 *     I and II: ±t; III: +0 / −t
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | dp | diametral pitch | - | 64, 96, 128 or 160 |
 * | class (knurlClass) | I, II or III | - | |
 * | → below, above | tolerance below and above the nominal blank | mm | |
 *
 * Assumes Class II blanks are held as Class I.
 *
 * @source asme-b94.6 (Class I: ±0.0015, ±0.0010, ±0.0007, ±0.0005 in)
 * @source asme-b94.6-memory (Classes II and III)
 * @example classBlankTolerance(96, 'I').above // 0.0254 mm
 * @example classBlankTolerance(160, 'III').above // 0 mm
 */
export function classBlankTolerance(
  dp: StandardDp,
  knurlClass: KnurlClass,
): { readonly below: Mm; readonly above: Mm } {
  if (knurlClass === 'III') return { below: inch(CLASS_III_BLANK_IN[dp]), above: mm(0) };
  return { below: inch(CLASS_I_BLANK_IN[dp]), above: inch(CLASS_I_BLANK_IN[dp]) };
}

/**
 * Diameters round a whole-tooth blank that still track.
 *
 *     D ± 0.10 p_t/π, or the tolerance of the class that was called out
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | N (teeth) | whole count the window belongs to | - | ≥ 3 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | dp | diametral pitch, where a class is called out | - | or null |
 * | class (knurlClass) | I, II, III or null | - | |
 * | → low, high | smallest and largest blank that tracks | mm | |
 *
 * Assumes the label's pitch is true; the check on the wheel says how far to trust that.
 *
 * @source window-thresholds (±0.10 of a tooth)
 * @source asme-b94.6 (class tolerances)
 * @example trackingWindow({ teeth: 65, transversePitch: inch(1 / 21), dp: null, knurlClass: null }).low // 24.9867 mm
 */
export function trackingWindow(of: {
  readonly teeth: number;
  readonly transversePitch: Mm;
  readonly dp: StandardDp | null;
  readonly knurlClass: KnurlClass | null;
}): Window {
  const nominal = wholeToothDiameter(of.teeth, of.transversePitch);
  if (of.dp !== null && of.knurlClass !== null) {
    const { below, above } = classBlankTolerance(of.dp, of.knurlClass);
    return { low: mm(nominal - below), high: mm(nominal + above) };
  }
  const share = wholeToothDiameter(TRACKS_WITHIN, of.transversePitch);
  return { low: mm(nominal - share), high: mm(nominal + share) };
}

/**
 * Infeed of the first turn from which the tip falls back into its own first groove.
 *
 *     H1 = 2 δ Hf,  z1 = H1 − H1²/(2 Hf)  →  0.18 Hf at δ = 0.10
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Hf (sharpHeight) | sharp tooth height | mm | > 0 |
 * | δ (share) | share of a tooth to be caught | - | 0 to 0.5 |
 * | → z1 | infeed of the first turn | mm | |
 *
 * Assumes each groove family is cut by its own wheel, so the straight relation holds for all.
 *
 * @source first-bite (capture geometry of one flank)
 * @example firstBite(mm(0.5), 0.1) // 0.09 mm
 */
export function firstBite(sharpHeight: Mm, share: number): Mm {
  within('sharpHeight', sharpHeight, Number.MIN_VALUE, 1000, 'mm');
  within('share', share, 0, 0.5);
  const s = 2 * share;
  return mm(sharpHeight * (s - (s * s) / 2));
}

/**
 * Infeed of the first turn of a knurl that is cut, as deep as the groove it has to fall back into.
 *
 *     z1 = H1 = 2 δ Hf
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Hf (sharpHeight) | sharp height | mm | > 0 |
 * | δ (share) | share of a tooth to be caught | - | 0 to 0.5 |
 * | → z1 | infeed of the first turn | mm | |
 *
 * Assumes a cut takes away what a form pushes up, so nothing rises beside the groove.
 *
 * @source first-bite (capture geometry of one flank)
 * @example firstCutBite(mm(0.6), 0.1) // 0.12 mm
 */
export function firstCutBite(sharpHeight: Mm, share: number): Mm {
  within('share', share, 0, 0.5);
  return mm(2 * share * sharpHeight);
}

/**
 * Share of a tooth that a first turn of a given infeed still catches.
 *
 *     δ < H1/(2 Hf),  H1 = Hf (1 − √(1 − 2 z1/Hf))
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Hf (sharpHeight) | sharp tooth height | mm | > 0 |
 * | z1 (infeed) | infeed of the first turn | mm | 0 to Hf/2 |
 * | → δ | share of a tooth | - | 0 to 0.5 |
 *
 * Assumes each groove family is cut by its own wheel.
 *
 * @source first-bite (firstBite, solved for the share)
 * @example caughtShare(mm(0.5), mm(0.15)) // 0.183772
 */
export function caughtShare(sharpHeight: Mm, infeed: Mm): number {
  within('sharpHeight', sharpHeight, Number.MIN_VALUE, 1000, 'mm');
  within('infeed', infeed, 0, sharpHeight / 2, 'mm');
  return (1 - Math.sqrt(1 - (2 * infeed) / sharpHeight)) / 2;
}

const trackingReason = (
  delta: number,
  state: State,
): 'whole' | 'inWindow' | 'nearEdge' | 'offWhole' => {
  if (state === 'watch') return 'nearEdge';
  if (state === 'stop') return 'offWhole';
  return Math.abs(delta) < 1e-6 ? 'whole' : 'inWindow';
};

/** How far outside its class window a blank may be before it stops: twice, as without a class. */
const CLASS_WATCH_FACTOR = TRACKS_NOT_ABOVE / TRACKS_WITHIN;

const classState = (diameter: Mm, window: Window, nominal: Mm): State => {
  const reach = diameter < nominal ? nominal - window.low : window.high - nominal;
  const off = Math.abs(diameter - nominal);
  return verdict(off, reach + 1e-9, CLASS_WATCH_FACTOR * reach + 1e-9);
};

/**
 * Whether the pattern meets itself after one turn.
 *
 *     |δ| ≤ 0.10 fine, ≤ 0.20 watch, else stop; under 12 teeth stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | dp | diametral pitch, where a class is called out | - | or null |
 * | class (knurlClass) | I, II, III or null: its own tolerance is the window | - | |
 * | → check | tracking, with toothError and the smallest sensible diameter | - | |
 *
 * Assumes the label's pitch is true.
 *
 * @source window-thresholds (0.10 and 0.20 of a tooth)
 * @source common-practice (fewer than 12 teeth do not roll)
 * @example trackingCheck({ diameter: mm(25.4), transversePitch: mm(1), dp: null, knurlClass: null }).state // "stop"
 */
export function trackingCheck(of: {
  readonly diameter: Mm;
  readonly transversePitch: Mm;
  readonly dp: StandardDp | null;
  readonly knurlClass: KnurlClass | null;
}): CheckOf<'tracking'> {
  const teeth = Math.round(toothCount(of.diameter, of.transversePitch));
  const delta = toothError(of.diameter, of.transversePitch);
  const smallest = wholeToothDiameter(FEWEST_SENSIBLE_TEETH, of.transversePitch);
  const figures = {
    toothError: figure(Math.abs(delta) < 1e-9 ? 0 : delta, '1'),
    smallestDiameter: figure(smallest, 'mm'),
  };
  if (teeth < FEWEST_SENSIBLE_TEETH)
    return { name: 'tracking', state: 'stop', reason: 'fewTeeth', figures };
  const nominal = wholeToothDiameter(teeth, of.transversePitch);
  const state =
    of.dp !== null && of.knurlClass !== null
      ? classState(of.diameter, trackingWindow({ ...of, teeth }), nominal)
      : verdict(Math.abs(delta) - 1e-9, TRACKS_WITHIN, TRACKS_NOT_ABOVE);
  return { name: 'tracking', state, reason: trackingReason(delta, state), figures };
}

/** What is known of the wheel's pitch, from least to best. */
export type WheelKnowledge = 'label' | 'counted' | 'proven';

/** Half width of the doubt about the pitch: labels are off by up to 2 %, and the free-rolling circle lies somewhere between surface and groove root. Derived / judgement. */
export const LABEL_DOUBT = 0.025;
/** A wheel counted and measured. Judgement. */
export const COUNTED_DOUBT = 0.005;
/** A proven pair is good to this many teeth in all. Judgement. */
export const PROVEN_DOUBT_TEETH = 0.1;

/**
 * How far the predicted count may be out, in teeth.
 *
 *     Δ = u N, u = 2.5 % label, 0.5 % counted, 0.1/N proven, 0 DP on its own blanks
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | N (teeth) | teeth round the work | - | > 0 |
 * | knowledge | label, counted or proven | - | |
 * | ownBlank | a DP wheel on its own fractional blank | - | |
 * | → Δ | half width of the doubt | - | |
 *
 * Assumes the doubt is spread evenly between its ends.
 *
 * @source wheel-truth (DIN 403 counts and the rolling circle)
 * @example countDoubt(65, 'label', false) // 1.625
 */
export function countDoubt(teeth: number, knowledge: WheelKnowledge, ownBlank: boolean): number {
  within('teeth', teeth, 0, 1e7);
  if (knowledge === 'proven') return PROVEN_DOUBT_TEETH;
  if (knowledge === 'counted') return COUNTED_DOUBT * teeth;
  return ownBlank ? 0 : LABEL_DOUBT * teeth;
}

/**
 * Whether the wheel's pitch is known well enough to trust the count.
 *
 *     Δ ≤ 0.25 of a tooth fine, else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (blankDiameter) | diameter of the blank | mm | > 0 |
 * | N (teeth) | teeth round the work | - | > 0 |
 * | pitch | the label, or null for a counted wheel | - | |
 * | knowledge | label, counted or proven | - | |
 * | setOver | a straight wheel swivelled: never on its own blank | - | |
 * | → check | wheel, with countDoubt | - | |
 *
 * Assumes a DP wheel's correction holds for unswivelled wheels only.
 *
 * @source wheel-truth (half widths)
 * @source asme-b94.6-reported (fractional blanks)
 * @example wheelCheck({ blankDiameter: inch(1), teeth: 96, pitch: { system: 'dp', value: 96 }, knowledge: 'label', setOver: false }).state // "fine"
 */
export function wheelCheck(of: {
  readonly blankDiameter: Mm;
  readonly teeth: number;
  readonly pitch: Pitch | null;
  readonly knowledge: WheelKnowledge;
  readonly setOver: boolean;
}): CheckOf<'wheel'> {
  const dp = of.pitch?.system === 'dp' && !of.setOver ? standardDp(of.pitch.value) : null;
  const own =
    of.knowledge === 'label' &&
    dp !== null &&
    onOwnBlank(dp, of.blankDiameter, classBlankTolerance(dp, 'I').above);
  const doubt = countDoubt(of.teeth, of.knowledge, own);
  return {
    name: 'wheel',
    state: doubt <= COUNT_DOUBT_LIMIT ? 'fine' : 'watch',
    reason: own ? 'ownBlank' : of.knowledge,
    figures: { countDoubt: figure(doubt, '1') },
  };
}

/**
 * Whether a bar that runs out still bites all the way round on its first turn.
 *
 *     e = reading/2 against z1: ≤ z1/2 fine, ≤ z1 watch, else stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | reading (runout) | indicator reading over one turn | mm | ≥ 0 |
 * | z1 (bite) | infeed of the first turn | mm | > 0 |
 * | → check | runout, with eccentricity and bite | - | |
 *
 * Assumes the reading is twice the eccentricity.
 *
 * @source judgement (half the first bite)
 * @example runoutCheck(mm(0.1), mm(0.1)).state // "fine"
 */
export function runoutCheck(runout: Mm, bite: Mm): CheckOf<'runout'> {
  within('runout', runout, 0, 1000, 'mm');
  const eccentricity = runout / 2;
  const state = verdict(eccentricity - 1e-12, bite / 2, bite);
  return {
    name: 'runout',
    state,
    reason: state === 'fine' ? 'within' : state === 'watch' ? 'close' : 'over',
    figures: { eccentricity: figure(eccentricity, 'mm'), firstBite: figure(bite, 'mm') },
  };
}
