import { materialById } from '../../src/calc/materials/index.ts';
import {
  PITCH_TOLERANCE,
  type PlanJob,
  type PlanRequest,
  TURNING_SPREAD,
} from '../../src/calc/plan/index.ts';
import { growthBeforeResults } from '../../src/calc/shopGrowth.ts';
import { dinCrib, dpCrib } from '../../src/calc/standards/index.ts';
import { mm } from '../../src/calc/units.ts';

const material = (id: string) => {
  const found = materialById(id);
  if (found === undefined) throw new Error(`no material ${id}`);
  return found;
};

/** A job of which nothing more is said than what has to be. */
export const planJob = (materialId = 'steel-lowC-CD', said: Partial<PlanJob> = {}): PlanJob => ({
  pattern: { kind: 'straight' },
  pitch: { system: 'metric', value: 0.8 },
  alongRim: false,
  helix: null,
  stock: null,
  knurlClass: null,
  material: material(materialId),
  hardness: null,
  process: null,
  pin: 'hardened',
  pinDiameter: null,
  length: mm(6),
  stickout: null,
  support: 'chuck',
  layout: null,
  stockLength: null,
  bore: null,
  plug: false,
  feed: null,
  speed: null,
  rotation: null,
  turns: null,
  batch: 1,
  runout: null,
  machine: null,
  growth: growthBeforeResults(),
  ...said,
});

/** Limits of a shaft that may only be smaller than its size. */
export const under = (size: number, tolerance: number) => ({
  low: mm(size - tolerance),
  high: mm(size),
});

/** A plan with the wheels of the standards. */
export const planRequest = (job: PlanJob, said: Partial<PlanRequest> = {}): PlanRequest => ({
  job,
  limits: under(20, 0.13),
  pitchTolerance: PITCH_TOLERANCE,
  included: null,
  crib: [...dinCrib(), ...dpCrib()],
  turningSpread: TURNING_SPREAD,
  ...said,
});
