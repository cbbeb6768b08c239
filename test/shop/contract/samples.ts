/** Invented wheels, machines and a card. */
import { degrees, mm, mmPerRev, revPerMin, setUp, watt } from '../../../src/calc/index.ts';
import {
  BARE_MACHINE,
  BARE_WHEEL,
  type CardDraft,
  type Machine,
  type Wheel,
} from '../../../src/shop/index.ts';
import { requestOf } from '../../support/setupRequest.ts';

export const STRAIGHT: Wheel = {
  ...BARE_WHEEL,
  name: 'Old Faithful',
  form: 'straight',
  pitch: { system: 'tpi', value: 21 },
  teeth: 63,
  diameter: mm(19.05),
  face: mm(8),
  bore: mm(6.35),
  bevel: mm(1),
  included: degrees(90),
  edge: 'bevelled',
  pinDiameter: mm(6.3),
  pinMaterial: 'carbide',
  place: 'drawer 3, left',
  partsRun: 1250,
};

export const LEFT: Wheel = {
  ...BARE_WHEEL,
  name: 'L 0.8',
  form: 'leftHelical',
  pitch: { system: 'metric', value: 0.8 },
  helix: degrees(30),
};

export const ENGINE_LATHE: Machine = {
  ...BARE_MACHINE,
  name: 'Big lathe',
  speeds: { list: [60, 90, 140, 215, 330, 500].map(revPerMin) },
  feeds: { list: [0.05, 0.1, 0.2].map(mmPerRev) },
  dial: 'radius',
  units: 'in',
  largestDiameter: mm(330),
  turningSpread: mm(0.008),
  topSpeed: revPerMin(500),
  power: watt(5500),
};

export const TURRET: Machine = {
  ...BARE_MACHINE,
  name: 'Turret 2',
  speeds: { slowest: revPerMin(40), fastest: revPerMin(2500) },
};

export const CARD = {
  kind: 'setup',
  place: 'channel',
  words: '1 in 1018 straight 21 tpi',
  request: { stock: 25.4, pitch: { system: 'tpi', value: 21 } },
  figures: { blankDiameter: { value: 25.02522, unit: 'mm' } },
  card: { headline: 'turnTo', parts: [{ part: 'own', texts: ['Ümlaut \u0000 "quoted" \\'] }] },
  program: '0.1.0',
  wheel: null,
  machine: null,
  material: null,
};

const SETUP = setUp(requestOf());

/** A set-up that was worked out, as the desk keeps it. */
export const SETUP_CARD: CardDraft = {
  ...CARD,
  request: requestOf(),
  figures: SETUP.figures,
  card: { verb: 'setup', checks: SETUP.checks, parts: [] },
};
