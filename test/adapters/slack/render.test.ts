/** Generated cards: every message within every limit, and nothing that a card says is lost. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { spoken } from '../../../src/adapters/common/spoken.ts';
import { literally, typedText } from '../../../src/adapters/slack/escape.ts';
import { verbForm } from '../../../src/adapters/slack/form.ts';
import { homeView } from '../../../src/adapters/slack/home.ts';
import { type Message, render } from '../../../src/adapters/slack/render.ts';
import { mm } from '../../../src/calc/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/slack/people.ts';
import { ruleFaults } from '../../platforms/slack/rules.ts';
import { bodyCheck, mostIn, slackSchema } from '../../platforms/slack/schemas.ts';
import { deskIn } from '../../support/desk.ts';
import { anyCard, bare, saidBy } from '../contract/anyCard.ts';

const check = bodyCheck();
const faultsIn = (message: Message): readonly string[] =>
  [check('message', message), ...ruleFaults('message', message)].filter((each) => each !== null);

const card = anyCard(['<!channel>', '<@U0SOMEBODY>', '&amp;', '*bold*', '_so_', '`x`', '~', '>']);

/** What is read in a message, marks taken as marks. */
const readIn = ({ blocks }: Message): string =>
  blocks.flatMap((block) => (block.type === 'section' ? [block.text?.text ?? ''] : [])).join('\n');

test('generated cards: within every limit, nothing lost, every choice has its button', () => {
  fc.assert(
    fc.property(card, (generated) => {
      const messages = render({ card: generated, of: 'Ev1', wasPrivate: false });
      for (const message of messages) expect(faultsIn(message)).toEqual([]);
      const read = bare(messages.map(readIn).join('\n'));
      // A text that was parted stands in two places, one after the other.
      for (const said of saidBy(generated))
        expect(read.replaceAll('**', '')).toContain(bare(literally(said)));
      const values = messages.flatMap((message) => buttonsOf(message).map(({ value }) => value));
      expect(values).toEqual(generated.choices.map((_, index) => `p:${String(index)}:Ev1`));
    }),
    { numRuns: 60 },
  );
});

test('what a person typed comes back as it was typed', () => {
  fc.assert(
    fc.property(fc.string(), (typed) => {
      const escaped = typed
        .replaceAll('&', '&amp;')
        .replaceAll('<', '&lt;')
        .replaceAll('>', '&gt;');
      expect(typedText(escaped)).toBe(typed.replaceAll(/\s+/gu, ' ').trim());
    }),
  );
});

describe('the limits come from the types', () => {
  test('lengths are read out of the comments', () => {
    expect(mostIn('Maximum length for this field is 255 characters.')).toBe(255);
    expect(mostIn('There is a maximum of 25 elements in each action block.')).toBe(25);
    expect(mostIn('The minimum length is 1 and maximum length is 3000 characters.')).toBe(3000);
    expect(mostIn('An array of up to 5 options')).toBe(5);
    expect(mostIn('The type of block.')).toBeNull();
    const limits = JSON.stringify(slackSchema()).match(/"max(?:Length|Items)":\d+/gu) ?? [];
    expect(limits.length).toBeGreaterThan(100);
  });

  test.each([
    ['a section too long', [{ type: 'section', text: { type: 'mrkdwn', text: 'a'.repeat(3001) } }]],
    ['an unknown block', [{ type: 'banner' }]],
    ['an unknown property', [{ type: 'divider', colour: 'red' }]],
    [
      'a label too long',
      [
        {
          type: 'actions',
          elements: [{ type: 'button', text: { type: 'plain_text', text: 'a'.repeat(76) } }],
        },
      ],
    ],
    ['too many blocks', Array.from({ length: 51 }, () => ({ type: 'divider' }))],
    ['somebody rung', [{ type: 'section', text: { type: 'mrkdwn', text: '<!channel>' } }]],
  ])('%s is refused', (_what, blocks) => {
    const message = { text: 'x', blocks } as unknown as Message;
    expect(faultsIn(message)).not.toEqual([]);
  });
});

test('every verb has a form within the limits, and the home too', () => {
  const handle = {
    shop: 'T0SHOP',
    person: { id: 'U0OPERATOR', name: 'robin' },
    channel: 'C0FLOORSHOP',
    thread: null,
    responseUrl: 'https://hooks.example/commands/T0SHOP/1/abc',
  };
  for (const command of FLEET) {
    const view = verbForm({ book: en, handle, isPrivate: false }, command);
    expect(check('modal', view)).toBeNull();
    expect(ruleFaults('view', view)).toEqual([]);
  }
  const standard = {
    part: 'P'.repeat(200),
    revision: 12,
    blankDiameter: mm(25),
    toothCount: 65,
    units: 'in',
    words: `/knurl standard show "${'P'.repeat(200)}"`,
  } as const;
  const home = homeView(en, FLEET, Array(20).fill(standard) as (typeof standard)[]);
  expect(check('home', home)).toBeNull();
  expect(ruleFaults('view', home)).toEqual([]);
});

/** Kept as files; `npm test -- test/adapters/slack/render -u` writes them anew. */
const WORK = FLEET.filter(({ path }) => path[0] === 'knurl');
test.each(WORK.map((command) => [command.path.join(' '), command] as const))(
  'golden: /%s',
  async (name, command) => {
    const answer = await deskIn('in').answer({
      shop: 'T0SHOP',
      person: { id: 'U0OPERATOR', name: 'robin' },
      place: { channel: 'C0FLOORSHOP', thread: null, isPrivate: false },
      interactionId: 'Ev1',
      given: { words: command.examples[0] ?? `/${name}` },
    });
    const messages = render({ card: spoken(answer, en), of: 'Ev1', wasPrivate: false });
    for (const message of messages) expect(faultsIn(message)).toEqual([]);
    await expect(`${JSON.stringify(messages, null, 2)}\n`).toMatchFileSnapshot(
      `goldens/${name.replaceAll(' ', '-')}.txt`,
    );
  },
);
