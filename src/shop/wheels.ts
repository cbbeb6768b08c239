import {
  COARSEST_PITCH,
  degrees,
  type Edge,
  FINEST_PITCH,
  labelledPitch,
  type Mm,
  mm,
  type PinMaterial,
  type Pitch,
  type PitchSystem,
  type Rad,
  rad,
} from '../calc/index.ts';
import type { Refusal } from '../refusal.ts';
import type { WheelTable } from '../store/index.ts';
import { cardsUsing } from './cardUses.ts';
import { outside, type Range, rangeFault, wholeFault } from './limits.ts';
import { cleaned, LONGEST_NAME, textFault } from './names.ts';
import type { Register } from './register.ts';

/** How the teeth of a wheel run; a crossed one-piece wheel also has points of its own. */
export const WHEEL_FORMS = [
  'straight',
  'leftHelical',
  'rightHelical',
  'onePieceRaised',
  'onePieceSunk',
] as const;
export type WheelForm = (typeof WHEEL_FORMS)[number];

/** What can be said of a wheel before a job: away is lent or out for regrinding. */
export const WHEEL_STATES = ['good', 'worn', 'damaged', 'away'] as const;
export type WheelState = (typeof WHEEL_STATES)[number];

export const EDGES = ['bevelled', 'square', 'convex'] as const satisfies readonly Edge[];
export const PIN_MATERIALS = ['hardened', 'carbide'] as const satisfies readonly PinMaterial[];

/** A wheel of the crib. Null: nobody has said. */
export type Wheel = {
  readonly name: string;
  readonly form: WheelForm;
  /** The label. */
  readonly pitch: Pitch | null;
  /** The label's pitch is meant along the rim. */
  readonly alongRim: boolean;
  /** Pitch round the rim that a diameter and its count have proven. */
  readonly proven: Mm | null;
  /** Counted … */
  readonly teeth: number | null;
  /** … and measured over the teeth. */
  readonly diameter: Mm | null;
  readonly face: Mm | null;
  readonly bore: Mm | null;
  readonly bevel: Mm | null;
  readonly included: Rad | null;
  readonly helix: Rad | null;
  readonly toothDepth: Mm | null;
  readonly edge: Edge | null;
  readonly pinDiameter: Mm | null;
  readonly pinMaterial: PinMaterial | null;
  /** Where it lies. */
  readonly place: string | null;
  readonly partsRun: number;
  readonly state: WheelState;
};

/** A wheel of which only its name, form and pitch are known. */
export const BARE_WHEEL: Omit<Wheel, 'name' | 'form'> = {
  pitch: null,
  alongRim: false,
  proven: null,
  teeth: null,
  diameter: null,
  face: null,
  bore: null,
  bevel: null,
  included: null,
  helix: null,
  toothDepth: null,
  edge: null,
  pinDiameter: null,
  pinMaterial: null,
  place: null,
  partsRun: 0,
  state: 'good',
};

/**
 * What a wheel's sizes may be. Judgement: wide enough for every wheel a shop buys, narrow enough
 * that inches taken for millimetres, or the other way round, nearly always fall outside.
 */
export const WHEEL_RANGES = {
  teeth: [5, 500, 'teeth'],
  diameter: [5, 100, 'mm'],
  face: [1.5, 60, 'mm'],
  bore: [1, 50, 'mm'],
  bevel: [0, 20, 'mm'],
  included: [degrees(60), degrees(120), 'rad'],
  helix: [0, degrees(60), 'rad'],
  toothDepth: [0.02, 3, 'mm'],
  pinDiameter: [1, 50, 'mm'],
  partsRun: [0, 100_000_000, 'parts'],
  proven: [FINEST_PITCH, COARSEST_PITCH * 2, 'mm'],
} as const satisfies Record<string, Range>;

const fault = (wheel: Wheel): Refusal | null =>
  rangeFault(WHEEL_RANGES, wheel) ??
  wholeFault('teeth', wheel.teeth, WHEEL_RANGES.teeth) ??
  wholeFault('partsRun', wheel.partsRun, WHEEL_RANGES.partsRun) ??
  pitchFault(wheel) ??
  fitFault(wheel) ??
  (wheel.place === null ? null : textFault('place', cleaned(wheel.place), LONGEST_NAME));

