import { setTimeout as pause } from 'node:timers/promises';
import type { Posted } from '../../platforms/discord/rooms.ts';
import { FLOOR, OWNER, SHOP, THREAD } from '../../platforms/discord/world.ts';
import { until } from '../../support/until.ts';
import {
  type Asking,
  adapterContract,
  type Opening,
  type Said,
} from '../contract/adapterContract.ts';
import { openBot } from './bot.ts';
import { readIn } from './seen.ts';

const LOST = Array.from({ length: 60 }, () => ({ status: 500, done: false }) as const);
const SETUP = ['knurl', 'setup'];

const said = (posted: Posted, threads: ReadonlyMap<string, string>): Said => {
  const parent = threads.get(posted.channel);
  return {
    text: readIn(posted),
    channel: parent ?? posted.channel,
    thread: parent === undefined ? null : posted.channel,
    only: posted.only,
    rings: posted.rings,
  };
};

const open: Opening = async (listen) => {
  const bot = await openBot({ breakDesk: listen });
  const { platform, people } = bot;
  const threads = (): ReadonlyMap<string, string> =>
    new Map(
      [...platform.rooms.channels.values()].flatMap(({ id, parent }) =>
        parent === null ? [] : [[id, parent] as const],
      ),
    );
  const all = (): readonly Said[] => platform.posted.map((each) => said(each, threads()));
  return {
    ask: async (words, { thread = false, isPrivate = false, copies = 1 }: Asking = {}) => {
      const before = platform.posted.length;
      const faults = bot.faults.length;
      const someone = { ...OWNER, channel: thread ? THREAD : FLOOR };
      const options = { words, ...(isPrivate ? { 'only-me': true } : {}) };
      void people.slash(SETUP, options, someone, { copies });
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
    pinned: () => platform.rooms.pinsOf(FLOOR).length,
    loseSends: () => {
      for (const route of ['callback', 'followUp', 'editOriginal', 'post'])
        platform.meet(route, ...LOST);
    },
    faults: () => bot.faults.map(({ what }) => what),
    complaints: () => platform.faults,
    stop: bot.stop,
  };
};

adapterContract(
  'Discord',
  {
    threads: true,
    privateReplies: true,
    pins: true,
    asksByForm: false,
    repeats: true,
    losesSends: true,
  },
  open,
);
