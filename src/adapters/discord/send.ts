import {
  type APIModalInteractionResponseCallbackData,
  InteractionResponseType,
  MessageFlags,
  type REST,
  type RequestData,
  Routes,
} from 'discord.js';
import { editRequest, openChannels, request } from './channels.ts';
import { isRefused, trying } from './faults.ts';
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
    ...openChannels(rest),
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
  };
};
