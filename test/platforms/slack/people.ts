/** What people do in Slack, as the payloads it makes of that. */
import type { Bodies } from './bodies.ts';
import type { Platform, Posted, View } from './platform.ts';

export type Someone = {
  readonly id?: string;
  readonly name?: string;
  readonly team?: string;
  readonly channel?: string;
};

const who = ({
  id = 'U0OPERATOR',
  name = 'robin',
  team = 'T0SHOP',
  channel = 'C0FLOORSHOP',
}: Someone) => ({
  id,
  name,
  team,
  channel,
});

type Times = {
  /** Under this name it was delivered before. */
  readonly as?: string;
  /** How long the trigger lasts. */
  readonly triggerLasts?: number;
  /** Posts that the response address still takes. */
  readonly responses?: number;
};

type Block = {
  readonly type: string;
  readonly block_id?: string;
  readonly elements?: readonly Element[];
  readonly element?: { readonly type: string; readonly action_id: string };
};
type Element = {
  readonly type: string;
  readonly action_id: string;
  readonly value?: string;
  readonly text?: { readonly text: string };
  readonly options?: readonly {
    readonly value: string;
    readonly text: { readonly text: string };
  }[];
};

export const buttonsOf = ({
  blocks = [],
}: {
  readonly blocks?: readonly unknown[];
}): readonly Element[] =>
  (blocks as readonly Block[]).flatMap(({ type, elements = [] }) =>
    type === 'actions' ? elements : [],
  );

const plainText = (text: string) => ({ type: 'plain_text', text, emoji: false }) as const;

