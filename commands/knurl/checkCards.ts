import {
  type AfterCheck,
  type BlankCheck,
  type CautionId,
  CHOSEN_CAUTIONS,
  type CheckFigures,
  type FamilyGrowth,
  firstBite,
  MM_PER_INCH,
  type Mm,
  mm,
  type SeamCheck,
  type SetupRequest,
  STANDING_CAUTIONS,
  sharpHeight,
  standardDp,
  TRACKS_WITHIN,
  trackingWindow,
  type Window,
  waysOfCheck,
} from '../../src/calc/index.ts';
import {
  type Card,
  type Choice,
  type Line,
  label,
  line,
  type Part,
  type Picture,
  type Row,
  row,
} from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import type { CheckWords } from './checkFields.ts';
import { afterPictures, blankPictures, seamPictures } from './checkPictures.ts';
import { logChoices } from './resultChoices.ts';
import { growthLines } from './shopGrowth.ts';
import { reworded } from './words.ts';

/** What a check's card is made from. */
type Checked<R> = {
  readonly context: Context;
  readonly said: CheckWords;
  readonly request: SetupRequest;
  readonly diameter: Mm;
  readonly result: R;
};

const figureOf = (figures: CheckFigures, name: keyof CheckFigures): number | null =>
  figures[name]?.value ?? null;

const cautionPart = (cautions: readonly CautionId[]): Part => ({
  part: 'cautions',
  shown: CHOSEN_CAUTIONS.filter((id) => cautions.includes(id)),
  rest: [],
  all: cautions,
});

const otherUnits = ({ context, said }: Checked<unknown>): Choice => {
  const turned = (said.units ?? context.units) === 'in' ? 'mm' : 'in';
  return {
    label: label('otherUnits', { units: turned }),
    words: reworded(context, ['units'], `show ${turned}`),
  };
};

/** What only a check can say; without it the line is that of a set-up. */
const CHECK_WORDS = ['seam', 'count', 'scrap', 'crest', 'height', 'flat', 'flats'] as const;

/** Decimals that a diameter is typed with: fine enough that no rounding moves a count. */
const TYPED = { in: 4, mm: 3 } as const;

const typedLength = ({ context }: Checked<unknown>, length: Mm): string =>
  context.units === 'in'
    ? `${(length / MM_PER_INCH).toFixed(TYPED.in)} in`
    : `${length.toFixed(TYPED.mm)} mm`;

/** A diameter and its count, said so that the wheel is taken by them from now on. */
const pairWords = (c: Checked<unknown>, count: number, diameter: Mm): string =>
  `proven ${String(count)} at ${typedLength(c, diameter)}`;

const BLANK_WORDS = ['diameter', 'asIs', 'teeth'] as const;

/** The set-up card of this blank, left as it is; said without what only a check reads. */
const setUpAt = (c: Checked<unknown>, diameter: Mm, pair = ''): Choice => {
  const without = [...CHECK_WORDS, ...BLANK_WORDS, ...(pair === '' ? [] : ['proven'])];
  const more = `${typedLength(c, diameter)} as-is ${pair}`;
  const words = reworded(c.context, without, more).replace(/^(?:\/?knurl\s+)?check\b\s*/iu, '');
  return { label: label('setUpAt', { diameter }), words: `/knurl ${words}` };
};

const cardOf = (
  c: Checked<BlankCheck | SeamCheck | AfterCheck>,
  headline: Line,
  parts: readonly Part[],
  cautions: readonly CautionId[],
  choices: readonly Choice[],
  pictures: readonly Picture[],
): Card => ({
  verb: 'check',
  headline,
  parts: [...parts, cautionPart(cautions), { part: 'footing' }],
  choices: [...choices, otherUnits(c)],
  pictures,
  figures: c.result.figures,
  checks: c.result.checks,
  cautions,
  alternatives: c.result.alternatives,
  ways: waysOfCheck(c.request, c.result),
  units: c.said.units ?? c.context.units,
});

const tracks = ({ result }: Checked<BlankCheck>): boolean =>
  result.checks.every((check) => check.name !== 'tracking' || check.state === 'fine');

