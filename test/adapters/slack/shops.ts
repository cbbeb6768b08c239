/** The bot in two workspaces whose shops keep records, for as long as one test runs. */
import { expect, onTestFinished } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { openRecordsDesk } from '../../../src/desk/index.ts';
import type { Someone } from '../../platforms/slack/people.ts';
import { newRecords } from '../../support/records.ts';
import { until } from '../../support/until.ts';
import { openBot, readable, type Wanted } from './bot.ts';

export const openShops = async (wanted: Wanted = {}) => {
  const { store } = await newRecords('sqlite');
  const options = { platform: 'slack', program: 'test', now: Date.now };
  const desk = openRecordsDesk(FLEET, store, options);
  const bot = await openBot({ ...wanted, desk });
  onTestFinished(async () => {
    expect(bot.platform.faults).toEqual([]);
    await bot.stop();
  });
  const messageTo = async (act: () => Promise<unknown>) => {
    const before = bot.platform.posted.length;
    await act();
    await until(() => bot.platform.posted.length > before, 'an answer');
    const message = bot.platform.posted.at(-1);
    if (message === undefined) throw new Error('silence');
    return message;
  };
  const answerTo = async (act: () => Promise<unknown>): Promise<string> =>
    readable((await messageTo(act)).body);
  const shop = (words: string, id: string, someone: Someone = {}) =>
    answerTo(() => bot.people.slash(words, { ...someone, id }, { command: '/shop' }));
  const knurl = (words: string, id: string, someone: Someone = {}) =>
    answerTo(() => bot.people.slash(words, { ...someone, id }));
  return { ...bot, messageTo, answerTo, shop, knurl };
};
