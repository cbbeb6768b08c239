import { describe, expect, it } from 'vitest';
import { setup } from '../../../commands/knurl/setup.ts';
import { ask } from '../../support/desk.ts';

/** What is asked for around the value that is walked. */
const JOB = '1.0 in straight 21 tpi 1018';
const LONG = `${JOB} long 1 in`;

type Limit = {
  /** Parameter of the command's record. */
  readonly parameter: string;
  /** Its line; `?` stands for the number. */
  readonly line: string;
  readonly low: number;
  readonly high: number;
  /** Name the refusal gives it, where it is not the parameter's own. */
  readonly what?: string;
  /** Only whole numbers say it. */
  readonly whole?: true;
};

/**
 * Every number a set-up takes, in the unit that is typed, with the ends of its range. Ranges:
 * judgement, except pitch (what wheels are sold in), fill (a share) and turns (bite, dwell and one
 * between).
 */
const LIMITS: readonly Limit[] = [
  { parameter: 'diameter', line: '? mm straight 0.2 pitch', low: 1, high: 500 },
  { parameter: 'pitch', line: '1.0 in straight ? pitch', low: 0.2, high: 3.2 },
  {
    parameter: 'pitch',
    line: '1.0 in straight ? tpi',
    low: 25.4 / 3.2,
    high: 25.4 / 0.2,
    what: 'tpi',
  },
  {
    parameter: 'pitch',
    line: '1.0 in straight module ?',
    low: 0.2 / Math.PI,
    high: 3.2 / Math.PI,
    what: 'module',
  },
  // A diametral pitch is along the rim: how coarse it may be depends on the helix, to 60°.
  {
    parameter: 'pitch',
    line: '1.0 in straight ? dp',
    low: (25.4 * Math.PI) / 3.2 / 1.5,
    high: (25.4 * Math.PI) / 0.2,
    what: 'dp',
  },
  { parameter: 'finish', line: 'finish ?-500 mm straight 1.0 pitch', low: 1, high: 500 },
  { parameter: 'teeth', line: `${JOB} ? teeth`, low: 3, high: 10_000, whole: true },
  { parameter: 'length', line: `${JOB} long ? mm`, low: 0.2, high: 2000 },
  { parameter: 'stickout', line: `${JOB} out ? mm`, low: 1, high: 3000 },
  { parameter: 'stockLength', line: `${JOB} bar length ? mm`, low: 10, high: 12_000 },
  { parameter: 'bore', line: '2.0 in straight 21 tpi bore ? mm', low: 0.2, high: 500 },
  { parameter: 'helix', line: '1.0 in diamond 21 tpi helix ?', low: 5, high: 60 },
  { parameter: 'tilt', line: `${JOB} tilt ?`, low: 1, high: 60 },
  { parameter: 'angle', line: `${JOB} angle ?`, low: 60, high: 120 },
  { parameter: 'fill', line: `${JOB} fill ?%`, low: 10, high: 100 },
  { parameter: 'speed', line: `${JOB} speed ? m/min`, low: 0.5, high: 300 },
  { parameter: 'rotation', line: `${JOB} ? rpm`, low: 1, high: 20_000 },
  { parameter: 'feed', line: `${LONG} feed ? mm/rev`, low: 0.01, high: 2 },
  { parameter: 'turns', line: `turns ? ${JOB}`, low: 5, high: 500, whole: true },
  { parameter: 'batch', line: `${JOB} batch ?`, low: 1, high: 1_000_000, whole: true },
  { parameter: 'bevel', line: `${JOB} bevel ? mm`, low: 0, high: 5 },
  { parameter: 'plate', line: `${JOB} plate ? mm`, low: 0.0001, high: 1 },
  { parameter: 'fit', line: `${JOB} fit ? mm`, low: 1, high: 500 },
  { parameter: 'runout', line: `${JOB} runout ? mm`, low: 0, high: 5 },
  {
    parameter: 'wheel',
    line: `${JOB} wheel ?x8x4 mm`,
    low: 5,
    high: 80,
    what: 'wheelDiameter',
  },
  { parameter: 'wheel', line: `${JOB} wheel 20x?x6 mm`, low: 0.5, high: 60, what: 'wheelFace' },
  { parameter: 'wheel', line: `${JOB} wheel 20x8x? mm`, low: 0.5, high: 20, what: 'wheelBore' },
  {
    parameter: 'wheel',
    line: '1.0 in straight 1018 wheel 20mm ? teeth',
    low: 8,
    high: 1000,
    what: 'wheelTeeth',
    whole: true,
  },
  // So many teeth that the pitch they prove is one that is answered.
  {
    parameter: 'proven',
    line: '1.0 in straight proven 15 at ? mm',
    low: 1,
    high: 500,
    what: 'diameter',
  },
  {
    parameter: 'proven',
    line: '1.0 in straight proven 1500 at ? mm',
    low: 1,
    high: 500,
    what: 'diameter',
  },
  { parameter: 'pin', line: `${JOB} pin ? mm`, low: 1, high: 25, what: 'pinDiameter' },
  { parameter: 'hardness', line: `HB ? ${JOB}`, low: 20, high: 750 },
  { parameter: 'hardness', line: `${JOB} ? HRC`, low: 20, high: 64 },
];

