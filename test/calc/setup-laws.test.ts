import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { STANDING_CAUTIONS } from '../../src/calc/caution.ts';
import { blankForCrest, heightFromRoundInfeed } from '../../src/calc/growth/index.ts';
import { formOf } from '../../src/calc/pattern.ts';
import {
  SETUP_FIGURES,
  type SetupFigureName,
  type SetupRequest,
  type SetupResult,
  setUp,
} from '../../src/calc/setup/index.ts';
import { toothCount } from '../../src/calc/teeth.ts';
import { mm, OutOfRange } from '../../src/calc/units.ts';
import { anySetup } from '../support/anySetup.ts';
import { near } from '../support/near.ts';

/** The set-up, or null where it is refused as outside what makes sense. */
const answered = (request: SetupRequest): SetupResult | null => {
  try {
    return setUp(request);
  } catch (error) {
    if (error instanceof OutOfRange) return null;
    throw error;
  }
};

const valueOf = (result: SetupResult, name: SetupFigureName): number =>
  result.figures[name]?.value ?? Number.NaN;

/** Holds a law of every set-up that is answered, and that most of them are. */
const always = (law: (result: SetupResult, request: SetupRequest) => void): void => {
  let asked = 0;
  let refused = 0;
  fc.assert(
    fc.property(anySetup, (request) => {
      const result = answered(request);
      asked += 1;
      if (result === null) refused += 1;
      else law(result, request);
    }),
    { numRuns: 200 },
  );
  expect(refused).toBeLessThan(asked / 5);
};

