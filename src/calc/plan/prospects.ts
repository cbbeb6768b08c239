import { type CribWheel, cribPitch, suitsPattern, withPairs } from '../crib.ts';
import { DEFAULT_FILL, OVER_FULL, SHALLOW_BELOW } from '../fill.ts';
import { formRating } from '../formOrCut.ts';
import {
  formedRound,
  heightFromCrest,
  roundWheelToothHeight,
  sharpHeight,
} from '../growth/index.ts';
import { formOf } from '../pattern.ts';
import type { ResolvedPitch } from '../setup/index.ts';
import { resolvePitch } from '../setup/index.ts';
import type { Process } from '../speed.ts';
import { FEWEST_SENSIBLE_TEETH, wholeToothDiameter } from '../teeth.ts';
import { type Window, wheelCheck } from '../tracking.ts';
import { type Mm, mm } from '../units.ts';
import { chanceOfLanding, chanceOfTracking, chanceOfTurning, toothErrorSpread } from './chances.ts';
import type { LimitedBy, PlanRequest } from './request.ts';

/** A wheel that suits the job, with what does not depend on the count. */
export type Fitting = {
  readonly wheel: CribWheel;
  readonly pitch: ResolvedPitch;
  readonly pitchError: number | null;
  readonly sharpHeight: Mm;
  /** Fullest tooth: neither packed nor taller than the wheel's own. */
  readonly fullest: number;
};

/** Wheel, count and blank with both chances, before force, feed and pin are looked at. */
export type Prospect = {
  readonly fitting: Fitting;
  readonly toothCount: number;
  readonly blankDiameter: Mm;
  readonly fill: number;
  readonly crestDiameter: Mm;
  readonly chanceTracks: number;
  readonly chanceLands: number;
  /** The weaker of the two chances, by its cause. */
  readonly weakest: LimitedBy;
};

/** Included angles this near are one. */
const SAME_ANGLE = 0.01;
/** Rounding noise that puts nothing outside its limit. */
const HAIR = 1e-9;

export const middleOf = (limits: Window): Mm => mm((limits.low + limits.high) / 2);

export const processOf = ({ job }: PlanRequest): Process => {
  const forms = formRating(job.material, job.hardness) !== 'no';
  return job.process ?? (forms ? 'form' : 'cut');
};

const pitchAsked = ({ job }: PlanRequest): Mm | null =>
  job.pitch === null
    ? null
    : resolvePitch({ ...job, counted: null, proven: null, tilt: null }).normal;

const fittingOf = (wheel: CribWheel, asked: Mm | null): Fitting => {
  const pitch = cribPitch(wheel);
  const sharp = sharpHeight(pitch.normal, wheel.included);
  const own =
    wheel.teeth === null ? sharp : roundWheelToothHeight(pitch.normal, wheel.included, wheel.teeth);
  return {
    wheel,
    pitch,
    pitchError: asked === null ? null : pitch.normal / asked - 1,
    sharpHeight: sharp,
    fullest: Math.min(OVER_FULL, own / sharp),
  };
};

const angleSuits = (wheel: CribWheel, { included }: PlanRequest): boolean =>
  included === null || Math.abs(wheel.included - included) <= SAME_ANGLE;

/** Wheels of the crib, pairs included, that leave the pattern at a pitch near enough. */
export const fittingsOf = (request: PlanRequest): readonly Fitting[] => {
  const asked = pitchAsked(request);
  return withPairs(request.crib)
    .filter((wheel) => suitsPattern(wheel.pattern, request.job.pattern))
    .filter((wheel) => angleSuits(wheel, request))
    .map((wheel) => fittingOf(wheel, asked))
    .filter(({ pitchError }) => Math.abs(pitchError ?? 0) <= request.pitchTolerance + HAIR);
};

const doubtOf = ({ wheel, pitch }: Fitting, blankDiameter: Mm, teeth: number): number => {
  const { knowledge, setOver } = pitch;
  const check = wheelCheck({ blankDiameter, teeth, pitch: wheel.pitch, knowledge, setOver });
  return check.figures['countDoubt']?.value ?? 0;
};

type Tracking = { readonly chance: number; readonly cause: LimitedBy };

const trackingOf = (
  fitting: Fitting,
  blank: Mm,
  teeth: number,
  { turningSpread }: PlanRequest,
): Tracking => {
  const transversePitch = fitting.pitch.transverse;
  const countDoubt = doubtOf(fitting, blank, teeth);
  const all = { turningSpread, transversePitch, countDoubt };
  const byTurning = toothErrorSpread({ ...all, countDoubt: 0 });
  const byWheel = toothErrorSpread({ ...all, turningSpread: mm(0) });
  return { chance: chanceOfTracking(all), cause: byWheel > byTurning ? 'wheel' : 'turning' };
};

const prospect = (
  of: Pick<
    Prospect,
    'fitting' | 'toothCount' | 'blankDiameter' | 'fill' | 'crestDiameter' | 'chanceLands'
  >,
  landing: LimitedBy,
  request: PlanRequest,
): Prospect => {
  const { chance, cause } = trackingOf(of.fitting, of.blankDiameter, of.toothCount, request);
  return { ...of, chanceTracks: chance, weakest: chance <= of.chanceLands ? cause : landing };
};

