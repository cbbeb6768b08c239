import { z } from 'zod';
import type { Figure, FigureName, Figures } from '../../src/calc/index.ts';
import { type Fact, line, type Row, row } from '../../src/card/index.ts';
import { cardReply, defineCommand, type Visit } from '../../src/desk/index.ts';
import type { Revision, Standard } from '../../src/shop/index.ts';
import { refused, shopCard, visiting } from '../shop/visit.ts';
import { cardOf, scopeFacts, signedLines } from './standardCards.ts';
import { leadPart, PART_EXAMPLE, part, revisions } from './standardFields.ts';
import { noSuchRevision, standardFor } from './standardLook.ts';

/**
 * What is still the same when it is read: lengths to a tenth of a thousandth of an inch, everything
 * else to half a per cent. Judgement: finer than anything on a lathe is set or measured to.
 */
const SAME_LENGTH = 0.0025;
const SAME_SHARE = 0.005;

const same = (a: Figure | null | undefined, b: Figure | null | undefined): boolean => {
  if (!a || !b) return !a && !b;
  if (a.unit !== b.unit) return false;
  const off = Math.abs(a.value - b.value);
  return a.unit === 'mm' ? off <= SAME_LENGTH : off <= SAME_SHARE * Math.abs(a.value);
};

export type Differing = {
  readonly name: FigureName;
  readonly before: Figure | null;
  readonly after: Figure | null;
};

/** Figures that read differently, in the order of the card. */
export const differing = (
  before: Figures,
  after: Figures,
  names?: readonly FigureName[],
): readonly Differing[] => {
  const all = [...new Set([...Object.keys(before), ...Object.keys(after)])] as FigureName[];
  return (names ?? all)
    .filter((name) => !same(before[name], after[name]))
    .map((name) => ({ name, before: before[name] ?? null, after: after[name] ?? null }));
};

const amountIn = (facts: readonly Fact[], name: string): Fact['amount'] =>
  facts.find((fact) => fact.name === name)?.amount ?? { kind: 'nothing' };

/** What it is for, where that differs. */
const scopeRows = async (
  { shop }: Visit,
  from: Revision,
  to: Revision,
): Promise<readonly Row[]> => {
  const [before, after] = [await scopeFacts(shop, from.scope), await scopeFacts(shop, to.scope)];
  const names = [...new Set([...before, ...after].map(({ name }) => name))];
  return names
    .map((name) => ({ name, before: amountIn(before, name), after: amountIn(after, name) }))
    .filter((each) => JSON.stringify(each.before) !== JSON.stringify(each.after))
    .map((each) => row('factRevised', each));
};

/** The two that are meant: those that were said, or the newest and the one before it. */
const pairOf = (
  { revisions: all }: Standard,
  said: readonly number[],
): readonly [number, number] | null => {
  const [first, second] = [...said].sort((a, b) => a - b);
  if (first !== undefined && second !== undefined) return [first, second];
  const [newest, before] = all;
  if (newest === undefined || before === undefined) return null;
  if (first === undefined) return [before.number, newest.number];
  return first === newest.number ? [before.number, newest.number] : [first, newest.number];
};

/** Two revisions of one part, figure by figure, and why the later one is not like the earlier. */
export const compare = defineCommand({
  path: ['knurl', 'standard', 'compare'],
  examples: [
    `/knurl standard compare ${PART_EXAMPLE}`,
    `/knurl standard compare ${PART_EXAMPLE} rev 1 and 3`,
  ],
  parameters: z.object({ part, revisions }),
  lead: { name: 'part', read: leadPart },
  allowed: 'operator',
  run: (context, said) =>
    visiting(context, async (visit) => {
      const standard = await standardFor(visit, said.part);
      if (!('revisions' in standard)) return standard;
      const { part: of } = standard;
      const pair = pairOf(standard, said.revisions ?? []);
      if (pair === null) {
        const [only] = standard.revisions;
        const headline = line('standardOnlyOne', { part: of, revision: only?.number ?? 1 });
        return cardReply(shopCard(context, { verb: 'standard', headline }));
      }
      const [before, after] = pair.map((number) =>
        standard.revisions.find((each) => each.number === number),
      );
      if (before === undefined) return refused(noSuchRevision(standard, pair[0]));
      if (after === undefined) return refused(noSuchRevision(standard, pair[1]));
      const [kept, newer] = [await cardOf(visit.shop, before), await cardOf(visit.shop, after)];
      const figures = differing(kept.figures as Figures, newer.figures as Figures);
      const rows = [
        ...(await scopeRows(visit, before, after)),
        ...figures.map((each) => row('figureRevised', each)),
      ];
      const { number: from } = before;
      const { number: to, why } = after;
      return cardReply(
        shopCard(context, {
          verb: 'standard',
          headline: line('standardCompared', { part: of, from, to, count: rows.length }),
          lines: [
            ...(why === null ? [] : [line('standardWhy', { why })]),
            ...(await signedLines(visit, after)),
          ],
          rows,
          lists: { compared: figures },
        }),
      );
    }),
});
