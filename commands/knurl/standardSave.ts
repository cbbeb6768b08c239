import { z } from 'zod';
import { mm } from '../../src/calc/index.ts';
import { line } from '../../src/card/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  placeName,
  type Reply,
  type Visit,
} from '../../src/desk/index.ts';
import type { Refusal } from '../../src/refusal.ts';
import {
  findCard,
  type KeptCard,
  latestCards,
  openOf,
  proposeStandard,
  readStandard,
  type Saving,
  type StandardWith,
  saveStandard,
} from '../../src/shop/index.ts';
import { refused, visiting } from '../shop/visit.ts';
import { lineFor, revisionCard } from './standardCards.ts';
import { bars, fromCard, leadPart, PART_EXAMPLE, part, revision, why } from './standardFields.ts';

const parameters = z.object({ part, card: fromCard, bars, revision, why });
type Said = z.infer<typeof parameters>;

const partMissing: Refusal = { code: 'missing', parameter: 'part', examples: [PART_EXAMPLE] };

/** How far back the last set-up is looked for. Judgement: checks and plans stand between. */
const LOOKED_BACK = 20;

/** The card that was named, or the last set-up this person was given here. */
const cardFor = async (
  { place }: Context,
  { shop, person }: Visit,
  code: string | undefined,
): Promise<KeptCard | Refusal> => {
  if (code !== undefined) {
    const found = await findCard(shop, code);
    if (found.ok) return found.value;
    const { refusal } = found;
    return refusal.code === 'notFound' ? { ...refusal, word: code } : refusal;
  }
  const wanted = { limit: LOOKED_BACK, madeBy: person.id, place: placeName(place) };
  const last = (await latestCards(shop, wanted)).find(({ kind }) => kind === 'setup');
  return last ?? { code: 'missing', parameter: 'setUpCard', examples: ['card K7M2X'] };
};

/** What was done, and the revision as it now is. */
const doneCard = async (
  context: Context,
  visit: Visit,
  { standard, revision: made }: StandardWith,
  did: 'saved' | 'proposed',
): Promise<Reply> => {
  const headline = line('standardDone', { part: standard.part, revision: made.number, did });
  const told = { standard, revision: made, headline };
  // Whoever decides on a proposal has to see all of it; whoever saves has just seen it.
  const brief = did === 'saved' ? ({ brief: true } as const) : {};
  return cardReply(await revisionCard(context, visit, { ...told, ...brief }));
};

/** A stale revision can be looked at by one button. */
const refusedWith = (refusal: Refusal, of: string): Reply =>
  refusal.code === 'stale' || refusal.code === 'notNow'
    ? { refusal, choices: [{ label: of, words: lineFor('show', of) }] }
    : refused(refusal.code === 'notFound' ? { word: of, ...refusal } : refusal);

const savedFrom = async (
  context: Context,
  visit: Visit,
  said: Said & { readonly part: string },
  saving: Saving,
): Promise<Reply> => {
  const card = await cardFor(context, visit, said.card);
  if ('code' in card && !('kind' in card)) return refused(card);
  const draft = {
    part: said.part,
    card: card,
    why: said.why ?? null,
    bars: said.bars === undefined ? null : { low: mm(said.bars.low), high: mm(said.bars.high) },
    over: said.revision ?? null,
  };
  const result = await saveStandard(visit.shop, draft, saving);
  return result.ok
    ? await doneCard(context, visit, result.value, saving === 'propose' ? 'proposed' : 'saved')
    : refusedWith(result.refusal, said.part);
};

const saving = (verb: Extract<Saving, 'save' | 'revise'>, examples: readonly string[]) =>
  defineCommand({
    path: ['knurl', 'standard', verb],
    examples,
    parameters,
    lead: { name: 'part', read: leadPart },
    allowed: verb === 'save' ? 'operator' : 'supervisor',
    run: (context, said) =>
      visiting(context, async (visit) =>
        said.part === undefined
          ? refused(partMissing)
          : await savedFrom(context, visit, { ...said, part: said.part }, verb),
      ),
  });

/** A draft from a card: whoever worked the set-up out may keep it. */
export const save = saving('save', [
  `/knurl standard save ${PART_EXAMPLE}`,
  `/knurl standard save ${PART_EXAMPLE} card K7M2X bars 0.990-1.010`,
]);

/** A new draft where one was approved before, and why. */
export const revise = saving('revise', [
  `/knurl standard revise ${PART_EXAMPLE} card K7M2X because the new wheel leaves a cleaner crest`,
]);

/** A draft that is there is put up as it is; where there is none, or a card is named, that card is. */
export const propose = defineCommand({
  path: ['knurl', 'standard', 'propose'],
  examples: [
    `/knurl standard propose ${PART_EXAMPLE}`,
    `/knurl standard propose ${PART_EXAMPLE} card K7M2X`,
  ],
  parameters,
  lead: { name: 'part', read: leadPart },
  allowed: 'operator',
  run: (context, said) =>
    visiting(context, async (visit) => {
      if (said.part === undefined) return refused(partMissing);
      const of = { ...said, part: said.part };
      if (said.card !== undefined) return await savedFrom(context, visit, of, 'propose');
      const standard = await readStandard(visit.shop, said.part);
      const isOpen = standard !== undefined && openOf(standard) !== undefined;
      if (!isOpen && said.revision === undefined)
        return await savedFrom(context, visit, of, 'propose');
      const which = { part: said.part, revision: said.revision ?? null };
      const result = await proposeStandard(visit.shop, which);
      return result.ok
        ? await doneCard(context, visit, result.value, 'proposed')
        : refusedWith(result.refusal, said.part);
    }),
});
