import {
  brinellFromRockwellC,
  type Callout,
  classSuits,
  DEFAULT_INCLUDED,
  DEFAULT_MATERIAL_ID,
  DEFAULT_WHEEL,
  finishedSizeMinusPlate,
  finishLimits,
  growthBeforeResults,
  type Material,
  type Mm,
  materialById,
  mm,
  mmPerRev,
  mPerMin,
  type Pattern,
  type PatternKind,
  type Pitch,
  provenPitch,
  type Rad,
  rad,
  revPerMin,
  type SetupRequest,
  standardDp,
  type WheelSize,
  type Window,
} from '../../src/calc/index.ts';
import type { Context } from '../../src/desk/index.ts';
import type { Refusal, Suggestion } from '../../src/refusal.ts';
import type { WheelWords } from '../../src/words/index.ts';
import type { SetupWords } from './setupParameters.ts';
import { contradiction, keeping, reworded, typed } from './words.ts';

/** Stops the building of a request with what is to be asked instead. */
class Asks extends Error {
  readonly refusal: Refusal;
  readonly choices: readonly Suggestion[] | null;

  constructor(refusal: Refusal, choices: readonly Suggestion[] | null = null) {
    super(refusal.code);
    this.refusal = refusal;
    this.choices = choices;
  }
}

export type Built =
  | { readonly request: SetupRequest; readonly materialAssumed: boolean }
  | { readonly refusal: Refusal; readonly choices: readonly Suggestion[] };

const missing = (context: Context, parameter: string, examples: readonly string[]): Asks =>
  new Asks(
    { code: 'missing', parameter, examples },
    examples.map((example) => ({ label: example, words: reworded(context, [], example) })),
  );

const length = (value: number | undefined): Mm | null => (value === undefined ? null : mm(value));

/** What was said in words and what a callout says are one thing, or a question. */
const agreed = <T>(
  context: Context,
  name: string,
  words: T | undefined,
  called: T | null,
): T | null => {
  if (words === undefined || called === null) return words ?? called;
  if (JSON.stringify(words) === JSON.stringify(called)) return words;
  throw new Asks({
    code: 'unclear',
    what: name,
    because: 'calloutAgainst',
    readings: [keeping(context, 'callout', [name]), keeping(context, name, ['callout'])],
  });
};

const PATTERN_EXAMPLES = ['straight', 'diamond', 'diagonal', 'square'] as const;

const crossed = (kind: PatternKind): kind is 'diamond' | 'square' =>
  kind === 'diamond' || kind === 'square';

const patternOf = (kind: PatternKind, said: SetupWords): Pattern => {
  switch (kind) {
    case 'straight':
      return { kind };
    case 'diagonal':
      return { kind, hand: said.hand ?? null };
    case 'diamond':
    case 'square':
      return { kind, points: said.points ?? 'raised' };
  }
};

const wordedPattern = (context: Context, said: SetupWords): Pattern => {
  const kind = said.pattern ?? (said.hand === undefined ? undefined : 'diagonal');
  if (kind === undefined) throw missing(context, 'pattern', PATTERN_EXAMPLES);
  if (said.hand !== undefined && kind !== 'diagonal')
    throw new Asks(
      contradiction('pattern', 'handNeedsDiagonal', [
        { label: 'diagonal', words: reworded(context, ['pattern'], 'diagonal') },
        keeping(context, 'pattern', ['hand']),
      ]),
    );
  if (said.points !== undefined && !crossed(kind))
    throw new Asks(
      contradiction('pattern', 'pointsNeedCrossing', [
        { label: 'diamond', words: reworded(context, ['pattern'], 'diamond') },
        keeping(context, 'pattern', ['points']),
      ]),
    );
  return patternOf(kind, said);
};

