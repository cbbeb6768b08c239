/** What a team decides on, by words and buttons, as the people in the channel read it. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import {
  type Answer,
  type Call,
  type Desk,
  type Effect,
  openRecordsDesk,
} from '../../../src/desk/index.ts';
import { type Attempt, openOutbox } from '../../../src/shop/index.ts';
import type { Engine, Store } from '../../../src/store/index.ts';
import { textOf } from '../../support/desk.ts';
import { ENGINES } from '../../support/places.ts';
import { newRecords, START } from '../../support/records.ts';

const LINE = '1.000 straight 21tpi 1018';
const DAY = 24 * 3_600_000;

type Shop = {
  readonly desk: Desk;
  readonly store: Store;
  readonly clock: { now: number };
  /** A line by Ines, the owner, unless somebody else says it. */
  readonly ask: (words: string, who?: string) => Promise<Answer>;
  /** The same, as one long line of text. */
  readonly said: (words: string, who?: string) => Promise<string>;
  /** A button of an answer, by what it says, with what its form asked for. */
  readonly press: (
    answer: Answed,
    label: RegExp,
    added?: Readonly<Record<string, string>>,
    who?: string,
  ) => Promise<Answed>;
  readonly asked: (words: string, who?: string) => Promise<Answed>;
};

/** An answer with the name under which its buttons are known. */
type Answed = { readonly id: string; readonly answer: Answer };

const flat = (answer: Answer): string => textOf(answer, 200).replaceAll(/\s+/gu, ' ').trim();

const open = async (engine: Engine, place = 'floor', isPrivate = false): Promise<Shop> => {
  const { store } = await newRecords(engine);
  const clock = { now: START };
  const desk = openRecordsDesk(FLEET, store, {
    platform: 'terminal',
    program: 'test',
    now: () => clock.now,
  });
  const call = async (given: Call['given'], who: string): Promise<Answed> => {
    const id = randomUUID();
    clock.now += 1000;
    const answer = await desk.answer({
      shop: 'north',
      person: { id: who, name: who },
      place: { channel: place, thread: null, isPrivate },
      interactionId: id,
      given,
    });
    return { id, answer };
  };
  const asked: Shop['asked'] = (words, who = 'Ines') => call({ words }, who);
  const press: Shop['press'] = ({ id, answer }, label, added, who = 'Ines') => {
    const choices = answer.kind === 'card' ? answer.card.choices : answer.choices;
    const labels = textOf(answer, 200)
      .split('\n')
      .filter((line) => /^ {2}\S/u.test(line))
      .map((line) => line.trim());
    const choice = labels.findIndex((each) => label.test(each));
    if (choice < 0 || choice >= choices.length) throw new Error(`no button in ${labels.join()}`);
    const pressed = { of: id, choice, ...(added === undefined ? {} : { added }) };
    return call({ pressed }, who);
  };
  const ask: Shop['ask'] = async (words, who) => (await asked(words, who)).answer;
  return { desk, store, clock, ask, asked, press, said: async (w, who) => flat(await ask(w, who)) };
};

/** Brings a part's standard to where it holds. */
const hold = async (shop: Shop, part: string, line = LINE): Promise<void> => {
  await shop.ask(line);
  await shop.ask(`/knurl standard propose ${part} because it runs cleaner`);
  const reply = await shop.said(`/knurl standard approve ${part}`);
  if (!reply.includes('approved.')) throw new Error(reply);
};

/** Delivers whatever is due and tells in which order it took place. */
const delivered = async (
  { store, clock }: Shop,
  fails: (effect: Effect) => boolean = () => false,
): Promise<readonly string[]> => {
  const done: string[] = [];
  const outbox = openOutbox(store, {
    worker: randomUUID(),
    concurrency: 1,
    now: () => clock.now,
    deliver: ({ effect, earlier, key }): Promise<Attempt> => {
      const of = effect as Effect;
      if (fails(of)) return Promise.resolve({ delivered: false, fault: 'too many', final: true });
      const place = 'place' in of ? ` in ${of.place}` : '';
      const on = earlier === null ? '' : ` ${(earlier as { message: string }).message}`;
      done.push(`${of.effect}${on}${place}`);
      return Promise.resolve({
        delivered: true,
        outcome: earlier ?? { message: `m${key.slice(-8)}` },
      });
    },
  });
  await outbox.deliverDue();
  return done;
};

