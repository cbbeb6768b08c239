import type { Check, Figure, FigureName, Figures, SetupResult } from '../../src/calc/index.ts';
import {
  type Card,
  type Choice,
  type Line,
  label,
  line,
  type Part,
  row,
} from '../../src/card/index.ts';
import type { About, Visit } from '../../src/desk/index.ts';
import {
  type Covering,
  covering,
  type Job,
  jobOf,
  outsideOf,
  personById,
  type Revision,
  type Standard,
} from '../../src/shop/index.ts';
import type { SetupWords } from './setupParameters.ts';
import type { ShopBuilt } from './shopRequest.ts';
import { cardOf, lineFor, plainSetup, reviewLines, scopeFacts, zoned } from './standardCards.ts';
import { type Differing, differing } from './standardCompare.ts';

type Built = Extract<ShopBuilt, { readonly about: About }>;

/** What a machinist sets, turns or measures by: where these agree two set-ups are one. */
const WORKED_BY: readonly FigureName[] = [
  'blankDiameter',
  'toothCount',
  'infeed',
  'firstBite',
  'crestFlat',
  'crestDiameter',
  'toothHeight',
  'spindleSpeed',
  'feed',
  'turns',
];

/** The job a line asks for; a material that the bot took by itself is not said. */
export const jobAsked = (said: SetupWords, built: Built, result: SetupResult): Job => {
  const { about, materialAssumed, request } = built;
  const { wheel, machine, material } = about;
  const of = { wheel, machine, material, base: materialAssumed ? null : about.base };
  return jobOf({ request, result, of, angleSaid: said.angle !== undefined });
};

/** The standard that goes first, and others that would have covered it too. */
export type First = Covering & {
  /** It was asked for by its part number, whatever it covers. */
  readonly picked: boolean;
  readonly outside: readonly string[];
  readonly also: readonly string[];
};

/** The standard that was asked for, or the closest of those that cover the job. */
export const firstFor = async (
  { shop }: Visit,
  job: Job,
  picked: Covering | null,
): Promise<First | null> => {
  if (picked !== null)
    return { ...picked, picked: true, outside: outsideOf(picked.revision.scope, job), also: [] };
  const [first, ...others] = await covering(shop, job);
  if (first === undefined) return null;
  const also = others.map(({ standard }) => standard.part);
  return { ...first, picked: false, outside: [], also };
};

const approvedLine = (visit: Visit, { approved }: Revision, by: string): readonly Line[] =>
  approved === null
    ? []
    : [line('standardSigned', { did: 'approved', by, why: null, ...zoned(visit, approved.at) })];

/** Why it stands here, and what speaks against it. */
const whyLines = async (visit: Visit, first: First): Promise<readonly Line[]> => {
  const { revision, picked, outside, also } = first;
  const facts = await scopeFacts(visit.shop, revision.scope);
  const by = (await personById(visit.shop, revision.approved?.by ?? ''))?.name ?? '';
  return [
    ...(picked ? [line('standardPicked', { outside })] : [line('standardCovers', { facts })]),
    ...(await reviewLines(visit, revision)),
    ...approvedLine(visit, revision, by),
    ...(also.length === 0 ? [] : [line('standardAlso', { parts: also })]),
  ];
};

/** The rows of the standard's own card. */
const rowsOf = (card: Card): readonly Part[] =>
  plainSetup(card)
    .parts.filter((part) => part.part === 'rows')
    .map((part): Part => ({ ...part, from: 'standard' }));

const headlineOf = ({ part }: Standard, { number, scope }: Revision): Line =>
  line('standardTurnTo', {
    part,
    revision: number,
    blankDiameter: scope.blank,
    toothCount: scope.toothCount,
    left: scope.stock !== null && Math.abs(scope.stock - scope.blank) < 1e-6,
  });

/** The second opinion: the same, or what differs. */
const opinion = (differences: readonly Differing[]): readonly Part[] =>
  differences.length === 0
    ? [{ part: 'lines', lines: [line('standardSame', {})], from: 'standard' }]
    : [
        {
          part: 'lines',
          lines: [line('standardDiffers', { count: differences.length })],
          from: 'standard',
        },
        {
          part: 'rows',
          rows: differences.map(({ name, before, after }) =>
            row('figureBeside', { name, standard: before, now: after }),
          ),
          from: 'standard',
        },
      ];

const stopIn = (checks: readonly Check[]): Check | undefined =>
  checks.find(({ state }) => state === 'stop');

/** What a program reads of the standard that was put first. */
const listed = (
  { standard, revision }: First,
  card: Card,
  figures: Readonly<Record<string, Figure | null>>,
  differences: readonly Differing[],
) => ({
  standard: [
    {
      part: standard.part,
      revision: revision.number,
      figures,
      differences,
      worked: card.headline,
    },
  ],
});

const showChoice = ({ part }: Standard): Choice => ({
  label: label('showStandard', { part }),
  words: lineFor('show', part),
});

/**
 * The standard before the set-up that was worked out, which stays as a second opinion. A stop of
 * that set-up goes before the standard: it was worked out for what was said just now.
 */
export const withStandard = async (visit: Visit, card: Card, first: First): Promise<Card> => {
  const { standard, revision } = first;
  const kept = await cardOf(visit.shop, revision);
  // What was kept is what was handed in: figures and a card of this program or an older one.
  const figures = kept.figures as Figures;
  const differences = differing(figures, card.figures, WORKED_BY);
  const lists = listed(first, card, figures, differences);
  const stop = stopIn(card.checks);
  const why = await whyLines(visit, first);
  const of = { part: standard.part, revision: revision.number };
  const choices = [...card.choices, showChoice(standard)];
  if (stop !== undefined) {
    const lines = [line('standardButStops', { ...of, check: stop }), ...why];
    const parts: readonly Part[] = [{ part: 'lines', lines, from: 'standard' }, ...card.parts];
    return { ...card, parts, choices, lists: { ...card.lists, ...lists } };
  }
  const worked: Part = { part: 'lines', lines: [card.headline], from: 'standard' };
  const parts: readonly Part[] = [
    { part: 'lines', lines: why, from: 'standard' },
    ...(differences.length === 0 ? [] : rowsOf(kept.card as Card)),
    ...opinion(differences),
    ...(differences.length === 0 ? [] : [worked]),
    ...card.parts,
  ];
  return {
    ...card,
    headline: headlineOf(standard, revision),
    parts,
    choices,
    lists: { ...card.lists, ...lists },
  };
};

/** A card that may become a standard: of a new part, or of the one whose standard it stands under. */
export const proposeChoice = (first: First | null): Choice =>
  first === null
    ? {
        label: label('proposeStandard', {}),
        words: '/knurl standard propose card',
        ask: ['part'],
        ofCard: true,
      }
    : {
        label: label('proposeRevision', { part: first.standard.part }),
        words: `${lineFor('propose', first.standard.part)} card`,
        ask: ['why'],
        ofCard: true,
      };
