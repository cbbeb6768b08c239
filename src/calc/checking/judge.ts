import { formedRound, heightFromCrest } from '../growth/index.ts';
import { formOf } from '../pattern.ts';
import { type SetupRequest, type SetupResult, setUp } from '../setup/index.ts';
import { toothCount } from '../teeth.ts';
import { type Mm, mm, within } from '../units.ts';
import { type Fade, FLAT_READING, type FlatsAlong, fadeAlong } from './fade.ts';
import { wholeCount } from './proven.ts';

/** How well a diameter over crests and a tooth height are read, standard deviations. Judgement. */
const CREST_READING: Mm = mm(0.01);
const HEIGHT_READING: Mm = mm(0.01);
/** Less than this under the blank, a crest that was cut is read as on it: three readings. Judgement. */
const UNDER_BLANK: Mm = mm(3 * CREST_READING);
/** Fill that a person stops within, standard deviation. Judgement. */
const STOPS_WITHIN = 0.03;

/** What was measured on a finished part; null where it was not. */
export type MeasuredPart = {
  /** Diameter before knurling. */
  readonly blank: Mm;
  readonly teeth: number | null;
  readonly crest: Mm | null;
  readonly toothHeight: Mm | null;
  /** Flat left on the crests. */
  readonly flat: Mm | null;
  readonly ends: FlatsAlong | null;
};

/** What was measured, made comparable with what was planned. */
export type Judged = {
  readonly part: MeasuredPart;
  readonly plan: SetupResult;
  readonly sharp: Mm;
  readonly fillPlanned: number;
  readonly fillMeasured: number | null;
  /** Crest diameter to expect at the fill that was measured, else at the planned one. */
  readonly staticGrowth: Mm | null;
  readonly growthMeasured: Mm | null;
  readonly growthFactor: number | null;
  readonly fillFromCrest: number | null;
  readonly countExpected: number;
  readonly fade: Fade | null;
  readonly filled: Off | null;
  readonly growth: Off | null;
};

/** How far off, in standard deviations, too little being negative. */
export type Off = { readonly by: number };

type Reading = { readonly fill: number; readonly sd: number };

const figureOf = (plan: SetupResult, name: keyof SetupResult['figures']): number =>
  plan.figures[name]?.value ?? 0;

const heightReading = (part: MeasuredPart, sharp: Mm): Reading | null =>
  part.toothHeight === null
    ? null
    : {
        fill: within('toothHeight', part.toothHeight, 0, sharp, 'mm') / sharp,
        sd: HEIGHT_READING / sharp,
      };

const flatReading = (part: MeasuredPart, p: number): Reading | null => {
  const { flat, ends } = part;
  const seen = flat ?? (ends === null ? null : mm((ends.near + ends.far) / 2));
  return seen === null
    ? null
    : { fill: 1 - within('flat', seen, 0, p, 'mm') / p, sd: FLAT_READING / p };
};

/**
 * A cut takes material away: crests under the blank are sharp, and by how much they are under it
 * is how much deeper than its whole tooth the cut went.
 */
const cutDeeper = ({ blank, crest }: MeasuredPart, sharp: Mm): Reading | null =>
  crest === null || blank - crest < UNDER_BLANK
    ? null
    : { fill: 1 + (blank - crest) / 2 / sharp, sd: CREST_READING / 2 / sharp };

/** Height, flat and crest speak of one fill; the better reading counts for more. */
const fillReading = (readings: readonly Reading[]): Reading | null => {
  if (readings.length === 0) return null;
  const weight = readings.reduce((sum, { sd }) => sum + sd ** -2, 0);
  const fill = readings.reduce((sum, r) => sum + r.fill * r.sd ** -2, 0) / weight;
  return { fill, sd: weight ** -0.5 };
};

const staticGrowthAt = (plan: SetupResult, request: SetupRequest, sharp: Mm, fill: number): Mm =>
  formedRound({
    form: formOf(request.pattern),
    blankDiameter: plan.blank.diameter,
    height: mm(fill * sharp),
    sharpHeight: sharp,
  }).growth;

