import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { CHECKS_SAID, FIGURES_SAID, saidOf, subjectsOf } from '../../../commands/knurl/whyWords.ts';
import { terminalCall } from '../../../src/adapters/terminal/index.ts';
import {
  CHECK_FIGURES,
  PLAN_FIGURES,
  SETUP_FIGURES,
  type Subject,
  TROUBLE_FIGURES,
} from '../../../src/calc/index.ts';
import type { Card } from '../../../src/card/index.ts';
import { type Answer, openDesk, plainShop } from '../../../src/desk/index.ts';
import { ask, type CardAnswer, cardFor, figureOf, refusalFor, textOf } from '../../support/desk.ts';

const BAR = '1.000 straight 21tpi 1018';

/** Lines whose cards, taken together, have every figure and every check that can be had by words. */
const LINES: readonly (readonly [verb: 'setup' | 'check' | 'plan' | 'trouble', line: string])[] = [
  ['setup', BAR],
  ['setup', `${BAR} long 1.5 out 3 bore 0.75 runout 0.004 finish 0.995-1.005 fit 1.000`],
  ['setup', '20mm diamond 1.0 pitch 304 out 60 mm tailstock bore 12 mm fill 80% turns 15 200 rpm'],
  ['setup', '20mm diagonal left 96dp brass wheel 20mm 63 teeth centers out 50 mm class I'],
  ['setup', '25mm straight 0.8 pitch acetal form opposed proven 98 at 25.0 mm carbide'],
  ['setup', '1.000 straight 21tpi cast iron cut long 1 speed 60 sfm feed 0.006 as-is'],
  ['check', '0.995 straight 21tpi'],
  ['check', '0.995 21tpi straight seam 0.3 count 66'],
  ['check', '0.995 21tpi straight seam 0.3 scrap'],
  ['check', '0.9852 straight 21tpi 1018 count 65 crest 1.0040 height 0.021 finish 0.995-1.005'],
  ['check', '0.9852 straight 21tpi 1018 count 130 crest 1.0040 flats 0.004 and 0.008 over 1.0'],
  ['plan', 'finish 0.995-1.005 straight 96dp 303'],
  ['plan', 'finish 0.995-1.005 straight 96dp 303 cut'],
  ['trouble', `double ${BAR}`],
];

const subjectsOn = (card: Card): readonly Subject[] => [
  ...Object.entries(card.figures).flatMap(([name, figure]) =>
    figure === null ? [] : [{ figure: name } as Subject],
  ),
  ...card.checks.map(({ name }): Subject => ({ check: name })),
];

const nameOf = (subject: Subject): string => ('check' in subject ? subject.check : subject.figure);

const linesOf = ({ card }: CardAnswer) =>
  card.parts.flatMap((part) => (part.part === 'lines' ? part.lines : []));
const isTraced = (answer: CardAnswer): boolean => {
  const said = linesOf(answer).map(({ line }) => line);
  const worked = ['whyFormula', 'whySure', 'whySource', 'whyAssumes'] as const;
  return said.includes('whyTold') || worked.every((line) => said.includes(line));
};

/** A desk that remembers this card as the last one. */
const deskAfter = (last: Card | null) =>
  openDesk(FLEET, async (call) => ({ ...(await plainShop('in')(call)), last }));
const askAfter = (last: Card | null, words: string): Promise<Answer> =>
  deskAfter(last).answer(terminalCall(words, 1));

const cardAfter = async (last: Card | null, words: string): Promise<CardAnswer> => {
  const answer = await askAfter(last, words);
  if (answer.kind !== 'card') throw new Error(`refused: ${words}\n${textOf(answer)}`);
  return answer;
};

