import type { SetupResult } from '../../../src/calc/setup/index.ts';
import { figureOf, inCheck, isPair, type Job, knurlWidth, travels } from './job.ts';

/** What can come of a job, each as a number that is 1 where it begins to be seen. */
export type Effects = {
  readonly doesNotMeet: number;
  readonly oneSided: number;
  readonly shallow: number;
  readonly fades: number;
  readonly slivers: number;
  readonly tears: number;
  readonly hotPin: number;
  readonly jammedPin: number;
  readonly teethBreak: number;
  readonly bends: number;
  readonly ovals: number;
  readonly uneven: number;
  readonly tooLarge: number;
  readonly tooSmall: number;
  readonly ridge: number;
  readonly vibrates: number;
  readonly slips: number;
  readonly marks: number;
};
export type Effect = keyof Effects;

/** What a chuck holds with, N. */
const GRIP = 6000;

type Scene = ReturnType<typeof sceneOf>;

/** Mechanical facts of a job that several things come of. */
const sceneOf = (job: Job, result: SetupResult, force: number) => {
  const { request, hidden } = job;
  const { material } = request;
  const hardening = material.hardeningClass ?? 'low';
  const turns = Math.max(1, figureOf(result, 'turns'));
  const fill = Math.min(1, result.blank.tooth.fill - hidden.fillShort);
  const deepest = Math.min(0.92, material.maxFill.value ?? 1);
  const hard = (request.hardness ?? material.hardness.value ?? 100) / 275;
  const short = 8.5 / material.elongation.value;
  const rated = { yes: 0, marginal: 1.05, no: 1.3 }[material.formKnurl];
  return {
    job,
    result,
    force,
    hidden,
    infeed: figureOf(result, 'infeed'),
    bite: figureOf(result, 'firstBite') * hidden.biteFactor,
    blank: result.blank.diameter + hidden.blankOff,
    fill,
    packed: Math.max(0, fill - deepest) / 0.035,
    brittle: Math.max(hard, short, rated),
    tooFewTurns: { low: 10, medium: 8, high: 5 }[hardening] / turns,
    tooManyTurns: turns / { low: 20, medium: 15, high: 10 }[hardening],
    give: inCheck(result, 'bending', 'depthDifference') * force,
    closing: figureOf(result, 'ringClosing') * force,
    line: Math.abs(Math.tan(hidden.lineAngle)) * knurlWidth(job),
    speed: figureOf(result, 'surfaceSpeed') / Math.max(1, inCheck(result, 'speed', 'speedLimit')),
    square: travels(job) && request.edge === 'square' ? 1.5 : 0,
  };
};

/** A tip falls back into a groove H1 deep when it is less than H1/(2 Hf) of a tooth away. */
const seamOf = ({ job, result, hidden, bite, blank }: Scene): number => {
  const sharp = figureOf(result, 'sharpHeight');
  const caught = (1 - Math.sqrt(Math.max(0, 1 - (2 * bite) / sharp))) / 2;
  // A dull wheel rides up out of its groove sooner.
  const holds = caught / (1 + 2 * Math.max(0, hidden.wheelWear - 0.7));
  const count = (Math.PI * blank) / (result.pitch.transverse * hidden.pitchFactor);
  const seam = Math.abs(count - Math.round(count));
  const steps = [seam, hidden.outOfStep, 0.7 * hidden.secondPass];
  return Math.max(...steps, isPair(job) ? 0.6 * hidden.unlike : 0) / holds;
};

const roundTheWork = (s: Scene) => {
  const { job, hidden, bite } = s;
  const eccentric = (job.request.runout ?? 0) / 2 + hidden.centrePlay / 3 + hidden.jawSqueeze / 2;
  const spiral = hidden.noDwell * (figureOf(s.result, 'infeedPerTurn') / s.infeed) * 6;
  const seam = seamOf(s);
  return {
    doesNotMeet: seam,
    oneSided: Math.max(eccentric / bite, spiral, s.closing / 4 / bite),
    marks: Math.max(
      hidden.chipped,
      0.9 * hidden.chips,
      0.5 * hidden.pinWear,
      eccentric / bite / 2.5,
    ),
    ovals: Math.max(s.closing, hidden.jawSqueeze) / (0.25 * s.result.blank.tooth.height),
    uneven: isPair(job)
      ? Math.max(
          hidden.unequal / 0.12,
          10 * hidden.unlike,
          0.6 * hidden.pinWear,
          0.65 * hidden.wheelWear,
          fadeOf(s) / 3,
          seam / 2.5,
        )
      : 0,
  };
};

