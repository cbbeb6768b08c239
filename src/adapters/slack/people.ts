import type { Person } from '../../desk/index.ts';
import type { Log } from '../common/log.ts';
import { within } from '../common/within.ts';
import { faultText } from './faults.ts';
import type { Sender } from './send.ts';

/** What Slack knows of a person's standing. */
export type Standing = Required<Pick<Person, 'groups' | 'manages'>>;
export type StandingOf = (sender: Sender, shop: string, person: string) => Promise<Standing>;

/** Until it is known, nobody has a standing. */
const NONE: Standing = { groups: [], manages: false };
/** Roles change by the week; a question comes by the minute. Judgement. */
const KNOWN_FOR_MS = 60_000;
/** An answer does not wait longer for it. Judgement. */
const PATIENCE_MS = 800;
const MOST = 5_000;

/** Asks once a minute for each person. */
export const openStanding = (log: Log, now: () => number = Date.now): StandingOf => {
  const known = new Map<string, { readonly at: number; readonly standing: Promise<Standing> }>();
  const look = async (sender: Sender, shop: string, person: string): Promise<Standing> => {
    try {
      const [groups, manages] = await Promise.all([
        sender.groups(person),
        sender.manages(person, shop),
      ]);
      return { groups, manages };
    } catch (error) {
      log.note('standing', { person, fault: faultText(error) });
      known.delete(`${shop} ${person}`);
      return NONE;
    }
  };
  return (sender, shop, person) => {
    const key = `${shop} ${person}`;
    const before = known.get(key);
    if (before !== undefined && now() - before.at < KNOWN_FOR_MS)
      return within(before.standing, PATIENCE_MS, NONE);
    const standing = look(sender, shop, person);
    known.set(key, { at: now(), standing });
    const [oldest] = known.keys();
    if (known.size > MOST && oldest !== undefined) known.delete(oldest);
    return within(standing, PATIENCE_MS, NONE);
  };
};
