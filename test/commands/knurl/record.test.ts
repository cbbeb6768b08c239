/** What a shop's own results show, as a card, a picture and files; on both engines. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import {
  type GrowthResult,
  growthBelief,
  growthInterval,
  siftResults,
} from '../../../src/calc/index.ts';
import { type Answer, type Call, openRecordsDesk } from '../../../src/desk/index.ts';
import { recordedParts, shopOf, viewShop } from '../../../src/shop/index.ts';
import { textOf } from '../../support/desk.ts';
import { ENGINES } from '../../support/places.ts';
import { newRecords, START, WORDS } from '../../support/records.ts';

const MINUTE = 60_000;
const FAMILY = 'straight × steel';

const callOf = (words: string, who: string, shop: string): Call => ({
  shop,
  person: { id: who, name: who },
  place: { channel: 'floor', thread: null, isPrivate: false },
  interactionId: randomUUID(),
  given: { words },
});

const shopAt = async (engine: (typeof ENGINES)[number]) => {
  const { store } = await newRecords(engine);
  let at = START;
  const now = (): number => {
    at += MINUTE;
    return at;
  };
  const desk = openRecordsDesk(FLEET, store, { platform: 'terminal', program: 'test', now });
  const ask = (words: string, who = 'Ines', shop = 'north'): Promise<Answer> =>
    desk.answer(callOf(words, who, shop));
  const file = async (name: string, who = 'Ines', shop = 'north'): Promise<string | null> => {
    const pieces = await desk.download(callOf('', who, shop), name);
    if (pieces === null) return null;
    const read: string[] = [];
    for await (const piece of pieces) read.push(piece);
    return read.join('');
  };
  const parts = async (shop = 'north') => {
    const id = await shopOf(store.read, { platform: 'terminal', id: shop });
    return await recordedParts(viewShop(store.read, id ?? '', WORDS));
  };
  return { ask, file, parts };
};

/** Results on a wheel and without one, of two families, one of them far from all others. */
const furnished = async (ask: (words: string) => Promise<Answer>): Promise<void> => {
  await ask('/shop wheels add Hazel straight 21 tpi');
  await ask('1.000 straight 1018 wheel Hazel');
  for (const crest of ['1.0030', '1.0034', '1.0036', '1.0032', '1.0035'])
    await ask(`/knurl result good crest ${crest} flat 0.0048 10 parts`);
  await ask('/knurl result double 66 teeth');
  await ask('/knurl result flaking');
  await ask('/knurl result double');
  // Far more than was expected: it waits.
  await ask('/knurl result good crest 1.0130 flat 0.0048');
  await ask('7/8 straight 96dp brass');
  await ask('/knurl result good');
};

const headline = (answer: Answer): string => textOf(answer, 2_000).split('\n')[0] ?? '';

describe.each(ENGINES)('record, %s', (engine) => {
  it('says where there is nothing yet, and what to log', async () => {
    const { ask } = await shopAt(engine);
    expect(headline(await ask('/knurl record'))).toBe(
      'No results yet. Log one: /knurl result good 65 teeth',
    );
  });

  it('shows the growth of a family as the pure calculation has it over the same results', async () => {
    const { ask, parts } = await shopAt(engine);
    await furnished(ask);
    const results: readonly GrowthResult[] = await parts();
    expect(results).toHaveLength(6);
    expect(siftResults(results).doubted).toHaveLength(1);
    const belief = growthBelief(results, FAMILY);
    const { low, high } = growthInterval(belief);
    const percent = (share: number): string => (100 * share).toFixed(0);
    const answer = await ask('/knurl record');
    expect(textOf(answer, 2_000)).toContain(
      `${percent(belief.mean)} % (${percent(low)} to ${percent(high)})  straight knurl in steel, 5 results`,
    );
    expect(textOf(answer, 2_000)).toContain(
      'Not learned from until an engineer confirms them: R9.',
    );
    await ask('/knurl result confirm R9');
    const after = textOf(await ask('/knurl record'), 2_000);
    expect(after).toContain('6 results');
    expect(after).not.toContain('Not learned from');
  });

  it('counts how parts came out by wheel and by material, without a share of few', async () => {
    const { ask } = await shopAt(engine);
    await furnished(ask);
    await ask('/knurl result bent');
    await ask('/knurl result withdraw R11');
    const text = textOf(await ask('/knurl record'), 2_000);
    expect(text).toContain('10 results of this shop: 7 of 10 good.');
    expect(text).toMatch(/6 of 9 good +Hazel; double 2; flaking 1\n/u);
    expect(text).toMatch(/1 of 1 good +no wheel named\n/u);
    expect(text).toMatch(
      /6 of 9 good +Low-carbon steel, 0\.18 % C, cold drawn; double 2; flaking 1\n/u,
    );
    expect(text).not.toContain('bent');
    for (let more = 0; more < 15; more += 1) await ask('/knurl result good');
    // evidence: 22 of 25 is 88 %
    expect(headline(await ask('/knurl record'))).toBe(
      '25 results of this shop: 22 of 25 good, 88 %.',
    );
  });

  it('names the standards by what was logged on their cards', async () => {
    const { ask } = await shopAt(engine);
    await ask('1.000 straight 21tpi 1018');
    await ask('/knurl standard save WT-1042');
    await ask('/knurl result good 40 parts');
    await ask('/knurl result good 2 parts');
    await ask('7/8 straight 21tpi 1018');
    await ask('/knurl standard save WT-7');
    await ask('/knurl result good 300 parts');
    const text = textOf(await ask('/knurl record'), 2_000);
    expect(text).toMatch(/WT-1042 +2 results, 42 parts run\nWT-7 +1 result, 300 parts run\n/u);
  });

  it('draws the measured parts against what was expected, and says it in words', async () => {
    const { ask } = await shopAt(engine);
    await furnished(ask);
    const answer = await ask('/knurl record');
    const pictures = answer.kind === 'card' ? answer.card.pictures : [];
    expect(pictures.map(({ kind }) => kind)).toEqual(['shopRecord']);
  });

  it('gives the same as files to a supervisor, and nothing to others or of others', async () => {
    const { ask, file } = await shopAt(engine);
    await furnished(ask);
    await ask('/shop people add Suna supervisor');
    await ask('/shop people add Opal operator');
    const answer = await ask('/knurl record', 'Suna');
    const files = answer.kind === 'card' ? (answer.files ?? []) : [];
    expect(files).toEqual(['record-growth.csv', 'record-outcomes.csv', 'record-standards.csv']);
    for (const name of files) expect(await file(name, 'Suna')).toBe(await file(name));
    const lines = (await file('record-outcomes.csv', 'Suna'))?.split('\r\n') ?? [];
    expect(lines.slice(0, 4)).toEqual([
      'by,name,outcome,results',
      'wheel,Hazel,good,6',
      'wheel,Hazel,double,2',
      'wheel,Hazel,flaking,1',
    ]);
    expect(await file('record-growth.csv')).toMatch(
      /\r\nstraight × steel,5,0\.\d+,0\.\d+,\d\.\d+,R9\r\n/u,
    );
    expect(await file('record-growth.csv', 'Opal')).toBe(null);
    // What everything is in stays the owner's.
    expect(await file('shop.json', 'Suna')).toBe(null);
    expect(await file('shop.json')).toContain('Hazel');
    expect(headline(await ask('/knurl record', 'Opal'))).toContain(
      'That needs the role supervisor.',
    );
    expect(await file('record-outcomes.csv', 'Zoe', 'south')).toBe('by,name,outcome,results\r\n');
  });
});
