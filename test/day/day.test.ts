/**
 * A day of three people in the terminal, kept as they read it on a phone: the same on both engines.
 * Read it before it is accepted anew: it is what the shop gets.
 */
import { expect, it } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { PHONE_WIDTH, speakerCalled } from '../../src/adapters/terminal/index.ts';
import type { Store } from '../../src/store/index.ts';
import { ENGINES } from '../support/places.ts';
import { newRecords } from '../support/records.ts';
import { play } from '../support/terminal.ts';
import { DAY, type Turn } from './day.ts';

/** A Wednesday in spring. */
const MIDNIGHT = Date.UTC(2025, 4, 14);

const momentOf = (at: string): number => {
  const [hour = 0, minute = 0] = at.split(':').map(Number);
  return MIDNIGHT + (hour * 60 + minute) * 60_000;
};

/** The last code that was said so: a question's where it is put up, a card's where it ends. */
const lastCode = (said: string, after: string): string =>
  [...said.matchAll(new RegExp(`${after} ([A-Z0-9]{5,})`, 'gu'))].at(-1)?.[1] ?? '(none)';

const turned = async (store: Store, { at, who, where, line }: Turn, said: string) => {
  const typed = line
    .replace('{card}', lastCode(said, 'Card'))
    .replace('{question}', lastCode(said, 'Question'));
  const place = { channel: where.replace('#', ''), thread: null, isPrivate: false };
  const shown = await play({
    store,
    fleet: FLEET,
    lines: [typed],
    now: () => momentOf(at),
    speaker: { ...speakerCalled(who), place },
  });
  return `${at}  ${shown}`;
};

/** Signs that chance gave out, each in the place of the one that stood there before it. */
const CODES = ['K7M2X', 'R4C9H', 'P2Y6T', 'W8F3J', 'C6X4K', 'H9R7P', 'T3K8M', 'Y6P2C', 'J4W9F'];
const THREADS = ['3fa2', '81c0', '5d7e'];

const steady = (said: string): string => {
  const inTurn = (pattern: RegExp, names: readonly string[], text: string): string => {
    const seen = new Map<string, string>();
    for (const [, sign = ''] of text.matchAll(pattern))
      if (!seen.has(sign)) seen.set(sign, names[seen.size] ?? 'too many');
    return [...seen].reduce((now, [sign, name]) => now.replaceAll(sign, name), text);
  };
  const code = /\b(?:Card|card|Question|question|answer) ([2346789CFHJKMPRTWXY]{5})\b/gu;
  return inTurn(/#questions\/([0-9a-f]{4})/gu, THREADS, inTurn(code, CODES, said));
};

it.each(ENGINES)(
  'from the set-up to the standard that the next one sees first, on %s',
  async (engine) => {
    const { store } = await newRecords(engine);
    let day = '';
    for (const turn of DAY) day += await turned(store, turn, day);
    for (const line of day.split('\n'))
      if (!line.includes('> ')) expect([line, line.length <= PHONE_WIDTH]).toEqual([line, true]);
    await expect(`${steady(day).trimEnd()}\n`).toMatchFileSnapshot('day.txt');
  },
  60_000,
);
