/** How parts came out, as people say it, and what the cards make of it: on both engines. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { cardText, spoken } from '../../../src/adapters/terminal/index.ts';
import {
  checkAfter,
  dinCrib,
  dpCrib,
  type GrowthResult,
  growthBelief,
  growthFamily,
  learnedPrior,
  mm,
  PITCH_TOLERANCE,
  plan,
  type SetupRequest,
  setUp,
  TURNING_SPREAD,
} from '../../../src/calc/index.ts';
import { type Answer, type Call, openRecordsDesk } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { findCard, type KeptResult, shopOf, viewShop } from '../../../src/shop/index.ts';
import type { Engine, Store } from '../../../src/store/index.ts';
import { ENGINES } from '../../support/places.ts';
import { good, newRecords, START, WORDS } from '../../support/records.ts';

type Who = { readonly who?: string; readonly shop?: string; readonly channel?: string };
type Given = Call['given'];

type TestDesk = {
  readonly store: Store;
  readonly ask: (words: string, by?: Who) => Promise<Answer>;
  readonly send: (given: Given, by?: Who, id?: string) => Promise<Answer>;
};

const deskOn = async (engine: Engine): Promise<TestDesk> => {
  const { store } = await newRecords(engine);
  const desk = openRecordsDesk(FLEET, store, {
    platform: 'terminal',
    program: 'test',
    now: () => START,
  });
  const send: TestDesk['send'] = (
    given,
    { who = 'Ines', shop = 'north', channel = 'floor' } = {},
    id = randomUUID(),
  ) =>
    desk.answer({
      shop,
      person: { id: who, name: who },
      place: { channel, thread: null, isPrivate: false },
      interactionId: id,
      given,
    });
  return { store, send, ask: (words, by) => send({ words }, by) };
};

const textOf = (answer: Answer): string =>
  cardText(spoken(answer, en), 400).replaceAll(/\s+/gu, ' ');
const codeOf = (answer: Answer): string => /Card ([A-Z0-9]+)/u.exec(textOf(answer))?.[1] ?? '';
const refusalOf = (answer: Answer): unknown =>
  answer.kind === 'refusal' ? answer.refusal : `answered: ${textOf(answer)}`;
const resultsIn = (answer: Answer): readonly KeptResult[] =>
  answer.kind === 'card' ? ((answer.card.lists?.['results'] ?? []) as readonly KeptResult[]) : [];
const figureOf = (answer: Answer, name: string): number =>
  answer.kind === 'card' ? (answer.card.figures[name]?.value ?? Number.NaN) : Number.NaN;
const choiceOf = (answer: Answer, label: string): number =>
  answer.kind === 'card' ? answer.card.choices.findIndex((each) => each.label.label === label) : -1;

const LINE = '1.000 straight 21tpi 1018';

/** What people type after a card of 65 teeth, and what is kept of it. */
const SAID: readonly (readonly [words: string, kept: object])[] = [
  ['good 65 teeth crest 1.0035', { outcome: 'good', teeth: 65, crest: mm(25.4889) }],
  ['ok count 65', { outcome: 'good', symptom: null, teeth: 65 }],
  ['good counted 65 height 0.0214', { teeth: 65, toothHeight: mm(0.54356) }],
  ['good flat 0.005 crest 25.5mm', { flat: mm(0.127), crest: mm(25.5) }],
  ['good blank 0.9850 50 parts', { blank: mm(25.019), partsRun: 50 }],
  ['good ran 20', { partsRun: 20 }],
  ['double 66 teeth', { outcome: 'double', symptom: 'doublePattern', teeth: 66 }],
  ['split pattern', { outcome: 'double', symptom: 'doublePattern' }],
  ['shallow', { outcome: 'shallow', symptom: 'shallowAllRound' }],
  ['shallow one side', { outcome: 'shallow', symptom: 'shallowOneSide' }],
  ['flaking', { outcome: 'flaking', symptom: 'flaking' }],
  ['part bent', { outcome: 'bent', symptom: 'bentPart' }],
  ['seized', { outcome: 'seized', symptom: 'pinSeized' }],
  ['tapered', { outcome: 'other', symptom: 'tapered' }],
  ['other', { outcome: 'other', symptom: null }],
  ['double cause dull wheel', { cause: 'dullWheel' }],
  ['double because of light bite', { cause: 'lightFirstBite' }],
  [
    'double 66 teeth note second start had 67 teeth, dull wheel?',
    { teeth: 66, cause: null, note: 'second start had 67 teeth, dull wheel?' },
  ],
  ['double note "two starts" 66 teeth', { teeth: 66, note: 'two starts' }],
  ['GOOD, 65 TEETH', { outcome: 'good', teeth: 65 }],
];

