/** Interactions: who asked, how long there is to answer, and what they were answered. */

import { Refused } from './refused.ts';
import type { File, Posted, Rooms } from './rooms.ts';
import type { Body } from './rules.ts';
import { FLAGS } from './rules.ts';
import { type Someone, snowflake } from './world.ts';

/** interactions/receiving-and-responding: three seconds to answer, a quarter of an hour to go on. */
const ACKNOWLEDGE_MS = 3_000;
const TOKEN_MS = 15 * 60_000;

/** Kinds of answers. */
const REPLY = 4;
const DEFER = 5;
const SUGGESTIONS = 8;
const FORM = 9;

export type Acknowledged = {
  readonly type: number;
  readonly data: Body;
  /** Since the person asked. */
  readonly ms: number;
};
export type Kind = 'command' | 'suggestion' | 'component' | 'submission';

export type Asked = {
  readonly id: string;
  readonly token: string;
  readonly kind: Kind;
  readonly someone: Someone;
  readonly acknowledged: Promise<Acknowledged | null>;
};

export type Times = {
  /** How long it may take to answer; below nothing where it is too late already. */
  readonly lasts?: number;
  /** How long the token is good for. */
  readonly tokenLasts?: number;
};

export type Form = { readonly asked: Asked; readonly body: Body };

type Open = Asked & {
  readonly until: number;
  readonly tokenUntil: number;
  readonly tell: (how: Acknowledged | null) => void;
  readonly since: number;
  taken: boolean;
  /** The message that stands for it; none yet while it is being waited for. */
  original: { readonly id: string; readonly isPrivate: boolean; isLoading: boolean } | null;
};

export const openInteractions = (rooms: Rooms, next: () => number) => {
  const open = new Map<string, Open>();
  const forms: Form[] = [];

  const ask = (
    kind: Kind,
    someone: Someone,
    { lasts = ACKNOWLEDGE_MS, tokenLasts = TOKEN_MS }: Times = {},
  ): Asked => {
    const id = snowflake(next());
    const token = `interaction-token-${id}`;
    let tell: Open['tell'] = () => undefined;
    const acknowledged = new Promise<Acknowledged | null>((done) => {
      const late = setTimeout(done, Math.max(0, lasts), null);
      tell = (how) => {
        clearTimeout(late);
        done(how);
      };
    });
    const now = Date.now();
    const asked: Open = {
      id,
      token,
      kind,
      someone,
      acknowledged,
      until: now + lasts,
      tokenUntil: now + tokenLasts,
      since: performance.now(),
      tell,
      taken: false,
      original: null,
    };
    open.set(token, asked);
    return asked;
  };

  const fits = ({ kind }: Open, type: number): boolean => {
    if (type === SUGGESTIONS || kind === 'suggestion')
      return type === SUGGESTIONS && kind === 'suggestion';
    return type === REPLY || type === DEFER || (type === FORM && kind !== 'submission');
  };

  const stored = (
    asked: Open,
    by: 'reply' | 'followUp',
    body: Body,
    files: readonly File[],
    isPrivate: boolean,
    id?: string,
  ): Posted =>
    rooms.store({
      by,
      channel: asked.someone.channel,
      only: isPrivate ? asked.someone.id : null,
      body,
      files,
      replyTo: null,
      ...(id === undefined ? {} : { id }),
    });

  const isHidden = (data: Body): boolean => (Number(data['flags'] ?? 0) & FLAGS.ephemeral) !== 0;

  /** The first answer; nobody's second. */
  const acknowledge = (id: string, token: string, body: Body, files: readonly File[]): void => {
    const asked = open.get(token);
    if (asked?.id !== id || Date.now() > asked.until)
      throw new Refused(404, 10_062, 'Unknown interaction');
    if (asked.taken) throw new Refused(400, 40_060, 'Interaction has already been acknowledged.');
    const type = Number(body['type']);
    if (!fits(asked, type)) throw new Refused(400, 50_035, 'Invalid Form Body');
    const data = (body['data'] ?? {}) as Body;
    asked.taken = true;
    if (type === FORM) forms.push({ asked, body: data });
    if (type === REPLY) {
      const { id: message } = stored(asked, 'reply', data, files, isHidden(data));
      asked.original = { id: message, isPrivate: isHidden(data), isLoading: false };
    }
    if (type === DEFER)
      asked.original = { id: snowflake(next()), isPrivate: isHidden(data), isLoading: true };
    asked.tell({ type, data, ms: performance.now() - asked.since });
  };

  const holder = (token: string): Open => {
    const asked = open.get(token);
    if (asked === undefined) throw new Refused(404, 10_015, 'Unknown Webhook');
    if (Date.now() > asked.tokenUntil) throw new Refused(401, 50_027, 'Invalid Webhook Token');
    return asked;
  };
  const original = (asked: Open): NonNullable<Open['original']> => {
    if (asked.original === null) throw new Refused(404, 10_008, 'Unknown Message');
    return asked.original;
  };
  /** What was being waited for is there. */
  const loaded = (asked: Open, body: Body, files: readonly File[]): Posted => {
    const waiting = original(asked);
    waiting.isLoading = false;
    return stored(asked, 'reply', body, files, waiting.isPrivate, waiting.id);
  };

  return {
    forms,
    ask,
    acknowledge,
    editOriginal: (token: string, body: Body, files: readonly File[]): Posted => {
      const asked = holder(token);
      const { id, isLoading } = original(asked);
      if (isLoading) return loaded(asked, body, files);
      return rooms.edit(rooms.messageAt(asked.someone.channel, id), body, files);
    },
    deleteOriginal: (token: string): void => {
      const asked = holder(token);
      const { id, isLoading } = original(asked);
      if (!isLoading) rooms.posted.splice(rooms.messageAt(asked.someone.channel, id), 1);
      asked.original = null;
    },
    followUp: (token: string, body: Body, files: readonly File[]): Posted => {
      const asked = holder(token);
      if (!asked.taken) throw new Refused(404, 10_015, 'Unknown Webhook');
      // The first message behind a waiting one takes its place, and is seen by whoever sees that.
      if (asked.original?.isLoading === true) return loaded(asked, body, files);
      return stored(asked, 'followUp', body, files, isHidden(body));
    },
  };
};
