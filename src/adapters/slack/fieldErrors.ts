import type { KnownBlock } from '@slack/types';
import type { Answer } from '../../desk/index.ts';
import { type Book } from '../../phrases/index.ts';
import { shortened } from '../common/fields.ts';
import { spoken } from '../common/spoken.ts';
import { LIMITS } from './limits.ts';
import { filledIn, ONLY_ME_FIELD, WORDS_FIELD } from './receive.ts';

type Refused = Extract<Answer, { readonly kind: 'refusal' }>;
type View = {
  readonly blocks: readonly (KnownBlock | { readonly type: string; readonly block_id?: string })[];
  readonly state: { readonly values: unknown };
};

/** What a refusal is about, by the names of parameters. */
const subjectOf = ({ refusal }: Refused): string | null => {
  if (refusal.code === 'missing') return refusal.parameter;
  return 'what' in refusal ? refusal.what : null;
};

/** The sentence at the field it is about: the one named, or the one with the word in it. */
export const fieldOf = (answer: Refused, view: View, book: Book): Record<string, string> => {
  const fields = view.blocks.flatMap(({ type, block_id }) =>
    type === 'input' && block_id !== undefined && block_id !== ONLY_ME_FIELD ? [block_id] : [],
  );
  const { options } = filledIn(view.state.values);
  const word = 'word' in answer.refusal ? (answer.refusal.word ?? '').toLowerCase() : '';
  const subject = subjectOf(answer);
  const holds = (name: string): boolean =>
    word !== '' &&
    String(options[name] ?? '')
      .toLowerCase()
      .includes(word);
  const field =
    fields.find((name) => name === subject && (word === '' || holds(name))) ??
    fields.find(holds) ??
    fields.find((name) => name === subject) ??
    fields.find((name) => name === WORDS_FIELD) ??
    fields.at(-1) ??
    WORDS_FIELD;
  return { [field]: shortened(spoken(answer, book).headline, LIMITS.fieldError) };
};
