/** A question from the machine to the engineer and back, as people type it, on both engines. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { type Answer, type Call, type Effect, openRecordsDesk } from '../../../src/desk/index.ts';
import { en, speakCard } from '../../../src/phrases/index.ts';
import { openQuestionReminders } from '../../../src/reminders.ts';
import { openOutbox } from '../../../src/shop/index.ts';
import { textOf } from '../../support/desk.ts';
import { ENGINES } from '../../support/places.ts';
import { newRecords, START } from '../../support/records.ts';

const HOUR = 3_600_000;
const FLOOR = { channel: 'floor', thread: null, isPrivate: false } as const;
type Given = Call['given'];

/** A shop with an engineer and a channel for questions; what happens is told in lines. */
const shopOn = async (engine: (typeof ENGINES)[number]) => {
  const { store } = await newRecords(engine);
  const clock = { now: START };
  const desk = openRecordsDesk(FLEET, store, {
    platform: 'terminal',
    program: 'test',
    now: () => clock.now,
    outsideId: (called) => called.toLowerCase(),
  });
  const give = (given: Given, who = 'Ines', place: Call['place'] = FLOOR): Promise<Answer> =>
    desk.answer({
      shop: 'north',
      person: { id: who.toLowerCase(), name: who },
      place,
      interactionId: randomUUID(),
      given,
    });
  const ask = (words: string, who?: string, place?: Call['place']) => give({ words }, who, place);
  const said = async (words: string, who?: string, place?: Call['place']) =>
    textOf(await ask(words, who, place), 200);
  const lines: string[] = [];
  const effects: Effect[] = [];
  const outbox = openOutbox(store, {
    worker: 'w',
    now: () => clock.now,
    concurrency: 1,
    deliver: ({ effect: queued, earlier }) => {
      const effect = queued as Effect;
      effects.push(effect);
      const before = earlier as { place: string; message: string } | null;
      const at = 'place' in effect ? effect.place : before?.place;
      const place = effect.effect === 'thread' ? `questions/${effect.of}` : (at ?? '');
      const says = 'card' in effect ? speakCard(en, effect.card).headline : '';
      const ring = effect.effect === 'post' ? (effect.ring?.people ?? []).join(',') : '';
      lines.push(`${effect.effect} ${place} [${ring}] ${says}`.trim());
      return Promise.resolve({ delivered: true, outcome: { place, message: effect.key } });
    },
  });
  const reminders = openQuestionReminders(store, { now: () => clock.now });
  const happened = async (): Promise<readonly string[]> => {
    await outbox.deliverDue();
    return lines.splice(0);
  };
  await ask('/shop people add Ben engineer');
  await ask('/shop people add Una supervisor');
  await ask('/shop settings questions questions');
  return { store, clock, give, ask, said, happened, effects, reminders };
};

const codeIn = (text: string): string => /[Qq]uestion ([A-Z0-9]+)/u.exec(text)?.[1] ?? '';
const cardIn = (text: string): string => /Card ([A-Z0-9]+)/u.exec(text)?.[1] ?? '';
const threadOf = (code: string) => ({
  channel: 'questions',
  thread: `question ${code} post`,
  isPrivate: false,
});

