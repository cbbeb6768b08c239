import type { Card } from '../card/index.ts';
import type { Suggestion } from '../refusal.ts';
import {
  answerTo,
  type ExportFile,
  effectOf,
  enterShop,
  exportFiles,
  latestCodes,
  listPeople,
  once,
  recordFiles,
  type ShopChange,
  type ShopOutside,
  type ShopView,
  type ShopWords,
  type Store,
  StoreUnavailable,
  settingsOf,
  shopOf,
  spokenNames,
  viewShop,
} from '../shop/index.ts';
import {
  materialNames,
  nearestOf,
  numberOf,
  plainText,
  type ShopUnits,
  type Suggested,
  unitOf,
} from '../words/index.ts';
import { type Answer, choicesIn } from './answer.ts';
import type { Call } from './call.ts';
import type { Command } from './command.ts';
import { type Desk, openDesk, type ShopFacts } from './desk.ts';
import type { Effect } from './effect.ts';
import { pinnedIn } from './pinned.ts';
import { atLeast, type Role } from './role.ts';
import { lineOf } from './route.ts';
import { lastCard, settled } from './settle.ts';
import type { Visit } from './visit.ts';

export type RecordsDeskOptions = {
  /** Whose shops and people these are: discord, slack, terminal … */
  readonly platform: string;
  /** The program's version, kept with every card. */
  readonly program: string;
  readonly now: () => number;
  /** The platform's id of a person who is called so; where not said, what is typed is the id. */
  readonly outsideId?: (called: string) => string;
  /** Something may have been queued for delivery. */
  readonly onAnswered?: () => void;
  /** For the log: the records could not be used. */
  readonly onFault?: (error: unknown) => void;
};

/** Names of the shop's own are compared and guessed at as everything else that is typed. */
export const SHOP_WORDS: ShopWords = { plainText, nearestOf, numberOf, unitOf, materialNames };

/** What is read of a shop that nobody has come into yet. */
const UNKNOWN_UNITS: ShopUnits = 'in';

/** Files that go with an answer, and who may take them along. */
type Offered = {
  readonly files: (view: ShopView) => readonly ExportFile[];
  readonly needs: Role;
};
const FILES: readonly Offered[] = [
  { files: exportFiles, needs: 'owner' },
  { files: recordFiles, needs: 'supervisor' },
];

/** The card of what was posted, for whatever stands behind its buttons. */
const postedCard = (effect: unknown): Answer | null =>
  // What was queued is what was handed in.
  effect !== null && 'card' in (effect as Effect)
    ? { kind: 'card', card: (effect as Extract<Effect, { card: Card }>).card, effects: [] }
    : null;

/** So many of the newest cards are offered while somebody types. Judgement. */
const CARDS_OFFERED = 500;

const offersIn = async (view: ShopView, kind: Suggested): Promise<readonly Suggestion[]> => {
  if (kind === 'cards')
    return (await latestCodes(view, CARDS_OFFERED)).map(({ code, words }) => ({
      label: `${code}  ${words}`,
      words: code,
    }));
  if (kind !== 'people') return [];
  return (await listPeople(view)).map(({ name }) => ({ label: name, words: name }));
};

/** An answer that leaves nothing behind but itself. */
class Refused extends Error {
  readonly answer: Answer;

  constructor(answer: Answer) {
    super('refused');
    this.answer = answer;
  }
}

/**
 * A desk whose shops keep records. A call is one change: whatever it does, what is to be
 * delivered because of it and the answer itself are kept together or not at all, and a call that
 * comes again gets the answer of the first time.
 */
