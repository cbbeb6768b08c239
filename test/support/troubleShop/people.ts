import { checkAfter } from '../../../src/calc/checking/index.ts';
import type { SetupResult } from '../../../src/calc/setup/index.ts';
import type { SymptomId, TroubleSeen } from '../../../src/calc/trouble/index.ts';
import { mm, OutOfRange } from '../../../src/calc/units.ts';
import { normalFrom } from '../random.ts';
import { figureOf, inCheck, type Job, knurlWidth, type Random } from './job.ts';
import type { Effect, Effects } from './mechanics.ts';

/** What people call what happened, and how often: not always the right word for it. */
const CALLED: Readonly<Record<Effect, readonly (readonly [SymptomId, number])[]>> = {
  doesNotMeet: [
    ['doublePattern', 0.96],
    ['tornCrests', 0.04],
  ],
  oneSided: [
    ['shallowOneSide', 0.84],
    ['doublePattern', 0.08],
    ['repeatingMark', 0.08],
  ],
  shallow: [
    ['shallowAllRound', 0.7],
    ['undersize', 0.3],
  ],
  fades: [
    ['fadesAlong', 0.5],
    ['tapered', 0.42],
    ['shallowOneSide', 0.08],
  ],
  slivers: [
    ['flaking', 0.87],
    ['tornCrests', 0.13],
  ],
  tears: [
    ['tornCrests', 0.87],
    ['flaking', 0.13],
  ],
  hotPin: [
    ['pinSeized', 0.6],
    ['wheelStopped', 0.4],
  ],
  jammedPin: [
    ['wheelStopped', 0.65],
    ['pinSeized', 0.27],
    ['chatterMarks', 0.08],
  ],
  teethBreak: [
    ['chippedTeeth', 0.93],
    ['repeatingMark', 0.07],
  ],
  bends: [
    ['bentPart', 0.92],
    ['fadesAlong', 0.08],
  ],
  ovals: [
    ['tubeOutOfRound', 0.92],
    ['shallowOneSide', 0.08],
  ],
  uneven: [
    ['unevenDiamonds', 0.94],
    ['doublePattern', 0.06],
  ],
  tooLarge: [['oversize', 1]],
  tooSmall: [['undersize', 1]],
  ridge: [
    ['ridgeAtEnd', 0.95],
    ['fadesAlong', 0.05],
  ],
  vibrates: [
    ['chatterMarks', 0.92],
    ['tornCrests', 0.08],
  ],
  slips: [
    ['slippedInChuck', 0.92],
    ['doublePattern', 0.08],
  ],
  marks: [
    ['repeatingMark', 0.95],
    ['doublePattern', 0.05],
  ],
};

const drawn = <T>(random: Random, list: readonly (readonly [T, number])[]): T | null => {
  let at = random() * list.reduce((sum, [, weight]) => sum + weight, 0);
  for (const [item, weight] of list) {
    at -= weight;
    if (at <= 0) return item;
  }
  return null;
};

/** The worst of what the cause has made worse is what people speak of, mostly. */
export const symptomOf = (random: Random, now: Effects, before: Effects): SymptomId | null => {
  const seen = (Object.entries(now) as [Effect, number][])
    .filter(([effect, severity]) => severity >= 1 && severity > 1.1 * before[effect])
    .map(([effect, severity]) => [effect, Math.min(severity, 4) ** 2] as const);
  const effect = drawn(random, seen);
  return effect === null ? null : drawn(random, CALLED[effect]);
};

/** Flats at both ends: uneven infeed shows in the fill by dx = dz/(Hf share). */
const endsOf = (job: Job, result: SetupResult, flatAt: (fill: number) => number, fill: number) => {
  const give = inCheck(result, 'bending', 'depthDifference');
  const line = Math.tan(job.hidden.lineAngle) * knurlWidth(job);
  const uneven = give + line + job.hidden.blankTaper / 2;
  const half = uneven / 2 / (figureOf(result, 'sharpHeight') * Math.max(0.12, 1 - fill));
  const flat = (x: number) => mm(flatAt(Math.min(1, Math.max(0.05, x))));
  return { near: flat(fill + half), far: flat(fill - half), distance: mm(0.8 * knurlWidth(job)) };
};

const measured = (random: Random, job: Job, result: SetupResult, ends: boolean) => {
  const { request, hidden } = job;
  const p = result.pitch.normal;
  const planned = result.blank.tooth.fill;
  const fill = Math.min(1, Math.max(0.1, planned - hidden.fillShort));
  const blank = result.blank.diameter + hidden.blankOff;
  const share = request.growth.mean + hidden.growthOff;
  const grown = share * figureOf(result, 'growth') * (fill / planned) ** 2;
  const flatAt = (x: number) => Math.min(p, Math.max(0, p * (1 - x) + 0.012 * normalFrom(random)));
  try {
    return checkAfter(request, {
      blank: mm(blank),
      teeth: null,
      crest: mm(blank + Math.max(0, grown + 0.006 * normalFrom(random))),
      toothHeight: null,
      flat: random() < 0.85 ? mm(flatAt(fill)) : null,
      ends: ends ? endsOf(job, result, flatAt, fill) : null,
    });
  } catch (error) {
    // A reading that makes no sense is not reported.
    if (error instanceof OutOfRange) return null;
    throw error;
  }
};

/** What a person has measured when they come to ask: some of it, and not perfectly. */
export const seenBy = (
  random: Random,
  job: Job,
  result: SetupResult,
  symptom: SymptomId,
): TroubleSeen => {
  const { hidden } = job;
  const looks = (share: number) => random() < share;
  const ofSize = ['oversize', 'undersize', 'shallowAllRound'].includes(symptom);
  const ofFade = ['fadesAlong', 'tapered'].includes(symptom);
  const bite = figureOf(result, 'firstBite') * hidden.biteFactor;
  const blank = result.blank.diameter + hidden.blankOff;
  const after = looks(ofSize ? 0.85 : ofFade ? 0.7 : 0.3) && result.process === 'form';
  return {
    partsOnWheel: looks(0.85) ? hidden.parts : null,
    firstBite: looks(0.6) ? mm(bite * (1 + 0.1 * normalFrom(random))) : null,
    blank: looks(ofSize ? 0.8 : 0.6) ? mm(blank + 0.002 * normalFrom(random)) : null,
    blankTaper: looks(ofFade ? 0.7 : 0.2)
      ? mm(Math.abs(hidden.blankTaper + 0.003 * normalFrom(random)))
      : null,
    after: after ? measured(random, job, result, ofFade) : null,
  };
};
