import { setTimeout as pause } from 'node:timers/promises';
import type { Answer, Call, Desk } from '../../desk/index.ts';
import type { Book, SpokenCard } from '../../phrases/index.ts';
import type { Log } from '../common/log.ts';
import type { Drawn } from '../common/pieces.ts';
import { hasMoreCautions, sentence, spoken } from '../common/spoken.ts';
import { faultText, isRefused } from './faults.ts';
import { LIMITS } from './limits.ts';
import { channelOf } from './receive.ts';
import { type ExtraButton, type Message, render, type Shown } from './render.ts';
import type { Acknowledged, Handle, Sender } from './send.ts';

/** Draws what an answer shows; nothing where it shows nothing. */
export type Draw = (answer: Answer) => Promise<readonly Drawn[]>;

export type FlowOptions = {
  readonly desk: Desk;
  readonly book: Book;
  readonly sender: Sender;
  readonly log: Log;
  readonly draw: Draw;
  /** How long an answer may take before it is acknowledged without one. */
  readonly deferAfterMs: number;
};

/** What is to be shown, before anything is known of messages. */
type Reply = {
  readonly card: SpokenCard;
  readonly isPrivate: boolean;
  readonly pictures: readonly Drawn[];
  readonly extra: readonly ExtraButton[];
};

const extrasOf = (answer: Answer, call: Call, book: Book): readonly ExtraButton[] => {
  const common = { of: call.interactionId, isPrivate: call.place.isPrivate };
  if (answer.kind === 'card')
    return hasMoreCautions(answer)
      ? [{ control: { ...common, control: 'cautions' }, label: book.chat.cautions }]
      : [];
  const correctable = answer.text !== '' && answer.text.length <= LIMITS.modalText;
  return correctable
    ? [{ control: { ...common, control: 'correct' }, label: book.chat.correct }]
    : [];
};

