import {
  convertPitch,
  mm,
  type Pattern,
  PITCH_TOLERANCE,
  type Pitch,
  rad,
  suitsPattern,
  usualHelix,
  wheelsWithin,
  withPairs,
} from '../../src/calc/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
} from '../../src/desk/index.ts';
import { convertCard, type Near, SYSTEMS } from './convertCard.ts';
import { type ConvertWords, convertFields } from './convertFields.ts';
import { type Crib, cribOfShop } from './shopCrib.ts';
import { contradiction, keeping, reworded } from './words.ts';

const EXAMPLES = ['21tpi', '96dp', '0.8 pitch'] as const;

const missingPitch = (context: Context): Reply =>
  refuse(
    { code: 'missing', parameter: 'pitch', examples: EXAMPLES },
    EXAMPLES.map((example) => ({ label: example, words: reworded(context, [], example) })),
  );

/** The pattern that was said; null leaves every wheel in question and the pitch straight. */
const patternOf = (said: ConvertWords): Pattern | null => {
  const kind = said.pattern ?? (said.hand === undefined ? undefined : 'diagonal');
  switch (kind) {
    case undefined:
      return said.callout?.pattern ?? null;
    case 'straight':
      return { kind };
    case 'diagonal':
      return { kind, hand: said.hand ?? null };
    case 'diamond':
    case 'square':
      return { kind, points: said.points ?? 'raised' };
  }
};

/** What the words say otherwise than the callout beside them. */
const against = ({ callout, pitch, pattern }: ConvertWords): 'pitch' | 'pattern' | null => {
  if (callout === undefined) return null;
  const other = pitch !== undefined && callout.pitch !== null;
  if (other && JSON.stringify(pitch) !== JSON.stringify(callout.pitch)) return 'pitch';
  const kind = callout.pattern?.kind;
  return pattern !== undefined && kind !== undefined && kind !== pattern ? 'pattern' : null;
};

const disagreeing = (context: Context, what: 'pitch' | 'pattern'): Reply => {
  const readings = [keeping(context, 'callout', [what]), keeping(context, what, ['callout'])];
  return refuse({ code: 'unclear', what, because: 'calloutAgainst', readings }, readings);
};

/** Every pattern that a wheel or a pair of wheels can leave. */
const EVERY_PATTERN: readonly Pattern[] = [
  { kind: 'straight' },
  { kind: 'diagonal', hand: null },
  { kind: 'diamond', points: 'raised' },
  { kind: 'diamond', points: 'sunk' },
];

/** The wheels that suit the pattern, with pairs made up for diamonds; each once. */
const cribFor = async (context: Context, pattern: Pattern | null): Promise<Crib> => {
  const found = await cribOfShop(context, pattern === null ? EVERY_PATTERN : [pattern]);
  if (found.kind === 'ofShop') return found;
  const crib = withPairs(found.crib).filter(
    (wheel) => pattern === null || suitsPattern(wheel.pattern, pattern),
  );
  return { ...found, crib };
};

const converted = async (context: Context, said: ConvertWords, pitch: Pitch): Promise<Reply> => {
  const pattern = patternOf(said);
  const crib = await cribFor(context, pattern);
  const helix =
    said.helix === undefined ? usualHelix(pattern ?? { kind: 'straight' }) : rad(said.helix);
  const systems = SYSTEMS.map((to) => convertPitch({ pitch, to, helix }));
  const normal = mm(convertPitch({ pitch, to: 'metric', helix }).exact.value);
  const tolerance = said.tolerance ?? PITCH_TOLERANCE;
  const near = (within: number): readonly Near[] =>
    wheelsWithin({ normal, tolerance: within, crib: crib.crib }).map(
      ({ wheel, pitch: own, error }) => ({ wheel: wheel.name, pitch: own.normal, error }),
    );
  return cardReply(
    convertCard({
      context,
      said,
      pitch,
      normal,
      helix,
      tolerance,
      systems,
      crib,
      straightTaken: pattern === null && said.helix === undefined,
      wheels: near(tolerance),
      nearest: near(ANY)[0] ?? null,
    }),
  );
};

/** Wide enough that some wheel always comes within it. */
const ANY = 10;

/** A pitch in every system, how far the nearest standard one is off, and which wheels come near. */
export const convert = defineCommand({
  path: ['knurl', 'convert'],
  examples: ['/knurl convert 0.8 pitch', '/knurl convert 21tpi diamond within 5%'],
  parameters: convertFields,
  allowed: 'operator',
  run: (context, said) => {
    const what = against(said);
    if (what !== null) return disagreeing(context, what);
    if (said.helix !== undefined && ['straight', 'square'].includes(patternOf(said)?.kind ?? ''))
      return helixOnStraight(context);
    const pitch = said.pitch ?? said.callout?.pitch ?? null;
    return pitch === null ? missingPitch(context) : converted(context, said, pitch);
  },
});

const helixOnStraight = (context: Context): Reply => {
  const readings = [
    { label: 'diagonal', words: reworded(context, ['pattern', 'callout'], 'diagonal') },
    keeping(context, 'pattern', ['helix']),
  ];
  return refuse(contradiction('helix', 'helixNeedsHelical', readings), readings);
};
