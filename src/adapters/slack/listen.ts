import type { App, webApi } from '@slack/bolt';
import type { ModalView } from '@slack/types';
import { z } from 'zod';
import { type Answer, type Call, type Command, type Desk, route } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { type ControlId, readId } from '../common/ids.ts';
import type { Log } from '../common/log.ts';
import { cautionsOf, sentence } from '../common/spoken.ts';
import { within } from '../common/within.ts';
import { typedText } from './escape.ts';
import { faultText, isRefused } from './faults.ts';
import { fieldOf } from './fieldErrors.ts';
import type { Flow } from './flow.ts';
import {
  askingForm,
  correctionForm,
  optionOf,
  purposeOf,
  readMemory,
  SUGGESTS,
  verbForm,
} from './form.ts';
import { CHOOSE, homeView, OPEN, openButton, SAY, verbMenu } from './home.ts';
import { LIMITS } from './limits.ts';
import { FROM_MESSAGE, OPEN_SETUP } from './manifest.ts';
import { namesSomebody } from './mentions.ts';
import {
  callOf,
  commandHandle,
  filledIn,
  type Handle,
  handleOf,
  interactionOf,
  quietly,
  WORDS_FIELD,
} from './receive.ts';
import { CONTROL, controlButton, type ExtraButton } from './render.ts';
import { openSender, type Sender } from './send.ts';

export type Listening = {
  readonly desk: Desk;
  readonly book: Book;
  readonly log: Log;
  readonly flow: Flow;
  /** Keeps what goes on after an acknowledgement, so that a stop can wait for it. */
  readonly keep: (what: string, work: Promise<void>) => void;
  /** How long a form waits for its answer before it closes without one. */
  readonly formPatienceMs: number;
};

/** How long the records may take to say what a button was for: a form has to open in time. Judgement. */
const RECALL_MS = 900;
/** Suggestions come while somebody types. Judgement. */
const SUGGEST_MS = 1_500;

const NOTHING: Call['given'] = { words: '' };

/** What every interaction is answered with. */
type At = {
  readonly sender: Sender;
  readonly handle: Handle;
  readonly id: string;
};

const commandAt = (desk: Desk, path: string): Command | undefined =>
  desk.fleet.find((each) => each.path.join(' ') === path);

/** A root by itself means its set-up, and that its form; the desk would answer with the help. */
const rootForm = (desk: Desk, line: string): Command | null => {
  const root = line.replace('/', '');
  const isRoot = desk.fleet.some(({ path }) => path[0] === root);
  return (isRoot ? commandAt(desk, `${root} setup`) : null) ?? null;
};

/** The verb of a line that says nothing more: where that is not enough, its form asks for the rest. */
const bareVerb = (desk: Desk, line: string): Command | null => {
  const way = route(line, desk.fleet);
  if (!('command' in way) || line.split(' ').length > way.skip) return null;
  return way.command.parameters.length === 0 ? null : way.command;
};

/** Asks a line that is only a verb; `ask` opens what asks for the rest, where something is missing. */
const bareAnswered = async (
  { flow, formPatienceMs }: Listening,
  { sender, handle }: At,
  call: Call,
  ask: () => Promise<void>,
): Promise<void> => {
  const asked = flow.ask(call);
  const early = await within(
    asked.catch(() => null),
    formPatienceMs,
    null,
  );
  const isMissing = early?.kind === 'refusal' && early.refusal.code === 'missing';
  await (isMissing ? ask() : flow.send(sender, handle, call, asked));
};

/** Whether nothing but a root was typed that has no set-up. */
const isBareRoot = (desk: Desk, line: string): boolean =>
  /^\/\w+$/u.test(line) && commandAt(desk, `${line.slice(1)} setup`) === undefined;

const opened = z.object({ trigger_id: z.string() });
const triggerOf = (body: unknown): string => opened.safeParse(body).data?.trigger_id ?? '';

/** Opens a form; where Slack gives it no time, a button that opens it takes its place. */
const openForm = async (
  { book, flow }: Listening,
  { sender, handle, id }: At,
  trigger: string,
  view: ModalView,
  again: ExtraButton,
): Promise<void> => {
  try {
    await sender.open(trigger, view);
  } catch (error) {
    if (!isRefused(error, 'triggerOver')) throw error;
    const call = callOf(handle, id, NOTHING, true);
    await flow.say(sender, handle, call, sentence(book.slack.formLate), [again]);
  }
};

