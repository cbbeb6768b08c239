import {
  type APIButtonComponentWithCustomId,
  type APIMessageTopLevelComponent,
  type APITextInputComponent,
  ButtonStyle,
  ComponentType,
  MessageFlags,
  type RawFile,
  TextInputStyle,
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
      readonly description: string;
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
  readonly pictures?: readonly Drawn[];
  readonly extra?: readonly ExtraButton[];
  readonly isPrivate: boolean;
  /** It was asked for in private: what its buttons do stays there. */
  readonly wasPrivate: boolean;
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
    case 'picture':
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
            description: alt.slice(0, LIMITS.altText),
          })),
        },
      ];

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
  { of, wasPrivate }: Shown,
  { index, label }: Extract<Piece, { piece: 'choice' }>,
) =>
  button(
    { control: 'press', of, choice: index, isPrivate: wasPrivate },
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
  const pictures = pieces.flatMap((piece) => (piece.piece === 'picture' ? [piece.drawn] : []));
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
        ...galleryOf(pictures),
        ...rowsOf(buttons),
      ],
      allowed_mentions: { parse: [], ...shown.rings },
      ...(pictures.length === 0
        ? {}
        : {
            attachments: pictures.map(({ name, alt }, index) => ({
              id: String(index),
              filename: name,
              description: alt.slice(0, LIMITS.altText),
            })),
          }),
    },
    files: pictures.map(({ name, bytes }) => ({
      name,
      data: Buffer.from(bytes),
      contentType: 'image/png',
    })),
  };
};

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

const fits = ({ body, files }: Message): boolean =>
  body.components.length > 0 &&
  count(body.components) <= LIMITS.components &&
  textLength(body.components) <= LIMITS.messageText &&
  files.length <= LIMITS.galleryItems;

const formOf = (shown: Shown): Form<Message> => ({
  encode: (pieces) => messageOf(shown, pieces),
  // A title alone says nothing, but it goes with what follows it.
  fits: (message) => message.body.components.length === 0 || fits(message),
});

/** A card as the messages it takes: nearly always one. */
export const render = (shown: Shown): readonly Message[] =>
  fit(piecesOf(shown.card, shown.pictures), formOf(shown)).filter(
    (message) => message.body.components.length > 0,
  );

/** One field of a form. */
export type Field = {
  readonly name: string;
  readonly label: string;
  readonly example: string;
  readonly value?: string;
  readonly long?: boolean;
};

const fieldOf = (field: Field): APITextInputComponent => ({
  type: ComponentType.TextInput,
  custom_id: field.name.slice(0, LIMITS.customId),
  style: field.long === true ? TextInputStyle.Paragraph : TextInputStyle.Short,
  max_length: LIMITS.modalText,
  required: false,
  ...(field.example === '' ? {} : { placeholder: field.example.slice(0, LIMITS.choiceName) }),
  ...(field.value === undefined ? {} : { value: field.value.slice(0, LIMITS.modalText) }),
});

/** A form that asks for what a line still needs. */
export const formOfFields = (control: ControlId, title: string, fields: readonly Field[]) => ({
  custom_id: idOf(control),
  title: shortened(title, LIMITS.modalTitle),
  components: fields.slice(0, LIMITS.modalFields).map((field) => ({
    type: ComponentType.Label as const,
    label: shortened(field.label, LIMITS.modalLabel),
    component: fieldOf(field),
  })),
});
