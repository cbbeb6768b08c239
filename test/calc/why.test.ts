import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { CHECK_FIGURES } from '../../src/calc/checking/index.ts';
import {
  feetPerMinute,
  inch,
  mm,
  mmPerRev,
  SETUP_FIGURES,
  type SetupRequest,
  setUp,
} from '../../src/calc/index.ts';
import { type Mark, SOURCES } from '../../src/calc/sources.ts';
import { FORMULAS, type FormulaName } from '../../src/calc/why/formulas.ts';
import { MARK_ORDER, weakestMark } from '../../src/calc/why/marks.ts';
import { CHECK_NUMBERS, type Origins, type Told, type Worked } from '../../src/calc/why/origin.ts';
import { CHECK_FIGURE_ORIGINS } from '../../src/calc/why/originsOfCheck.ts';
import { CHECK_ORIGINS } from '../../src/calc/why/originsOfChecks.ts';
import {
  PLAN_FIGURES,
  PLAN_ORIGINS,
  TROUBLE_FIGURES,
  TROUBLE_ORIGINS,
} from '../../src/calc/why/originsOfPlan.ts';
import { SETUP_ORIGINS } from '../../src/calc/why/originsOfSetup.ts';
import { waysOfSetUp } from '../../src/calc/why/ways.ts';
import { type Explained, whyOf } from '../../src/calc/why/why.ts';
import { en } from '../../src/phrases/index.ts';
import { filesIn, functionsOf, programOf } from '../support/calcFunctions.ts';
import { type FormulaCard, readCard, sourceIds, symbolsOf } from '../support/formulaCards.ts';
import { requestOf } from '../support/setupRequest.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const files = filesIn(path.join(root, 'src', 'calc'));
const cards = new Map<string, FormulaCard>(
  functionsOf(programOf(root, files), files).flatMap(({ name, comment }) =>
    comment === null ? [] : [[name, readCard(comment)] as const],
  ),
);
const cardOf = (name: string): FormulaCard => {
  const card = cards.get(name);
  if (card === undefined) throw new Error(`${name} has no formula card`);
  return card;
};

const formulaNames = Object.keys(FORMULAS) as FormulaName[];

type Entry = { readonly name: string; readonly origin: Worked };

const isWorked = (origin: Worked | Told): origin is Worked => 'by' in origin;
const entriesOf = (register: Readonly<Record<string, Origins>>): Entry[] =>
  Object.entries(register).flatMap(([name, origins]) =>
    origins.filter(isWorked).map((origin) => ({ name, origin })),
  );

const setupEntries = entriesOf(SETUP_ORIGINS);
const checkEntries = entriesOf(CHECK_FIGURE_ORIGINS);
const ruleEntries = entriesOf(CHECK_ORIGINS);
const planEntries = entriesOf(PLAN_ORIGINS);
const troubleEntries = entriesOf(TROUBLE_ORIGINS);
const entries = [
  ...setupEntries,
  ...checkEntries,
  ...planEntries,
  ...troubleEntries,
  ...ruleEntries,
];
const title = ({ name, origin }: Entry) =>
  `${name} by ${origin.by}${origin.when === undefined ? '' : ` when ${origin.when.join(', ')}`}`;

const steps = ({ origin }: Entry): { readonly by: FormulaName; readonly text: string }[] => [
  { by: origin.by, text: (origin.parts ?? FORMULAS[origin.by].formula).join(';  ') },
  ...Object.values(origin.through ?? {}).map((through) =>
    typeof through === 'string'
      ? { by: through, text: FORMULAS[through].formula.join(';  ') }
      : { by: through[0], text: through[1] },
  ),
];

/** Raised letters are symbols too: 2.5ⁿ speaks of n. */
const plain = (text: string): string => text.replaceAll('ⁿ', ' n').replaceAll('ᴴ', ' H');

const occurs = (symbol: string, text: string): boolean => {
  const escaped = symbol.replaceAll(/[.*+?^${}()|[\]\\]/gu, '\\$&');
  // A number may stand right before a symbol (2Hf), an exponent right behind it (b²).
  return new RegExp(`(?<![\\p{L}\\p{M}_])${escaped}(?![\\p{L}\\p{M}\\d_*₀-₉])`, 'u').test(
    plain(text),
  );
};