describe('every figure and check of a card', () => {
  it.each(LINES)('%s %s', async (verb, line) => {
    const { card } = await cardFor(`/knurl ${verb} ${line}`);
    const subjects = subjectsOn(card);
    expect(subjects.length).toBeGreaterThan(0);
    for (const subject of subjects) {
      const why = await cardAfter(card, `/knurl why ${saidOf(subject)}`);
      expect(why.card.headline.line, nameOf(subject)).toBe(
        'check' in subject ? 'whyCheck' : 'whyFigure',
      );
      expect(why.card.headline.values, nameOf(subject)).toMatchObject(
        'check' in subject ? { check: { name: subject.check } } : { name: subject.figure },
      );
      expect(isTraced(why), nameOf(subject)).toBe(true);
      // For programs: the figure asked about and what goes into it, as they stand on the card.
      const own = card.checks.find(({ name }) => 'check' in subject && name === subject.check);
      const known = { ...card.figures, ...own?.figures };
      for (const [name, value] of Object.entries(why.card.figures))
        expect([name, value]).toEqual([name, known[name] ?? null]);
      if ('figure' in subject) expect(why.card.figures).toHaveProperty(subject.figure);
    }
  });

  it('is worked out from a line as well as taken from the last card', async () => {
    for (const [verb, line] of LINES.filter(([, each]) => !each.includes('cut'))) {
      const { card } = await cardFor(`/knurl ${verb} ${line}`);
      const [first, last] = [subjectsOn(card)[0], subjectsOn(card).at(-1)];
      for (const subject of [first, last].filter((each) => each !== undefined)) {
        const afterwards = await cardAfter(card, `/knurl why ${saidOf(subject)}`);
        const atOnce = await cardFor(`/knurl why ${saidOf(subject)} ${verb} ${line}`);
        expect(atOnce.card.headline).toEqual(afterwards.card.headline);
        expect(atOnce.card.parts).toEqual(afterwards.card.parts);
      }
    }
  });

  it('has been asked about in one of these lines, but for what a machine limits', async () => {
    const all = { setup: SETUP_FIGURES, check: CHECK_FIGURES };
    const met = new Set<string>();
    for (const [verb, line] of LINES) {
      const { card } = await cardFor(`/knurl ${verb} ${line}`);
      const figures = Object.keys(card.figures).sort();
      if (verb === 'plan') expect(figures).toEqual([...PLAN_FIGURES].sort());
      else if (verb === 'trouble') expect(figures).toEqual([...TROUBLE_FIGURES]);
      else expect(figures).toEqual(Object.keys(all[verb]).sort());
      for (const subject of subjectsOn(card))
        met.add('check' in subject ? `check ${subject.check}` : `${verb} ${subject.figure}`);
    }
    const wanted = [
      ...Object.keys(SETUP_FIGURES).map((name) => `setup ${name}`),
      ...Object.keys(CHECK_FIGURES).map((name) => `check ${name}`),
      ...Object.keys(CHECKS_SAID).map((name) => `check ${name}`),
    ];
    expect(wanted.filter((name) => !met.has(name))).toEqual(['check capacity']);
  });
});

describe('names', () => {
  it('are said one way by buttons, and that way means one thing', () => {
    const first = Object.values(FIGURES_SAID).map(([name]) => name);
    expect(new Set(first).size).toBe(first.length);
    for (const [figure, [name]] of Object.entries(FIGURES_SAID))
      expect(subjectsOf(name, false)[0]).toEqual({ figure });
  });

  it.each([
    ['infeed', 'infeed'],
    ['feed in', 'infeed'],
    ['feed-in', 'infeed'],
    ['the feed in?', 'infeed'],
    ['is the blank', 'blankDiameter'],
    ['diameter', 'blankDiameter'],
    ['crest', 'crestDiameter'],
    ['speed', 'surfaceSpeed'],
    ['rpm', 'spindleSpeed'],
    ['First Turn', 'firstBite'],
    ['tooth height', 'toothHeight'],
    ['fill', 'fill'],
    ['growth', 'growth'],
    ['pin heat', 'pinHeatIndex'],
    ['force', 'radialForce'],
    ['blankDiameter', 'blankDiameter'],
  ])('%s', async (said, name) => {
    const { card } = await cardFor(`/knurl why ${said} ${BAR}`);
    expect(card.headline).toMatchObject({ line: 'whyFigure', values: { name } });
  });

  it.each([
    ['tracking', 'tracking'],
    ['wheel', 'wheel'],
    ['check fill', 'fill'],
    ['check on the speed', 'speed'],
    ['material', 'material'],
    ['edge', 'edge'],
  ])('%s is a check', async (said, name) => {
    const { card } = await cardFor(`/knurl why ${said} ${BAR}`);
    expect(card.headline).toMatchObject({ line: 'whyCheck', values: { check: { name } } });
    expect(card.checks.map((check) => check.name)).toEqual([name]);
  });

  it('are read first and only there: behind them their words are parameters again', async () => {
    const answer = await cardFor(`/knurl why feed ${BAR} long 1.5 feed 0.012 speed 60 sfm`);
    const { card } = answer;
    expect(card.headline).toMatchObject({ line: 'whyFigure', values: { name: 'feed' } });
    // An inch is 25.4 mm exactly.
    expect(figureOf(answer, 'feed')).toBeCloseTo(0.012 * 25.4, 9);
    const speed = await cardFor(`/knurl why speed ${BAR} speed 60 sfm`);
    expect(textOf(speed)).toContain('60 ft/min');
    expect(textOf(speed)).toContain('Taken as you gave it.');
  });

  it('mean what the card has', async () => {
    const seam = await cardFor('/knurl why take off 0.995 21tpi straight seam 0.3');
    expect(seam.card.headline).toMatchObject({ values: { name: 'seamTakeOff' } });
    const blank = await cardFor('/knurl why take off 0.995 21tpi straight');
    expect(blank.card.headline).toMatchObject({ values: { name: 'nextTakeOff' } });
    const part = await cardFor(
      '/knurl why growth 0.9852 straight 21tpi 1018 count 65 crest 1.0040',
    );
    expect(part.card.headline).toMatchObject({ values: { name: 'growthMeasured' } });
  });

  it('of one option of a form come first too', async () => {
    const desk = deskAfter(null);
    const answer = await desk.answer({
      ...terminalCall('', 1),
      given: {
        path: ['knurl', 'why'],
        options: {
          figure: 'feed',
          diameter: '1.000',
          pattern: 'straight',
          pitch: '21tpi',
          length: '1.5',
        },
      },
    });
    expect(answer.kind === 'card' && answer.card.headline).toMatchObject({
      values: { name: 'feed' },
    });
  });
});

