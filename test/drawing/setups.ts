/** Set-ups for the pictures: usual ones, and those at the ends of what is answered. */
import fc from 'fast-check';
import { afterPictures, blankPictures, seamPictures } from '../../commands/knurl/checkPictures.ts';
import { planPictures, setupPictures } from '../../commands/knurl/pictures.ts';
import { type MeasuredPart, recordPictures } from '../../commands/knurl/recordPictures.ts';
import {
  type CribWheel,
  checkAfter,
  checkBlank,
  degrees,
  dinCrib,
  dpCrib,
  growthFamily,
  MATERIALS,
  materialById,
  mm,
  OutOfRange,
  type Pattern,
  plan,
  type SetupRequest,
  seamTest,
  setUp,
  wholeToothDiameter,
} from '../../src/calc/index.ts';
import type { Card, Picture } from '../../src/card/index.ts';
import { drawPicture } from '../../src/drawing/index.ts';
import { en, type SpokenPicture, speakPictures } from '../../src/phrases/index.ts';
import { anySetup } from '../support/anySetup.ts';
import { planJob, planRequest, under } from '../support/planJob.ts';
import { between, mulberry32, normalFrom, oneOf } from '../support/random.ts';
import { requestOf } from '../support/setupRequest.ts';

/** The pictures of a set-up; none where the set-up makes no sense. */
export const picturesOf = (request: SetupRequest): readonly Picture[] | null => {
  try {
    return setupPictures(request, setUp(request));
  } catch (error) {
    if (error instanceof OutOfRange) return null;
    throw error;
  }
};

export const spokenIn = (
  units: 'in' | 'mm',
  pictures: readonly Picture[],
): readonly SpokenPicture[] => speakPictures(en, { pictures, units } as Card);

export const svgOf = (spoken: SpokenPicture): string =>
  drawPicture(spoken.kind, spoken.numbers, spoken.words);

/** From 4 teeth to thousands, pitch 0.2 to 3.2 mm, walls down to half a millimetre, any hold. */
const extremes = (count: number, seed: number): readonly SetupRequest[] => {
  const random = mulberry32(seed);
  return Array.from({ length: count }, () => {
    const pitch = oneOf(random, [0.2, 0.5, 1, 1.6, 3.2]);
    const teeth = Math.round(oneOf(random, [4, 12, 65, 600, 2400]) * between(random, 1, 1.2));
    const stock = Math.min(500, wholeToothDiameter(teeth, mm(pitch)) * between(random, 1, 1.01));
    const length = between(random, 1, 400);
    return requestOf({
      pattern: oneOf(random, [
        { kind: 'straight' },
        { kind: 'diagonal', hand: 'left' },
        { kind: 'diamond', points: 'raised' },
        { kind: 'square', points: 'raised' },
      ] as const),
      pitch: { system: 'metric', value: pitch },
      stock: mm(stock),
      asIs: random() < 0.4,
      material: materialById('brass360') ?? requestOf().material,
      length: random() < 0.3 ? null : mm(length),
      stickout: random() < 0.3 ? null : mm(length + between(random, 0, 400)),
      support: oneOf(random, ['chuck', 'tailstock', 'centres'] as const),
      layout: oneOf(random, ['oneSided', 'opposed', null] as const),
      bore: random() < 0.3 && stock > 12 * pitch ? mm(stock - Math.max(1, 4 * pitch)) : null,
      included: degrees(oneOf(random, [70, 90])),
    });
  });
};

/** So many set-ups that make sense, half of them extreme; the same every time. */
export const manySetups = (count: number): readonly (readonly Picture[])[] => {
  const usual = fc.sample(anySetup, { numRuns: count, seed: 8 });
  const far = extremes(count, 8);
  const drawn = (list: readonly SetupRequest[]) =>
    list
      .map(picturesOf)
      .filter((each) => each !== null)
      .slice(0, count / 2);
  return [...drawn(usual), ...drawn(far)];
};

/** Nothing where the request makes no sense. */
const sensible = (make: () => readonly Picture[]): readonly Picture[] => {
  try {
    return make();
  } catch (error) {
    if (error instanceof OutOfRange) return [];
    throw error;
  }
};

