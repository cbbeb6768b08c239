/** Every verb in a shop that keeps records: by words and by form, each payload one that Slack takes. */
import { expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import type { Command } from '../../../src/desk/index.ts';
import { until } from '../../support/until.ts';
import { openShops } from './shops.ts';

const OWNER = { id: 'U0OWNER' } as const;
const LINE = '1.000 1018 straight 21tpi';

/** Examples name a card and a number of a list that no shop of a test has. */
const ownNames = (line: string, code: string): string =>
  line
    .replaceAll(/\b(?=\w*\d)(?=\w*[A-Z])[2346789CFHJKMPRTWXY]{5}\b/gu, code)
    .replaceAll(/\b([QR])\d+\b/gu, '$11');

const wordsAfter = (line: string, { path }: Command): string =>
  line.replace(/^\/?/u, '').split(' ').slice(path.length).join(' ');

/** What fills a list comes first, what empties it last. */
const ORDER = ['add', 'log', 'save', 'propose', 'approve', 'ask', 'answer', 'solved'];
const ENDS = ['remove', 'withdraw', 'retire'];
const weight = ({ path }: Command): number => {
  const last = path.at(-1) ?? '';
  if (ENDS.includes(last)) return 2;
  return ORDER.includes(last) ? ORDER.indexOf(last) / ORDER.length : 1;
};
const VERBS = [...FLEET].sort((a, b) => weight(a) - weight(b));

test('every verb is answered by words and by form, and nothing that is sent is refused', async () => {
  const bot = await openShops();
  const card = await bot.knurl(LINE, OWNER.id);
  const code = /\bCard ([2346789CFHJKMPRTWXY]{5,12})\b/u.exec(card)?.[1] ?? '';
  expect(code).not.toBe('');
  for (const command of VERBS)
    for (const example of command.examples) {
      const line = ownNames(example, code);
      const [root = '', ...rest] = line.split(' ');
      // A verb alone that needs more opens its form.
      const seen = (): number => bot.platform.posted.length + bot.platform.views.length;
      const sofar = seen();
      await bot.people.slash(rest.join(' '), OWNER, { command: root });
      await until(() => seen() > sofar, `an answer to ${line}`);
      if (command.parameters.length === 0) continue;
      await bot.people.pressHome(command.path.join(' '), OWNER);
      const views = bot.platform.views;
      await until(() => views.at(-1)?.view.callback_id === `verb ${command.path.join(' ')}`, line);
      const form = views.at(-1);
      if (form === undefined) throw new Error('no form');
      const before = bot.platform.posted.length;
      const acked = await bot.people.submit(form, { words: wordsAfter(line, command) }, OWNER);
      const { errors } = (acked?.payload ?? {}) as { readonly errors?: object };
      if (errors === undefined)
        await until(() => bot.platform.posted.length > before, `an answer to the form of ${line}`);
      // An error stands at a field that the form has.
      const fields = JSON.stringify(form.view);
      for (const field of Object.keys(errors ?? {}))
        expect(fields).toContain(`"block_id":"${field}"`);
    }
  expect(bot.faults).toEqual([]);
}, 120_000);
