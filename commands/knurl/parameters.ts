import type { Edge, PatternKind, Process, Support, ToolLayout } from '../../src/calc/index.ts';
import {
  degrees,
  FEWEST_TURNS,
  feetPerMinute,
  type KnurlClass,
  LARGEST_DIAMETER,
  MM_PER_INCH,
} from '../../src/calc/index.ts';
import { said } from '../../src/desk/index.ts';
import {
  angleOf,
  countOf,
  freeCallout,
  freeMaterial,
  freePitch,
  hardwareOf,
  lengthOf,
  limitsOf,
  nameOf,
  narrowed,
  numberOfKind,
  onePin,
  oneWheel,
  type Parameter,
  pinFirst,
  pitchesOf,
  quantityAt,
  rateOf,
  readHardness,
  readPin,
  readPitch,
  readWheel,
  type ShopUnits,
  samePitch,
  shareOf,
  smallLengthOf,
  unannouncedLimits,
  wheelFirst,
} from '../../src/words/index.ts';

/** Only the listed words say it. */
const wordsOnly = <T>(parameter: Omit<Parameter<T>, 'read'>) =>
  said<T>({ ...parameter, read: () => null, closed: true });

/** Smallest bar that is answered. Judgement. */
const SMALLEST_DIAMETER = 1;
const DIAMETERS = [SMALLEST_DIAMETER, LARGEST_DIAMETER] as const;
const USUAL_DIAMETERS = { in: [0.06, 8], mm: [2, 200] } as const;

export const diameter = said<number>({
  name: 'diameter',
  read: lengthOf('diameter', DIAMETERS, USUAL_DIAMETERS, ['mm', 'in', 'thou']),
  keywords: ['ø', 'dia', 'diam', 'diameter', 'bar', 'stock', 'd'],
  postfix: true,
  loose: true,
  measures: ['length'],
  bare: true,
  examples: ['1.000', '7/8', '19mm'],
  metricExamples: ['20', '25.4', '3/4 in'],
});

export const pattern = wordsOnly<PatternKind>({
  name: 'pattern',
  values: [
    ['straight', 'straight'],
    ['str', 'straight'],
    ['axial', 'straight'],
    ['parallel', 'straight'],
    ['diagonal', 'diagonal'],
    ['diag', 'diagonal'],
    ['helical', 'diagonal'],
    ['spiral', 'diagonal'],
    ['diamond', 'diamond'],
    ['diamonds', 'diamond'],
    ['crosshatch', 'diamond'],
    ['cross-hatch', 'diamond'],
    ['criss-cross', 'diamond'],
    ['square', 'square'],
    ['square pattern', 'square'],
    ['squares', 'square'],
  ],
  examples: ['straight', 'diamond', 'diagonal left', 'square'],
});

export const points = wordsOnly<'raised' | 'sunk'>({
  name: 'points',
  values: [
    ...['raised', 'raised points', 'points raised', 'male'].map(
      (phrase) => [phrase, 'raised'] as const,
    ),
    ...['sunk', 'sunken', 'indented', 'sunk points', 'points sunk', 'female', 'depressed'].map(
      (phrase) => [phrase, 'sunk'] as const,
    ),
  ],
  examples: ['raised', 'sunk'],
});

export const hand = wordsOnly<'left' | 'right'>({
  name: 'hand',
  values: ['left', 'right'].flatMap((side) => {
    const own = side === 'left' ? 'left' : 'right';
    return [side, `${side}-hand`, `${side}-handed`, own === 'left' ? 'lh' : 'rh'].map(
      (phrase) => [phrase, own] as const,
    );
  }),
  examples: ['left', 'right'],
});

export const pitch = said({
  name: 'pitch',
  read: readPitch,
  free: freePitch,
  keywords: ['pitch'],
  measures: ['tpi', 'dp', 'module'],
  mayBe: pitchesOf,
  merge: samePitch,
  examples: ['21tpi', '96dp', '1.0 pitch'],
  metricExamples: ['1.0 pitch', '0.8 pitch', 'm0.3'],
});

export const rim = wordsOnly<true>({
  name: 'rim',
  values: [
    ['rim', true],
    ['along the rim', true],
    ['on the rim', true],
  ],
  examples: ['rim'],
});

export const material = said({
  name: 'material',
  read: freeMaterial,
  free: freeMaterial,
  merge: narrowed,
  suggests: 'materials',
  examples: ['1018', '304', '6061', 'brass'],
});

export const process = wordsOnly<Process>({
  name: 'process',
  values: [
    ['form', 'form'],
    ['formed', 'form'],
    ['forming', 'form'],
    ['roll', 'form'],
    ['rolled', 'form'],
    ['cut', 'cut'],
    ['cutting', 'cut'],
  ],
  examples: ['form', 'cut'],
});

const readFinish = limitsOf('finish', DIAMETERS, USUAL_DIAMETERS);

