import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../../../src/desk/index.ts';
import type { ShopUnits } from '../../../src/words/index.ts';
import { ask } from '../../support/desk.ts';

/** The same amount as a shop of either unit would type it, exactly. */
type Typed = { readonly in: string; readonly mm: string };

/** Thousandths of an inch; in millimetres a number of four decimals at the most. */
const thousandths = (n: number): Typed => ({
  in: (n / 1000).toFixed(3),
  mm: (n * 0.0254).toFixed(4),
});
const length = (min: number, max: number): fc.Arbitrary<Typed> =>
  fc.integer({ min, max }).map(thousandths);
/** The unit is left to the shop, or said. */
const withUnit = (of: fc.Arbitrary<Typed>, ending: Typed): fc.Arbitrary<Typed> =>
  fc
    .tuple(of, fc.boolean())
    .map(([{ in: inch, mm }, isSaid]) =>
      isSaid ? { in: `${inch}${ending.in}`, mm: `${mm}${ending.mm}` } : { in: inch, mm },
    );
const LENGTH = { in: ' in', mm: ' mm' } as const;
const alike = (text: string): Typed => ({ in: text, mm: text });
const after = (word: string, of: fc.Arbitrary<Typed>): fc.Arbitrary<Typed> =>
  of.map((typed) => ({ in: `${word} ${typed.in}`, mm: `${word} ${typed.mm}` }));
const maybe = (of: fc.Arbitrary<Typed>): fc.Arbitrary<Typed> =>
  fc.oneof(fc.constant(alike('')), of);

const feet = fc
  .integer({ min: 5, max: 300 })
  .map((n) => ({ in: `${n} sfm`, mm: `${(n * 0.3048).toFixed(4)} m/min` }));
const feeds = fc
  .integer({ min: 1, max: 40 })
  .map((n) => ({ in: `${(n / 1000).toFixed(3)} in/rev`, mm: `${(n * 0.0254).toFixed(4)} mm/rev` }));

/** Words that exclude each other are kept apart, so that most lines are answered. */
const lines: fc.Arbitrary<Typed> = fc
  .record({
    bar: withUnit(length(400, 4000), LENGTH),
    pattern: fc.constantFrom('straight', 'diagonal left', 'diamond', 'diamond sunk', 'square'),
    pitch: fc.constantFrom('21 tpi', '33 tpi', '96 dp', '160 dp', '0.8 pitch', 'm0.3'),
    material: fc.constantFrom('1018', '304', 'brass', '6061', 'cast iron', 'ti64', ''),
    // Words whose number takes its unit from the shop go before those that stand alone.
    length: maybe(after('long', withUnit(length(200, 3000), LENGTH))),
    out: maybe(after('out', withUnit(length(3200, 6000), LENGTH))),
    runout: maybe(after('runout', length(1, 10))),
    bore: maybe(after('bore', withUnit(length(20, 150), LENGTH))),
    speed: maybe(after('speed', feet)),
    feed: maybe(after('feed', feeds)),
    fill: fc.constantFrom('', 'fill 80%', 'fill 0.95'),
    leave: fc.constantFrom('', 'as-is', 'opposed', 'tailstock'),
  })
  .map((of) => {
    const { bar, length: long, out, runout, bore, speed, feed } = of;
    const line = (units: ShopUnits): string =>
      [
        of.pattern,
        of.pitch,
        of.material,
        bar,
        long,
        out,
        runout,
        bore,
        speed,
        feed,
        of.fill,
        of.leave,
      ]
        .map((part) => (typeof part === 'string' ? part : part[units]))
        .filter((part) => part !== '')
        .join(' ');
    return { in: line('in'), mm: line('mm') };
  });

const sameAnswer = (inch: Answer, metric: Answer): void => {
  expect(metric.kind).toBe(inch.kind);
  if (inch.kind === 'refusal' || metric.kind === 'refusal') {
    const code = (answer: Answer) => (answer.kind === 'refusal' ? answer.refusal.code : null);
    expect(code(metric)).toBe(code(inch));
    return;
  }
  for (const [name, figure] of Object.entries(inch.card.figures)) {
    const other = metric.card.figures[name] ?? null;
    expect(other?.unit, name).toBe(figure?.unit);
    // Of a share of a tooth only the size of a tooth is known to so many digits.
    if (figure !== null && other !== null)
      expect(Math.abs(other.value - figure.value), name).toBeLessThan(
        1e-9 * (1 + Math.abs(figure.value)),
      );
  }
  const states = ({ card }: typeof inch) =>
    card.checks.map(({ name, state, reason }) => `${name} ${state} ${reason}`);
  expect(states(metric)).toEqual(states(inch));
  expect(metric.card.cautions).toEqual(inch.card.cautions);
  const counts = ({ card }: typeof inch) => card.alternatives.map((each) => each.toothCount);
  expect(counts(metric)).toEqual(counts(inch));
};

describe('inch and metric entry', () => {
  it('give one answer, each in its own shop', async () => {
    let cards = 0;
    let asked = 0;
    await fc.assert(
      fc.asyncProperty(lines, async (line) => {
        const [inch, metric] = [await ask(line.in, 'in'), await ask(line.mm, 'mm')];
        asked += 1;
        if (inch.kind === 'card') cards += 1;
        sameAnswer(inch, metric);
      }),
      { numRuns: 300 },
    );
    expect(cards).toBeGreaterThan(asked / 2);
  });

  it('give one answer in the other’s shop, where every unit is said', async () => {
    const said =
      '1.000 in straight 21 tpi 1018 long 1.5 in out 3 in speed 60 sfm feed 0.012 in/rev';
    const metric =
      '25.4 mm straight 21 tpi 1018 long 38.1 mm out 76.2 mm speed 18.288 m/min feed 0.3048 mm/rev';
    const answers = await Promise.all([
      ask(said, 'in'),
      ask(said, 'mm'),
      ask(metric, 'in'),
      ask(metric, 'mm'),
    ]);
    const [first, ...others] = answers;
    expect(first.kind).toBe('card');
    for (const other of others) sameAnswer(first, other);
  });
});

describe('what a shop’s unit changes', () => {
  it('is what is shown first, and nothing else', async () => {
    const line = '25 mm straight 1.0 pitch 1018';
    const [inch, metric] = [await ask(line, 'in'), await ask(line, 'mm')];
    sameAnswer(inch, metric);
    const units = [inch, metric].map((each) => (each.kind === 'card' ? each.card.units : null));
    expect(units).toEqual(['in', 'mm']);
    const shown = await ask(`${line} show mm`, 'in');
    expect(shown.kind === 'card' ? shown.card.units : null).toBe('mm');
  });

  it('is what a bare number is in, where it is a likely size in it', async () => {
    const [inch, metric] = [
      await ask('1 straight 21tpi', 'in'),
      await ask('25.4 straight 21tpi', 'mm'),
    ];
    sameAnswer(inch, metric);
    for (const [line, units] of [
      ['19 straight 21tpi', 'in'],
      ['0.75 straight 21tpi', 'mm'],
    ] as const) {
      const answer = await ask(line, units);
      expect(answer.kind === 'refusal' ? answer.refusal.code : null).toBe('unclear');
    }
  });
});
