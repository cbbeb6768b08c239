import { setTimeout as pause } from 'node:timers/promises';
import { FLEET } from '../../../commands/index.ts';
import { openRecordsDesk } from '../../../src/desk/index.ts';
import { newRecords, START } from '../../support/records.ts';
import { until } from '../../support/until.ts';
import {
  type Asking,
  adapterContract,
  type Opening,
  type Said,
} from '../contract/adapterContract.ts';
import { openBot, readable } from './bot.ts';

const LOST = Array.from({ length: 60 }, () => ({ status: 500, done: false }) as const);
const OWNER = { id: 'U0OWNER' };
const SHOP = 'T0SHOP';
const FLOOR = 'C0FLOORSHOP';
const THREAD = '1790000000.000700';

const open: Opening = async (listen) => {
  const { store } = await newRecords('sqlite');
  const records = { platform: 'slack', program: 'test', now: () => START };
  const bot = await openBot({ desk: listen(openRecordsDesk(FLEET, store, records)) });
  const { platform, people } = bot;
  const all = (): readonly Said[] =>
    platform.posted.map(({ body, channel, thread, only }) => ({
      text: readable(body).replaceAll('\\"', '"').replaceAll('*', ''),
      channel,
      thread,
      only,
      // A name that rings and was not asked for is a complaint of the platform.
      rings: [],
    }));
  return {
    ask: async (words, { thread = false, isPrivate = false, copies = 1 }: Asking = {}) => {
      const before = platform.posted.length;
      const faults = bot.faults.length;
      const line = isPrivate ? `${words} only me` : words;
      const asked =
        copies > 1
          ? repeated(line, copies)
          : people.mention(line, { ...OWNER, ...(thread ? { thread: THREAD } : {}) });
      void asked;
      await until(
        () => platform.posted.length > before || bot.faults.length > faults,
        'an answer or a fault',
      );
      for (let seen = -1; seen !== platform.calls.length; ) {
        seen = platform.calls.length;
        await pause(40);
      }
      return all().slice(before);
    },
    deliver: (effect, delivering) => bot.bot.deliver(effect, { ...delivering, shop: SHOP }),
    place: `${FLOOR}/`,
    channel: FLOOR,
    thread: THREAD,
    said: all,
    pinned: () => platform.pins.length,
    loseSends: () => {
      for (const method of ['chat.postMessage', 'chat.postEphemeral', 'response_url'])
        platform.meet(method, ...LOST);
    },
    faults: () => bot.faults.map(({ what }) => what),
    complaints: () => platform.faults,
    stop: bot.stop,
  };

  /** The same envelope, so many times. */
  async function repeated(line: string, copies: number): Promise<void> {
    const payload = people.slashBody('/knurl', line, OWNER, {});
    for (let copy = 0; copy < copies; copy += 1)
      await platform.deliver({ type: 'slash_commands', payload });
  }
};

adapterContract(
  'Slack',
  {
    threads: true,
    privateReplies: true,
    pins: true,
    asksByForm: true,
    repeats: true,
    losesSends: true,
  },
  open,
);
