import { z } from 'zod';
import { mm } from '../../src/calc/index.ts';
import { line } from '../../src/card/index.ts';
import {
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
  type Visit,
} from '../../src/desk/index.ts';
import {
  confirmResult,
  correctResult,
  type Done,
  type KeptResult,
  type Logged,
  logResult,
  OUTCOMES,
  type ResultContent,
  resultName,
  withdrawResult,
} from '../../src/shop/index.ts';
import { shopCard, visiting } from '../shop/visit.ts';
import * as measured from './checkParameters.ts';
import * as words from './resultParameters.ts';
import { resultReply } from './resultReply.ts';
import { listResults, showResult } from './resultShow.ts';
import { cardFor, othersOwn, resultFor, waitingResult } from './resultWanted.ts';
import { reworded } from './words.ts';

/** What can be said of a part. */
const partFields = {
  outcome: words.outcome,
  count: words.count,
  crest: measured.crest,
  height: measured.height,
  flat: measured.flat,
  blank: words.blank,
  parts: words.parts,
  cause: words.cause,
  note: words.note,
};
type Said = z.infer<z.ZodObject<typeof partFields>>;

/** Those of a form, in the order in which they are asked at the machine. */
const FOREMOST = ['outcome', 'count', 'crest', 'height', 'flat', 'parts', 'cause', 'note'] as const;

/** Only what was said. */
const patchOf = (said: Said): Partial<ResultContent> => ({
  ...(said.outcome ?? {}),
  ...(said.count === undefined ? {} : { teeth: said.count }),
  ...(said.blank === undefined ? {} : { blank: mm(said.blank) }),
  ...(said.crest === undefined ? {} : { crest: mm(said.crest) }),
  ...(said.height === undefined ? {} : { toothHeight: mm(said.height) }),
  ...(said.flat === undefined ? {} : { flat: mm(said.flat) }),
  ...(said.parts === undefined ? {} : { partsRun: said.parts }),
  ...(said.cause === undefined ? {} : { cause: said.cause }),
  ...(said.note === undefined ? {} : { note: said.note }),
});

/** A result is of a part: where no number is said it is that one. */
const ONE_PART = 1;

const NOTHING_SAID: Omit<ResultContent, 'outcome'> = {
  symptom: null,
  teeth: null,
  blank: null,
  crest: null,
  toothHeight: null,
  flat: null,
  partsRun: ONE_PART,
  cause: null,
  note: null,
};

const missingOutcome = (context: Context): Reply =>
  refuse(
    { code: 'missing', parameter: 'outcome', examples: OUTCOMES },
    OUTCOMES.map((example) => ({
      label: example,
      words: reworded(context, [], example),
    })),
  );

/** How a part of a card came out. */
const log = defineCommand({
  path: ['knurl', 'result', 'log'],
  examples: [
    '/knurl result good 65 teeth crest 1.0035 flat 0.0048',
    '/knurl result K7M2X double 66 teeth note second start after lunch',
  ],
  parameters: z.object({ code: words.code, ...partFields }),
  foremost: [...FOREMOST],
  allowed: 'operator',
  run: (context, said) =>
    visiting(context, async (visit) => {
      const { outcome } = said;
      if (outcome === undefined) return missingOutcome(context);
      const card = await cardFor(context, visit, said.code);
      if (!('code' in card)) return card;
      const content = { ...NOTHING_SAID, ...outcome, ...patchOf(said) };
      const logged = await logResult(visit.shop, card, content);
      return logged.ok
        ? await resultReply(context, visit, 'logged', logged.value, { worn: content.partsRun })
        : refuse(logged.refusal);
    }),
});

const pointer = { result: words.result, version: words.version };
type Pointed = z.infer<z.ZodObject<typeof pointer>>;

/** What the three verbs do that change one: find it, see whether it may be, and tell what came of it. */
const changing = (
  context: Context,
  said: Pointed,
  did: 'corrected' | 'withdrawn' | 'confirmed',
  change: (visit: Visit, result: KeptResult, seen: Seen) => Promise<Done<Logged> | Reply>,
  meant: typeof resultFor = resultFor,
): Promise<Reply> =>
  visiting(context, async (visit) => {
    const result = await meant(context, visit, said.result);
    if (!('id' in result)) return result;
    const { id } = result;
    const seen = said.version === undefined ? { id } : { id, version: said.version };
    const done = await change(visit, result, seen);
    if (!('ok' in done)) return done;
    if (!done.ok) return refuse(done.refusal);
    const after = did === 'withdrawn' ? 0 : done.value.result.partsRun;
    const worn = after - result.partsRun;
    return await resultReply(context, visit, did, done.value, { worn });
  });
type Seen = Parameters<typeof withdrawResult>[1];

const CHANGE_EXAMPLES = ['66 teeth', 'crest 1.0040', 'cause dull wheel'] as const;

const correct = defineCommand({
  path: ['knurl', 'result', 'correct'],
  examples: ['/knurl result correct R12 66 teeth crest 1.0040'],
  parameters: z.object({ ...pointer, ...partFields }),
  foremost: ['result', ...FOREMOST],
  allowed: 'operator',
  run: (context, said) =>
    changing(context, said, 'corrected', async (visit, result, seen) => {
      const refused = await othersOwn(visit, result);
      if (refused !== null) return refused;
      const patch = patchOf(said);
      if (Object.keys(patch).length === 0)
        return refuse({ code: 'missing', parameter: 'change', examples: CHANGE_EXAMPLES });
      return await correctResult(visit.shop, seen, patch);
    }),
});

const withdraw = defineCommand({
  path: ['knurl', 'result', 'withdraw'],
  examples: ['/knurl result withdraw R12'],
  parameters: z.object(pointer),
  lead: { name: 'result', read: words.resultFirst },
  allowed: 'operator',
  run: (context, said) =>
    changing(
      context,
      said,
      'withdrawn',
      async (visit, result, seen) =>
        (await othersOwn(visit, result)) ?? (await withdrawResult(visit.shop, seen)),
    ),
});

/** Confirming what does not wait would change nothing. */
const nothingWaits = (context: Context, { number, standing }: KeptResult): Reply => {
  const said = { result: resultName(number), learned: standing === 'learned' };
  return cardReply(shopCard(context, { verb: 'result', headline: line('resultNoDoubt', said) }));
};

const confirm = defineCommand({
  path: ['knurl', 'result', 'confirm'],
  examples: ['/knurl result confirm R12'],
  parameters: z.object(pointer),
  lead: { name: 'result', read: words.resultFirst },
  allowed: 'engineer',
  run: (context, said) =>
    changing(
      context,
      said,
      'confirmed',
      async ({ shop }, result, seen) =>
        result.standing === 'silent' || result.standing === 'learned'
          ? nothingWaits(context, result)
          : await confirmResult(shop, seen),
      waitingResult,
    ),
});

export const results: readonly Command[] = [
  log,
  correct,
  withdraw,
  confirm,
  showResult,
  listResults,
];
