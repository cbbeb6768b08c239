import {
  basisOf,
  labelledPitch,
  type Mm,
  mm,
  type Pattern,
  type Pitch,
  type PitchBasis,
  type Process,
  type SetupRequest,
  type SetupResult,
  setUp,
  type Window,
} from '../../calc/index.ts';

/** How fine a job is: what its label names, in which direction, and what that is round the rim. */
export type JobPitch = {
  readonly named: Mm;
  readonly basis: PitchBasis;
  readonly transverse: Mm;
};

/** What is asked for, as far as it decides which standard it falls under. Null: not said. */
export type Job = {
  readonly pattern: Pattern;
  readonly pitch: JobPitch;
  readonly helix: number | null;
  readonly included: number | null;
  readonly process: Process | null;
  readonly stock: Mm | null;
  readonly asIs: boolean;
  readonly teeth: number | null;
  readonly finish: Window | null;
  /** Plunged or travelled, where a length was said. */
  readonly travel: 'plunge' | 'traverse' | null;
  readonly bore: Mm | null;
  readonly plug: boolean;
  /** Ids: the row of the table of materials, and the shop's own material, wheel and machine. */
  readonly base: string | null;
  readonly material: string | null;
  readonly wheel: string | null;
  readonly machine: string | null;
};

export type JobParts = {
  readonly request: SetupRequest;
  readonly result: Pick<SetupResult, 'pitch' | 'motion'>;
  readonly of: Pick<Job, 'base' | 'material' | 'wheel' | 'machine'>;
  /** The tooth angle was said, and not the usual one taken. */
  readonly angleSaid: boolean;
};

/** A label says what a wheel is meant to be; only where there is none it goes by what was counted. */
const pitchOf = ({ request, result }: JobParts): JobPitch => {
  const { transverse } = result.pitch;
  if (request.pitch === null) return { named: transverse, basis: 'rim', transverse };
  const basis = request.alongRim ? 'rim' : basisOf(request.pitch.system);
  return { named: labelledPitch(request.pitch), basis, transverse };
};

export const jobOf = (parts: JobParts): Job => {
  const { request, result, of, angleSaid } = parts;
  return {
    ...of,
    pattern: request.pattern,
    pitch: pitchOf(parts),
    helix: request.tilt ?? request.helix,
    included: angleSaid || of.wheel !== null ? request.included : null,
    process: request.process,
    stock: request.stock,
    asIs: request.asIs,
    teeth: request.wantedTeeth,
    finish: request.aimOnly === true ? null : request.finish,
    travel: request.length === null ? null : result.motion.travel,
    bore: request.bore,
    plug: request.plug,
  };
};

/** What a standard applies to: the job it was made for with nothing left open, and what it makes. */
export type Scope = Job & {
  readonly helix: number;
  readonly included: number;
  readonly process: Process;
  readonly travel: 'plunge' | 'traverse';
  readonly base: string;
  /** What the wheel's label says; null where it was counted. */
  readonly label: Pitch | null;
  /** Bars it may be made from; null where it was worked out from the print alone. */
  readonly bars: Window | null;
  readonly blank: Mm;
  readonly toothCount: number;
  readonly crest: Mm;
};

/**
 * How far a bar may be from the one a standard was worked out for, as a share of it, where nothing
 * else was said. Judgement: it holds a bar's own tolerance and keeps 25 mm and 1 in apart.
 */
const BAR_SHARE = 0.01;

/** From the blank, or a hundredth below the bar, to a hundredth above it. */
const usualBars = (stock: Mm | null, blank: Mm): Window | null =>
  stock === null
    ? null
    : {
        low: mm(Math.max(Math.min(blank, stock), stock * (1 - BAR_SHARE))),
        high: mm(stock * (1 + BAR_SHARE)),
      };

/** No bar is turned up to its blank. */
const turned = ({ low, high }: Window, blank: Mm): Window => ({
  low: mm(Math.max(low, blank)),
  high,
});

/** What a set-up is for, and what bars it takes: those that were said, or those like its own. */
export const scopeOf = (
  request: SetupRequest,
  of: Pick<Job, 'material' | 'wheel' | 'machine'>,
  bars: Window | null,
): Scope => {
  const result = setUp(request);
  const base = request.material.id;
  const { blank } = result;
  return {
    ...jobOf({ request, result, of: { ...of, base }, angleSaid: true }),
    helix: result.pitch.helix,
    included: request.included,
    process: result.process,
    travel: result.motion.travel,
    base,
    label: request.pitch,
    bars: bars === null ? usualBars(request.stock, blank.diameter) : turned(bars, blank.diameter),
    blank: blank.diameter,
    toothCount: blank.teeth,
    crest: blank.tooth.crest,
  };
};
