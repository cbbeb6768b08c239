import { speakerCalled, terminalCall } from '../adapters/terminal/index.ts';
import type { FigureName } from '../calc/index.ts';
import type { Answer, Desk } from '../desk/index.ts';
import { mulberry32 } from './chance.ts';
import { DECISIONS, type Decision, spokenLine } from './decisions.ts';
import { FLOOR } from './floor.ts';
import type { Said } from './said.ts';
import { type Batch, DAYS, resultLine, season } from './season.ts';

const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
/** Any will do; with this one every run of the demo tells the same. */
const SEED = 114;
/** The shop is set up a while before its season begins. */
const BEFORE_HOURS = 24;
/** The last shift began so long ago. */
const LAST_SHIFT_HOURS = 9;

export type Filling = {
  /** Its clock is the one that is handed along. */
  readonly desk: Desk;
  readonly clock: { now: number };
  /** Brings about what was left to be done. */
  readonly settle: () => Promise<number>;
};

type CardAnswer = Extract<Answer, { readonly kind: 'card' }>;

/** The demo's own sentences have to be understood; one that is not is a fault of the demo. */
const understood = (answer: Answer, { by, line }: Said): CardAnswer => {
  if (answer.kind === 'card') return answer;
  throw new Error(`refused to ${by}: ${line}: ${JSON.stringify(answer.refusal)}`);
};

/** Says things one after the other, a minute after what was said before or at their own time. */
const speakerIn = ({ desk, clock, settle }: Filling) => {
  let number = 0;
  return async (said: Said, at = 0): Promise<CardAnswer> => {
    clock.now = Math.max(clock.now + MINUTE, at);
    number += 1;
    const call = {
      ...terminalCall(said.line, number, speakerCalled(said.by)),
      // Not one of the lines that are typed afterwards in the same run.
      interactionId: `demo-${String(number)}`,
    };
    const { attached } = said;
    const answer = await desk.answer(
      attached === undefined ? call : { ...call, attached: [attached] },
    );
    await settle();
    return understood(answer, said);
  };
};

const codeOn = ({ card }: CardAnswer): string => {
  const { headline } = card;
  if (headline.line === 'questionPutUp') return headline.values.code;
  for (const part of card.parts)
    if (part.part === 'lines')
      for (const each of part.lines) if (each.line === 'cardCode') return each.values.code;
  throw new Error('a card without a code');
};

const figureOf =
  ({ card }: CardAnswer) =>
  (name: FigureName): number =>
    card.figures[name]?.value ?? Number.NaN;

type Season = {
  readonly say: (said: Said, at?: number) => Promise<CardAnswer>;
  readonly begin: number;
  /** Codes by what they are spoken of as. */
  readonly codes: Map<string, string>;
};

const makeBatch = async ({ say, begin, codes }: Season, batch: Batch): Promise<void> => {
  const { job, by, at, results } = batch;
  const card = await say({ by, line: job.line }, begin + at * HOUR);
  const code = codeOn(card);
  codes.set(`card ${job.part}`, code);
  for (const result of results) await say({ by, line: resultLine(code, result, figureOf(card)) });
};

const decide = async ({ say, begin, codes }: Season, decision: Decision): Promise<void> => {
  const { by, line, at, names } = decision;
  const card = await say({ by, line: spokenLine(line, codes) }, begin + at * HOUR);
  if (names !== undefined) codes.set(names, codeOn(card));
};

/** Fills an empty shop by what its people say in a season that ends now. */
export const fill = async (filling: Filling): Promise<void> => {
  const { clock } = filling;
  const begin = clock.now - (DAYS - 1) * 24 * HOUR - LAST_SHIFT_HOURS * HOUR;
  clock.now = begin - BEFORE_HOURS * HOUR;
  const say = speakerIn(filling);
  for (const said of FLOOR) await say(said);
  const going: Season = { say, begin, codes: new Map() };
  let decided = 0;
  const decideUntil = async (at: number): Promise<void> => {
    for (;;) {
      const next = DECISIONS[decided];
      if (next === undefined || next.at > at) return;
      decided += 1;
      await decide(going, next);
    }
  };
  for (const batch of season(mulberry32(SEED))) {
    await decideUntil(batch.at);
    await makeBatch(going, batch);
  }
  await decideUntil(DAYS * 24);
};
