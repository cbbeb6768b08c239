import type { Check } from '../check.ts';
import type { ResolvedPitch, SetupRequest } from '../setup/index.ts';
import {
  type CheckAlternative,
  type CheckFigures,
  checkFigures,
  type PartMove,
} from './figures.ts';
import type { Judged, MeasuredPart } from './judge.ts';
import { type NextPartMoveId, nextPartMoves, type ThisPartMoveId, thisPartMoves } from './moves.ts';
import { provenPitch } from './proven.ts';
import type { Rescue } from './rescue.ts';
import { isSpoiled, look, type OffFigure, rescueOf, type Seen } from './seen.ts';

export type AfterCheck = {
  readonly figures: CheckFigures;
  readonly checks: readonly Check[];
  readonly alternatives: readonly CheckAlternative[];
  readonly right: boolean;
  /** What is off, the clearest first. */
  readonly off: readonly OffFigure[];
  /** How far the growth factor is off what was expected, in standard deviations. */
  readonly growthOffBy: number | null;
  readonly spoiled: boolean;
  readonly rescue: Rescue | null;
  readonly thisPart: readonly PartMove<ThisPartMoveId>[];
  readonly nextPart: readonly PartMove<NextPartMoveId>[];
  readonly pitch: ResolvedPitch;
};

const planFigures = (judged: Judged) => {
  const { tooth } = judged.plan.blank;
  const cut = judged.plan.process === 'cut';
  return {
    fillExpected: judged.fillPlanned,
    crestDiameter: tooth.crest,
    crestDiameterLow: tooth.crestLow,
    crestDiameterHigh: tooth.crestHigh,
    growthExpected: cut ? null : tooth.crest - judged.part.blank,
  };
};

const measuredFigures = ({ judged, request }: Seen) => {
  const { part, fade } = judged;
  return {
    blankDiameter: part.blank,
    countedTeeth: part.teeth,
    countExpected: judged.countExpected,
    effectivePitch: part.teeth === null ? null : provenPitch(part.blank, part.teeth),
    crestMeasured: part.crest,
    growthMeasured: judged.growthMeasured,
    growthFactor: judged.growthFactor,
    growthFactorExpected: judged.staticGrowth === null ? null : request.growth.mean,
    fillMeasured: judged.fillMeasured,
    fillFromCrest: judged.fillFromCrest,
    fillNear: fade?.fillNear ?? null,
    fillFar: fade?.fillFar ?? null,
    infeedNear: fade?.infeedNear ?? null,
    infeedFar: fade?.infeedFar ?? null,
    taper: fade?.taper ?? null,
    swivelAngle: fade?.swivelAngle ?? null,
  };
};

const afterFigures = (seen: Seen, rescue: Rescue | null): CheckFigures => {
  const { plan } = seen.judged;
  return checkFigures({
    toothCount: plan.blank.teeth,
    toothError: plan.figures.stockToothError?.value ?? null,
    pitch: plan.pitch.normal,
    transversePitch: plan.pitch.transverse,
    firstBite: plan.figures.firstBite?.value ?? null,
    ...planFigures(seen.judged),
    ...measuredFigures(seen),
    cleanedDiameter: rescue?.cleaned ?? null,
    rescueDiameter: rescue?.blank?.diameter ?? null,
    rescueToothCount: rescue?.blank?.teeth ?? null,
    rescueFill: rescue?.blank?.fill ?? null,
  });
};

/**
 * Whether a finished part is right, which of count, fill and growth is off, and what to do now.
 *
 *     N expected = round(π D/p_t);  x = H/Hf = 1 − w/p;  g = (Do − D)/growth(x);  Do = D + ḡ growth(x_crest)
 *     off: more than 2.5 standard deviations of what is expected and how well it is measured
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | request | the set-up the part was made by | - | |
 * | part | blank, counted teeth, crest diameter, tooth height, flat, flats at both ends; null: not measured | mm | |
 * | → countExpected | nearest whole count of the blank | - | |
 * | → growthMeasured | crest diameter less blank | mm | |
 * | → growthFactor | growth over the static one at the fill that was measured, else planned | - | |
 * | → fillFromCrest | fill the crest speaks for, or null beyond full form | - | |
 * | → off, thisPart, nextPart | what is off, and what to do to this part and to the next | - | |
 *
 * Assumes the crest is read to 0.01 mm, the height to 0.01 mm, the flat to 0.02 mm.
 *
 * @source check-after (figures of a part)
 * @source check-limits (when a figure is off)
 * @source round-work (static growth)
 * @source growth-prior (what growth to expect)
 * @example checkAfter({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, included: DEFAULT_INCLUDED, stock: inch(1), finish: null, asIs: false, wantedTeeth: null, knurlClass: null, fill: null, material: materialById('steel-lowC-CD'), hardness: null, process: null, wheel: DEFAULT_WHEEL, edge: null, pin: 'hardened', pinDiameter: null, onePiece: false, length: null, stickout: null, support: 'chuck', layout: null, stockLength: null, bore: null, plug: false, feed: null, speed: null, rotation: null, turns: null, batch: 1, runout: null, machine: null, growth: growthBeforeResults() }, { blank: inch(0.9852), teeth: 65, crest: inch(1.004), toothHeight: null, flat: null, ends: null }).right // true
 */
export function checkAfter(request: SetupRequest, part: MeasuredPart): AfterCheck {
  const seen = look(request, part);
  const spoiled = isSpoiled(seen);
  const rescue = spoiled ? rescueOf(seen) : null;
  const bad = seen.checks.some(({ state }) => state === 'stop');
  return {
    figures: afterFigures(seen, rescue),
    checks: seen.checks,
    alternatives: [rescue?.blank ?? null]
      .filter((blank) => blank !== null)
      .map(({ teeth, diameter }) => ({ toothCount: teeth, blankDiameter: diameter })),
    right: seen.off.length === 0 && !bad,
    off: seen.off,
    growthOffBy: seen.judged.growth === null ? null : Math.abs(seen.judged.growth.by),
    spoiled,
    rescue,
    thisPart: thisPartMoves(seen, rescue),
    nextPart: nextPartMoves(seen),
    pitch: seen.judged.plan.pitch,
  };
}
