import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { ask, cardFor, refusalFor, textOf } from '../../support/desk.ts';

const said = (text: string): string => text.replaceAll(/\s+/gu, ' ');

type Cause = {
  readonly cause: string;
  readonly chance: number;
  readonly evidence: readonly unknown[];
  readonly move: { readonly id: string; readonly number: number | null };
};
const causesIn = (lists: Readonly<Record<string, readonly unknown[]>> | undefined) =>
  (lists?.['causes'] ?? []) as readonly Cause[];

/** What people say, and what the card says it has understood. */
const SPOKEN: readonly (readonly [words: string, seen: string])[] = [
  ['double', 'double or split pattern'],
  ['double pattern', 'double or split pattern'],
  ['split pattern', 'double or split pattern'],
  ['shallow one side', 'shallow on one side'],
  ['shallow', 'shallow all round'],
  ['tapered', 'tapered'],
  ['pattern fades', 'fades along the length'],
  ['fades along the length', 'fades along the length'],
  ['flaking', 'flaking or slivers'],
  ['slivers', 'flaking or slivers'],
  ['crests torn', 'torn crests'],
  ['wheel stopped turning', 'wheel stopped turning'],
  ['pin seized', 'pin seized or picked up'],
  ['pin picked up', 'pin seized or picked up'],
  ['wheel teeth chipped', 'chipped'],
  ['part bent', 'bent'],
  ['tube out of round', 'out of round'],
  ['uneven diamonds', 'uneven diamonds'],
  ['oversize', 'too large over the crests'],
  ['undersize', 'too small over the crests'],
  ['ridge at start', 'ridge'],
  ['ridge at the end', 'ridge'],
  ['chatter', 'chatter'],
  ['slipped in the chuck', 'chuck'],
  ['mark every turn', 'mark'],
];

describe('a symptom in the words of the trade', () => {
  it.each(SPOKEN)('%s', async (words, seen) => {
    const answer = await cardFor(`/knurl trouble ${words}`);
    const text = said(textOf(answer, 200)).toLowerCase();
    expect(text).toContain('seen: ');
    expect(text).toContain(seen);
    expect(text).toContain('ranked by words alone');
    const causes = causesIn(answer.card.lists);
    expect(causes.length).toBeGreaterThan(1);
    for (const { move } of causes) expect(move.id).not.toBe('');
  });

  it('a wrong size says too little and is asked', async () => {
    for (const words of ['size wrong', 'wrong size', 'size is wrong']) {
      const answer = await refusalFor(`/knurl trouble ${words} 1.000 straight 21tpi`);
      expect(answer.refusal).toMatchObject({ code: 'unclear', what: 'symptom' });
      expect(answer.choices.map(({ label }) => label)).toEqual(['oversize', 'undersize']);
      for (const choice of answer.choices) expect((await ask(choice.words)).kind).toBe('card');
    }
  });

  it('none at all is asked with symptoms to choose', async () => {
    const answer = await refusalFor('/knurl trouble 1.000 straight 21tpi');
    expect(answer.refusal).toMatchObject({ code: 'missing', parameter: 'symptom' });
    for (const choice of answer.choices) expect((await ask(choice.words)).kind).toBe('card');
  });
});

describe('the numbers of the set-up speak', () => {
  const chanceOf = async (line: string, cause: string): Promise<number> =>
    causesIn((await cardFor(line)).card.lists).find((each) => each.cause === cause)?.chance ?? 0;

  it('ranks causes by chance, which add up to one', async () => {
    const causes = causesIn(
      (await cardFor('/knurl trouble double 1.000 straight 21tpi 1018')).card.lists,
    );
    const chances = causes.map(({ chance }) => chance);
    expect(chances).toEqual([...chances].sort((a, b) => b - a));
    expect(chances.reduce((sum, chance) => sum + chance, 0)).toBeCloseTo(1, 9);
  });

  it.each([
    ['double', '', 'runout 0.02', 'runOut'],
    ['flaking', 'fill 80%', 'fill 96%', 'overFilled'],
    ['double', 'bite 0.006', 'bite 0.001', 'lightFirstBite'],
  ])('%s: %s against %s', async (symptom, calm, telling, cause) => {
    const line = `/knurl trouble ${symptom} 1.000 straight 21tpi 1018 as-is`;
    const names = causesIn((await cardFor(line)).card.lists).map((each) => each.cause);
    expect(names).toContain(cause);
    expect(await chanceOf(`${line} ${telling}`, cause)).toBeGreaterThan(
      await chanceOf(`${line} ${calm}`, cause),
    );
  });

  it('gives each cause one move, as a number, and a way to the cards of the same bar', async () => {
    const answer = await cardFor('/knurl trouble double 1.000 straight 21tpi 1018');
    expect(causesIn(answer.card.lists)[0]?.move.number).not.toBeNull();
    const verbs: string[] = [];
    for (const { words } of answer.card.choices) verbs.push((await cardFor(words)).card.verb);
    expect(verbs).toEqual(['setup', 'check']);
  });
});

describe('what the records of the commands show', () => {
  const examples = FLEET.flatMap(({ path, examples: lines }) =>
    lines.map((line) => [path.join(' '), line] as const),
  ).filter(([path]) =>
    ['knurl setup', 'knurl check', 'knurl plan', 'knurl trouble'].includes(path),
  );

  it.each(examples)('%s: %s', async (path, line) => {
    const answer = await cardFor(line);
    expect(`knurl ${answer.card.verb}`).toBe(path);
  });
});
