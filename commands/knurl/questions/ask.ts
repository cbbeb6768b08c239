import { z } from 'zod';
import { type Card, line } from '../../../src/card/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  placeName,
  type Reply,
  refuse,
  type Visit,
} from '../../../src/desk/index.ts';
import type { Refusal } from '../../../src/refusal.ts';
import {
  askQuestion,
  findCard,
  type KeptCard,
  latestCards,
  type Question,
  type Tellable,
  toTell,
} from '../../../src/shop/index.ts';
import { quoted } from '../../../src/words/index.ts';
import { refused, shopCard, visiting } from '../../shop/visit.ts';
import { attachedFrom } from './cards.ts';
import { askedEffects } from './effects.ts';
import { lineOf } from './found.ts';
import { cardCode, noCard, type QuestionWords, readQuestionWords, wordsField } from './words.ts';

const KEYWORDS = { code: ['card', 'code'], number: [], text: ['question'] } as const;
const EXAMPLE = '/knurl ask why does it double at the end';

/** What looks for a list rather than asks. */
const LISTS: ReadonlySet<string> = new Set(['list', 'open', 'show', 'all']);

/**
 * How old the card of a person may be to be meant by a question that names none. Judgement: one
 * shift; older ones are named by their code.
 */
const STILL_MEANT_MS = 12 * 3_600_000;

type Meant = { readonly card: KeptCard | null; readonly text: string };

const lastHere = async ({ place }: Context, { shop, person }: Visit): Promise<KeptCard | null> => {
  const wanted = { limit: 1, madeBy: person.id, place: placeName(place) };
  const [last] = await latestCards(shop, wanted);
  return last !== undefined && shop.at - last.madeAt <= STILL_MEANT_MS ? last : null;
};

/** The card a question is about: named by its code, or the last one of whoever asks, here. */
const meant = async (
  context: Context,
  visit: Visit,
  said: QuestionWords,
): Promise<Meant | { readonly refusal: Refusal }> => {
  const { code, text, whole } = said;
  if (said.noCard) return { card: null, text: whole };
  if (code === null) return { card: await lastHere(context, visit), text };
  const found = await findCard(visit.shop, code);
  if (found.ok) return { card: found.value, text };
  const { refusal } = found;
  // What comes near no code was none: it is the first word of the question.
  return refusal.code === 'notFound' && refusal.nearest.length === 0
    ? { card: await lastHere(context, visit), text: whole }
    : { refusal };
};

/** A code that was misheard is asked about; the question is not lost over it. */
const misheard = (refusal: Refusal, { code, text, whole }: QuestionWords): Reply => {
  if (refusal.code !== 'notFound') return refused(refusal);
  const lineFor = lineOf('ask', 'question', text);
  return refuse({ ...refusal, word: (code ?? '').toUpperCase() }, [
    ...refusal.nearest.map((each) => ({ label: each, words: lineFor(each) })),
    { label: 'no card', words: `/knurl ask no card question ${quoted(whole)}` },
  ]);
};

const tooShort = (said: QuestionWords): Reply => {
  const readings = [
    { label: 'open questions', words: '/knurl questions' },
    { label: `ask “${said.text}”`, words: `/knurl ask question ${quoted(said.text)}` },
  ];
  return refused({ code: 'unclear', what: 'question', readings });
};

const putUp = async (context: Context, visit: Visit, { card, text }: Meant): Promise<Reply> => {
  const { shop, settings } = visit;
  const channel = settings.questionsChannel ?? context.place.channel;
  const place = placeName({ channel, thread: null });
  // Without a channel for questions it would be shown here, to people it was kept from.
  if (settings.questionsChannel === null && context.place.isPrivate) {
    const examples = ['/shop settings questions here'];
    return refused({ code: 'missing', parameter: 'questionsChannel', examples });
  }
  const asked = await askQuestion(shop, { text, card: card?.id ?? null, place });
  if (!asked.ok) return refused(asked.refusal);
  const told = await toTell(shop, 'engineer', shop.by);
  const attached = card === null ? null : attachedFrom(card);
  const effects = await askedEffects(shop, asked.value, attached, told);
  return cardReply(putUpCard(context, visit, asked.value, card, told), effects);
};

/** Short: the question itself stands where it was put up. */
const putUpCard = (
  context: Context,
  { settings }: Visit,
  { code, remindAt: at }: Question,
  card: KeptCard | null,
  { people, groups }: Tellable,
): Card => {
  const told = [...people, ...groups].map(({ name }) => name);
  return shopCard(context, {
    verb: 'ask',
    headline: line('questionPutUp', { code, told }),
    lines:
      card === null
        ? [line('questionAlone', {})]
        : [line('questionAbout', { card: card.code }), (card.card as Card).headline],
    after: [
      ...(told.length === 0 ? [line('questionNobody', {})] : []),
      ...(at === null ? [] : [line('questionAgainAt', { at, zone: settings.timeZone })]),
    ],
    lists: { questions: [{ code }] },
  });
};

/** A question to the engineers, with the numbers of a card. */
export const ask = defineCommand({
  path: ['knurl', 'ask'],
  examples: [EXAMPLE, '/knurl ask K7M2X may I run this on the small lathe'],
  parameters: z.object({
    code: cardCode,
    noCard,
    question: wordsField('question', KEYWORDS, ['"why does it double at the end"']),
  }),
  foremost: ['question', 'code'],
  lead: { name: 'question', read: readQuestionWords(KEYWORDS) },
  allowed: 'operator',
  run: (context, { question: said }) =>
    visiting(context, async (visit) => {
      if (said === undefined || said.whole === '') {
        return refused({ code: 'missing', parameter: 'question', examples: [EXAMPLE] });
      }
      if (LISTS.has(said.text.toLowerCase()) && !said.noCard) return tooShort(said);
      const what = await meant(context, visit, said);
      return 'refusal' in what ? misheard(what.refusal, said) : await putUp(context, visit, what);
    }),
});
