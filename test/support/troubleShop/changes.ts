import { materialById } from '../../../src/calc/materials/index.ts';
import { type SetupRequest, setUp } from '../../../src/calc/setup/index.ts';
import type { CauseId } from '../../../src/calc/trouble/index.ts';
import { type Mm, mm, mmPerRev, mPerMin } from '../../../src/calc/units.ts';
import { between, normalFrom, oneOf } from '../random.ts';
import {
  figureOf,
  type Hidden,
  inCheck,
  isGrooves,
  isPair,
  type Job,
  knurlWidth,
  type Random,
} from './job.ts';

/** What a cause changes: the job as it is told, or what nobody sees; nothing where it cannot be. */
type Change = (random: Random, job: Job) => Job | null;

const told = (job: Job, request: Partial<SetupRequest>): Job => ({
  ...job,
  request: { ...job.request, ...request },
});
const truth = (job: Job, hidden: Partial<Hidden>): Job => ({
  ...job,
  hidden: { ...job.hidden, ...hidden },
});

const sign = (random: Random): number => (random() < 0.5 ? -1 : 1);
const oneTooth = (job: Job): number => setUp(job.request).pitch.transverse / Math.PI;

const traverse = (random: Random, job: Job): Job => {
  const length = between(random, 12, 35);
  return told(job, { length: mm(length), stickout: mm(length + between(random, 2, 15)) });
};
const plunge = (random: Random, job: Job): Job => {
  const length = between(random, 3, 6);
  return told(job, { length: mm(length), stickout: mm(length + between(random, 2, 20)) });
};

/** Bore that leaves a wall of so many tooth heights. */
const boreLeaving = (job: Job, heights: number): Mm => {
  const result = setUp(job.request);
  const wall = heights * figureOf(result, 'toothHeight') + figureOf(result, 'infeed');
  return mm(Math.max(1, result.blank.diameter - 2 * wall));
};

const ABOUT_THE_COUNT = {
  wrongCount: (random, job) => {
    const off = sign(random) * between(random, 0.16, 0.5) * oneTooth(job);
    const diameter = mm(setUp(job.request).blank.diameter + off);
    // Most people say which diameter they really have; the others find out by measuring.
    return random() < 0.7
      ? told(job, { stock: diameter, asIs: true })
      : truth(job, { blankOff: off });
  },
  wheelOffLabel: (random, job) =>
    truth(told(job, { proven: null }), { pitchFactor: 1 + between(random, -0.025, 0.025) }),
  lightFirstBite: (random, job) =>
    truth(job, { biteFactor: between(random, 0.05, 0.4), blankOff: 0.012 * normalFrom(random) }),
  runOut: (random, job) => {
    const bite = figureOf(setUp(job.request), 'firstBite');
    return told(job, { runout: mm(2 * bite * between(random, 1, 2.5)) });
  },
  opposedOutOfStep: (random, job) =>
    isGrooves(job)
      ? truth(told(job, { layout: 'opposed' }), { outOfStep: between(random, 0.1, 0.5) })
      : null,
  secondPass: (random, job) => truth(job, { secondPass: between(random, 0.05, 0.5) }),
  blankOffSize: (random, job) => {
    // A tooth more or less tracks as well, and so does what lies inside the window.
    const teeth = random() < 0.6 ? 1 : between(random, 0.06, 0.095);
    return truth(job, { blankOff: sign(random) * teeth * oneTooth(job) });
  },
} satisfies Partial<Record<CauseId, Change>>;

const ABOUT_THE_TOOTH = {
  overFilled: (random, job) => {
    const deepest = job.request.material.maxFill.value ?? 0.92;
    const fill = Math.min(1, deepest + between(random, 0.04, 0.14));
    return random() < 0.7 ? told(job, { fill }) : truth(job, { fillShort: 0.9 - fill });
  },
  underFilled: (random, job) => truth(job, { fillShort: between(random, 0.12, 0.4) }),
  growthUnlike: (random, job) =>
    truth(job, { growthOff: sign(random) * between(random, 0.25, 0.5) }),
  noDwell: (random, job) => truth(plunge(random, job), { noDwell: 1 }),
  feedTooFast: (random, job) => {
    const far = traverse(random, job);
    const high = figureOf(setUp(far.request), 'feedHigh');
    return told(far, { feed: mmPerRev(high * between(random, 1.4, 3)) });
  },
  tooManyTurns: (random, job) => {
    const most = { low: 20, medium: 15, high: 10 }[job.request.material.hardeningClass ?? 'low'];
    return told(job, { turns: Math.round(most * between(random, 1.4, 3)) });
  },
  materialTears: (random, job) => {
    const poor = ['ss17-4-A', 'iron-grey30', 'steel-CrMo-PH', 'al356-T6', 'al7075-T6'];
    return random() < 0.5
      ? told(job, { process: 'form', material: materialById(oneOf(random, poor))! })
      : told(job, { process: 'form', hardness: Math.round(between(random, 290, 380)) });
  },
} satisfies Partial<Record<CauseId, Change>>;