const openVerb = (
  listening: Listening,
  at: At,
  trigger: string,
  command: Command,
  isPrivate: boolean,
): Promise<void> => {
  const { book } = listening;
  const view = verbForm({ book, handle: at.handle, isPrivate }, command);
  return openForm(listening, at, trigger, view, openButton(command, book.slack.openForm));
};

/** A slash command: a line, or the form of what it names. */
const asked = async (
  listening: Listening,
  at: At,
  body: {
    readonly command: string;
    readonly text?: string | undefined;
    readonly trigger_id: string;
  },
): Promise<void> => {
  const { desk, book, flow } = listening;
  const { sender, handle, id } = at;
  const typed = typedText(body.text ?? '', namesSomebody(undefined));
  const { words, isPrivate } = quietly(typed, book.slack.onlyMeWords);
  const line = `${body.command} ${words}`.trim();
  const root = rootForm(desk, line);
  if (root !== null) {
    await openVerb(listening, at, body.trigger_id, root, isPrivate);
    return;
  }
  if (isBareRoot(desk, line)) {
    await choosing(listening, at, line.slice(1));
    return;
  }
  const call = callOf(handle, id, { words: line }, isPrivate);
  const bare = bareVerb(desk, line);
  await (bare === null
    ? flow.answer(sender, handle, call)
    : bareAnswered(listening, at, call, () =>
        openVerb(listening, at, body.trigger_id, bare, isPrivate),
      ));
};

/** A root whose verbs stand side by side: each opens its form. */
const choosing = async (
  { desk, book, flow, log }: Listening,
  at: At,
  root: string,
): Promise<void> => {
  const { sender, handle, id } = at;
  const commands = desk.fleet.filter(
    ({ path, parameters }) => path[0] === root && parameters.length > 0,
  );
  const call = callOf(handle, id, { words: `/${root}` }, true);
  const menu = verbMenu(book, commands);
  if (menu.length === 0 || handle.responseUrl === null) {
    await flow.answer(sender, handle, call);
    return;
  }
  try {
    const message = { text: book.slack.choose, blocks: [...menu] };
    await sender.respond(handle.responseUrl, message, { isPrivate: true, thread: null });
  } catch (error) {
    log.note('menu', { interaction: id, fault: faultText(error) });
    await flow.say(
      sender,
      handle,
      call,
      sentence(book.slack.formNeeded),
      commands.slice(0, LIMITS.buttons).map((each) => openButton(each, `/${each.path.join(' ')}`)),
    );
  }
};

/** What a choice still has to be told before its line can be sent. */
const askedBy = (desk: Desk, answer: Answer | null, choice: number) => {
  if (answer?.kind !== 'card') return null;
  const { ask = [], words = '' } = answer.card.choices[choice] ?? {};
  const way = route(words, desk.fleet);
  return ask.length === 0 || !('command' in way) ? null : { ask, command: way.command };
};

/** A button of the newest answer or of one from weeks ago. */
const pressed = async (
  listening: Listening,
  at: At,
  trigger: string,
  control: ControlId,
): Promise<void> => {
  const { desk, book, flow } = listening;
  const { sender, handle, id } = at;
  const { of, isPrivate } = control;
  const call = callOf(handle, id, NOTHING, isPrivate);
  const gone = () => flow.say(sender, handle, call, sentence(book.chat.gone));
  const recalled = await within(desk.recall(call, of), RECALL_MS, null);
  const opening = { book, handle, isPrivate };
  switch (control.control) {
    case 'cautions': {
      const card = cautionsOf(recalled, book);
      await (card === null ? gone() : flow.say(sender, handle, call, card));
      return;
    }
    case 'correct': {
      if (recalled?.kind !== 'refusal') {
        await gone();
        return;
      }
      const view = correctionForm(opening, control, recalled.text);
      await openForm(listening, at, trigger, view, controlButton(control, book.slack.openForm));
      return;
    }
    case 'show':
      // Nothing that this platform is sent carries one.
      await gone();
      return;
    case 'press': {
      const asks = askedBy(desk, recalled, control.choice);
      if (asks === null) {
        const given = { pressed: { of, choice: control.choice } };
        await flow.answer(sender, handle, { ...call, given });
        return;
      }
      const view = askingForm(opening, control, asks.command, asks.ask);
      await openForm(listening, at, trigger, view, controlButton(control, book.slack.openForm));
    }
  }
};

