import {
  type AfterCheck,
  DOUBTED_BEYOND,
  type FamilyGrowth,
  mm,
  type SetupRequest,
  STANDING_CAUTIONS,
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
import { type KeptCard, type KeptResult, type Logged, resultName } from '../../src/shop/index.ts';
import { ASKED } from './resultChoices.ts';

/** What a result's card is made from. */
export type Told = {
  readonly context: Context;
  readonly did: 'logged' | 'corrected' | 'withdrawn' | 'confirmed' | 'shown';
  readonly logged: Logged;
  readonly card: KeptCard;
  /** Names of what others stand otherwise because of it. */
  readonly others: { readonly learned: readonly string[]; readonly doubted: readonly string[] };
  readonly wheel: string | null;
  /** Parts the wheel has run more, or fewer, because of what was done. */
  readonly worn: number;
  /** What trouble says of it, where it went wrong. */
  readonly trouble: Card | null;
  readonly troubleWords: string | null;
  /** Who logged it, and what was done to it since. */
  readonly history: readonly Line[];
};

const nameOf = ({ logged }: Told): string => resultName(logged.result.number);

const headline = (t: Told): Line => {
  const { outcome, symptom } = t.logged.result;
  const said = { result: nameOf(t), code: t.card.code, outcome, symptom };
  if (t.did === 'shown') return line('resultShown', said);
  return t.did === 'withdrawn'
    ? line('resultWithdrawn', said)
    : line('resultDone', { ...said, did: t.did });
};

const figureOf = (after: AfterCheck, name: keyof AfterCheck['figures']): number | null =>
  after.figures[name]?.value ?? null;

/** Teeth, crest and fill against the card's. */
const seenRows = (after: AfterCheck, result: KeptResult): readonly Row[] => {
  const expected = figureOf(after, 'countExpected');
  const low = figureOf(after, 'crestDiameterLow');
  const high = figureOf(after, 'crestDiameterHigh');
  const measured = figureOf(after, 'fillMeasured');
  const { teeth, crest } = result;
  return [
    ...(teeth === null || expected === null
      ? []
      : [row('countSeen', { counted: teeth, expected })]),
    ...(crest === null || low === null || high === null
      ? []
      : [row('crestSeen', { crest, low: mm(low), high: mm(high) })]),
    ...(measured === null ? [] : [row('fillSeen', { measured, fromCrest: null })]),
  ];
};

const rows = (t: Told): readonly Row[] => {
  const { compared, result, partsOnWheel } = t.logged;
  const { after } = compared;
  const { share, cause, note } = result;
  const expected = after === null ? null : figureOf(after, 'growthFactorExpected');
  return [
    ...(after === null ? [] : seenRows(after, result)),
    ...(share === null ? [] : [row('resultGrowth', { share, expected })]),
    ...(t.wheel === null || partsOnWheel === null
      ? []
      : [row('resultWheel', { wheel: t.wheel, parts: t.worn, run: partsOnWheel })]),
    ...(cause === null ? [] : [row('resultCause', { cause })]),
    ...(note === null ? [] : [row('resultNote', { note })]),
  ];
};

const waitsLine = (t: Told, share: number, { mean, sd }: FamilyGrowth): Line =>
  line('resultWaits', {
    result: nameOf(t),
    share,
    low: mean - DOUBTED_BEYOND * sd,
    high: mean + DOUBTED_BEYOND * sd,
  });

const expectsLine = ({ card }: Told, { mean, ofFamily }: FamilyGrowth): Line => {
  const { pattern, material } = card.request as SetupRequest;
  return line('resultExpects', { mean, ofFamily, pattern, group: material.group });
};

/** What the cards learn from it, or why nothing. */
const learnedLines = (t: Told): readonly Line[] => {
  const { compared, growth, result } = t.logged;
  switch (result.standing) {
    case 'silent': {
      const why = compared.growth;
      // Nobody measures the crest of a part that is none.
      const isIdle = typeof why !== 'string' || (why === 'noCrest' && result.outcome !== 'good');
      return isIdle ? [] : [line('resultTeachesNot', { why })];
    }
    case 'doubted':
      return result.share === null || growth === null ? [] : [waitsLine(t, result.share, growth)];
    case 'learned':
    case 'withdrawn':
      return growth === null ? [] : [expectsLine(t, growth)];
  }
};

const otherLines = ({ others }: Told): readonly Line[] =>
  others.learned.length + others.doubted.length === 0 ? [] : [line('resultOthers', others)];

const causeLines = ({ logged }: Told): readonly Line[] => {
  const { cause, symptom, standing } = logged.result;
  return cause === null || symptom === null || standing === 'withdrawn'
    ? []
    : [line('resultCauseCounts', { cause, symptom })];
};

/** What to do now: as a check of the part says it, and as trouble says it. */
const moveLines = ({ logged, trouble }: Told): readonly Line[] => {
  const { after } = logged.compared;
  const { outcome, standing } = logged.result;
  if (standing === 'withdrawn') return [];
  const behind = trouble === null ? [] : [trouble.headline];
  if (after === null) return behind;
  const flat = mm(after.pitch.normal * (1 - (figureOf(after, 'fillExpected') ?? 0)));
  // What went wrong is not made the same again, and the count of a doubled part proves no pitch.
  const next = after.nextPart.filter(
    ({ id }) => id !== 'logGrowth' && outcome !== 'double' && (id !== 'same' || outcome === 'good'),
  );
  return [
    ...behind,
    ...after.thisPart.filter(({ id }) => id !== 'keep').map((move) => line('thisPart', { move })),
    ...next.map((move) => line('nextPart', { move, flat })),
  ];
};

/** The version that this card was made from: a button never writes over another's change. */
const seen = (t: Told): string => `${nameOf(t)} seen ${String(t.logged.result.version)}`;

const standingChoices = (t: Told): readonly Choice[] => {
  const { compared, result } = t.logged;
  const correct = `/knurl result correct ${seen(t)}`;
  return [
    ...(result.standing === 'doubted'
      ? [
          {
            label: label('confirmResult', { result: nameOf(t) }),
            words: `/knurl result confirm ${seen(t)}`,
          },
        ]
      : []),
    ...(compared.growth === 'noHeight'
      ? [{ label: label('heightMeasured', {}), words: correct, ask: ['height'] }]
      : []),
    ...(result.symptom !== null && t.troubleWords !== null
      ? [{ label: label('whatIsBehind', { symptom: result.symptom }), words: t.troubleWords }]
      : []),
    ...(result.outcome !== 'good' && result.cause === null
      ? [{ label: label('causeFound', {}), words: correct, ask: ['cause'] }]
      : []),
    { label: label('correctResult', {}), words: correct, ask: ASKED },
    {
      label: label('withdrawResult', { result: nameOf(t) }),
      words: `/knurl result withdraw ${seen(t)}`,
    },
  ];
};

const choices = (t: Told): readonly Choice[] => [
  ...(t.logged.result.standing === 'withdrawn' ? [] : standingChoices(t)),
  { label: label('cardOf', { code: t.card.code }), words: `/knurl card ${t.card.code}` },
];

/** Only what is not as it should be: the rows have the rest. */
const checksOf = ({ logged }: Told): Card['checks'] =>
  logged.result.standing === 'withdrawn'
    ? []
    : (logged.compared.after?.checks ?? []).filter(({ state }) => state !== 'fine');

/** What a result did: against the card, to the growth, to the wheel, and what is next. */
export const resultCard = (t: Told): Card => {
  const checks = checksOf(t);
  const { after } = t.logged.compared;
  const parts: Part[] = [
    { part: 'lines', lines: moveLines(t) },
    { part: 'rows', rows: rows(t) },
    { part: 'checks', checks },
    {
      part: 'lines',
      lines: [...learnedLines(t), ...otherLines(t), ...causeLines(t), ...t.history],
    },
    { part: 'cautions', shown: [], rest: [], all: STANDING_CAUTIONS },
    { part: 'footing' },
  ];
  return {
    verb: 'result',
    headline: headline(t),
    parts,
    choices: choices(t),
    pictures: [],
    figures: after?.figures ?? {},
    checks,
    cautions: STANDING_CAUTIONS,
    alternatives: [],
    lists: { results: [t.logged.result] },
    units: t.context.units,
  };
};
