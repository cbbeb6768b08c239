import { MATERIALS } from '../../../src/calc/materials/index.ts';
import type { Pattern } from '../../../src/calc/pattern.ts';
import { type SetupRequest, type SetupResult, setUp } from '../../../src/calc/setup/index.ts';
import { mm, OutOfRange } from '../../../src/calc/units.ts';
import { between, normalFrom, oneOf } from '../random.ts';
import { requestOf } from '../setupRequest.ts';

export type Random = () => number;

/** What is true of a job and stands on no card. Nothing, or one for a factor, is as it should be. */
export type Hidden = {
  /** Wheel's true pitch over the one the card works with. */
  readonly pitchFactor: number;
  readonly biteFactor: number;
  readonly fillShort: number;
  /** Rubbing of a dry pin over an oiled one. */
  readonly dry: number;
  /** Wear of pin and of wheel, 1 being the end of their life. */
  readonly pinWear: number;
  readonly wheelWear: number;
  readonly chipped: number;
  readonly lineAngle: number;
  /** How unequally a pair bites, share of the tooth. */
  readonly unequal: number;
  /** How far the two wheels of a pair disagree round the work, in pitches. */
  readonly unlike: number;
  /** How far a second wheel or a second pass starts out of step, in pitches. */
  readonly outOfStep: number;
  readonly secondPass: number;
  readonly growthOff: number;
  readonly blankOff: number;
  readonly blankTaper: number;
  readonly jawSqueeze: number;
  readonly chips: number;
  readonly toolPlay: number;
  readonly centrePlay: number;
  readonly grip: number;
  readonly noDwell: number;
  readonly noChamfer: number;
  readonly parts: number;
};

export type Job = { readonly request: SetupRequest; readonly hidden: Hidden };

const FORMING = MATERIALS.filter(({ formKnurl }) => formKnurl === 'yes');

const patternOf = (random: Random): Pattern => {
  const at = random();
  if (at < 0.35) return { kind: 'straight' };
  if (at < 0.5) return { kind: 'diagonal', hand: 'left' };
  return { kind: 'diamond', points: at < 0.9 ? 'raised' : 'sunk' };
};

/** A job as shops get them, before anything goes wrong. */
export const jobOf = (random: Random): Job => {
  const pattern = patternOf(random);
  const pitch = oneOf(random, [0.5, 0.6, 0.8, 1, 1.2]);
  const rim = pattern.kind === 'straight' ? pitch : pitch / Math.cos(Math.PI / 6);
  const length = random() < 0.4 ? between(random, 3, 6) : between(random, 9, 35);
  const request = requestOf({
    pattern,
    pitch: { system: 'metric', value: pitch },
    proven: random() < 0.65 ? mm(rim * between(random, 0.98, 1.02)) : null,
    stock: mm(between(random, 10, 45)),
    material: oneOf(random, FORMING),
    length: mm(length),
    stickout: mm(length + between(random, 2, 25)),
    support: random() < 0.35 ? 'tailstock' : 'chuck',
    layout: random() < 0.25 ? 'opposed' : null,
    runout: random() < 0.6 ? mm(between(random, 0.005, 0.05)) : null,
    growth: { mean: 0.95, sd: 0.06, results: 15 },
  });
  return { request, hidden: hiddenOf(random) };
};

const hiddenOf = (random: Random): Hidden => {
  const parts = random() < 0.7 ? between(random, 20, 1200) : between(random, 1200, 3000);
  return {
    pitchFactor: 1,
    biteFactor: between(random, 0.9, 1.3),
    fillShort: 0.02 * normalFrom(random),
    dry: 1,
    pinWear: parts / 5000,
    wheelWear: parts / 5000,
    chipped: 0,
    lineAngle: 0.0003 * normalFrom(random),
    unequal: 0,
    unlike: 0,
    outOfStep: 0,
    secondPass: 0,
    growthOff: 0.05 * normalFrom(random),
    blankOff: 0.006 * normalFrom(random),
    blankTaper: between(random, 0, 0.008),
    jawSqueeze: 0,
    chips: 0,
    toolPlay: 0,
    centrePlay: 0,
    grip: 1,
    noDwell: 0,
    noChamfer: 0,
    parts,
  };
};

/** Two wheels cross to raise points; sunk ones come from one wheel, grooves from one each side. */
export const isPair = ({ request: { pattern } }: Job): boolean =>
  pattern.kind === 'diamond' && pattern.points === 'raised';
export const isGrooves = ({ request: { pattern } }: Job): boolean =>
  pattern.kind === 'straight' || pattern.kind === 'diagonal';
export const travels = ({ request }: Job): boolean => (request.length ?? 0) > 6;
export const knurlWidth = ({ request }: Job): number => Math.min(request.length ?? 6, 35);

/** A set-up, or nothing where the job makes no sense. */
export const worked = (request: SetupRequest): SetupResult | null => {
  try {
    return setUp(request);
  } catch (error) {
    if (error instanceof OutOfRange) return null;
    throw error;
  }
};

export const figureOf = (result: SetupResult, name: keyof SetupResult['figures']): number =>
  result.figures[name]?.value ?? 0;

export const inCheck = (result: SetupResult, check: string, name: string): number =>
  result.checks.find((each) => each.name === check)?.figures[name]?.value ?? 0;

/** Nothing stops, and beside the wheel's label no more than one thing is watched. */
export const isSound = (result: SetupResult): boolean => {
  const states = result.checks.filter(({ name }) => name !== 'wheel').map(({ state }) => state);
  return !states.includes('stop') && states.filter((state) => state === 'watch').length <= 1;
};
