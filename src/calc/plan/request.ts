import type { Check, CheckName, State } from '../check.ts';
import type { CribWheel } from '../crib.ts';
import type { Remedy, SetupRequest } from '../setup/index.ts';
import type { Process } from '../speed.ts';
import type { Window } from '../tracking.ts';
import type { Mm, Rad } from '../units.ts';

/** Share a wheel's pitch may be off the one asked for where nothing is said. Judgement: labels are off by up to 2 %. */
export const PITCH_TOLERANCE = 0.03;
/** How many set-ups that pass are looked for, and how many that do not are kept. Judgement. */
export const PLAN_LENGTH = 10;

/** What the plan chooses by itself, and so does not take from the job. */
type Chosen =
  | 'finish'
  | 'asIs'
  | 'wantedTeeth'
  | 'fill'
  | 'included'
  | 'counted'
  | 'proven'
  | 'tilt'
  | 'wheel'
  | 'edge'
  | 'onePiece';

/** The job as it was said: its stock is the largest bar to be had, its pitch null for any. */
export type PlanJob = Omit<SetupRequest, Chosen>;

export type PlanRequest = {
  readonly job: PlanJob;
  /** Limits of the finished diameter. */
  readonly limits: Window;
  /** Share a wheel's pitch may be off the job's. */
  readonly pitchTolerance: number;
  /** Included angle the print asks for, or null. */
  readonly included: Rad | null;
  readonly crib: readonly CribWheel[];
  /** Standard deviation of the machine's turned diameters. */
  readonly turningSpread: Mm;
};

/** What keeps a candidate from being better: the check that stops it, or the weaker chance's cause. */
export type LimitedBy = CheckName | 'turning';

export type Candidate = {
  readonly wheel: CribWheel;
  readonly toothCount: number;
  readonly blankDiameter: Mm;
  readonly fill: number;
  readonly crestDiameter: Mm;
  readonly process: Process;
  /** How much coarser the wheel is than the pitch asked for, as a share; null where any will do. */
  readonly pitchError: number | null;
  readonly chanceTracks: number;
  readonly chanceLands: number;
  /** Both at once. */
  readonly product: number;
  readonly limitedBy: LimitedBy;
  /** The worst of its checks. */
  readonly state: State;
  readonly checks: readonly Check[];
  /** The set-up, ready to be worked out in full. */
  readonly request: SetupRequest;
};

/** What holds the work better while it is knurled. */
export type Aid = 'tailstock' | 'plug' | 'opposed';

type Change =
  /** The crest inside the limits all the same, but not in the middle; landing is anywhere inside. */
  | { readonly kind: 'offMiddle' }
  /** Another way of doing it: support, tool, turns. */
  | { readonly kind: 'remedy'; readonly remedy: Remedy }
  /** One limit moved outward by so much. */
  | {
      readonly kind: 'widerLimits';
      readonly side: 'above' | 'below';
      readonly by: Mm;
      readonly limits: Window;
    }
  | { readonly kind: 'otherPitch' }
  | { readonly kind: 'cut' };

/** A change to the job under which a set-up passes. */
export type PlanChange = Change & {
  /** The set-up that passes; under a remedy, the one it is to be applied to. */
  readonly candidate: Candidate;
  /** What has to hold the work as well, where the change alone is not enough. */
  readonly aid: Aid | null;
};

export type Plan = {
  /** The best first, those that a check stops last. */
  readonly candidates: readonly Candidate[];
  /** Wheels whose pattern and pitch suit the job. */
  readonly fittingWheels: number;
  /** Where none passes: what would, the smallest change first. */
  readonly changes: readonly PlanChange[];
};