describe.each(ENGINES)('a question, %s', (engine) => {
  it('goes to the engineer with the card, and the answer comes back to who asked', async () => {
    const { said, happened, effects } = await shopOn(engine);
    const card = cardIn(await said('1.000 straight 21tpi 1018', 'Olga'));
    const asked = await said('/knurl ask why does it double?', 'Olga');
    const code = codeIn(asked);
    expect(asked).toContain(`Question ${code} is put up. Told: Ben.`);
    expect(asked).toContain(`About card ${card}:`);
    expect(await happened()).toEqual([
      `post questions/ [ben] Question ${code} from Olga: why does it double?`,
      `thread questions/question ${code} post []`,
    ]);
    const [posted] = effects;
    const whole = posted?.effect === 'post' ? JSON.stringify(speakCard(en, posted.card)) : '';
    // The numbers, the cautions and what goes before them travel with the question.
    for (const part of ['Turn to 0.9852 in: 65 teeth', 'Feed in', 'Guard in place', en.footing])
      expect([part, whole.includes(part)]).toEqual([part, true]);

    const answered = await said('/knurl answer 12 turns instead of 15', 'Ben', threadOf(code));
    expect(answered).toBe(`Answer 1 is kept with question ${code}. Told: Olga.`);
    expect(await happened()).toEqual([
      `post questions/question ${code} post [olga] Answer 1 to question ${code}, from Ben: 12 turns instead of 15`,
      `edit questions/ [] Question ${code} from Olga: why does it double?`,
    ]);
    expect(await said(`/knurl solved ${code.toLowerCase()}`, 'Olga')).toBe(
      `Question ${code} is solved by answer 1, from Ben.`,
    );
    await happened();
    const last = effects.at(-1);
    expect(last?.effect === 'edit' && JSON.stringify(speakCard(en, last.card))).toContain(
      'Solved by answer 1, from Ben.',
    );
    const again = await said(`/knurl card ${card}`, 'Olga');
    expect(again).toContain('why does it double?');
    expect(again).toContain('12 turns instead of 15 (Ben');
  });

  it('that is solved takes no answer, repeats the words and offers to reopen', async () => {
    const { said, ask, happened } = await shopOn(engine);
    const code = codeIn(await said('/knurl ask what feed?', 'Olga'));
    await ask(`/knurl solved ${code} 0.012 did it`, 'Olga');
    const refused = await ask(`/knurl answer ${code} try 0.010`, 'Ben');
    expect(textOf(refused, 200)).toContain('Your words: try 0.010');
    expect(refused).toMatchObject({ choices: [{ words: `/knurl reopen ${code}` }] });
    await happened();
    expect(await said(`/knurl reopen ${code} it tears`, 'Olga')).toContain('was reopened by Olga');
    expect((await happened())[0]).toBe(
      `post questions/question ${code} post [ben] Question ${code} was reopened by Olga: it tears`,
    );
    expect(await said(`/knurl answer ${code} try 0.010`, 'Ben')).toContain('Answer 2');
  });

  it('comes up again for the engineer twice, then for the supervisor, and then no more', async () => {
    const { said, happened, clock, reminders } = await shopOn(engine);
    const code = codeIn(await said('/knurl ask what feed?', 'Olga'));
    await happened();
    const seen: string[] = [];
    for (let hour = 1; hour <= 48; hour += 1) {
      clock.now = START + hour * HOUR;
      await reminders.remindDue();
      seen.push(...(await happened()).map((each) => `${String(hour)} ${each}`));
    }
    const since = `${code} from Olga`;
    expect(seen).toEqual([
      `4 post questions/ [ben] Question ${since} waits since 6 Jan 2025, 07:00 UTC: what feed?`,
      `8 post questions/ [ben] Question ${since} waits since 6 Jan 2025, 07:00 UTC, a second time: what feed?`,
      `12 post questions/ [una] Nobody has answered question ${since} since 6 Jan 2025, 07:00 UTC: what feed?`,
    ]);
  });

  it('is answered by the button of what was posted, word for word', async () => {
    const { said, give, happened, effects } = await shopOn(engine);
    const code = codeIn(await said('/knurl ask what feed?', 'Olga'));
    await happened();
    const words = 'use "half" *feed*,\n<!channel> @here 1/2';
    const of = effects[0]?.key ?? '';
    await give({ pressed: { of, choice: 0, added: { answer: words } } }, 'Ben');
    await happened();
    const told = effects.at(-2);
    expect(told).toMatchObject({ effect: 'post', ring: { people: ['olga'], groups: [] } });
    const { parts } = told?.effect === 'post' ? told.card : { parts: [] };
    expect(parts).toContainEqual({ part: 'own', texts: [words] });
    expect(await said(`/knurl questions ${code}`, 'Olga')).toContain('use "half" *feed*');
  });

  it('is asked by a form as by words, about the card that is named', async () => {
    const { said, give } = await shopOn(engine);
    const card = cardIn(await said('1.000 straight 21tpi 1018', 'Olga'));
    const form = async (options: Readonly<Record<string, string | boolean>>) =>
      textOf(await give({ path: ['knurl', 'ask'], options }, 'Ines'), 200);
    expect(await form({ question: 'why', code: card })).toContain(`About card ${card}:`);
    expect(await form({ question: 'why', noCard: true })).toContain('No card is attached.');
    expect(await form({ words: `${card.toLowerCase()} why` })).toContain(`About card ${card}:`);
    expect(await said(`/knurl ask ${card}: why`)).toContain(`About card ${card}:`);
    // Ines has no card of her own here.
    expect(await said('/knurl ask why')).toContain('No card is attached.');
    expect(await said('/knurl ask no card why', 'Olga')).toContain('No card is attached.');
  });

  it('is settled by who asked and by engineers; operators do not answer', async () => {
    const { said, ask } = await shopOn(engine);
    const code = codeIn(await said('/knurl ask what feed?', 'Olga'));
    expect(await ask(`/knurl answer ${code} slow`, 'Pavel')).toMatchObject({
      refusal: { code: 'notAllowed', role: 'engineer' },
    });
    expect(await said(`/knurl solved ${code} so`, 'Pavel')).toBe(
      'That is for Olga, who asked, or for the role engineer: Ben, Ines or Una.',
    );
  });

  it('asks back where it is not clear, and nothing is lost', async () => {
    const { said, ask } = await shopOn(engine);
    expect(await said('/knurl questions')).toContain('No question is open.');
    const code = codeIn(await said('/knurl ask what feed?', 'Olga'));
    for (const [line, wanted] of [
      ['/knurl ask', 'The question is missing.'],
      ['/knurl ask list', '/knurl questions'],
      [`/knurl answer ${code}`, 'The answer is missing.'],
      ['/knurl answer half of it', `/knurl answer ${code} answer "half of it"`],
      [`/knurl solved ${code}`, 'has no answer yet'],
      [`/knurl reopen ${code}`, 'it is open as it is'],
      ['/knurl questions 9X9X9', 'There is no question'],
      [`/knurl ask ${'x'.repeat(2001)}`, '2001 characters'],
    ] as const) {
      const answer = await ask(line);
      expect([line, answer.kind]).toEqual([line, 'refusal']);
      expect(textOf(answer, 400)).toContain(wanted);
    }
    expect(await said('/knurl questions')).toContain('1 question waits for an answer:');
  });

  it('never shows to another shop', async () => {
    const { said, store } = await shopOn(engine);
    const code = codeIn(await said('/knurl ask what feed?', 'Olga'));
    const south = openRecordsDesk(FLEET, store, {
      platform: 'terminal',
      program: 'test',
      now: () => START,
    });
    const call = (words: string): Call => ({
      shop: 'south',
      person: { id: 'eve', name: 'Eve' },
      place: threadOf(code),
      interactionId: randomUUID(),
      given: { words },
    });
    for (const line of [`/knurl questions ${code}`, `/knurl answer ${code} x`])
      expect(await south.answer(call(line))).toMatchObject({
        refusal: { code: 'notFound', nearest: [] },
      });
    expect(textOf(await south.answer(call('/knurl questions')))).toContain('No question is open');
  });

  it('takes no place where it would be shown to those it was kept from', async () => {
    const { said } = await shopOn(engine);
    await said('/shop settings questions nowhere');
    const hidden = { ...FLOOR, isPrivate: true };
    expect(await said('/knurl ask why', 'Olga', hidden)).toContain('channel for questions');
    expect(await said('/knurl ask why', 'Olga')).toContain('is put up');
  });
});

describe('quiet hours', () => {
  it.each([
    ['quiet 22:00-06:00', '22:00 to 06:00'],
    ['quiet 10pm to 6am', '22:00 to 06:00'],
    ['quiet from 21.30 to 5', '21:30 to 05:00'],
    ['quiet none', 'not set'],
  ])('%s', async (typed, wanted) => {
    const { said } = await shopOn('sqlite');
    for (const line of [`/shop settings ${typed}`, `/shop settings change ${typed}`])
      expect(await said(line)).toMatch(new RegExp(`Quiet +${wanted}`, 'u'));
  });

  it.each([
    ['quiet 6-6', 'leave at least 4 hours'],
    ['quiet 5:00-04:00', 'leave at least 4 hours'],
    ['quiet soon', 'quiet 22:00-06:00'],
    ['quiet 25-6', 'quiet 22:00-06:00'],
  ])('%s is refused in a sentence', async (typed, wanted) => {
    const { said, ask } = await shopOn('sqlite');
    expect(await ask(`/shop settings ${typed}`)).toMatchObject({ kind: 'refusal' });
    expect(await said(`/shop settings ${typed}`)).toContain(wanted);
    expect(await said('/shop settings')).toMatch(/Quiet +22:00 to 06:00/u);
  });
});
