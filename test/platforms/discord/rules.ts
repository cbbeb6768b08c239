/**
 * What Discord refuses and its published description does not say: discord.com/developers/docs,
 * resources/message, components/reference and interactions (reported).
 */
export type Body = Readonly<Record<string, unknown>>;
export type MessageRoute = 'reply' | 'followUp' | 'editOriginal' | 'post' | 'edit';

export type Component = {
  readonly type: number;
  /** A number of its own; the platform gives one where none is said. */
  readonly id?: number;
  readonly custom_id?: string;
  readonly style?: number;
  readonly label?: string;
  readonly url?: string;
  readonly emoji?: unknown;
  readonly content?: string;
  readonly components?: readonly Component[];
  readonly component?: Component;
  readonly accessory?: Component;
  readonly file?: { readonly url: string };
  readonly items?: readonly { readonly media: { readonly url: string }; description?: string }[];
};

const ROW = 1;
const BUTTON = 2;
const FIELD = 4;
const TEXT = 10;
const LABEL = 18;
/** Those that only a message of components may hold. */
const NEWER: ReadonlySet<number> = new Set([9, TEXT, 11, 12, 13, 14, 17]);
const LINK_STYLE = 5;

export const FLAGS = {
  suppressEmbeds: 4,
  ephemeral: 64,
  silent: 4096,
  components: 32_768,
} as const;
const TAKEN: { readonly [R in MessageRoute]: number } = {
  reply: FLAGS.suppressEmbeds | FLAGS.ephemeral | FLAGS.silent | FLAGS.components,
  followUp: FLAGS.suppressEmbeds | FLAGS.ephemeral | FLAGS.silent | FLAGS.components,
  editOriginal: FLAGS.suppressEmbeds | FLAGS.components,
  post: FLAGS.suppressEmbeds | FLAGS.silent | FLAGS.components,
  edit: FLAGS.suppressEmbeds | FLAGS.components,
};

const MOST = { rows: 5, components: 40, text: 4000, embeds: 6000, fields: 5, command: 8000 };

/** A component and all inside it. */
export const allOf = (components: readonly Component[]): readonly Component[] =>
  components.flatMap((each) => [
    each,
    ...allOf(each.components ?? []),
    ...allOf(each.component === undefined ? [] : [each.component]),
    ...allOf(each.accessory === undefined ? [] : [each.accessory]),
  ]);

const twice = (names: readonly string[]): readonly string[] =>
  names.filter((name, index) => names.indexOf(name) !== index);

/** Who is named in a text: `@1`, `&2` for a role, `everyone`. */
export const namedIn = (text: string): readonly string[] => [
  ...[...text.matchAll(/(?<!\\)<@!?(\d+)>/gu)].map(([, id]) => `@${id ?? ''}`),
  ...[...text.matchAll(/(?<!\\)<@&(\d+)>/gu)].map(([, id]) => `&${id ?? ''}`),
  ...[...text.matchAll(/(?<!\\)@(everyone|here)/gu)].map(([, name]) => name ?? ''),
];

const embedLength = (embed: Body): number =>
  JSON.stringify(embed, (key, value: unknown) =>
    ['url', 'color', 'type', 'timestamp', 'inline'].includes(key) ? undefined : value,
  )
    .match(/(?<=:)"(?:[^"\\]|\\.)*"/gu)
    ?.reduce((sum, text) => sum + (JSON.parse(text) as string).length, 0) ?? 0;

const idFaults = (components: readonly Component[]): readonly string[] => [
  ...components.flatMap(({ type, style, custom_id, url, label, emoji }) => {
    if (type !== BUTTON) return [];
    const isLink = style === LINK_STYLE;
    return [
      ...(isLink === (custom_id !== undefined) ? ['a button without its custom_id'] : []),
      ...(isLink === (url === undefined) ? ['a button with an address, or without one'] : []),
      ...((label ?? '').trim() === '' && emoji === undefined ? ['a button that says nothing'] : []),
    ];
  }),
  ...twice(components.flatMap(({ custom_id }) => custom_id ?? [])).map(
    (id) => `two components named ${id}`,
  ),
];

const componentFaults = (body: Body): readonly string[] => {
  const top = (body['components'] ?? []) as readonly Component[];
  const all = allOf(top);
  const isNew = (Number(body['flags'] ?? 0) & FLAGS.components) !== 0;
  if (!isNew)
    return [
      ...(top.length > MOST.rows ? [`${String(top.length)} rows`] : []),
      ...(all.some(({ type }) => NEWER.has(type)) ? ['newer components without their flag'] : []),
      ...idFaults(all),
    ];
  const text = all.reduce(
    (sum, each) => sum + (each.type === TEXT ? (each.content ?? '') : '').length,
    0,
  );
  return [
    ...(['content', 'embeds', 'poll', 'sticker_ids'] as const).flatMap((name) =>
      body[name] === undefined ? [] : [`${name} beside components`],
    ),
    ...(top.length === 0 ? ['no components'] : []),
    ...(all.length > MOST.components ? [`${String(all.length)} components`] : []),
    ...(text > MOST.text ? [`texts of ${String(text)} characters`] : []),
    ...idFaults(all),
  ];
};

type Attachment = {
  readonly id: string;
  readonly filename?: string;
  readonly description?: string;
};

