/** What a shop was told, found again from the channel: by words, on both engines. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { type Answer, type Call, choicesIn, openRecordsDesk } from '../../../src/desk/index.ts';
import { textOf } from '../../support/desk.ts';
import { ENGINES } from '../../support/places.ts';
import { newRecords, START } from '../../support/records.ts';

const MINUTE = 60_000;

type Ask = (words: string, shop?: string) => Promise<Answer>;

const callOf = (given: Call['given'], shop: string): Call => ({
  shop,
  person: { id: 'Ines', name: 'Ines' },
  place: { channel: 'floor', thread: null, isPrivate: false },
  interactionId: randomUUID(),
  given,
});

const shopAt = async (engine: (typeof ENGINES)[number]) => {
  const { store } = await newRecords(engine);
  let at = START;
  const now = (): number => {
    at += MINUTE;
    return at;
  };
  const desk = openRecordsDesk(FLEET, store, { platform: 'terminal', program: 'test', now });
  const ask: Ask = (words, shop = 'north') => desk.answer(callOf({ words }, shop));
  return { ask, desk };
};

const codeOf = (text: string): string => /Card ([A-Z0-9]+)/u.exec(text)?.[1] ?? '';
const headline = (answer: Answer): string => textOf(answer, 2_000).split('\n')[0] ?? '';

/** Two cards and a result, and their codes. */
const furnished = async (ask: Ask): Promise<{ readonly lid: string; readonly bar: string }> => {
  await ask('/shop machines add Long bed speeds 60 90 140');
  const bar = codeOf(textOf(await ask('1.000 straight 21tpi 1018 on Long bed')));
  const lid = codeOf(textOf(await ask('7/8 diamond 96dp 304')));
  await ask(`/knurl result ${lid} flaking note pepper mill lid, edge broke out`);
  return { lid, bar };
};

describe.each(ENGINES)('find, %s', (engine) => {
  it('shows kind, code, what, who and when, and a button opens it', async () => {
    const { ask } = await shopAt(engine);
    const { bar } = await furnished(ask);
    const answer = await ask('/knurl find straigth 1018');
    expect(headline(answer)).toBe('1 card fits:');
    expect(textOf(answer, 2_000)).toContain(
      `Card. 1.000 straight 21tpi 1018 on Long bed. Ines, 6 Jan 2025, 07:`,
    );
    const [open] = choicesIn(answer);
    expect(open?.words).toBe(`/knurl card ${bar}`);
    expect(textOf(await ask(open?.words ?? ''))).toContain(`Card ${bar}, made for Ines`);
  });

  it('shows a result with its outcome, and opens it', async () => {
    const { ask } = await shopAt(engine);
    await furnished(ask);
    const answer = await ask('/knurl find peper mill');
    expect(headline(answer)).toBe('1 result fits:');
    expect(textOf(answer, 2_000)).toMatch(
      /R1 +Result\. flaking, pepper mill lid, edge broke out; 7\/8 diamond 96dp 304\./u,
    );
    expect(textOf(await ask(choicesIn(answer)[0]?.words ?? ''))).toContain('R1: flaking');
  });

  it('keeps to the kind that is named, and says so where only others fit', async () => {
    const { ask } = await shopAt(engine);
    const { lid } = await furnished(ask);
    expect(textOf(await ask('/knurl find cards 304'))).toContain(lid);
    expect(textOf(await ask('/knurl find cards 304'))).not.toContain('R1');
    expect(headline(await ask('/knurl find 304 results'))).toBe('1 result fits:');
    expect(headline(await ask('/knurl find results'))).toBe('1 result fits:');
    expect(textOf(await ask('/knurl find standards 1018'), 2_000)).toContain(
      'No standard fits; these are of other kinds.',
    );
    expect(headline(await ask('/knurl find standards'))).toBe('No standards yet.');
  });

  it('is told the same by a form, in quotation marks, and behind for', async () => {
    const { ask, desk } = await shopAt(engine);
    await furnished(ask);
    const said = textOf(await ask('/knurl find 304 flaking'));
    for (const line of ['"304 flaking"', 'for 304 flaking', 'for "304 flaking"', '304, “flaking”?'])
      expect(textOf(await ask(`/knurl find ${line}`))).toBe(said);
    const form = { path: ['knurl', 'find'], options: { wanted: '304 flaking' } };
    expect(textOf(await desk.answer(callOf(form, 'north')))).toBe(said);
  });

  it('shows the first eight of many, and says that there are more', async () => {
    const { ask } = await shopAt(engine);
    for (let teeth = 50; teeth < 60; teeth += 1)
      await ask(`1.000 straight 21tpi brass ${teeth} teeth`);
    const answer = await ask('/knurl find brass');
    expect(headline(answer)).toBe('The first 8 cards that fit, the best first:');
    expect(textOf(answer)).toContain('More fit. Add a word to narrow it.');
    expect(choicesIn(answer)).toHaveLength(8);
    // Of what fits alike the newest comes first.
    expect(textOf(answer, 2_000)).toMatch(/59 teeth[^]*58 teeth[^]*52 teeth/u);
    expect(textOf(answer, 2_000)).not.toContain('51 teeth');
  });

  it('says what to try where nothing fits: the words that this shop writes', async () => {
    const { ask } = await shopAt(engine);
    await furnished(ask);
    const answer = await ask('/knurl find peppermint');
    expect(headline(answer)).toBe('Nothing fits “peppermint”.');
    expect(textOf(answer, 2_000)).toContain('a number has to be right');
    const near = await ask('/knurl find flackin');
    expect(textOf(near, 2_000)).toContain('This shop writes flaking.');
    expect(choicesIn(near)[0]?.words).toBe('/knurl find flaking');
  });

  it('asks for a word where there is none, and takes nothing for a command', async () => {
    const { ask } = await shopAt(engine);
    await furnished(ask);
    for (const line of ['', ' ', 'the of in', '🙂', '" " "', '%', '; --']) {
      const answer = await ask(`/knurl find ${line}`);
      expect([line, answer.kind]).toEqual([line, 'refusal']);
      expect([line, headline(answer)]).toEqual([
        line,
        'The word to look for is missing. Add one, such as flaking 304, results brass or standard WT-1042.',
      ]);
    }
    for (const line of ['%%zz%%', "zz'; drop table find_entry; --", '\\zz_', '🙂 zz', '<!zz> @zz'])
      expect([line, headline(await ask(`/knurl find ${line}`))]).toEqual([
        line,
        `Nothing fits “${line}”.`,
      ]);
    expect(headline(await ask('/knurl find for'))).toMatch(
      /^“for” does not say the word to look for/u,
    );
    const long = await ask(`/knurl find ${'flaking '.repeat(750)}`);
    expect(headline(long)).toBe(
      'That is 5999 characters to look for. Say it in a few words; at most 200 characters.',
    );
    expect(headline(await ask('/knurl find flaking'))).toBe('1 result fits:');
  });

  it('never finds what another shop was told, nor its words', async () => {
    const { ask } = await shopAt(engine);
    await furnished((words) => ask(words, 'south'));
    for (const words of ['304', 'pepper mill', 'cards', 'flackin', 'Long bed', 'peppe'])
      expect(textOf(await ask(`/knurl find ${words}`))).toBe(
        textOf(await ask(`/knurl find ${words}`, 'nobody was here')),
      );
    expect(headline(await ask('/knurl find pepper'))).toBe('Nothing fits “pepper”.');
  });
});