export const openPeople = (platform: Platform) => {
  const send = async <K extends keyof Bodies>(
    kind: K,
    type: 'slash_commands' | 'interactive' | 'events_api',
    payload: Bodies[K],
    as?: string,
  ) => {
    const wrong = platform.check(kind, payload);
    if (wrong !== null) platform.faults.push(wrong);
    return await platform.deliver({ type, payload }, as);
  };

  const slashBody = (
    command: string,
    text: string,
    someone: Someone,
    times: Times,
  ): Bodies['slash'] => {
    const { id, name, team, channel } = who(someone);
    return {
      token: 'legacy',
      command,
      text,
      response_url: platform.responseUrl(team, channel, id, times.responses),
      trigger_id: platform.trigger(team, id, times.triggerLasts),
      user_id: id,
      user_name: name,
      team_id: team,
      team_domain: 'shop',
      channel_id: channel,
      channel_name: 'floor',
      api_app_id: 'A0APP',
    };
  };

  const common = (someone: Someone) => {
    const { id, name, team } = who(someone);
    return {
      team: { id: team, domain: 'shop' },
      user: { id, name, username: name, team_id: team },
      token: 'legacy',
    };
  };

  const actionBody = <A extends Bodies['button' | 'select']['actions'][number]>(
    message: Posted | null,
    action: A,
    someone: Someone,
    times: Times,
  ) => {
    const { id, team, channel } = who(someone);
    const inMessage = message !== null;
    return {
      type: 'block_actions' as const,
      actions: [action],
      ...common(someone),
      ...(inMessage
        ? {
            channel: { id: message.channel, name: 'floor' },
            message: {
              type: 'message' as const,
              ts: message.ts,
              text: message.body.text ?? '',
              ...(message.thread === null ? {} : { thread_ts: message.thread }),
            },
          }
        : {}),
      response_url: inMessage
        ? platform.responseUrl(team, message.channel, id, times.responses)
        : '',
      trigger_id: platform.trigger(team, id, times.triggerLasts),
      api_app_id: 'A0APP',
      container: inMessage
        ? {
            type: 'message',
            message_ts: message.ts,
            channel_id: message.channel,
            is_ephemeral: message.only !== null,
            ...(message.thread === null ? {} : { thread_ts: message.thread }),
          }
        : { type: 'view', channel },
    };
  };

  const envelope = (team: string, event: unknown) => ({
    token: 'legacy',
    team_id: team,
    api_app_id: 'A0APP',
    type: 'event_callback' as const,
    event_id: `Ev${String(platform.next())}`,
    event_time: Math.floor(Date.now() / 1000),
    authorizations: [
      {
        enterprise_id: null,
        team_id: team,
        user_id: 'U0BOT',
        is_bot: true,
        is_enterprise_install: false,
      },
    ],
    event,
  });

  const mentionBody = (
    text: string,
    someone: Someone & { readonly thread?: string },
  ): Bodies['mention'] => {
    const { id, team, channel } = who(someone);
    const ts = `1790000000.${String(platform.next()).padStart(6, '0')}`;
    return envelope(team, {
      type: 'app_mention',
      user: id,
      text: `<@U0BOT> ${text}`,
      ts,
      channel,
      event_ts: ts,
      ...(someone.thread === undefined ? {} : { thread_ts: someone.thread }),
    }) as Bodies['mention'];
  };

  /** A form filled in: text, or the value of an option, under each field's name. */
  const submissionBody = (
    { id: view, view: form }: View,
    filled: Readonly<Record<string, string>>,
    someone: Someone,
  ): Bodies['submission'] => {
    const { id, team } = who(someone);
    const blocks = (form.blocks ?? []) as readonly Block[];
    const values = Object.fromEntries(
      blocks.flatMap(({ block_id, element }) => {
        if (block_id === undefined || element === undefined) return [];
        const value = filled[block_id];
        const chosen = value === undefined ? null : { text: plainText(value), value };
        const state = element.type.endsWith('select')
          ? { type: element.type, selected_option: chosen }
          : element.type === 'checkboxes'
            ? { type: element.type, selected_options: chosen === null ? [] : [chosen] }
            : { type: element.type, value: value ?? null };
        return [[block_id, { [element.action_id]: state }] as const];
      }),
    );
    return {
      type: 'view_submission',
      ...common({ ...someone, id }),
      user: { id, name: who(someone).name, team_id: team },
      api_app_id: 'A0APP',
      trigger_id: platform.trigger(team, id),
      view: {
        ...(form as unknown as Bodies['submission']['view']),
        id: view,
        team_id: team,
        app_id: 'A0APP',
        bot_id: 'B0BOT',
        state: { values },
        hash: String(platform.next()),
        root_view_id: view,
        previous_view_id: null,
        clear_on_close: false,
        notify_on_close: false,
      },
    };
  };

  return {
    slashBody,
    mentionBody,
    slash: (
      text: string,
      someone: Someone = {},
      times: Times & { readonly command?: string } = {},
    ) =>
      send(
        'slash',
        'slash_commands',
        slashBody(times.command ?? '/knurl', text, someone, times),
        times.as,
      ),

    mention: (text: string, someone: Someone & { readonly thread?: string } = {}) =>
      send('mention', 'events_api', mentionBody(text, someone)),

    /** Presses the button with this label, or the one at this place. */
    press: (message: Posted, which: string | number, someone: Someone = {}, times: Times = {}) => {
      const buttons = buttonsOf(message.body);
      const button =
        typeof which === 'number'
          ? buttons[which]
          : buttons.find(({ text }) => text?.text === which);
      if (button === undefined)
        throw new Error(
          `no button ${String(which)} among ${buttons.map(({ text }) => text?.text).join(', ')}`,
        );
      const action = {
        type: 'button' as const,
        block_id: 'b',
        action_id: button.action_id,
        action_ts: '1790000000.000001',
        value: button.value ?? '',
        text: plainText(button.text?.text ?? ''),
      };
      return send('button', 'interactive', actionBody(message, action, someone, times), times.as);
    },

    /** Presses or chooses something on the bot's own page, or in a message with a menu. */
    choose: (message: Posted | null, value: string, someone: Someone = {}) =>
      send(
        'select',
        'interactive',
        actionBody(
          message,
          {
            type: 'static_select' as const,
            block_id: 'b',
            action_id: 'choose',
            action_ts: '1790000000.000001',
            selected_option: { text: plainText(value), value },
          },
          someone,
          {},
        ),
      ),
    pressHome: (value: string, someone: Someone = {}, action = 'open:0') =>
      send(
        'button',
        'interactive',
        actionBody(
          null,
          {
            type: 'button' as const,
            block_id: 'b',
            action_id: action,
            action_ts: '1790000000.000001',
            value,
            text: plainText(value),
          },
          someone,
          {},
        ),
      ),

    submit: (view: View, filled: Readonly<Record<string, string>>, someone: Someone = {}) =>
      send('submission', 'interactive', submissionBody(view, filled, someone)),

    suggest: (view: View, field: string, typed: string, someone: Someone = {}) => {
      const { id, team } = who(someone);
      return send('suggestion', 'interactive', {
        type: 'block_suggestion',
        block_id: field,
        action_id: 'suggest',
        value: typed,
        api_app_id: 'A0APP',
        ...common({ ...someone, id }),
        container: { type: 'view', view_id: view.id },
        view: submissionBody(view, {}, someone).view,
        team: { id: team, domain: 'shop' },
        user: { id, name: who(someone).name, team_id: team },
      } as unknown as Bodies['suggestion']);
    },

    globalShortcut: (callback: string, someone: Someone = {}) => {
      const { id, name, team } = who(someone);
      return send('globalShortcut', 'interactive', {
        type: 'shortcut',
        callback_id: callback,
        trigger_id: platform.trigger(team, id),
        user: { id, username: name, team_id: team },
        team: { id: team, domain: 'shop' },
        token: 'legacy',
        action_ts: '1790000000.000001',
      });
    },

    messageShortcut: (
      callback: string,
      text: string,
      someone: Someone & { readonly thread?: string } = {},
    ) => {
      const { id, name, team, channel } = who(someone);
      return send('messageShortcut', 'interactive', {
        type: 'message_action',
        callback_id: callback,
        trigger_id: platform.trigger(team, id),
        message_ts: '1790000000.000002',
        response_url: platform.responseUrl(team, channel, id),
        message: {
          type: 'message',
          user: 'U0SOMEBODY',
          ts: '1790000000.000002',
          text,
          ...(someone.thread === undefined ? {} : { thread_ts: someone.thread }),
        },
        user: { id, name, team_id: team },
        channel: { id: channel, name: 'floor' },
        team: { id: team, domain: 'shop' },
        token: 'legacy',
        action_ts: '1790000000.000002',
      });
    },

    openHome: (someone: Someone = {}) => {
      const { id, team } = who(someone);
      return send(
        'homeOpened',
        'events_api',
        envelope(team, {
          type: 'app_home_opened',
          user: id,
          channel: `D${id}`,
          tab: 'home',
          event_ts: '1790000000.000003',
        }) as Bodies['homeOpened'],
      );
    },
  };
};