export const openFlow = ({ desk, book, sender, log, draw, deferAfterMs }: FlowOptions) => {
  const plain = (card: SpokenCard): Reply => ({ card, isPrivate: true, pictures: [], extra: [] });

  const replyFor = async (call: Call): Promise<Reply> => {
    try {
      const answer = await desk.answer(call);
      return {
        card: spoken(answer, book),
        // A refusal is between the bot and whoever asked.
        isPrivate: call.place.isPrivate || answer.kind === 'refusal',
        pictures: await draw(answer),
        extra: extrasOf(answer, call, book),
      };
    } catch (error) {
      log.fault('answer', { interaction: call.interactionId, fault: faultText(error), error });
      return plain(sentence(book.chat.fault));
    }
  };

  const shownAs = (call: Call, reply: Reply): Shown => ({
    card: reply.card,
    of: call.interactionId,
    pictures: reply.pictures,
    extra: reply.extra,
    isPrivate: reply.isPrivate,
    wasPrivate: call.place.isPrivate,
  });

  /** In the channel: what has no private side, or came too late for it. */
  const inChannel = async (
    call: Call,
    messages: readonly Message[],
    { from = 0, replyTo }: { from?: number; replyTo?: string } = {},
  ): Promise<void> => {
    const place = channelOf(call.place);
    for (const [index, message] of messages.entries()) {
      const nonce = `${call.interactionId}-${String(from + index)}`;
      await sender.post(place, message, nonce, replyTo);
    }
  };

  /** The interaction is over: what is not private is said in the channel to whoever asked. */
  const late = async (handle: Handle, call: Call, reply: Reply): Promise<void> => {
    const rings = { users: [handle.person] };
    // A refusal may be said again when asked again; a private answer never becomes public.
    const said = reply.isPrivate
      ? { ...shownAs(call, plain(sentence(book.chat.tooLate))), isPrivate: false, rings }
      : { ...shownAs(call, reply), rings, note: book.chat.lateAnswer };
    await inChannel(call, render(said));
  };

  /** Messages after the first. */
  const others = async (
    handle: Handle,
    call: Call,
    rest: readonly Message[],
    isPrivate: boolean,
  ): Promise<void> => {
    for (const [index, message] of rest.entries()) {
      if (isPrivate) {
        await sender.followUp(handle, message);
        continue;
      }
      try {
        await inChannel(call, [message], { from: index + 1 });
      } catch (error) {
        // The bot may answer where it may not write by itself.
        if (!isRefused(error, 'missingAccess', 'missingPermission', 'unknownChannel')) throw error;
        await sender.followUp(handle, message);
      }
    }
  };

  /** After a deferral: the reply takes the place of the waiting message, if it may be seen there. */
  const settle = async (
    handle: Handle,
    call: Call,
    reply: Reply,
    [first, ...rest]: readonly Message[],
  ): Promise<void> => {
    if (first === undefined) return;
    if (reply.isPrivate && !call.place.isPrivate) {
      await sender.deleteOriginal(handle);
      await sender.followUp(handle, first);
    } else await sender.editOriginal(handle, first);
    await others(handle, call, rest, reply.isPrivate);
  };

  const isOver = (error: unknown): boolean =>
    isRefused(error, 'unknownInteraction', 'unknownWebhook', 'unknownMessage', 'expiredToken');

  const deliver = async (
    handle: Handle,
    call: Call,
    reply: Reply,
    deferred: Acknowledged | null,
  ): Promise<void> => {
    const messages = render(shownAs(call, reply));
    const [first, ...rest] = messages;
    if (first === undefined) return;
    if (deferred === 'before') return;
    if (deferred === 'tooLate') {
      await late(handle, call, reply);
      return;
    }
    if (deferred === 'taken') {
      try {
        await settle(handle, call, reply, messages);
      } catch (error) {
        if (!isOver(error)) throw error;
        await late(handle, call, reply);
      }
      return;
    }
    const taken = await sender.reply(handle, first);
    if (taken === 'tooLate') await late(handle, call, reply);
    if (taken === 'taken') await others(handle, call, rest, reply.isPrivate);
  };

  /** The last resort: one short sentence, by whichever way is still open. */
  const excuse = async (handle: Handle, call: Call, error: unknown): Promise<void> => {
    log.fault('send', { interaction: call.interactionId, fault: faultText(error) });
    const [message] = render(shownAs(call, plain(sentence(book.chat.fault))));
    if (message === undefined) return;
    try {
      const taken = await sender.reply(handle, message);
      if (taken === 'before') await sender.followUp(handle, message);
    } catch (second) {
      log.fault('excuse', { interaction: call.interactionId, fault: faultText(second) });
    }
  };

  /** Waits for an answer as long as the platform allows, and then without holding anybody up. */
  const answering = async (
    handle: Handle,
    call: Call,
    making: Promise<Reply>,
    since: number,
  ): Promise<void> => {
    const patience = new AbortController();
    const left = Math.max(0, deferAfterMs - (performance.now() - since));
    try {
      const early = await Promise.race([making, pause(left, null, { signal: patience.signal })]);
      patience.abort();
      const deferred = early === null ? await sender.defer(handle, call.place.isPrivate) : null;
      await deliver(handle, call, early ?? (await making), deferred);
    } catch (error) {
      await excuse(handle, call, error);
    }
  };

  return {
    /** An interaction: acknowledged in time, answered when the answer is there. */
    answer: (handle: Handle, call: Call, since = performance.now()): Promise<void> =>
      answering(handle, call, replyFor(call), since),

    /** Something said without asking the desk. */
    say: (handle: Handle, call: Call, card: SpokenCard): Promise<void> =>
      answering(handle, call, Promise.resolve(plain(card)), performance.now()),

    /** A message in a channel: there is nothing to acknowledge, and no private reply. */
    answerMessage: async (call: Call, message: string): Promise<void> => {
      const reply = await replyFor(call);
      const shown = { ...shownAs(call, reply), isPrivate: false };
      try {
        await inChannel(call, render(shown), { replyTo: message });
      } catch (error) {
        log.fault('send', { interaction: call.interactionId, fault: faultText(error) });
        const excuseFor = shownAs(call, plain(sentence(book.chat.fault)));
        await inChannel(call, render({ ...excuseFor, isPrivate: false }), { from: 9 }).catch(
          (second: unknown) => {
            log.fault('excuse', { interaction: call.interactionId, fault: faultText(second) });
          },
        );
      }
    },
  };
};
export type Flow = ReturnType<typeof openFlow>;