/** What a form that was sent asks of the desk, and where its reply goes. */
const submission = (
  body: unknown,
  view: {
    readonly callback_id: string;
    readonly private_metadata: string;
    readonly state: { readonly values: unknown };
  },
  team: string,
): { readonly handle: Handle; readonly call: Call } | null => {
  const purpose = purposeOf(view.callback_id);
  if (purpose === null) return null;
  const memory = readMemory(view.private_metadata);
  const { channel, thread, responseUrl } = memory;
  const handle = { ...handleOf(body, team), channel, thread, responseUrl };
  const { options, isPrivate } = filledIn(view.state.values);
  const id = interactionOf(body) ?? '';
  if ('path' in purpose) {
    const quiet = isPrivate || channel === null;
    return { handle, call: callOf(handle, id, { path: purpose.path, options }, quiet) };
  }
  const { control } = purpose;
  const given: Call['given'] =
    control.control === 'press'
      ? { pressed: { of: control.of, choice: control.choice, added: options } }
      : { words: String(options[WORDS_FIELD] ?? '') };
  return { handle, call: callOf(handle, id, given, control.isPrivate) };
};

/** A form of an earlier program may say what this one does not read: it is acknowledged all the same. */
const submissionOrFault = (...form: Parameters<typeof submission>) => {
  try {
    return submission(...form);
  } catch (error) {
    return { fault: error instanceof Error ? error : new Error('unreadable form') };
  }
};

const pressedShape = z.object({
  action_id: z.string(),
  value: z.string().optional(),
  selected_option: z.object({ value: z.string() }).nullish(),
});

const suggestion = z.object({
  value: z.string(),
  block_id: z.string(),
  view: z.object({ callback_id: z.string() }).optional(),
});

/** Names for the letters typed so far; what was typed itself is always among them. */
const suggestions = async ({ desk }: Listening, body: unknown, team: string) => {
  const { value, block_id, view } = suggestion.parse(body);
  const purpose = purposeOf(view?.callback_id ?? '');
  const path = purpose !== null && 'path' in purpose ? purpose.path : ['knurl', 'setup'];
  const call = callOf(handleOf(body, team), '', { path, options: {} }, true);
  const found = await within(
    desk.suggest(call, { parameter: block_id, typed: value }),
    SUGGEST_MS,
    [],
  );
  const typed = value.trim();
  const itself =
    typed === '' || found.some(({ words }) => words === typed) ? [] : [optionOf(typed, typed)];
  return [...found.map(({ label, words }) => optionOf(label, words)), ...itself]
    .filter((option) => (option.value?.length ?? 0) <= LIMITS.optionValue)
    .slice(0, LIMITS.options);
};

