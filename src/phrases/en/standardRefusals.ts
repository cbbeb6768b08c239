import type { CheckName } from '../../calc/index.ts';
import type { CardStopped, FourEyes, NotNow, Stale } from '../../refusal.ts';
import { checks } from './checks.ts';
import { thing } from './names.ts';
import { momentText } from './shopNames.ts';

const STATES: { readonly [S in NotNow['state']]: string } = {
  draft: 'is a draft',
  proposed: 'is proposed',
  approved: 'is approved',
  superseded: 'is superseded',
  retired: 'is retired',
};

const who = ({ by, at, zone }: NotNow): string =>
  by === '' ? `(${momentText({ at, zone })})` : `(${by}, ${momentText({ at, zone })})`;

/** What can be done instead, where it is now. */
const INSTEAD: {
  readonly [A in NotNow['asked']]: (part: string) => Partial<Record<NotNow['state'], string>>;
} = {
  save: (part) => ({
    approved: `Make a new revision of it: /knurl standard revise ${part} because …`,
    retired: `Take it up again: /knurl standard revise ${part} because …`,
    superseded: `Make a new revision of it: /knurl standard revise ${part} because …`,
  }),
  propose: (part) => ({
    proposed: 'It only has to be approved.',
    approved: `Propose a newer card: /knurl standard propose ${part} card … because …`,
    superseded: `Propose a newer card: /knurl standard propose ${part} card … because …`,
    retired: `Propose a newer card: /knurl standard propose ${part} card … because …`,
  }),
  approve: (part) => ({
    draft: `Propose it first: /knurl standard propose ${part}`,
    approved: 'There is nothing left to approve.',
    superseded: `Look at what took its place: /knurl standard history ${part}`,
    retired: `Look at why: /knurl standard history ${part}`,
  }),
  revise: (part) => ({
    draft: `Save another card over it: /knurl standard save ${part}`,
    proposed: 'Approve or retire it first.',
    superseded: `Look at what took its place: /knurl standard history ${part}`,
  }),
  use: (part) => ({
    draft: `Propose it: /knurl standard propose ${part}`,
    proposed: 'It has to be approved before it is set up by.',
    retired: `Look at why: /knurl standard history ${part}`,
  }),
  retire: (part) => ({
    superseded: `Look at what took its place: /knurl standard history ${part}`,
    retired: 'There is nothing left to retire.',
  }),
};

/** A standard is not where it would have to be: where it is, since when, and what to do instead. */
export const notNow = (fault: NotNow): string => {
  const { asked, part, revision, state } = fault;
  const instead = INSTEAD[asked](part)[state] ?? `See /knurl standard history ${part}`;
  return `${part} rev ${String(revision)} ${STATES[state]} ${who(fault)}. Nothing was changed. ${instead}`;
};

export const fourEyes = ({ part, revision, people }: FourEyes): string => {
  const ask =
    people.length === 0 ? 'nobody else here may, so name another supervisor' : people.join(' or ');
  return `You proposed ${part} rev ${String(revision)}, and this shop wants two people for a standard. Ask ${ask}.`;
};

const isCheck = (name: string): name is CheckName => name in checks;

export const cardStopped = ({ card, check }: CardStopped): string => {
  const name = isCheck(check) ? checks[check].label.toLowerCase() : check;
  return `Card ${card} stops at ${name}: a set-up that is not to be run is no standard. Work out one that passes, then save that.`;
};

/** Somebody was there first. */
export const stale = ({ what, by, when, zone = 'UTC' }: Stale): string => {
  const at = Date.parse(when);
  const moment = Number.isNaN(at) ? when : momentText({ at, zone });
  return `${thing(what)} was changed by ${by}, ${moment}. Nothing of yours was done. Look at it again, then repeat your change.`;
};
