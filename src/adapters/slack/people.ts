import type { Person } from '../../desk/index.ts';
import type { Log } from '../common/log.ts';
import { within } from '../common/within.ts';
import { faultText } from './faults.ts';
import type { Sender, UserGroup } from './send.ts';

/** What Slack knows of a person's standing. */
export type Standing = Required<Pick<Person, 'groups' | 'manages'>>;

/** What is asked of a workspace about its people. */
export type Looker = Pick<Sender, 'user' | 'groups'>;

export type People = {
  readonly standingOf: (shop: string, person: string) => Promise<Standing>;
  /** As they are called there; their id where that is not known. */
  readonly nameOf: (shop: string, person: string) => Promise<string>;
  readonly groupsOf: (shop: string) => Promise<readonly UserGroup[]>;
};

/** Groups change by the week, a question comes by the minute. Judgement. */
const GROUPS_KEPT_MS = 60_000;
/** Who manages a workspace, and what people are called, changes by the year. Judgement. */
const PERSON_KEPT_MS = 10 * 60_000;
/** After a fault it is asked again, but not by every question. Judgement. */
const AGAIN_AFTER_MS = 5_000;
/** An answer does not wait longer for it. Judgement. */
const PATIENCE_MS = 800;
const MOST = 5_000;

type Keeping<T> = {
  readonly ask: (key: string) => Promise<T>;
  /** Until something is known. */
  readonly none: T;
  readonly keptMs: number;
  readonly now: () => number;
  readonly onFault: (error: unknown) => void;
};

/** Asks once for everybody who wants to know, and keeps what was known where asking fails. */
const keeping = <T>({ ask, none, keptMs, now, onFault }: Keeping<T>) => {
  type Entry = { until: number; last: T; asked: Promise<T> };
  const known = new Map<string, Entry>();
  return (key: string): Promise<T> => {
    const before = known.get(key);
    if (before !== undefined && now() < before.until)
      return within(before.asked, PATIENCE_MS, before.last);
    const entry: Entry = {
      until: now() + keptMs,
      last: before?.last ?? none,
      asked: Promise.resolve(none),
    };
    entry.asked = ask(key).then(
      (found) => {
        entry.last = found;
        return found;
      },
      (error: unknown) => {
        onFault(error);
        entry.until = now() + AGAIN_AFTER_MS;
        return entry.last;
      },
    );
    known.delete(key);
    known.set(key, entry);
    const [oldest] = known.keys();
    if (known.size > MOST && oldest !== undefined) known.delete(oldest);
    return within(entry.asked, PATIENCE_MS, entry.last);
  };
};

/** No id of Slack's has a space in it. */
const BETWEEN = ' ';

export const openPeople = (
  lookIn: (shop: string) => Looker | null,
  log: Log,
  now: () => number = Date.now,
): People => {
  const onFault = (what: string) => (error: unknown) => {
    log.note(what, { fault: faultText(error) });
  };
  const groups = keeping<readonly UserGroup[]>({
    ask: async (shop) => (await lookIn(shop)?.groups()) ?? [],
    none: [],
    keptMs: GROUPS_KEPT_MS,
    now,
    onFault: onFault('user groups'),
  });
  const users = keeping<{ readonly name: string | null; readonly manages: boolean }>({
    ask: async (key) => {
      const [shop = '', person = ''] = key.split(BETWEEN);
      return (await lookIn(shop)?.user(person, shop)) ?? { name: null, manages: false };
    },
    none: { name: null, manages: false },
    keptMs: PERSON_KEPT_MS,
    now,
    onFault: onFault('person'),
  });
  const userOf = (shop: string, person: string) => users(`${shop}${BETWEEN}${person}`);
  return {
    standingOf: async (shop, person) => {
      const [all, { manages }] = await Promise.all([groups(shop), userOf(shop, person)]);
      const own = all.filter(({ users: members }) => members.includes(person));
      return { groups: own.map(({ id }) => id), manages };
    },
    nameOf: async (shop, person) => (await userOf(shop, person)).name ?? person,
    groupsOf: groups,
  };
};
