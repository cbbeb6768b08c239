import { z } from 'zod';
import { line } from '../../../src/card/index.ts';
import { cardReply, defineCommand, type Reply } from '../../../src/desk/index.ts';
import type { Refusal } from '../../../src/refusal.ts';
import { type Question, solveQuestion, unsolvedQuestions } from '../../../src/shop/index.ts';
import { refused, shopCard, visiting } from '../../shop/visit.ts';
import { OFFERED, wayOut } from './answer.ts';
import { nameOf } from './cards.ts';
import { solvedEffects } from './effects.ts';
import { cardOf, lineOf, meant } from './found.ts';
import { answerNumber, questionCode, readQuestionWords, wordsField } from './words.ts';

const KEYWORDS = {
  code: ['question', 'code'],
  number: ['answer', 'number'],
  text: ['solution', 'because'],
} as const;

/** Of several answers one is chosen by a button. */
const chosen = ({ code }: Question, refusal: Refusal): Reply => {
  if (refusal.code !== 'unclear' || refusal.what !== 'accepted') return wayOut(refusal);
  const readings = refusal.readings.map(({ label, words }) => ({
    label,
    words: `/knurl solved ${code} answer ${words}`,
  }));
  return refused({ ...refusal, readings });
};

/** By which answer a question is solved, or by what else: for whoever asked, and for engineers. */
export const solved = defineCommand({
  path: ['knurl', 'solved'],
  examples: ['/knurl solved K7M2X', '/knurl solved K7M2X the wheel was worn'],
  parameters: z.object({
    asked: questionCode,
    accepted: answerNumber,
    solution: wordsField('solution', KEYWORDS, ['"the wheel was worn"']),
  }),
  foremost: ['asked', 'accepted', 'solution'],
  lead: { name: 'solution', read: readQuestionWords(KEYWORDS) },
  allowed: 'operator',
  run: (context, { solution: said }) =>
    visiting(context, async (visit) => {
      const { shop, person, role } = visit;
      const found = await meant(
        context,
        visit,
        said,
        (text) => lineOf('solved', 'solution', text),
        () => unsolvedQuestions(shop, { limit: OFFERED, askedBy: person.id }),
      );
      if ('reply' in found) return found.reply;
      // A number by itself is that of an answer.
      const named = /^\d{1,4}$/u.test(found.text) ? Number(found.text) : (said?.number ?? null);
      const words = found.text === '' || named !== null ? null : found.text;
      const solving = { role, accepted: named, words };
      const done = await solveQuestion(shop, found.question.id, solving);
      if (!done.ok) return chosen(found.question, done.refusal);
      const { question, answer } = done.value;
      const effects = await solvedEffects(shop, done.value, await cardOf(shop, question));
      const by = await nameOf(shop, answer.givenBy);
      const headline = line('questionSolved', { code: question.code, number: answer.number, by });
      return cardReply(shopCard(context, { verb: 'solved', headline }), effects);
    }),
});
