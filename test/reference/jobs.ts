/**
 * Jobs as shops run them, with support and stickout, and what a machinist would say of each. The
 * jobs are invented; the arguments are common practice and plain strength of materials, and no
 * measured force stands behind them.
 */
import type { CheckName, State } from '../../src/calc/check.ts';
import { type Material, materialById } from '../../src/calc/materials/index.ts';
import type { SetupRequest } from '../../src/calc/setup/index.ts';
import { inch, mm, mPerMin, watt } from '../../src/calc/units.ts';

export type Job = {
  readonly job: string;
  readonly said: Partial<SetupRequest>;
  readonly verdict: Partial<Record<CheckName, State>>;
  readonly because: string;
};

const of = (id: string): { readonly material: Material } => ({ material: materialById(id)! });
const tpi = (value: number) => ({ pitch: { system: 'tpi', value } as const });
const pitch = (value: number) => ({ pitch: { system: 'metric', value } as const });
const diamond = { pattern: { kind: 'diamond', points: 'raised' } as const };
const opposed = { layout: 'opposed' } as const;
const unlimited = { speeds: null, feeds: null, topSpeed: null, torque: null };

export const ORDINARY: readonly Job[] = [
  {
    job: '1 in 1018, straight, plunged 1.5 in out',
    said: { stickout: inch(1.5) },
    verdict: { bending: 'fine', pinHeat: 'fine', pinPressure: 'fine', stickout: 'fine' },
    because: 'a stout bar held short: the first job anybody knurls',
  },
  {
    job: '1 in 1018, diamond, plunged 2 in out',
    said: { ...diamond, stickout: inch(2) },
    verdict: { bending: 'fine', pinHeat: 'fine', stickout: 'fine' },
    because: 'two wheels share what one straight wheel presses, on the same stout bar',
  },
  {
    job: '1 in 1018, diamond, 1.5 in long, 2 in out',
    said: { ...diamond, length: inch(1.5), stickout: inch(2) },
    verdict: { bending: 'fine', width: 'watch' },
    because: 'travelling takes far less force than plunging; longer than thick is only watched',
  },
  {
    job: '3/4 in 12L14 handle, diamond, 1 in long, 1.25 in out',
    said: {
      ...diamond,
      ...of('steel-free-Pb'),
      stock: inch(0.75),
      length: inch(1),
      stickout: inch(1.25),
    },
    verdict: { bending: 'fine' },
    because: 'under two diameters out and yield over 400 MPa',
  },
  {
    job: '5/8 in brass thumb nut, fine straight, 0.5 in out',
    said: { ...of('brass360'), ...tpi(33), stock: inch(0.625), stickout: inch(0.5) },
    verdict: { bending: 'fine', pinHeat: 'fine' },
    because: 'hardly out of the jaws',
  },
  {
    job: '5/8 in brass knob, diamond, 0.75 in long, 1 in out',
    said: {
      ...diamond,
      ...of('brass360'),
      stock: inch(0.625),
      length: inch(0.75),
      stickout: inch(1),
    },
    verdict: { bending: 'fine' },
    because: 'a diameter and a half out, and the wheels travel',
  },
  {
    job: '3/4 in 6061 knob, fine diamond, 1 in out',
    said: { ...diamond, ...of('al6061-T6'), ...tpi(33), stock: inch(0.75), stickout: inch(1) },
    verdict: { bending: 'fine' },
    because: 'soft metal, short and thick',
  },
  {
    job: '1 in 304, fine diamond, 0.75 in long, 1.25 in out',
    said: {
      ...diamond,
      ...of('ss304'),
      ...tpi(33),
      length: inch(0.75),
      stickout: inch(1.25),
    },
    verdict: { bending: 'fine', pinHeat: 'fine' },
    because: 'it hardens under the wheel, but the bar is thick and the wheels travel',
  },
  {
    job: '1.5 in 4140, coarse diamond, 4 in long, tailstock',
    said: {
      ...diamond,
      ...of('steel-CrMo-ann'),
      ...tpi(14),
      stock: inch(1.5),
      length: inch(4),
      stickout: inch(5),
      support: 'tailstock',
    },
    verdict: { bending: 'fine', stickout: 'fine' },
    because: 'both ends held and thick; over three diameters, but not hanging free',
  },
  {
    job: '50 mm 1045 shaft between centres, diamond 1.2, 80 long',
    said: {
      ...diamond,
      ...of('steel-medC-CD'),
      ...pitch(1.2),
      stock: mm(50),
      length: mm(80),
      stickout: mm(300),
      support: 'centres',
    },
    verdict: { bending: 'fine', stickout: 'fine' },
    because: 'six diameters between centres are stiff against two small travelling wheels',
  },
  {
    job: '3/8 in 1018 pin, fine straight, 3/16 in wide, 0.5 in out',
    said: { ...tpi(33), stock: inch(0.375), length: inch(3 / 16), stickout: inch(0.5) },
    verdict: { bending: 'fine' },
    because: 'slim, but the band is narrow and right at the jaws',
  },
  {
    job: '1/2 in 1018, straight, plunged 1 in out',
    said: { stock: inch(0.5), stickout: inch(1) },
    verdict: { bending: 'watch' },
    because: 'it is done every day, and now and then a bar comes out bent',
  },
  {
    job: '20 mm 1045, straight 1.0, 10 long, 25 out',
    said: {
      ...of('steel-medC-CD'),
      ...pitch(1),
      stock: mm(20),
      length: mm(10),
      stickout: mm(25),
    },
    verdict: { bending: 'fine' },
    because: 'just over one diameter out',
  },
  {
    job: '12 mm brass, diamond 0.8, 15 long, opposed, 40 out',
    said: {
      ...diamond,
      ...opposed,
      ...of('brass360'),
      ...pitch(0.8),
      stock: mm(12),
      length: mm(15),
      stickout: mm(40),
    },
    verdict: { bending: 'fine', stickout: 'fine' },
    because: 'opposed wheels push the bar nowhere',
  },
  {
    job: '6 mm 1018 pin, straight 0.6, 4 wide, opposed, 12 out',
    said: { ...opposed, ...pitch(0.6), stock: mm(6), length: mm(4), stickout: mm(12) },
    verdict: { bending: 'fine' },
    because: 'what a straddle tool is bought for',
  },
  {
    job: '6 mm 303 pin, straight 0.5, cut, 10 long, 15 out',
    said: {
      ...of('ss303'),
      ...pitch(0.5),
      stock: mm(6),
      length: mm(10),
      stickout: mm(15),
      process: 'cut',
    },
    verdict: { bending: 'fine', pinHeat: 'fine' },
    because: 'a cut takes a small part of the force, which is why slender stainless pins are cut',
  },
  {
    job: '30 mm 6061 sleeve, bore 16, straight 1.0, 30 out',
    said: {
      ...of('al6061-T6'),
      ...pitch(1),
      stock: mm(30),
      bore: mm(16),
      stickout: mm(30),
    },
    verdict: { ring: 'fine', bending: 'fine' },
    because: 'a wall of 7 mm is a bar with a hole, not a tube',
  },
  {
    job: '40 mm 1018 tube, bore 34, diamond 1.0, on a plug',
    said: {
      ...diamond,
      ...pitch(1),
      stock: mm(40),
      bore: mm(34),
      plug: true,
      stickout: mm(40),
    },
    verdict: { ring: 'fine', bending: 'fine' },
    because: 'the plug carries the wall',
  },
  {
    job: '40 mm 1018 tube, bore 34, diamond 1.0, cut',
    said: {
      ...diamond,
      ...pitch(1),
      stock: mm(40),
      bore: mm(34),
      process: 'cut',
      length: mm(20),
      stickout: mm(40),
    },
    verdict: { ring: 'fine' },
    because: 'cut knurls suit thin walls',
  },
  {
    job: '25 mm acetal grip, cut, 20 long, 30 out',
    said: { ...of('pom'), ...pitch(1), stock: mm(25), length: mm(20), stickout: mm(30) },
    verdict: { bending: 'fine', pinHeat: 'fine' },
    because: 'soft as butter to the wheel, and stiff enough at one diameter out',
  },
  {
    job: '8 in 1018 handwheel, coarse straight, 2 in out',
    said: { ...tpi(14), stock: inch(8), stickout: inch(2) },
    verdict: { bending: 'fine', pinHeat: 'fine', pinPressure: 'watch' },
    because: 'nothing bends a bar of 8 in; the coarse wheel leans hard on its pin',
  },
  {
    job: '1/2 in 416, 96 DP straight, 1/4 in wide, 0.75 in out',
    said: {
      ...of('ss416'),
      pitch: { system: 'dp', value: 96 },
      stock: inch(0.5),
      length: inch(0.25),
      stickout: inch(0.75),
    },
    verdict: { bending: 'fine' },
    because: 'a fine pitch a diameter and a half out',
  },
];

