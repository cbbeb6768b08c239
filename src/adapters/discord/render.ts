import {
  type APIButtonComponentWithCustomId,
  type APIMessageTopLevelComponent,
  ButtonStyle,
  ComponentType,
  MessageFlags,
  type RawFile,
} from 'discord.js';
import { unreachable } from '../../card/index.ts';
import type { SpokenCard } from '../../phrases/index.ts';
import { shortened } from '../common/fields.ts';
import { type Form, fit } from '../common/fit.ts';
import { type ControlId, idOf } from '../common/ids.ts';
import { type Drawn, type Piece, piecesOf } from '../common/pieces.ts';
import { escaped } from './escape.ts';
import { LIMITS } from './limits.ts';

/** A message as Discord takes it, for every route that takes one. */
export type Message = {
  readonly body: {
    readonly flags: number;
    readonly components: readonly APIMessageTopLevelComponent[];
    readonly allowed_mentions: {
      readonly parse: readonly [];
      readonly users?: readonly string[];
      readonly roles?: readonly string[];
    };
    readonly attachments?: readonly {
      readonly id: string;
      readonly filename: string;
      readonly description?: string;
    }[];
  };
  readonly files: readonly RawFile[];
};

/** Buttons that do not send a line: said by whoever renders. */
export type ExtraButton = { readonly control: ControlId; readonly label: string };

export type Shown = {
  readonly card: SpokenCard;
  /** The interaction whose answer this is: what its buttons point at. */
  readonly of: string;
  readonly extra?: readonly ExtraButton[];
  readonly isPrivate: boolean;
  /** It was asked for in private: what its buttons do stays there. */
  readonly wasPrivate: boolean;
  /** Whose it is, where the message itself does not tell: in a direct message. */
  readonly shop?: string;
  /** The only ones whom this message may ring. */
  readonly rings?: Rings;
  /** In front of the card, beside those it rings. */
  readonly note?: string;
};
export type Rings = { readonly users?: readonly string[]; readonly roles?: readonly string[] };

const NO_EMBEDS = MessageFlags.SuppressEmbeds;

/** What a piece says, in Discord's markup; null for what is no text. */
const textOf = (piece: Piece): string | null => {
  switch (piece.piece) {
    case 'headline':
      return `### ${escaped(piece.text)}`;
    case 'line':
    case 'own':
      return escaped(piece.text);
    case 'row':
      return `**${escaped(piece.label)}**  ${escaped(piece.text)}`;
    case 'check':
      return `**${escaped(piece.check.label)}**  ${piece.check.state === 'fine' ? escaped(piece.check.stateWord) : `**${escaped(piece.check.stateWord)}**`}  ${escaped(piece.check.text)}`;
    case 'caution':
      return `- ${escaped(piece.text)}`;
    case 'footing':
      return `-# ${escaped(piece.text)}`;
    case 'choice':
      // A label too long for a button stands in the text, under the button's number.
      return piece.label.length > LIMITS.buttonLabel
        ? `${String(piece.index + 1)}  ${escaped(piece.label)}`
        : null;
    case 'choices':
      return null;
    default:
      return unreachable(piece);
  }
};

/** Texts of one block stand in one component, so that a card stays far from the most a message holds. */
const textComponents = (pieces: readonly Piece[]): readonly APIMessageTopLevelComponent[] => {
  const blocks = new Map<number, string[]>();
  for (const piece of pieces) {
    const text = textOf(piece);
    if (text === null || text.trim() === '') continue;
    blocks.set(piece.block, [...(blocks.get(piece.block) ?? []), text]);
  }
  return [...blocks.values()].map((texts) => ({
    type: ComponentType.TextDisplay,
    content: texts.join('\n'),
  }));
};

const galleryOf = (pictures: readonly Drawn[]): readonly APIMessageTopLevelComponent[] =>
  pictures.length === 0
    ? []
    : [
        {
          type: ComponentType.MediaGallery,
          items: pictures.map(({ name, alt }) => ({
            media: { url: `attachment://${name}` },
            description: shortened(alt, LIMITS.altText),
          })),
        },
      ];

const noteOf = (note: string | null): readonly APIMessageTopLevelComponent[] =>
  note === null ? [] : [{ type: ComponentType.TextDisplay, content: `-# ${escaped(note)}` }];

/** The same message with its pictures, or with a word about them, between its text and its buttons. */
export const pictured = (
  { body }: Message,
  pictures: readonly Drawn[],
  note: string | null,
): Message => {
  const buttons = body.components.findIndex(({ type }) => type === ComponentType.ActionRow);
  const at = buttons < 0 ? body.components.length : buttons;
  return {
    body: {
      ...body,
      components: [
        ...body.components.slice(0, at),
        ...galleryOf(pictures),
        ...noteOf(note),
        ...body.components.slice(at),
      ],
      attachments: pictures.map(({ name, alt }, index) => ({
        id: String(index),
        filename: name,
        description: shortened(alt, LIMITS.altText),
      })),
    },
    files: pictures.map(({ name, bytes }) => ({
      name,
      data: Buffer.from(bytes),
      contentType: 'image/png',
    })),
  };
};

