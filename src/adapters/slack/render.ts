import type { ActionsBlock, Button, KnownBlock, SectionBlock } from '@slack/types';
import { unreachable } from '../../card/index.ts';
import type { SpokenCard } from '../../phrases/index.ts';
import { shortened } from '../common/fields.ts';
import { type Form, fit } from '../common/fit.ts';
import { type ControlId, idOf } from '../common/ids.ts';
import { type Piece, piecesOf } from '../common/pieces.ts';
import { escaped, literally } from './escape.ts';
import { LIMITS } from './limits.ts';

/** A message as Slack takes it, for every method that takes one. */
export type Message = {
  /** The first line: what notifications and screen readers say. */
  readonly text: string;
  readonly blocks: KnownBlock[];
};

/** A button that does not send a line of the card. */
export type ExtraButton = {
  readonly action: string;
  readonly value: string;
  readonly label: string;
};

export type Shown = {
  readonly card: SpokenCard;
  /** The interaction whose answer this is: what its buttons point at. */
  readonly of: string;
  /** It was asked for in private: what its buttons do stays there. */
  readonly wasPrivate: boolean;
  readonly extra?: readonly ExtraButton[];
  /** In front of the card: the only ones whom this message may ring, by Slack's own ids. */
  readonly rings?: readonly Ring[];
};
export type Ring = { readonly user: string } | { readonly group: string };

/** The action of every button that points at an earlier answer. */
export const CONTROL = 'control';

export const controlButton = (control: ControlId, label: string): ExtraButton => ({
  action: CONTROL,
  value: idOf(control),
  label,
});

/** A plain text is shown as it is: nothing in it is markup, and it rings nobody. */
export const plain = (text: string) => ({ type: 'plain_text', text, emoji: false }) as const;
const marked = (text: string) => ({ type: 'mrkdwn', text, verbatim: true }) as const;

/** What a piece says, in Slack's markup; null for what is no text of a message. */
const markupOf = (piece: Piece): string | null => {
  switch (piece.piece) {
    case 'headline':
      return `*${literally(piece.text)}*`;
    case 'line':
    case 'own':
    case 'footing':
      return literally(piece.text);
    case 'row':
      return `*${literally(piece.label)}*  ${literally(piece.text)}`;
    case 'check': {
      const { label, state, stateWord, text } = piece.check;
      const word = literally(stateWord);
      return `*${literally(label)}*  ${state === 'fine' ? word : `*${word}*`}  ${literally(text)}`;
    }
    case 'caution':
      return `•  ${literally(piece.text)}`;
    case 'choice':
      // A label too long for a button stands in the text, under the button's number.
      return piece.label.length > LIMITS.buttonLabel
        ? `${String(piece.index + 1)}  ${literally(piece.label)}`
        : null;
    case 'choices':
      return null;
    default:
      return unreachable(piece);
  }
};

/** Texts of one block of the card stand in one section, parted where a section is full. */
const sectionsOf = (pieces: readonly Piece[]): readonly SectionBlock[] => {
  const texts: { block: number; text: string }[] = [];
  for (const piece of pieces) {
    const text = markupOf(piece);
    if (text === null || text.trim() === '') continue;
    const last = texts.at(-1);
    const joined = last === undefined ? '' : `${last.text}\n${text}`;
    if (last?.block === piece.block && joined.length <= LIMITS.sectionText) last.text = joined;
    else texts.push({ block: piece.block, text });
  }
  return texts.map(({ text }) => ({ type: 'section', text: marked(text), expand: true }));
};

const buttonOf = ({ action, value, label }: ExtraButton, index: number): Button => ({
  type: 'button',
  action_id: `${action}:${String(index)}`,
  value,
  text: plain(shortened(label, LIMITS.buttonLabel)),
});

const choiceButton = (shown: Shown, piece: Extract<Piece, { piece: 'choice' }>): ExtraButton => {
  const { index, label } = piece;
  const control = {
    control: 'press',
    of: shown.of,
    choice: index,
    isPrivate: shown.wasPrivate,
  } as const;
  const isShort = label.trim() !== '' && label.length <= LIMITS.buttonLabel;
  return controlButton(control, isShort ? label : String(index + 1));
};

export const actionsOf = (buttons: readonly ExtraButton[]): readonly ActionsBlock[] =>
  Array.from({ length: Math.ceil(buttons.length / LIMITS.buttons) }, (_, block) => {
    const from = block * LIMITS.buttons;
    const some = buttons.slice(from, from + LIMITS.buttons);
    return { type: 'actions', elements: some.map((each, index) => buttonOf(each, from + index)) };
  });

const ringOf = (ring: Ring): string =>
  'user' in ring ? `<@${ring.user}>` : `<!subteam^${ring.group}>`;

const calling = ({ rings = [] }: Shown): readonly SectionBlock[] =>
  rings.length === 0 ? [] : [{ type: 'section', text: marked(rings.map(ringOf).join(' ')) }];

const firstText = (pieces: readonly Piece[]): string => {
  for (const piece of pieces) {
    if (piece.piece === 'check') return `${piece.check.label}: ${piece.check.text}`;
    if (piece.piece === 'choices') return piece.title;
    if (piece.piece === 'choice') return piece.label;
    if ('text' in piece && piece.text.trim() !== '') return piece.text;
  }
  return '';
};

const messageOf = (shown: Shown, pieces: readonly Piece[]): Message => {
  const isFirst = pieces.some((piece) => piece.piece === 'headline');
  const rung = isFirst ? (shown.rings ?? []).map((ring) => `${ringOf(ring)} `).join('') : '';
  const buttons = [
    ...pieces.flatMap((piece) => (piece.piece === 'choice' ? [choiceButton(shown, piece)] : [])),
    // With the first message: that is the one whose headline they belong to.
    ...(isFirst ? (shown.extra ?? []) : []),
  ];
  return {
    text: `${rung}${escaped(shortened(firstText(pieces), LIMITS.sectionText))}`,
    blocks: [...(isFirst ? calling(shown) : []), ...sectionsOf(pieces), ...actionsOf(buttons)],
  };
};

const fits = (message: Message): boolean =>
  message.blocks.length <= LIMITS.blocks &&
  message.text.length <= LIMITS.messageText &&
  message.blocks.every(
    (block) => block.type !== 'section' || (block.text?.text.length ?? 0) <= LIMITS.sectionText,
  ) &&
  JSON.stringify(message).length <= LIMITS.encoded;

const formOf = (shown: Shown): Form<Message> => ({
  encode: (pieces) => messageOf(shown, pieces),
  fits,
});

/** A card as the messages it takes: nearly always one. */
export const render = (shown: Shown): readonly Message[] =>
  fit(piecesOf(shown.card), formOf(shown)).filter((message) => message.blocks.length > 0);
