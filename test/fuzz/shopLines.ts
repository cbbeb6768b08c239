/**
 * Lines as they reach a bot in a shop: good ones, slips of the thumb, half of one, words in any
 * order, and what no person would type. The same row of lines for the same seed.
 */
import { FLEET } from '../../commands/index.ts';
import { MATERIAL_PHRASES } from '../../src/words/index.ts';
import { between, mulberry32, oneOf } from '../support/random.ts';

type Random = () => number;

/** Lines a shop would type; the slips are made from these. */
export const GOOD_LINES: readonly string[] = [
  '/knurl 1.000 straight 21tpi 1018',
  '/knurl 7/8 diagonal left 96dp brass',
  '/knurl setup ø19mm diamond 1.0 pitch 304 long 30mm out 60mm tailstock',
  '1-1/4 diamond 14 tpi 12L14 long 1.5 out 3 opposed',
  '3/4 straight 96 dp class II 303 finish 0.745-0.755',
  'finish 1.000 +0 -0.010 straight 96dp 6061',
  'RGE 0.8 brass 20mm long 12',
  'DIN 82-RAA 0,8 25 mm 1045',
  'JIS B 0951 straight m 0.3 20mm',
  '0.875 diamond sunk 33 tpi alu feed 0.012 long 2',
  '1.0 square pattern 21tpi one wheel copper',
  '25.4mm straight 160dp tilt 30 bronze',
  '1.500 diagonal right helix 45 module 0.4 4140 HB 210',
  '1 straight 21tpi 28 HRC 4140 speed 60 sfm batch 50',
  '1 diamond 21tpi 316 200 rpm turns 18 fill 85%',
  '1.000 straight 21tpi as-is beveled wheel 20x8x6 bevel 1',
  '20 mm diamond 1.0 pitch wheel 20mm 63 teeth pin 6mm carbide',
  '1.0 diamond 21tpi rim runout 0.004 bore 0.75 plug',
  '1 straight 21tpi ti-6al-4v cut square edge long 1',
  '2 in bar straight 16 tpi 64 teeth bar length 36 centers',
  '1.0 straight 21tpi form cast iron angle 80',
  '0.1 14tpi straight',
  '19 diamond 21tpi',
  'help',
];

/** All that the commands listen to, and what people say round it. */
const WORDS: readonly string[] = [
  ...FLEET.flatMap((command) => [command.path.join(' '), `/${command.path.join(' ')}`]),
  ...FLEET.flatMap(({ parameters }) => parameters).flatMap((parameter) => [
    ...(parameter.values ?? []).map(([phrase]) => phrase),
    ...(parameter.keywords ?? []),
    ...parameter.examples,
  ]),
  ...MATERIAL_PHRASES,
  ...['a', 'the', 'bar', 'please', 'in', 'with', 'and', 'x', 'to', '-', '/', '+0', '±0.005', 'x8'],
];

const UNITS: readonly string[] = [
  ...['', '', '', 'in', '"', '″', "'", 'mm', ' mm', 'cm', 'thou', 'um', 'tpi', ' tpi', 'dp', ' dp'],
  ...['°', 'deg', '%', 'rpm', 'sfm', 'm/min', 'in/rev', 'mm/rev', 'hb', 'hrc', 'teeth', 'turns'],
  ...['pcs', 'm', 'x', 'e3', 'kg', '½', '..'],
];

/** What breaks readers: signs of other scripts, marks of the platforms, numbers that are none. */
const ODD: readonly string[] = [
  ...['NaN', 'Infinity', '-Infinity', '1e99', '1e-99', '0x1f', '1_000', '٣', '二', '٫', '𝟚', '①'],
  ...['null', 'undefined', '__proto__', 'constructor', 'toString', 'hasOwnProperty', '{}', '[]'],
  ...['<@U012AB3CD>', '<!channel>', '@everyone', '*bold*', '`code`', '||x||', '&lt;', '<script>'],
  ...['ﬁnish', 'Ⅱ', 'class Ⅱ', 'İ', 'ß', 'ẞ', '\u200B', '\u202E', '\u0000', '\uFEFF', '\u00A0'],
  ...['\uD800', '\uDC00', '💥', '👩‍🏭', 'é', 'a\u0301', '—', '‘', '”', '½', '1½', '⅞', '−1', '＋1'],
  ...['\n', '\t', '\r', '\\', '%s', '%', ';', ',', '.', '/', '//', '--', "'", '"', '\u2028'],
];

