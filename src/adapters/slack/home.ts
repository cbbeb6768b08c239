import type { HomeView, KnownBlock } from '@slack/types';
import type { Command, PinnedStandard } from '../../desk/index.ts';
import { type Book, showIn } from '../../phrases/index.ts';
import { shortened } from '../common/fields.ts';
import { verbSummary } from '../common/spoken.ts';
import { optionOf } from './form.ts';
import { LIMITS } from './limits.ts';
import { actionsOf, type ExtraButton, plain } from './render.ts';

/** Opens the form of a verb: the button carries its name, the menu a list of them. */
export const OPEN = 'open';
export const CHOOSE = 'choose';

export const openButton = ({ path }: Command, label: string): ExtraButton => ({
  action: OPEN,
  value: path.join(' '),
  label,
});

const hasForm = ({ parameters }: Command): boolean => parameters.length > 0;

/** One menu for every verb that can be filled in. */
export const verbMenu = (book: Book, commands: readonly Command[]): readonly KnownBlock[] => {
  const options = commands
    .filter(hasForm)
    .slice(0, LIMITS.options)
    .map((command) => optionOf(`/${command.path.join(' ')}`, command.path.join(' ')));
  if (options.length === 0) return [];
  return [
    {
      type: 'actions',
      elements: [
        {
          type: 'static_select',
          action_id: CHOOSE,
          placeholder: plain(book.slack.choose),
          options,
        },
      ],
    },
  ];
};

/** Verbs that stand by themselves; the rest is in the menu. Judgement: what a phone shows at once. */
const SHOWN = 5;

const verbBlocks = (book: Book, command: Command): readonly KnownBlock[] => [
  {
    type: 'section',
    text: plain(shortened(verbSummary(book, command), LIMITS.summary)),
  },
  ...actionsOf([openButton(command, `/${command.path.join(' ')}`)]),
];

/** Sends the line that stands behind it, answered to whoever presses it alone. */
export const SAY = 'say';

const standardBlocks = (book: Book, pinned: readonly PinnedStandard[]): readonly KnownBlock[] =>
  pinned.length === 0
    ? []
    : [
        { type: 'header', text: plain(book.slack.standards) },
        ...pinned.map(
          (standard, index): KnownBlock => ({
            type: 'section',
            text: plain(book.slack.standard(standard, showIn(standard.units))),
            accessory: {
              type: 'button',
              action_id: `${SAY}:${String(index)}`,
              value: standard.words,
              text: plain(book.slack.showStandard),
            },
          }),
        ),
      ];

/** What a person finds under the bot's own name: what the shop has decided, and the forms. */
export const homeView = (
  book: Book,
  fleet: readonly Command[],
  pinned: readonly PinnedStandard[] = [],
): HomeView => {
  const forms = fleet.filter(hasForm);
  return {
    type: 'home',
    blocks: [
      { type: 'section', text: plain(book.slack.home) },
      ...standardBlocks(book, pinned),
      ...forms.slice(0, SHOWN).flatMap((command) => verbBlocks(book, command)),
      ...(forms.length > SHOWN ? verbMenu(book, forms) : []),
      { type: 'context', elements: [plain(book.footing)] },
    ],
  };
};
