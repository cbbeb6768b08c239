/** What every adapter owes a person, whatever its platform can do. */
import { describe, expect, onTestFinished, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import type { Delivering, Delivery } from '../../../src/adapters/common/delivery.ts';
import { spoken } from '../../../src/adapters/common/spoken.ts';
import { type Card, line } from '../../../src/card/index.ts';
import type { Answer, Desk, Effect } from '../../../src/desk/index.ts';
import { en, showIn } from '../../../src/phrases/index.ts';
import { bare, saidBy } from './anyCard.ts';

/** A message as it reached whoever sees it. */
export type Said = {
  readonly text: string;
  readonly channel: string;
  readonly thread: string | null;
  /** The one person who sees it, or null for everybody there. */
  readonly only: string | null;
  /** Who was called by it. */
  readonly rings: readonly string[];
};

/** What a platform can do. Nothing in the contract asks which platform it is. */
export type Capabilities = {
  readonly threads: boolean;
  readonly privateReplies: boolean;
  /** Messages that can be held up so that they stay in sight. */
  readonly pins: boolean;
  /** What is missing is asked for by a form, not by a sentence. */
  readonly asksByForm: boolean;
  /** The same event may come several times. */
  readonly repeats: boolean;
  /** A send can fail on the way. */
  readonly losesSends: boolean;
};

export type Asking = {
  readonly thread?: boolean;
  readonly isPrivate?: boolean;
  readonly copies?: number;
};

export type Running = {
  /** Asks with words, as the shop's owner, and gives everything that came of it. */
  readonly ask: (words: string, asking?: Asking) => Promise<readonly Said[]>;
  readonly deliver: (effect: Effect, delivering: Omit<Delivering, 'shop'>) => Promise<Delivery>;
  /** Where the owner stands, as an effect names it. */
  readonly place: string;
  readonly channel: string;
  readonly thread: string;
  /** Everything that was said so far, and what is pinned. */
  readonly said: () => readonly Said[];
  readonly pinned: () => number;
  /** From now on no message goes out. */
  readonly loseSends: () => void;
  /** Faults that were counted, by what failed. */
  readonly faults: () => readonly string[];
  /** What the platform found wrong with anything that it was sent. */
  readonly complaints: () => readonly string[];
  readonly stop: () => Promise<void>;
};

/** Opens an adapter on a desk that somebody listens to. */
export type Opening = (listen: (desk: Desk) => Desk) => Promise<Running>;

const LINE = '1.000 1018 straight 21tpi';
/** Worked by hand in test/reference/jobs.ts: 65 teeth of 1/21 in want 0.9852 in. */
const HEADLINE = 'Turn to 0.9852 in: 65 teeth';
const LOUD = '@everyone @here <!channel> <!here> <@1300000000000000003> <@U0ENGINEER> blorp';

const CARD: Card = {
  verb: 'help',
  headline: line('helpIntro', {}),
  parts: [],
  choices: [],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units: 'in',
};

/** What the card of the effects says. */
const HELP = en.lines.helpIntro({}, showIn('in'));

const FIRST = { earlier: null, firstTried: null };

const isMissing = (answer: Answer): boolean =>
  answer.kind === 'refusal' && answer.refusal.code === 'missing';

/** Examples name a card that no shop of a test has. */
const withCode = (example: string, code: string): string =>
  example.replaceAll(/\b(?=\w*\d)(?=\w*[A-Z])[2346789CFHJKMPRTWXY]{5}\b/gu, code);

export const adapterContract = (name: string, can: Capabilities, open: Opening): void => {
  const opened = async () => {
    const answers: Answer[] = [];
    const running = await open((desk) => ({
      ...desk,
      answer: async (call) => {
        const answer = await desk.answer(call);
        answers.push(answer);
        return answer;
      },
    }));
    onTestFinished(async () => {
      const complaints = running.complaints();
      await running.stop();
      expect(complaints).toEqual([]);
    });
    return { ...running, answers };
  };
  const textOf = (said: readonly Said[]): string => bare(said.map(({ text }) => text).join(' '));

  describe(`what ${name} owes a person`, () => {
    test('every verb: no figure, check, caution or sentence of its answer is lost', async () => {
      const { ask, answers } = await opened();
      await ask(LINE);
      const [first] = answers;
      const code = /\bCard (\w{5,})/u.exec(JSON.stringify(first && spoken(first, en)))?.[1] ?? '';
      let answered = 0;
      for (const { examples } of FLEET)
        for (const example of examples) {
          const before = answers.length;
          const said = await ask(withCode(example, code));
          const answer = answers[before];
          // A verb that says nothing more may be met with a form; then the desk is not asked yet.
          if (answer === undefined || (can.asksByForm && isMissing(answer))) continue;
          answered += 1;
          for (const sentence of saidBy(spoken(answer, en)))
            expect(textOf(said), example).toContain(bare(sentence));
        }
      expect(answered).toBeGreaterThan(FLEET.length / 2);
    }, 90_000);

    test('an answer stands where it was asked for', async () => {
      const { ask, channel } = await opened();
      const [here] = await ask(LINE);
      expect(here).toMatchObject({ channel, thread: null, only: null });
      expect(here?.text).toContain(HEADLINE);
    });

    if (can.threads)
      test('what is asked in a thread is answered in that thread', async () => {
        const { ask, channel, thread } = await opened();
        for (const said of await ask(LINE, { thread: true }))
          expect(said).toMatchObject({ channel, thread, only: null });
      });

    if (can.privateReplies)
      test('what is asked in private is seen by nobody else', async () => {
        const { ask } = await opened();
        const said = await ask(LINE, { isPrivate: true });
        expect(textOf(said)).toContain(bare(HEADLINE));
        for (const { only } of said) expect(only).not.toBeNull();
        const refused = await ask('1.000 blorp');
        for (const { only } of refused) expect(only).not.toBeNull();
      });

    test('words of a person are shown as they stand and ring nobody', async () => {
      const { ask } = await opened();
      for (const { rings } of await ask(LOUD)) expect(rings).toEqual([]);
    });

    test('an effect takes place once, however often it is tried', async () => {
      const { deliver, said, place, pinned } = await opened();
      const post: Effect = { effect: 'post', key: 'k1', place, card: CARD };
      const posted = await deliver(post, FIRST);
      const again = await deliver(post, { earlier: null, firstTried: Date.now() - 1000 });
      expect(again).toEqual(posted);
      if (!posted.delivered) throw new Error(posted.fault);
      const earlier = posted.outcome;
      const pin: Effect = { effect: 'pin', key: 'k2', of: 'k1' };
      for (let turn = 0; turn < 2; turn += 1)
        expect(await deliver(pin, { earlier, firstTried: null })).toMatchObject({
          delivered: true,
        });
      if (!can.pins) return;
      expect(said().filter(({ text }) => text.includes(HELP))).toHaveLength(1);
      expect(pinned()).toBe(1);
      const unpin: Effect = { effect: 'unpin', key: 'k3', of: 'k2' };
      for (let turn = 0; turn < 2; turn += 1)
        expect(await deliver(unpin, { earlier, firstTried: null })).toMatchObject({
          delivered: true,
        });
      expect(pinned()).toBe(0);
    });

    if (can.threads)
      test('what follows a thread stands in it', async () => {
        const { deliver, place, said, channel } = await opened();
        const posted = await deliver({ effect: 'post', key: 'q1', place, card: CARD }, FIRST);
        if (!posted.delivered) throw new Error(posted.fault);
        const thread: Effect = { effect: 'thread', key: 'q2', of: 'q1', title: 'Which wheel?' };
        const under = await deliver(thread, { earlier: posted.outcome, firstTried: null });
        if (!under.delivered) throw new Error(under.fault);
        const before = said().length;
        const follows: Effect = { effect: 'post', key: 'q3', of: 'q2', card: CARD };
        await deliver(follows, { earlier: under.outcome, firstTried: null });
        expect(said().length).toBe(before + 1);
        expect(said().at(-1)?.channel).toBe(channel);
        expect(said().at(-1)?.thread).not.toBeNull();
      });

    if (can.repeats)
      test('what comes twice is answered once', async () => {
        const { ask } = await opened();
        const said = await ask(LINE, { copies: 3 });
        expect(said.filter(({ text }) => text.includes(HEADLINE))).toHaveLength(1);
      });

    if (can.losesSends)
      test('a send that fails ends in a sentence or a counted fault', async () => {
        const { ask, loseSends, faults } = await opened();
        loseSends();
        const said = await ask(LINE).catch(() => []);
        expect(said.length + faults().length).toBeGreaterThan(0);
        expect(said.length).toBeLessThanOrEqual(1);
      });
  });
};
