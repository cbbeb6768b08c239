/** Every verb through the real client: options, the card they bring, and all that hangs on it. */
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { readId } from '../../../src/adapters/common/ids.ts';
import type { Command } from '../../../src/desk/index.ts';
import { buttonsOf, fieldsOf, type Value } from '../../platforms/discord/people.ts';
import type { Posted } from '../../platforms/discord/rooms.ts';
import type { Someone } from '../../platforms/discord/world.ts';
import { until } from '../../support/until.ts';
import { openBot } from './bot.ts';
import { optionsFor, restOf } from './options.ts';
import { readIn, seenAs, withoutCodes } from './seen.ts';

const bot = await openBot();
afterAll(async () => {
  expect(bot.platform.faults).toEqual([]);
  expect(bot.faults).toEqual([]);
  await bot.stop();
});
const { people, platform } = bot;
const SETUP = ['knurl', 'setup'];
const LINE = '1.000 straight 21tpi 1018';

const codeIn = (message: Posted): string =>
  /\bCard ([2346789CFHJKMPRTWXY]{5,12})\b/u.exec(readIn(message))?.[1] ?? '';
/** What is asked has a code of its own. */
const questionIn = (message: Posted): string | undefined =>
  /\bQuestion ([2346789CFHJKMPRTWXY]{5,12}) is put up/u.exec(readIn(message))?.[1];
/** Examples name somebody, a card and a number of the list that no shop of a test has. */
const ownNames = (line: string, code: string, ben: string): string =>
  line
    // People are named here by a mention.
    .replace(/^(\/shop people (?!group)\w+ )Ben\b/u, `$1<@${ben}>`)
    .replaceAll(/\b(?=\w*\d)(?=\w*[A-Z])[2346789CFHJKMPRTWXY]{5}\b/gu, code)
    .replaceAll(/\b([QR])\d+\b/gu, '$11');

/** What has to be there before a verb shows what it does. */
const BEFORE: Readonly<Record<string, readonly string[]>> = {
  'result show': ['result log'],
  'result list': ['result log'],
  'result correct': ['result log'],
  'result withdraw': ['result log'],
  'result confirm': ['result log'],
  answer: ['ask'],
  solved: ['ask'],
  reopen: ['ask', 'solved'],
  questions: ['ask'],
  'standard list': ['standard propose'],
  'standard show': ['standard propose'],
  'standard approve': ['standard propose'],
  'standard history': ['standard propose', 'standard approve'],
  'standard revise': ['standard propose', 'standard approve'],
  'standard compare': ['standard propose', 'standard approve', 'standard revise'],
  'standard retire': ['standard propose', 'standard approve'],
};

/** The verbs that fill the list which a verb reads. */
const makersFor = ({ path }: Command): readonly Command[] => {
  const [root, ...verb] = path;
  const adds = verb.at(-1) === 'add' ? [] : [`${verb[0] ?? ''} add`];
  const wanted = [...adds, ...(BEFORE[verb.join(' ')] ?? [])].map((each) => `${root} ${each}`);
  return wanted.flatMap((each) => FLEET.filter((command) => command.path.join(' ') === each));
};

/** Everything that one act brings: it is over when nothing more comes. */
const brought = async (act: () => Promise<unknown>, quietMs = 0): Promise<readonly Posted[]> => {
  const before = platform.posted.length;
  const { message } = await bot.next(act);
  await bot.quiet();
  if (quietMs > 0) await pause(quietMs);
  const all = platform.posted.slice(before);
  // A file that is handed over has no words of its own, and goes to one person alone.
  const isHandedOver = ({ files }: Posted): boolean => files.some(({ alt }) => alt === '');
  const rest = all.filter((each) => !isHandedOver(each));
  expect(rest.every(({ only }) => only === message.only)).toBe(true);
  expect(all.filter(isHandedOver).every(({ only }) => only !== null)).toBe(true);
  return all;
};

type Served = { readonly who: Someone; readonly code: string; readonly ben: string };

/** A server of its own, with a card to speak of and whatever the verb's list holds. */
const shopFor = async (name: string, command: Command): Promise<Served> => {
  const who = platform.addGuild(name);
  const ben = platform.newId();
  platform.meetPerson({ ...who, id: ben, name: 'Ben', manages: false });
  const first = await brought(() => people.slash(SETUP, { words: LINE }, who));
  let code = first.map(codeIn).join('');
  for (const maker of makersFor(command)) {
    // The first makes what is needed; a list gets all of them.
    const needed = maker.path.at(-1) === 'add' ? maker.examples : maker.examples.slice(0, 1);
    for (const example of needed) {
      const options = optionsFor(people, maker, ownNames(example, code, ben));
      const made = await brought(() => people.slash(maker.path, options, who));
      code = made.map(questionIn).find((each) => each !== undefined) ?? code;
    }
  }
  return { who, code, ben };
};