/** What makes no sense, and what it gets. */
const REFUSED: readonly (readonly [words: string, refusal: object, sentence: string])[] = [
  ['65 teeth', { code: 'missing', parameter: 'outcome' }, 'The outcome is missing.'],
  [
    'good crest 0.9700',
    { code: 'outOfRange', what: 'crestDiameter' },
    'is smaller than the blank it grew from',
  ],
  ['good crest 1.2', { what: 'crestDiameter' }, 'is larger than this tooth can raise it'],
  ['good height 0.15', { what: 'toothHeight' }, 'tooth height, 0.1500 in, is too large'],
  ['good 9000 teeth', { what: 'counted' }, 'count of teeth'],
  ['good 65.5 teeth', { code: 'unclear' }, 'whole number'],
  ['good 2 teeth', { code: 'outOfRange', what: 'count' }, 'too small'],
  ['double cause gremlins', { code: 'notFound', what: 'cause' }, 'no cause'],
  [
    'double cause dul wheel',
    { code: 'notFound', nearest: ['dry wheel', 'dull wheel', 'dull'] },
    'dull wheel',
  ],
  ['good blorp', { code: 'unreadable', word: 'blorp' }, 'blorp'],
  ['double good', { code: 'unclear', because: 'saidTwice' }, 'said twice'],
  [
    `good note ${'x'.repeat(501)}`,
    { code: 'outOfRange', what: 'note', value: 501 },
    'has 501 characters; at most 500',
  ],
];

