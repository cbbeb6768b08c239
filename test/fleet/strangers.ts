/** Two shops that know nothing of each other, and everything of one that could be named in the other. */
import { randomUUID } from 'node:crypto';
import type { Answer, Command, Desk } from '../../src/desk/index.ts';
import { CODE_SIGNS } from '../../src/shop/index.ts';
import type { Store } from '../../src/store/index.ts';
import { textOf } from '../support/desk.ts';

export type Ask = (words: string) => Promise<Answer>;

export const askIn =
  (desk: Desk, shop: string, who = 'Nell'): Ask =>
  (words) =>
    desk.answer({
      shop,
      person: { id: who, name: who },
      place: { channel: 'floor', thread: null, isPrivate: false },
      interactionId: randomUUID(),
      given: { words },
    });

/** Something of the other shop, and something like it that nobody has. */
export type Thing = {
  readonly kind: string;
  readonly theirs: string;
  readonly nobodys: string;
  /** A person would type it anywhere in a line; everything else stands right behind a verb. */
  readonly spoken: boolean;
  /** A bare number is a size to most verbs: only these take it for what it is. */
  readonly only?: (command: Command) => boolean;
};

/** Names that are as far from every word as each other. */
const named = (kind: string, name: string): Thing => ({
  kind,
  theirs: `${name}one`,
  nobodys: `${name}two`,
  spoken: true,
});
const WHEEL = named('wheel', 'Qvuzzlewyck');
const MACHINE = named('machine', 'Jxorfbandel');
const MATERIAL = named('material', 'Vwyzgrumpel');
const PERSON = named('person', 'Zjubbelfrant');
const STANDARD = named('standard', 'Nbolgrimpyl');
/** The other shop has one, the two alike have none. */
const RESULT: Thing = { kind: 'result', theirs: 'R1', nobodys: 'R7', spoken: false };

export const carded = async (ask: Ask, words: string): Promise<Answer> => {
  const answer = await ask(words);
  if (answer.kind === 'refusal') throw new Error(`refused: ${words}\n${textOf(answer)}`);
  return answer;
};

const codeOn = (answer: Answer): string =>
  /(?:Card|Question) ([A-Z0-9]{5,})/u.exec(textOf(answer))?.[1] ?? '';

const LINE = `1.000 ${MATERIAL.theirs} straight wheel ${WHEEL.theirs} on ${MACHINE.theirs}`;

/** A code that reads as nothing but a code, so that no chance decides what a line means. */
const plainCode = async (ask: Ask, line: string): Promise<string> => {
  for (;;) {
    const code = codeOn(await carded(ask, line));
    if (/^[CFHJKPRTWXY]{2}/u.test(code)) return code;
  }
};

/** Something of the other shop that goes by a code. */
const coded = (kind: string, code: string): Thing => ({
  kind,
  theirs: code,
  nobodys: otherCode(code),
  spoken: true,
});

/** Other letters in the same places: as far from being a word, and nobody's. */
const otherCode = (code: string): string =>
  code.replaceAll(/[A-Z]/gu, (letter) => {
    const letters = Array.from(CODE_SIGNS).filter((sign) => /[CFHJKPRTWXY]/u.test(sign));
    return letters[(letters.indexOf(letter) + 5) % letters.length] ?? 'K';
  });

/** More rules than the others ever get. */
const RULES = 40;
const namesRule = ({ path }: Command): boolean => path[1] === 'rules' && path[2] !== 'add';

/** More results than the others ever get. */
const RESULTS = 3;
const namesResult = ({ path }: Command): boolean => path[1] === 'result' && path[2] !== 'log';

/** Fills the other shop, and gives back everything of it that has an id, a name or a code. */
export const furnish = async (ask: Ask, store: Store): Promise<readonly Thing[]> => {
  await carded(ask, `/shop people add ${PERSON.theirs} engineer`);
  await carded(ask, `/shop wheels add ${WHEEL.theirs} straight 21 tpi teeth 50 diameter 19 mm`);
  await carded(ask, `/shop machines add ${MACHINE.theirs} speeds 70 115 190`);
  await carded(ask, `/shop materials add ${MATERIAL.theirs} as 1018 HB 150`);
  for (let rule = 1; rule <= RULES; rule += 1) await carded(ask, '/shop rules add Lamp on');
  const code = await plainCode(ask, LINE);
  const question = await plainCode(ask, `/knurl ask ${code} may I run it faster`);
  await carded(ask, `/knurl result card ${code} good 50 parts`);
  for (const step of [`propose ${STANDARD.theirs} card ${code}`, `approve ${STANDARD.theirs}`])
    await carded(ask, `/knurl standard ${step}`);
  for (let logged = 1; logged <= RESULTS; logged += 1)
    await carded(ask, `/knurl result ${code} good 50 teeth`);
  const tables = ['wheel', 'machine', 'material', 'rule', 'person', 'card', 'result'] as const;
  const idsOf = async (table: (typeof tables)[number]) => {
    const { id } = await store.read
      .selectFrom(table)
      .select('id')
      .limit(1)
      .executeTakeFirstOrThrow();
    return {
      kind: `id of a ${table}`,
      theirs: id,
      nobodys: id.replaceAll(/.{4}$/gu, 'zzzz'),
      spoken: false,
    };
  };
  return [
    WHEEL,
    MACHINE,
    MATERIAL,
    PERSON,
    STANDARD,
    RESULT,
    coded('code', code),
    coded('code of a question', question),
    { kind: 'number of a rule', theirs: '38', nobodys: '48', spoken: false, only: namesRule },
    { kind: 'number of a result', theirs: 'R3', nobodys: 'R9', spoken: false, only: namesResult },
    ...(await Promise.all(tables.map(idsOf))),
  ];
};

const said = ({ path }: Command): string => `/${path.join(' ')}`;

/** The line that asks a verb for a thing and says no more. */
export const behindVerb = (command: Command, name: string): readonly string[] => [
  `${said(command)} ${name}`,
];

/** A verb's examples with the thing in place of each of their words. */
export const withinExamples = (command: Command, name: string): readonly string[] => {
  const asked = said(command);
  const lines = command.examples.flatMap((example) => {
    const words = (example.startsWith(asked) ? example.slice(asked.length) : example)
      .split(' ')
      .filter((word) => word !== '' && !word.startsWith('/'));
    return [...words.keys()].map((at) => `${asked} ${words.with(at, name).join(' ')}`);
  });
  return [...new Set(lines)];
};

/** The same records, in which nothing stays of what is done: every question meets the same shop. */
export const takenBack = (store: Store): Store => ({
  ...store,
  transact: async (work, options) => {
    const stop = new Error('taken back');
    const done: unknown[] = [];
    await store
      .transact(async (tx) => {
        done[0] = await work(tx);
        throw stop;
      }, options)
      .catch((error: unknown) => {
        if (error !== stop) throw error;
      });
    return done[0] as Awaited<ReturnType<typeof work>>;
  },
});