const some = (random: Random, share: number): boolean => random() < share;
const upTo = (random: Random, most: number): number => Math.floor(between(random, 0, most + 1));

/** A number over many sizes, written one of the ways people write numbers. */
const numberText = (random: Random): string => {
  const size = 10 ** between(random, -3, 3.5);
  const whole = Math.max(1, Math.round(size));
  const ways: readonly (() => string)[] = [
    () => size.toFixed(upTo(random, 4)),
    () => size.toFixed(upTo(random, 3)).replace('.', ','),
    () => size.toFixed(3).replace(/^0/u, ''),
    () => String(whole),
    () => `${String(upTo(random, 15))}/${String(2 ** upTo(random, 6))}`,
    () => `${String(upTo(random, 3))}-${String(1 + upTo(random, 6))}/8`,
    () => `${String(upTo(random, 3))} ${String(1 + upTo(random, 6))}/8`,
    () => `${String(upTo(random, 3))}${oneOf(random, ['½', '¼', '¾', '⅛', '⅞'])}`,
    () => `${oneOf(random, ['-', '+', '±', '−', 'ø', 'Ø'])}${size.toFixed(2)}`,
    () => String(size ** between(random, 1, 12)),
  ];
  return oneOf(random, ways)();
};

const quantityText = (random: Random): string => numberText(random) + oneOf(random, UNITS);

const oddText = (random: Random): string => {
  if (some(random, 0.6)) return oneOf(random, ODD);
  const points = Array.from({ length: 1 + upTo(random, 6) }, () =>
    some(random, 0.5) ? upTo(random, 0x2fff) : upTo(random, 0x10ffff),
  );
  return String.fromCodePoint(...points);
};

const anyWord = (random: Random): string => {
  const drawn = random();
  if (drawn < 0.55) return oneOf(random, WORDS);
  return drawn < 0.92 ? quantityText(random) : oddText(random);
};

/** Words and numbers in any order. */
const heap = (random: Random): string =>
  Array.from({ length: upTo(random, 14) }, () => anyWord(random)).join(' ');

const PATTERNS = ['straight', 'diamond', 'diagonal left', 'diagonal', 'square', 'diamond sunk'];
const PITCHES: readonly ((random: Random) => string)[] = [
  (random) => `${String(8 + upTo(random, 90))} tpi`,
  (random) => `${String(oneOf(random, [64, 96, 128, 160, 100]))}dp`,
  (random) => `${between(random, 0.2, 3.2).toFixed(2)} pitch`,
  (random) => `m${between(random, 0.07, 1).toFixed(2)}`,
  (random) => `wheel ${String(15 + upTo(random, 10))}mm ${String(20 + upTo(random, 200))} teeth`,
];
/** What may stand beside bar, pattern and pitch, in sizes that mostly make sense. */
const BESIDE: readonly ((random: Random) => string)[] = [
  (random) => oneOf(random, MATERIAL_PHRASES),
  (random) => `long ${between(random, 0.5, 80).toFixed(1)} mm`,
  (random) => `out ${between(random, 5, 400).toFixed(1)} mm`,
  (random) => `bore ${between(random, 1, 60).toFixed(1)} mm`,
  (random) => `bar length ${between(random, 20, 3000).toFixed(0)} mm`,
  (random) => `fill ${between(random, 5, 110).toFixed(0)}%`,
  (random) => `${oneOf(random, ['helix', 'tilt', 'angle'])} ${between(random, 0, 130).toFixed(0)}`,
  (random) => `feed ${between(random, 0.01, 1.5).toFixed(2)} mm/rev`,
  (random) => `turns ${String(upTo(random, 40))}`,
  (random) => `speed ${between(random, 0, 120).toFixed(0)} m/min`,
  (random) => `${String(upTo(random, 6000))} rpm`,
  (random) => `batch ${String(upTo(random, 2000))}`,
  (random) => `${String(1 + upTo(random, 300))} teeth`,
  (random) => `HB ${String(20 + upTo(random, 750))}`,
  (random) => `${String(upTo(random, 70))} HRC`,
  (random) => `runout ${between(random, 0, 0.6).toFixed(3)} mm`,
  (random) => `class ${oneOf(random, ['I', 'II', 'III', 'IV'])}`,
  (random) => `pin ${String(1 + upTo(random, 12))} mm ${oneOf(random, ['carbide', 'hardened'])}`,
  (random) => `wheel ${String(10 + upTo(random, 30))}x${String(1 + upTo(random, 20))}x6`,
  (random) => `bevel ${between(random, 0, 5).toFixed(1)} mm`,
  ...['cut', 'form', 'as-is', 'rim', 'one wheel', 'opposed', 'one-sided', 'plug', 'tailstock'].map(
    (word) => () => word,
  ),
  ...['centers', 'chuck', 'square edge', 'convex', 'beveled', 'show mm', 'show in'].map(
    (word) => () => word,
  ),
];

