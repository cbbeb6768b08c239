import { type Figures, materialById } from '../../src/calc/index.ts';
import {
  type Amount,
  type Card,
  type Choice,
  type Fact,
  type Line,
  label,
  line,
  type Moment,
  type Part,
  row,
} from '../../src/card/index.ts';
import type { Context, Visit } from '../../src/desk/index.ts';
import {
  approvedOf,
  changesSince,
  findCard,
  findIn,
  type KeptCard,
  MACHINES,
  MATERIALS_OF_SHOP,
  personById,
  type Register,
  type Revision,
  type Scope,
  type ShopView,
  type Standard,
  WHEELS,
} from '../../src/shop/index.ts';
import { quoted } from '../../src/words/index.ts';

type Signed = NonNullable<Revision['proposed']>;

/** The card a revision was made from. */
export const cardOf = async (shop: ShopView, { card }: Revision): Promise<KeptCard> => {
  const found = await findCard(shop, card);
  if (!found.ok) throw new Error('a standard without its card');
  return found.value;
};

const baseName = (base: string): string => {
  const material = materialById(base);
  return material === undefined ? base : `${material.name}, ${material.condition}`;
};

/** The name of one of the shop's things as it is today; null where it is gone. */
const nameIn = async <
  N extends 'wheel' | 'machine' | 'material',
  T extends { readonly name: string },
>(
  shop: ShopView,
  register: Register<N, T>,
  id: string | null,
): Promise<string | null> => {
  if (id === null) return null;
  const found = await findIn(shop, register, id);
  return found.ok ? found.value.name : null;
};

const text = (value: string): Amount => ({ kind: 'text', value });
const known = (name: string, amount: Amount | null): readonly Fact[] =>
  amount === null ? [] : [{ name, amount }];
const nullable = (name: string, value: string | null): readonly Fact[] =>
  known(name, value === null ? null : text(value));

/** What a standard is for, in the order in which it is read. */
export const scopeFacts = async (shop: ShopView, scope: Scope): Promise<readonly Fact[]> => {
  const own = await nameIn(shop, MATERIALS_OF_SHOP, scope.material);
  const { pattern, label: pitch, bars, finish } = scope;
  return [
    { name: 'pattern', amount: { kind: 'pattern', value: pattern } },
    {
      name: 'pitch',
      amount:
        pitch === null
          ? { kind: 'length', value: scope.pitch.named }
          : { kind: 'pitch', value: pitch },
    },
    { name: 'material', amount: text(own ?? baseName(scope.base)) },
    ...known('bars', bars === null ? null : { kind: 'span', value: bars }),
    ...known('finish', finish === null ? null : { kind: 'span', value: finish }),
    ...nullable('wheel', await nameIn(shop, WHEELS, scope.wheel)),
    ...nullable('machine', await nameIn(shop, MACHINES, scope.machine)),
  ];
};

/** The set-up of a card without what a standard had put before it. */
export const plainSetup = (
  card: Card,
): { readonly headline: Line; readonly parts: readonly Part[] } => {
  const [before] = card.lists?.['standard'] ?? [];
  const parts = card.parts.filter((part) => !('from' in part));
  if (before === undefined) return { headline: card.headline, parts };
  // What was kept is what was handed in: the headline that the standard took the place of.
  return { headline: (before as { readonly worked: Line }).worked, parts };
};

export const zoned = ({ settings }: Visit, at: number): Moment => ({
  at,
  zone: settings.timeZone,
});

const signedLine = async (
  visit: Visit,
  did: Revision['state'],
  signed: Signed | null,
  why: string | null = null,
): Promise<readonly Line[]> => {
  if (signed === null) return [];
  const by = (await personById(visit.shop, signed.by))?.name ?? '';
  return [line('standardSigned', { did, by, why, ...zoned(visit, signed.at) })];
};

/** Who brought it where it is. */
export const signedLines = async (visit: Visit, revision: Revision): Promise<readonly Line[]> => {
  const { made, proposed, approved, ended, state } = revision;
  return [
    ...(await signedLine(visit, 'draft', proposed?.at === made.at ? null : made)),
    ...(await signedLine(visit, 'proposed', proposed)),
    ...(await signedLine(visit, 'approved', approved)),
    ...(await signedLine(visit, state, ended, ended?.why ?? null)),
  ];
};

