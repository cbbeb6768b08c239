import {
  type AfterCheck,
  type BlankCheck,
  type CautionId,
  CHOSEN_CAUTIONS,
  type CheckFigures,
  type Mm,
  mm,
  type SeamCheck,
  type SetupRequest,
  STANDING_CAUTIONS,
  waysOfCheck,
} from '../../src/calc/index.ts';
import {
  type Card,
  type Choice,
  type Line,
  label,
  line,
  type Part,
  type Row,
  row,
} from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import type { CheckWords } from './checkFields.ts';
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

const cardOf = (
  c: Checked<BlankCheck | SeamCheck | AfterCheck>,
  headline: Line,
  parts: readonly Part[],
  cautions: readonly CautionId[],
): Card => ({
  verb: 'check',
  headline,
  parts: [...parts, cautionPart(cautions), { part: 'footing' }],
  choices: [otherUnits(c)],
  pictures: [],
  figures: c.result.figures,
  checks: c.result.checks,
  cautions,
  alternatives: c.result.alternatives,
  ways: waysOfCheck(c.request, c.result),
  units: c.said.units ?? c.context.units,
});

const blankHeadline = ({ diameter, result }: Checked<BlankCheck>): Line => {
  const { figures, checks } = result;
  const toothCount = figureOf(figures, 'toothCount') ?? 0;
  const toothError = figureOf(figures, 'toothError') ?? 0;
  const tracks = checks.every((check) => check.name !== 'tracking' || check.state === 'fine');
  if (tracks)
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

const blankLines = ({ result }: Checked<BlankCheck>): readonly Line[] => {
  const low = figureOf(result.figures, 'blankWindowLow');
  const high = figureOf(result.figures, 'blankWindowHigh');
  const chance = figureOf(result.figures, 'chanceTracks');
  return [
    ...(low === null || high === null
      ? []
      : [line('windowTracks', { low: mm(low), high: mm(high) })]),
    ...(chance === null ? [] : [line('chanceTracks', { chance })]),
  ];
};

const seamSteps = (figures: CheckFigures): readonly Line[] => {
  const bite = figureOf(figures, 'firstBite');
  return ([1, 2, 3, 4] as const).map((step) =>
    line('seamStep', { step, bite: bite === null ? null : mm(bite) }),
  );
};

/** Where the wheel's label leaves the count open, the seam test settles it. */
const doubtsWheel = ({ result }: Checked<BlankCheck>): boolean =>
  result.checks.some((check) => check.name === 'wheel' && check.state !== 'fine');

/** Before a wheel touches the blank. */
export const blankCard = (c: Checked<BlankCheck>): Card =>
  cardOf(
    c,
    blankHeadline(c),
    [
      { part: 'lines', lines: blankLines(c) },
      { part: 'checks', checks: c.result.checks },
      { part: 'lines', lines: doubtsWheel(c) ? seamSteps(c.result.figures) : [] },
    ],
    STANDING_CAUTIONS,
  );

const seamLines = ({ said, result, diameter }: Checked<SeamCheck>): readonly Line[] => {
  const { figures } = result;
  const chance = figureOf(figures, 'chanceTracks');
  const byLabel = figureOf(figures, 'seamLabelChance');
  const effective = figureOf(figures, 'effectivePitch');
  return [
    ...(chance === null || byLabel === null ? [] : [line('seamChance', { chance, byLabel })]),
    ...(result.kind === 'closes' && said.scrap !== true ? [] : [line('seamMarksStay', {})]),
    ...(effective === null
      ? []
      : [line('seamProven', { effectivePitch: mm(effective), count: said.count ?? 0, diameter })]),
  ];
};

/** How much the trial turn says is to come off. */
export const seamCard = (c: Checked<SeamCheck>): Card => {
  const { figures, kind } = c.result;
  const left = mm(figureOf(figures, 'seamDiameter') ?? c.diameter);
  const takeOff = mm(figureOf(figures, 'seamTakeOff') ?? 0);
  const headline =
    kind === 'whole'
      ? line('seamWhole', { diameter: c.diameter })
      : line('seamTurnTo', { diameter: left, takeOff });
  return cardOf(
    c,
    headline,
    [
      { part: 'lines', lines: seamLines(c) },
      { part: 'checks', checks: c.result.checks },
      { part: 'lines', lines: seamSteps(figures) },
    ],
    c.result.cautions,
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
    : [line('rescue', { cleaned, diameter: blank.diameter, toothCount: blank.teeth, meetsPrint })];
};

/** The finished part: right or not, what is off, and what to do. */
export const afterCard = (c: Checked<AfterCheck>): Card => {
  const { result, diameter } = c;
  const toothCount = figureOf(result.figures, 'countExpected') ?? 0;
  const headline = result.right
    ? line('partRight', { blank: diameter, toothCount })
    : line('partOff', { off: result.off });
  const moves: readonly Line[] = [
    ...result.thisPart.map((move) => line('thisPart', { move })),
    ...result.nextPart.map((move) => line('nextPart', { move })),
    ...rescueLines(c),
  ];
  return cardOf(
    c,
    headline,
    [
      { part: 'lines', lines: moves },
      { part: 'rows', rows: afterRows(c) },
      { part: 'checks', checks: result.checks },
    ],
    STANDING_CAUTIONS,
  );
};