describe.each(ENGINES)('a result, %s', (engine) => {
  it.each(SAID)('%s', async (words, kept) => {
    const { ask } = await deskOn(engine);
    await ask(LINE);
    const answer = await ask(`/knurl result ${words}`);
    const [result] = resultsIn(answer);
    expect(result, textOf(answer)).toMatchObject(
      Object.fromEntries(
        Object.entries(kept).map(([name, value]: [string, unknown]) => [
          name,
          typeof value === 'number' ? (expect.closeTo(value, 6) as unknown) : value,
        ]),
      ),
    );
    expect(textOf(answer)).toContain('R1 logged');
  });

  it.each(REFUSED)(
    '%s: refused, with the words kept and nothing else',
    async (words, refusal, sentence) => {
      const { ask } = await deskOn(engine);
      await ask(LINE);
      const line = `/knurl result ${words}`;
      const answer = await ask(line);
      expect(refusalOf(answer)).toMatchObject(refusal);
      expect(textOf(answer)).toContain(sentence);
      expect(answer.kind === 'refusal' && answer.text).toBe(line);
      expect(textOf(await ask('/knurl result list'))).toContain('No results yet');
    },
  );

  it('is of the card that is named, or of the last one this person was given here', async () => {
    const { ask } = await deskOn(engine);
    const first = codeOf(await ask(LINE));
    await ask('/knurl trouble double');
    const second = codeOf(await ask('19mm diamond 1.0 pitch 304'));
    await ask(LINE, { channel: 'office' });
    const last = await ask('/knurl result good');
    expect(textOf(last)).toContain(`card ${second}`);
    for (const words of [`${first} good`, `good ${first.toLowerCase()}`, `good card ${first}`])
      expect(textOf(await ask(`/knurl result ${words}`))).toContain(`card ${first}`);
  });

  it('offers the cards of this place to whoever has none of their own', async () => {
    const { ask } = await deskOn(engine);
    const code = codeOf(await ask(LINE));
    const answer = await ask('/knurl result good 65 teeth', { who: 'Pavel' });
    expect(refusalOf(answer)).toMatchObject({ code: 'missing', parameter: 'setupCard' });
    const [choice] = answer.kind === 'refusal' ? answer.choices : [];
    const logged = await ask(choice?.words ?? '', { who: 'Pavel' });
    expect(textOf(logged)).toContain(`card ${code}`);
    expect(resultsIn(logged)).toMatchObject([{ teeth: 65 }]);
  });

  it('of another shop’s card is of a card that is not there', async () => {
    const { ask } = await deskOn(engine);
    const code = codeOf(await ask(LINE));
    await ask('/knurl result good');
    await ask(LINE, { shop: 'south', who: 'Olga' });
    const sentences = [code, 'K7M2X'].map(async (each) => {
      const answer = await ask(`/knurl result ${each} good`, { shop: 'south', who: 'Olga' });
      return textOf(answer).replaceAll(each, '');
    });
    const [theirs, nobodys] = await Promise.all(sentences);
    expect(theirs).toBe(nobodys);
    for (const verb of ['show', 'withdraw', 'correct 66 teeth', 'confirm']) {
      const [word = '', ...more] = verb.split(' ');
      const line = `/knurl result ${word} R1 ${more.join(' ')}`;
      const answer = await ask(line, { shop: 'south', who: 'Olga' });
      expect(refusalOf(answer)).toMatchObject({ code: 'notFound', what: 'result', nearest: [] });
    }
  });

  it('says teeth, crest and growth against the card, what is learned, and what is next', async () => {
    const { ask } = await deskOn(engine);
    await ask('/shop wheels add A1 straight 21tpi parts 100');
    const card = await ask('1.000 straight 1018 wheel A1');
    const text = textOf(
      await ask('/knurl result good 65 teeth crest 1.0035 height 0.0214 40 parts'),
    );
    expect(text).toContain('Counted 65 counted, 65 worked out');
    expect(text).toMatch(/Crests 1\.0035 in \[25\.489 mm\] measured, 1\.0010 to 1\.0060 expected/u);
    expect(text).toMatch(/Growth 9\d(\.\d)? % of the static growth, 95 % expected/u);
    expect(text).toMatch(/The next card of a straight knurl in steel expects 9\d(\.\d)? %/u);
    expect(text).toContain('by 1 such result.');
    expect(text).toContain('A1: 140 parts run (40 more)');
    expect(text).toContain('Next part: the same again.');
    expect(codeOf(card)).not.toBe('');
    const wheel = async () => textOf(await ask('/shop wheels show A1'));
    expect(await wheel()).toContain('Parts run 140');
    await ask('/knurl result correct 30 parts');
    expect(await wheel()).toContain('Parts run 130');
    await ask('/knurl result withdraw');
    expect(await wheel()).toContain('Parts run 100');
  });

  it('names the likeliest cause where it went wrong, and counts the cause that was found', async () => {
    const { ask } = await deskOn(engine);
    await ask(LINE);
    const double = await ask('/knurl result double 66 teeth');
    expect(textOf(double)).toMatch(/Most likely /u);
    const trouble = choiceOf(double, 'whatIsBehind');
    const words = double.kind === 'card' ? double.card.choices[trouble]?.words : '';
    expect(textOf(await ask(words ?? ''))).toContain('Seen: double or split pattern.');
    for (let more = 0; more < 4; more += 1) await ask('/knurl result double cause second pass');
    const ranked = await ask('/knurl trouble double');
    const causes = (ranked.kind === 'card' ? ranked.card.lists?.['causes'] : []) as {
      readonly cause: string;
      readonly prior: number;
    }[];
    const pure = learnedPrior('doublePattern', { secondPass: 4 });
    for (const { cause, prior } of causes)
      expect(prior).toBeCloseTo(pure.find((each) => each.cause === cause)?.chance ?? 0, 12);
    expect(textOf(ranked)).toContain('4 causes that this shop has found are counted in.');
    await ask('/knurl result withdraw R5');
    expect(textOf(await ask('/knurl trouble double'))).toContain('3 causes');
  });

  it('wears the wheel, which trouble then knows of', async () => {
    const { ask } = await deskOn(engine);
    await ask('/shop wheels add A1 straight 21tpi parts 5000');
    await ask('1.000 straight 1018 wheel A1');
    await ask('/knurl result good 1500 parts');
    const evidence = async (words: string) => {
      const answer = await ask(`/knurl trouble double 1.000 straight 1018 ${words}`);
      const causes = (answer.kind === 'card' ? answer.card.lists?.['causes'] : []) as {
        readonly cause: string;
        readonly evidence: readonly { readonly number?: string; readonly value?: number }[];
      }[];
      return causes.find(({ cause }) => cause === 'dullWheel')?.evidence;
    };
    expect(await evidence('wheel A1')).toMatchObject([{ number: 'partsOnWheel', value: 6500 }]);
    expect(await evidence('wheel A1 wheel made 100')).toMatchObject([{ value: 100 }]);
    expect(await evidence('21tpi')).toEqual([]);
  });

  it('far from what was expected waits until an engineer stands by it', async () => {
    const { ask } = await deskOn(engine);
    await ask(LINE);
    const odd = await ask('/knurl result good 65 teeth crest 1.0130 height 0.0214', {
      who: 'Ines',
    });
    expect(textOf(odd)).toContain('Kept, and not learned from yet');
    expect(textOf(await ask(LINE))).toContain('1 result waits to be confirmed');
    expect(textOf(await ask('/knurl result list waiting'))).toContain('1 result waits');
    await ask('/shop people add Pavel');
    const operator = await ask('/knurl result confirm R1', { who: 'Pavel' });
    expect(refusalOf(operator)).toMatchObject({ code: 'notAllowed', role: 'engineer' });
    await ask('/shop people change Pavel engineer');
    const confirmed = await ask('/knurl result confirm', { who: 'Pavel' });
    expect(textOf(confirmed)).toContain('R1 confirmed');
    expect(textOf(confirmed)).toContain('by 1 such result.');
    expect(textOf(await ask('/knurl result confirm R1', { who: 'Pavel' }))).toContain(
      'the cards learn from it already',
    );
    expect(textOf(await ask('/knurl result show R1'))).toContain('Changed by Pavel');
  });

  it('is corrected by whoever logged it or an engineer, and never over another’s change', async () => {
    const { ask } = await deskOn(engine);
    const code = codeOf(await ask(LINE));
    await ask('/knurl result good 65 teeth');
    const other = await ask('/knurl result correct R1 66 teeth', { who: 'Pavel' });
    expect(refusalOf(other)).toMatchObject({ code: 'notAllowed', people: ['Ines'] });
    const own = await ask(`/knurl result ${code} good`, { who: 'Pavel' });
    expect(resultsIn(own)).toMatchObject([{ number: 2 }]);
    const corrected = await ask('/knurl result correct 66 teeth', { who: 'Pavel' });
    expect(resultsIn(corrected)).toMatchObject([{ number: 2, teeth: 66, version: 2 }]);
    expect(refusalOf(await ask('/knurl result correct R2 seen 1 64 teeth'))).toMatchObject({
      code: 'stale',
      what: 'R2',
      by: 'Pavel',
    });
    expect(refusalOf(await ask('/knurl result correct R2'))).toMatchObject({ parameter: 'change' });
    expect(textOf(await ask('/knurl result withdraw #2'))).toContain('R2 withdrawn');
    expect(refusalOf(await ask('/knurl result correct R2 65 teeth'))).toMatchObject({
      code: 'stale',
    });
    expect(textOf(await ask('/knurl result show 2'))).toContain('Withdrawn by Ines');
    expect(textOf(await ask('/knurl result list'))).toContain('The last 1 result');
  });

  it('is logged by the button of its own card, whoever presses it and whenever', async () => {
    const { ask, send } = await deskOn(engine);
    const card = await send({ words: LINE }, {}, 'the card');
    await ask('19mm diamond 1.0 pitch 304');
    const choice = choiceOf(card, 'logResult');
    const asked = card.kind === 'card' ? card.card.choices[choice]?.ask : [];
    expect(asked).toEqual(['outcome', 'count', 'crest', 'height', 'parts']);
    const added = { outcome: 'good', count: '65', crest: '1.0035', height: '0.0214', parts: '12' };
    const pressed = { of: 'the card', choice, added };
    const logged = await send({ pressed }, { who: 'Pavel', channel: 'office' }, 'pressed');
    expect(textOf(logged)).toContain(`R1 logged: good, card ${codeOf(card)}`);
    expect(resultsIn(logged)).toMatchObject([{ teeth: 65, partsRun: 12, standing: 'learned' }]);
    const twice = await send({ pressed }, { who: 'Pavel', channel: 'office' }, 'pressed');
    expect(twice).toEqual(logged);
    // The card that is shown again carries its code as well.
    const again = await ask(`/knurl card ${codeOf(card)}`);
    const shown = again.kind === 'card' ? again.card.choices[choiceOf(again, 'logResult')] : null;
    expect(shown?.words).toBe(`/knurl result log card ${codeOf(card)}`);
  });

  it('is not offered where nothing is kept, and set-ups there say nothing of results', async () => {
    const { openDesk, plainShop } = await import('../../../src/desk/index.ts');
    const desk = openDesk(FLEET, plainShop('in'));
    const call = (words: string): Call => ({
      shop: '',
      person: { id: 'x', name: 'x' },
      place: { channel: 'x', thread: null, isPrivate: true },
      interactionId: words,
      given: { words },
    });
    const card = await desk.answer(call(LINE));
    expect(choiceOf(card, 'logResult')).toBe(-1);
    expect(textOf(card)).not.toContain('results of this shop');
    expect(refusalOf(await desk.answer(call('/knurl result good')))).toMatchObject({
      code: 'unavailable',
    });
  });
});