/** What asks for a review: something it rests on has changed, or its time has come. */
export const reviewLines = async (
  visit: Visit,
  { scope, basis, state, reviewAt }: Revision,
): Promise<readonly Line[]> => {
  if (state !== 'approved') return [];
  const changes = await changesSince(visit.shop, scope, basis);
  const isDue = reviewAt !== null && reviewAt <= visit.shop.at;
  return [
    ...changes.map((change) => line('standardChanged', change)),
    ...(isDue ? [line('standardReviewDue', zoned(visit, reviewAt))] : []),
  ];
};

const reviewAtLine = (visit: Visit, { state, reviewAt }: Revision): readonly Line[] =>
  state === 'approved' && reviewAt !== null && reviewAt > visit.shop.at
    ? [line('standardReviewAt', zoned(visit, reviewAt))]
    : [];

/** A line of buttons about one revision. */
export const lineFor = (verb: string, part: string, number?: number): string =>
  `/knurl standard ${verb} ${quoted(part)}${number === undefined ? '' : ` rev ${String(number)}`}`;

/** What can be done with a revision next. */
const choicesFor = (standard: Standard, { number, state }: Revision): readonly Choice[] => {
  const { part } = standard;
  const of = { part, revision: number };
  const held = approvedOf(standard);
  const retire: Choice = {
    label: label('retireStandard', of),
    words: lineFor('retire', part, number),
    ask: ['why'],
  };
  const propose = { label: label('proposeDraft', {}), words: lineFor('propose', part, number) };
  const approve = { label: label('approveStandard', of), words: lineFor('approve', part, number) };
  const compare =
    standard.revisions.length > 1 && number > 1
      ? [{ label: label('compareStandard', {}), words: lineFor('compare', part) }]
      : [];
  const history = { label: label('standardHistory', {}), words: lineFor('history', part) };
  switch (state) {
    case 'draft':
      return [propose, ...compare, retire];
    case 'proposed':
      return [approve, ...compare, retire];
    case 'approved':
      return [...compare, history, retire];
    case 'superseded':
    case 'retired':
      return held === undefined
        ? [history]
        : [{ label: label('showStandard', { part }), words: lineFor('show', part) }, history];
  }
};

export type RevisionTold = {
  readonly standard: Standard;
  readonly revision: Revision;
  readonly headline: Line;
  /** Said right under the headline. */
  readonly first?: readonly Line[];
  /** Without the set-up itself, where that was just seen or stands right beside it. */
  readonly brief?: true;
};

/** What programs read of a revision. */
export const revisionList = (
  { part }: Standard,
  { number, state, scope, why, reviewAt }: Revision,
  figures: unknown,
) => ({ part, revision: number, state, why, reviewAt, scope, figures });

const FOOTING: Part = { part: 'footing' };

/** A revision with all that is to be known of it, and the set-up it was made from. */
export const revisionCard = async (
  { units }: Context,
  visit: Visit,
  { standard, revision, headline, first = [], brief }: RevisionTold,
): Promise<Card> => {
  const kept = await cardOf(visit.shop, revision);
  // What was kept is what was handed in: a card of this program or an older one.
  const card = kept.card as Card;
  const setup = plainSetup(card);
  const lines = [
    ...first,
    ...(await reviewLines(visit, revision)),
    ...(await signedLines(visit, revision)),
    ...(revision.why === null ? [] : [line('standardWhy', { why: revision.why })]),
    ...reviewAtLine(visit, revision),
  ];
  const facts = await scopeFacts(visit.shop, revision.scope);
  const parts: readonly Part[] = [
    { part: 'lines', lines },
    { part: 'rows', rows: facts.map((fact) => row('fact', fact)) },
    { part: 'lines', lines: [setup.headline] },
  ];
  const whole =
    brief === true
      ? // A diameter to turn to stands on it, so what goes before every card does too.
        {
          ...card,
          parts: [...parts, FOOTING],
          pictures: [],
          checks: [],
          cautions: [],
          alternatives: [],
        }
      : { ...card, parts: [...parts, ...setup.parts] };
  return {
    ...whole,
    verb: 'standard',
    headline,
    choices: choicesFor(standard, revision),
    figures: kept.figures as Figures,
    lists: { standard: [revisionList(standard, revision, kept.figures)] },
    units,
  };
};
