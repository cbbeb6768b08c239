/** Generated cards: every message within every limit, and nothing that a card says is lost. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { escaped } from '../../../src/adapters/discord/escape.ts';
import { LIMITS } from '../../../src/adapters/discord/limits.ts';
import { render } from '../../../src/adapters/discord/render.ts';
import { type Outgoing, outgoingFaults } from '../../platforms/discord/outgoing.ts';
import { textsIn } from '../../platforms/discord/payloads.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import { namedIn } from '../../platforms/discord/rules.ts';
import { bodyCheck } from '../../platforms/discord/schemas.ts';
import { anyCard, bare, saidBy } from '../contract/anyCard.ts';

const MARKUP = [
  '@everyone',
  '@here',
  '<@1300000000000000002>',
  '<@&1200000000000000011>',
  '<#1400000000000000001>',
  '</knurl setup:1>',
  '<t:1790000000:R>',
  '**bold**',
  '_so_',
  '`x`',
  '```js',
  '||hidden||',
  '~~no~~',
  '# head',
  '-# small',
  '> said',
  '- one',
  '1. one',
  '[here](https://x.example)',
  'discord.gg/abcdef',
  'https://discord.com/invite/abcdef',
  '\\',
];

const shown = (card: Parameters<typeof render>[0]['card']) => ({
  card,
  of: '1500000000000000001',
  isPrivate: false,
  wasPrivate: false,
});

test('generated cards: within every limit, nothing lost, every choice has its button', () => {
  fc.assert(
    fc.property(anyCard(MARKUP), (card) => {
      const messages = render(shown(card));
      for (const { body } of messages) expect(outgoingFaults('post', body)).toEqual([]);
      const read = bare(messages.flatMap(({ body }) => textsIn(body)).join('\n'));
      // A text that was parted stands in two places, one after the other.
      for (const said of saidBy(card))
        expect(read.replaceAll('**', '')).toContain(bare(escaped(said)).replaceAll('**', ''));
      const ids = messages.flatMap((message) =>
        buttonsOf(message).map(({ custom_id }) => custom_id),
      );
      expect(ids).toEqual(card.choices.map((_, index) => `p:${String(index)}:1500000000000000001`));
    }),
    { numRuns: 60 },
  );
});

test('generated cards ring nobody and hide nothing', () => {
  fc.assert(
    fc.property(anyCard(MARKUP), (card) => {
      for (const { body } of render(shown(card))) {
        expect(body.allowed_mentions).toEqual({ parse: [] });
        expect(textsIn(body).flatMap(namedIn)).toEqual([]);
      }
    }),
    { numRuns: 30 },
  );
});

describe('what Discord refuses, the counterpart refuses', () => {
  const V2 = 32_768;
  const text = (content: string) => ({ type: 10, content });
  const button = (more: object) => ({ type: 2, style: 2, label: 'x', ...more });
  const row = (...components: readonly object[]) => ({ type: 1, components });
  const said = (components: readonly object[], more = {}) => ({
    flags: V2,
    components,
    allowed_mentions: { parse: [] },
    ...more,
  });

  test('a good message is taken', () => {
    const good = said([text('hello'), row(button({ custom_id: 'a' }))]);
    expect(outgoingFaults('post', good)).toEqual([]);
  });

  const field = (custom_id: string) => ({
    type: 18,
    label: 'x',
    component: { type: 4, custom_id, style: 1 },
  });
  const form = (...components: readonly object[]) => ({
    type: 9,
    data: { custom_id: 'f', title: 'x', components },
  });
  const rows = (count: number) =>
    Array.from({ length: count }, (_, i) => row(button({ custom_id: String(i) })));
  const embed = { fields: [{ name: 'x'.repeat(256), value: 'x'.repeat(1000) }] };

  test.each<[string, Outgoing, object]>([
    ['texts too long together', 'post', said([text('a'.repeat(2500)), text('b'.repeat(1501))])],
    ['too many components', 'post', said(rows(21))],
    ['more than five rows', 'post', { ...said(rows(6)), flags: 0 }],
    ['content beside components', 'post', said([text('a')], { content: 'b' })],
    ['newer components without the flag', 'post', { ...said([text('a')]), flags: 0 }],
    ['a button without an id', 'post', said([row(button({}))])],
    [
      'two buttons of one id',
      'post',
      said([row(button({ custom_id: 'a' }), button({ custom_id: 'a' }))]),
    ],
    ['an unknown property', 'post', said([{ ...text('a'), colour: 3 }])],
    ['an unknown component', 'post', said([{ type: 99 }])],
    ['a label too long', 'post', said([row(button({ custom_id: 'a', label: 'x'.repeat(81) }))])],
    [
      'six buttons in a row',
      'post',
      said([row(...rows(6).flatMap(({ components }) => components))]),
    ],
    ['a nonce too long', 'post', said([text('a')], { nonce: '1'.repeat(26) })],
    ['a message that may ring anybody', 'post', { flags: V2, components: [text('a')] }],
    ['a private message in a channel', 'post', { ...said([text('a')]), flags: V2 | 64 }],
    ['nothing at all', 'post', said([])],
    [
      'embeds too long together',
      'post',
      { embeds: Array.from({ length: 5 }, () => embed), allowed_mentions: { parse: [] } },
    ],
    [
      'a picture that is not there',
      'post',
      said([{ type: 12, items: [{ media: { url: 'attachment://a.png' }, description: 'a' }] }]),
    ],
    ['six fields in a form', 'form', form(...['a', 'b', 'c', 'd', 'e', 'f'].map(field))],
    ['two fields of one name', 'form', form(field('a'), field('a'))],
    ['an empty form', 'form', form()],
    [
      '26 suggestions',
      'suggestions',
      {
        type: 8,
        data: {
          choices: Array.from({ length: 26 }, (_, i) => ({ name: String(i), value: String(i) })),
        },
      },
    ],
    ['a command with capitals', 'command', { type: 1, name: 'Knurl', description: 'x' }],
    [
      'a command too long',
      'command',
      {
        type: 1,
        name: 'knurl',
        description: 'x',
        options: Array.from({ length: 25 }, (_, i) => ({
          type: 1,
          name: `v${String(i)}`,
          description: 'x'.repeat(100),
          options: Array.from({ length: 10 }, (__, j) => ({
            type: 3,
            name: `o${String(j)}`,
            description: 'x'.repeat(100),
          })),
        })),
      },
    ],
    ['a thread without a name', 'thread', { name: '' }],
  ])('%s', (_what, kind, body) => {
    expect(outgoingFaults(kind, body)).not.toEqual([]);
  });

  test('a picture without words is refused', () => {
    const item = { media: { url: 'attachment://a.png' } };
    const body = said([{ type: 12, items: [item] }]);
    expect(outgoingFaults('post', body, ['a.png'])).not.toEqual([]);
  });

  test('the adapter keeps no limit that is wider than those', () => {
    const cards = [LIMITS.messageText, LIMITS.components, LIMITS.modalFields, LIMITS.commandText];
    expect(cards).toEqual([4000, 40, 5, 8000]);
  });
});

test('what the platform could not have sent is found out', () => {
  const check = bodyCheck();
  expect(check('gateway', { url: 'ws://x', shards: 1 })).not.toBeNull();
  expect(check('slash', { type: 2 })).not.toBeNull();
  expect(check('guildDelete', { id: '1', reason: 'none' })).not.toBeNull();
  expect(check('guildDelete', { id: '1' })).toBeNull();
});
