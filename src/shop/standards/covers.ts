import type { Pattern, Window } from '../../calc/index.ts';
import type { Job, Scope } from './job.ts';

/** What of a job lies outside what a standard applies to. */
export type Outside =
  | 'pattern'
  | 'pitch'
  | 'helix'
  | 'angle'
  | 'material'
  | 'diameter'
  | 'finish'
  | 'teeth'
  | 'asIs'
  | 'process'
  | 'length'
  | 'bore'
  | 'wheel'
  | 'machine';

/** Pitches further apart are two wheels. Judgement: neighbours that are made differ by more. */
const SAME_PITCH = 0.005;
/** Angles further apart are two wheels: one degree. Judgement. */
const SAME_ANGLE = Math.PI / 180;
/** Sizes nearer than this read the same on a micrometer. Judgement: a tenth of a thousandth. */
const SAME_SIZE = 0.0025;
/** Limits of one print typed in either system. Judgement. */
const SAME_LIMIT = 0.005;
/** Bores nearer than this leave the same wall. Judgement. */
const SAME_BORE = 0.1;

const near = (a: number, b: number, slack: number): boolean => Math.abs(a - b) <= slack;

/** What was not said of the job excludes nothing. */
const agrees = <T>(said: T | null, fits: (value: T) => boolean): boolean =>
  said === null || fits(said);

const patternFits = (standard: Pattern, job: Pattern): boolean => {
  if (standard.kind !== job.kind) return false;
  if ('points' in standard && 'points' in job) return standard.points === job.points;
  if ('hand' in standard && 'hand' in job)
    return job.hand === null || standard.hand === null || standard.hand === job.hand;
  return true;
};

/** Labels are compared as they are printed; labels of two kinds by what they are round the rim. */
const pitchFits = (standard: Scope['pitch'], job: Job['pitch']): boolean => {
  const what = standard.basis === job.basis ? 'named' : 'transverse';
  return near(standard[what], job[what], standard[what] * SAME_PITCH);
};

/** A standard for the shop's own bars is for no others; one for a row of the table is for all of it. */
const materialFits = (standard: Scope, job: Job): boolean =>
  job.base === standard.base && (standard.material === null || job.material === standard.material);

const stockFits = ({ bars, blank }: Scope, stock: number): boolean =>
  bars === null
    ? stock >= blank - SAME_SIZE
    : stock >= bars.low - SAME_SIZE && stock <= bars.high + SAME_SIZE;

/** The same limits; a standard without any has to come out inside those of the print. */
const finishFits = ({ finish, crest }: Scope, wanted: Window): boolean =>
  finish === null
    ? crest >= wanted.low && crest <= wanted.high
    : near(finish.low, wanted.low, SAME_LIMIT) && near(finish.high, wanted.high, SAME_LIMIT);

const boreFits = (standard: Scope, job: Job): boolean => {
  if (standard.bore === null || job.bore === null) return standard.bore === job.bore;
  return near(standard.bore, job.bore, SAME_BORE) && standard.plug === job.plug;
};

/** One of the shop's own things: a standard that names none is for any. */
const thingFits = (standard: string | null, job: string | null): boolean =>
  standard === null || agrees(job, (id) => id === standard);

/**
 * What of a job a standard is not for; nothing: it covers it. It does when pattern, pitch and
 * material are the same, the bar is one of its bars, a print's limits are met, and nothing else
 * that was said (count, process, angle, length, bore, wheel, machine) says otherwise. A material
 * that nobody named is covered by nothing.
 */
export const outsideOf = (standard: Scope, job: Job): readonly Outside[] => {
  const fits: Readonly<Record<Outside, boolean>> = {
    pattern: patternFits(standard.pattern, job.pattern),
    pitch: pitchFits(standard.pitch, job.pitch),
    helix: agrees(job.helix, (helix) => near(standard.helix, helix, SAME_ANGLE)),
    angle: agrees(job.included, (angle) => near(standard.included, angle, SAME_ANGLE)),
    material: materialFits(standard, job),
    diameter: agrees(job.stock, (stock) => stockFits(standard, stock)),
    finish: agrees(job.finish, (wanted) => finishFits(standard, wanted)),
    teeth: agrees(job.teeth, (count) => count === standard.toothCount),
    asIs: !job.asIs || (job.stock !== null && near(job.stock, standard.blank, SAME_SIZE)),
    process: agrees(job.process, (process) => process === standard.process),
    length: agrees(job.travel, (travel) => travel === standard.travel),
    bore: boreFits(standard, job),
    wheel: thingFits(standard.wheel, job.wheel),
    machine: thingFits(standard.machine, job.machine),
  };
  return (Object.keys(fits) as Outside[]).filter((what) => !fits[what]);
};

/** How much of what a standard is for the job says too: of several the closest one is meant. */
export const closeness = (standard: Scope, job: Job): number =>
  (['wheel', 'machine', 'material', 'finish', 'teeth'] as const).filter(
    (what) => standard[what] !== null && job[what] !== null,
  ).length;
