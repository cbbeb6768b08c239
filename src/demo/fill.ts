import { speakerCalled, terminalCall } from '../adapters/terminal/index.ts';
import type { Answer, Desk } from '../desk/index.ts';
import { FLOOR } from './floor.ts';
import { JOBS } from './jobs.ts';
import { OPERATORS, type Said } from './said.ts';

const MINUTE = 60_000;

export type Filling = {
  /** Whose clock is the one that is handed along. */
  readonly desk: Desk;
  readonly clock: { now: number };
  /** Brings about what was left to be done. */
  readonly settle: () => Promise<number>;
};

/** The demo's own sentences have to be understood; one that is not is a fault of the demo. */
const understood = (answer: Answer, { by, line }: Said): Extract<Answer, { kind: 'card' }> => {
  if (answer.kind === 'card') return answer;
  throw new Error(`refused to ${by}: ${line}: ${JSON.stringify(answer.refusal)}`);
};

/** Says things one after the other, each at its time. */
const say = async ({ desk, clock, settle }: Filling, said: Said, number: number) => {
  clock.now += (said.after ?? 1) * MINUTE;
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

/** Fills an empty shop by what its people say. */
export const fill = async (filling: Filling): Promise<void> => {
  let number = 0;
  const next = (said: Said) => say(filling, said, (number += 1));
  for (const said of FLOOR) await next(said);
  for (const [at, { line }] of JOBS.entries())
    await next({ by: OPERATORS[at % OPERATORS.length] ?? '', line, after: 30 });
};
