import type { Answer, Call, Desk } from '../../desk/index.ts';
import type { Book, SpokenCard } from '../../phrases/index.ts';
import type { Log } from '../common/log.ts';
import { hasMoreCautions, sentence, spoken } from '../common/spoken.ts';
import { faultText, isRefused } from './faults.ts';
import { filesOf, sendFiles } from './files.ts';
import { LIMITS } from './limits.ts';
import { withMentions } from './mentions.ts';
import type { People } from './people.ts';
import { change, type Draw, sendPictures, withoutPicture } from './pictures.ts';
import type { Handle } from './receive.ts';
import { controlButton, type ExtraButton, type Message, render } from './render.ts';
import type { Sender, Sent, Where } from './send.ts';

export type FlowOptions = {
  readonly desk: Desk;
  readonly book: Book;
  readonly log: Log;
  /** Null where no pictures are wanted. */
  readonly draw: Draw | null;
  readonly people: People;
};

/** What is to be shown, before anything is known of messages. */
type Reply = {
  readonly card: SpokenCard;
  readonly isPrivate: boolean;
  readonly extra: readonly ExtraButton[];
  /** What its pictures are drawn from; null where the bot says something of its own. */
  readonly answer: Answer | null;
};

type Standing = { readonly sent: Sent; readonly message: Message };

const extrasOf = (answer: Answer, call: Call, book: Book): readonly ExtraButton[] => {
  const common = { of: call.interactionId, isPrivate: call.place.isPrivate };
  if (answer.kind === 'card')
    return hasMoreCautions(answer)
      ? [controlButton({ ...common, control: 'cautions' }, book.chat.cautions)]
      : [];
  const correctable = answer.text !== '' && answer.text.length <= LIMITS.inputText;
  return correctable ? [controlButton({ ...common, control: 'correct' }, book.chat.correct)] : [];
};

const whereOf = (handle: Handle): Where | null =>
  handle.channel === null ? null : { channel: handle.channel, thread: handle.thread };

/** The ways a message can go, the one that shows it best first. */
type Way = () => Promise<unknown>;

export type Flow = ReturnType<typeof openFlow>;