/** Crests and heights of parts, good ones and one that waits. */
const PARTS: readonly string[] = [
  'crest 1.0035 height 0.0214',
  'crest 1.0020 height 0.0210',
  'crest 1.0130 height 0.0214',
  'crest 1.0028 flat 0.0050',
];

describe.each(ENGINES)('what the cards expect, %s', (engine) => {
  const requestBehind = async ({ store }: TestDesk, answer: Answer): Promise<SetupRequest> => {
    const id = await shopOf(store.read, { platform: 'terminal', id: 'north' });
    const card = await findCard(viewShop(store.read, id ?? '', WORDS), codeOf(answer));
    return good(card).request as SetupRequest;
  };

  it('is what the pure calculation makes of the same results: set-up, check and plan', async () => {
    const desk = await deskOn(engine);
    const { ask } = desk;
    const seen: GrowthResult[] = [];
    await ask(LINE);
    for (const part of PARTS) {
      const [result] = resultsIn(await ask(`/knurl result good ${part}`));
      const { family, share } = result ?? { family: null, share: null };
      if (family === null || share === null) throw new Error(`${part} says nothing of growth`);
      seen.push({ family, share, confirmed: false });
    }
    const family = growthFamily({ kind: 'straight' }, 'steel');
    const { mean, sd, results } = growthBelief(seen, family);
    expect(results).toBe(3);
    const growth = { mean, sd, results };

    const setup = await ask(LINE);
    const request = await requestBehind(desk, setup);
    expect(request.growth).toEqual(growth);
    const pure = setUp({ ...request, growth });
    for (const name of ['growthFactor', 'crestDiameter', 'crestDiameterLow', 'crestDiameterHigh'])
      expect(figureOf(setup, name)).toBe(pure.figures[name as 'growthFactor']?.value);
    const stands = 'Growth by 3 results of this shop, 3 of a straight knurl in steel. 1 more waits';
    expect(textOf(setup)).toContain(stands);

    const why = textOf(await ask('/knurl why growth factor'));
    expect(why).toContain(stands);
    expect(textOf(await ask('/knurl why crest diameter'))).toContain(stands);
    expect(textOf(await ask('/knurl why infeed'))).not.toContain('results of this shop');

    const check = await ask('/knurl check 0.9852 straight 21tpi 1018 crest 1.0035');
    const checked = await requestBehind(desk, check);
    const part = { blank: mm(0.9852 * 25.4), teeth: null, crest: mm(1.0035 * 25.4) };
    const after = checkAfter(
      { ...checked, asIs: true, growth },
      { ...part, toothHeight: null, flat: null, ends: null },
    );
    for (const name of ['growthFactorExpected', 'crestDiameter', 'fillFromCrest'] as const)
      expect(figureOf(check, name)).toBe(after.figures[name]?.value);
    expect(textOf(check)).toContain(stands);

    const planned = await ask('/knurl plan finish 0.995-1.005 straight 96dp 1018 long 0.2');
    const job = await requestBehind(desk, planned);
    expect(job.growth).toEqual(growth);
    const [best] = plan({
      job: { ...job, growth },
      limits: job.finish ?? { low: mm(0), high: mm(0) },
      pitchTolerance: PITCH_TOLERANCE,
      included: null,
      crib: [...dinCrib(), ...dpCrib()],
      turningSpread: TURNING_SPREAD,
    }).candidates;
    expect(figureOf(planned, 'chanceLands')).toBe(best?.chanceLands);
    expect(figureOf(planned, 'fill')).toBe(best?.fill);
    expect(textOf(planned)).toContain(stands);
  });

  it('is as before once all of them are withdrawn', async () => {
    const { ask } = await deskOn(engine);
    const before = await ask(LINE);
    for (const part of PARTS) await ask(`/knurl result good ${part}`);
    expect(figureOf(await ask(LINE), 'crestDiameter')).not.toBe(figureOf(before, 'crestDiameter'));
    for (const number of [2, 4, 1, 3]) await ask(`/knurl result withdraw ${String(number)}`);
    const after = await ask(LINE);
    expect(after.kind === 'card' && after.card.figures).toEqual(
      before.kind === 'card' && before.card.figures,
    );
    expect(textOf(after)).toContain('no results of this shop behind it yet');
  });
});
