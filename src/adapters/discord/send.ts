import { setTimeout as pause } from 'node:timers/promises';
import {
  type APIModalInteractionResponseCallbackData,
  InteractionResponseType,
  MessageFlags,
  type REST,
  type RequestData,
  Routes,
} from 'discord.js';
import { z } from 'zod';
import { isPassing, isRefused } from './faults.ts';
import { LIMITS } from './limits.ts';
import type { Message } from './render.ts';

/** An interaction as far as answering it needs it. */
export type Handle = {
  readonly application: string;
  readonly id: string;
  readonly token: string;
  readonly channel: string;
  readonly person: string;
};

/** How the platform took an acknowledgement. */
export type Acknowledged =
  | 'taken'
  /** By another process, or by an earlier delivery of the same event. */
  | 'before'
  | 'tooLate';

export type Sent = { readonly channel: string; readonly message: string };

/** Judgement: three tries within what a person waits; the outbox has its own, longer patience. */
const TRIES = 3;
const FIRST_PAUSE_MS = 150;

const sentShape = z.object({ id: z.string(), channel_id: z.string() });
const sentOf = (response: unknown): Sent => {
  const { id, channel_id } = sentShape.parse(response);
  return { channel: channel_id, message: id };
};

/** Tries again what may go well the next time. The client itself retries only where it is paused. */
export const trying = async <T>(call: (attempt: number) => Promise<T>): Promise<T> => {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await call(attempt);
    } catch (error) {
      if (attempt >= TRIES || !isPassing(error)) throw error;
      await pause(FIRST_PAUSE_MS * 2 ** (attempt - 1));
    }
  }
};

const request = ({ body, files }: Message, more: object = {}): RequestData => ({
  body: { ...body, ...more },
  files: [...files],
});

/** An edit keeps the audience the message was made for. */
const editRequest = (message: Message): RequestData =>
  request(message, { flags: message.body.flags & ~MessageFlags.Ephemeral });

export type Sender = ReturnType<typeof openSender>;

/** Every call to Discord, each made so that a second one does no second thing. */
export const openSender = (rest: REST) => {
  const callback = (handle: Handle, request: RequestData): Promise<Acknowledged> =>
    trying(async (attempt) => {
      try {
        await rest.post(Routes.interactionCallback(handle.id, handle.token), {
          ...request,
          auth: false,
        });
        return 'taken';
      } catch (error) {
        // The try before went through and only its answer was lost.
        if (isRefused(error, 'alreadyAcknowledged')) return attempt > 1 ? 'taken' : 'before';
        if (isRefused(error, 'unknownInteraction')) return 'tooLate';
        throw error;
      }
    });

  const webhook = ({ application, token }: Handle) => Routes.webhook(application, token);
  const original = ({ application, token }: Handle) =>
    Routes.webhookMessage(application, token, '@original');

  return {
    reply: (handle: Handle, message: Message) =>
      callback(handle, {
        body: { type: InteractionResponseType.ChannelMessageWithSource, data: message.body },
        files: [...message.files],
      }),
    defer: (handle: Handle, isPrivate: boolean) =>
      callback(handle, {
        body: {
          type: InteractionResponseType.DeferredChannelMessageWithSource,
          data: { flags: isPrivate ? MessageFlags.Ephemeral : 0 },
        },
      }),
    form: (handle: Handle, form: APIModalInteractionResponseCallbackData) =>
      callback(handle, { body: { type: InteractionResponseType.Modal, data: form } }),
    suggest: (handle: Handle, choices: readonly { name: string; value: string }[]) =>
      callback(handle, {
        body: {
          type: InteractionResponseType.ApplicationCommandAutocompleteResult,
          data: { choices },
        },
      }),
    editOriginal: (handle: Handle, message: Message) =>
      trying(() => rest.patch(original(handle), { ...editRequest(message), auth: false })),
    deleteOriginal: (handle: Handle) =>
      trying(() => rest.delete(original(handle), { auth: false })),
    /** Has no key of its own: after a fault it may stand twice, which is better than not at all. */
    followUp: (handle: Handle, message: Message) =>
      trying(() => rest.post(webhook(handle), { ...request(message), auth: false })),
    /** The nonce makes a second copy of the same message the first one. */
    post: async (channel: string, message: Message, nonce: string, replyTo?: string) =>
      sentOf(
        await trying(() =>
          rest.post(
            Routes.channelMessages(channel),
            request(message, {
              nonce: nonce.slice(-LIMITS.nonce),
              enforce_nonce: true,
              ...(replyTo === undefined
                ? {}
                : { message_reference: { message_id: replyTo, fail_if_not_exists: false } }),
            }),
          ),
        ),
      ),
    edit: async ({ channel, message: id }: Sent, message: Message) =>
      sentOf(
        await trying(() => rest.patch(Routes.channelMessage(channel, id), editRequest(message))),
      ),
    pin: ({ channel, message }: Sent) =>
      trying(() => rest.put(Routes.channelMessagesPin(channel, message))),
    unpin: ({ channel, message }: Sent) =>
      trying(() => rest.delete(Routes.channelMessagesPin(channel, message))),
    /** The thread of a message has the message's own id, so a second one is refused. */
    thread: async ({ channel, message }: Sent, name: string): Promise<string> => {
      try {
        await trying(() =>
          rest.post(Routes.threads(channel, message), {
            body: { name: name.slice(0, LIMITS.threadName) },
          }),
        );
      } catch (error) {
        if (!isRefused(error, 'threadExists')) throw error;
      }
      return message;
    },
  };
};