const walked = LIMITS.map((limit) => ({ ...limit, what: limit.what ?? limit.parameter }));

/** A hair outside, as a person could type it. */
const beside = ({ whole, low, high }: Limit, end: 'low' | 'high', out: boolean): string => {
  const at = end === 'low' ? low : high;
  const away = (end === 'low') === out ? -1 : 1;
  if (whole === true) return String(at + (out ? away : 0));
  return (at + away * Math.max(0.001 * at, 1e-3)).toFixed(5);
};

/** What was out of range, or null where something else or nothing was wrong. */
const outside = async (line: string) => {
  for (const units of ['in', 'mm'] as const) {
    const answer = await ask(line, units);
    if (answer.kind !== 'refusal' || answer.refusal.code !== 'outOfRange') return null;
    const { what, value, min, max } = answer.refusal;
    if (value >= min && value <= max) return null;
    if (units === 'mm') return { what, value, min, max };
  }
  return null;
};

describe('numbers outside their range', () => {
  it.each(walked)('$what: under $low in "$line"', async (limit) => {
    const found = await outside(limit.line.replace('?', beside(limit, 'low', true)));
    expect(found).toMatchObject({ what: limit.what });
    expect(found!.value).toBeLessThan(found!.min);
  });

  it.each(walked)('$what: over $high in "$line"', async (limit) => {
    const found = await outside(limit.line.replace('?', beside(limit, 'high', true)));
    expect(found).toMatchObject({ what: limit.what });
    expect(found!.value).toBeGreaterThan(found!.max);
  });

  it.each(walked)('$what: $low and $high themselves are answered for', async (limit) => {
    for (const end of ['low', 'high'] as const) {
      const found = await outside(limit.line.replace('?', beside(limit, end, false)));
      // Another limit may still be met (a bore as wide as the bar), but not this parameter's own.
      const range = found === null ? null : [found.min, found.max];
      if (found?.what === limit.what) expect(range).not.toEqual([limit.low, limit.high]);
    }
  });

  it('of every parameter that takes a number are tried here', () => {
    const taking = setup.parameters
      .filter(({ name, examples }) => examples.some((example) => /\d/u.test(example)) && name)
      .map(({ name }) => name)
      // Their digits are names: 1018, class 2, TH-2041-B, RGE 0.8 (whose pitch is held to the same
      // range).
      .filter((name) => !['material', 'class', 'part', 'callout'].includes(name));
    expect([...new Set(LIMITS.map(({ parameter }) => parameter))].sort()).toEqual(taking.sort());
  });

  it('a diametral pitch too coarse without a helix is out of range as a pitch', async () => {
    const found = await outside('1.0 in straight 24 dp');
    expect(found).toMatchObject({ what: 'pitch', max: 3.2 });
    expect(await outside('1.0 in diamond helix 45 24 dp')).toBeNull();
  });
});

describe('a stickout, a bore and a wheel that do not go with the rest', () => {
  it.each([
    ['a stickout shorter than the knurl', `${JOB} long 2 in out 1 in`, 'stickout'],
    ['a bore as wide as the blank', `${JOB} bore 0.99 in`, 'bore'],
    ['a wall thinner than the tooth', `${JOB} bore 0.95 in`, 'wall'],
    ['bevels that leave no face', `${JOB} wheel 20x8x6 bevel 4.5 mm`, 'bevel'],
    ['more teeth than the bar takes', `${JOB} 70 teeth`, 'teeth'],
  ])('%s', async (_, line, what) => {
    expect(await outside(line)).toMatchObject({ what });
  });
});
