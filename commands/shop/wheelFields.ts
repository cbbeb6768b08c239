import type { z } from 'zod';
import { mm, provenPitch, rad } from '../../src/calc/index.ts';
import { said } from '../../src/desk/index.ts';
import type { Wheel, WheelForm, WheelState } from '../../src/shop/index.ts';
import {
  angleOf,
  countOf,
  hardwareOf,
  NO_NAMES,
  type Parameter,
  type Reader,
  readWheel,
  smallLengthOf,
  textOf,
  timesAt,
  vocabularyOf,
  type WheelWords,
} from '../../src/words/index.ts';
import { proven } from '../knurl/checkParameters.ts';
import * as knurl from '../knurl/parameters.ts';
import { recordsOf } from './named.ts';

/** Only the listed words say it. */
const wordsOnly = <T>(parameter: Omit<Parameter<T>, 'read'>) =>
  said<T>({ ...parameter, read: () => null, closed: true });

/** The wheel's own hand, which is the mirror of what it leaves on the work. */
const form = wordsOnly<WheelForm>({
  name: 'form',
  values: [
    ['straight', 'straight'],
    ...['left', 'left hand', 'left-hand', 'left helical', 'left-hand helical', 'lh'].map(
      (phrase) => [phrase, 'leftHelical'] as const,
    ),
    ...['right', 'right hand', 'right-hand', 'right helical', 'right-hand helical', 'rh'].map(
      (phrase) => [phrase, 'rightHelical'] as const,
    ),
    ...['raised', 'one piece raised', 'crossed raised'].map(
      (phrase) => [phrase, 'onePieceRaised'] as const,
    ),
    ...['sunk', 'one piece sunk', 'crossed sunk'].map(
      (phrase) => [phrase, 'onePieceSunk'] as const,
    ),
  ],
  examples: ['straight', 'left', 'one piece sunk'],
});

/** Sizes of wheels; inch and metric ones do not overlap, so a bare size is clear. */
const wheelDiameter = said<number>({
  name: 'wheelDiameter',
  read: hardwareOf('wheelDiameter', [5, 100], { in: [0.2, 4], mm: [5, 100] }),
  keywords: ['ø', 'dia', 'diameter', 'od', 'measured', 'measures'],
  postfix: true,
  examples: ['diameter 19.05 mm', 'diameter 0.75'],
});

const wheelFace = said<number>({
  name: 'wheelFace',
  read: hardwareOf('wheelFace', [1.5, 60], { in: [0.06, 1.49], mm: [1.5, 60] }),
  keywords: ['face', 'width', 'wide'],
  postfix: true,
  examples: ['face 8 mm'],
});

const wheelBore = said<number>({
  name: 'wheelBore',
  read: hardwareOf('wheelBore', [1, 50], { in: [0.04, 0.99], mm: [1, 50] }),
  keywords: ['bore', 'hole'],
  postfix: true,
  examples: ['bore 6 mm'],
});

const wheelTeeth = said<number>({
  name: 'wheelTeeth',
  read: countOf('wheelTeeth', [5, 500], 'teeth'),
  keywords: ['teeth', 'counted'],
  measures: ['teeth'],
  postfix: true,
  examples: ['63 teeth'],
});

const readSizes: Reader<WheelWords> = (cursor) =>
  timesAt(cursor) === null ? null : readWheel(cursor, NO_NAMES);

/** `20x8x6`, which says three at once; names are none of its business. */
const size = said<WheelWords>({
  name: 'wheel',
  read: readSizes,
  free: readSizes,
  keywords: ['size'],
  examples: ['20x8x6'],
});

const wheelHelix = said<number>({
  name: 'helix',
  read: angleOf('helix', [0, Math.PI / 3]),
  keywords: ['helix', 'helix angle'],
  postfix: true,
  examples: ['helix 30'],
});