const barText = (random: Random): string => {
  const size = 10 ** between(random, 0, 2.3);
  if (some(random, 0.2)) {
    const spread = size * between(random, 0, 0.03);
    return `finish ${size.toFixed(2)}-${(size + spread).toFixed(2)} mm`;
  }
  return some(random, 0.5) ? `${size.toFixed(2)} mm` : `${(size / 25.4).toFixed(3)} in`;
};

/** A line that mostly makes sense; with many wishes, some of which exclude each other. */
const sensible = (random: Random): string => {
  const beside = Array.from({ length: upTo(random, 6) }, () => oneOf(random, BESIDE)(random));
  const parts = [barText(random), oneOf(random, PATTERNS), oneOf(random, PITCHES)(random)];
  return [...parts, ...beside].sort(() => random() - 0.5).join(' ');
};

/** A good line with slips in it: letters lost, doubled, swapped, pasted over, cut off. */
const slipped = (random: Random): string => {
  let line = oneOf(random, GOOD_LINES);
  for (let left = 1 + upTo(random, 3); left > 0; left -= 1) {
    const at = upTo(random, line.length);
    const to = at + upTo(random, 3);
    const slips: readonly (() => string)[] = [
      () => line.slice(0, at) + line.slice(to),
      () => line.slice(0, to) + line.slice(at),
      () => line.slice(0, at) + (line[at + 1] ?? '') + (line[at] ?? '') + line.slice(at + 2),
      () => `${line.slice(0, at)}${anyWord(random)}${line.slice(at)}`,
      () => line.slice(0, at),
      () => line.slice(at),
      () => `${line} ${anyWord(random)}`,
      () => line.toUpperCase(),
      () => line.replaceAll(' ', oneOf(random, ['\u00A0', '', '  ', ', ', '\t'])),
    ];
    line = oneOf(random, slips)();
  }
  return line;
};

const noise = (random: Random): string =>
  Array.from({ length: upTo(random, 30) }, () => oddText(random)).join(
    some(random, 0.5) ? ' ' : '',
  );

const long = (random: Random): string => {
  const one = some(random, 0.5) ? heap(random) : oneOf(random, GOOD_LINES);
  return `${one} `.repeat(1 + upTo(random, 60)).slice(0, upTo(random, 4000));
};

const anyLine = (random: Random): string => {
  const drawn = random();
  if (drawn < 0.45) return sensible(random);
  if (drawn < 0.7) return slipped(random);
  if (drawn < 0.9) return heap(random);
  return drawn < 0.99 ? noise(random) : long(random);
};

/** A row of lines, the same one for the same seed. */
export function* shopLines(seed: number, count: number): Generator<string> {
  const random = mulberry32(seed);
  for (let left = count; left > 0; left -= 1) yield anyLine(random);
}
