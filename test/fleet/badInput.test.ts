/** What a person is told who types what cannot be: a sentence, what is near, and nothing half-done. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { type Answer, choicesIn, type Desk, openRecordsDesk } from '../../src/desk/index.ts';
import { textOf } from '../support/desk.ts';
import { ENGINES } from '../support/places.ts';
import { newRecords, START } from '../support/records.ts';
import { carded } from './strangers.ts';

type Ask = (words: string, file?: string) => Promise<Answer>;

const asking =
  (desk: Desk): Ask =>
  (words, file) =>
    desk.answer({
      shop: 'Quillhaven',
      person: { id: 'oda', name: 'Oda' },
      place: { channel: 'floor', thread: null, isPrivate: false },
      interactionId: randomUUID(),
      attached: file === undefined ? [] : [{ name: 'crib.csv', text: file }],
      given: { words },
    });

/** A shop that has one thing of each list. */
const shopOn = async (engine: (typeof ENGINES)[number]): Promise<Ask> => {
  const { store } = await newRecords(engine);
  const options = { platform: 'terminal', program: 'test', now: () => START };
  const ask = asking(openRecordsDesk(FLEET, store, options));
  for (const line of [
    '/shop wheels add Hazel straight 21 tpi teeth 50 diameter 19 mm',
    '/shop machines add Long bed speeds 60 90 140 rpm',
    '/shop materials add yellow bar as 1018 HB 150',
    '/shop people add Marten engineer',
    '/shop rules add Guard down',
  ])
    await carded(ask, line);
  return ask;
};

const told = async (ask: Ask, line: string, file?: string): Promise<string> =>
  textOf(await ask(line, file), 200);

describe.each(ENGINES)('on %s', (engine) => {
  it.each([
    ['/shop wheels add Hazel straight 25 tpi', 'There is a wheel “Hazel” already.', '/shop wheels'],
    ['/shop wheels add HAZEL left 1.0 pitch', 'There is a wheel “HAZEL” already.', '/shop wheels'],
    ['/shop machines add long  BED', 'There is a machine “long BED” already.', '/shop machines'],
    ['/shop materials add Yellow Bar as 304', 'already', '/shop materials'],
    ['/shop people add Marten owner', 'already', '/shop people'],
  ])('a name that is there: %s', async (line, sentence, list) => {
    const ask = await shopOn(engine);
    const before = await told(ask, list);
    expect(await told(ask, line)).toContain(sentence);
    expect(await told(ask, list)).toBe(before);
  });

  it('a name that another has, given to one that is renamed', async () => {
    const ask = await shopOn(engine);
    await carded(ask, '/shop wheels add Rowan straight 25 tpi');
    expect(await told(ask, '/shop wheels change Rowan rename to hazel')).toContain('already');
    const list = await told(ask, '/shop wheels');
    expect(list).toContain('Hazel');
    expect(list).toContain('Rowan');
  });

  it.each([
    ['/shop wheels show Hazle', 'Hazel'],
    ['/shop wheels change hasel worn', 'Hazel'],
    ['/shop wheels remove Hazell', 'Hazel'],
    ['/shop machines show long bet', 'Long bed'],
    ['/shop people show Martin', 'Marten'],
    ['/shop people change Martem supervisor', 'Marten'],
    ['1.000 straight 1018 wheel Hazle', 'Hazel'],
    ['1.000 straight 21tpi 1018 on long bet', 'Long bed'],
  ])('a name that nobody has: %s', async (line, nearest) => {
    const ask = await shopOn(engine);
    const answer = await ask(line);
    expect(answer).toMatchObject({ kind: 'refusal', refusal: { nearest: [nearest] } });
    expect(textOf(answer, 200)).toContain(`Did you mean ${nearest}?`);
    // What is offered can be sent as it is, and is understood.
    for (const { words } of choicesIn(answer)) await carded(ask, words);
  });

  it.each([
    ['name,pitch\nAsh,21 tpi\n', 'The file has no column form. Its columns are name, pitch.'],
    ['', 'The file has no rows.'],
    ['name,form,pitch\n"Ash,straight,21 tpi\n', 'a quotation mark does not close'],
  ])('a file that is no list of wheels: %j', async (file, sentence) => {
    const ask = await shopOn(engine);
    expect(await told(ask, '/shop wheels import', file)).toContain(sentence);
    expect(await told(ask, '/shop wheels')).toContain('1 wheel:');
  });

  it('a file with wrong units, a name twice and a formula: each line is told, the good ones are taken', async () => {
    const ask = await shopOn(engine);
    const file = `name,form,pitch,face,place
Ash,straight,21 tpi,8 kg,drawer 1
Beech,straight,21 tpi,8 mm,=1+1
hazel,straight,25 tpi,8 mm,drawer 2
Cedar,straight,21 tpi,=4+4,drawer 3
`;
    const report = await told(ask, '/shop wheels import', file);
    expect(report).toContain('1 wheel added, 3 not taken.');
    expect(report).toMatch(/Line 2, Ash: .*"8 kg" has the wrong unit; write/u);
    expect(report).toMatch(/Line 4, hazel: .*add the word replace/u);
    expect(report).toMatch(/Line 5, Cedar: .*is no number/u);
    const list = await told(ask, '/shop wheels');
    expect(list).toContain('2 wheels:');
    // What a spreadsheet would run is a place like any other here.
    expect(list).toContain('=1+1');
    expect(await told(ask, '/shop wheels show Hazel')).toContain('21 TPI');
  });

  it('ten thousand rows are taken in one go, one more is not, and the list stays readable', async () => {
    const ask = await shopOn(engine);
    const rows = (count: number): string =>
      [
        'name,form,pitch',
        ...Array.from({ length: count }, (_, at) => `W${String(at)},straight,21 tpi`),
      ].join('\n');
    expect(await told(ask, '/shop wheels import', rows(10_001))).toContain(
      'more than 10000 rows. Take it in in parts.',
    );
    expect(await told(ask, '/shop wheels')).toContain('1 wheel:');
    expect(await told(ask, '/shop wheels import', rows(10_000))).toContain('10000 wheels added.');
    const list = await told(ask, '/shop wheels');
    expect(list).toContain('10001 wheels:');
    expect(list).toContain('more; export has all of them.');
    expect(list.split('\n').length).toBeLessThan(100);
  }, 60_000);

  it('no file at all, and a verb without a name: what is missing, with an example', async () => {
    const ask = await shopOn(engine);
    expect(await told(ask, '/shop wheels import')).toMatch(/file is missing.*wheels\.csv/u);
    for (const line of ['/shop wheels show', '/shop machines remove', '/shop people change'])
      expect([line, await told(ask, line)]).toEqual([line, expect.stringContaining('is missing')]);
  });
});