describe('what cannot be answered', () => {
  it('a misspelt name gets the nearest, as a line to send', async () => {
    const { refusal, choices } = await refusalFor(`/knurl why infed ${BAR}`);
    expect(refusal).toMatchObject({ code: 'notFound', what: 'figure', nearest: ['infeed'] });
    expect(choices).toEqual([{ label: 'infeed', words: `/knurl why infeed ${BAR}` }]);
  });

  it('a misspelt name of two words is one name', async () => {
    const { refusal, choices } = await refusalFor(`why pin haet ${BAR}`);
    expect(refusal).toMatchObject({ code: 'notFound', word: 'pin haet', nearest: ['pin heat'] });
    expect(choices[0]?.words).toBe(`/knurl why pin heat ${BAR}`);
  });

  it('an unknown name is not guessed', async () => {
    const answer = await refusalFor(`why sparkle ${BAR}`);
    expect(answer.refusal).toMatchObject({ code: 'notFound', what: 'figure', nearest: [] });
    expect(textOf(answer)).toContain('There is no figure or check “sparkle” here.');
    expect(answer.choices[0]?.words).toBe(`/knurl why infeed ${BAR}`);
  });

  it.each(['/knurl why', 'why?', `/knurl why ${BAR}`, 'why check 0.995 straight 21tpi'])(
    'no name: %s',
    async (line) => {
      const answer = await refusalFor(line);
      expect(answer.refusal).toMatchObject({ code: 'missing', parameter: 'figure' });
      expect(textOf(answer, 200)).toContain('such as infeed, crest, speed or tracking.');
      for (const { words } of answer.choices)
        expect(words).toMatch(/^\/knurl why\?? (infeed|crest|speed|tracking)\b/u);
    },
  );

  it('no line and no last card: a line to type, in the shop’s own units', async () => {
    const answer = await refusalFor('/knurl why crest');
    expect(answer.refusal).toMatchObject({ code: 'missing', parameter: 'explained' });
    expect(textOf(answer, 200)).toContain(`such as /knurl why crest ${BAR}.`);
    const metric = await refusalFor('/knurl why crest', 'mm');
    expect(metric.choices[0]?.words).toBe('/knurl why crest 25 straight 1.0 pitch 1018');
    expect((await ask(metric.choices[0]?.words ?? '', 'mm')).kind).toBe('card');
  });

  it('a last card without figures is no card to explain', async () => {
    const { card } = await cardFor('/knurl help');
    const answer = await askAfter(card, '/knurl why crest');
    expect(answer.kind === 'refusal' && answer.refusal).toMatchObject({ parameter: 'explained' });
  });

  it.each([
    [`why bending ${BAR}`, 'stickout', 'out 3'],
    [`why wall stress ${BAR}`, 'bore', 'bore 0.75'],
    [`why feed ${BAR}`, 'length', 'long 1.5'],
    [`why runout ${BAR}`, 'runout', 'runout 0.004'],
    [`why seam diameter 0.995 straight 21tpi`, 'seam', 'seam 0.3'],
    [`why measured crest 0.9852 straight 21tpi count 65`, 'crest', 'crest 1.0040'],
  ])('%s: what would bring it is asked for', async (line, parameter, example) => {
    const { refusal, choices } = await refusalFor(line);
    expect(refusal).toMatchObject({ code: 'missing', parameter });
    expect(choices.map(({ label }) => label)).toContain(example);
    const line2 = choices.find(({ label }) => label === example)?.words ?? '';
    expect((await cardFor(line2)).card.headline.line).toMatch(/^why(Figure|Check)$/u);
  });

  it('a figure that does not apply says so', async () => {
    const answer = await cardFor('why growth factor 1.000 straight 21tpi brass cut');
    expect(textOf(answer)).toMatch(/^There is no growth factor on this card/u);
    const { card } = await cardFor(`/knurl ${BAR}`);
    expect(textOf(await cardAfter(card, 'why seam diameter'))).toMatch(
      /^There is no diameter that/u,
    );
  });

  it('a line that its own command refuses is refused the same way', async () => {
    const { refusal, choices } = await refusalFor('why infeed 1.000 straight 1018');
    expect(refusal).toMatchObject({ code: 'missing', parameter: 'pitch' });
    expect(choices[0]?.words).toBe('/knurl why infeed 1.000 straight 1018 21tpi');
  });

  it('a word that the card’s command does not read is not dropped', async () => {
    const { refusal } = await refusalFor('why fill plan finish 0.995-1.005 straight 96dp fill 80%');
    expect(refusal).toMatchObject({ code: 'unreadable', word: 'fill 80%' });
  });
});

