import type { Choice, FoundThing } from '../../src/card/index.ts';
import { label } from '../../src/card/index.ts';
import type { Visit } from '../../src/desk/index.ts';
import {
  cardById,
  type Found,
  type KeptCard,
  type KeptResult,
  personById,
  resultById,
  resultName,
} from '../../src/shop/index.ts';

/** A thing of the records as a list shows it, and the line that opens it. */
export type Openable = { readonly thing: FoundThing; readonly open: string };

/** Most of somebody's words in a list. Judgement: two lines on a phone; the thing itself has all. */
const EXCERPT = 90;

/** The beginning of what was said, up to a whole word. */
const excerpt = (words: string): string => {
  const plain = words.replaceAll(/\s+/gu, ' ').trim();
  if (Array.from(plain).length <= EXCERPT) return plain;
  const start = Array.from(plain).slice(0, EXCERPT).join('');
  return `${start.replace(/\s\S*$/u, '')} …`;
};

/** `/knurl` and the verb say nothing in a list of cards. */
const withoutVerb = (words: string): string => words.replace(/^\s*\/?knurl\s+(?:setup\s+)?/iu, '');

const nameOf = async ({ shop }: Visit, id: string): Promise<string> =>
  (await personById(shop, id))?.name ?? '';

export const cardThing = async (visit: Visit, card: KeptCard): Promise<Openable> => ({
  thing: {
    kind: 'card',
    name: card.code,
    went: null,
    said: excerpt(withoutVerb(card.words)),
    state: null,
    by: await nameOf(visit, card.madeBy),
    moment: { at: card.madeAt, zone: visit.settings.timeZone },
  },
  open: `/knurl card ${card.code}`,
});

export const resultThing = async (visit: Visit, result: KeptResult): Promise<Openable> => {
  const { outcome, symptom, note, standing } = result;
  const name = resultName(result.number);
  const card = await cardById(visit.shop, result.card);
  return {
    thing: {
      kind: 'result',
      name,
      went: { outcome, symptom },
      said: excerpt(note ?? withoutVerb(card?.words ?? '')),
      state: standing === 'withdrawn' || standing === 'doubted' ? standing : null,
      by: await nameOf(visit, result.madeBy),
      moment: { at: result.madeAt, zone: visit.settings.timeZone },
    },
    open: `/knurl result show ${name}`,
  };
};

/** What was found, as the records have it now; null where it is gone. */
export const foundThing = async (visit: Visit, found: Found): Promise<Openable | null> => {
  switch (found.kind) {
    case 'card': {
      const card = await cardById(visit.shop, found.id);
      return card === null ? null : await cardThing(visit, card);
    }
    case 'result': {
      const result = await resultById(visit.shop, found.id);
      return result === null ? null : await resultThing(visit, result);
    }
    case 'standard':
    case 'question':
      return null;
  }
};

/** A button that opens it. */
export const openChoice = ({ thing: { kind, name }, open }: Openable): Choice => ({
  label: label('openFound', { kind, name }),
  words: open,
});
