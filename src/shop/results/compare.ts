import {
  type AfterCheck,
  checkAfter,
  formedRound,
  formOf,
  growthFamily,
  type Mm,
  measuredGrowthShare,
  mm,
  OutOfRange,
  type SetupRequest,
  setUp,
  within,
} from '../../calc/index.ts';
import type { Refusal } from '../../refusal.ts';
import type { KeptCard } from '../cards.ts';
import { type Done, done, refused } from '../result.ts';
import type { Outcome, ResultContent } from './content.ts';

/** What a result says of the growth of its pattern and material. */
export type GrowthSaid = { readonly family: string; readonly share: number };

/** Why a result says nothing of the growth. */
export type NoGrowth = 'noCrest' | 'noHeight' | 'cut' | 'spoiled' | 'tooLittle' | 'oldCard';

/** What leaves no sound tooth, so that its crest is not that of the growth. Judgement. */
const SPOILED: readonly Outcome[] = ['double', 'flaking', 'bent', 'seized'];

/** A result held against its card. */
export type Compared = {
  /** The row of the table of materials the card was for; null where the card is too old to say. */
  readonly base: string | null;
  readonly after: AfterCheck | null;
  readonly growth: GrowthSaid | NoGrowth;
};

/** Static growth under which a crest that is read to 0.01 mm says nothing of its share. Judgement. */
const LEAST_GROWTH: Mm = mm(0.05);
/** No material grows by more than this over its volume: one of the measures is wrong. Judgement. */
const MOST_SHARE = 10;

/** What every request of this program has; a card of another form is kept, and not compared. */
const NEEDED = ['pattern', 'material', 'included', 'wheel', 'growth'] as const;

/** The request that a kept card was worked out from. */
const requestOf = ({ request }: KeptCard): SetupRequest | null =>
  typeof request === 'object' && request !== null && NEEDED.every((name) => name in request)
    ? (request as SetupRequest)
    : null;

/** The blank the card was for: the bar that was checked, or what was to be turned. */
const blankOf = ({ kind }: KeptCard, request: SetupRequest): Mm =>
  kind === 'check' && request.stock !== null ? request.stock : setUp(request).blank.diameter;

/** Tooth height as measured, or as the flat on the crests has it: H = (1 − w/p) Hf. */
const heightOf = (content: ResultContent, { pitch }: AfterCheck, sharp: Mm): Mm | null => {
  const { toothHeight, flat } = content;
  if (toothHeight !== null) return toothHeight;
  return flat === null ? null : mm((1 - flat / pitch.normal) * sharp);
};

const growthOf = (
  content: ResultContent,
  request: SetupRequest,
  blank: Mm,
  after: AfterCheck,
): GrowthSaid | NoGrowth => {
  const planned = setUp({ ...request, stock: blank, asIs: true, wantedTeeth: null });
  if (planned.process === 'cut') return 'cut';
  if (SPOILED.includes(content.outcome)) return 'spoiled';
  if (content.crest === null) return 'noCrest';
  const sharp = mm(planned.figures.sharpHeight?.value ?? 0);
  const height = heightOf(content, after, sharp);
  if (height === null) return 'noHeight';
  const tooth = { form: formOf(request.pattern), blankDiameter: blank, height, sharpHeight: sharp };
  const still = height <= 0 ? mm(0) : formedRound(tooth).growth;
  if (still < LEAST_GROWTH) return 'tooLittle';
  // The root never rises over the bar, so the crest never by more than the tooth that was measured.
  const most = mm(blank + Math.min(2 * height, MOST_SHARE * still));
  within('crestDiameter', content.crest, blank, most, 'mm');
  const share = measuredGrowthShare({ ...tooth, crestDiameter: content.crest });
  return { family: growthFamily(request.pattern, request.material.group), share };
};

const comparedTo = (card: KeptCard, request: SetupRequest, content: ResultContent): Compared => {
  const blank = content.blank ?? blankOf(card, request);
  const after = checkAfter(
    { ...request, asIs: true },
    {
      blank,
      teeth: content.teeth,
      crest: content.crest,
      toothHeight: content.toothHeight,
      flat: content.flat,
      ends: null,
    },
  );
  const growth = growthOf(content, request, blank, after);
  return { base: request.material.id, after, growth };
};

const asRefusal = ({ what, value, min, max, unit }: OutOfRange): Refusal => ({
  code: 'outOfRange',
  what,
  value,
  min,
  max,
  unit,
});

/** What a result says beside its card, or why such a part cannot be. */
export const compared = (card: KeptCard, content: ResultContent): Done<Compared> => {
  const request = requestOf(card);
  if (request === null) return done({ base: null, after: null, growth: 'oldCard' });
  try {
    return done(comparedTo(card, request, content));
  } catch (error) {
    if (error instanceof OutOfRange) return refused(asRefusal(error));
    throw error;
  }
};