/** Smallest diameter that makes sense with this pitch, where the blank is below it. */
const sensibleFrom = ({ result }: Checked<BlankCheck>): Mm | null => {
  const tracking = result.checks.find(({ reason }) => reason === 'fewTeeth');
  const smallest = tracking?.figures['smallestDiameter'];
  return smallest === undefined || smallest === null ? null : mm(smallest.value);
};

const blankHeadline = (c: Checked<BlankCheck>): Line => {
  const { figures } = c.result;
  const { diameter } = c;
  const smallest = sensibleFrom(c);
  if (smallest !== null) return line('blankFewTeeth', { diameter, smallest });
  const toothCount = figureOf(figures, 'toothCount') ?? 0;
  const toothError = figureOf(figures, 'toothError') ?? 0;
  if (tracks(c))
    return line('blankTracks', {
      diameter,
      toothCount,
      toothError,
      chance: figureOf(figures, 'chanceTracks'),
    });
  const [next, off] = [figureOf(figures, 'nextDiameter'), figureOf(figures, 'nextTakeOff')];
  const nextToothCount = figureOf(figures, 'nextToothCount');
  if (next === null || off === null || nextToothCount === null)
    return line('blankTooSmall', { diameter, toothError });
  return line('blankDoesNot', {
    diameter,
    toothError,
    nextDiameter: mm(next),
    nextToothCount,
    takeOff: mm(off),
  });
};

/** The window of the count the headline tells: a bar cannot be turned up to a larger one. */
const windowTold = (c: Checked<BlankCheck>): Window | null => {
  const { pitch, knurlClass } = c.request;
  const { figures } = c.result;
  const teeth = figureOf(figures, tracks(c) ? 'toothCount' : 'nextToothCount');
  return teeth === null
    ? null
    : trackingWindow({
        teeth,
        transversePitch: c.result.pitch.transverse,
        dp: pitch?.system === 'dp' ? standardDp(pitch.value) : null,
        knurlClass,
      });
};

const blankLines = (c: Checked<BlankCheck>): readonly Line[] => {
  const { figures } = c.result;
  if (sensibleFrom(c) !== null) return [];
  const window = windowTold(c);
  const chance = figureOf(figures, 'chanceTracks');
  const doubted = tracks(c) && doubtsWheel(c);
  return [
    ...(tracks(c)
      ? []
      : [
          line('blankIsOff', {
            diameter: c.diameter,
            toothCount: figureOf(figures, 'toothCount') ?? 0,
            toothError: figureOf(figures, 'toothError') ?? 0,
          }),
        ]),
    ...(window === null ? [] : [line('windowTracks', window)]),
    ...(chance === null || !doubted ? [] : [line('chanceTracks', { chance })]),
  ];
};

const seamSteps = (bite: Mm): readonly Line[] =>
  ([1, 2, 3, 4] as const).map((step) => line('seamStep', { step, bite }));

/** Infeed of the trial turn, the same as the first turn's. */
const trialBite = ({ request, result }: Checked<{ pitch: BlankCheck['pitch'] }>): Mm =>
  firstBite(sharpHeight(result.pitch.normal, request.included), TRACKS_WITHIN);

/** Where the wheel's label leaves the count open, the seam test settles it. */
const doubtsWheel = ({ result }: Checked<BlankCheck>): boolean =>
  result.checks.some((check) => check.name === 'wheel' && check.state !== 'fine');

/** Before a wheel touches the blank. */
export const blankCard = (c: Checked<BlankCheck>): Card => {
  const next = figureOf(c.result.figures, 'nextDiameter');
  const to = tracks(c) ? c.diameter : next === null ? null : mm(next);
  return cardOf(
    c,
    blankHeadline(c),
    [
      { part: 'lines', lines: blankLines(c) },
      { part: 'checks', checks: c.result.checks },
      { part: 'lines', lines: doubtsWheel(c) ? seamSteps(trialBite(c)) : [] },
    ],
    STANDING_CAUTIONS,
    to === null || sensibleFrom(c) !== null
      ? []
      : [setUpAt(c, to), ...(tracks(c) ? logChoices(c.context) : [])],
    blankPictures(c.request, c.diameter, c.result),
  );
};

