import { setTimeout as pause } from 'node:timers/promises';
import type { Answer, Call, Desk } from '../../desk/index.ts';
import type { Book, SpokenCard } from '../../phrases/index.ts';
import type { Log } from '../common/log.ts';
import { hasMoreCautions, sentence, spoken } from '../common/spoken.ts';
import { faultText, isOver, isRefused } from './faults.ts';
import { FileRefused, filesFor } from './files.ts';
import { LIMITS } from './limits.ts';
import { addPictures, type Draw, type Standing } from './pictures.ts';
import { channelOf } from './places.ts';
import { type ExtraButton, type Message, openly, render, type Shown } from './render.ts';
import type { Acknowledged, Handle, Sender } from './send.ts';

export type FlowOptions = {
  readonly desk: Desk;
  readonly book: Book;
  readonly sender: Sender;
  readonly log: Log;
  /** Null where no pictures are wanted. */
  readonly draw: Draw | null;
  /** How long an answer may take before it is acknowledged without one. */
  readonly deferAfterMs: number;
};

/** What is to be shown, before anything is known of messages. */
type Reply = {
  readonly card: SpokenCard;
  readonly isPrivate: boolean;
  readonly extra: readonly ExtraButton[];
  /** The interaction whose answer it is. */
  readonly of: string;
  /** None where the adapter says something of its own. */
  readonly answer: Answer | null;
};

const extrasOf = (answer: Answer, call: Call, of: string, book: Book): readonly ExtraButton[] => {
  const common = { of, isPrivate: call.place.isPrivate };
  if (answer.kind === 'card')
    return hasMoreCautions(answer)
      ? [{ control: { ...common, control: 'cautions' }, label: book.chat.cautions }]
      : [];
  const correctable = answer.text !== '' && answer.text.length <= LIMITS.modalText;
  return correctable
    ? [{ control: { ...common, control: 'correct' }, label: book.chat.correct }]
    : [];
};

/** What a call still needs before it is asked: names for mentions, the text of a file. */
export type Prepare = (call: Call) => Promise<Call>;
const AS_IT_IS: Prepare = (call) => Promise.resolve(call);

