/**
 * Every verb, asked in one shop with whatever another shop has: the answer is the one that is given
 * for something that nobody has at all, and the other shop stays as it was.
 */
import { expect, it } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { type Answer, type Command, openRecordsDesk } from '../../src/desk/index.ts';
import { exportJson, shopOf, viewShop } from '../../src/shop/index.ts';
import type { Store } from '../../src/store/index.ts';
import { textOf } from '../support/desk.ts';
import { ENGINES } from '../support/places.ts';
import { newRecords, START, WORDS } from '../support/records.ts';
import {
  type Ask,
  askIn,
  behindVerb,
  carded,
  furnish,
  type Thing,
  takenBack,
  withinExamples,
} from './strangers.ts';

const THEIRS = 'Yonder';
/** Two shops alike: one is asked for what the other shop has, one for what nobody has. */
const ALIKE = ['Hither', 'Nearby'] as const;

const NAMED = '(what was asked for)';
/** Codes are given by chance. */
const CODE = /\b(?=[A-Z0-9]*\d)(?=[A-Z0-9]*[A-Z])[2346789CFHJKMPRTWXY]{5,6}\b/gu;

/** A long word is repeated in part, and the part may end within the name. */
const SHORTENED = /“[^”]*…”/gu;

/** What a person is told, without the name they gave and the codes that chance gave. */
const told = (answer: Answer, name: string): string =>
  textOf(answer, 2000)
    .replaceAll(new RegExp(name, 'giu'), NAMED)
    .replaceAll(SHORTENED, '“…”')
    .replaceAll(CODE, '(code)');

const rowsOf = async (store: Store, shop: string): Promise<string> => {
  const id = await shopOf(store.read, { platform: 'terminal', id: shop });
  const pieces: string[] = [];
  for await (const piece of exportJson(viewShop(store.read, id ?? '', WORDS))) pieces.push(piece);
  return pieces.join('');
};

/** A shop with a little of its own, so that there is something that could be near. */
const alike = async (ask: Ask): Promise<void> => {
  await carded(ask, '/shop wheels add Hazel straight 21 tpi');
  await carded(ask, '/shop machines add Long bed speeds 60 90 140');
  await carded(ask, '/shop rules add Guard down');
  await carded(ask, '1.000 1018 straight wheel Hazel on Long bed');
};

/** The names of the other shop that a person was told though they did not say them. */
const leaked = (text: string, things: readonly Thing[], asked: Thing): readonly string[] =>
  things
    .filter(({ theirs }) => theirs.length > 3 && theirs !== asked.theirs && text.includes(theirs))
    .map(({ kind }) => kind);

const deskOver = (store: Store) =>
  openRecordsDesk(FLEET, store, { platform: 'terminal', program: 'test', now: () => START });

type Asked = {
  readonly things: readonly Thing[];
  readonly linesOf: (command: Command, name: string) => readonly string[];
  /** Who is asked for what the other shop has, and who for what nobody has. */
  readonly mine: Ask;
  readonly twin: Ask;
  /** The same two, with nothing kept of what they are asked. */
  readonly unkept?: Pick<Asked, 'mine' | 'twin'>;
};

/** A question is kept word for word, and is the shop's own from then on. */
const keepsWords = ({ path }: Command): boolean => path[1] === 'ask';

/** Asks every verb for everything, and gives back how much was asked. */
const askForAll = async ({ things, linesOf, unkept, ...both }: Asked): Promise<number> => {
  let asked = 0;
  for (const command of FLEET) {
    const { mine, twin } = keepsWords(command) ? (unkept ?? both) : both;
    for (const thing of things.filter(({ only }) => only === undefined || only(command))) {
      const nothing = linesOf(command, thing.nobodys);
      for (const [at, line] of linesOf(command, thing.theirs).entries()) {
        const said = told(await mine(line), thing.theirs);
        expect([line, said]).toEqual([line, told(await twin(nothing[at] ?? ''), thing.nobodys)]);
        expect([line, leaked(said, things, thing)]).toEqual([line, []]);
        asked += 1;
      }
    }
  }
  return asked;
};

it.each(ENGINES)(
  'behind every verb, on %s: two shops alike stay alike, and the third as it was',
  async (engine) => {
    const { store } = await newRecords(engine);
    const desk = deskOver(store);
    const things = await furnish(askIn(desk, THEIRS), store);
    const [mine, twin] = [askIn(desk, ALIKE[0]), askIn(desk, ALIKE[1])];
    await alike(mine);
    await alike(twin);
    const before = await rowsOf(store, THEIRS);
    const undone = deskOver(takenBack(store));
    const unkept = { mine: askIn(undone, ALIKE[0]), twin: askIn(undone, ALIKE[1]) };
    const asked = await askForAll({ things, linesOf: behindVerb, mine, twin, unkept });
    expect(asked).toBeGreaterThan(FLEET.length * 10);
    expect(await rowsOf(store, THEIRS)).toBe(before);
  },
  120_000,
);

it('in place of every word of every example', async () => {
  const { store } = await newRecords('sqlite');
  const things = await furnish(askIn(deskOver(store), THEIRS), store);
  await alike(askIn(deskOver(store), ALIKE[0]));
  const mine = askIn(deskOver(takenBack(store)), ALIKE[0]);
  const spoken = things.filter((thing) => thing.spoken);
  const asked = await askForAll({ things: spoken, linesOf: withinExamples, mine, twin: mine });
  expect(asked).toBeGreaterThan(FLEET.length * 10);
}, 240_000);