/** Connects what Slack sends to what the desk answers; acknowledged at once, then answered. */
export const listen = (app: App, listening: Listening): void => {
  const { desk, book, log, flow, keep, formPatienceMs } = listening;
  /** The platform hears that it arrived; whether it hears does not change the answer. */
  const acknowledged = async (ack: () => Promise<void>): Promise<void> => {
    try {
      await ack();
    } catch (error) {
      log.note('acknowledgement', { fault: faultText(error) });
    }
  };
  const at = (client: webApi.WebClient, handle: Handle, body: unknown): At => ({
    sender: openSender(client),
    handle,
    id: interactionOf(body) ?? '',
  });
  /** What fails here was not said to anybody yet. */
  const told = async (there: At, work: Promise<void>): Promise<void> => {
    try {
      await work;
    } catch (error) {
      log.fault('interaction', { interaction: there.id, fault: faultText(error), error });
      const call = callOf(there.handle, there.id, NOTHING, true);
      await flow.say(there.sender, there.handle, call, sentence(book.chat.fault));
    }
  };
  const go = (what: string, there: At, work: () => Promise<void>): void =>
    keep(what, told(there, Promise.resolve().then(work)));

  app.command(/.*/u, async ({ ack, body, client, context }) => {
    await acknowledged(ack);
    const there = at(client, commandHandle(body, context.teamId ?? body.team_id), body);
    go('command', there, () => asked(listening, there, body));
  });

  app.action(/.*/u, async ({ ack, action, body, client, context }) => {
    await acknowledged(ack);
    const there = at(client, handleOf(body, context.teamId ?? ''), body);
    const trigger = triggerOf(body);
    const on = pressedShape.safeParse(action).data;
    const [name, value] = [on?.action_id ?? '', on?.value ?? ''];
    const selected = on?.selected_option;
    const command = commandAt(desk, name === CHOOSE ? (selected?.value ?? '') : value);
    const control = name.startsWith(`${CONTROL}:`) ? readId(value) : null;
    go('action', there, () => {
      if ((name.startsWith(`${OPEN}:`) || name === CHOOSE) && command !== undefined)
        return openVerb(listening, there, trigger, command, false);
      if (name.startsWith(`${SAY}:`) && value !== '') {
        const line = callOf(there.handle, there.id, { words: value }, true);
        return flow.answer(there.sender, there.handle, line);
      }
      if (control !== null) return pressed(listening, there, trigger, control);
      const call = callOf(there.handle, there.id, NOTHING, true);
      return flow.say(there.sender, there.handle, call, sentence(book.chat.gone));
    });
  });

  app.shortcut(/.*/u, async ({ ack, shortcut, body, client, context }) => {
    await acknowledged(ack);
    const there = at(client, handleOf(body, context.teamId ?? ''), body);
    go('shortcut', there, async () => {
      const { sender, handle, id } = there;
      const setup = commandAt(desk, 'knurl setup');
      if (shortcut.callback_id === OPEN_SETUP && setup !== undefined) {
        await openVerb(listening, there, shortcut.trigger_id, setup, true);
        return;
      }
      if (shortcut.callback_id !== FROM_MESSAGE || shortcut.type !== 'message_action') return;
      const words = typedText(shortcut.message.text ?? '');
      const call = callOf(handle, id, { words }, false);
      await (words === ''
        ? flow.say(sender, handle, call, sentence(book.chat.nothingToRead))
        : flow.answer(sender, handle, call));
    });
  });

  app.view(/.*/u, async ({ ack, body, view, client, context }) => {
    const team = context.teamId ?? '';
    const read = submissionOrFault(body, view, team);
    if (read === null) {
      await acknowledged(ack);
      return;
    }
    if ('fault' in read) {
      await acknowledged(ack);
      go('view', at(client, handleOf(body, team), body), () => Promise.reject(read.fault));
      return;
    }
    const { call, handle } = read;
    const there = at(client, handle, body);
    const asked = flow.ask(call);
    // Its fault is told by whoever sends the reply.
    const early = await within(
      asked.catch(() => null),
      formPatienceMs,
      null,
    );
    if (early?.kind === 'refusal') {
      const errors = fieldOf(early, view, book);
      await acknowledged(() => ack({ response_action: 'errors', errors }));
      return;
    }
    await acknowledged(ack);
    go('view', there, () => flow.send(there.sender, handle, call, asked));
  });

  app.options(SUGGESTS, async ({ ack, body, context }) => {
    const options = await suggestions(listening, body, context.teamId ?? '').catch(
      (error: unknown) => {
        log.fault('suggest', { fault: faultText(error), error });
        return [];
      },
    );
    await acknowledged(() => ack({ options }));
  });

  app.event('app_mention', async ({ event, body, client, context }) => {
    const { user, channel, text, thread_ts, bot_id } = event;
    if (user === undefined || bot_id !== undefined) return;
    const handle: Handle = {
      shop: context.teamId ?? body.team_id,
      person: { id: user, name: event.user_profile?.display_name ?? user },
      channel,
      thread: thread_ts ?? null,
      responseUrl: null,
    };
    const there = at(client, handle, body);
    const typed = typedText(text, namesSomebody(context.botUserId));
    const { words, isPrivate } = quietly(typed, book.slack.onlyMeWords);
    go('mention', there, () => {
      const { sender, id } = there;
      const line = words === '' ? '/knurl' : words;
      const call = callOf(handle, id, { words }, isPrivate);
      // A mention opens no form: a button does.
      const offer = (command: Command): Promise<void> =>
        flow.say(sender, handle, call, sentence(book.slack.formNeeded), [
          openButton(command, book.slack.openForm),
        ]);
      const root = rootForm(desk, line);
      if (root !== null) return offer(root);
      const bare = bareVerb(desk, line);
      return bare === null
        ? flow.answer(sender, handle, call)
        : bareAnswered(listening, there, call, () => offer(bare));
    });
    await Promise.resolve();
  });

  const homeFor = async (client: webApi.WebClient, shop: string, person: string): Promise<void> => {
    const looked = desk.pinned({ shop }).catch((error: unknown) => {
      log.fault('home', { fault: faultText(error), error });
      return [];
    });
    // The forms are there in any case.
    const pinned = await within(looked, RECALL_MS, []);
    await openSender(client).home(person, homeView(book, desk.fleet, pinned));
  };

  app.event('app_home_opened', async ({ event, body, client, context }) => {
    if (event.tab === 'messages') return;
    keep('home', homeFor(client, context.teamId ?? body.team_id, event.user));
    await Promise.resolve();
  });
};
