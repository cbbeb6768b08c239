import {
  checkAfter,
  type MeasuredPart,
  mm,
  NO_FACTS,
  rankCauses,
  type SetupRequest,
  type SymptomId,
  setUp,
  type TroubleFacts,
  troubleFacts,
} from '../../src/calc/index.ts';
import { line } from '../../src/card/index.ts';
import {
  type About,
  type Context,
  cardReply,
  defineCommand,
  placeName,
  type Reply,
  refuse,
} from '../../src/desk/index.ts';
import { causeCounts, latestCards, type Wheel } from '../../src/shop/index.ts';
import { bareLine } from './nextMoves.ts';
import { shopRequestOf } from './shopRequest.ts';
import { troubleCard } from './troubleCard.ts';
import { type TroubleWords, troubleFields } from './troubleFields.ts';
import { reworded } from './words.ts';

/** Nothing of the set-up was said: only the words of the symptom speak. */
const wordsAlone = (said: TroubleWords): boolean =>
  [said.diameter, said.finish, said.pattern, said.pitch, said.callout, said.wheel].every(
    (each) => each === undefined,
  );

const length = (value: number | undefined) => (value === undefined ? null : mm(value));

const partOf = (said: TroubleWords, blank: number): MeasuredPart | null => {
  const { flats, count, crest, height, flat } = said;
  if ([flats, count, crest, height, flat].every((each) => each === undefined)) return null;
  return {
    blank: mm(blank),
    teeth: count ?? null,
    crest: length(crest),
    toothHeight: length(height),
    flat: length(flat),
    ends:
      flats === undefined
        ? null
        : { near: mm(flats.near), far: mm(flats.far), distance: mm(flats.distance) },
  };
};

/** Parts the wheel has made: as it was said, else as the shop has counted them. */
const partsOn = (said: TroubleWords, wheel: Wheel | null): number | null => {
  if (said.partsOnWheel !== undefined) return said.partsOnWheel;
  return wheel === null || wheel.partsRun === 0 ? null : wheel.partsRun;
};

const factsOf = (said: TroubleWords, request: SetupRequest, wheel: Wheel | null): TroubleFacts => {
  const result = setUp(request);
  const part = partOf(said, result.blank.diameter);
  return troubleFacts(request, result, {
    partsOnWheel: partsOn(said, wheel),
    firstBite: length(said.bite),
    blank: null,
    blankTaper: null,
    after: part === null ? null : checkAfter(request, part),
  });
};

const ranked = async (
  context: Context,
  said: TroubleWords,
  symptom: SymptomId,
  facts: TroubleFacts,
  about?: About,
): Promise<Reply> => {
  const { visit } = context;
  const counts = visit === null ? {} : await causeCounts(visit.shop, symptom);
  const causes = rankCauses(symptom, facts, counts);
  const logged = Object.values(counts).reduce((sum, count) => sum + count, 0);
  return cardReply(troubleCard({ context, said, symptom, facts, causes, logged }), [], about);
};

/** Cards that are looked through for the last set-up. Judgement. */
const LOOKED_THROUGH = 20;

/** The same trouble with the set-up this person was last given here; null where there is none. */
const ofLastSetup = async (context: Context): Promise<Reply | null> => {
  const { visit, text } = context;
  if (visit === null) return null;
  const [place, madeBy] = [placeName(context.place), visit.person.id];
  const own = await latestCards(visit.shop, { limit: LOOKED_THROUGH, madeBy, place });
  const last = own.find(({ kind }) => kind === 'setup');
  if (last === undefined) return null;
  const words = `/knurl trouble ${bareLine(text)} ${bareLine(last.words)}`;
  const reply = await context.again(words);
  // Words that do not go together with it are ranked by themselves.
  if ('refusal' in reply) return null;
  const { card, about } = reply;
  const from = line('troubleOfCard', { code: last.code });
  const [head, ...rest] = card.parts;
  const first = head?.part === 'lines' ? head.lines : [];
  const others = head?.part === 'lines' ? rest : card.parts;
  return {
    ...reply,
    card: { ...card, parts: [{ part: 'lines', lines: [from, ...first] }, ...others] },
    ...(about === undefined ? {} : { about: { ...about, words } }),
  };
};

const SYMPTOM_EXAMPLES = ['double', 'flaking', 'shallow', 'pin seized'] as const;

const missingSymptom = (context: Context): Reply =>
  refuse(
    { code: 'missing', parameter: 'symptom', examples: SYMPTOM_EXAMPLES },
    SYMPTOM_EXAMPLES.map((example) => ({
      label: example,
      words: reworded(context, [], example),
    })),
  );

/** From what is seen on the part to its likeliest causes, each with one next move. */
export const trouble = defineCommand({
  path: ['knurl', 'trouble'],
  examples: [
    '/knurl trouble double 1.000 straight 21tpi 1018',
    '/knurl trouble flaking 20mm diamond 0.8 pitch brass fill 95%',
    '/knurl trouble pin seized',
  ],
  parameters: troubleFields,
  foremost: [
    'symptom',
    'diameter',
    'pattern',
    'pitch',
    'material',
    'wheel',
    'machine',
    'bite',
    'partsOnWheel',
    'count',
    'crest',
    'height',
    'flat',
    'flats',
  ],
  allowed: 'operator',
  run: async (context, said) => {
    if (said.symptom === undefined) return missingSymptom(context);
    if (wordsAlone(said))
      return (await ofLastSetup(context)) ?? (await ranked(context, said, said.symptom, NO_FACTS));
    const built = await shopRequestOf(context, said);
    return 'refusal' in built
      ? refuse(built.refusal, built.choices)
      : await ranked(
          context,
          said,
          said.symptom,
          factsOf(said, built.request, built.wheel),
          built.about,
        );
  },
});
