/** What people do in Discord, as the payloads it makes of that. */
import { ApplicationCommandType } from 'discord-api-types/v10';
import type { Acknowledged, Asked, Form, Kind, Times } from './asked.ts';
import type { Bodies } from './bodies.ts';
import { interactionCommon, messageOf, writtenBy } from './payloads.ts';
import type { Platform } from './platform.ts';
import type { Posted } from './rooms.ts';
import { allOf, type Body, type Component } from './rules.ts';
import { APPLICATION, OPERATOR, type Someone } from './world.ts';

/** How it reaches the bot. */
export type Delivery = Times & {
  /** So many times over. */
  readonly copies?: number;
  /** Files that a person gives to an option, by the option's value. */
  readonly files?: Readonly<Record<string, Body>>;
};
export type Value = string | number | boolean;

type Interaction =
  | 'slash'
  | 'suggestion'
  | 'messageCommand'
  | 'button'
  | 'directButton'
  | 'submission';

type Option = {
  readonly type: number;
  readonly name: string;
  readonly options?: readonly Option[];
  readonly choices?: readonly { readonly value: Value }[];
  readonly autocomplete?: boolean;
};
type Filled = {
  readonly type: number;
  readonly name: string;
  readonly value?: Value;
  readonly focused?: boolean;
  readonly options?: readonly Filled[];
};

/** Kinds of commands, options and components. */
const BY_SLASH = ApplicationCommandType.ChatInput;
const ON_MESSAGE = ApplicationCommandType.Message;
const SUBCOMMAND = 1;
const GROUP = 2;
const TEXT_OPTION = 3;
const WHOLE_OPTION = 4;
const BUTTON = 2;
const SELECT = 3;
const FIELD = 4;
const LABEL = 18;

/** interactions/application-commands: a text option holds no more. */
const MOST_TEXT = 6000;

export const buttonsOf = ({ body }: Pick<Posted, 'body'>): readonly Component[] =>
  allOf((body['components'] ?? []) as readonly Component[]).filter(({ type }) => type === BUTTON);

export type Field = Component & {
  readonly value?: string;
  readonly placeholder?: string;
  readonly options?: readonly { readonly value: string; readonly default?: boolean }[];
};
export const fieldsOf = ({ body }: Form): readonly Field[] =>
  allOf((body['components'] ?? []) as readonly Component[]).filter(
    ({ type }) => type === FIELD || type === SELECT,
  );

/** What comes of a field: its text, or what was chosen of its options. */
const sentBy = ({ type, options = [], value = '' }: Field, filled: string | undefined): Body => {
  if (type === FIELD) return { value: filled ?? value };
  const before = options.filter((each) => each.default === true).map((each) => each.value);
  if (filled === undefined) return { values: before };
  if (options.every((each) => each.value !== filled)) throw new Error(`no option ${filled}`);
  return { values: [filled] };
};

/** What the platform's own client would not let a person send. */
const refusedAt = (option: Option, value: Value): string | null => {
  if (option.type === TEXT_OPTION && typeof value !== 'string') return 'a text';
  if (typeof value === 'string' && value.length > MOST_TEXT) return 'shorter';
  if (option.type === WHOLE_OPTION && !Number.isInteger(value)) return 'a whole number';
  if (option.choices !== undefined && option.choices.every((each) => each.value !== value))
    return 'one of its choices';
  return null;
};

