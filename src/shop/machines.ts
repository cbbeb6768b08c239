import { z } from 'zod';
import {
  type Mm,
  type MmPerRev,
  mm,
  mmPerRev,
  type RevPerMin,
  revPerMin,
  type Steps,
  type Watt,
  watt,
} from '../calc/index.ts';
import type { Refusal, Use } from '../refusal.ts';
import { cardsUsing } from './cardUses.ts';
import { outside, type Range, rangeFault } from './limits.ts';
import type { Register } from './register.ts';
import { rulesFor } from './ruleUses.ts';
import type { ShopView } from './view.ts';

/** What the cross-slide's dial shows when the tool goes in: the whole, or half of it. */
export const DIALS = ['diameter', 'radius'] as const;
export type Dial = (typeof DIALS)[number];

/** A lathe. Null: nobody has said. */
export type Machine = {
  readonly name: string;
  /** The gears, or anything between two ends. */
  readonly speeds: Steps<RevPerMin> | null;
  readonly feeds: Steps<MmPerRev> | null;
  readonly dial: Dial;
  /** What its dials are in. */
  readonly units: 'in' | 'mm' | null;
  readonly largestDiameter: Mm | null;
  /** How far apart diameters turned to one setting come out (one standard deviation). */
  readonly turningSpread: Mm | null;
  readonly topSpeed: RevPerMin | null;
  readonly power: Watt | null;
};

/** A machine of which only its name is known. */
export const BARE_MACHINE: Omit<Machine, 'name'> = {
  speeds: null,
  feeds: null,
  dial: 'diameter',
  units: null,
  largestDiameter: null,
  turningSpread: null,
  topSpeed: null,
  power: null,
};

/** What a lathe's figures may be. Judgement: from a watchmaker's lathe to a large engine lathe. */
export const MACHINE_RANGES = {
  largestDiameter: [5, 3000, 'mm'],
  turningSpread: [0.0005, 0.5, 'mm'],
  topSpeed: [10, 20_000, 'rev/min'],
  power: [20, 200_000, 'W'],
} as const satisfies Record<string, Range>;
export const SPEED_RANGE: Range = [1, 20_000, 'rev/min'];
export const FEED_RANGE: Range = [0.001, 10, 'mm/rev'];
/** Gears of one lathe. Judgement. */
const MOST_STEPS = 100;

const fault = (machine: Machine): Refusal | null =>
  rangeFault(MACHINE_RANGES, machine) ??
  stepsFault('speeds', machine.speeds, SPEED_RANGE) ??
  stepsFault('feeds', machine.feeds, FEED_RANGE);

const stepsFault = (what: string, steps: Steps<number> | null, range: Range): Refusal | null => {
  if (steps === null) return null;
  const [, , unit] = range;
  if ('list' in steps) {
    const count = steps.list.length;
    if (count < 1 || count > MOST_STEPS) {
      return { code: 'outOfRange', what, value: count, min: 1, max: MOST_STEPS, unit: 'steps' };
    }
    return steps.list.map((step) => outside(what, step, range)).find((f) => f !== null) ?? null;
  }
  const { slowest, fastest } = steps;
  const ends = outside(what, slowest, range) ?? outside(what, fastest, range);
  if (ends !== null || fastest > slowest) return ends;
  return { code: 'outOfRange', what, value: fastest, min: slowest, max: range[1], unit };
};

/** A rule that holds for it, or a card that was made for it. */
const uses = async (view: ShopView, id: string, most: number): Promise<readonly Use[]> => {
  const rules = await rulesFor(view, 'machine', id, most);
  return [...rules, ...(await cardsUsing(view, 'machine', id, most))].slice(0, most);
};

export const MACHINES: Register<'machine', Machine> = {
  subject: 'machine',
  fault,
  uses,
  toRow: (machine) => ({
    speeds: stepsJson(machine.speeds),
    feeds: stepsJson(machine.feeds),
    dial: machine.dial,
    units: machine.units,
    largest_diameter: machine.largestDiameter,
    turning_spread: machine.turningSpread,
    top_speed: machine.topSpeed,
    power: machine.power,
  }),
  fromRow: (row) => ({
    name: row.name,
    speeds: stepsOf(row.speeds, revPerMin),
    feeds: stepsOf(row.feeds, mmPerRev),
    dial: row.dial === 'radius' ? 'radius' : 'diameter',
    units: row.units === 'in' || row.units === 'mm' ? row.units : null,
    largestDiameter: row.largest_diameter === null ? null : mm(row.largest_diameter),
    turningSpread: row.turning_spread === null ? null : mm(row.turning_spread),
    topSpeed: row.top_speed === null ? null : revPerMin(row.top_speed),
    power: row.power === null ? null : watt(row.power),
  }),
};

const KEPT_STEPS = z.union([
  z.object({ list: z.array(z.number()) }),
  z.object({ slowest: z.number(), fastest: z.number() }),
]);

/** Gears are kept in the order of their speed, each once, however they were read out. */
const stepsJson = (steps: Steps<number> | null): string | null => {
  if (steps === null) return null;
  if (!('list' in steps)) return JSON.stringify(steps);
  return JSON.stringify({ list: [...new Set(steps.list)].sort((a, b) => a - b) });
};

const stepsOf = <T>(json: string | null, branded: (value: number) => T): Steps<T> | null => {
  if (json === null) return null;
  const steps = KEPT_STEPS.parse(JSON.parse(json));
  return 'list' in steps
    ? { list: steps.list.map(branded) }
    : { slowest: branded(steps.slowest), fastest: branded(steps.fastest) };
};
