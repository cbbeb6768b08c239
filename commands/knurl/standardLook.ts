import { z } from 'zod';
import { line, row } from '../../src/card/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  type Visit,
} from '../../src/desk/index.ts';
import type { Refusal } from '../../src/refusal.ts';
import {
  approvedOf,
  changesSince,
  findStandard,
  historyOf,
  listStandards,
  openOf,
  personById,
  type Revision,
  type Standard,
  type StandardState,
} from '../../src/shop/index.ts';
import { refused, shopCard, visiting } from '../shop/visit.ts';
import { revisionCard, scopeFacts, zoned } from './standardCards.ts';
import { leadPart, PART_EXAMPLE, part, revision, state } from './standardFields.ts';

const SAVE_LINE = `/knurl standard save ${PART_EXAMPLE}`;

/** Most standards that one card shows. Judgement: what is still read; find and export have all. */
const MOST_SHOWN = 40;
/** Most steps of a history that one card shows. Judgement. */
const MOST_STEPS = 60;

/** The standard of this part number, with what was typed repeated where there is none. */
export const standardFor = async (
  { shop }: Visit,
  said: string | undefined,
): Promise<Standard | Reply> => {
  if (said === undefined)
    return refused({ code: 'missing', parameter: 'part', examples: [PART_EXAMPLE] });
  const found = await findStandard(shop, said);
  if (found.ok) return found.value;
  const { refusal } = found;
  return refused(refusal.code === 'notFound' ? { ...refusal, word: said } : refusal);
};

/** There is no revision of this number: which there are. */
export const noSuchRevision = ({ part: of, revisions }: Standard, number: number): Refusal => ({
  code: 'notFound',
  what: 'revision',
  word: `${of} rev ${String(number)}`,
  nearest: revisions.map((each) => `rev ${String(each.number)}`).slice(0, 3),
});

/** The one that holds; where none does, the newest. */
const shownOf = (standard: Standard, number: number | undefined): Revision | undefined =>
  number === undefined
    ? (approvedOf(standard) ?? openOf(standard) ?? standard.revisions[0])
    : standard.revisions.find((each) => each.number === number);

const showing = (
  context: Context,
  said: string | undefined,
  number: number | undefined,
): Promise<Reply> =>
  visiting(context, async (visit) => {
    const standard = await standardFor(visit, said);
    if (!('revisions' in standard)) return standard;
    const shown = shownOf(standard, number);
    if (shown === undefined) return refused(noSuchRevision(standard, number ?? 1));
    const headline = line('standardIs', {
      part: standard.part,
      revision: shown.number,
      state: shown.state,
    });
    return cardReply(await revisionCard(context, visit, { standard, revision: shown, headline }));
  });

/** One standard: the revision that holds, or the one that is asked for. */
export const show = defineCommand({
  path: ['knurl', 'standard', 'show'],
  examples: [`/knurl standard show ${PART_EXAMPLE}`, `/knurl standard show ${PART_EXAMPLE} rev 1`],
  parameters: z.object({ part, revision }),
  lead: { name: 'part', read: leadPart },
  allowed: 'operator',
  run: (context, said) => showing(context, said.part, said.revision),
});

/** One line of the list: the revision that holds, and the one that waits. */
const itemRow = async (visit: Visit, standard: Standard) => {
  const shown = shownOf(standard, undefined);
  if (shown === undefined) return [];
  const { scope, basis, reviewAt } = shown;
  const open = openOf(standard);
  const isApproved = shown.state === 'approved';
  const due =
    isApproved &&
    ((reviewAt !== null && reviewAt <= visit.shop.at) ||
      (await changesSince(visit.shop, scope, basis)).length > 0);
  return [
    row('standardItem', {
      part: standard.part,
      revision: shown.number,
      state: shown.state,
      facts: (await scopeFacts(visit.shop, scope)).slice(0, 3),
      blankDiameter: scope.blank,
      toothCount: scope.toothCount,
      due,
      open:
        open === undefined || open.number === shown.number
          ? null
          : { revision: open.number, state: open.state },
    }),
  ];
};

/** What the shop has decided, the last changed first; a part number shows that one. */
export const list = defineCommand({
  path: ['knurl', 'standard', 'list'],
  examples: ['/knurl standard list', '/knurl standard list proposed'],
  parameters: z.object({ part, revision, state }),
  lead: { name: 'part', read: leadPart },
  allowed: 'operator',
  run: (context, said) => {
    if (said.part !== undefined) return showing(context, said.part, said.revision);
    return visiting(context, async (visit) => {
      const wanted = said.state === undefined ? {} : { state: said.state };
      const standards = await listStandards(visit.shop, { limit: MOST_SHOWN + 1, ...wanted });
      if (standards.length === 0)
        return cardReply(
          shopCard(context, {
            verb: 'standard',
            headline: line('standardsNone', { line: SAVE_LINE }),
          }),
        );
      const shown = standards.slice(0, MOST_SHOWN);
      const rows = (await Promise.all(shown.map((each) => itemRow(visit, each)))).flat();
      return cardReply(
        shopCard(context, {
          verb: 'standard',
          headline: line('standardsListed', { count: shown.length, state: said.state ?? null }),
          rows,
          after: standards.length > MOST_SHOWN ? [line('standardsMore', {})] : [],
          lists: { standards: shown },
        }),
      );
    });
  },
});

type Kept = {
  readonly revision?: number;
  readonly why?: string | null;
  readonly card?: string;
  readonly state?: StandardState;
};

/** Who did what to it, when and why: the newest first. */
export const history = defineCommand({
  path: ['knurl', 'standard', 'history'],
  examples: [`/knurl standard history ${PART_EXAMPLE}`],
  parameters: z.object({ part }),
  lead: { name: 'part', read: leadPart },
  allowed: 'operator',
  run: (context, said) =>
    visiting(context, async (visit) => {
      const standard = await standardFor(visit, said.part);
      if (!('revisions' in standard)) return standard;
      const { shop } = visit;
      const steps = await historyOf(shop, 'standard', { id: standard.id, limit: MOST_STEPS });
      const rows = await Promise.all(
        steps.map(async ({ at, by, after }) => {
          // What was remembered is what was handed in.
          const {
            revision: of = 0,
            why = null,
            card = null,
            state: to = 'draft',
          } = (after ?? {}) as Kept;
          const name = (await personById(shop, by))?.name ?? '';
          return row('standardStep', {
            ...zoned(visit, at),
            revision: of,
            state: to,
            by: name,
            why,
            card,
          });
        }),
      );
      return cardReply(
        shopCard(context, {
          verb: 'standard',
          headline: line('standardHistory', {
            part: standard.part,
            revisions: standard.revisions.length,
          }),
          rows,
          lists: { history: steps },
        }),
      );
    }),
});