describe('the formulas of the register', () => {
  it.each(formulaNames)('%s stand as its card prints them', (name) => {
    expect(FORMULAS[name].formula).toEqual(cardOf(name).formula);
  });

  it.each(formulaNames)('%s have the sources of its card', (name) => {
    expect([...FORMULAS[name].sources].sort()).toEqual([...sourceIds(cardOf(name))].sort());
  });

  it('are all needed', () => {
    const used = new Set(entries.flatMap((entry) => steps(entry).map(({ by }) => by)));
    expect(formulaNames.filter((name) => !used.has(name))).toEqual([]);
  });
});

describe('the register', () => {
  it('has an entry for every figure of a set-up and of a check, and no other', () => {
    expect(Object.keys(SETUP_ORIGINS).sort()).toEqual(Object.keys(SETUP_FIGURES).sort());
    expect(Object.keys(CHECK_FIGURE_ORIGINS).sort()).toEqual(Object.keys(CHECK_FIGURES).sort());
  });

  it('has an entry for every check that has a name for people, and no other', () => {
    expect(Object.keys(CHECK_ORIGINS).sort()).toEqual(Object.keys(en.checks).sort());
  });

  it('always ends in an origin that holds for the rest', () => {
    const registers = [
      SETUP_ORIGINS,
      CHECK_FIGURE_ORIGINS,
      PLAN_ORIGINS,
      TROUBLE_ORIGINS,
      CHECK_ORIGINS,
    ];
    const open = registers
      .flatMap((register) => Object.entries<Origins>(register))
      .filter(([, all]) => all.at(-1)?.when !== undefined);
    expect(open.map(([name]) => name)).toEqual([]);
  });

  it.each(entries.map((entry) => [title(entry), entry] as const))(
    '%s: every part is a whole clause of the card',
    (_, entry) => {
      const texts = steps(entry).flatMap(({ by, text }) =>
        text.split(';  ').map((clause) => ({ by, clause })),
      );
      const torn = texts.filter(
        ({ by, clause }) => !cardOf(by).formula.some((line) => line.split(';  ').includes(clause)),
      );
      expect(torn).toEqual([]);
    },
  );

  it.each(entries.map((entry) => [title(entry), entry] as const))(
    '%s: what it names stands in the formula',
    (_, entry) => {
      const { inputs = {}, through = {}, given = {} } = entry.origin;
      const text = steps(entry)
        .map((step) => step.text)
        .join(' ');
      const named = [...Object.keys(inputs), ...Object.keys(through), ...Object.keys(given)];
      expect(named.filter((symbol) => !occurs(symbol, text))).toEqual([]);
    },
  );

  it.each(entries.map((entry) => [title(entry), entry] as const))(
    '%s: no symbol stays unexplained',
    (_, entry) => {
      const { inputs = {}, through = {}, given = {} } = entry.origin;
      const explained = new Set(
        [...Object.keys(inputs), ...Object.keys(through), ...Object.keys(given)].map((symbol) =>
          symbol.replace(/^round\((.*)\)$/, '$1'),
        ),
      );
      const unexplained = steps(entry).flatMap(({ by, text }) =>
        symbolsOf(cardOf(by))
          .map((symbol) => symbol.replace(/^2a$/, 'a'))
          // Names of whole things (plan, wheel, limits) are words of the formula, not symbols.
          .filter((symbol) => /^\p{L}{1,2}$|[_*\d\p{M}]|^\p{Lu}/u.test(symbol))
          .filter((symbol) => occurs(symbol, text) && !explained.has(symbol)),
      );
      expect(unexplained).toEqual([]);
    },
  );

  it('lets only figures of the same card go in', () => {
    const numbers: readonly string[] = CHECK_NUMBERS;
    const strays = (all: readonly Entry[], known: readonly string[]) =>
      all.flatMap(({ name, origin }) =>
        [...Object.values(origin.inputs ?? {}), ...(origin.also ?? [])]
          .filter((input) => !known.includes(input) || input === name)
          .map((input) => `${name} ← ${input}`),
      );
    const [setup, check] = [Object.keys(SETUP_FIGURES), Object.keys(CHECK_FIGURES)];
    expect(strays(setupEntries, setup)).toEqual([]);
    expect(strays(checkEntries, check)).toEqual([]);
    expect(strays(planEntries, PLAN_FIGURES)).toEqual([]);
    expect(strays(troubleEntries, TROUBLE_FIGURES)).toEqual([]);
    // The rule of a check also reads numbers that only the check carries; its name may be a figure's.
    const rules = ruleEntries.map(({ name, origin }) => ({ name: `the check of ${name}`, origin }));
    expect(strays(rules, [...setup, ...check, ...numbers])).toEqual([]);
  });
});

