import {
  type AfterCheck,
  type BlankCheck,
  type Candidate,
  type Check,
  type CheckFigures,
  cribPitch,
  formOf,
  type Mm,
  mm,
  type SetupRequest,
  type SetupResult,
  sharpHeight,
  type Window,
} from '../../src/calc/index.ts';
import type { Picture } from '../../src/card/index.ts';

type PictureFor<K extends Picture['kind']> = Extract<Picture, { kind: K }>;
type StripMarks = PictureFor<'trackingStrip'>['numbers']['marks'];

const trackingOf = (checks: readonly Check[]): Check | undefined =>
  checks.find((check) => check.name === 'tracking');
const isFine = (checks: readonly Check[]): boolean => trackingOf(checks)?.state === 'fine';

const toothForm = ({ figures, blank, pitch, process }: SetupResult): readonly Picture[] => {
  const { sharpHeight: sharp, crestFlat } = figures;
  if (sharp === null || crestFlat === null) return [];
  const { tooth, diameter, teeth } = blank;
  return [
    {
      kind: 'toothForm',
      numbers: {
        toothCount: teeth,
        blankDiameter: diameter,
        crestDiameter: tooth.crest,
        toothHeight: tooth.height,
        sharpHeight: mm(sharp.value),
        infeed: tooth.infeed,
        pitch: pitch.normal,
        transversePitch: pitch.transverse,
        crestFlat: mm(crestFlat.value),
        process,
      },
    },
  ];
};

const strip = (of: {
  readonly transversePitch: Mm;
  /** The whole-tooth diameter that the window belongs to. */
  readonly whole: number;
  readonly window: Window;
  readonly marks: StripMarks;
  readonly next: PictureFor<'trackingStrip'>['numbers']['next'];
}): Picture => {
  const { transversePitch, whole, marks, next } = of;
  return {
    kind: 'trackingStrip',
    numbers: {
      transversePitch,
      below: mm(whole - of.window.low),
      above: mm(of.window.high - whole),
      marks,
      next,
    },
  };
};

const setupStrip = (request: SetupRequest, result: SetupResult): Picture => {
  const { blank, pitch, window } = result;
  const { stock } = request;
  const blankMark = { what: 'blank', diameter: blank.diameter } as const;
  return strip({
    transversePitch: pitch.transverse,
    whole: (blank.teeth * pitch.transverse) / Math.PI,
    window,
    marks: stock === null ? [blankMark] : [{ what: 'bar', diameter: stock }, blankMark],
    next: null,
  });
};

const setupSketch = (request: SetupRequest, result: SetupResult): Picture => ({
  kind: 'setupSketch',
  numbers: {
    blankDiameter: result.blank.diameter,
    bore: request.bore,
    length: request.length ?? result.wheelInUse.width,
    stickout: request.stickout,
    chamfer: result.blank.tooth.height,
    wheelDiameter: request.counted?.diameter ?? request.wheel.diameter,
    wheelFace: request.wheel.face,
    support: request.support,
    opposed: request.layout === 'opposed',
    travel: result.motion.travel,
  },
});

const familiesOf = ({
  pattern,
}: SetupRequest): PictureFor<'developedPattern'>['numbers']['families'] => {
  switch (pattern.kind) {
    case 'straight':
      return 'straight';
    case 'diagonal':
      return pattern.hand ?? 'right';
    case 'diamond':
      return 'crossed';
    case 'square':
      return 'square';
  }
};

const developedPattern = (request: SetupRequest, result: SetupResult): Picture => ({
  kind: 'developedPattern',
  numbers: {
    toothCount: result.blank.teeth,
    transversePitch: result.pitch.transverse,
    helix: result.pitch.helix,
    families: familiesOf(request),
    toothError: trackingOf(result.checks)?.figures['toothError']?.value ?? 0,
    tracks: isFine(result.checks),
  },
});

/** Tooth, diameter and machine; where the count is bad, what it would do to the pattern instead. */
export const setupPictures = (request: SetupRequest, result: SetupResult): readonly Picture[] =>
  isFine(result.checks)
    ? [...toothForm(result), setupStrip(request, result), setupSketch(request, result)]
    : [setupStrip(request, result), developedPattern(request, result), ...toothForm(result)];

const figureOf = (figures: CheckFigures, name: keyof CheckFigures): number | null =>
  figures[name]?.value ?? null;

/** Where the blank stands between the whole counts, and where to from there. */
export const checkPictures = (
  diameter: Mm,
  { figures, checks }: Pick<BlankCheck | AfterCheck, 'figures' | 'checks'>,
): readonly Picture[] => {
  const [pitch, toothCount] = [
    figureOf(figures, 'transversePitch'),
    figureOf(figures, 'toothCount'),
  ];
  const [low, high] = [figureOf(figures, 'blankWindowLow'), figureOf(figures, 'blankWindowHigh')];
  if (pitch === null || toothCount === null || low === null || high === null) return [];
  const seam = figureOf(figures, 'seamDiameter');
  const proven = figureOf(figures, 'effectivePitch');
  // A seam that does not close speaks against the label: its counts are not shown as if they held.
  if (seam !== null && proven === null) return [];
  const to = seam ?? figureOf(figures, 'nextDiameter');
  const needsNext = to !== null && to < diameter - 1e-6 && (seam !== null || !isFine(checks));
  return [
    strip({
      transversePitch: mm(proven ?? pitch),
      whole: (toothCount * pitch) / Math.PI,
      window: { low: mm(low), high: mm(high) },
      marks: [{ what: 'bar', diameter }],
      next: needsNext ? { from: diameter, to: mm(to) } : null,
    }),
  ];
};

/** Dots on the map: more would hide each other. Judgement. */
const MAPPED = 40;

export const planPictures = (
  request: SetupRequest,
  limits: Window,
  candidates: readonly Candidate[],
): readonly Picture[] => {
  const [first] = candidates;
  if (first === undefined) return [];
  return [
    {
      kind: 'planMap',
      numbers: {
        limits,
        candidates: candidates
          .slice(0, MAPPED)
          .map(({ blankDiameter, fill, toothCount, state, wheel }) => ({
            blankDiameter,
            fill,
            toothCount,
            state,
            wheel: wheel.name,
          })),
        tooth: {
          form: formOf(first.wheel.pattern),
          sharpHeight: sharpHeight(cribPitch(first.wheel).normal, first.wheel.included),
          growthMean: request.growth.mean,
          process: first.process,
        },
      },
    },
  ];
};
