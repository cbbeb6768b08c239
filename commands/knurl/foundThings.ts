import type { Choice, FoundThing } from '../../src/card/index.ts';
import { label } from '../../src/card/index.ts';
import type { Visit } from '../../src/desk/index.ts';
import {
  answersTo,
  approvedOf,
  cardById,
  type Found,
  findQuestion,
  type KeptCard,
  type KeptResult,
  openOf,
  personById,
  type Question,
  readStandard,
  resultById,
  resultName,
  type Standard,
} from '../../src/shop/index.ts';
import { quoted } from '../../src/words/index.ts';

/** A thing of the records as a list shows it, and the line that opens it. */
export type Openable = { readonly thing: FoundThing; readonly open: string };

/** Most of somebody's words in a list. Judgement: two lines on a phone; the thing itself has all. */
const EXCERPT = 90;

/** The beginning of what was said, up to a whole word. */
export const excerpt = (words: string): string => {
  const plain = withoutVerb(words).replaceAll(/\s+/gu, ' ').trim();
  if (Array.from(plain).length <= EXCERPT) return plain;
  const start = Array.from(plain).slice(0, EXCERPT).join('');
  return `${start.replace(/\s\S*$/u, '')} …`;
};

/** `/knurl` and the verb say nothing in a list of cards. */
const withoutVerb = (words: string): string => words.replace(/^\s*\/?knurl\s+(?:setup\s+)?/iu, '');

const joined = (...words: readonly string[]): string =>
  words
    .map(excerpt)
    .filter((each) => each !== '')
    .join('; ');

const nameOf = async ({ shop }: Visit, id: string): Promise<string> =>
  (await personById(shop, id))?.name ?? '';

export const cardThing = async (visit: Visit, card: KeptCard): Promise<Openable> => ({
  thing: {
    kind: 'card',
    name: card.code,
    went: null,
    said: excerpt(card.words),
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
      said: joined(note ?? '', card?.words ?? ''),
      state: standing === 'withdrawn' || standing === 'doubted' ? standing : null,
      by: await nameOf(visit, result.madeBy),
      moment: { at: result.madeAt, zone: visit.settings.timeZone },
    },
    open: `/knurl result show ${name}`,
  };
};

/** A standard by what is to be decided of it, or by what holds. */
export const standardThing = async (
  visit: Visit,
  standard: Standard,
  isOpen: boolean,
): Promise<Openable> => {
  const holds = approvedOf(standard);
  const open = openOf(standard);
  const revision = (isOpen ? open : holds) ?? holds ?? open ?? standard.revisions[0];
  const card = revision === undefined ? null : await cardById(visit.shop, revision.card);
  const { by, at } = standard.changed;
  return {
    thing: {
      kind: 'standard',
      name: standard.part,
      went: null,
      said: excerpt(card?.words ?? ''),
      state: revision?.state ?? null,
      by: await nameOf(visit, by),
      moment: { at, zone: visit.settings.timeZone },
    },
    open: `/knurl standard show ${quoted(standard.part)}`,
  };
};

/** A question, with the answer that was taken, or else the last one. */
export const questionThing = async (visit: Visit, question: Question): Promise<Openable> => {
  const { id, code, text, state, accepted, askedAt, askedBy } = question;
  const answers = await answersTo(visit.shop, id);
  const answer = answers.find(({ number }) => number === accepted) ?? answers.at(-1);
  return {
    thing: {
      kind: 'question',
      name: code,
      went: null,
      said: joined(text, answer?.text ?? ''),
      state,
      by: await nameOf(visit, askedBy),
      moment: { at: askedAt, zone: visit.settings.timeZone },
    },
    open: `/knurl questions ${code}`,
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
    case 'standard': {
      const standard = await readStandard(visit.shop, found.id);
      return standard === undefined ? null : await standardThing(visit, standard, false);
    }
    case 'question': {
      const question = await findQuestion(visit.shop, found.id);
      return question.ok ? await questionThing(visit, question.value) : null;
    }
  }
};

/** A button that opens it. */
export const openChoice = ({ thing: { kind, name }, open }: Openable): Choice => ({
  label: label('openFound', { kind, name }),
  words: open,
});