describe('marks', () => {
  it('stand in an order that knows every mark of the register of sources', () => {
    const marks = new Set<Mark>(Object.values(SOURCES).map(({ mark }) => mark));
    expect([...marks].sort()).toEqual([...MARK_ORDER].sort());
  });

  it('of a figure are no surer than any source of its formulas', () => {
    for (const [figure] of Object.entries(SETUP_ORIGINS)) {
      const why = whyOf('setup', { figure: figure as keyof typeof SETUP_FIGURES }, []) as Explained;
      const names = [why.by, ...Object.values(why.through).map(({ by }) => by)];
      const ids = [...new Set(names.flatMap((name) => sourceIds(cardOf(name))))].sort();
      expect([figure, [...why.sources].sort()]).toEqual([figure, ids]);
      const ranks = why.sources.map((id) => MARK_ORDER.indexOf(SOURCES[id].mark));
      expect(MARK_ORDER.indexOf(why.mark)).toBe(Math.max(...ranks));
    }
  });

  it('need something to be marked', () => {
    expect(() => weakestMark([])).toThrow(RangeError);
  });
});

/** Set-ups that come about in every way, by the words that make the difference. */
const SET_UPS: Readonly<Record<string, SetupRequest>> = {
  plunge: requestOf(),
  'as it is': requestOf({ asIs: true, stock: inch(0.99) }),
  'count asked': requestOf({ wantedTeeth: 60, turns: 18, fill: 0.8 }),
  traverse: requestOf({ length: mm(30), stickout: mm(60), pin: 'carbide' }),
  'traverse, turns asked': requestOf({ length: mm(30), turns: 12, speed: feetPerMinute(60) }),
  'pair on a tube': requestOf({
    pattern: { kind: 'diamond', points: 'raised' },
    bore: mm(21),
    stickout: mm(50),
    support: 'tailstock',
  }),
  'between centres': requestOf({ stickout: mm(60), support: 'centres' }),
  cut: requestOf({ process: 'cut', length: mm(20), batch: 4 }),
  'for a print': requestOf({ finish: { low: mm(24.9), high: mm(25) } }),
};

describe('what goes into a figure gives the figure', () => {
  type Numbers = Readonly<Record<string, number>>;
  /** The formulas of the register, done with nothing but the inputs it names. */
  const DONE: Readonly<Partial<Record<FormulaName, (of: Numbers) => number>>> = {
    wholeToothDiameter: ({ N = 0, p_t = 0 }) => (N * p_t) / Math.PI,
    crestFlat: ({ p = 0, x = 0 }) => p * (1 - x),
    infeedPerTurn: ({ z = 0, z1 = 0, N = 0 }) => (z - z1) / (N - 4),
    spindleSpeed: ({ v = 0, D = 0 }) => (1000 * v) / (Math.PI * D),
    surfaceSpeed: ({ n = 0, D = 0 }) => (Math.PI * D * n) / 1000,
    plungeTime: ({ N = 0, n = 0 }) => (60 * N) / n,
    drivePower: ({ T = 0, n = 0 }) => (T * 2 * Math.PI * n) / 60000,
    firstBite: ({ Hf = 0 }) => 0.18 * Hf,
    firstCutBite: ({ Hf = 0 }) => 0.2 * Hf,
    makeTooth: ({ x = 0, Hf = 0, D = 0, ḡ = 0, growth = 0 }) => (D === 0 ? x * Hf : D + ḡ * growth),
  };
  const LOW_AND_HIGH = ['crestDiameterLow', 'crestDiameterHigh'];

  it.each(Object.entries(SET_UPS))('%s', (_, request) => {
    const result = setUp(request);
    const ways = waysOfSetUp(request, result);
    let done = 0;
    for (const [name, figure] of Object.entries(result.figures)) {
      const why = whyOf('setup', { figure: name as keyof typeof SETUP_FIGURES }, ways);
      if (figure === null || why === null || 'told' in why || LOW_AND_HIGH.includes(name)) continue;
      const numbers = Object.fromEntries(
        Object.entries(why.inputs).map(([symbol, input]) => [
          symbol,
          result.figures[input as keyof typeof SETUP_FIGURES]?.value ?? Number.NaN,
        ]),
      );
      const value = DONE[why.by]?.(numbers);
      if (value === undefined) continue;
      done += 1;
      expect([name, value]).toEqual([name, expect.closeTo(figure.value, 9)]);
    }
    expect(done).toBeGreaterThanOrEqual(5);
  });
});

