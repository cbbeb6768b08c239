import { checksWith, REMEDY_KINDS, type Remedy, type RemedyKind, setUp } from '../setup/index.ts';
import { largestWholeCount, wholeToothDiameter } from '../teeth.ts';
import type { Window } from '../tracking.ts';
import { type Mm, mm } from '../units.ts';
import { firstPassing } from './judged.ts';
import {
  cutProspects,
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
  type Reach,
  reachesNear,
} from './prospects.ts';
import type { Aid, Candidate, PlanChange, PlanJob, PlanRequest } from './request.ts';

/** A pitch further off than this is another drawing. Judgement. */
const ANY_PITCH = 10;
/** Another pitch is offered only where it comes out at least so well against the best of all. Judgement. */
const WORTH = 0.5;
/** Limits are moved in whole steps of this, outward. */
const LIMIT_STEP = 0.001;
/** How many ways of widening the limits are tried. Judgement. */
const WIDENINGS_TRIED = 40;

/** A plan that did not come out, with the wheels that suit it. */
type Failed = { readonly request: PlanRequest; readonly fittings: readonly Fitting[] };

const formedReaches = ({ request, fittings }: Failed): readonly (Reach & { miss: number })[] => {
  const middle = middleOf(request.limits);
  return fittings
    .flatMap((fitting) => reachesNear(fitting, middle, request))
    .map((reach) => ({ ...reach, miss: missOf(reach, middle, request.job.growth.mean) }))
    .filter(({ miss }) => miss !== 0);
};

/** Where no fill brings the crest to the middle, one may still bring it inside. */
const offMiddle = (failed: Failed): readonly PlanChange[] => {
  const { request } = failed;
  if (processOf(request) === 'cut') return [];
  const { limits } = request;
  const inside = formedReaches(failed).flatMap((reach) => {
    const crest = mm(middleOf(limits) + reach.miss);
    if (crest < limits.low || crest > limits.high) return [];
    return formedProspect(reach, crest, limits, request) ?? [];
  });
  const candidate = firstPassing(likeliestFirst(inside), request);
  return candidate === null ? [] : [{ kind: 'offMiddle', candidate, aid: null }];
};

/** The likeliest, the one with the narrowest face and the one with the finest pitch: who else should it lift? */
const worthRemedy = (stopped: readonly Candidate[]): ReadonlySet<Candidate> => {
  const least = (of: (candidate: Candidate) => number): Candidate[] =>
    [...stopped].sort((a, b) => of(a) - of(b)).slice(0, 1);
  const finest = least(({ blankDiameter, toothCount }) => blankDiameter / toothCount);
  return new Set([...stopped.slice(0, 1), ...least(({ wheel }) => wheel.size.face), ...finest]);
};

/** A cut knurl does not grow, so it wants a blank of its own: cutInstead looks for that. */
const keepsTheBlank = ({ kind }: Remedy): boolean => kind !== 'cut';

const liftsEverything = (candidate: Candidate, { change }: Remedy): boolean =>
  checksWith(candidate.request, change).every(({ state }) => state !== 'stop');

/** Each kind of remedy once, on the first set-up that it lifts altogether. */
const remedied = (stopped: readonly Candidate[]): readonly PlanChange[] => {
  const found = new Map<RemedyKind, PlanChange>();
  for (const candidate of worthRemedy(stopped))
    for (const remedy of setUp(candidate.request).remedies)
      if (keepsTheBlank(remedy) && !found.has(remedy.kind) && liftsEverything(candidate, remedy))
        found.set(remedy.kind, { kind: 'remedy', remedy, candidate, aid: null });
  return REMEDY_KINDS.flatMap((kind) => found.get(kind) ?? []);
};

/** Limits with one of them moved outward, and what then comes out. */
type Widened = {
  readonly side: 'above' | 'below';
  readonly by: Mm;
  readonly limits: Window;
  readonly prospects: (request: PlanRequest) => readonly Prospect[];
};

const moved = ({ low, high }: Window, side: 'above' | 'below', least: number) => {
  const by = mm(Number((Math.ceil(least / LIMIT_STEP) * LIMIT_STEP).toFixed(6)));
  const limits = side === 'above' ? { low, high: mm(high + by) } : { low: mm(low - by), high };
  return { side, by, limits };
};

/** A limit moved by twice the miss moves the middle by the miss. */
const widerToForm = (failed: Failed): readonly Widened[] =>
  formedReaches(failed).map((reach) => ({
    ...moved(failed.request.limits, reach.miss > 0 ? 'above' : 'below', 2 * Math.abs(reach.miss)),
    prospects: (request) => {
      const middle = middleOf(request.limits);
      return [formedProspect(reach, middle, { low: middle, high: middle }, request) ?? []].flat();
    },
  }));