describe('every set-up', () => {
  it('turns the bar down, never up', () => {
    always((result, { stock }) => {
      expect(valueOf(result, 'blankDiameter')).toBeLessThanOrEqual(stock! * (1 + 1e-12));
    });
  });

  it('comes out whole, unless the bar is left as it is', () => {
    always((result, { asIs }) => {
      const blank = mm(valueOf(result, 'blankDiameter'));
      const teeth = toothCount(blank, mm(valueOf(result, 'transversePitch')));
      if (asIs) expect(Math.round(teeth)).toBe(valueOf(result, 'toothCount'));
      else expect(Math.abs(teeth - valueOf(result, 'toothCount'))).toBeLessThan(1e-9);
    });
  });

  it('has a window as wide on one side as on the other', () => {
    always((result, { asIs }) => {
      const [low, high] = [valueOf(result, 'blankWindowLow'), valueOf(result, 'blankWindowHigh')];
      const middle = (low + high) / 2;
      const transverse = valueOf(result, 'transversePitch');
      expect(toothCount(mm(middle), mm(transverse))).toBeCloseTo(valueOf(result, 'toothCount'), 8);
      if (!asIs) near(middle, valueOf(result, 'blankDiameter'), 1e-12);
    });
  });

  it('has a tooth that its own infeed and growth lead back to', () => {
    always((result, { pattern }) => {
      const form = formOf(pattern);
      const blankDiameter = mm(valueOf(result, 'blankDiameter'));
      const sharpHeight = mm(valueOf(result, 'sharpHeight'));
      const height = mm(valueOf(result, 'toothHeight'));
      near(height, valueOf(result, 'fill') * sharpHeight, 1e-12);
      near(
        valueOf(result, 'crestFlat'),
        valueOf(result, 'pitch') * (1 - valueOf(result, 'fill')),
        1e-12,
      );
      if (result.process === 'cut') {
        expect(valueOf(result, 'infeed')).toBe(height);
        expect(valueOf(result, 'crestDiameter')).toBe(blankDiameter);
        expect(valueOf(result, 'growth')).toBe(0);
        expect(result.figures.growthFactor).toBeNull();
        return;
      }
      const infeed = mm(valueOf(result, 'infeed'));
      // Near full form the infeed hardly moves with the height, which costs half its digits.
      const back = heightFromRoundInfeed({ form, blankDiameter, infeed, sharpHeight });
      near(back!, height, 1e-5);
      const crestDiameter = mm(blankDiameter + valueOf(result, 'growth'));
      const blank = blankForCrest({ form, crestDiameter, height, sharpHeight });
      near(blank, blankDiameter, 1e-9);
      near(
        valueOf(result, 'crestDiameter'),
        blankDiameter + valueOf(result, 'growthFactor') * valueOf(result, 'growth'),
        1e-12,
      );
      expect(valueOf(result, 'crestDiameterLow')).toBeLessThan(valueOf(result, 'crestDiameter'));
      expect(valueOf(result, 'crestDiameterHigh')).toBeGreaterThan(
        valueOf(result, 'crestDiameter'),
      );
    });
  });

  it('offers the next three whole blanks below its own', () => {
    always((result, request) => {
      const transverse = mm(valueOf(result, 'transversePitch'));
      const blank = valueOf(result, 'blankDiameter');
      const below = Math.ceil(toothCount(mm(blank), transverse) - 1e-6) - 1;
      expect(result.alternatives.map((each) => each.toothCount)).toEqual(
        [below, below - 1, below - 2].filter((teeth) => teeth >= 3),
      );
      for (const { toothCount: wantedTeeth, blankDiameter } of result.alternatives) {
        const taken = answered({ ...request, asIs: false, wantedTeeth });
        if (taken !== null) near(valueOf(taken, 'blankDiameter'), blankDiameter, 1e-12);
      }
    });
  });

  it('has every figure, each finite with its own unit, or null', () => {
    always((result) => {
      expect(Object.keys(result.figures)).toEqual(Object.keys(SETUP_FIGURES));
      for (const [name, figure] of Object.entries(result.figures)) {
        if (figure === null) continue;
        expect(Number.isFinite(figure.value), name).toBe(true);
        expect(figure.unit).toBe(SETUP_FIGURES[name as SetupFigureName]);
      }
      for (const check of result.checks)
        for (const [name, figure] of Object.entries(check.figures))
          if (figure !== null)
            expect(Number.isFinite(figure.value), `${check.name} ${name}`).toBe(true);
      expect(new Set(result.checks.map(({ name }) => name)).size).toBe(result.checks.length);
    });
  });

  it('has the standing cautions, and each caution once', () => {
    always(({ cautions }) => {
      expect(cautions.slice(0, STANDING_CAUTIONS.length)).toEqual([...STANDING_CAUTIONS]);
      expect(new Set(cautions).size).toBe(cautions.length);
    });
  });

  it('takes a whole batch as long as its parts', () => {
    always((result, request) => {
      const one = setUp({ ...request, batch: 1 });
      if (one.figures.time === null) expect(result.figures.time).toBeNull();
      else near(valueOf(result, 'time'), request.batch * valueOf(one, 'time'), 1e-12);
    });
  });

  it('worked out again for its own blank as the bar stays what it is', () => {
    always((result, request) => {
      const blank = mm(valueOf(result, 'blankDiameter'));
      const again = answered({ ...request, stock: blank });
      // Force and tooth are those of the blank, so nothing may refuse it now.
      expect(again).not.toBeNull();
      expect(valueOf(again!, 'toothCount')).toBe(valueOf(result, 'toothCount'));
      near(valueOf(again!, 'crestDiameter'), valueOf(result, 'crestDiameter'), 1e-9);
      near(valueOf(again!, 'infeed'), valueOf(result, 'infeed'), 1e-9);
    });
  });
});

describe('more fill', () => {
  const fills = fc.double({ min: 0.1, max: 1, noNaN: true });

  it('never takes less infeed, nor leaves a wider flat, nor a smaller static growth', () => {
    fc.assert(
      fc.property(anySetup, fills, fills, (request, a, b) => {
        const [less, more] = a < b ? [a, b] : [b, a];
        const shallow = answered({ ...request, fill: less });
        const deep = answered({ ...request, fill: more });
        fc.pre(shallow !== null && deep !== null);
        expect(valueOf(deep, 'blankDiameter')).toBe(valueOf(shallow, 'blankDiameter'));
        const slack = 1e-12 * valueOf(deep, 'blankDiameter');
        expect(valueOf(deep, 'infeed')).toBeGreaterThanOrEqual(valueOf(shallow, 'infeed') - slack);
        expect(valueOf(deep, 'crestFlat')).toBeLessThanOrEqual(valueOf(shallow, 'crestFlat'));
        if (deep.process === 'form')
          expect(valueOf(deep, 'growth')).toBeGreaterThanOrEqual(
            valueOf(shallow, 'growth') - slack,
          );
      }),
      { numRuns: 200 },
    );
  });

  it('never goes past the infeed of full form', () => {
    always((result) => {
      const full = result.figures.fullInfeed;
      if (full !== null)
        expect(valueOf(result, 'infeed')).toBeLessThanOrEqual(full.value * (1 + 1e-12));
    });
  });
});
