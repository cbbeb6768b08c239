/** What the shift that comes in has to know, in the shop's own time, on both engines. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { type Answer, choicesIn, openRecordsDesk } from '../../../src/desk/index.ts';
import { textOf } from '../../support/desk.ts';
import { ENGINES } from '../../support/places.ts';
import { newRecords } from '../../support/records.ts';

/** A shop whose clock stands where it is put. */
const shopAt = async (engine: (typeof ENGINES)[number]) => {
  const { store } = await newRecords(engine);
  const clock = { at: Date.parse('2025-01-06T12:00:00Z') };
  const now = (): number => clock.at;
  const desk = openRecordsDesk(FLEET, store, { platform: 'terminal', program: 'test', now });
  const ask = (words: string, who = 'Ines', at?: string): Promise<Answer> => {
    clock.at = at === undefined ? clock.at : Date.parse(at);
    return desk.answer({
      shop: 'north',
      person: { id: who, name: who },
      place: { channel: 'floor', thread: null, isPrivate: false },
      interactionId: randomUUID(),
      given: { words },
    });
  };
  const today = async (at: string): Promise<string> =>
    textOf(await ask('/knurl today', 'Noor', at), 2_000);
  return { ask, today };
};

const codeOf = (answer: Answer): string => /Card ([A-Z0-9]+)/u.exec(textOf(answer))?.[1] ?? '';

describe.each(ENGINES)('today, %s', (engine) => {
  it('says in one line that there is nothing', async () => {
    const { today } = await shopAt(engine);
    expect(await today('2025-01-06T06:00:00Z')).toContain(
      '6 Jan 2025, 06:00 UTC: nothing new since yesterday.\n' +
        'Nothing set up, nothing went wrong,',
    );
  });

  it('shows what is set up on each machine, and by whom where none was named: the newest alone', async () => {
    const { ask, today } = await shopAt(engine);
    await ask('/shop machines add Long bed speeds 60 90 140');
    const old = codeOf(await ask('1.000 straight 21tpi 1018 on Long bed'));
    const bed = codeOf(await ask('7/8 straight 21tpi 1018 on Long bed', 'Noor'));
    const hand = codeOf(await ask('3/4 diamond 96dp brass', 'Priya'));
    const text = await today('2025-01-06T14:00:00Z');
    expect(text).toContain('2 set up');
    expect(text).toMatch(
      new RegExp(`Priya +3/4 diamond 96dp brass\\. ${hand}, 6 Jan 2025, 12:00 UTC\n`, 'u'),
    );
    expect(text).toMatch(
      new RegExp(`Long bed +7/8 straight 21tpi 1018 on Long bed\\. ${bed}, Noor, 6 Jan`, 'u'),
    );
    expect(text).not.toContain(old);
    const open = choicesIn(await ask('/knurl today'));
    expect(open.map(({ words }) => words)).toContain(`/knurl card ${bed}`);
  });

  it("goes back to the beginning of yesterday by the shop's own clock", async () => {
    const { ask, today } = await shopAt(engine);
    await ask('/shop settings change time zone America/Chicago');
    // evidence: six hours behind UTC in winter: the 5th begins there at 06:00 UTC
    await ask('1.000 straight 21tpi 1018', 'Ada', '2025-01-05T05:59:00Z');
    await ask('/knurl result flaking', 'Ada', '2025-01-05T05:59:30Z');
    await ask('7/8 straight 21tpi 1018', 'Ben', '2025-01-05T06:00:00Z');
    await ask('/knurl result bent', 'Ben', '2025-01-05T06:01:00Z');
    await ask('/knurl result good', 'Ben', '2025-01-06T01:00:00Z');
    const text = await today('2025-01-07T05:30:00Z');
    expect(text).toContain('6 Jan 2025, 23:30: 1 set up, 1 went wrong.');
    expect(text).toMatch(/R2 +Result\. bent, 7\/8 straight 21tpi 1018\./u);
    expect(text).not.toContain('R1');
    expect(text).not.toContain('R3');
    // An hour later it is the 7th, and the 5th is no longer yesterday.
    expect(await today('2025-01-07T06:30:00Z')).not.toContain('went wrong since');
  });

  it('shows four of what is more, how many there are besides, and where all of it is', async () => {
    const { ask, today } = await shopAt(engine);
    await ask('1.000 straight 21tpi 1018');
    for (let part = 0; part < 6; part += 1) await ask('/knurl result double');
    await ask('/knurl result withdraw R6');
    const text = await today('2025-01-06T14:00:00Z');
    expect(text).toContain('Went wrong since yesterday, and 1 more:');
    expect(text).toMatch(/R5 [^]*R2 /u);
    expect(text).not.toMatch(/R1 |R6 /u);
    const words = choicesIn(await ask('/knurl today')).map((choice) => choice.words);
    expect(words).toContain('/knurl result show R5');
    expect(words).toContain('/knurl result list');
  });

  it('shows what nobody has solved yet, and not what is', async () => {
    const { ask, today } = await shopAt(engine);
    await ask('1.000 straight 21tpi 1018');
    const code = /[A-Z0-9]{5}/u.exec(textOf(await ask('/knurl ask Why does the seam gape?')))?.[0];
    const text = await today('2025-01-06T14:00:00Z');
    expect(text).toContain('1 question open');
    expect(text).toMatch(
      /Open question:\n+[A-Z0-9]+ +Question, open\. Why does the seam gape\? Ines/u,
    );
    const [open = ''] = choicesIn(await ask('/knurl today'))
      .map(({ words }) => words)
      .filter((words) => words.startsWith('/knurl questions '));
    expect(open).toContain(code ?? 'no code');
    await ask(open.replace('questions', 'answer') + ' The bite is too light');
    expect(await today('2025-01-06T15:00:00Z')).toMatch(
      /Question, answered\. [^]*bite is too light/u,
    );
    await ask(open.replace('questions', 'solved'));
    expect(await today('2025-01-06T16:00:00Z')).toContain('no question open');
    expect(textOf(await ask('/knurl find seem gape light bite'), 2_000)).toMatch(
      /1 question fits:[^]*Question, solved\./u,
    );
  });

  it('shows the standards that wait for a decision, and those whose review is due', async () => {
    const { ask, today } = await shopAt(engine);
    await ask('1.000 straight 21tpi 1018');
    await ask('/knurl standard propose WT-1042');
    const waiting = await today('2025-01-06T14:00:00Z');
    expect(waiting).toContain('1 standard to decide on.');
    expect(waiting).toMatch(/WT-1042 +Standard, proposed\. 1\.000 straight 21tpi 1018\. Ines/u);
    expect(choicesIn(await ask('/knurl today')).map(({ words }) => words)).toContain(
      '/knurl standard show "WT-1042"',
    );
    await ask('/knurl standard approve WT-1042 review in 6 months');
    expect(await today('2025-06-30T15:00:00Z')).not.toContain('1 standard');
    const due = await today('2025-07-08T15:00:00Z');
    expect(due).toContain(': 1 standard to look at again.');
    expect(due).toMatch(/Standard to look at again:\n+WT-1042 +Standard, approved\./u);
  });
});