const patternFor = (context: Context, said: SetupWords): Pattern => {
  const called = said.callout?.pattern ?? null;
  if (called === null) return wordedPattern(context, said);
  const silent = said.pattern === undefined && said.hand === undefined && said.points === undefined;
  if (silent) return called;
  const kind = said.pattern ?? called.kind;
  // A hand beside a diamond, or points beside a straight one, would be dropped without a word.
  const isIdle =
    (said.hand !== undefined && kind !== 'diagonal') ||
    (said.points !== undefined && !crossed(kind));
  const worded = patternOf(kind, {
    ...said,
    points: said.points ?? ('points' in called ? called.points : undefined),
    hand: said.hand ?? ('hand' in called ? (called.hand ?? undefined) : undefined),
  });
  if (!isIdle && JSON.stringify(worded) === JSON.stringify(called)) return called;
  throw new Asks({
    code: 'unclear',
    what: 'pattern',
    because: 'calloutAgainst',
    readings: [
      keeping(context, 'callout', ['pattern', 'hand', 'points']),
      {
        label: [typed(context, 'pattern'), typed(context, 'hand'), typed(context, 'points')]
          .join(' ')
          .trim(),
        words: reworded(context, ['callout'], ''),
      },
    ],
  });
};

const pitchExamples = ({ units }: Context): readonly string[] =>
  units === 'in' ? ['21tpi', '96dp', '1.0 pitch'] : ['1.0 pitch', '0.8 pitch', '1.6 pitch'];

const pitchFor = (context: Context, said: SetupWords, needed: boolean): Pitch | null => {
  const pitch = agreed(context, 'pitch', said.pitch, said.callout?.pitch ?? null);
  const counted = said.wheel?.teeth !== undefined && said.wheel.teeth !== null;
  if (needed && pitch === null && !counted && said.proven === undefined)
    throw missing(context, 'pitch', pitchExamples(context));
  if (counted && said.wheel?.diameter === null)
    throw missing(context, 'wheelDiameter', ['wheel 20mm 63 teeth', 'wheel 3/4 in 60 teeth']);
  return pitch;
};

const checkAngles = (context: Context, said: SetupWords, pattern: Pattern): void => {
  if (said.helix !== undefined && said.tilt !== undefined)
    throw new Asks(
      contradiction('helix', 'tiltAndHelix', [
        keeping(context, 'helix', ['tilt']),
        keeping(context, 'tilt', ['helix']),
      ]),
    );
  if (said.helix !== undefined && (pattern.kind === 'straight' || pattern.kind === 'square'))
    throw new Asks(
      contradiction('helix', 'helixNeedsHelical', [
        { label: 'diagonal', words: reworded(context, ['pattern'], 'diagonal') },
        { label: 'diamond', words: reworded(context, ['pattern'], 'diamond') },
        keeping(context, 'pattern', ['helix']),
      ]),
    );
  if (said.tilt !== undefined && pattern.kind === 'square')
    throw new Asks(
      contradiction('tilt', 'tiltNotSquare', [
        { label: 'diamond', words: reworded(context, ['pattern'], 'diamond') },
        keeping(context, 'pattern', ['tilt']),
      ]),
    );
};

const classFor = (context: Context, said: SetupWords, pattern: Pattern, pitch: Pitch | null) => {
  const own = agreed(context, 'class', said.class, said.callout?.knurlClass ?? null);
  if (own === null) return null;
  const line = reworded(context, ['class'], '');
  const without = { label: line, words: line };
  const dp = pitch?.system === 'dp' ? standardDp(pitch.value) : null;
  if (dp === null)
    throw new Asks(
      contradiction('class', 'classNeedsDp', [
        { label: '96dp', words: reworded(context, ['pitch'], '96dp') },
        without,
      ]),
    );
  if (classSuits(own, pattern)) return own;
  throw new Asks(
    contradiction('class', 'classStraightOnly', [
      { label: 'straight', words: reworded(context, ['pattern', 'hand', 'points'], 'straight') },
      { label: 'class I', words: reworded(context, ['class'], 'class I') },
      without,
    ]),
  );
};

const BORE_SHARE = 0.3;

