/** What a shop has entered changes the card, and what was answered is kept: by words, on both engines. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { cardText, spoken } from '../../../src/adapters/terminal/index.ts';
import { type Answer, type Call, choicesIn, openRecordsDesk } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { ENGINES } from '../../support/places.ts';
import { newRecords, START } from '../../support/records.ts';

type Ask = (words: string, who?: string, shop?: string) => Promise<Answer>;

const callOf = (words: string, who: string, shop: string, id: string): Call => ({
  shop,
  person: { id: who, name: who },
  place: { channel: 'floor', thread: null, isPrivate: false },
  interactionId: id,
  given: { words },
});

const shopAt = async (engine: (typeof ENGINES)[number]): Promise<Ask> => {
  const { store } = await newRecords(engine);
  const desk = openRecordsDesk(FLEET, store, {
    platform: 'terminal',
    program: 'test',
    now: () => START,
  });
  return (words, who = 'Ines', shop = 'north') =>
    desk.answer(callOf(words, who, shop, randomUUID()));
};

const textOf = (answer: Answer): string => cardText(spoken(answer, en), 100);
const figureOf = (answer: Answer, name: string): number =>
  answer.kind === 'card' ? (answer.card.figures[name]?.value ?? Number.NaN) : Number.NaN;
const codeOf = (text: string): string => /Card ([A-Z0-9]+)/u.exec(text)?.[1] ?? '';

describe.each(ENGINES)('a shop at work, %s', (engine) => {
  it('runs at the gear at or under what was worked out, and says the dial number', async () => {
    const ask = await shopAt(engine);
    const before = await ask('1.000 straight 21tpi 1018');
    await ask('/shop machines add big speeds 70 115 190 300 feeds 0.1 0.2');
    const after = await ask('1.000 straight 21tpi 1018 on big');
    // evidence: 1000 × 22.62/(π × 25.0252) = 287.7 rev/min; the gear at or under it is 190
    expect(figureOf(before, 'spindleSpeed')).toBeCloseTo(287.7, 1);
    expect(figureOf(after, 'spindleSpeed')).toBe(190);
    // A dial that reads diameter goes through twice the infeed: 2 × 0.0118 in.
    expect(textOf(after)).toContain('On the dial  0.0237 in');
  });

  it("takes the shop's own truth about a wheel before any label", async () => {
    const ask = await shopAt(engine);
    await ask('/shop wheels add A1 straight teeth 63 diameter 20mm bevel 0.5mm');
    const answer = await ask('1.000 straight 1018 wheel A1');
    // evidence: rim pitch π·20/63, as a wheel that was counted
    expect(figureOf(answer, 'transversePitch')).toBeCloseTo((Math.PI * 20) / 63, 9);
    expect(textOf(answer)).toContain('counted');
  });

  it('plans from its own wheels once it has entered some', async () => {
    const ask = await shopAt(engine);
    const line = '/knurl plan finish 0.995-1.005 straight 1018 long 0.2';
    expect(textOf(await ask(line))).toContain('No wheels are entered yet');
    await ask('/shop wheels add A1 straight teeth 63 diameter 20mm');
    const own = textOf(await ask(line));
    expect(own).toContain('A1');
    expect(own).not.toContain('DIN 403');
    // Set up from there, the card knows which of the shop's wheels it is of.
    const setUp = choicesIn(await ask(line)).find(({ words }) => words.includes('wheel A1'));
    expect(textOf(await ask(setUp?.words ?? ''))).toContain('counted');
  });

  it('looks for the nearest wheel in its own crib once it has entered some', async () => {
    const ask = await shopAt(engine);
    expect(textOf(await ask('/knurl convert 1.0 pitch'))).toContain('No wheels are entered yet');
    await ask('/shop wheels add A1 straight 1.0 pitch teeth 63 diameter 20mm');
    await ask('/shop wheels add B7 left 2.0 pitch');
    const own = textOf(await ask('/knurl convert 1.0 pitch'));
    expect(own).toContain('A1');
    expect(own).not.toContain('B7');
    expect(own).not.toContain('DIN 403');
    expect(textOf(await ask('/knurl convert 1.0 pitch diagonal'))).toContain('No wheel');
  });

  it('takes the pattern that its wheel leaves, where nobody named one', async () => {
    const ask = await shopAt(engine);
    await ask('/shop wheels add A1 straight teeth 63 diameter 20mm');
    await ask('/shop wheels add L1 left 1.0 pitch');
    await ask('/shop wheels add X1 crossed raised 1.0 pitch');
    const worded = await ask('1.000 straight 1018 wheel A1');
    expect(await ask('1.000 1018 wheel A1')).toMatchObject({
      card: { figures: worded.kind === 'card' ? worded.card.figures : null },
    });
    // The work is the mirror of the wheel.
    expect(textOf(await ask('1.000 1018 wheel L1'))).toContain('right');
    // Of a crossed wheel it is not known whether it leaves diamonds or squares.
    expect(await ask('1.000 1018 wheel X1')).toMatchObject({
      refusal: { code: 'missing', parameter: 'pattern' },
    });
  });

  it('plans with how closely its machine is known to turn', async () => {
    const ask = await shopAt(engine);
    await ask('/shop wheels add A1 straight teeth 63 diameter 20mm');
    await ask('/shop machines add close spread 0.002mm');
    await ask('/shop machines add loose spread 0.05mm');
    const chance = async (machine: string): Promise<number> => {
      const answer = await ask(
        `/knurl plan finish 0.995-1.005 straight 1018 long 0.2 on ${machine}`,
      );
      return figureOf(answer, 'chanceTracks');
    };
    expect(await chance('close')).toBeGreaterThan(await chance('loose'));
  });

  it('keeps a card and shows it again by its code', async () => {
    const ask = await shopAt(engine);
    const code = codeOf(textOf(await ask('1.000 straight 21tpi 1018')));
    expect(code).not.toBe('');
    // No sign that is misheard over a machine.
    expect(code).not.toMatch(/[01OI]/u);
    const again = textOf(await ask(`/knurl card ${code.toLowerCase()}`));
    expect(again).toContain('0.9852 in');
    // `9X2T4` once was read as nine by two.
    const code9 = '9X2T4';
    expect(await ask(`/knurl card ${code9}`)).toMatchObject({
      refusal: { code: 'notFound', word: code9 },
    });
    const unknown = await ask('/knurl card zzzzz');
    expect(unknown).toMatchObject({ kind: 'refusal', refusal: { code: 'notFound', what: 'card' } });
  });

  it('never shows one shop what another has', async () => {
    const ask = await shopAt(engine);
    const code = codeOf(textOf(await ask('1.000 straight 21tpi 1018')));
    await ask('/shop wheels add A1 straight teeth 63 diameter 20mm');
    const other = await ask(`/knurl card ${code}`, 'Olga', 'south');
    expect(other).toMatchObject({ kind: 'refusal', refusal: { code: 'notFound', nearest: [] } });
    const wheels = textOf(await ask('/shop wheels', 'Olga', 'south'));
    expect(wheels).toContain('No wheels yet');
  });

  it('explains the last card of this person, and says who may change what', async () => {
    const ask = await shopAt(engine);
    await ask('1.000 straight 21tpi 1018');
    expect(textOf(await ask('/knurl why infeed'))).toContain('Infeed past touch');
    const refused = await ask('/shop wheels add B straight 21tpi', 'Pavel');
    expect(refused).toMatchObject({
      kind: 'refusal',
      refusal: { code: 'notAllowed', people: ['Ines'] },
    });
  });

  it('ranks a trouble by the last set-up, where only what is seen is said', async () => {
    const ask = await shopAt(engine);
    expect(textOf(await ask('/knurl trouble double'))).toContain('Ranked by words alone');
    const line = '1.000 straight 21tpi 1018 out 1.5';
    const code = codeOf(textOf(await ask(line)));
    const short = await ask('/knurl trouble double');
    expect(textOf(short)).toContain(`For your last set-up here, card ${code}.`);
    const full = await ask(`/knurl trouble double ${line}`);
    expect(figureOf(short, 'chanceOfCause')).toBe(figureOf(full, 'chanceOfCause'));
    // Shown again, it is worked out from the whole line, whatever was set up since.
    await ask('0.5 diamond 33tpi brass');
    const again = textOf(await ask(`/knurl card ${codeOf(textOf(short))}`));
    expect(again).toContain('Worked out today it is the same.');
    // Somebody else has no set-up here.
    expect(textOf(await ask('/knurl trouble double', 'Pavel'))).toContain('Ranked by words alone');
  });

  it('offers the nearest machine for a misspelt one', async () => {
    const ask = await shopAt(engine);
    await ask('/shop machines add lathe-west speeds 100 200');
    const answer = await ask('1.000 straight 21tpi on lathe-wset');
    expect(answer).toMatchObject({
      refusal: { code: 'notFound', what: 'machine', nearest: ['lathe-west'] },
    });
  });

  it('acts once on what comes twice', async () => {
    const { store } = await newRecords(engine);
    const desk = openRecordsDesk(FLEET, store, {
      platform: 'terminal',
      program: 'test',
      now: () => START,
    });
    const call = (): Call =>
      callOf('/shop wheels add A1 straight teeth 63 diameter 20mm', 'Ines', 'north', 'same');
    const [first, second] = await Promise.all([desk.answer(call()), desk.answer(call())]);
    expect(second).toEqual(first);
    const list = await desk.answer(callOf('/shop wheels', 'Ines', 'north', 'other'));
    expect(textOf(list)).toContain('1 wheel:');
  });
});
