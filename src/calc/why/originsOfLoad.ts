import type { SetupFigureName } from '../setup/index.ts';
import type { Given, Origins, Through, Worked } from './origin.ts';

const CUT_CHIP = 'A = f·r(H);  Ft = kc·A';
const CUT_GIVEN = { kc: 'chipStiffness', r: 'voidOfForm' } as const;

const BAND: Origins = [{ by: 'forceBand', inputs: { F: 'radialForce' } }];

type Ground = {
  readonly through: { readonly q: Through };
  readonly given: Readonly<Record<string, Given>>;
};
const METAL: Ground = {
  through: { q: 'metalPressure' },
  given: { HB: 'hardness', n: 'hardening' },
};
const PLASTIC: Ground = { through: { q: 'plasticPressure' }, given: { Re: 'yieldOfMaterial' } };

const travelling = ({ through, given }: Ground): Worked => ({
  by: 'traverseForce',
  inputs: { x: 'fill', z: 'infeed', f: 'feed', Dp: 'blankDiameter' },
  through: {
    ...through,
    φ̄: 'meanWedgeShare',
    p̄: ['trailingForce', 'p̄ = 0.5 q φ(x)'],
    φ: 'wedgeShare',
    b_e: 'hertzHalfWidth',
    'E*': 'contactModulus',
    Req: 'equivalentRadius',
    b: 'contactWidth',
  },
  given: { ...given, E: 'modulus', Dw: 'wheelDiameter', face: 'wheelFace', bevel: 'bevel' },
});

const plunging = ({ through, given }: Ground): Worked => ({
  by: 'plungeForce',
  inputs: { x: 'fill', z1: 'firstBite', dz: 'infeedPerTurn', Dp: 'blankDiameter' },
  through: { ...through, φ: 'wedgeShare', Req: 'equivalentRadius' },
  given: { ...given, w: 'pressedWidth', Dw: 'wheelDiameter' },
});

const FORCE_ORIGINS = {
  radialForce: [
    {
      when: ['cut'],
      by: 'cutKnurl',
      parts: [`${CUT_CHIP};  Fr = 0.5 Ft`],
      inputs: { f: 'feed', H: 'toothHeight' },
      given: CUT_GIVEN,
    },
    { ...travelling(PLASTIC), when: ['traverse', 'plastic'] },
    { ...travelling(METAL), when: ['traverse'] },
    { ...plunging(PLASTIC), when: ['plastic'] },
    plunging(METAL),
  ],
  radialForceLow: BAND,
  radialForceHigh: BAND,
  torque: [
    {
      when: ['cut'],
      by: 'cutTorque',
      inputs: { D: 'blankDiameter', f: 'feed', H: 'toothHeight' },
      through: { Ft: ['cutKnurl', CUT_CHIP] },
      given: CUT_GIVEN,
    },
    {
      by: 'wheelTorque',
      inputs: { F: 'radialForce', Dp: 'blankDiameter' },
      through: { L: 'contactArc', Req: 'equivalentRadius' },
      given: { Dw: 'wheelDiameter', dz: 'hardestTurn' },
      remark: 'timesWheels',
    },
  ],
  power: [{ by: 'drivePower', inputs: { T: 'torque', n: 'spindleSpeed' } }],
} as const satisfies Partial<Record<SetupFigureName, Origins>>;

const BAR = {
  inputs: { F: 'radialForce', D: 'blankDiameter' },
  remark: 'sideForce',
} as const satisfies Partial<Worked>;
const BAR_GIVEN = { a: 'reach', E: 'modulus', d: 'bore' } as const;
const HELD_TWICE = { ...BAR_GIVEN, L: 'span' } as const;
const MOMENT_GIVEN = { a: 'reach', d: 'bore' } as const;

const RING = {
  inputs: { F: 'radialForce' },
  through: { b: 'ringWidth' },
  given: { R: 'meanRadius', t: 'wall', w: 'pressedWidth' },
  remark: 'sideForce',
} as const satisfies Partial<Worked>;

const stressed = (moment: Through, given: Readonly<Record<string, Given>>): Worked => ({
  by: 'bentWork',
  parts: ['stress M/W'],
  ...BAR,
  through: { M: moment, W: 'sectionModulus', I: 'secondMoment' },
  given,
});

const WORK_ORIGINS = {
  deflection: [
    {
      when: ['tailstock'],
      by: 'bentByTailstock',
      parts: ['δ = F a³ b² (3a + 4b)/(12 E I L³);  b = L − a'],
      ...BAR,
      through: { I: 'secondMoment' },
      given: HELD_TWICE,
    },
    {
      when: ['centres'],
      by: 'bentBetweenCentres',
      ...BAR,
      through: { I: 'secondMoment' },
      given: HELD_TWICE,
    },
    {
      by: 'bentInChuck',
      parts: ['δ = F a³/(3 E I)'],
      ...BAR,
      through: { I: 'secondMoment' },
      given: BAR_GIVEN,
    },
  ],
  bendingStress: [
    {
      ...stressed(['bentByTailstock', 'M = max(F a b (L + b)/(2L²), F a² b (3L − a)/(2L³))'], {
        ...MOMENT_GIVEN,
        L: 'span',
      }),
      when: ['tailstock'],
    },
    {
      ...stressed(['bentBetweenCentres', 'M = F a b/L;  b = L − a'], {
        ...MOMENT_GIVEN,
        L: 'span',
      }),
      when: ['centres'],
    },
    stressed(['bentInChuck', 'M = F a'], MOMENT_GIVEN),
  ],
  ringStress: [
    {
      by: 'pinchedRing',
      parts: [
        'M under the force F R/π, a quarter turn away (1/2 − 1/π) F R',
        'σ = 6 M/(b t²), a quarter turn away + F/(2 b t)',
      ],
      ...RING,
    },
  ],
  ringClosing: [
    {
      by: 'pinchedRing',
      parts: ['closing (π/4 − 2/π) F R³/(E I)', 'I = b t³/12'],
      ...RING,
      given: { ...RING.given, E: 'modulus' },
    },
  ],
} as const satisfies Partial<Record<SetupFigureName, Origins>>;

const PIN_ORIGINS = {
  pinHeatIndex: [
    {
      by: 'pinHeatIndex',
      inputs: { P: 'pinPressure', n_w: 'wheelSpeed' },
      through: { v: 'pinSliding', '1.524': 'ordinaryPinHeat' },
      given: { μ: 'pinFriction', d: 'pinDiameter' },
    },
  ],
  pinPressure: [
    {
      by: 'pinBearing',
      inputs: { F: 'radialForce' },
      given: { d: 'pinDiameter', w: 'wheelFace' },
    },
  ],
  wheelSpeed: [
    {
      by: 'wheelRotation',
      inputs: { n: 'spindleSpeed', D: 'blankDiameter' },
      given: { Dw: 'wheelDiameter' },
    },
  ],
  wheelWarmUp: [
    {
      by: 'wheelWarmUp',
      inputs: { t: 'time', F: 'radialForce', n_w: 'wheelSpeed' },
      through: { Q: 'pinHeat', v: 'pinSliding' },
      given: { Dw: 'wheelDiameter', d: 'pinDiameter', w: 'wheelFace' },
      remark: 'timeOfOnePart',
    },
  ],
} as const satisfies Partial<Record<SetupFigureName, Origins>>;

/** How force, torque, bending, pinching and the load of the pin come about. */
export const LOAD_ORIGINS = { ...FORCE_ORIGINS, ...WORK_ORIGINS, ...PIN_ORIGINS } as const;