export const openFlow = ({ desk, book, log, draw, people }: FlowOptions) => {
  /** The desk also hears what this person may by the platform's own reckoning, and whom a line names. */
  const known = async (call: Call): Promise<Call> => {
    const { shop, person } = call;
    const [standing, groups] = await Promise.all([
      people.standingOf(shop, person.id),
      people.groupsOf(shop),
    ]);
    const nameOf = (id: string): Promise<string> => people.nameOf(shop, id);
    const named = await withMentions(call, { nameOf, groups });
    // A mention comes without the name of whoever wrote it.
    const name = person.name === person.id ? await nameOf(person.id) : person.name;
    return { ...named, person: { ...person, name, ...standing } };
  };
  const ask = async (call: Call): Promise<Answer> => await desk.answer(await known(call));

  const own = (card: SpokenCard, extra: readonly ExtraButton[] = []): Reply => ({
    card,
    isPrivate: true,
    extra,
    answer: null,
  });

  const replyOf = (call: Call, answer: Answer): Reply => ({
    card: spoken(answer, book),
    // A refusal is between the bot and whoever asked.
    isPrivate: call.place.isPrivate || answer.kind === 'refusal',
    extra: extrasOf(answer, call, book),
    answer,
  });

  const replyFor = async (call: Call, asked: Promise<Answer>): Promise<Reply> => {
    try {
      return replyOf(call, await asked);
    } catch (error) {
      log.fault('answer', { interaction: call.interactionId, fault: faultText(error), error });
      return own(sentence(book.chat.fault));
    }
  };

  /** Goes down the ways until one is open. */
  const firstOpen = async (call: Call, ways: readonly Way[]): Promise<void> => {
    let last: unknown = new Error('no way to reply');
    for (const way of ways) {
      try {
        await way();
        return;
      } catch (error) {
        log.note('way closed', { interaction: call.interactionId, fault: faultText(error) });
        last = error;
      }
    }
    throw last;
  };

  const privately = async (
    sender: Sender,
    handle: Handle,
    call: Call,
    messages: readonly Message[],
    since: number,
  ): Promise<void> => {
    const where = whereOf(handle);
    const { responseUrl: url, thread, person } = handle;
    for (const [index, message] of messages.entries()) {
      const key = `${call.interactionId}-${String(since + index)}`;
      const respond = (address: string) => () =>
        sender.respond(address, message, { isPrivate: true, thread });
      await firstOpen(call, [
        ...(url === null || index >= LIMITS.responses ? [] : [respond(url)]),
        ...(where === null ? [] : [() => sender.whisper(where, person.id, message)]),
        () => sender.direct(person.id, message, key),
      ]);
    }
  };

  /** What stands where it was asked; null where it had to go another way. */
  const openly = async (
    sender: Sender,
    handle: Handle,
    call: Call,
    messages: readonly Message[],
  ): Promise<readonly Standing[] | null> => {
    const where = whereOf(handle);
    const { responseUrl: url, thread, person } = handle;
    const standing: Standing[] = [];
    for (const [index, message] of messages.entries()) {
      const key = `${call.interactionId}-${String(index)}`;
      const direct = () => sender.direct(person.id, message, key);
      if (where === null) {
        await direct();
        continue;
      }
      try {
        standing.push({ sent: await sender.post(where, message, key), message });
      } catch (error) {
        // Only where the bot may not write: after any other fault the post may stand already.
        if (!isRefused(error, 'notThere')) throw error;
        const respond = (address: string) => () =>
          sender.respond(address, message, { isPrivate: false, thread });
        await firstOpen(call, [...(url === null ? [] : [respond(url)]), direct]);
      }
    }
    return standing.length === messages.length ? standing : null;
  };

  /**
   * The card stands already and says everything; its pictures follow. Where one is missing, the
   * card says that nothing else is.
   */
  const pictures = async (
    sender: Sender,
    handle: Handle,
    call: Call,
    reply: Reply,
    standing: readonly Standing[],
  ): Promise<void> => {
    const where = whereOf(handle);
    if (where === null || draw === null || reply.answer === null) return;
    const onFault = (error: unknown): void =>
      log.fault('picture', { interaction: call.interactionId, fault: faultText(error) });
    try {
      if (await sendPictures({ sender, where, draw, onFault }, reply.answer)) return;
      const messages = messagesOf(call, { ...reply, card: withoutPicture(reply.card, book) });
      await change(sender, standing, messages, (message, index) =>
        sender.post(where, message, `${call.interactionId}-${String(index)}`),
      );
    } catch (error) {
      onFault(error);
    }
  };

  const messagesOf = (call: Call, { card, extra }: Reply): readonly Message[] =>
    render({ card, of: call.interactionId, wasPrivate: call.place.isPrivate, extra });

  const deliver = async (
    sender: Sender,
    handle: Handle,
    call: Call,
    reply: Reply,
  ): Promise<void> => {
    const messages = messagesOf(call, reply);
    if (reply.isPrivate) {
      await privately(sender, handle, call, messages, 0);
    } else {
      const standing = await openly(sender, handle, call, messages);
      if (standing !== null) await pictures(sender, handle, call, reply, standing);
    }
    const names = filesOf(reply.answer);
    if (names.length > 0) await files(sender, handle, call, names);
  };

  /** To whoever asked, wherever that was. */
  const files = async (
    sender: Sender,
    handle: Handle,
    call: Call,
    names: readonly string[],
  ): Promise<void> => {
    const onFault = (error: unknown): void =>
      log.fault('file', { interaction: call.interactionId, fault: faultText(error) });
    const say = (text: string, since: number): Promise<void> => {
      const shown = { card: sentence(text), of: call.interactionId, wasPrivate: true };
      return privately(sender, handle, call, render(shown), since);
    };
    await say(book.slack.filesHere, FILES_FROM);
    const left = await sendFiles({ desk, sender }, await known(call), names, onFault);
    if (left.length > 0) await say(book.slack.filesLeft(left), FILES_FROM + 1);
  };
  const FILES_FROM = 800;

  /** Nothing more than one short sentence is left to say, by whichever way is still open. */
  const EXCUSE_FROM = 900;
  const sending = async (
    sender: Sender,
    handle: Handle,
    call: Call,
    reply: Reply,
  ): Promise<void> => {
    try {
      await deliver(sender, handle, call, reply);
    } catch (error) {
      log.fault('send', { interaction: call.interactionId, fault: faultText(error) });
      const messages = render({
        card: sentence(book.chat.fault),
        of: call.interactionId,
        wasPrivate: true,
      });
      await privately(sender, handle, call, messages, EXCUSE_FROM).catch((second: unknown) => {
        log.fault('excuse', { interaction: call.interactionId, fault: faultText(second) });
      });
    }
  };

  return {
    ask,

    /** Asks the desk and sends what it says. */
    answer: async (sender: Sender, handle: Handle, call: Call): Promise<void> => {
      await sending(sender, handle, call, await replyFor(call, ask(call)));
    },

    /** Sends what the desk was asked before. */
    send: async (
      sender: Sender,
      handle: Handle,
      call: Call,
      asked: Promise<Answer>,
    ): Promise<void> => {
      await sending(sender, handle, call, await replyFor(call, asked));
    },

    /** Something said to this person without asking the desk. */
    say: (
      sender: Sender,
      handle: Handle,
      call: Call,
      card: SpokenCard,
      extra: readonly ExtraButton[] = [],
    ): Promise<void> => sending(sender, handle, call, own(card, extra)),
  };
};
