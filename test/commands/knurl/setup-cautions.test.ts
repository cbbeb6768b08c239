import { describe, expect, it } from 'vitest';
import { CHOSEN_CAUTIONS, type ChosenCaution, STANDING_CAUTIONS } from '../../../src/calc/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { cardFor, checkOf, textOf } from '../../support/desk.ts';

const JOB = '1.0 in straight 21 tpi 1018';

/** Lines that are alike but for one thing, and what beside the standing cautions each calls for. */
const TABLE: readonly (readonly [line: string, calls: readonly ChosenCaution[]])[] = [
  [JOB, []],
  // evidence: over 3 diameters without tailstock or centres (common practice); blank 0.9852 in
  [`${JOB} out 2.9 opposed`, []],
  [`${JOB} out 3.0 opposed`, ['supportBar']],
  [`${JOB} out 3.0 opposed tailstock`, []],
  [`${JOB} out 3.0 opposed centers`, []],
  // evidence: any bending not fine (common practice), and then the force is uncertain (judgement)
  ['0.375 straight 21tpi 304 out 1.1 long 1', ['supportBar', 'forceUncertain']],
  // evidence: bar longer than stickout + 300 mm (reported)
  [`${JOB} bar length 300 mm`, []],
  [`${JOB} bar length 301 mm`, ['barBehindSpindle']],
  [`${JOB} bar length 350 mm out 50 mm opposed`, []],
  [`${JOB} bar length 351 mm out 50 mm opposed`, ['barBehindSpindle']],
  // evidence: material with its own fill, or fill above 0.92 (common practice)
  ['1.0 in straight 21 tpi brass', ['flaking']],
  ['1.0 in straight 21 tpi 7075', ['flaking']],
  [`${JOB} fill 92%`, []],
  [`${JOB} fill 93%`, ['flaking']],
  // evidence: above 1500 rev/min (judgement)
  ['0.2 in straight 96dp 1018 1500 rpm', []],
  ['0.2 in straight 96dp 1018 1501 rpm', ['chuckSpeed']],
  // evidence: titanium or magnesium (reported)
  ['1.0 in straight 21 tpi ti64', ['fireChips']],
  ['1.0 in straight 21 tpi titanium', ['fireChips']],
  ['1.0 in straight 21 tpi magnesium', ['fireChips']],
  // evidence: bore said (derived)
  [`${JOB} bore 0.25 in plug`, ['tubePinch']],
  // evidence: pin not fine (judgement)
  [`${JOB} speed 170 sfm`, ['hotPin', 'forceUncertain']],
];

const chosen = async (line: string): Promise<readonly string[]> => {
  const { card } = await cardFor(line);
  return CHOSEN_CAUTIONS.filter((id) => card.cautions.includes(id));
};

describe('cautions by words', () => {
  it.each(TABLE)('%s: %j', async (line, calls) => {
    expect(await chosen(line)).toEqual(CHOSEN_CAUTIONS.filter((id) => calls.includes(id)));
  });

  it('all that words can call for are called for', () => {
    const called = new Set(TABLE.flatMap(([, calls]) => calls));
    expect(CHOSEN_CAUTIONS.filter((id) => !called.has(id))).toEqual(['handTurn']);
  });

  it('hot pins and bent bars are so by their checks', async () => {
    expect(checkOf(await cardFor(`${JOB} speed 170 sfm`), 'pinHeat')).not.toMatch(/^fine/u);
    const bent = await cardFor('0.375 straight 21tpi 304 out 1.1 long 1');
    expect(checkOf(bent, 'bending')).not.toMatch(/^fine/u);
  });
});

describe('on every set-up card', () => {
  it.each([...TABLE.map(([line]) => line), '0.1 14tpi straight', '1.0 straight 21tpi form pom'])(
    '%s: the standing six, what this one calls for, and what goes before it',
    async (line) => {
      const answer = await cardFor(line);
      const { cautions, parts } = answer.card;
      expect(cautions.slice(0, 6)).toEqual([...STANDING_CAUTIONS]);
      expect(new Set(cautions).size).toBe(cautions.length);
      expect(parts.at(-1)?.part).toBe('footing');
      const part = parts.find((each) => each.part === 'cautions');
      expect(part?.all).toEqual(cautions);
      expect([...(part?.shown ?? []), ...(part?.rest ?? [])]).toEqual(cautions.slice(6));
      expect(part?.shown.length).toBeLessThanOrEqual(3);
      const text = textOf(answer).replaceAll(/\s+/gu, ' ');
      expect(text).toContain(en.standing);
      expect(text).toContain(en.footing);
      for (const id of cautions.slice(6)) expect(text).toContain(en.cautions[id]);
    },
  );

  it('the six in one breath name each of them', () => {
    const words = [
      /guard/iu,
      /gloves.*sleeves.*rings/iu,
      /eyes/iu,
      /key out/iu,
      /stopped/iu,
      /oil/iu,
    ];
    for (const word of words) expect(en.standing).toMatch(word);
  });
});