/** A wheel said by its diameter alone gets a face and a bore that such a wheel can have. */
const wheelSize = (said: SetupWords): WheelSize => {
  const wheel: WheelWords | undefined = said.wheel;
  const diameter = mm(wheel?.diameter ?? DEFAULT_WHEEL.diameter);
  const usual = DEFAULT_WHEEL.bore < diameter / 2 ? DEFAULT_WHEEL.bore : diameter * BORE_SHARE;
  return {
    diameter,
    face: mm(wheel?.face ?? DEFAULT_WHEEL.face),
    bore: mm(wheel?.bore ?? usual),
    bevel: length(said.bevel),
  };
};

const checkEdge = (context: Context, said: SetupWords): void => {
  if (said.edge !== 'square' || said.bevel === undefined || said.bevel === 0) return;
  throw new Asks(
    contradiction('edge', 'squareEdgeHasNoBevel', [
      keeping(context, 'edge', ['bevel']),
      keeping(context, 'bevel', ['edge']),
    ]),
  );
};

const checkTwice = (context: Context, said: SetupWords): void => {
  const both = (a: string, b: string) => [keeping(context, a, [b]), keeping(context, b, [a])];
  if (said.speed !== undefined && said.rotation !== undefined)
    throw new Asks(contradiction('speed', 'speedTwice', both('speed', 'rotation')));
  if (said.feed !== undefined && said.turns !== undefined)
    throw new Asks(contradiction('feed', 'feedTwice', both('feed', 'turns')));
  if (said.asIs === true && said.teeth !== undefined)
    throw new Asks(contradiction('teeth', 'countAndAsIs', both('teeth', 'asIs')));
};

type Finish = { readonly limits: Window | null; readonly aimOnly: boolean };

/** The limits of the print: said, or those of the class; one size alone is aimed at. */
const printLimits = (
  said: SetupWords,
  dp: ReturnType<typeof standardDp>,
  knurlClass: Callout['knurlClass'],
): Finish => {
  const { finish } = said;
  if (finish === undefined) return { limits: null, aimOnly: false };
  const low = mm(finish.low);
  if (!finish.nominalOnly) return { limits: { low, high: mm(finish.high) }, aimOnly: false };
  return dp !== null && knurlClass !== null
    ? { limits: finishLimits({ dp, knurlClass, nominal: low }), aimOnly: false }
    : { limits: { low, high: low }, aimOnly: true };
};

/** Plating to come takes its thickness off both sides of the target. */
const finishFor = (
  said: SetupWords,
  dp: ReturnType<typeof standardDp>,
  knurlClass: Callout['knurlClass'],
): Finish => {
  const print = printLimits(said, dp, knurlClass);
  return print.limits === null || said.plate === undefined
    ? print
    : { ...print, limits: finishedSizeMinusPlate(print.limits, mm(said.plate)) };
};

/** Most rows of the table that are offered where a word leaves several. */
const MOST_MATERIALS = 5;

/** `annealed` alone leaves a dozen rows and no usual one among them. */
const whichMaterial = (context: Context, ids: readonly string[]): Asks => {
  const names = ids.flatMap((id) => materialById(id)?.aliases[0] ?? []);
  const readings = names
    .slice(0, MOST_MATERIALS)
    .map((name) => ({ label: name, words: reworded(context, ['material'], name) }));
  return new Asks({ code: 'unclear', what: 'material', because: 'familyOnly', readings });
};

const materialFor = (
  context: Context,
  said: SetupWords,
): { material: Material; assumed: boolean } => {
  const { material: words } = said;
  if (words?.usual === null) throw whichMaterial(context, words.ids);
  const id = words?.usual ?? DEFAULT_MATERIAL_ID;
  const material = materialById(id);
  if (material === undefined) throw new Error(`no material ${id}`);
  return { material, assumed: words === undefined };
};

const brinell = (said: SetupWords): number | null => {
  if (said.hardness === undefined) return null;
  const { scale, value } = said.hardness;
  return scale === 'HB' ? value : brinellFromRockwellC(value);
};