export const DANGEROUS: readonly Job[] = [
  {
    job: '3/16 in drill rod, fine straight, plunged 0.75 in out',
    said: {
      ...of('tool-O1-ann'),
      ...tpi(33),
      stock: inch(3 / 16),
      stickout: inch(0.75),
    },
    verdict: { bending: 'stop', stickout: 'watch', width: 'watch' },
    because: 'a rod of 4.8 mm against a wheel meant for bars of an inch: it bends before it marks',
  },
  {
    job: '1/4 in 303, fine diamond, plunged 1 in out',
    said: { ...diamond, ...of('ss303'), ...tpi(33), stock: inch(0.25), stickout: inch(1) },
    verdict: { bending: 'stop', stickout: 'watch' },
    because: 'four diameters out, soft in bending and hard under the wheel',
  },
  {
    job: '1/4 in 1018, straight, plunged 1.5 in out',
    said: { stock: inch(0.25), stickout: inch(1.5) },
    verdict: { bending: 'stop', stickout: 'watch' },
    because: 'six diameters out: it is pushed away and stays bent',
  },
  {
    job: '3/8 in prehard 4140, diamond, plunged 2 in out',
    said: { ...diamond, ...of('steel-CrMo-PH'), stock: inch(0.375), stickout: inch(2) },
    verdict: { bending: 'stop', stickout: 'watch' },
    because: 'strong steel, but twice the force at five diameters',
  },
  {
    job: '1/2 in 1018, diamond, plunged 4 in out',
    said: { ...diamond, stock: inch(0.5), stickout: inch(4) },
    verdict: { bending: 'stop', stickout: 'watch' },
    because: 'eight diameters out without a tailstock',
  },
  {
    job: '12 mm 6061, diamond 0.8, 60 long, 80 out',
    said: {
      ...diamond,
      ...of('al6061-T6'),
      ...pitch(0.8),
      stock: mm(12),
      length: mm(60),
      stickout: mm(80),
    },
    verdict: { bending: 'stop', stickout: 'watch' },
    because: 'it does not stay bent, but the pattern fades to nothing towards the free end',
  },
  {
    job: '10 mm 1018 rod, diamond 0.8, 120 long, tailstock',
    said: {
      ...diamond,
      ...pitch(0.8),
      stock: mm(10),
      length: mm(120),
      stickout: mm(150),
      support: 'tailstock',
    },
    verdict: { bending: 'stop' },
    because: 'held at both ends it still bows in the middle: the pattern is faint there',
  },
  {
    job: '1.5 in 6061 tube, wall 1/16 in, fine diamond',
    said: {
      ...diamond,
      ...of('al6061-T6'),
      ...tpi(33),
      stock: inch(1.5),
      bore: inch(1.375),
      stickout: inch(2),
    },
    verdict: { ring: 'stop', bending: 'fine' },
    because: 'the wheels press the tube oval before they print',
  },
  {
    job: '1 in 1018 tube, wall 0.065 in, straight',
    said: { bore: inch(0.87) },
    verdict: { ring: 'stop' },
    because: 'electrical-conduit wall: it collapses',
  },
  {
    job: '1 in 1018 tube, wall 1/8 in, straight',
    said: { bore: inch(0.75) },
    verdict: { ring: 'watch' },
    because: 'it may hold, it may come out of round: what the force really is decides',
  },
  {
    job: '4 in 4140, straight, run at 150 m/min',
    said: { ...of('steel-CrMo-ann'), stock: inch(4), speed: mPerMin(150) },
    verdict: { pinHeat: 'stop', speed: 'stop' },
    because: 'five times the trade’s limit for as long as it takes to seize',
  },
  {
    job: '1 in 1018, straight, on a 3 mm pin',
    said: { pinDiameter: mm(3) },
    verdict: { pinPressure: 'watch' },
    because: 'half the pin, twice the pressure',
  },
  {
    job: '2 in 1045, coarse diamond, on a bench lathe that has 60 W left',
    said: {
      ...diamond,
      ...of('steel-medC-CD'),
      ...tpi(14),
      stock: inch(2),
      machine: { ...unlimited, power: watt(60) },
    },
    verdict: { capacity: 'stop' },
    because: 'the belt slips',
  },
];
