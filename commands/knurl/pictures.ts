import {
  type Candidate,
  type Check,
  cribPitch,
  formOf,
  mm,
  type SetupRequest,
  type SetupResult,
  sharpHeight,
  TRACKS_WITHIN,
  type Window,
} from '../../src/calc/index.ts';
import type { Picture } from '../../src/card/index.ts';

type PictureFor<K extends Picture['kind']> = Extract<Picture, { kind: K }>;

const trackingOf = (checks: readonly Check[]): Check | undefined =>
  checks.find((check) => check.name === 'tracking');
/** How far the second turn falls beside the first, in teeth. */
const errorOf = (checks: readonly Check[]): number =>
  trackingOf(checks)?.figures['toothError']?.value ?? 0;
/** Whether the pattern would split; a blank can be stopped for other reasons too. */
const splits = (checks: readonly Check[]): boolean =>
  Math.abs(errorOf(checks)) > TRACKS_WITHIN + 1e-9;

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

const setupStrip = (request: SetupRequest, result: SetupResult): Picture => {
  const { blank, pitch, window } = result;
  const { stock } = request;
  const whole = (blank.teeth * pitch.transverse) / Math.PI;
  const blankMark = { what: 'blank', diameter: blank.diameter } as const;
  return {
    kind: 'trackingStrip',
    numbers: {
      transversePitch: pitch.transverse,
      wholeAt: null,
      below: mm(whole - window.low),
      above: mm(window.high - whole),
      marks: stock === null ? [blankMark] : [{ what: 'bar', diameter: stock }, blankMark],
      expected: null,
      next: null,
    },
  };
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
    toothError: errorOf(result.checks),
    tracks: !splits(result.checks),
  },
});

/** Tooth, diameter and machine; where the count is bad, what it would do to the pattern instead. */
export const setupPictures = (request: SetupRequest, result: SetupResult): readonly Picture[] =>
  splits(result.checks)
    ? [setupStrip(request, result), developedPattern(request, result), ...toothForm(result)]
    : [...toothForm(result), setupStrip(request, result), setupSketch(request, result)];

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
