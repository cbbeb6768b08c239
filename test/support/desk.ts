/** A line as an operator sends it, and what comes back: through words, desk and command. */
import { FLEET } from '../../commands/index.ts';
import { cardText, spoken, terminalCall } from '../../src/adapters/terminal/index.ts';
import { type Answer, type Desk, openDesk, plainShop } from '../../src/desk/index.ts';
import { en } from '../../src/phrases/index.ts';
import type { ShopUnits } from '../../src/words/index.ts';

export type CardAnswer = Extract<Answer, { readonly kind: 'card' }>;
export type RefusalAnswer = Extract<Answer, { readonly kind: 'refusal' }>;

export const deskIn = (units: ShopUnits): Desk => openDesk(FLEET, plainShop(units));

const DESKS = { in: deskIn('in'), mm: deskIn('mm') } as const;

export const ask = (line: string, units: ShopUnits = 'in'): Promise<Answer> =>
  DESKS[units].answer(terminalCall(line, 1));

/** The answer as it is read on a phone. */
export const textOf = (answer: Answer, width = 48): string => cardText(spoken(answer, en), width);

export const cardFor = async (line: string, units: ShopUnits = 'in'): Promise<CardAnswer> => {
  const answer = await ask(line, units);
  if (answer.kind !== 'card') throw new Error(`refused: ${line}\n${textOf(answer)}`);
  return answer;
};

export const refusalFor = async (line: string, units: ShopUnits = 'in'): Promise<RefusalAnswer> => {
  const answer = await ask(line, units);
  if (answer.kind !== 'refusal') throw new Error(`answered: ${line}\n${textOf(answer)}`);
  return answer;
};

/** A figure's number; NaN, which equals nothing, where it does not apply. */
export const figureOf = ({ card }: CardAnswer, name: string): number =>
  card.figures[name]?.value ?? Number.NaN;

/** `fine forms`, or `absent`. */
export const checkOf = ({ card }: CardAnswer, name: string): string => {
  const check = card.checks.find((each) => each.name === name);
  return check === undefined ? 'absent' : `${check.state} ${check.reason}`;
};