export const finish = said({
  name: 'finish',
  read: readFinish,
  keywords: ['finish', 'finished', 'print', 'finish size', 'finished size'],
  unannounced: unannouncedLimits(['finish', 'finished'], readFinish),
  examples: ['finish 0.995-1.005', 'finish 1.000 +0 -0.010'],
  metricExamples: ['finish 19.9-20.1', 'finish 20 +0 -0.2'],
});

export const asIs = wordsOnly<true>({
  name: 'asIs',
  values: [
    ['as-is', true],
    ['as is', true],
    ['asis', true],
    ['leave it', true],
  ],
  examples: ['as-is'],
});

export const teeth = said<number>({
  name: 'teeth',
  read: countOf('teeth', [3, 10_000], 'teeth'),
  keywords: ['teeth'],
  measures: ['teeth'],
  examples: ['64 teeth'],
});

export const knurlClass = wordsOnly<KnurlClass>({
  name: 'class',
  values: (
    [
      ['I', ['i', '1']],
      ['II', ['ii', '2']],
      ['III', ['iii', '3']],
    ] as const
  ).flatMap(([own, spellings]) =>
    spellings.flatMap((spelling) =>
      [`class ${spelling}`, `cl ${spelling}`].map((phrase) => [phrase, own] as const),
    ),
  ),
  examples: ['class I', 'class II'],
});

export const helix = said<number>({
  name: 'helix',
  read: angleOf('helix', [degrees(5), degrees(60)]),
  keywords: ['helix', 'helix angle'],
  postfix: true,
  examples: ['helix 45'],
});

export const tilt = said<number>({
  name: 'tilt',
  read: angleOf('tilt', [degrees(1), degrees(60)]),
  keywords: ['tilt', 'tilted', 'set over', 'swivel', 'swivelled', 'swiveled'],
  postfix: true,
  examples: ['tilt 30'],
});

export const angle = said<number>({
  name: 'angle',
  read: angleOf('angle', [degrees(60), degrees(120)]),
  keywords: ['angle', 'tooth angle', 'included', 'included angle'],
  postfix: true,
  examples: ['angle 80'],
});

export const fill = said<number>({
  name: 'fill',
  read: shareOf('fill', [0.1, 1]),
  keywords: ['fill'],
  postfix: true,
  measures: ['share'],
  examples: ['fill 85%'],
});

export const length = said<number>({
  name: 'length',
  read: lengthOf('length', [0.2, 2000], { in: [0.02, 12], mm: [0.8, 300] }),
  keywords: ['long', 'length', 'knurl length', 'lg', 'l'],
  postfix: true,
  examples: ['long 1.5'],
  metricExamples: ['long 30'],
});

export const stickout = said<number>({
  name: 'stickout',
  read: lengthOf('stickout', [1, 3000], { in: [0.1, 40], mm: [3, 1000] }),
  keywords: ['out', 'stickout', 'stick out', 'sticking out', 'overhang'],
  postfix: true,
  examples: ['out 3'],
  metricExamples: ['out 60'],
});

export const stockLength = said<number>({
  name: 'stockLength',
  read: lengthOf('stockLength', [10, 12_000], { in: [1, 240], mm: [25, 6100] }),
  keywords: ['bar length', 'stock length'],
  examples: ['bar length 36'],
  metricExamples: ['bar length 1000'],
});

export const support = wordsOnly<Support>({
  name: 'support',
  values: [
    ['chuck', 'chuck'],
    ['chucked', 'chuck'],
    ['in the chuck', 'chuck'],
    ['collet', 'chuck'],
    ['tailstock', 'tailstock'],
    ['tail stock', 'tailstock'],
    ['live center', 'tailstock'],
    ['live centre', 'tailstock'],
    ['centers', 'centres'],
    ['centres', 'centres'],
    ['between centers', 'centres'],
    ['between centres', 'centres'],
  ],
  examples: ['tailstock', 'centers', 'chuck'],
});

export const bore = said<number>({
  name: 'bore',
  read: lengthOf('bore', [0.2, LARGEST_DIAMETER], { in: [0.01, 8], mm: [0.5, 200] }),
  keywords: ['bore', 'id', 'bored'],
  postfix: true,
  examples: ['bore 0.75'],
  metricExamples: ['bore 16'],
});

export const plug = wordsOnly<true>({
  name: 'plug',
  values: [
    ['plug', true],
    ['plugged', true],
  ],
  examples: ['plug'],
});

export const wheel = said({
  name: 'wheel',
  read: readWheel,
  unannounced: wheelFirst,
  keywords: ['wheel', 'wheels'],
  loose: true,
  merge: oneWheel,
  suggests: 'wheels',
  examples: ['wheel 20x8x6', 'wheel 20mm 63 teeth'],
});

const BEVEL = [0, 5] as const;
const BEVEL_SIZES = { in: [0, 0.19], mm: [0.2, 5] } as const;

export const bevel = said<number>({
  name: 'bevel',
  read: hardwareOf('bevel', BEVEL, BEVEL_SIZES),
  keywords: ['bevel', 'bevels'],
  postfix: true,
  examples: ['bevel 1'],
});

