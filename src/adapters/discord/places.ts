import { z } from 'zod';
import type { Call, MessageAddress } from '../../desk/index.ts';
import type { Sent } from './channels.ts';

/** A place as the records name it: a channel, and a thread in it. */
export type Where = { readonly channel: string; readonly thread: string | null };

export const whereOf = (place: string): Where => {
  const [channel = '', thread = ''] = place.split('/');
  return { channel, thread: thread === '' ? null : thread };
};

export const placeOf = ({ channel, thread }: Where): string => `${channel}/${thread ?? ''}`;

/** Where a reply to a place goes: a thread is a channel of its own. */
export const channelOf = ({ channel, thread }: Pick<Call['place'], 'channel' | 'thread'>): string =>
  thread ?? channel;

export const addressOf = (place: string, { message }: Sent): MessageAddress => ({ place, message });

/** The message that a thread hangs on has the thread's own id, and stands in the channel above. */
export const sentOf = ({ place, message }: MessageAddress): Sent => {
  const where = whereOf(place);
  return { channel: where.thread === message ? where.channel : channelOf(where), message };
};

const address = z.object({ place: z.string(), message: z.string() });
/** What an effect left behind for those that wait for it. */
export const addressIn = (outcome: unknown): MessageAddress => address.parse(outcome);