/** Checks before, by a trial turn and after, right and wrong, counts and crests far off among them. */
export const manyChecks = (count: number): readonly (readonly Picture[])[] => {
  const random = mulberry32(38);
  const checks: (readonly Picture[])[] = [];
  while (checks.length < count) {
    const pitch = oneOf(random, [0.2, 0.5, 1, 1.6, 3.2]);
    const teeth = Math.round(oneOf(random, [4, 12, 65, 600, 2400]) * between(random, 1, 1.2));
    const off = oneOf(random, [0, between(random, 0, 1 / teeth), between(random, 0, 0.02)]);
    const diameter = mm(Math.min(500, wholeToothDiameter(teeth, mm(pitch)) * (1 + off)));
    const request = requestOf({
      pattern: oneOf(random, PATTERNS),
      pitch: { system: 'metric', value: pitch },
      stock: diameter,
      asIs: true,
    });
    const seen = oneOf(random, [null, teeth, teeth + 1, 2 * teeth, 2 * teeth + 3]);
    const crest = mm(diameter + pitch * oneOf(random, [0.1, 0.4, 0.7, 5]));
    const measured = {
      blank: diameter,
      teeth: seen,
      crest: seen !== null && random() < 0.5 ? null : crest,
      toothHeight: null,
      flat: null,
      ends: null,
    };
    const gap = between(random, 0.05, 1);
    const reading = { gap, scrap: false, count: random() < 0.5 ? null : teeth };
    const drawn = sensible(
      oneOf(random, [
        () => blankPictures(request, diameter, checkBlank(request, diameter)),
        () => seamPictures(request, diameter, seamTest(request, diameter, reading)),
        () => afterPictures(request, diameter, checkAfter(request, measured)),
      ]),
    );
    if (drawn.length > 0) checks.push(drawn);
  }
  return checks;
};

/** A wheel as a shop may name it: as its maker does, with all there is to say, or in one long word. */
const named = (wheel: CribWheel, random: () => number): CribWheel => ({
  ...wheel,
  name: oneOf(random, [
    wheel.name,
    'A',
    `${wheel.name}, bought in spring, top drawer of the red cabinet`,
    'W'.repeat(60),
  ]),
});

/** Maps of plans from prints of 3 to 300 mm, tight and wide, with whichever wheels are there. */
export const manyPlans = (count: number): readonly (readonly Picture[])[] => {
  const random = mulberry32(18);
  const all = [...dinCrib(), ...dpCrib()];
  const maps: (readonly Picture[])[] = [];
  while (maps.length < count) {
    const crib = Array.from({ length: 12 }, () => named(oneOf(random, all), random));
    const job = planJob(oneOf(random, ['steel-lowC-CD', 'brass360']), {
      pitch: null,
      pattern: oneOf(random, PATTERNS),
      length: mm(between(random, 1, 60)),
    });
    const size = oneOf(random, [3, 12, 25.4, 60, 300]) * between(random, 1, 1.2);
    const limits = under(size, oneOf(random, [0.02, 0.13, 0.5]));
    const { candidates } = plan(planRequest(job, { limits, crib }));
    const pictures = planPictures(requestOf(), limits, candidates);
    if (pictures.length > 0) maps.push(pictures);
  }
  return maps;
};

const PATTERNS: readonly Pattern[] = [
  { kind: 'straight' },
  { kind: 'diagonal', hand: 'left' },
  { kind: 'diamond', points: 'raised' },
  { kind: 'square', points: 'sunk' },
];

/** Records of shops with one part and with hundreds, steady and wild, a slip of the pen among them. */
export const manyRecords = (count: number): readonly (readonly Picture[])[] => {
  const random = mulberry32(28);
  return Array.from({ length: count }, () => {
    const spread = oneOf(random, [0, 0.03, 0.3]);
    const kinds = Array.from({ length: Math.ceil(between(random, 0, 9)) }, () => {
      const [pattern, { group: material }] = [oneOf(random, PATTERNS), oneOf(random, MATERIALS)];
      return { pattern, material, family: growthFamily(pattern, material) };
    });
    const parts = Math.ceil(between(random, 0, oneOf(random, [2, 20, 300])));
    return recordPictures(
      Array.from({ length: parts }, (): MeasuredPart => {
        const slip = random() < 0.05 ? oneOf(random, [-1, 2]) : 0;
        return {
          ...oneOf(random, kinds),
          share: Math.min(5, Math.max(0, 0.92 + spread * normalFrom(random) + slip)),
          confirmed: random() < 0.1,
        };
      }),
    );
  });
};