/** A cut knurl only needs a whole count inside the limits. */
const widerToCut = ({ request, fittings }: Failed): readonly Widened[] =>
  fittings.flatMap((fitting) => {
    const { limits } = request;
    const { transverse } = fitting.pitch;
    const under = wholeToothDiameter(largestWholeCount(limits.low, transverse), transverse);
    const over = wholeToothDiameter(largestWholeCount(limits.high, transverse) + 1, transverse);
    const prospects = (wider: PlanRequest) => cutProspects(fitting, wider);
    return [
      { ...moved(limits, 'below', limits.low - under), prospects },
      { ...moved(limits, 'above', over - limits.high), prospects },
    ];
  });

/** The least that one limit has to move for some wheel and count to come out. */
const widerLimits = (failed: Failed): readonly PlanChange[] => {
  const { request } = failed;
  const wider = processOf(request) === 'cut' ? widerToCut(failed) : widerToForm(failed);
  const least = [...wider].sort((a, b) => a.by - b.by).slice(0, WIDENINGS_TRIED);
  for (const { prospects, ...change } of least) {
    const next = { ...request, limits: change.limits };
    const candidate = firstPassing(prospects(next), next);
    if (candidate !== null) return [{ kind: 'widerLimits', ...change, candidate, aid: null }];
  }
  return [];
};

const otherPitch = ({ request }: Failed): readonly PlanChange[] => {
  if (request.job.pitch === null) return [];
  const any: PlanRequest = { ...request, pitchTolerance: ANY_PITCH };
  const off = ({ fitting }: Prospect): number => Math.abs(fitting.pitchError ?? 0);
  const prospects = prospectsOf(fittingsOf(any), any);
  const worthIt = WORTH * Math.max(0, ...prospects.map(productOf));
  const nearestFirst = prospects
    .filter((prospect) => productOf(prospect) >= worthIt)
    .sort((a, b) => off(a) - off(b));
  const candidate = firstPassing(nearestFirst, any);
  return candidate === null ? [] : [{ kind: 'otherPitch', candidate, aid: null }];
};

const cutInstead = ({ request, fittings }: Failed): readonly PlanChange[] => {
  if (processOf(request) === 'cut') return [];
  const cut: PlanRequest = { ...request, job: { ...request.job, process: 'cut' } };
  const any: PlanRequest = { ...cut, pitchTolerance: ANY_PITCH };
  const candidate =
    firstPassing(prospectsOf(fittings, cut), cut) ??
    (cut.job.pitch === null ? null : firstPassing(prospectsOf(fittingsOf(any), any), any));
  return candidate === null ? [] : [{ kind: 'cut', candidate, aid: null }];
};

const withoutAid = (stopped: readonly Candidate[], failed: Failed): readonly PlanChange[] => [
  ...offMiddle(failed),
  ...remedied(stopped),
  ...widerLimits(failed),
  ...otherPitch(failed),
  ...cutInstead(failed),
];

/** What holds the work better, the least trouble first. */
const AIDS: readonly (readonly [aid: Aid, change: Partial<PlanJob>])[] = [
  ['tailstock', { support: 'tailstock' }],
  ['plug', { plug: true }],
  ['opposed', { layout: 'opposed' }],
];

const isNew = ({ job }: PlanRequest, aid: Aid): boolean => {
  switch (aid) {
    case 'tailstock':
      return job.stickout !== null && job.support === 'chuck';
    case 'plug':
      return job.bore !== null && !job.plug;
    case 'opposed':
      return job.layout !== 'opposed';
  }
};

/** Where the print does not come out and the work gives way too, both have to change. */
const withAid = ({ request, fittings }: Failed): readonly PlanChange[] => {
  for (const [aid, change] of AIDS) {
    if (!isNew(request, aid)) continue;
    const aided: Failed = {
      request: { ...request, job: { ...request.job, ...change } },
      fittings,
    };
    const found = withoutAid([], aided);
    if (found.length > 0) return found.map((each) => ({ ...each, aid }));
  }
  return [];
};

/** What would pass where nothing does: another way of doing it before another print. */
export const changesFor = (
  stopped: readonly Candidate[],
  failed: Failed,
): readonly PlanChange[] => {
  const found = withoutAid(stopped, failed);
  return found.length > 0 || failed.fittings.length === 0 ? found : withAid(failed);
};