const toothDepth = said<number>({
  name: 'toothDepth',
  read: smallLengthOf('toothDepth', [0.02, 3]),
  keywords: ['tooth depth', 'depth', 'deep'],
  examples: ['depth 0.5 mm'],
});

const partsRun = said<number>({
  name: 'partsRun',
  read: countOf('partsRun', [0, 100_000_000], 'pieces'),
  keywords: ['parts run', 'parts', 'ran'],
  measures: ['pieces'],
  examples: ['parts 1200'],
});

const state = wordsOnly<WheelState>({
  name: 'state',
  values: [
    ['good', 'good'],
    ['worn', 'worn'],
    ...['damaged', 'chipped', 'broken'].map((phrase) => [phrase, 'damaged'] as const),
    ...['away', 'lent', 'missing'].map((phrase) => [phrase, 'away'] as const),
  ],
  examples: ['worn'],
});

const place = said<string>({
  name: 'place',
  read: textOf(() => vocabularyOf(wheelRecords())),
  keywords: ['place', 'kept in', 'lies in', 'where'],
  text: true,
  examples: ['place "drawer 3"'],
});

export const wheelFields = {
  form,
  pitch: knurl.pitch,
  wheelTeeth,
  wheelDiameter,
  wheel: size,
  wheelFace,
  wheelBore,
  bevel: knurl.bevel,
  edge: knurl.edge,
  angle: knurl.angle,
  helix: wheelHelix,
  toothDepth,
  pin: knurl.pin,
  rim: knurl.rim,
  proven,
  place,
  partsRun,
  state,
};
export const wheelRecords = recordsOf(wheelFields);
export type WheelSaid = z.infer<z.ZodObject<typeof wheelFields>>;

/** What was said of a wheel, and nothing of what was not. */
export const wheelPatch = (said: WheelSaid): Partial<Wheel> => ({
  ...(said.form === undefined ? {} : { form: said.form }),
  ...(said.pitch === undefined ? {} : { pitch: said.pitch }),
  ...(said.rim === undefined ? {} : { alongRim: true }),
  ...(said.proven === undefined
    ? {}
    : { proven: provenPitch(mm(said.proven.diameter), said.proven.teeth) }),
  ...sizePatch(said),
  ...(said.bevel === undefined ? {} : { bevel: mm(said.bevel) }),
  ...(said.angle === undefined ? {} : { included: rad(said.angle) }),
  ...(said.helix === undefined ? {} : { helix: rad(said.helix) }),
  ...(said.toothDepth === undefined ? {} : { toothDepth: mm(said.toothDepth) }),
  ...(said.edge === undefined ? {} : { edge: said.edge }),
  ...pinPatch(said),
  ...(said.place === undefined ? {} : { place: said.place }),
  ...(said.partsRun === undefined ? {} : { partsRun: said.partsRun }),
  ...(said.state === undefined ? {} : { state: said.state }),
});

/** `20x8x6` and each by itself say the same; what stands by itself is the more exact. */
const sizePatch = (said: WheelSaid): Partial<Wheel> => {
  const { wheel } = said;
  const teeth = said.wheelTeeth ?? wheel?.teeth ?? null;
  const diameter = said.wheelDiameter ?? wheel?.diameter ?? null;
  const face = said.wheelFace ?? wheel?.face ?? null;
  const bore = said.wheelBore ?? wheel?.bore ?? null;
  return {
    ...(teeth === null ? {} : { teeth }),
    ...(diameter === null ? {} : { diameter: mm(diameter) }),
    ...(face === null ? {} : { face: mm(face) }),
    ...(bore === null ? {} : { bore: mm(bore) }),
  };
};

const pinPatch = ({ pin }: WheelSaid): Partial<Wheel> => {
  const { diameter = null, material = null } = pin ?? {};
  return {
    ...(diameter === null ? {} : { pinDiameter: mm(diameter) }),
    ...(material === null ? {} : { pinMaterial: material }),
  };
};
