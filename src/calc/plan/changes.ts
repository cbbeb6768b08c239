import { checksWith, type Remedy, setUp } from '../setup/index.ts';
import { largestWholeCount, wholeToothDiameter } from '../teeth.ts';
import type { Window } from '../tracking.ts';
import { mm } from '../units.ts';
import { firstPassing } from './judged.ts';
import {
  type Fitting,
  fittingsOf,
  formedProspect,
  likeliestFirst,
  middleOf,
  missOf,
  type Prospect,
  processOf,
  productOf,
  prospectsOf,
  reachesNear,
} from './prospects.ts';
import type { Candidate, PlanChange, PlanRequest } from './request.ts';

/** A pitch further off than this is another drawing. Judgement. */
const ANY_PITCH = 10;
/** Another pitch is offered only where it comes out at least so well against the best of all. Judgement. */
const WORTH = 0.5;
/** Added to a limit so that it is wide enough after rounding, in mm. */
const ROUNDED_OUT = 0.001;
/** How many of the stopped ones, or of the wider limits, are tried. Judgement. */
const TRIED = 3;

const likeliest = (request: PlanRequest): Candidate | null =>
  firstPassing(prospectsOf(fittingsOf(request), request), request);

/** Where no fill brings the crest to the middle, one may still bring it inside. */
const offMiddle = (request: PlanRequest): readonly PlanChange[] => {
  if (processOf(request) === 'cut') return [];
  const { limits, job } = request;
  const middle = middleOf(limits);
  const inside = fittingsOf(request).flatMap((fitting) =>
    reachesNear(fitting, middle, request).flatMap((reach) => {
      const miss = missOf(reach, middle, job.growth.mean);
      const crest = mm(middle + miss);
      if (miss === 0 || crest < limits.low || crest > limits.high) return [];
      return formedProspect(reach, crest, limits, request) ?? [];
    }),
  );
  const candidate = firstPassing(likeliestFirst(inside), request);
  return candidate === null ? [] : [{ kind: 'offMiddle', candidate }];
};

/** A cut knurl does not grow, so it wants a blank of its own: cutInstead looks for that. */
const keepsTheBlank = ({ kind }: Remedy): boolean => kind !== 'cut';

const liftsEverything = (candidate: Candidate, { change }: Remedy): boolean =>
  checksWith(candidate.request, change).every(({ state }) => state !== 'stop');

const remedied = (stopped: readonly Candidate[]): readonly PlanChange[] => {
  for (const candidate of stopped.slice(0, TRIED)) {
    const remedies = setUp(candidate.request)
      .remedies.filter(keepsTheBlank)
      .filter((remedy) => liftsEverything(candidate, remedy));
    if (remedies.length > 0)
      return remedies.map((remedy) => ({ kind: 'remedy', remedy, candidate }));
  }
  return [];
};

type Widened = Omit<Extract<PlanChange, { kind: 'widerLimits' }>, 'candidate'>;

const widened = ({ low, high }: Window, side: 'above' | 'below', least: number): Widened => {
  const by = mm(Number((Math.ceil(least / ROUNDED_OUT) * ROUNDED_OUT).toFixed(6)));
  const limits = side === 'above' ? { low, high: mm(high + by) } : { low: mm(low - by), high };
  return { kind: 'widerLimits', side, by, limits };
};

/** A limit moved by twice the miss moves the middle by the miss. */
const widerToForm = (fitting: Fitting, request: PlanRequest): readonly Widened[] => {
  const middle = middleOf(request.limits);
  return reachesNear(fitting, middle, request)
    .map((reach) => missOf(reach, middle, request.job.growth.mean))
    .filter((miss) => miss !== 0)
    .map((miss) => widened(request.limits, miss > 0 ? 'above' : 'below', 2 * Math.abs(miss)));
};

/** A cut knurl only needs a whole count inside the limits. */
const widerToCut = (fitting: Fitting, { limits }: PlanRequest): readonly Widened[] => {
  const { transverse } = fitting.pitch;
  const under = wholeToothDiameter(largestWholeCount(limits.low, transverse), transverse);
  const over = wholeToothDiameter(largestWholeCount(limits.high, transverse) + 1, transverse);
  return [
    widened(limits, 'below', limits.low - under),
    widened(limits, 'above', over - limits.high),
  ];
};

/** The least that one limit has to move for some wheel and count to come out. */
const widerLimits = (request: PlanRequest): readonly PlanChange[] => {
  const wider = processOf(request) === 'cut' ? widerToCut : widerToForm;
  const least = fittingsOf(request)
    .flatMap((fitting) => wider(fitting, request))
    .sort((a, b) => a.by - b.by);
  for (const change of least.slice(0, TRIED)) {
    const candidate = likeliest({ ...request, limits: change.limits });
    if (candidate !== null) return [{ ...change, candidate }];
  }
  return [];
};

const otherPitch = (request: PlanRequest): readonly PlanChange[] => {
  if (request.job.pitch === null) return [];
  const any: PlanRequest = { ...request, pitchTolerance: ANY_PITCH };
  const off = ({ fitting }: Prospect): number => Math.abs(fitting.pitchError ?? 0);
  const prospects = prospectsOf(fittingsOf(any), any);
  const worthIt = WORTH * Math.max(0, ...prospects.map(productOf));
  const nearestFirst = prospects
    .filter((prospect) => productOf(prospect) >= worthIt)
    .sort((a, b) => off(a) - off(b));
  const candidate = firstPassing(nearestFirst, any);
  return candidate === null ? [] : [{ kind: 'otherPitch', candidate }];
};

const cutInstead = (request: PlanRequest): readonly PlanChange[] => {
  if (processOf(request) === 'cut') return [];
  const cut: PlanRequest = { ...request, job: { ...request.job, process: 'cut' } };
  const candidate = likeliest(cut) ?? likeliest({ ...cut, pitchTolerance: ANY_PITCH });
  return candidate === null ? [] : [{ kind: 'cut', candidate }];
};

/** What would pass where nothing does: another way of doing it before another print. */
export const changesFor = (
  stopped: readonly Candidate[],
  request: PlanRequest,
): readonly PlanChange[] => [
  ...offMiddle(request),
  ...remedied(stopped),
  ...widerLimits(request),
  ...otherPitch(request),
  ...cutInstead(request),
];
