/**
 * What Slack refuses and its type package does not say: docs.slack.dev, reference/block-kit and
 * messaging/formatting-message-text (reported).
 */
type Block = {
  readonly type: string;
  readonly block_id?: string;
  readonly text?: { readonly type: string; readonly text: string };
  readonly elements?: readonly Element[];
  readonly element?: Element;
};
type Element = {
  readonly type: string;
  readonly action_id?: string;
  readonly options?: readonly unknown[];
  readonly text?: unknown;
};

export type Body = { readonly text?: string; readonly blocks?: readonly unknown[] };

/** Control sequences that a text may hold: a date's fallback, and those who are to be rung. */
const sequences = (text: string): readonly string[] =>
  [...text.matchAll(/<([^>]*)>?/gu)].map(([, inside]) => inside ?? '');

const textFaults = (text: string, mayRing: ReadonlySet<string>): readonly string[] => [
  ...sequences(text).flatMap((inside) =>
    /^!date\^00000000\^\{_\}\|[*_~`]$/u.test(inside) || mayRing.has(inside)
      ? []
      : [`a control sequence: <${inside}>`],
  ),
  ...(/&(?!amp;|lt;|gt;)/u.test(text) ? ['an ampersand that is no entity'] : []),
  ...(text.replaceAll(/<[^>]*>/gu, '').includes('>') ? ['a bare >'] : []),
];

const markupIn = (value: unknown): readonly string[] => {
  if (Array.isArray(value)) return value.flatMap(markupIn);
  if (typeof value !== 'object' || value === null) return [];
  const own =
    'type' in value && value.type === 'mrkdwn' && 'text' in value && typeof value.text === 'string'
      ? [value.text]
      : [];
  return [...own, ...Object.values(value).flatMap(markupIn)];
};

const twice = (names: readonly string[]): readonly string[] =>
  names.filter((name, index) => names.indexOf(name) !== index);

const blockFaults = (blocks: readonly Block[], most: number): readonly string[] => {
  const elements = blocks.flatMap(({ elements = [], element }) => [
    ...elements,
    ...(element === undefined ? [] : [element]),
  ]);
  const acting = blocks
    .filter(({ type }) => type === 'actions')
    .flatMap(({ elements: own = [] }) => own.map(({ action_id }) => action_id ?? ''));
  return [
    ...(blocks.length > most ? [`${String(blocks.length)} blocks`] : []),
    ...twice(blocks.flatMap(({ block_id }) => (block_id === undefined ? [] : [block_id]))).map(
      (name) => `two blocks named ${name}`,
    ),
    ...twice(acting.filter((name) => !/^(?:open|choose)/u.test(name))).map(
      (name) => `two actions named ${name}`,
    ),
    ...elements.flatMap(({ type, options }) =>
      type.endsWith('static_select') &&
      (options === undefined || options.length === 0 || options.length > 100)
        ? ['a select without options, or with too many']
        : [],
    ),
    ...(/"text":""/u.test(JSON.stringify(blocks)) ? ['an empty text'] : []),
    ...(blocks.length === 0 ? ['no blocks'] : []),
  ];
};

/** Everything that is wrong with a message or a view beyond its schema. */
export const ruleFaults = (
  kind: 'message' | 'view',
  body: Body & { readonly submit?: unknown },
  mayRing: ReadonlySet<string> = new Set(),
): readonly string[] => {
  const blocks = (body.blocks ?? []) as readonly Block[];
  const texts = [...markupIn(blocks), ...(kind === 'message' ? [body.text ?? ''] : [])];
  return [
    ...(kind === 'message' && (body.text ?? '').trim() === '' ? ['no text for notifications'] : []),
    ...((body.text ?? '').length > 4000 ? ['a text of more than 4000 characters'] : []),
    ...blockFaults(blocks, kind === 'message' ? 50 : 100),
    ...texts.flatMap((text) => textFaults(text, mayRing)),
    ...(kind === 'view' && blocks.some(({ type }) => type === 'input') && body.submit === undefined
      ? ['inputs without a submit']
      : []),
  ];
};
