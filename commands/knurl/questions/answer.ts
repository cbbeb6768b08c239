import { z } from 'zod';
import { line } from '../../../src/card/index.ts';
import { cardReply, defineCommand, type Reply, refuse } from '../../../src/desk/index.ts';
import type { Refusal } from '../../../src/refusal.ts';
import { answerQuestion, isWaiting, unsolvedQuestions } from '../../../src/shop/index.ts';
import { refused, shopCard, visiting } from '../../shop/visit.ts';
import { nameOf } from './cards.ts';
import { answeredEffects } from './effects.ts';
import { cardOf, lineOf, meant } from './found.ts';
import { questionCode, readQuestionWords, wordsField } from './words.ts';

const KEYWORDS = { code: ['question', 'code'], number: [], text: ['answer'] } as const;
const EXAMPLE = '/knurl answer K7M2X 12 turns instead of 15';

/** Most questions that are offered where none was named. Judgement: what a phone shows at once. */
export const OFFERED = 5;

/** What a refusal offers to do first. */
export const wayOut = (refusal: Refusal): Reply =>
  refusal.code === 'questionStands' && refusal.state === 'solved'
    ? refuse(refusal, [
        { label: `Reopen ${refusal.question}`, words: `/knurl reopen ${refusal.question}` },
      ])
    : refused(refusal);

/** An answer, kept with the question and told to whoever asked. */
export const answer = defineCommand({
  path: ['knurl', 'answer'],
  examples: [EXAMPLE],
  parameters: z.object({
    asked: questionCode,
    answer: wordsField('answer', KEYWORDS, ['"12 turns instead of 15"']),
  }),
  foremost: ['answer', 'asked'],
  lead: { name: 'answer', read: readQuestionWords(KEYWORDS) },
  allowed: 'engineer',
  run: (context, { answer: said }) =>
    visiting(context, async (visit) => {
      const { shop } = visit;
      const found = await meant(
        context,
        visit,
        said,
        (text) => lineOf('answer', 'answer', text),
        async () => (await unsolvedQuestions(shop, { limit: OFFERED })).filter(isWaiting),
      );
      if ('reply' in found) return found.reply;
      if (found.text === '') {
        return refused({ code: 'missing', parameter: 'answer', examples: [EXAMPLE] });
      }
      const answered = await answerQuestion(shop, found.question.id, found.text);
      if (!answered.ok) return wayOut(answered.refusal);
      const { question, answer: given } = answered.value;
      const attached = await cardOf(shop, question);
      const effects = await answeredEffects(shop, answered.value, attached);
      const asker = question.askedBy === shop.by ? null : await nameOf(shop, question.askedBy);
      const { code } = question;
      const headline = line('answerKept', { code, number: given.number, asker });
      return cardReply(shopCard(context, { verb: 'answer', headline }), effects);
    }),
});