/** Something must say how fine it is: the label, or the count with the diameter. */
const pitchFault = ({ pitch, teeth, diameter, proven }: Wheel): Refusal | null => {
  if (pitch !== null) {
    if (!(pitch.value > 0)) return { code: 'missing', parameter: 'pitch', examples: ['21 tpi'] };
    return outside('pitch', labelledPitch(pitch), [FINEST_PITCH, COARSEST_PITCH, 'mm']);
  }
  if (proven !== null) return null;
  if (teeth === null && diameter === null) {
    const examples = ['21 tpi', '0.8 mm', '96 dp', '63 teeth, 20 mm'];
    return { code: 'missing', parameter: 'pitch', examples };
  }
  if (teeth === null) return { code: 'missing', parameter: 'teeth', examples: ['63 teeth'] };
  if (diameter === null) return { code: 'missing', parameter: 'diameter', examples: ['20 mm'] };
  const rim = (Math.PI * diameter) / teeth;
  return outside('pitch', rim, [FINEST_PITCH, COARSEST_PITCH * 2, 'mm']);
};

/** The bore lies inside the wheel, the pin in the bore, and some face is left between the bevels. */
const fitFault = ({ diameter, bore, face, bevel, pinDiameter }: Wheel): Refusal | null => {
  const largestBore = diameter === null ? null : diameter * 0.8;
  if (largestBore !== null && bore !== null && bore > largestBore) {
    return { code: 'outOfRange', what: 'bore', value: bore, min: 1, max: largestBore, unit: 'mm' };
  }
  if (bore !== null && pinDiameter !== null && pinDiameter > bore) {
    const range = { min: 1, max: bore, unit: 'mm' };
    return { code: 'outOfRange', what: 'pinDiameter', value: pinDiameter, ...range };
  }
  if (face !== null && bevel !== null && bevel > face * 0.45) {
    return {
      code: 'outOfRange',
      what: 'bevel',
      value: bevel,
      min: 0,
      max: face * 0.45,
      unit: 'mm',
    };
  }
  return null;
};

export const WHEELS: Register<'wheel', Wheel> = {
  subject: 'wheel',
  fault,
  uses: (view, id, most) => cardsUsing(view, 'wheel', id, most),
  toRow: (wheel) => ({
    kind: wheel.form,
    pitch_system: wheel.pitch?.system ?? null,
    pitch_value: wheel.pitch?.value ?? null,
    along_rim: wheel.alongRim ? 1 : 0,
    proven: wheel.proven,
    teeth: wheel.teeth,
    diameter: wheel.diameter,
    face: wheel.face,
    bore: wheel.bore,
    bevel: wheel.bevel,
    included: wheel.included,
    helix: wheel.helix,
    tooth_depth: wheel.toothDepth,
    edge: wheel.edge,
    pin_diameter: wheel.pinDiameter,
    pin_material: wheel.pinMaterial,
    place: wheel.place === null ? null : cleaned(wheel.place),
    parts_run: wheel.partsRun,
    state: wheel.state,
  }),
  fromRow: (row) => ({
    name: row.name,
    form: oneOf(WHEEL_FORMS, row.kind) ?? 'straight',
    pitch: pitchOf(row),
    alongRim: row.along_rim === 1,
    proven: length(row.proven),
    teeth: row.teeth,
    diameter: length(row.diameter),
    face: length(row.face),
    bore: length(row.bore),
    bevel: length(row.bevel),
    included: angle(row.included),
    helix: angle(row.helix),
    toothDepth: length(row.tooth_depth),
    edge: oneOf(EDGES, row.edge),
    pinDiameter: length(row.pin_diameter),
    pinMaterial: oneOf(PIN_MATERIALS, row.pin_material),
    place: row.place,
    partsRun: row.parts_run,
    state: oneOf(WHEEL_STATES, row.state) ?? 'good',
  }),
};

const PITCH_SYSTEMS = ['metric', 'tpi', 'dp', 'module'] as const satisfies readonly PitchSystem[];

const pitchOf = (row: WheelTable): Pitch | null => {
  const system = oneOf(PITCH_SYSTEMS, row.pitch_system);
  return system === null || row.pitch_value === null ? null : { system, value: row.pitch_value };
};

const length = (value: number | null): Mm | null => (value === null ? null : mm(value));
const angle = (value: number | null): Rad | null => (value === null ? null : rad(value));

const oneOf = <T extends string>(known: readonly T[], kept: string | null): T | null =>
  known.find((word) => word === kept) ?? null;