describe('the card', () => {
  it('reads well on a phone', async () => {
    const answer = await cardFor(`/knurl why first turn ${BAR}`);
    expect(textOf(answer).split('\n\nNext')[0]).toBe(`First turn: 0.0043 in [0.109 mm]
Infeed of the first turn from which the tip
falls back into its own first groove.
H1 = 2 δ Hf, z1 = H1 − H1²/(2 Hf) → 0.18 Hf at δ
= 0.10
How sure: worked out here.

Hf          sharp height 0.0238 in [0.605 mm]
            (worked out)
δ           share of a tooth to be caught, 0.10

Worked out here: The first turn falls back into
its own groove.

Assumes each groove family is cut by its own
wheel, so the straight relation holds for all.

The shop's rules, the machine's manual and
licensed practice go before this card.`);
  });

  it('names title and edition of what was read, and never hides what is from memory', async () => {
    const count = textOf(await cardFor(`why tooth count ${BAR} as-is`), 200);
    expect(count).toContain(
      "Read in ASME B94.6 as given in Machinery's Handbook, 31st edition, pages 1059-1060.",
    );
    const force = textOf(await cardFor(`why force ${BAR}`), 200);
    expect(force).toContain(
      'From memory, check before you rely on it: Brinell hardness as yield pressure.',
    );
    expect(force).toContain(
      'No surer than its weakest part: from memory; check before you rely on it.',
    );
    const factor = textOf(await cardFor(`why growth factor ${BAR}`), 200);
    expect(factor).toContain(
      'A judgement made here: Growth over the static figure before any result.',
    );
    const edge = textOf(await cardFor(`why edge ${BAR}`), 200);
    expect(edge).toContain('A rule of the trade, no source: Edges of the wheel.');
  });

  it('explains what was asked for as asked for, not as worked out', async () => {
    const asked = { fill: 'fill 80%', turns: 'turns 18', rpm: '200 rpm', speed: 'speed 60 sfm' };
    for (const [name, words] of Object.entries(asked)) {
      const answer = await cardFor(`why ${name} 1.000 straight 21tpi ${words}`);
      expect(textOf(answer)).toContain('Taken as you gave it.');
    }
  });

  it('offers the next question: each of its buttons is answered', async () => {
    for (const line of [
      `why infeed ${BAR}`,
      `why check fill ${BAR}`,
      'why take off 0.995 21tpi straight seam 0.3',
    ]) {
      const { card } = await cardFor(line);
      expect(card.choices.length).toBeGreaterThan(1);
      for (const { words } of card.choices) {
        const next = await cardFor(words);
        expect(next.card.verb).toBe('why');
        expect(next.card.headline).not.toMatchObject({ line: 'whyNone' });
      }
    }
    const { card } = await cardFor(`/knurl ${BAR}`);
    const why = await cardAfter(card, '/knurl why infeed');
    for (const { words } of why.card.choices) await cardAfter(card, words);
  });

  it('offers the check of the same name', async () => {
    const { card } = await cardFor(`why fill ${BAR}`);
    expect(card.choices.map(({ words }) => words)).toContain(`/knurl why check fill ${BAR}`);
  });

  it('shows the units that are asked for, else those of the card it explains', async () => {
    expect(textOf(await cardFor(`why blank ${BAR} show mm`))).toMatch(/25\.025 mm \[0\.9852 in\]/u);
    const { card } = await cardFor('/knurl 25 straight 1.0 pitch', 'mm');
    expect((await cardAfter(card, 'why blank')).card.units).toBe('mm');
    expect((await cardAfter(card, 'why blank show in')).card.units).toBe('in');
  });

  it('is read back from where it was kept: nothing of it is lost on the way', async () => {
    const { card } = await cardFor('/knurl 1.000 straight 21tpi turns 18');
    const kept = JSON.parse(JSON.stringify(card)) as Card;
    expect(textOf(await cardAfter(kept, 'why turns'))).toContain('Taken as you gave it.');
    expect(await cardAfter(kept, 'why infeed')).toEqual(await cardAfter(card, 'why infeed'));
  });
});
