import type { CribWheel } from '../crib.ts';
import type { Pattern } from '../pattern.ts';
import type { StandardDp } from '../pitch.ts';
import { DEFAULT_INCLUDED } from '../setup/index.ts';
import { type Mm, mm } from '../units.ts';
import { DP_BY_PREFERENCE, DP_WHEEL_SIZES, type DpWheelSize } from './ansi.ts';
import { DIN_82, DIN_FORMS, DIN_INCLUDED, DIN_PITCHES, type DinWheelForm } from './din82.ts';
import { DIN_403, type DinWheelSize, dinWheelCode, dinWheelTeeth } from './din403.ts';

type Tool = { readonly pattern: Pattern; readonly wheel: DinWheelForm };

/** Every wheel that makes a form by itself, unswivelled. */
const TOOLS: readonly Tool[] = DIN_FORMS.flatMap((form) => {
  const { pattern, tools } = DIN_82[form];
  return tools.flatMap(({ wheels: [wheel, fellow], setOver }) =>
    wheel === undefined || fellow !== undefined || setOver ? [] : [{ pattern, wheel }],
  );
});

const isCrossed = ({ kind }: Pattern): boolean => kind === 'diamond' || kind === 'square';

const dinWheel = (tool: Tool, size: DinWheelSize, width: Mm, t: number): CribWheel => {
  const { diameter, bore } = size;
  return {
    name: `${tool.wheel} ${dinWheelCode({ diameter, width, pitch: mm(t) })} DIN 403`,
    pattern: tool.pattern,
    onePiece: isCrossed(tool.pattern),
    pitch: { system: 'metric', value: t },
    alongRim: false,
    teeth: dinWheelTeeth(tool.wheel, diameter, mm(t)),
    proven: null,
    helix: null,
    included: DIN_INCLUDED,
    size: { diameter, face: width, bore, bevel: null },
    edge: null,
  };
};

/**
 * The crib of a shop that has entered no metric wheels: every wheel of the standard.
 *
 *     forms × diameters × widths × pitches
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | → crib | the wheels | - | |
 *
 * Assumes the teeth the standard prints, the nominal diameter and 90° teeth; the edges are to be had either way, and pairs come from withPairs.
 *
 * @source din-403 (sizes and teeth)
 * @source din-82 (which wheels make which form)
 * @example dinCrib().length // 252
 */
export function dinCrib(): readonly CribWheel[] {
  return TOOLS.flatMap((tool) =>
    DIN_403.flatMap((size) =>
      size.widths.flatMap((width) => DIN_PITCHES.map((t) => dinWheel(tool, size, width, t))),
    ),
  );
}

const DP_PATTERNS: readonly (readonly [name: string, pattern: Pattern])[] = [
  ['straight', { kind: 'straight' }],
  ['diagonal left', { kind: 'diagonal', hand: 'left' }],
  ['diagonal right', { kind: 'diagonal', hand: 'right' }],
];

const dpWheel = (
  dp: StandardDp,
  size: DpWheelSize,
  [name, pattern]: readonly [string, Pattern],
): CribWheel => {
  const { diameter, face, bore } = size;
  return {
    name: `${dp} DP ${name} ${size.name}`,
    pattern,
    onePiece: false,
    // The label and not the count: a diametral wheel is corrected for its own blanks.
    pitch: { system: 'dp', value: dp },
    alongRim: false,
    teeth: null,
    proven: null,
    helix: null,
    included: DEFAULT_INCLUDED,
    size: { diameter, face, bore, bevel: null },
    edge: null,
  };
};

/**
 * The crib of a shop that has entered no inch wheels: diametral-pitch wheels of the listed sizes.
 *
 *     pitches × sizes × straight, diagonal left and right
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | → crib | the wheels | - | |
 *
 * Assumes 90° teeth as everywhere unless said, edges to be had either way, and wheels true on their own fractional blanks.
 *
 * @source asme-b94.6 (pitches)
 * @source asme-b94.6-memory (sizes)
 * @example dpCrib().length // 48
 */
export function dpCrib(): readonly CribWheel[] {
  return DP_BY_PREFERENCE.flatMap((dp) =>
    DP_WHEEL_SIZES.flatMap((size) => DP_PATTERNS.map((pattern) => dpWheel(dp, size, pattern))),
  );
}