export const edge = wordsOnly<Edge>({
  name: 'edge',
  values: [
    ...['beveled', 'bevelled', 'bevel edge', 'beveled edge', 'bevelled edge'].flatMap((phrase) =>
      [phrase, `${phrase}s`].map((each) => [each, 'bevelled'] as const),
    ),
    ...['square edge', 'square edges', 'square edged'].map((phrase) => [phrase, 'square'] as const),
    ...['convex', 'convex edge', 'convex edges'].map((phrase) => [phrase, 'convex'] as const),
  ],
  examples: ['beveled', 'square edge', 'convex'],
});

export const pin = said({
  name: 'pin',
  read: readPin,
  unannounced: pinFirst,
  keywords: ['pin', 'pins'],
  values: [
    ['carbide', { diameter: null, material: 'carbide' }],
    ['carbide pin', { diameter: null, material: 'carbide' }],
    ['carbide pins', { diameter: null, material: 'carbide' }],
    ['hardened pin', { diameter: null, material: 'hardened' }],
    ['hardened pins', { diameter: null, material: 'hardened' }],
  ],
  merge: onePin,
  examples: ['pin 6mm carbide'],
});

export const onePiece = wordsOnly<boolean>({
  name: 'oneWheel',
  values: [
    ...['one wheel', '1 wheel', 'single wheel', 'crossed wheel', 'one-piece wheel'].map(
      (phrase) => [phrase, true] as const,
    ),
    ...['two wheels', '2 wheels', 'pair of wheels', 'wheel pair'].map(
      (phrase) => [phrase, false] as const,
    ),
  ],
  examples: ['one wheel'],
});

export const layout = wordsOnly<ToolLayout>({
  name: 'layout',
  values: [
    ['one-sided', 'oneSided'],
    ['onesided', 'oneSided'],
    ['single-sided', 'oneSided'],
    ['opposed', 'opposed'],
    ['straddle', 'opposed'],
    ['scissor', 'opposed'],
    ['scissors', 'opposed'],
  ],
  examples: ['opposed', 'one-sided'],
});

export const hardness = said({
  name: 'hardness',
  read: readHardness,
  free: readHardness,
  measures: ['hb', 'hrc'],
  examples: ['HB 210', '28 HRC'],
});

const readSurfaceSpeed = rateOf('speed', [0.5, 300], 'speed', feetPerMinute(1));
const readRotation = numberOfKind('rotation', [1, 20_000], 'rotation', 'rev/min');

export const speed = said<number>({
  name: 'speed',
  // `speed 200 rpm` is a spindle speed.
  read: (cursor, names) =>
    quantityAt(cursor)?.unit?.measure === 'rotation' ? null : readSurfaceSpeed(cursor, names),
  keywords: ['speed', 'surface speed', 'cutting speed', 'sfm', 'vc'],
  measures: ['speed'],
  examples: ['speed 60 sfm', 'speed 18 m/min'],
  metricExamples: ['speed 18 m/min', 'speed 60 sfm'],
});

export const rotation = said<number>({
  name: 'rotation',
  read: readRotation,
  keywords: ['rpm', 'speed', 'spindle', 'spindle speed', 'n'],
  measures: ['rotation'],
  examples: ['200 rpm'],
});

export const feed = said<number>({
  name: 'feed',
  read: rateOf('feed', [0.01, 2], 'feed', MM_PER_INCH),
  keywords: ['feed', 'feed rate', 'feedrate', 'f'],
  postfix: true,
  measures: ['feed'],
  examples: ['feed 0.012'],
  metricExamples: ['feed 0.3'],
});

export const turns = said<number>({
  name: 'turns',
  read: countOf('turns', [FEWEST_TURNS, 500], 'turns'),
  keywords: ['turns'],
  measures: ['turns'],
  examples: ['turns 18'],
});

export const batch = said<number>({
  name: 'batch',
  read: countOf('batch', [1, 1_000_000], 'pieces'),
  keywords: ['batch', 'qty', 'quantity'],
  postfix: true,
  measures: ['pieces'],
  examples: ['batch 50'],
});

export const runout = said<number>({
  name: 'runout',
  read: smallLengthOf('runout', [0, 5], { in: [0, 0.05], mm: [0, 1] }),
  keywords: ['runout', 'run-out', 'tir'],
  postfix: true,
  examples: ['runout 0.004'],
  metricExamples: ['runout 0.1'],
});

export const machine = said<string>({
  name: 'machine',
  read: nameOf('machine', (names) => names.machines),
  keywords: ['on', 'machine'],
  // `on a 1.0 bar` names no machine.
  loose: true,
  suggests: 'machines',
  examples: ['on <machine>'],
});

export const shown = wordsOnly<ShopUnits>({
  name: 'units',
  values: [
    ['show mm', 'mm'],
    ['show metric', 'mm'],
    ['show in', 'in'],
    ['show inch', 'in'],
    ['show inches', 'in'],
  ],
  examples: ['show mm'],
});

export const callout = said({
  name: 'callout',
  read: freeCallout,
  free: freeCallout,
  examples: ['RGE 0.8', 'DIN 82 RAA 1'],
});