const crestSaid = (part: MeasuredPart, plan: SetupResult, sharp: Mm): Mm | null => {
  if (part.crest === null) return null;
  // A formed knurl only rises, and never by more than its whole tooth.
  const least = plan.process === 'cut' ? part.blank - 2 * sharp : part.blank;
  return within('crestDiameter', part.crest, mm(least), mm(part.blank + 2 * sharp), 'mm');
};

/** Fill that the crest speaks for, the expected growth being right. */
const crestFill = (
  request: SetupRequest,
  plan: SetupResult,
  sharp: Mm,
  growth: Mm,
): number | null => {
  const height = heightFromCrest({
    form: formOf(request.pattern),
    blankDiameter: plan.blank.diameter,
    crestDiameter: mm(plan.blank.diameter + growth / request.growth.mean),
    sharpHeight: sharp,
  });
  return height === null ? null : height / sharp;
};

const filledOff = (reading: Reading | null, planned: number): Off | null =>
  reading === null ? null : { by: (reading.fill - planned) / Math.hypot(STOPS_WITHIN, reading.sd) };

type GrowthSeen = {
  readonly request: SetupRequest;
  readonly plan: SetupResult;
  readonly sharp: Mm;
  readonly growth: Mm;
  readonly fill: Reading;
};

/** The growth factor against what the shop has seen, with everything that blurs it. */
const growthOff = (seen: GrowthSeen): { readonly factor: number; readonly off: Off } | null => {
  const { request, plan, sharp, fill } = seen;
  const at = (x: number) => staticGrowthAt(plan, request, sharp, Math.min(1, Math.max(0, x)));
  const still = at(fill.fill);
  if (still < CREST_READING / 10) return null;
  const slope = (at(fill.fill + 0.01) - at(fill.fill - 0.01)) / 0.02 / still;
  const factor = seen.growth / still;
  const spread = Math.hypot(request.growth.sd, CREST_READING / still, factor * slope * fill.sd);
  return { factor, off: { by: (factor - request.growth.mean) / spread } };
};

const fadeOf = (part: MeasuredPart, request: SetupRequest, plan: SetupResult): Fade | null => {
  if (part.ends === null) return null;
  const bending = plan.checks.find(({ name }) => name === 'bending');
  const deflection = bending?.figures['depthDifference']?.value ?? null;
  return fadeAlong({
    form: formOf(request.pattern),
    blank: part.blank,
    p: plan.pitch.normal,
    included: request.included,
    flats: part.ends,
    deflection: deflection === null ? null : mm(deflection),
  });
};

/** Every figure a finished part gives, held against the set-up of the blank it was made from. */
export const judge = (request: SetupRequest, part: MeasuredPart): Judged => {
  const plan = setUp({ ...request, stock: part.blank, asIs: true, wantedTeeth: null });
  const sharp = mm(figureOf(plan, 'sharpHeight'));
  const countExpected = Math.round(toothCount(part.blank, plan.pitch.transverse));
  if (part.teeth !== null) wholeCount(part.teeth, countExpected);
  const crest = crestSaid(part, plan, sharp);
  const cut = plan.process === 'cut';
  const readings = [
    heightReading(part, sharp),
    flatReading(part, plan.pitch.normal),
    cut ? cutDeeper(part, sharp) : null,
  ];
  const reading = fillReading(readings.filter((each) => each !== null));
  const fillPlanned = plan.blank.tooth.fill;
  const grown = crest === null || cut ? null : mm(crest - part.blank);
  const fill = reading ?? { fill: fillPlanned, sd: STOPS_WITHIN };
  const growth = grown === null ? null : growthOff({ request, plan, sharp, growth: grown, fill });
  return {
    part,
    plan,
    sharp,
    fillPlanned,
    fillMeasured: reading?.fill ?? null,
    staticGrowth: cut ? null : staticGrowthAt(plan, request, sharp, fill.fill),
    growthMeasured: grown,
    growthFactor: growth?.factor ?? null,
    fillFromCrest: grown === null ? null : crestFill(request, plan, sharp, grown),
    countExpected,
    fade: fadeOf(part, request, plan),
    filled: filledOff(reading, fillPlanned),
    growth: growth?.off ?? null,
  };
};
