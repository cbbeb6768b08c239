import { describe, expect, it } from 'vitest';
import {
  CAUSE_IDS,
  type CauseId,
  NO_FACTS,
  type RankedCause,
  rankCauses,
  troubleFacts,
} from '../../src/calc/trouble/index.ts';
import { mulberry32 } from '../support/random.ts';
import { troubleWith } from '../support/troubleShop/index.ts';

const SETUPS = 2000;

const placeOf = (ranked: readonly RankedCause[], cause: CauseId): number => {
  const at = ranked.findIndex((each) => each.cause === cause);
  return at < 0 ? Number.POSITIVE_INFINITY : at + 1;
};

describe('set-ups with one planted cause each', () => {
  it('the numbers bring it to the front, words alone among the first five', () => {
    const random = mulberry32(2000);
    const places = Array.from({ length: SETUPS }, (_, i) => {
      // Every cause as often as any other, the ones without a number of their own too.
      const cause = CAUSE_IDS[i % CAUSE_IDS.length]!;
      const { symptom, request, result, seen } = troubleWith(random, cause);
      const facts = troubleFacts(request, result, seen);
      return {
        byNumbers: placeOf(rankCauses(symptom, facts, {}), cause),
        byWords: placeOf(rankCauses(symptom, NO_FACTS, {}), cause),
      };
    });
    const share = (found: (place: (typeof places)[number]) => boolean) =>
      places.filter(found).length / SETUPS;
    const first = share(({ byNumbers }) => byNumbers === 1);
    const three = share(({ byNumbers }) => byNumbers <= 3);
    const wordsFirst = share(({ byWords }) => byWords === 1);
    const wordsFive = share(({ byWords }) => byWords <= 5);
    const percent = (of: number) => `${(100 * of).toFixed(1)} %`;
    console.log(
      `planted cause first ${percent(first)}, in three ${percent(three)}; by words alone first ${percent(wordsFirst)}, in five ${percent(wordsFive)}`,
    );
    expect(three).toBeGreaterThanOrEqual(0.85);
    expect(first).toBeGreaterThanOrEqual(0.6);
    expect(wordsFive).toBeGreaterThanOrEqual(0.85);
    // The numbers have to be worth asking for.
    expect(first).toBeGreaterThan(wordsFirst + 0.15);
  });
});