const typed = (path: readonly string[], options: Readonly<Record<string, unknown>>): string =>
  [
    `/${path.join(' ')}`,
    ...Object.entries(options).map(([name, value]) => `${name}: ${String(value)}`),
  ].join('  ');

/** What the examples of a verb bring in a server of their own, without the codes of its cards. */
const examplesOf = async (
  name: string,
  command: Command,
  fill: (line: string) => Readonly<Record<string, Value>>,
) => {
  const { who, code, ben } = await shopFor(name, command);
  const plain = (text: string): string => text.replaceAll(code, 'CODE').replaceAll(ben, 'BEN');
  const asked: string[] = [];
  const seen: string[] = [];
  for (const example of command.examples) {
    const options = fill(ownNames(example, code, ben));
    // Files are made while they are handed over: nothing is heard of them for a while.
    const quietMs = command.path.at(-1) === 'export' ? 400 : 0;
    const messages = await brought(() => people.slash(command.path, options, who), quietMs);
    asked.push(plain(typed(command.path, options)));
    seen.push(plain(withoutCodes(messages.map(seenAs).join('\n\n'))));
  }
  return { asked, seen };
};

const VERBS = FLEET.map((command) => [command.path.join(' '), command] as const);

test.each(VERBS)('golden: /%s by its options, and the same by words', async (name, command) => {
  const byOptions = await examplesOf(name, command, (line) => optionsFor(people, command, line));
  const byWords = await examplesOf(`${name} in words`, command, (line) => ({
    words: restOf(line),
  }));
  expect(byWords.seen).toEqual(byOptions.seen);
  const text = byOptions.asked.flatMap((line, index) => [line, byOptions.seen[index]]);
  await expect(`${text.join('\n\n')}\n`).toMatchFileSnapshot(
    `goldens/${name.replaceAll(' ', '-')}.txt`,
  );
});

const isFromPrivate = (id: string): boolean => readId(id)?.isPrivate === true;

/** Judgement: buttons of one verb's cards that are pressed, each label once. */
const MOST_PRESSES = 40;

test.each(VERBS)(
  'every button and form of /%s is answered, and private stays private',
  async (name, command) => {
    const { who, code, ben } = await shopFor(`${name} pressed`, command);
    const waiting: Posted[] = [];
    for (const example of command.examples) {
      const options = optionsFor(people, command, ownNames(example, code, ben));
      const quietMs = command.path.at(-1) === 'export' ? 400 : 0;
      const hidden = { ...options, 'only-me': true };
      for (const asked of [options, hidden])
        waiting.push(...(await brought(() => people.slash(command.path, asked, who), quietMs)));
    }
    const pressed = new Set<string>();
    for (let card = waiting.shift(); card !== undefined; card = waiting.shift())
      for (const { label = '', custom_id = '' } of buttonsOf(card)) {
        const key = `${label} ${custom_id.split(':')[0] ?? ''}`;
        if (pressed.has(key) || pressed.size >= MOST_PRESSES) continue;
        pressed.add(key);
        const answers = await answered(card, label, who);
        // A refusal is private by itself: what is asked openly after it is answered openly.
        if (isFromPrivate(custom_id))
          expect(answers.every(({ only }) => only === who.id)).toBe(true);
        waiting.push(...answers);
      }
  },
  30_000,
);

/** What a button brings, by way of its form where it opens one. */
const answered = async (card: Posted, label: string, who: Someone): Promise<readonly Posted[]> => {
  const forms = platform.forms.length;
  const before = platform.posted.length;
  const acked = await people.press(card, label, who);
  expect(acked, `${label} is answered in time`).not.toBeNull();
  const form = platform.forms[forms];
  if (form === undefined) {
    await until(() => platform.posted.length > before, `what ${label} brings`);
    return platform.posted.slice(before);
  }
  const filled = Object.fromEntries(
    fieldsOf(form).map(({ custom_id = '', value, placeholder, options }) => [
      custom_id,
      options?.[0]?.value ?? value ?? placeholder?.split(', ')[0] ?? 'x',
    ]),
  );
  return await brought(() => people.submit(form, filled));
};