const diameterExamples = ({ units }: Context): readonly string[] =>
  units === 'in' ? ['1.000', '7/8', '19mm'] : ['20', '25.4', '3/4 in'];

const countedOf = ({ wheel }: SetupWords): SetupRequest['counted'] => {
  const [diameter, teeth] = [wheel?.diameter ?? null, wheel?.teeth ?? null];
  return diameter === null || teeth === null ? null : { diameter: mm(diameter), teeth };
};

/** What was said of the wheel and of what it turns on. */
const wheelParts = (said: SetupWords) => {
  const { pin } = said;
  return {
    counted: countedOf(said),
    proven:
      said.proven === undefined ? null : provenPitch(mm(said.proven.diameter), said.proven.teeth),
    wheel: wheelSize(said),
    edge: said.edge ?? null,
    pin: pin?.material ?? 'hardened',
    pinDiameter: length(pin?.diameter ?? undefined),
    onePiece: said.oneWheel === true,
    layout: said.layout ?? null,
  } as const;
};

/** What was said of the bar and how it is held. */
const barParts = (said: SetupWords) =>
  ({
    stock: length(said.diameter),
    asIs: said.asIs === true,
    wantedTeeth: said.teeth ?? null,
    hardness: brinell(said),
    length: length(said.length),
    stickout: length(said.stickout),
    support: said.support ?? 'chuck',
    stockLength: length(said.stockLength),
    bore: length(said.bore),
    plug: said.plug === true,
    runout: length(said.runout),
    fitBore: length(said.fit),
    plate: length(said.plate),
  }) as const;

/** What was said of how it runs. */
const runParts = (said: SetupWords) => ({
  process: said.process ?? null,
  feed: said.feed === undefined ? null : mmPerRev(said.feed),
  speed: said.speed === undefined ? null : mPerMin(said.speed),
  rotation: said.rotation === undefined ? null : revPerMin(said.rotation),
  turns: said.turns ?? null,
  batch: said.batch ?? 1,
});

const includedOf = (context: Context, said: SetupWords): Rad => {
  const worded = said.angle === undefined ? undefined : rad(said.angle);
  return agreed(context, 'angle', worded, said.callout?.included ?? null) ?? DEFAULT_INCLUDED;
};

const assemble = (context: Context, said: SetupWords, pitchNeeded: boolean): Built => {
  const pattern = patternFor(context, said);
  const pitch = pitchFor(context, said, pitchNeeded);
  checkAngles(context, said, pattern);
  checkEdge(context, said);
  checkTwice(context, said);
  const knurlClass = classFor(context, said, pattern, pitch);
  const dp = pitch?.system === 'dp' ? standardDp(pitch.value) : null;
  const { limits, aimOnly } = finishFor(said, dp, knurlClass);
  if (said.diameter === undefined && limits === null)
    throw missing(context, 'diameter', diameterExamples(context));
  const { material, assumed } = materialFor(context, said);
  const request: SetupRequest = {
    pattern,
    pitch,
    alongRim: said.rim === true,
    helix: said.helix === undefined ? null : rad(said.helix),
    tilt: said.tilt === undefined ? null : rad(said.tilt),
    included: includedOf(context, said),
    finish: limits,
    aimOnly,
    knurlClass,
    fill: said.fill ?? null,
    material,
    ...wheelParts(said),
    ...barParts(said),
    ...runParts(said),
    machine: null,
    growth: growthBeforeResults(),
  };
  return { request, materialAssumed: assumed };
};

/** What a line asks for, in calc's own terms, or what has to be asked back. */
export const requestOf = (context: Context, said: SetupWords, pitchNeeded = true): Built => {
  try {
    return assemble(context, said, pitchNeeded);
  } catch (error) {
    if (!(error instanceof Asks)) throw error;
    const { refusal } = error;
    const choices = error.choices ?? (refusal.code === 'unclear' ? refusal.readings : []);
    return { refusal, choices };
  }
};
