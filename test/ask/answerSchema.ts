/** What a program may rely on in the object that `ask --json` prints. */
import { z } from 'zod';
import { UNITS } from '../../src/calc/index.ts';
import { en } from '../../src/phrases/index.ts';

const number = z.number();
const text = z.string().trim().min(1);
const figure = z.strictObject({ value: number, unit: z.enum(UNITS) });
const figures = z.record(z.string(), figure.nullable());

/** The figures of a set-up, each with its unit; more may be added, none may go or change. */
const SETUP_FIGURES = {
  stockToothCount: '1',
  stockToothError: '1',
  toothCount: '1',
  blankDiameter: 'mm',
  blankWindowLow: 'mm',
  blankWindowHigh: 'mm',
  pitch: 'mm',
  transversePitch: 'mm',
  sharpHeight: 'mm',
  toothHeight: 'mm',
  fill: '1',
  infeed: 'mm',
  fullInfeed: 'mm',
  growth: 'mm',
  growthFactor: '1',
  crestDiameter: 'mm',
  crestDiameterLow: 'mm',
  crestDiameterHigh: 'mm',
  crestFlat: 'mm',
  firstBite: 'mm',
  surfaceSpeed: 'm/min',
  spindleSpeed: 'rev/min',
  feed: 'mm/rev',
  feedLow: 'mm/rev',
  feedHigh: 'mm/rev',
  turns: '1',
  passes: '1',
  time: 's',
} as const;

const setupFigures = z
  .object(
    Object.fromEntries(
      Object.entries(SETUP_FIGURES).map(([name, unit]) => [
        name,
        z.strictObject({ value: number, unit: z.literal(unit) }).nullable(),
      ]),
    ),
  )
  .catchall(figure.nullable());

const check = z.strictObject({
  name: z.enum(Object.keys(en.checks) as [string, ...string[]]),
  state: z.enum(['fine', 'watch', 'stop']),
  figures,
});
const cautions = z.array(z.enum(Object.keys(en.cautions) as [string, ...string[]]));
const alternative = z.looseObject({ toothCount: number.int().min(3), blankDiameter: number });
const choice = z.strictObject({ label: text, words: z.string().regex(/^\/\S/u) });

/** Where in the line it stands, for those refusals that know. */
const place = {
  word: text.optional(),
  start: number.int().min(0).optional(),
  end: number.int().min(0).optional(),
};
const suggestion = z.strictObject({ label: text, words: text });
export const refusalSchema = z.discriminatedUnion('code', [
  z.strictObject({
    code: z.literal('unreadable'),
    word: z.string(),
    start: number.int().min(0),
    end: number.int().min(0),
    nearest: z.array(text),
  }),
  z.strictObject({
    code: z.literal('missing'),
    parameter: text,
    examples: z.array(text).min(1),
    ...place,
  }),
  z.strictObject({
    code: z.literal('outOfRange'),
    what: text,
    value: number,
    min: number,
    max: number,
    unit: z.enum(UNITS),
    ...place,
  }),
  z.strictObject({
    code: z.literal('unclear'),
    what: text,
    readings: z.array(suggestion),
    because: text.optional(),
    ...place,
  }),
  z.strictObject({ code: z.literal('notAllowed'), role: text, people: z.array(text) }),
  z.strictObject({ code: z.literal('notFound'), what: text, nearest: z.array(text), ...place }),
  z.strictObject({ code: z.literal('stale'), what: text, by: text, when: text }),
  z.strictObject({ code: z.literal('unavailable'), what: text, words: z.string() }),
]);

const card = {
  headline: text,
  refusal: z.null(),
  figures,
  checks: z.array(check),
  cautions,
  alternatives: z.array(alternative),
  choices: z.array(choice),
};

/** A set-up card: all of its figures, the standing cautions, and nothing beside what is promised. */
export const setupSchema = z.strictObject({
  ...card,
  figures: setupFigures,
  cautions: cautions.min(6),
});

const refused = z.strictObject({
  headline: text,
  refusal: refusalSchema,
  figures: z.strictObject({}),
  checks: z.tuple([]),
  cautions: z.tuple([]),
  alternatives: z.tuple([]),
  choices: z.array(choice),
});

/** Whatever comes back: a card of any verb, with tables of its own, or a refusal. */
export const answerSchema = z.union([z.looseObject(card), refused]);