describe.each(ENGINES)('standards, %s', (engine) => {
  it('go from a card to the one that holds, and each step says what comes next', async () => {
    const shop = await open(engine);
    await shop.ask('/knurl help');
    const card = await shop.asked(LINE, 'Pavel');
    const proposal = await shop.press(
      card,
      /^Propose as standard/u,
      { part: 'TH-2041-B' },
      'Pavel',
    );
    expect(flat(proposal.answer)).toMatch(
      /^Standard TH-2041-B rev 1 proposed\. Proposed by Pavel, 6 Jan 2025\. Pattern straight knurl Pitch 21 TPI Material Low-carbon steel.* Bars 0\.9900 to 1\.0100 in Turn to 0\.9852 in: 65 teeth/u,
    );
    // Whoever decides sees all of it, cautions included.
    expect(flat(proposal.answer)).toMatch(
      /Guard in place.*machine's manual and licensed practice/u,
    );
    const operator = await shop.press(proposal, /^Approve/u, undefined, 'Pavel');
    expect(flat(operator.answer)).toMatch(/needs the role supervisor\. Ask Ines\./u);
    const approved = await shop.press(proposal, /^Approve TH-2041-B rev 1/u);
    expect(flat(approved.answer)).toMatch(
      /^Standard TH-2041-B rev 1 approved\. No standards channel is set: it is posted and pinned here\. Set one: \/shop settings change standards here Proposed by Pavel, 6 Jan 2025\. Approved by Ines, 6 Jan 2025\. To be reviewed by 6 Jan 2026\./u,
    );
    const again = await shop.press(proposal, /^Approve TH-2041-B rev 1/u);
    expect(flat(again.answer)).toMatch(
      /^TH-2041-B rev 1 is approved \(Ines, 6 Jan 2025, 07:00 UTC\)\. Nothing was changed\. There is nothing left to approve\./u,
    );
    expect(await delivered(shop)).toEqual(['post in floor/', expect.stringMatching(/^pin m/u)]);
  });

  it('come first where they cover what is asked, with the second opinion behind', async () => {
    const shop = await open(engine);
    await hold(shop, 'TH-2041-B');
    const same = await shop.said(`${LINE} show in`);
    expect(same).toMatch(
      /^Standard TH-2041-B rev 1: turn to 0\.9852 in, 65 teeth \[25\.025 mm\] Covers this: straight knurl, 21 TPI, Low-carbon steel, 0\.18 % C, cold drawn, bars 0\.9900 to 1\.0100 in\. Approved by Ines, 6 Jan 2025\. Second opinion: worked out now, every figure is the same\./u,
    );
    expect(same).toMatch(/Guard in place.*Card [A-Z0-9]{5}/u);
    const other = await shop.said('1.002 straight 21tpi 1018 speed 50 sfm');
    expect(other).toMatch(/Second opinion: worked out now, 4 figures differ:/u);
    // evidence: 66 teeth of 21 TPI, 66/(21 π) = 1.0004 in; 65 are 0.9852 in
    expect(other).toContain(
      'Blank diameter standard 0.9852 in [25.025 mm], now 1.0004 in [25.410 mm] (0.0152 in [0.385 mm] more)',
    );
    expect(other).toContain('Tooth count standard 65, now 66 (1 more)');
    expect(other).toMatch(/Turn to 1\.0004 in: 66 teeth/u);
    // What was not said is covered by nothing.
    expect(await shop.said('1.000 straight 21tpi')).toMatch(/^Turn to/u);
    expect(await shop.said('1.000 straight 21tpi 304')).toMatch(/^Turn to/u);
  });

  it('stand behind a stop of what was asked', async () => {
    const shop = await open(engine);
    await hold(shop, 'TH-2041-B');
    const stopped = await shop.said(`${LINE} fill 100%`);
    expect(stopped).toMatch(/^Do not run this\..*The standard TH-2041-B rev 1 covers this, but/u);
    const refused = await shop.said('/knurl standard save X-1');
    expect(refused).toMatch(/stops at fill: a set-up that is not to be run is no standard/u);
  });

  it('are picked by their part number, alone or among other words', async () => {
    const shop = await open(engine);
    await hold(shop, 'TH-2041-B');
    const alone = await shop.said('part th-2041-b');
    expect(alone).toMatch(
      /^Standard TH-2041-B rev 1: turn to 0\.9852 in.*Picked by its part number\./u,
    );
    const code = /Card (?<code>[A-Z0-9]{5})/u.exec(alone)?.groups?.['code'] ?? '';
    expect(await shop.said(`/knurl card ${code}`)).toContain('Worked out today it is the same.');
    const outside = await shop.said('1.000 straight 21tpi 304 part TH-2041-B');
    expect(outside).toMatch(/your line is outside it: material\. Ask before you run it\./u);
    const slip = await shop.said('part TH-2041-C');
    expect(slip).toContain('There is no standard “TH-2041-C” here. Did you mean TH-2041-B?');
    await shop.ask(LINE);
    await shop.ask('/knurl standard save DRAFT-7');
    expect(await shop.said('part DRAFT-7')).toMatch(
      /^DRAFT-7 rev 1 is a draft \(Ines.*Propose it/u,
    );
    // The word is mostly said of the work.
    expect(await shop.said('this part 1.000 straight 25tpi 1018')).toMatch(/^Turn to/u);
  });

  it('take the older pin off, also where the older post is still to be delivered', async () => {
    const shop = await open(engine);
    await shop.ask('/shop settings change standards C-17');
    await hold(shop, 'TH-2041-B');
    await hold(shop, 'TH-2041-B', `${LINE} fill 85%`);
    const [first, ...rest] = await delivered(shop);
    expect(first).toBe('post in C-17/');
    const message = /m\S+/u.exec(rest.find((each) => each.startsWith('unpin')) ?? '')?.[0] ?? '';
    expect(rest.filter((each) => each.includes(message))).toEqual([
      `pin ${message}`,
      `unpin ${message}`,
    ]);
    expect(rest.filter((each) => each.startsWith('pin'))).toHaveLength(2);
    const retired = await shop.said(
      '/knurl standard retire TH-2041-B because the part is obsolete',
    );
    expect(retired).toMatch(
      /rev 2 retired\..*Retired by Ines, 6 Jan 2025: the part is obsolete\./u,
    );
    expect(await delivered(shop)).toEqual([expect.stringMatching(/^unpin m/u), 'post in C-17/']);
    expect(await shop.said(LINE)).toMatch(/^Turn to/u);
  });

  it('name the pins that stand longest where one could not be set, and take none off', async () => {
    const shop = await open(engine);
    await hold(shop, 'A-1');
    expect(await delivered(shop)).toHaveLength(2);
    await hold(shop, 'B-2', '1.250 straight 21tpi 1018');
    await delivered(shop, ({ effect }) => effect === 'pin');
    const next = await shop.said('/knurl standard list');
    expect(next).toContain(
      'One message could not be delivered: too many. Pinned longest: A-1 rev 1 (6 Jan 2025). None was taken off. If the channel is full, take one off yourself, then pin this one by hand.',
    );
    // A pin that never stood is not taken off.
    await hold(shop, 'B-2', '1.250 straight 21tpi 1018 fill 85%');
    expect((await delivered(shop)).map((each) => each.split(' ')[0])).toEqual(['post', 'pin']);
  });

  it('approved in private are told to nobody else', async () => {
    const shop = await open(engine, 'floor', true);
    await shop.ask(LINE);
    await shop.ask('/knurl standard propose TH-2041-B');
    expect(await shop.said('/knurl standard approve TH-2041-B')).toContain(
      'No standards channel is set and this is private: it is not posted anywhere.',
    );
    expect(await delivered(shop)).toEqual([]);
  });

  it('say what has changed under them, and when they are due for review', async () => {
    const shop = await open(engine);
    await shop.ask('/shop wheels add A1 straight 21 tpi teeth 50 diameter 19.25mm bevel 1mm');
    await hold(shop, 'TH-2041-B', '1.000 straight 1018 wheel A1');
    expect(await shop.said('1.000 straight 1018 wheel A1')).not.toContain('review');
    await shop.ask('/shop wheels change A1 diameter 19.20mm');
    const changed = await shop.said('1.000 straight 1018 wheel A1');
    expect(changed).toContain(
      'Wheel A1 has changed since (diameter): review this standard before the next batch.',
    );
    expect(await shop.said('/knurl standard list')).toContain('approved, review due');
    shop.clock.now += 366 * DAY;
    expect(await shop.said('/knurl standard show TH-2041-B')).toContain(
      'Its review was due on 6 Jan 2026.',
    );
  });

  it('are compared figure by figure, with what changed why', async () => {
    const shop = await open(engine);
    await hold(shop, 'TH-2041-B');
    await shop.ask(`${LINE} fill 85%`);
    const none = await shop.said('/knurl standard revise TH-2041-B');
    expect(none).toContain('The reason is missing.');
    const line = '/knurl standard revise TH-2041-B bars 0.99-1.02 because rev 1 flaked, see card 9';
    expect(await shop.said(line)).toContain('Why: rev 1 flaked, see card 9');
    const compared = await shop.said('/knurl standard compare TH-2041-B');
    expect(compared).toMatch(/^TH-2041-B, rev 1 to rev 2: \d+ things differ Why: rev 1 flaked/u);
    expect(compared).toContain('Bars 0.9900 to 1.0100 in to 0.9900 to 1.0200 in');
    expect(compared).toContain('Fill 90 % to 85 % (5 % less)');
    // evidence: tooth height is fill times the sharp height, 0.0238 in
    expect(compared).toMatch(/Tooth height 0\.0214 in \[0\.544 mm\] to 0\.0202 in \[0\.514 mm\]/u);
    expect(await shop.said('/knurl standard compare TH-2041-B rev 1 and 7')).toContain(
      'There is no revision “TH-2041-B rev 7” here. Did you mean rev 2 or rev 1?',
    );
    const history = await shop.said('/knurl standard history TH-2041-B');
    expect(history).toMatch(
      /^History of TH-2041-B: 2 revisions Rev 2 saved by Ines, 6 Jan 2025, 07:00 UTC, card [A-Z0-9]+: rev 1 flaked, see card 9 Rev 1 approved by Ines/u,
    );
  });

  it('want two people where the shop says so', async () => {
    const shop = await open(engine);
    await shop.ask('/shop settings change four eyes yes');
    await shop.ask(LINE);
    await shop.ask('/knurl standard propose TH-2041-B');
    expect(await shop.said('/knurl standard approve TH-2041-B')).toMatch(
      /^You proposed TH-2041-B rev 1, and this shop wants two people for a standard\. Ask nobody else/u,
    );
    await shop.ask('good morning', 'Bea');
    await shop.ask('/shop people change Bea supervisor');
    expect(await shop.said('/knurl standard approve TH-2041-B')).toContain('Ask Bea.');
    expect(await shop.said('/knurl standard approve TH-2041-B', 'Bea')).toContain('approved.');
  });

  it('of another’s hand are not written over unseen', async () => {
    const shop = await open(engine);
    await shop.ask(LINE);
    await shop.ask('/knurl standard save TH-2041-B');
    await shop.ask(LINE, 'Pavel');
    const stale = await shop.said('/knurl standard save TH-2041-B', 'Pavel');
    expect(stale).toMatch(
      /^TH-2041-B was changed by Ines, 6 Jan 2025, 07:00 UTC\. Nothing of yours was done\./u,
    );
    const over = await shop.said('/knurl standard save TH-2041-B rev 1', 'Pavel');
    expect(over).toContain('Standard TH-2041-B rev 2 saved.');
  });

  it('take a part number of 500 characters for what it is, and keep the words', async () => {
    const shop = await open(engine);
    await shop.ask(LINE);
    const line = `/knurl standard save ${'X1'.repeat(250)}`;
    const answer = await shop.ask(line);
    expect(flat(answer)).toBe(
      'The part number has 500 characters; at most 60 are kept. Make it shorter.',
    );
    expect(answer).toMatchObject({ kind: 'refusal', text: line });
    expect(await shop.said('/knurl standard')).toMatch(/^No such standards yet\./u);
  });

  it('are listed by where they are, and shown by their part number alone', async () => {
    const shop = await open(engine);
    await hold(shop, 'TH-2041-B');
    await shop.ask(LINE);
    await shop.ask('/knurl standard save 3/4-16 KNOB');
    const all = await shop.said('/knurl standard');
    expect(all).toMatch(/^2 standards: 3\/4-16 KNOB rev 1 draft; 0\.9852 in, 65 teeth;/u);
    const approved = await shop.said('/knurl standard list approved');
    expect(approved).toMatch(/^1 standard, approved: TH-2041-B rev 1 approved;/u);
    expect(await shop.said('/knurl standard list drafts')).toMatch(/^1 standard, draft: 3\/4-16/u);
    expect(await shop.said('/knurl standard list retired')).toMatch(/^No such standards yet\./u);
    const shown = await shop.said('/knurl standard 3/4-16 knob');
    expect(shown).toMatch(/^Standard 3\/4-16 KNOB rev 1: draft/u);
  });

  it('are suggested while somebody types', async () => {
    const shop = await open(engine);
    await hold(shop, 'TH-2041-B');
    await hold(shop, 'KN-7');
    const given = { path: ['knurl', 'setup'], options: {} };
    const offers = await shop.desk.suggest(
      {
        shop: 'north',
        person: { id: 'Ines', name: 'Ines' },
        place: { channel: 'floor', thread: null, isPrivate: false },
        interactionId: 'typing',
        given,
      },
      { parameter: 'part', typed: 'th' },
    );
    expect(offers.map(({ words }) => words)).toEqual(['TH-2041-B']);
  });
});
