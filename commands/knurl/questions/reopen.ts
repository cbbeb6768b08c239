import { z } from 'zod';
import { line } from '../../../src/card/index.ts';
import { cardReply, defineCommand } from '../../../src/desk/index.ts';
import { reopenQuestion } from '../../../src/shop/index.ts';
import { refused, shopCard, visiting } from '../../shop/visit.ts';
import { nameOf } from './cards.ts';
import { reopenedEffects } from './effects.ts';
import { cardOf, lineOf, meant } from './found.ts';
import { questionCode, readQuestionWords, wordsField } from './words.ts';

const KEYWORDS = { code: ['question', 'code'], number: [], text: ['reason', 'because'] } as const;

/** What was answered or solved waits again: for whoever asked, and for engineers. */
export const reopen = defineCommand({
  path: ['knurl', 'reopen'],
  examples: ['/knurl reopen K7M2X it doubles again'],
  parameters: z.object({
    asked: questionCode,
    reason: wordsField('reason', KEYWORDS, ['"it doubles again"']),
  }),
  foremost: ['asked', 'reason'],
  lead: { name: 'reason', read: readQuestionWords(KEYWORDS) },
  allowed: 'operator',
  run: (context, { reason: said }) =>
    visiting(context, async (visit) => {
      const { shop, role, settings } = visit;
      const found = await meant(
        context,
        visit,
        said,
        (text) => lineOf('reopen', 'reason', text),
        () => Promise.resolve([]),
      );
      if ('reply' in found) return found.reply;
      const { question: before, text: words } = found;
      const reopened = await reopenQuestion(shop, before.id, { role, words });
      if (!reopened.ok) return refused(reopened.refusal);
      const { value: question } = reopened;
      const attached = await cardOf(shop, question);
      const effects = await reopenedEffects(shop, question, words, shop.by, attached);
      const { code, remindAt: at } = question;
      const by = await nameOf(shop, shop.by);
      const headline = line('questionReopened', { code, by, why: '' });
      const after = at === null ? [] : [line('questionAgainAt', { at, zone: settings.timeZone })];
      return cardReply(shopCard(context, { verb: 'reopen', headline, after }), effects);
    }),
});
