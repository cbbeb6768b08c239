import {
  type AfterCheck,
  type BlankCheck,
  type CheckFigures,
  type Mm,
  mm,
  type SeamCheck,
  type SetupRequest,
  standardDp,
  trackingWindow,
  wholeToothDiameter,
} from '../../src/calc/index.ts';
import type { Picture } from '../../src/card/index.ts';

type Strip = Extract<Picture, { kind: 'trackingStrip' }>['numbers'];

const figureOf = (figures: CheckFigures, name: keyof CheckFigures): number | null =>
  figures[name]?.value ?? null;

/** Half widths of the window round a whole count, by the class where one is called out. */
const windowOf = ({ pitch, knurlClass }: SetupRequest, transversePitch: Mm) => {
  // Every whole count has the same window.
  const teeth = 100;
  const window = trackingWindow({
    teeth,
    transversePitch,
    dp: pitch?.system === 'dp' ? standardDp(pitch.value) : null,
    knurlClass,
  });
  const whole = wholeToothDiameter(teeth, transversePitch);
  return { below: mm(whole - window.low), above: mm(window.high - whole) };
};

/** Off a whole count, and large enough that a smaller one makes sense. */
const wantsNext = ({ checks }: Pick<BlankCheck, 'checks'>): boolean => {
  const tracking = checks.find(({ name }) => name === 'tracking');
  return tracking?.state !== 'fine' && tracking?.reason !== 'fewTeeth';
};

/** Where a blank stands between the whole counts, and where to from there. */
export const blankPictures = (
  request: SetupRequest,
  diameter: Mm,
  { figures, checks, pitch }: BlankCheck,
): readonly Picture[] => {
  const to = figureOf(figures, 'nextDiameter');
  const next: Strip['next'] =
    to === null || !wantsNext({ checks }) || to >= diameter - 1e-6
      ? null
      : { from: diameter, to: mm(to), off: mm(diameter - to) };
  return [
    {
      kind: 'trackingStrip',
      numbers: {
        transversePitch: pitch.transverse,
        wholeAt: null,
        ...windowOf(request, pitch.transverse),
        marks: [{ what: 'bar', diameter }],
        expected: null,
        next,
      },
    },
  ];
};

/**
 * What a trial turn says: the seam closes on a whole count, whichever number that is. Only a wheel
 * that is proven by it has counts.
 */
export const seamPictures = (
  request: SetupRequest,
  diameter: Mm,
  { figures, pitch }: SeamCheck,
): readonly Picture[] => {
  const closes = mm(figureOf(figures, 'seamDiameter') ?? diameter);
  const proven = figureOf(figures, 'effectivePitch');
  const transversePitch = mm(proven ?? pitch.transverse);
  return [
    {
      kind: 'trackingStrip',
      numbers: {
        transversePitch,
        wholeAt: proven === null ? closes : null,
        ...windowOf(request, transversePitch),
        marks: [{ what: 'bar', diameter }],
        expected: null,
        next:
          closes < diameter - 1e-6
            ? { from: diameter, to: closes, off: mm(diameter - closes) }
            : null,
      },
    },
  ];
};

/** A count that is not the label's, and no doubled pattern either: the wheel is by its own pitch. */
const ownPitch = ({ figures, checks, spoiled }: AfterCheck): number | null =>
  spoiled || checks.some(({ name, reason }) => name === 'count' && reason !== 'wheelDiffers')
    ? null
    : figureOf(figures, 'effectivePitch');

/** A finished part: where its blank stood, what it measures beside what was expected, where to now. */
export const afterPictures = (
  request: SetupRequest,
  blank: Mm,
  result: AfterCheck,
): readonly Picture[] => {
  const { figures, spoiled, rescue, pitch } = result;
  const crest = spoiled ? null : figureOf(figures, 'crestMeasured');
  const low = figureOf(figures, 'crestDiameterLow');
  const high = figureOf(figures, 'crestDiameterHigh');
  const counted = figureOf(figures, 'countedTeeth');
  if (crest === null && counted === null) return [];
  const transversePitch = mm(ownPitch(result) ?? pitch.transverse);
  const to = rescue?.blank?.diameter ?? null;
  return [
    {
      kind: 'trackingStrip',
      numbers: {
        transversePitch,
        wholeAt: null,
        ...windowOf(request, transversePitch),
        marks: [
          { what: 'blank', diameter: blank },
          ...(crest === null ? [] : [{ what: 'part', diameter: mm(crest) } as const]),
        ],
        expected:
          crest === null || low === null || high === null ? null : { low: mm(low), high: mm(high) },
        // How much comes off depends on the crests, which are not measured.
        next: to === null ? null : { from: blank, to, off: null },
      },
    },
  ];
};