export const openRecordsDesk = (
  fleet: readonly Command[],
  store: Store,
  options: RecordsDeskOptions,
): Desk => {
  const { platform, now, onAnswered = () => undefined, onFault = () => undefined } = options;
  const visits = new WeakMap<object, Visit>();
  const outsideOf = (call: Pick<Call, 'shop'>, person?: Call['person']): ShopOutside => ({
    platform,
    // Somebody who writes to the bot alone has a shop of their own.
    id: call.shop === '' ? `person:${person?.id ?? ''}` : call.shop,
    name: call.shop === '' ? (person?.name ?? '') : call.shop,
  });
  const viewOf = async (call: Pick<Call, 'shop'> & Partial<Call>): Promise<ShopView | null> => {
    const open = visits.get(call);
    if (open !== undefined) return open.shop;
    const id = await shopOf(store.read, outsideOf(call, call.person));
    return id === null ? null : viewShop(store.read, id, SHOP_WORDS);
  };

  const facts = async (call: Call): Promise<ShopFacts> => {
    const view = await viewOf(call);
    if (view === null)
      return { units: UNKNOWN_UNITS, names: { wheels: [], machines: [] }, last: null };
    const names = await spokenNames(view);
    const visit = visits.get(call);
    if (visit === undefined) {
      const { units } = await settingsOf(view);
      return { units, names, last: null, offers: (kind) => offersIn(view, kind) };
    }
    return {
      units: visit.settings.units,
      names,
      last: await lastCard(visit, call.place),
      visit,
      settle: (reply, context) => settled(reply, context, visit, options.program),
    };
  };

  const desk = openDesk(fleet, facts, {
    keep: () => undefined,
    recall: async (call, of) => {
      const view = await viewOf(call);
      if (view === null) return null;
      return (await answerTo<Answer>(view, of)) ?? postedCard(await effectOf(view, of));
    },
  });

  /** Enters the shop and acts, unless that was done before. */
  const change = <T>(call: Call, act: (shop: ShopChange, visit: Visit) => Promise<T>): Promise<T> =>
    store.transact(
      async (tx) => {
        const { person } = call;
        const { change: shop, ...entered } = await enterShop(
          tx,
          SHOP_WORDS,
          outsideOf(call, person),
          { ...person, groups: person.groups ?? [], manages: person.manages ?? null },
          now(),
        );
        const settings = await settingsOf(shop);
        const { directory = null } = call;
        const outsideId = (called: string): string =>
          directory?.person(called)?.id ?? options.outsideId?.(called) ?? called;
        const { person: who, role } = entered;
        return await act(shop, { shop, settings, person: who, role, outsideId, directory });
      },
      { repeatable: true },
    );

  const acted = (call: Call): Promise<Answer> =>
    change(call, async (shop, visit) => {
      const { answer } = await once(shop, call.interactionId, async () => {
        visits.set(call, visit);
        const given = await desk.answer(call).finally(() => visits.delete(call));
        if (given.kind === 'refusal') throw new Refused(given);
        return given;
      });
      return answer;
    });

  /** A refusal has changed nothing; only what it offers is kept, for its buttons. */
  const keptRefusal = (call: Call, given: Answer): Promise<Answer> =>
    change(call, async (shop) => {
      const { answer } = await once(shop, call.interactionId, () => Promise.resolve(given));
      return answer;
    });

  const unavailable = async (call: Call): Promise<Answer> => {
    const text = await textOf(call, desk).catch(() => '');
    return {
      kind: 'refusal',
      refusal: { code: 'unavailable', what: 'records', words: text },
      choices: [],
      units: UNKNOWN_UNITS,
      text,
    };
  };

  const answer: Desk['answer'] = async (call) => {
    try {
      const given = await acted(call).catch((error: unknown) => {
        if (error instanceof Refused) return keptRefusal(call, error.answer);
        throw error;
      });
      onAnswered();
      return given;
    } catch (error) {
      if (!(error instanceof StoreUnavailable)) throw error;
      onFault(error);
      return await unavailable(call);
    }
  };

  const suggest: Desk['suggest'] = async (call, asked) => {
    try {
      return await desk.suggest(call, asked);
    } catch (error) {
      if (!(error instanceof StoreUnavailable)) throw error;
      onFault(error);
      return [];
    }
  };

  /** Files are made from a view of one moment while they are sent, however large they are. */
  const download: Desk['download'] = async (call, file) => {
    const role = await change(call, (_, visit) => Promise.resolve(visit.role));
    const view = await viewOf(call);
    const offered = view === null ? null : offeredTo(role, view, file);
    return view === null || offered === null ? null : filePieces(store, view, file, offered);
  };

  const pinned: Desk['pinned'] = async (call) => {
    try {
      const view = await viewOf(call);
      return view === null ? [] : await pinnedIn(view, fleet);
    } catch (error) {
      if (!(error instanceof StoreUnavailable)) throw error;
      onFault(error);
      return [];
    }
  };

  return { ...desk, answer, suggest, download, pinned };
};

const named = (files: readonly ExportFile[], name: string): ExportFile | undefined =>
  files.find((each) => each.name === name);

/** What a file of this name belongs to, if this role may take it along. */
const offeredTo = (role: Role, view: ShopView, name: string): Offered | null =>
  FILES.find(
    ({ files, needs }) => atLeast(role, needs) && named(files(view), name) !== undefined,
  ) ?? null;

async function* filePieces(
  store: Store,
  { id }: ShopView,
  name: string,
  { files }: Offered,
): AsyncGenerator<string> {
  const view = await store.view();
  try {
    const file = named(files(viewShop(view.db, id, SHOP_WORDS)), name);
    if (file !== undefined) yield* file.pieces;
  } finally {
    await view.close();
  }
}

/** The person's words, to be repeated to them. */
const textOf = async (call: Call, desk: Desk): Promise<string> => {
  const { given } = call;
  if ('words' in given) return given.words;
  if ('path' in given) {
    const command = desk.fleet.find(({ path }) => path.join(' ') === given.path.join(' '));
    return command === undefined ? '' : lineOf(command, given.options);
  }
  const pressed = await desk.recall(call, given.pressed.of);
  return choicesIn(pressed)[given.pressed.choice]?.words ?? '';
};