describe('ways', () => {
  const waysOf = (said: Partial<SetupRequest>) => {
    const request = requestOf(said);
    return waysOfSetUp(request, setUp(request));
  };
  const gears = {
    speeds: { list: [100, 200, 300] as never[] },
    feeds: { list: [0.1, 0.2] as never[] },
    topSpeed: null,
    torque: null,
    power: null,
  };

  it.each<[string, Partial<SetupRequest>, readonly string[]]>([
    ['nothing said', {}, []],
    ['the bar as it is', { asIs: true }, ['asIs']],
    ['a count', { wantedTeeth: 60 }, ['teethAsked']],
    ['a fill', { fill: 0.8 }, ['fillAsked']],
    ['limits that the usual fill meets', { finish: { low: mm(25), high: mm(26) } }, ['forPrint']],
    [
      'limits that move the fill',
      { stock: null, finish: { low: mm(25.4), high: mm(25.41) } },
      ['forPrint', 'fillForPrint'],
    ],
    ['a speed', { speed: feetPerMinute(50) }, ['speedAsked']],
    ['turns of a plunge', { turns: 20 }, ['turnsAsked']],
    ['a length', { length: mm(30) }, ['traverse']],
    ['a length and a feed', { length: mm(30), feed: mmPerRev(0.4) }, ['traverse', 'feedAsked']],
    ['a cut', { process: 'cut' }, ['cut', 'traverse']],
    ['gears', { machine: gears }, ['speedStepped']],
    [
      'gears and a length',
      { machine: gears, length: mm(30), feed: mmPerRev(0.3) },
      ['traverse', 'feedStepped', 'speedStepped'],
    ],
    ['results of the shop', { growth: { mean: 0.9, sd: 0.05, results: 4 } }, ['growthLearned']],
    ['a tailstock', { support: 'tailstock' }, ['tailstock']],
    ['a wheel that was counted', { counted: { diameter: mm(20), teeth: 52 } }, ['counted']],
    ['a pair that is proven', { proven: mm(1.21) }, ['proven']],
  ])('%s', (_, said, ways) => {
    expect(waysOf(said)).toEqual(ways);
  });

  it('a figure that was asked for is not explained as worked out', () => {
    expect(whyOf('setup', { figure: 'fill' }, waysOf({ fill: 0.8 }))).toEqual({ told: 'person' });
    expect(whyOf('setup', { figure: 'spindleSpeed' }, waysOf({ machine: gears }))).toEqual({
      told: 'machine',
    });
  });

  it('a wheel that is lower than the fill asked for is not what was asked', () => {
    const counted = { diameter: mm(20), teeth: 20 };
    expect(waysOf({ counted, fill: 0.99 })).not.toContain('fillAsked');
  });

  it('another card has other figures', () => {
    expect(whyOf('check', { figure: 'infeed' }, [])).toBeNull();
    expect(whyOf('setup', { figure: 'seamTakeOff' }, [])).toBeNull();
  });
});