export const openPeople = (platform: Platform) => {
  const { interactions, routes } = platform;

  const ask = (
    payload: Interaction,
    kind: Kind,
    someone: Someone,
    { copies = 1, ...times }: Delivery,
    more: Body,
  ): Promise<Acknowledged | null> => {
    platform.meetPerson(someone);
    const asked: Asked = interactions.ask(kind, someone, times);
    const body = {
      ...interactionCommon(asked, someone, platform.rooms.channelOf(someone.channel)),
      ...more,
    } as unknown as Bodies[Interaction];
    platform.dispatch('INTERACTION_CREATE', payload, body, copies);
    return asked.acknowledged;
  };

  /** The options of a verb as they are registered, and the way there. */
  const registered = (path: readonly string[]) => {
    const [root = '', ...below] = path;
    const command = routes.commandOf(BY_SLASH, root);
    if (command === undefined) throw new Error(`/${root} is not registered`);
    let options = (command.options ?? []) as readonly Option[];
    const way = below.map((name) => {
      const found = options.find((each) => each.name === name);
      if (found === undefined || (found.type !== SUBCOMMAND && found.type !== GROUP))
        throw new Error(`/${path.join(' ')} is not registered`);
      options = found.options ?? [];
      return found;
    });
    return { command, way, options };
  };

  const filledIn = (
    options: readonly Option[],
    values: Readonly<Record<string, Value>>,
    focused?: string,
  ): readonly Filled[] =>
    Object.entries(values).map(([name, value]) => {
      const option = options.find((each) => each.name === name);
      if (option === undefined) throw new Error(`no option ${name}`);
      const wrong = name === focused ? null : refusedAt(option, value);
      if (wrong !== null) throw new Error(`${name} has to be ${wrong}: ${String(value)}`);
      return {
        type: option.type,
        name,
        value,
        ...(name === focused ? { focused: true } : {}),
      };
    });

  const commandData = (
    path: readonly string[],
    values: Readonly<Record<string, Value>>,
    focused?: string,
  ): Body => {
    const { command, way, options } = registered(path);
    const leaf = filledIn(options, values, focused);
    const nested = [...way]
      .reverse()
      .reduce<readonly Filled[]>(
        (inside, { type, name }) => [{ type, name, options: inside }],
        leaf,
      );
    return { id: command.id, name: command.name, type: BY_SLASH, options: nested };
  };

  const nameOf = (message: Posted): Body => ({
    message: messageOf(message),
    channel_id: message.channel,
  });

  return {
    /** The options of a verb, as a person would see them. */
    optionsOf: (path: readonly string[]): readonly Option[] => registered(path).options,

    slash: (
      path: readonly string[],
      values: Readonly<Record<string, Value>> = {},
      someone: Someone = OPERATOR,
      delivery: Delivery = {},
    ) => {
      const { files: attachments } = delivery;
      const resolved = attachments === undefined ? {} : { resolved: { attachments } };
      const data = { ...commandData(path, values), ...resolved };
      return ask('slash', 'command', someone, delivery, { type: 2, data });
    },

    /** What is offered while an option is being typed. */
    suggest: async (
      path: readonly string[],
      values: Readonly<Record<string, Value>>,
      focused: string,
      someone: Someone = OPERATOR,
    ): Promise<readonly { readonly name: string; readonly value: string }[]> => {
      const { options } = registered(path);
      if (options.find(({ name }) => name === focused)?.autocomplete !== true)
        throw new Error(`${focused} has no suggestions`);
      const data = commandData(path, values, focused);
      const acked = await ask('suggestion', 'suggestion', someone, {}, { type: 4, data });
      if (acked === null) throw new Error('no suggestions in time');
      return acked.data['choices'] as readonly { name: string; value: string }[];
    },

    onMessage: (text: string, someone: Someone = OPERATOR, delivery: Delivery = {}) => {
      const name = 'Set up from this message';
      const command = routes.commandOf(ON_MESSAGE, name);
      if (command === undefined) throw new Error(`${name} is not registered`);
      const id = platform.newId();
      const target = writtenBy(id, { ...someone, id: '1300000000000000009' }, text, false);
      // In a command the message comes without its server and its writer's member.
      const message = Object.entries(target).filter(
        ([key]) => key !== 'guild_id' && key !== 'member',
      );
      const resolved = { messages: { [id]: Object.fromEntries(message) as Body } };
      const data = { id: command.id, name, type: ON_MESSAGE, target_id: id, resolved };
      return ask('messageCommand', 'command', someone, delivery, { type: 2, data });
    },

    /** Presses the button with this label, or the one at this place. */
    press: (
      message: Posted,
      which: string | number,
      someone: Someone = OPERATOR,
      delivery: Delivery = {},
    ) => {
      const buttons = buttonsOf(message);
      const button =
        typeof which === 'number' ? buttons[which] : buttons.find(({ label }) => label === which);
      if (button === undefined)
        throw new Error(
          `no button ${String(which)} among ${buttons.map(({ label }) => label).join(', ')}`,
        );
      const presser = { ...someone, channel: message.channel };
      const data = { custom_id: button.custom_id, component_type: BUTTON };
      const more = { type: 3, data, ...nameOf(message) };
      const payload = message.guild === null ? 'directButton' : 'button';
      return ask(payload, 'component', presser, delivery, more);
    },

    /** Sends a form, filled in under each field's name; what was in it already stays. */
    submit: (form: Form, filled: Readonly<Record<string, string>>, delivery: Delivery = {}) => {
      const fields = fieldsOf(form);
      for (const name of Object.keys(filled))
        if (fields.every(({ custom_id }) => custom_id !== name))
          throw new Error(`no field ${name} among ${fields.map((f) => f.custom_id).join(', ')}`);
      const components = fields.map((field, index) => {
        const { type, custom_id = '' } = field;
        const said = { type, id: 2 * index + 2, custom_id, ...sentBy(field, filled[custom_id]) };
        return { type: LABEL, id: 2 * index + 1, component: said };
      });
      const data = { custom_id: form.body['custom_id'], components };
      return ask('submission', 'submission', form.asked.someone, delivery, { type: 5, data });
    },

    /** Names the bot in a message; gives the message's id. */
    mention: (text: string, someone: Someone = OPERATOR, copies = 1): string => {
      platform.meetPerson(someone);
      const id = platform.newId();
      const written = writtenBy(id, someone, `<@${APPLICATION}> ${text}`, true);
      platform.dispatch('MESSAGE_CREATE', 'mention', written, copies);
      return id;
    },

    /** Another bot names this one. */
    mentionByBot: (text: string, someone: Someone): void => {
      const written = writtenBy(platform.newId(), someone, `<@${APPLICATION}> ${text}`, true);
      const author = { ...written.author, bot: true };
      platform.dispatch('MESSAGE_CREATE', 'mention', { ...written, author });
    },

    /** Says something that does not name the bot: its words do not come along. */
    chat: (someone: Someone = OPERATOR): void => {
      platform.dispatch(
        'MESSAGE_CREATE',
        'mention',
        writtenBy(platform.newId(), someone, '', false),
      );
    },
  };
};
export type People = ReturnType<typeof openPeople>;