const fadeOf = ({ hidden, give, line, infeed }: Scene): number => {
  const loose = hidden.toolPlay + hidden.centrePlay / 4;
  return (give + line + hidden.blankTaper / 2 + loose / 3) / (0.17 * infeed);
};

const lostFill = (s: Scene): number =>
  Math.max(0, s.hidden.fillShort) +
  0.08 * Math.max(0, s.hidden.wheelWear - 0.4) +
  (travels(s.job) ? 0.15 * Math.max(0, s.tooFewTurns - 1) : 0) +
  0.2 * Math.max(0, s.brittle - 0.95) +
  (0.4 * (s.give + s.hidden.toolPlay / 2)) / s.infeed +
  0.13 * s.hidden.noDwell;

/** Crest over the planned one, by the growth of a straight tooth: with the square of the fill. */
const oversizeOf = ({ job, result, hidden, blank, fill }: Scene): number => {
  const planned = figureOf(result, 'growth');
  const share = job.request.growth.mean + hidden.growthOff;
  const grown = share * planned * (fill / result.blank.tooth.fill) ** 2;
  const off = blank + grown - figureOf(result, 'crestDiameter');
  return off / Math.max(0.025, 0.12 * planned);
};

const alongTheWork = (s: Scene) => ({
  shallow: lostFill(s) / 0.12,
  fades: fadeOf(s),
  tooLarge: oversizeOf(s),
  tooSmall: -oversizeOf(s),
  ridge: Math.max(
    0.9 * s.square,
    s.hidden.noChamfer,
    travels(s.job) ? s.tooFewTurns / 1.3 : 0,
    s.line / (0.35 * s.infeed),
    0.5 * s.packed,
  ),
  bends: (figureOf(s.result, 'bendingStress') * s.force) / s.job.request.material.yield.value,
  vibrates: Math.max(
    s.hidden.toolPlay / 0.035,
    s.hidden.centrePlay / 0.08,
    0.8 * s.hidden.pinWear,
    s.speed / 1.6,
    s.give / 0.06,
  ),
  slips: (figureOf(s.result, 'torque') * s.force) / ((0.15 * GRIP * s.hidden.grip * s.blank) / 2),
});

const atTheWheel = (s: Scene) => {
  const { hidden, result, force, packed, brittle } = s;
  const index = figureOf(result, 'pinHeatIndex') * force * hidden.dry;
  return {
    slivers: Math.max(
      packed,
      s.tooManyTurns / 1.3,
      hidden.chips,
      0.9 * brittle,
      4 * hidden.secondPass,
      hidden.dry / 8,
    ),
    tears: Math.max(
      0.8 * packed,
      brittle,
      0.3 * hidden.dry,
      s.speed / 1.4,
      0.75 * hidden.wheelWear,
      0.7 * hidden.chips,
      0.45 * s.tooManyTurns,
    ),
    hotPin: index / 1.3,
    jammedPin: Math.max(
      (figureOf(result, 'pinPressure') / 150) * force,
      0.8 * hidden.pinWear,
      0.9 * hidden.chips,
      index / 3,
    ),
    teethBreak: Math.max(
      0.95 * brittle,
      s.square,
      3.5 * hidden.secondPass,
      0.6 * packed,
      (figureOf(result, 'radialForce') * force) / 11_000,
      0.7 * hidden.noChamfer,
    ),
  };
};

/** What the mechanics make of a job; `force` is the true force over the estimated one. */
export const happens = (job: Job, result: SetupResult, force: number): Effects => {
  const scene = sceneOf(job, result, force);
  return { ...roundTheWork(scene), ...alongTheWork(scene), ...atTheWheel(scene) };
};