/** The pair that proves the wheel: the whole count, and the diameter on which it closes. */
const provenPair = ({
  result,
}: Checked<SeamCheck>): {
  readonly count: number;
  readonly diameter: Mm;
} | null => {
  const count = figureOf(result.figures, 'nextToothCount');
  const diameter = figureOf(result.figures, 'nextDiameter');
  const isProven = figureOf(result.figures, 'effectivePitch') !== null;
  return !isProven || count === null || diameter === null
    ? null
    : { count, diameter: mm(diameter) };
};

/** A count that no doubt about the wheel covers, by more than one tooth. */
const countIsFar = ({ said, result }: Checked<SeamCheck>): boolean => {
  const expected = figureOf(result.figures, 'toothCount') ?? 0;
  const doubt = figureOf(result.figures, 'countDoubt') ?? 0;
  return said.count !== undefined && Math.abs(said.count - expected) > doubt + 1 + 1e-9;
};

const seamLines = (c: Checked<SeamCheck>): readonly Line[] => {
  const { said, result } = c;
  const { figures } = result;
  const chance = figureOf(figures, 'chanceTracks');
  const byLabel = figureOf(figures, 'seamLabelChance');
  const effective = figureOf(figures, 'effectivePitch');
  const pair = provenPair(c);
  const expected = figureOf(figures, 'toothCount') ?? 0;
  if (countIsFar(c)) return [line('seamCountFar', { count: said.count ?? 0, expected })];
  return [
    ...(chance === null || byLabel === null ? [] : [line('seamChance', { chance, byLabel })]),
    ...(result.kind === 'closes' && said.scrap !== true ? [] : [line('seamMarksStay', {})]),
    ...(effective === null || pair === null
      ? []
      : [line('seamProven', { effectivePitch: mm(effective), ...pair })]),
  ];
};

const seamChoices = (c: Checked<SeamCheck>, left: Mm): readonly Choice[] => {
  if (countIsFar(c))
    return [
      {
        label: label('withoutCount', {}),
        words: reworded(c.context, ['count'], ''),
      },
    ];
  const pair = provenPair(c);
  if (pair === null) return [setUpAt(c, left)];
  return [setUpAt(c, left, pairWords(c, pair.count, pair.diameter))];
};

/** The label no longer counts once the seam has spoken: only a wheel that is proven is named. */
const seamChecks = ({ result }: Checked<SeamCheck>): SeamCheck['checks'] =>
  result.checks.filter((check) => check.name !== 'wheel' || check.state === 'fine');

/** How much the trial turn says is to come off. */
export const seamCard = (c: Checked<SeamCheck>): Card => {
  const { figures, kind } = c.result;
  const left = mm(figureOf(figures, 'seamDiameter') ?? c.diameter);
  const takeOff = mm(figureOf(figures, 'seamTakeOff') ?? 0);
  const headline =
    kind === 'whole'
      ? line('seamWhole', { diameter: c.diameter })
      : line('seamTurnTo', { diameter: left, takeOff });
  const result = { ...c.result, checks: seamChecks(c) };
  return cardOf(
    { ...c, result },
    headline,
    [
      { part: 'lines', lines: seamLines(c) },
      { part: 'checks', checks: result.checks },
      { part: 'lines', lines: seamSteps(trialBite(c)) },
    ],
    c.result.cautions,
    seamChoices(c, left),
    countIsFar(c) ? [] : seamPictures(c.request, c.diameter, c.result),
  );
};

const afterRows = ({ result }: Checked<AfterCheck>): readonly Row[] => {
  const figure = (name: keyof CheckFigures) => figureOf(result.figures, name);
  const [counted, expected] = [figure('countedTeeth'), figure('countExpected')];
  const [crest, low, high] = [
    figure('crestMeasured'),
    figure('crestDiameterLow'),
    figure('crestDiameterHigh'),
  ];
  const [growth, factor] = [figure('growthMeasured'), figure('growthFactor')];
  const [measured, fromCrest] = [figure('fillMeasured'), figure('fillFromCrest')];
  return [
    ...(counted === null || expected === null ? [] : [row('countSeen', { counted, expected })]),
    ...(crest === null || low === null || high === null
      ? []
      : [row('crestSeen', { crest: mm(crest), low: mm(low), high: mm(high) })]),
    ...(growth === null || factor === null
      ? []
      : [row('growthSeen', { growth: mm(growth), factor })]),
    ...(measured === null && fromCrest === null ? [] : [row('fillSeen', { measured, fromCrest })]),
  ];
};