const fileFaults = (body: Body, files: readonly string[]): readonly string[] => {
  const said = (body['attachments'] ?? []) as readonly Attachment[];
  const items = allOf((body['components'] ?? []) as readonly Component[]).flatMap(
    ({ items: inside = [] }) => inside,
  );
  const pictures = items.map(({ media }) => media.url);
  // A file that is handed over is its name; only a picture needs words.
  const handed = ((body['components'] ?? []) as readonly Component[]).flatMap(({ file }) =>
    file === undefined ? [] : [file.url],
  );
  const shown = [...pictures, ...handed];
  return [
    ...files.flatMap((name, index) => {
      const about = said.find(({ id }) => id === String(index));
      const url = `attachment://${name}`;
      return [
        ...(pictures.includes(url) && (about?.description ?? '') === ''
          ? [`${name} without words`]
          : []),
        ...(shown.includes(url) ? [] : [`${name} is shown nowhere`]),
      ];
    }),
    ...shown.flatMap((url) =>
      url.startsWith('attachment://') && !files.includes(url.slice('attachment://'.length))
        ? [`no file for ${url}`]
        : [],
    ),
    ...(items.some(({ description = '' }) => description === '')
      ? ['a picture without words']
      : []),
  ];
};

/** Everything that is wrong with a message beyond its schema. */
export const messageFaults = (
  route: MessageRoute,
  body: Body,
  files: readonly string[],
): readonly string[] => {
  const embeds = (body['embeds'] ?? []) as readonly Body[];
  const flags = Number(body['flags'] ?? 0);
  const isEmpty =
    ((body['content'] ?? '') as string).trim() === '' &&
    embeds.length === 0 &&
    ((body['components'] ?? []) as readonly unknown[]).length === 0 &&
    files.length === 0;
  return [
    ...(isEmpty ? ['an empty message'] : []),
    ...(body['allowed_mentions'] === undefined ? ['it may ring anybody'] : []),
    ...((flags & ~TAKEN[route]) === 0 ? [] : [`flags ${String(flags)} by ${route}`]),
    ...(embeds.reduce((sum, each) => sum + embedLength(each), 0) > MOST.embeds
      ? ['embeds too long together']
      : []),
    ...componentFaults(body),
    ...fileFaults(body, files),
  ];
};

/** Everything that is wrong with a form beyond its schema. */
export const formFaults = (body: Body): readonly string[] => {
  const top = (body['components'] ?? []) as readonly Component[];
  const fields = allOf(top).filter(({ type }) => type !== ROW && type !== LABEL && type !== TEXT);
  return [
    ...(top.length > MOST.fields ? [`a form of ${String(top.length)} components`] : []),
    ...(fields.length === 0 ? ['a form that asks nothing'] : []),
    ...(fields.some(({ custom_id }) => custom_id === undefined) ? ['a field without a name'] : []),
    ...(fields.some((each) => each.type === FIELD && each.label !== undefined)
      ? ['a field with two labels']
      : []),
    ...twice(fields.flatMap(({ custom_id }) => custom_id ?? [])).map(
      (id) => `two fields named ${id}`,
    ),
  ];
};

type Option = {
  readonly type: number;
  readonly name: string;
  readonly required?: boolean;
  readonly autocomplete?: boolean;
  readonly options?: readonly Option[];
  readonly choices?: readonly { readonly name: string; readonly value: unknown }[];
};

const SUBCOMMANDS: ReadonlySet<number> = new Set([1, 2]);
const CHAT = 1;

const optionFaults = (options: readonly Option[]): readonly string[] => [
  ...twice(options.map(({ name }) => name)).map((name) => `two options named ${name}`),
  ...(options.some(
    (each, index) =>
      each.required === true && options.slice(0, index).some(({ required }) => required !== true),
  )
    ? ['a required option behind one that is not']
    : []),
  ...(options.some(({ type }) => SUBCOMMANDS.has(type)) &&
  options.some(({ type }) => !SUBCOMMANDS.has(type))
    ? ['options beside sub-commands']
    : []),
  ...options.flatMap((each) => [
    ...(/^[-_'\p{Ll}\p{Lo}\p{N}]{1,32}$/u.test(each.name) ? [] : [`an option named ${each.name}`]),
    ...(each.autocomplete === true && each.choices !== undefined
      ? [`choices and suggestions for ${each.name}`]
      : []),
    ...twice((each.choices ?? []).map(({ name }) => name)).map((name) => `two choices ${name}`),
    ...optionFaults(each.options ?? []),
  ]),
];

/** Characters that count for a command: names, descriptions and values of all of it. */
const commandLength = (value: unknown, key = ''): number => {
  if (typeof value === 'string')
    return ['name', 'description', 'value'].includes(key) ? value.length : 0;
  if (typeof value !== 'object' || value === null) return 0;
  return Object.entries(value).reduce(
    (sum, [name, each]: [string, unknown]) => sum + commandLength(each, name),
    0,
  );
};

/** Everything that is wrong with a command beyond its schema. */
export const commandFaults = (body: Body): readonly string[] => {
  const isChat = body['type'] === CHAT;
  const length = commandLength(body);
  return [
    ...(length > MOST.command ? [`a command of ${String(length)} characters`] : []),
    ...(isChat === ((body['description'] ?? '') === '')
      ? ['a description where none belongs']
      : []),
    ...(isChat && !/^[-_'\p{Ll}\p{Lo}\p{N}]{1,32}$/u.test(String(body['name']))
      ? [`a command named ${String(body['name'])}`]
      : []),
    ...optionFaults((body['options'] ?? []) as readonly Option[]),
  ];
};