const button = (control: ControlId, label: string): APIButtonComponentWithCustomId => ({
  type: ComponentType.Button,
  style: ButtonStyle.Secondary,
  label,
  custom_id: idOf(control),
});

const rowsOf = (
  buttons: readonly APIButtonComponentWithCustomId[],
): readonly APIMessageTopLevelComponent[] =>
  Array.from({ length: Math.ceil(buttons.length / LIMITS.buttonsInRow) }, (_, row) => ({
    type: ComponentType.ActionRow,
    components: buttons.slice(row * LIMITS.buttonsInRow, (row + 1) * LIMITS.buttonsInRow),
  }));

const choiceButton = (
  { of, wasPrivate, shop }: Shown,
  { index, label }: Extract<Piece, { piece: 'choice' }>,
) =>
  button(
    {
      control: 'press',
      of,
      choice: index,
      isPrivate: wasPrivate,
      ...(shop === undefined ? {} : { shop }),
    },
    label.trim() === '' || label.length > LIMITS.buttonLabel ? String(index + 1) : label,
  );

/** Who is meant, in Discord's own way of writing it, and why. */
const calling = ({ rings, note }: Shown): readonly APIMessageTopLevelComponent[] => {
  const names = [
    ...(rings?.users ?? []).map((id) => `<@${id}>`),
    ...(rings?.roles ?? []).map((id) => `<@&${id}>`),
    ...(note === undefined ? [] : [escaped(note)]),
  ];
  return names.length === 0 ? [] : [{ type: ComponentType.TextDisplay, content: names.join(' ') }];
};

const messageOf = (shown: Shown, pieces: readonly Piece[]): Message => {
  const isFirst = pieces.some((piece) => piece.piece === 'headline');
  const buttons = [
    ...pieces.flatMap((piece) => (piece.piece === 'choice' ? [choiceButton(shown, piece)] : [])),
    // With the first message: that is the one whose headline they belong to.
    ...(isFirst ? (shown.extra ?? []) : []).map(({ control, label }) => button(control, label)),
  ];
  return {
    body: {
      flags:
        MessageFlags.IsComponentsV2 | NO_EMBEDS | (shown.isPrivate ? MessageFlags.Ephemeral : 0),
      components: [
        ...(isFirst ? calling(shown) : []),
        ...textComponents(pieces),
        ...rowsOf(buttons),
      ],
      allowed_mentions: { parse: [], ...shown.rings },
    },
    files: [],
  };
};

/** A sentence with files, for one person alone. */
export const sentenceWith = (
  text: string,
  files: readonly { readonly name: string; readonly bytes: Buffer }[],
): Message => ({
  body: {
    flags: MessageFlags.IsComponentsV2 | NO_EMBEDS | MessageFlags.Ephemeral,
    components: [
      { type: ComponentType.TextDisplay, content: escaped(text) },
      ...files.map(
        ({ name }): APIMessageTopLevelComponent => ({
          type: ComponentType.File,
          file: { url: `attachment://${name}` },
        }),
      ),
    ],
    allowed_mentions: { parse: [] },
    attachments: files.map(({ name }, index) => ({ id: String(index), filename: name })),
  },
  files: files.map(({ name, bytes }) => ({ name, data: bytes })),
});

/** Where it is seen by one person anyhow. */
export const openly = (message: Message): Message => ({
  ...message,
  body: { ...message.body, flags: message.body.flags & ~MessageFlags.Ephemeral },
});

/** All components of a message, those inside others too. */
const count = (components: readonly object[]): number =>
  components.reduce(
    (sum, each) =>
      sum +
      1 +
      ('components' in each && Array.isArray(each.components) ? each.components.length : 0),
    0,
  );

const textLength = (components: readonly APIMessageTopLevelComponent[]): number =>
  components.reduce(
    (sum, each) => sum + (each.type === ComponentType.TextDisplay ? each.content.length : 0),
    0,
  );

/** Kept free in every message for a picture that comes later, or a word about one that does not. */
const ROOM = { components: 2, text: 200 } as const;

const fits = ({ body }: Message): boolean =>
  body.components.length > 0 &&
  count(body.components) <= LIMITS.components - ROOM.components &&
  textLength(body.components) <= LIMITS.messageText - ROOM.text;

const formOf = (shown: Shown): Form<Message> => ({
  encode: (pieces) => messageOf(shown, pieces),
  // A title alone says nothing, but it goes with what follows it.
  fits: (message) => message.body.components.length === 0 || fits(message),
});

/** A card as the messages it takes: nearly always one. */
export const render = (shown: Shown): readonly Message[] =>
  fit(piecesOf(shown.card), formOf(shown)).filter((message) => message.body.components.length > 0);
