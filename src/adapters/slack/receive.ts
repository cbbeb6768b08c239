import { z } from 'zod';
import type { Call, Options } from '../../desk/index.ts';

/** The field that takes a whole line, and the one that hides the reply. */
export const WORDS_FIELD = 'words';
export const ONLY_ME_FIELD = 'only-me';

/** Where a request came from and by which ways its reply can go back. */
export type Handle = {
  readonly shop: string;
  readonly person: { readonly id: string; readonly name: string };
  /** None where it was asked from a home or a shortcut: then the reply goes to the person. */
  readonly channel: string | null;
  readonly thread: string | null;
  /** Takes a few posts for half an hour, wherever the bot may not write by itself. */
  readonly responseUrl: string | null;
};

const id = z.object({ id: z.string() });
const named = z.object({
  id: z.string(),
  username: z.string().optional(),
  name: z.string().optional(),
});

/** What Slack's bodies have in common, as far as a reply needs it. */
const bodyShape = z.object({
  team: id.nullish(),
  user: named,
  channel: id.optional(),
  response_url: z.string().optional(),
  message: z.object({ thread_ts: z.string().optional() }).optional(),
  container: z
    .object({
      channel_id: z.string().optional(),
      thread_ts: z.string().optional(),
      is_ephemeral: z.boolean().optional(),
    })
    .optional(),
});

/** Of a button, a select or a shortcut. */
export const handleOf = (body: unknown, team: string): Handle => {
  const { user, channel, response_url, message, container } = bodyShape.parse(body);
  return {
    shop: team,
    person: { id: user.id, name: user.name ?? user.username ?? user.id },
    channel: channel?.id ?? container?.channel_id ?? null,
    thread: message?.thread_ts ?? container?.thread_ts ?? null,
    responseUrl: response_url !== undefined && response_url !== '' ? response_url : null,
  };
};

type SlashWords = {
  readonly user_id: string;
  readonly user_name: string;
  readonly channel_id: string;
  readonly response_url: string;
};

/** Of a slash command; such a command is never given in a thread. */
export const commandHandle = (body: SlashWords, team: string): Handle => ({
  shop: team,
  person: { id: body.user_id, name: body.user_name },
  channel: body.channel_id,
  thread: null,
  responseUrl: body.response_url,
});

/** A reply that everybody in the channel may see, or only whoever asked. */
export const callOf = (
  handle: Handle,
  interactionId: string,
  given: Call['given'],
  isPrivate: boolean,
): Call => ({
  shop: handle.shop,
  person: handle.person,
  place: { channel: handle.channel ?? handle.person.id, thread: handle.thread, isPrivate },
  interactionId,
  given,
});

/** `only me` at either end of a line hides the reply; it is no word of the request. */
export const quietly = (
  typed: string,
  onlyMe: string,
): { readonly words: string; readonly isPrivate: boolean } => {
  const lower = typed.toLowerCase();
  if (lower === onlyMe) return { words: '', isPrivate: true };
  if (lower.endsWith(` ${onlyMe}`))
    return { words: typed.slice(0, -onlyMe.length).trim(), isPrivate: true };
  if (lower.startsWith(`${onlyMe} `))
    return { words: typed.slice(onlyMe.length).trim(), isPrivate: true };
  return { words: typed, isPrivate: false };
};

const identity = z.object({
  event_id: z.string().optional(),
  trigger_id: z.string().optional(),
  type: z.string().optional(),
  view: z.object({ id: z.string(), hash: z.string().optional() }).optional(),
});

/** One name for one interaction, however often Slack sends it; null for what may come again. */
export const interactionOf = (body: unknown): string | null => {
  const read = identity.safeParse(body);
  if (!read.success || read.data.type === 'block_suggestion') return null;
  const { event_id, trigger_id, view } = read.data;
  if (event_id !== undefined) return event_id;
  if (trigger_id !== undefined && trigger_id !== '') return trigger_id;
  return view === undefined ? null : `${view.id}-${view.hash ?? ''}`;
};

const stateValue = z.object({
  type: z.string(),
  value: z.string().nullish(),
  selected_option: z.object({ value: z.string() }).nullish(),
  selected_options: z.array(z.object({ value: z.string() })).optional(),
});
const stateShape = z.record(z.string(), z.record(z.string(), stateValue));

const readField = (field: z.infer<typeof stateValue>): string | boolean | null => {
  if (field.type === 'checkboxes') return (field.selected_options ?? []).length > 0;
  const typed = field.selected_option?.value ?? field.value ?? '';
  return typed.trim() === '' ? null : typed.trim();
};

/** What was filled in, under the names of the command's own parameters. */
export const filledIn = (
  state: unknown,
): { readonly options: Options; readonly isPrivate: boolean } => {
  const filled = Object.entries(stateShape.parse(state)).flatMap(([name, block]) =>
    Object.values(block).flatMap((field) => {
      const read = readField(field);
      return read === null || read === false ? [] : [[name, read] as const];
    }),
  );
  const options = Object.fromEntries(filled.filter(([name]) => name !== ONLY_ME_FIELD));
  return { options, isPrivate: filled.some(([name]) => name === ONLY_ME_FIELD) };
};