/** What a formed tooth does to a blank at the shallowest and at the fullest fill. */
export type Reach = {
  readonly fitting: Fitting;
  readonly toothCount: number;
  readonly blankDiameter: Mm;
  readonly shallow: Mm;
  readonly full: Mm;
};

const reachOf = (fitting: Fitting, toothCount: number): Reach => {
  const blankDiameter = wholeToothDiameter(toothCount, fitting.pitch.transverse);
  const growth = (fill: number): Mm =>
    formedRound({
      form: formOf(fitting.wheel.pattern),
      blankDiameter,
      height: mm(fill * fitting.sharpHeight),
      sharpHeight: fitting.sharpHeight,
    }).growth;
  const shallow = growth(Math.min(SHALLOW_BELOW, fitting.fullest));
  return { fitting, toothCount, blankDiameter, shallow, full: growth(fitting.fullest) };
};

/** Every count whose crest can come anywhere near a diameter, and one more on either side. */
export const reachesNear = (
  fitting: Fitting,
  crest: Mm,
  request: PlanRequest,
): readonly Reach[] => {
  const step = wholeToothDiameter(1, fitting.pitch.transverse);
  // No growth of a full tooth is more than twice its height on the diameter.
  const least = (crest - 2 * request.job.growth.mean * fitting.sharpHeight) / step;
  const first = Math.max(FEWEST_SENSIBLE_TEETH, Math.floor(least));
  const most = Math.min(crest + step, request.job.stock ?? Number.POSITIVE_INFINITY);
  const last = Math.floor(most / step + HAIR);
  const counts = Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i);
  return counts.map((count) => reachOf(fitting, count));
};

/** How far a reach lies from bringing the expected crest to a diameter; 0 where it does. */
export const missOf = (reach: Reach, crest: Mm, mean: number): number => {
  const lowest = reach.blankDiameter + mean * reach.shallow;
  const highest = reach.blankDiameter + mean * reach.full;
  if (crest < lowest - HAIR) return lowest - crest;
  return crest > highest + HAIR ? highest - crest : 0;
};

/** The crest brought to a diameter; it lands anywhere inside `lands`. Null where the fill does not reach it. */
export const formedProspect = (
  reach: Reach,
  crest: Mm,
  lands: Window,
  request: PlanRequest,
): Prospect | null => {
  const { growth } = request.job;
  const { fitting, toothCount, blankDiameter, shallow, full } = reach;
  if (missOf(reach, crest, growth.mean) !== 0) return null;
  const height = heightFromCrest({
    form: formOf(fitting.wheel.pattern),
    blankDiameter,
    crestDiameter: mm(blankDiameter + (crest - blankDiameter) / growth.mean),
    sharpHeight: fitting.sharpHeight,
  });
  const fill = Math.min(fitting.fullest, (height ?? fitting.sharpHeight) / fitting.sharpHeight);
  const wanted = { low: mm(lands.low - blankDiameter), high: mm(lands.high - blankDiameter) };
  const chanceLands = chanceOfLanding({ wanted, shallow, full, belief: growth });
  const made = { fitting, toothCount, blankDiameter, fill, crestDiameter: crest, chanceLands };
  return prospect(made, 'growth', request);
};

/** A cut knurl's crest is its blank, so the whole count itself must lie inside the limits. */
export const cutProspects = (fitting: Fitting, request: PlanRequest): readonly Prospect[] => {
  const { limits, turningSpread, job } = request;
  const step = wholeToothDiameter(1, fitting.pitch.transverse);
  const most = Math.min(limits.high, job.stock ?? limits.high);
  const first = Math.max(FEWEST_SENSIBLE_TEETH, Math.ceil(limits.low / step - HAIR));
  const last = Math.floor(most / step + HAIR);
  const fill = Math.min(DEFAULT_FILL, fitting.fullest);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => {
    const toothCount = first + i;
    const diameter = wholeToothDiameter(toothCount, fitting.pitch.transverse);
    const chanceLands = chanceOfTurning({ diameter, limits, turningSpread });
    const made = { fitting, toothCount, fill, chanceLands };
    return prospect(
      { ...made, blankDiameter: diameter, crestDiameter: diameter },
      'turning',
      request,
    );
  });
};

export const productOf = (prospect: Prospect): number =>
  prospect.chanceTracks * prospect.chanceLands;

export const likeliestFirst = (prospects: readonly Prospect[]): readonly Prospect[] =>
  [...prospects].sort((a, b) => productOf(b) - productOf(a));

/** Every wheel and whole count that brings the crest where it is wanted, the likeliest first. */
export const prospectsOf = (
  fittings: readonly Fitting[],
  request: PlanRequest,
): readonly Prospect[] => {
  const process = processOf(request);
  const middle = middleOf(request.limits);
  const found = fittings.flatMap((fitting) =>
    process === 'cut'
      ? cutProspects(fitting, request)
      : reachesNear(fitting, middle, request).flatMap(
          (reach) => formedProspect(reach, middle, { low: middle, high: middle }, request) ?? [],
        ),
  );
  return likeliestFirst(found);
};
