import { speakerCalled, terminalCall } from '../adapters/terminal/index.ts';
import type { FigureName } from '../calc/index.ts';
import type { Answer, Desk } from '../desk/index.ts';
import { mulberry32 } from './chance.ts';
import { FLOOR } from './floor.ts';
import type { Said } from './said.ts';
import { DAYS, resultLine, season } from './season.ts';

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
  for (const part of card.parts)
    if (part.part === 'lines')
      for (const each of part.lines) if (each.line === 'cardCode') return each.values.code;
  throw new Error('a card without a code');
};

const figureOf =
  ({ card }: CardAnswer) =>
  (name: FigureName): number =>
    card.figures[name]?.value ?? Number.NaN;

/** Fills an empty shop by what its people say in a season that ends now. */
export const fill = async (filling: Filling): Promise<void> => {
  const { clock } = filling;
  const begin = clock.now - (DAYS - 1) * 24 * HOUR - LAST_SHIFT_HOURS * HOUR;
  clock.now = begin - BEFORE_HOURS * HOUR;
  const say = speakerIn(filling);
  for (const said of FLOOR) await say(said);
  for (const { job, by, at, results } of season(mulberry32(SEED))) {
    const card = await say({ by, line: job.line }, begin + at * HOUR);
    for (const result of results)
      await say({ by, line: resultLine(codeOn(card), result, figureOf(card)) });
  }
};
