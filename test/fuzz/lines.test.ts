import { describe, expect, it } from 'vitest';
import {
  answerJson,
  cardText,
  PHONE_WIDTH,
  spoken,
  terminalCall,
} from '../../src/adapters/terminal/index.ts';
import { type Figures, UNITS } from '../../src/calc/index.ts';
import type { Answer } from '../../src/desk/index.ts';
import { en } from '../../src/phrases/index.ts';
import { answerSchema, setupSchema } from '../ask/answerSchema.ts';
import { type CardAnswer, deskIn, type RefusalAnswer } from '../support/desk.ts';
import { shopLines } from './shopLines.ts';

/** Ten rows of ten thousand lines, one after the other in an inch and a metric shop. */
const SEEDS = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10];
const LINES_A_SEED = 10_000;
/** The slower looks are taken at one answer in so many. */
const SAMPLE = 25;

const DESKS = [deskIn('in'), deskIn('mm')] as const;
const UNIT_NAMES: ReadonlySet<string> = new Set(UNITS);

/** Names of figures that are neither a finite number with a unit nor null. */
const brokenFigures = (figures: Figures): readonly string[] =>
  Object.entries(figures)
    .filter(([, figure]) => {
      if (figure === null) return false;
      return !Number.isFinite(figure.value) || !UNIT_NAMES.has(figure.unit);
    })
    .map(([name]) => name);

const cardFaults = ({ card }: CardAnswer): readonly string[] => [
  ...brokenFigures(card.figures),
  ...card.checks.flatMap((check) => brokenFigures(check.figures)),
  ...card.alternatives
    .filter((each) => !(each.blankDiameter > 0 && Number.isInteger(each.toothCount)))
    .map((each) => `alternative of ${String(each.toothCount)} teeth`),
  ...(card.parts.at(-1)?.part === 'footing' ? [] : ['no word of what goes before the card']),
];

const refusalFaults = ({ refusal }: RefusalAnswer, line: string): readonly string[] => {
  const numbers = Object.entries(refusal).filter(([, value]) => typeof value === 'number');
  const endless = numbers.filter(([, value]) => !Number.isFinite(value)).map(([name]) => name);
  const [start, end] = 'start' in refusal ? [refusal.start, refusal.end] : [undefined, undefined];
  if (start === undefined || end === undefined) return endless;
  const inside = start >= 0 && start <= end && end <= line.length;
  return inside ? endless : [...endless, `points at ${String(start)} to ${String(end)}`];
};

const textFaults = (answer: Answer): readonly string[] => {
  const card = spoken(answer, en);
  const text = cardText(card, PHONE_WIDTH);
  const tooWide = text.split('\n').filter((line) => line.length > PHONE_WIDTH);
  // A refusal repeats what was typed, whatever that was; a card only what it has read.
  const odd =
    answer.kind === 'card' ? /NaN|Infinity|undefined|\bnull\b|\[object/u.exec(text) : null;
  return [
    ...tooWide.map((line) => `too wide: ${line}`),
    ...(/\S/u.test(card.headline) ? [] : ['says nothing']),
    ...(odd === null ? [] : [`says ${odd[0]}`]),
    ...card.choices
      .filter(({ label, words }) => label.trim() === '' || !words.startsWith('/'))
      .map(({ words }) => `a button that sends ${JSON.stringify(words)}`),
  ];
};

const isSetup = (answer: Answer): boolean => answer.kind === 'card' && answer.card.verb === 'setup';

/** The object for programs, as it comes out of its own text. */
const jsonFaults = (answer: Answer): readonly string[] => {
  const object: unknown = JSON.parse(JSON.stringify(answerJson(answer, en)));
  const { error } = (isSetup(answer) ? setupSchema : answerSchema).safeParse(object);
  return error === undefined ? [] : [error.message];
};

type Tally = { faults: string[]; kinds: Map<string, number> };

const look = async (line: string, index: number, tally: Tally): Promise<void> => {
  const desk = DESKS[index % 2]!;
  const answer = await desk.answer(terminalCall(line, index));
  const kind = answer.kind === 'card' ? 'card' : answer.refusal.code;
  tally.kinds.set(kind, (tally.kinds.get(kind) ?? 0) + 1);
  const sampled = Math.floor(index / 2) % SAMPLE === 0;
  const faults = [
    ...(answer.kind === 'card' ? cardFaults(answer) : refusalFaults(answer, line)),
    ...textFaults(answer),
    ...(sampled ? jsonFaults(answer) : []),
  ];
  if (faults.length > 0) tally.faults.push(`${JSON.stringify(line)}: ${faults.join('; ')}`);
  if (!sampled) return;
  // What a button sends is answered too.
  const { choices } = spoken(answer, en);
  for (const { words } of choices.slice(0, 2)) await desk.answer(terminalCall(words, index));
};

describe('any line', () => {
  it.each(SEEDS)('gets a card or a refusal that can be read (row %d)', async (seed) => {
    const tally: Tally = { faults: [], kinds: new Map() };
    let index = 0;
    for (const line of shopLines(seed, LINES_A_SEED)) {
      try {
        await look(line, index, tally);
      } catch (error) {
        tally.faults.push(`${JSON.stringify(line)} throws ${String(error)}`);
      }
      index += 1;
    }
    expect(tally.faults.slice(0, 10)).toEqual([]);
    expect(index).toBe(LINES_A_SEED);
    // The lines are not all of one kind.
    for (const kind of ['card', 'unreadable', 'unclear', 'outOfRange', 'missing'])
      expect(tally.kinds.get(kind) ?? 0, kind).toBeGreaterThan(LINES_A_SEED / 100);
  });

  it('of the same seed is the same line', () => {
    expect([...shopLines(7, 200)]).toEqual([...shopLines(7, 200)]);
    expect([...shopLines(7, 200)]).not.toEqual([...shopLines(8, 200)]);
  });
});