export const openFlow = ({ desk, book, sender, log, draw, deferAfterMs }: FlowOptions) => {
  const own = (call: Call, card: SpokenCard, extra: readonly ExtraButton[] = []): Reply => ({
    card,
    isPrivate: true,
    extra,
    of: call.interactionId,
    answer: null,
  });

  const replyOf = (call: Call, answer: Answer, of = call.interactionId): Reply => ({
    card: spoken(answer, book),
    // A refusal is between the bot and whoever asked.
    isPrivate: call.place.isPrivate || answer.kind === 'refusal',
    extra: extrasOf(answer, call, of, book),
    of,
    answer,
  });

  const replyFor = async (call: Call, prepare: Prepare): Promise<Reply> => {
    try {
      return replyOf(call, await desk.answer(await prepare(call)));
    } catch (error) {
      if (error instanceof FileRefused) return own(call, sentence(error.message));
      log.fault('answer', { interaction: call.interactionId, fault: faultText(error), error });
      return own(call, sentence(book.chat.fault));
    }
  };

  const shownAs = (call: Call, { card, of, extra, isPrivate }: Reply): Shown => ({
    card,
    of,
    extra,
    isPrivate,
    wasPrivate: call.place.isPrivate,
  });

  /** The answer was made and is kept: whoever asked can still have it. */
  const showButton = ({ of }: Reply, call: Call): ExtraButton => ({
    control: { control: 'show', of, isPrivate: true, person: call.person.id },
    label: book.discord.showMe,
  });

  /** In the channel: what has no private side, or came too late for it. */
  const inChannel = async (
    call: Call,
    messages: readonly Message[],
    { from = 0, replyTo }: { from?: number; replyTo?: string } = {},
  ): Promise<Standing | null> => {
    const place = channelOf(call.place);
    let first: Standing | null = null;
    for (const [index, message] of messages.entries()) {
      const key = `${call.interactionId} ${String(from + index)}`;
      const sent = await sender.post(place, message, key, replyTo === undefined ? {} : { replyTo });
      first ??= { message, change: (changed) => sender.edit(sent, changed) };
    }
    return first;
  };

  /**
   * The interaction is over. What is not private is said in the channel to whoever asked; of what
   * is, only that it is ready.
   */
  const late = async (handle: Handle, call: Call, reply: Reply): Promise<Standing | null> => {
    const rings = { users: [handle.person] };
    if (!reply.isPrivate) {
      const shown = { ...shownAs(call, reply), rings, note: book.chat.lateAnswer };
      return await inChannel(call, render(shown));
    }
    const kept = reply.answer !== null;
    const ready = own(
      call,
      sentence(kept ? book.discord.answerReady : book.chat.tooLate),
      kept ? [showButton(reply, call)] : [],
    );
    await inChannel(call, render({ ...shownAs(call, ready), isPrivate: false, rings }));
    return null;
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

  const original = (handle: Handle, message: Message): Standing => ({
    message,
    change: (changed) => sender.editOriginal(handle, changed),
  });

  /** After a deferral: the reply takes the place of the waiting message, if it may be seen there. */
  const settle = async (
    handle: Handle,
    call: Call,
    reply: Reply,
    [first, ...rest]: readonly Message[],
  ): Promise<Standing | null> => {
    if (first === undefined) return null;
    if (reply.isPrivate && !call.place.isPrivate) {
      await sender.deleteOriginal(handle);
      await sender.followUp(handle, first);
      await others(handle, call, rest, true);
      return null;
    }
    await sender.editOriginal(handle, first);
    await others(handle, call, rest, reply.isPrivate);
    return original(handle, first);
  };

  /** Sends a reply, and gives back the message that pictures can be added to. */
  const deliver = async (
    handle: Handle,
    call: Call,
    reply: Reply,
    deferred: Acknowledged | null,
  ): Promise<Standing | null> => {
    const messages = render(shownAs(call, reply));
    const [first, ...rest] = messages;
    if (first === undefined || deferred === 'before') return null;
    if (deferred === 'tooLate') return await late(handle, call, reply);
    if (deferred === 'taken') {
      try {
        return await settle(handle, call, reply, messages);
      } catch (error) {
        if (!isOver(error)) throw error;
        return await late(handle, call, reply);
      }
    }
    const taken = await sender.reply(handle, first);
    if (taken === 'before') return null;
    if (taken === 'tooLate') return await late(handle, call, reply);
    await others(handle, call, rest, reply.isPrivate);
    return original(handle, first);
  };

  /** One short sentence: what was asked for is done and kept, or it failed and nothing changed. */
  const excuseFor = (call: Call, reply: Reply): Reply =>
    reply.answer === null
      ? own(call, sentence(book.chat.fault))
      : own(call, sentence(book.discord.unsent), [showButton(reply, call)]);

  /** The last resort, by whichever way is still open. */
  const excuse = async (
    handle: Handle,
    call: Call,
    reply: Reply,
    error: unknown,
  ): Promise<void> => {
    log.fault('send', { interaction: call.interactionId, fault: faultText(error) });
    const [message] = render(shownAs(call, excuseFor(call, reply)));
    if (message === undefined) return;
    try {
      const taken = await sender.reply(handle, message);
      if (taken === 'before') await sender.followUp(handle, message);
    } catch (second) {
      log.fault('excuse', { interaction: call.interactionId, fault: faultText(second) });
    }
  };

  const withPictures = async (
    call: Call,
    { answer }: Reply,
    standing: Standing | null,
  ): Promise<void> => {
    if (draw === null || answer === null || standing === null) return;
    const onFault = (error: unknown): void =>
      log.fault('picture', { interaction: call.interactionId, fault: faultText(error) });
    await addPictures({ draw, noPicture: book.terminal.noPicture, onFault }, answer, standing);
  };

  /** Files go to whoever asked for them, and to nobody else. */
  const withFiles = async (
    call: Call,
    { answer }: Reply,
    send: (file: Message, index: number) => Promise<unknown>,
  ): Promise<void> => {
    if (answer === null) return;
    try {
      const files = await filesFor(desk, book, call, answer);
      for (const [index, file] of files.entries()) await send(file, index);
    } catch (error) {
      log.fault('files', { interaction: call.interactionId, fault: faultText(error) });
      if (!isRefused(error, 'cannotSendToPerson')) return;
      const shown = shownAs(call, own(call, sentence(book.discord.filesClosed)));
      const key = { from: FILES_FROM };
      await inChannel(call, render({ ...shown, isPrivate: false }), key).catch(
        (second: unknown) => {
          log.fault('excuse', { interaction: call.interactionId, fault: faultText(second) });
        },
      );
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
    const early = await Promise.race([making, pause(left, null, { signal: patience.signal })]);
    patience.abort();
    let standing: Standing | null = null;
    try {
      const deferred = early === null ? await sender.defer(handle, call.place.isPrivate) : null;
      standing = await deliver(handle, call, early ?? (await making), deferred);
    } catch (error) {
      await excuse(handle, call, await making, error);
      return;
    }
    const reply = early ?? (await making);
    await withPictures(call, reply, standing);
    if (standing !== null) await withFiles(call, reply, (file) => sender.followUp(handle, file));
  };

  return {
    /** An interaction: acknowledged in time, answered when the answer is there. */
    answer: (
      handle: Handle,
      call: Call,
      { since = performance.now(), prepare = AS_IT_IS }: { since?: number; prepare?: Prepare } = {},
    ): Promise<void> => answering(handle, call, replyFor(call, prepare), since),

    /** Something said without asking the desk. */
    say: (handle: Handle, call: Call, card: SpokenCard): Promise<void> =>
      answering(handle, call, Promise.resolve(own(call, card)), performance.now()),

    /** An answer that was given before, to whom it is for. */
    show: (handle: Handle, call: Call, answer: Answer, of: string): Promise<void> =>
      answering(handle, call, Promise.resolve(replyOf(call, answer, of)), performance.now()),

    /** The platform gave no time for a form: said where everybody may see it, to whoever pressed. */
    formLate: async (handle: Handle, call: Call): Promise<void> => {
      const shown = shownAs(call, own(call, sentence(book.discord.formLate)));
      const rings = { users: [handle.person] };
      await inChannel(call, render({ ...shown, isPrivate: false, rings }));
    },

    /** A message in a channel: there is nothing to acknowledge, and no private reply. */
    answerMessage: async (call: Call, message: string, prepare: Prepare): Promise<void> => {
      const reply = await replyFor(call, prepare);
      let standing: Standing | null = null;
      try {
        const shown = { ...shownAs(call, reply), isPrivate: false };
        standing = await inChannel(call, render(shown), { replyTo: message });
      } catch (error) {
        log.fault('send', { interaction: call.interactionId, fault: faultText(error) });
        const shown = { ...shownAs(call, excuseFor(call, reply)), isPrivate: false };
        await inChannel(call, render(shown), { from: EXCUSE_FROM }).catch((second: unknown) => {
          log.fault('excuse', { interaction: call.interactionId, fault: faultText(second) });
        });
        return;
      }
      await withPictures(call, reply, standing);
      await withFiles(call, reply, async (file, index) => {
        const direct = await sender.directChannel(call.person.id);
        await sender.post(direct, openly(file), `${call.interactionId} file ${String(index)}`);
      });
    },
  };
};
export type Flow = ReturnType<typeof openFlow>;

/** Apart from the messages of any card. */
const EXCUSE_FROM = 900;
const FILES_FROM = 800;