const ABOUT_THE_WHEEL = {
  hotPin: (random, job) => {
    const narrow = { face: mm(oneOf(random, [4, 5])), bevel: mm(0.5), bore: mm(6) };
    const wheel = { ...job.request.wheel, ...narrow };
    const hard = told(plunge(random, job), { wheel, turns: Math.round(between(random, 5, 8)) });
    const fastest = inCheck(setUp(hard.request), 'speed', 'speedLimit');
    return told(hard, { speed: mPerMin(between(random, 0.8, 1.05) * fastest) });
  },
  dryWheel: (random, job) => truth(job, { dry: between(random, 2.5, 6) }),
  wornPin: (random, job) => {
    const pinWear = between(random, 1, 2);
    const parts = 2500 * pinWear * Math.exp(0.35 * normalFrom(random));
    return truth(job, { pinWear, parts });
  },
  thinPin: (random, job) =>
    told(job, {
      pinDiameter: mm(between(random, 1.5, 3)),
      wheel: { ...job.request.wheel, bore: mm(4) },
    }),
  dullWheel: (random, job) => {
    const wheelWear = between(random, 1, 2);
    const parts = 3000 * wheelWear * Math.exp(0.35 * normalFrom(random));
    return truth(job, { wheelWear, parts });
  },
  chippedWheel: (random, job) => truth(job, { chipped: between(random, 1, 3) }),
  wheelsUnequal: (random, job) =>
    isPair(job) ? truth(job, { unequal: between(random, 0.15, 0.6) }) : null,
  unlikeWheels: (random, job) =>
    isPair(job) ? truth(job, { unlike: between(random, 0.1, 0.5) }) : null,
  chipsInMesh: (random, job) => truth(job, { chips: between(random, 0.5, 2) }),
  tooFast: (random, job) => {
    const limit = inCheck(setUp(job.request), 'speed', 'speedLimit');
    return told(job, { speed: mPerMin(limit * between(random, 1.35, 2.5)) });
  },
  squareEdges: (random, job) => told(traverse(random, job), { edge: 'square' }),
  noLeadChamfer: (random, job) =>
    truth(traverse(random, job), { noChamfer: between(random, 0.8, 2) }),
} satisfies Partial<Record<CauseId, Change>>;

const ABOUT_WHAT_GIVES_WAY = {
  barGivesWay: (random, job) => {
    const out = (job.request.stickout ?? 20) * between(random, 2, 6);
    return told(job, { support: 'chuck', layout: null, stickout: mm(out) });
  },
  toolOutOfLine: (random, job) => {
    const infeed = figureOf(setUp(job.request), 'infeed');
    const slope = (between(random, 0.2, 0.6) * infeed) / knurlWidth(job);
    return truth(job, { lineAngle: sign(random) * slope });
  },
  taperedBlank: (random, job) => {
    const infeed = figureOf(setUp(job.request), 'infeed');
    return truth(job, { blankTaper: 2 * infeed * between(random, 0.2, 0.6) });
  },
  thinWall: (random, job) => told(job, { bore: boreLeaving(job, between(random, 2, 5)) }),
  jawsTooTight: (random, job) =>
    truth(told(job, { bore: boreLeaving(job, between(random, 9, 14)) }), {
      jawSqueeze: between(random, 0.05, 0.25),
    }),
  looseTool: (random, job) => truth(job, { toolPlay: between(random, 0.04, 0.15) }),
  poorGrip: (random, job) => truth(job, { grip: between(random, 0.02, 0.1) }),
  looseCentre: (random, job) =>
    truth(told(job, { support: 'tailstock', layout: null }), {
      centrePlay: between(random, 0.08, 0.3),
    }),
  wideKnurl: (random, job) => {
    const face = mm(between(random, 12, 16));
    const length = between(random, 10, face - 2);
    return told(job, {
      wheel: { ...job.request.wheel, diameter: mm(25), face },
      stock: mm(between(random, 6, 9)),
      length: mm(length),
      stickout: mm(length + between(random, 2, 6)),
    });
  },
  pressesTooHard: (random, job) => told(plunge(random, job), { turns: 5 }),
} satisfies Partial<Record<CauseId, Change>>;

export const CHANGES: Readonly<Record<CauseId, Change>> = {
  ...ABOUT_THE_COUNT,
  ...ABOUT_THE_TOOTH,
  ...ABOUT_THE_WHEEL,
  ...ABOUT_WHAT_GIVES_WAY,
};