const rescueLines = ({ result }: Checked<AfterCheck>): readonly Line[] => {
  const { rescue } = result;
  if (rescue === null) return [];
  const { cleaned, blank, meetsPrint } = rescue;
  return blank === null
    ? [line('noRescue', { cleaned })]
    : [
        line('rescue', {
          cleaned,
          diameter: blank.diameter,
          toothCount: blank.teeth,
          meetsPrint,
        }),
      ];
};

const thisPartLines = ({ result }: Checked<AfterCheck>): readonly Line[] =>
  result.thisPart.filter((move) => move.id !== 'keep').map((move) => line('thisPart', { move }));

/** What the planned fill leaves on the crests: near full form a better judge than the dial. */
const plannedFlat = ({ result }: Checked<AfterCheck>): Mm =>
  mm(result.pitch.normal * (1 - (figureOf(result.figures, 'fillExpected') ?? 0)));

const nextPartLines = (c: Checked<AfterCheck>): readonly Line[] => {
  const { result, diameter, said } = c;
  const flat = plannedFlat(c);
  const expected = figureOf(result.figures, 'countExpected') ?? 0;
  const differs = result.checks.some(
    ({ name, reason }) => name === 'count' && reason === 'wheelDiffers',
  );
  return result.nextPart.map((move) =>
    move.id === 'turnBlank' && differs && move.number !== null && said.finish === undefined
      ? line('nextCount', {
          blank: diameter,
          counted: said.count ?? expected,
          diameter: mm(move.number),
          expected,
        })
      : line('nextPart', { move, flat }),
  );
};

const afterHeadline = (c: Checked<AfterCheck>): Line => {
  const { result, diameter, said } = c;
  const [move] = result.thisPart;
  const expected = figureOf(result.figures, 'countExpected') ?? 0;
  return result.right || move === undefined
    ? line('partRight', { blank: diameter, toothCount: said.count ?? expected })
    : line('partOff', { off: result.off, move, flat: plannedFlat(c) });
};

/** A part that is spoiled is turned down where that helps; the next one is set up. */
const afterChoices = (c: Checked<AfterCheck>): readonly Choice[] => {
  const { result, said, diameter } = c;
  const { rescue } = result;
  const down = result.thisPart.some((move) => move.id === 'turnDown');
  const count = result.checks.find((check) => check.name === 'count');
  const isProven = count?.reason === 'asExpected' || count?.reason === 'wheelDiffers';
  const pair = isProven && said.count !== undefined ? pairWords(c, said.count, diameter) : '';
  const smaller = down ? (rescue?.blank?.diameter ?? null) : null;
  return [...(smaller === null ? [] : [setUpAt(c, smaller, pair)]), setUpAt(c, diameter, pair)];
};

/** A cut part has no growth to expect. */
const growthBehind = (c: Checked<AfterCheck>, growth: FamilyGrowth | null): readonly Line[] =>
  growthLines(
    growth,
    c.request,
    figureOf(c.result.figures, 'growthExpected') === null ? 'cut' : 'form',
  );

/** The finished part: right or not, what is off, and what to do. */
export const afterCard = (c: Checked<AfterCheck>, growth: FamilyGrowth | null): Card =>
  cardOf(
    c,
    afterHeadline(c),
    [
      {
        part: 'lines',
        lines: [...thisPartLines(c), ...nextPartLines(c), ...rescueLines(c)],
      },
      { part: 'rows', rows: afterRows(c) },
      { part: 'checks', checks: c.result.checks },
      { part: 'lines', lines: growthBehind(c, growth) },
    ],
    STANDING_CAUTIONS,
    [...afterChoices(c), ...logChoices(c.context)],
    afterPictures(c.request, c.diameter, c.result),
  );
