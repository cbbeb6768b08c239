import { z } from 'zod';
import { type Card, type Line, line } from '../../src/card/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Effect,
  placeName,
  type Reply,
  type Visit,
} from '../../src/desk/index.ts';
import type { Refusal } from '../../src/refusal.ts';
import {
  approveStandard,
  isUnderWay,
  keysOf,
  type Revision,
  retireStandard,
  type Standard,
} from '../../src/shop/index.ts';
import { refused, visiting } from '../shop/visit.ts';
import { lineFor, revisionCard } from './standardCards.ts';
import { leadPart, PART_EXAMPLE, part, reviewMonths, revision, why } from './standardFields.ts';

const partMissing: Refusal = { code: 'missing', parameter: 'part', examples: [PART_EXAMPLE] };

/** What sets the channel that standards go to. */
const SET_CHANNEL = '/shop settings change standards here';

type Where = {
  readonly where: 'channel' | 'here' | 'nowhere';
  /** Null where it would be told to more people than asked for it. */
  readonly place: string | null;
};

/** The shop's channel for standards; without one the place where it was approved. */
const placeFor = ({ place }: Context, { settings }: Visit): Where => {
  const { standardsChannel } = settings;
  if (standardsChannel !== null)
    return { where: 'channel', place: placeName({ channel: standardsChannel, thread: null }) };
  return place.isPrivate
    ? { where: 'nowhere', place: null }
    : { where: 'here', place: placeName(place) };
};

/** The pin of a revision comes off, where it was ever put up: it waits for that pin. */
const unpinOf = async (
  { shop }: Visit,
  { id }: Standard,
  { number }: Revision,
): Promise<readonly Effect[]> => {
  const { pin, unpin } = keysOf(id, number);
  return (await isUnderWay(shop, pin)) ? [{ effect: 'unpin', key: unpin, of: pin }] : [];
};

/** What is posted: the revision, to be read where it is pinned. */
const posted = (card: Card): Card => ({ ...card, choices: [], pictures: [] });

const refusedWith = (refusal: Refusal, of: string): Reply =>
  refusal.code === 'notFound'
    ? refused({ word: of, ...refusal })
    : {
        refusal,
        choices:
          refusal.code === 'stale' || refusal.code === 'notNow'
            ? [{ label: of, words: lineFor('show', of) }]
            : [],
      };

/** The proposed revision holds from now on: posted, pinned, and the one before it taken down. */
export const approve = defineCommand({
  path: ['knurl', 'standard', 'approve'],
  examples: [
    `/knurl standard approve ${PART_EXAMPLE}`,
    `/knurl standard approve ${PART_EXAMPLE} rev 2 review in 6 months`,
  ],
  parameters: z.object({ part, revision, reviewMonths }),
  lead: { name: 'part', read: leadPart },
  allowed: 'supervisor',
  run: (context, said) =>
    visiting(context, async (visit) => {
      if (said.part === undefined) return refused(partMissing);
      const result = await approveStandard(visit.shop, {
        part: said.part,
        revision: said.revision ?? null,
        reviewMonths: said.reviewMonths ?? null,
      });
      if (!result.ok) return refusedWith(result.refusal, said.part);
      const { standard, revision: approved, before } = result.value;
      const { where, place } = placeFor(context, visit);
      const offs = before === null ? [] : await unpinOf(visit, standard, before);
      const of = { part: standard.part, revision: approved.number };
      const firsts: Line[] = [line('standardPosted', { where, line: SET_CHANNEL })];
      if (before !== null)
        firsts.push(line('standardBefore', { revision: before.number, pinned: offs.length > 0 }));
      const told = { standard, revision: approved };
      const card = await revisionCard(context, visit, {
        ...told,
        headline: line('standardDone', { ...of, did: 'approved' }),
        first: firsts,
        brief: true,
      });
      const headline = line('standardIs', { ...of, state: 'approved' });
      const post = posted(await revisionCard(context, visit, { ...told, headline }));
      const { post: key, pin } = keysOf(standard.id, approved.number);
      const ons: readonly Effect[] =
        place === null
          ? []
          : [
              { effect: 'post', key, place, card: post },
              { effect: 'pin', key: pin, of: key },
            ];
      return cardReply(card, [...ons, ...offs]);
    }),
});

/** A revision goes out of use: the one that holds, or one that was not to be. */
export const retire = defineCommand({
  path: ['knurl', 'standard', 'retire'],
  examples: [`/knurl standard retire ${PART_EXAMPLE} because the part is no longer made`],
  parameters: z.object({ part, revision, why }),
  lead: { name: 'part', read: leadPart },
  allowed: 'supervisor',
  run: (context, said) =>
    visiting(context, async (visit) => {
      if (said.part === undefined) return refused(partMissing);
      const which = { part: said.part, revision: said.revision ?? null, why: said.why ?? null };
      const result = await retireStandard(visit.shop, which);
      if (!result.ok) return refusedWith(result.refusal, said.part);
      const { standard, revision: retired, wasApproved } = result.value;
      const of = { part: standard.part, revision: retired.number };
      const headline = line('standardDone', { ...of, did: 'retired' });
      const told = { standard, revision: retired, headline, brief: true } as const;
      const card = await revisionCard(context, visit, told);
      if (!wasApproved) return cardReply(card);
      const offs = await unpinOf(visit, standard, retired);
      const { place } = placeFor(context, visit);
      const { end } = keysOf(standard.id, retired.number);
      const tell: readonly Effect[] =
        place === null ? [] : [{ effect: 'post', key: end, place, card: posted(card) }];
      return cardReply(card, [...offs, ...tell]);
    }),
});
