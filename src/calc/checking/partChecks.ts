import { type Check, type CheckOf, figure } from '../check.ts';
import { fillCheck } from '../fill.ts';
import { finishCheck, type SetupRequest } from '../setup/index.ts';
import { toothCount } from '../teeth.ts';
import type { Judged, Off } from './judge.ts';
import { provenPitch } from './proven.ts';

/** A figure this many standard deviations from what was expected is off. Judgement. */
const OFF_FROM = 2.5;
/** A count this near to twice the expected one is a doubled pattern. Judgement. */
const DOUBLED_WITHIN = 0.06;

const isOff = (off: Off | null): boolean => off !== null && Math.abs(off.by) > OFF_FROM;

const countReason = (judged: Judged, counted: number): CheckOf<'count'>['reason'] => {
  const { countExpected, plan, part } = judged;
  if (counted === countExpected) return 'asExpected';
  if (Math.abs(counted / (2 * countExpected) - 1) <= DOUBLED_WITHIN) return 'doubled';
  const real = toothCount(part.blank, plan.pitch.transverse);
  const wheel = plan.checks.find((check) => check.name === 'wheel');
  const doubt = (wheel?.figures['countDoubt']?.value ?? 0) + 0.5;
  return Math.abs(counted - real) <= doubt + 1e-9 ? 'wheelDiffers' : 'notThisWheel';
};

const countCheck = (judged: Judged): CheckOf<'count'> | null => {
  const { teeth } = judged.part;
  if (teeth === null) return null;
  const reason = countReason(judged, teeth);
  const state = reason === 'asExpected' ? 'fine' : reason === 'wheelDiffers' ? 'watch' : 'stop';
  return {
    name: 'count',
    state,
    reason,
    figures: {
      countedTeeth: figure(teeth, '1'),
      countExpected: figure(judged.countExpected, '1'),
      effectivePitch: figure(provenPitch(judged.part.blank, teeth), 'mm'),
    },
  };
};

const filledCheck = (judged: Judged): CheckOf<'filled'> | null => {
  const { filled, fillMeasured, fillPlanned } = judged;
  if (filled === null || fillMeasured === null) return null;
  const reason = !isOff(filled) ? 'asPlanned' : filled.by < 0 ? 'short' : 'over';
  return {
    name: 'filled',
    state: reason === 'asPlanned' ? 'fine' : 'watch',
    reason,
    figures: { fillMeasured: figure(fillMeasured, '1'), fillExpected: figure(fillPlanned, '1') },
  };
};

const growthCheck = (judged: Judged, expected: number): CheckOf<'growth'> | null => {
  const { growth, growthFactor } = judged;
  if (growth === null || growthFactor === null) return null;
  const reason = !isOff(growth) ? 'asExpected' : growth.by < 0 ? 'less' : 'more';
  return {
    name: 'growth',
    state: reason === 'asExpected' ? 'fine' : 'watch',
    reason,
    figures: {
      growthFactor: figure(growthFactor, '1'),
      growthFactorExpected: figure(expected, '1'),
    },
  };
};

const finishOf = (judged: Judged, request: SetupRequest): CheckOf<'finish'> | null => {
  const { crest } = judged.part;
  if (request.finish === null || crest === null) return null;
  return finishCheck({ crest, crestLow: crest, crestHigh: crest }, request.finish);
};

/**
 * The checks a finished part can be put to, as far as it was measured.
 *
 *     count: N as worked out fine;  within Δ + 0.5 of π D/p_t watch;  else, or within 6 % of twice N, stop
 *     fill, growth: up to 2.5 standard deviations off fine, else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | judged | what was measured against what was planned, with the doubt Δ about the count | - | |
 * | request | the set-up the part was made by | - | |
 * | → checks | count, filled, fill, growth, finish and taper, those that were measured | - | |
 *
 * Assumes a pattern with nearly twice its teeth has doubled.
 *
 * @source wheel-truth (how far the count may be out)
 * @source check-limits (2.5 standard deviations, how well a part is read)
 * @source growth-prior (what growth to expect, and its spread)
 * @source judgement (6 % of twice the count)
 * @example partChecks(judge({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, included: DEFAULT_INCLUDED, stock: inch(1), finish: null, asIs: false, wantedTeeth: null, knurlClass: null, fill: null, material: materialById('steel-lowC-CD'), hardness: null, process: null, wheel: DEFAULT_WHEEL, edge: null, pin: 'hardened', pinDiameter: null, onePiece: false, length: null, stickout: null, support: 'chuck', layout: null, stockLength: null, bore: null, plug: false, feed: null, speed: null, rotation: null, turns: null, batch: 1, runout: null, machine: null, growth: growthBeforeResults() }, { blank: inch(0.9852), teeth: 65, crest: inch(1.004), toothHeight: null, flat: null, ends: null }), { finish: null, growth: growthBeforeResults(), material: materialById('steel-lowC-CD') }).map((check) => check.state) // ["fine", "fine"]
 */
export function partChecks(judged: Judged, request: SetupRequest): readonly Check[] {
  const materialFill = judged.plan.process === 'form' ? request.material.maxFill.value : null;
  const checks: (Check | null)[] = [
    countCheck(judged),
    filledCheck(judged),
    // A cut deeper than its whole tooth is at least full.
    judged.fillMeasured === null ? null : fillCheck(Math.min(1, judged.fillMeasured), materialFill),
    growthCheck(judged, request.growth.mean),
    finishOf(judged, request),
    judged.fade?.check ?? null,
  ];
  return checks.filter((check) => check !== null);
}
