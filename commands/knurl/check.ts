import {
  checkAfter,
  checkBlank,
  type FamilyGrowth,
  type Mm,
  mm,
  OutOfRange,
  type SetupRequest,
  seamTest,
} from '../../src/calc/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
} from '../../src/desk/index.ts';
import { afterCard, blankCard, seamCard } from './checkCards.ts';
import { type CheckWords, checkFields } from './checkFields.ts';
import { shopRequestOf } from './shopRequest.ts';
import { reworded } from './words.ts';

const isAfter = (said: CheckWords): boolean =>
  [said.crest, said.height, said.flat, said.flats, said.count].some((each) => each !== undefined);

/** The bar that was said; a bore that is no smaller makes no sense of it. */
const barOf = ({ stock, bore }: SetupRequest): Mm | null => {
  if (stock !== null && bore !== null && bore >= stock)
    throw new OutOfRange('bore', bore, 0, stock, 'mm');
  return stock;
};

const seamReply = (
  context: Context,
  said: CheckWords,
  request: SetupRequest,
  gap: number,
): Reply => {
  const diameter = barOf(request);
  if (diameter === null) return missingDiameter(context);
  const result = seamTest(request, diameter, {
    gap,
    scrap: said.scrap === true,
    count: said.count ?? null,
  });
  return cardReply(seamCard({ context, said, request, diameter, result }));
};

const afterReply = (
  context: Context,
  said: CheckWords,
  request: SetupRequest,
  growth: FamilyGrowth | null,
): Reply => {
  const blank = barOf(request);
  if (blank === null) return missingDiameter(context);
  const { flats } = said;
  const result = checkAfter(
    { ...request, asIs: true },
    {
      blank,
      teeth: said.count ?? null,
      crest: said.crest === undefined ? null : mm(said.crest),
      toothHeight: said.height === undefined ? null : mm(said.height),
      flat: said.flat === undefined ? null : mm(said.flat),
      ends:
        flats === undefined
          ? null
          : {
              near: mm(flats.near),
              far: mm(flats.far),
              distance: mm(flats.distance),
            },
    },
  );
  return cardReply(afterCard({ context, said, request, diameter: blank, result }, growth));
};

const missingDiameter = (context: Context): Reply => {
  const examples = context.units === 'in' ? ['1.000', '7/8', '19mm'] : ['20', '25.4', '3/4 in'];
  return refuse(
    { code: 'missing', parameter: 'diameter', examples },
    examples.map((example) => ({
      label: example,
      words: reworded(context, [], example),
    })),
  );
};

const checked = (
  context: Context,
  said: CheckWords,
  request: SetupRequest,
  growth: FamilyGrowth | null,
): Reply => {
  if (said.seam !== undefined) return seamReply(context, said, request, said.seam);
  if (isAfter(said)) return afterReply(context, said, request, growth);
  const diameter = barOf(request);
  if (diameter === null) return missingDiameter(context);
  const result = checkBlank(request, diameter);
  return cardReply(blankCard({ context, said, request, diameter, result }));
};

/** Before, at the seam, and after: is this right, and what now. */
export const check = defineCommand({
  path: ['knurl', 'check'],
  examples: [
    '/knurl check 0.995 straight 21tpi',
    '/knurl check 0.995 21tpi straight seam 0.3',
    '/knurl check 0.9852 straight 21tpi 1018 count 65 crest 1.0040',
  ],
  parameters: checkFields,
  foremost: [
    'diameter',
    'pattern',
    'pitch',
    'material',
    'wheel',
    'machine',
    'count',
    'crest',
    'seam',
    'height',
    'flat',
    'flats',
    'scrap',
  ],
  allowed: 'operator',
  run: async (context, said) => {
    const built = await shopRequestOf(context, said);
    if ('refusal' in built) return refuse(built.refusal, built.choices);
    const reply = checked(context, said, built.request, built.growth);
    return 'card' in reply ? { ...reply, about: built.about } : reply;
  },
});
