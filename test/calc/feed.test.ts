import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  contactWidth,
  cutFeedCheck,
  FASTEST_FEED,
  feedWindow,
  formedFeedCheck,
  type HardeningClass,
  infeedPerTurn,
  plungeTime,
  plungeTurns,
  SLOWEST_FEED,
  TURNS_ON_A_SPOT,
  traverseTime,
} from '../../src/calc/feed.ts';
import { mm, mmPerRev, OutOfRange, revPerMin } from '../../src/calc/units.ts';
import { FEED_WINDOWS, TRAVERSE } from '../reference/speed-and-feed.ts';
import { sixDigits } from '../support/digits.ts';

const CLASSES: readonly HardeningClass[] = ['low', 'medium', 'high'];

describe('feed window', () => {
  // evidence: worked examples E2
  it.each(FEED_WINDOWS)('of $width mm at pitch $pitch, $hardening hardening', (of) => {
    const window = feedWindow(mm(of.width), mm(of.pitch), of.hardening);
    expect({
      low: sixDigits(window.low),
      high: sixDigits(window.high),
      open: window.open,
    }).toEqual({ low: of.low, high: of.high, open: of.open });
  });

  it('is 0.005 to 0.030 in a turn where nothing else binds', () => {
    // evidence: common practice
    const inches = [SLOWEST_FEED, FASTEST_FEED].map((feed) => (feed / 25.4).toFixed(3));
    expect(inches).toEqual(['0.005', '0.030']);
  });

  const widths = fc.double({ min: 0.2, max: 40, noNaN: true }).map(mm);
  const pitches = fc.double({ min: 0.2, max: 3.2, noNaN: true }).map(mm);
  const classes = fc.constantFrom(...CLASSES);

  it('open: every feed in it gives the spot its turns, and the middle is taken', () => {
    fc.assert(
      fc.property(widths, pitches, classes, (width, pitch, hardening) => {
        const { open, low, high, feed, openingWidth } = feedWindow(width, pitch, hardening);
        fc.pre(open);
        const [fewest, most] = TURNS_ON_A_SPOT[hardening];
        expect(width / high).toBeGreaterThanOrEqual(fewest * (1 - 1e-12));
        expect(width / low).toBeLessThanOrEqual(most * (1 + 1e-12));
        expect(low).toBeGreaterThanOrEqual(SLOWEST_FEED);
        expect(high).toBeLessThanOrEqual(FASTEST_FEED);
        expect(feed).toBeCloseTo((low + high) / 2, 12);
        expect(openingWidth).toBeNull();
        expect(formedFeedCheck(feed, { ...feedWindow(width, pitch, hardening) }).state).toBe(
          'fine',
        );
      }),
    );
  });

  it('closed: the upper end is taken, never under 0.13, and watched; the width named opens it', () => {
    fc.assert(
      fc.property(widths, pitches, classes, (width, pitch, hardening) => {
        const window = feedWindow(width, pitch, hardening);
        fc.pre(!window.open);
        expect(window.feed).toBe(Math.max(SLOWEST_FEED, window.high));
        expect(formedFeedCheck(window.feed, window)).toMatchObject({
          state: 'watch',
          reason: 'noWindow',
        });
        const opening = window.openingWidth!;
        expect(feedWindow(mm(opening * 1.000001), pitch, hardening).open).toBe(opening > width);
        expect(feedWindow(mm(opening * 0.999999), pitch, hardening).open).toBe(opening < width);
      }),
    );
  });

  it('a coarser pitch never wants more feed', () => {
    fc.assert(
      fc.property(widths, pitches, pitches, classes, (width, a, b, hardening) => {
        const [fine, coarse] = a < b ? [a, b] : [b, a];
        const at = (pitch: typeof a) => feedWindow(width, pitch, hardening);
        expect(at(coarse).high).toBeLessThanOrEqual(at(fine).high);
      }),
    );
  });

  // evidence: judgement: 0.76 min(1, 1/p)
  it.each([
    [40, 0.5, 'low', 'envelope'],
    [40, 2, 'low', 'coarsePitch'],
    [5, 1, 'low', 'turns'],
  ] as const)('%d mm at pitch %d, %s: %s binds', (width, pitch, hardening, rule) => {
    expect(feedWindow(mm(width), mm(pitch), hardening).boundBy).toBe(rule);
  });
});

describe('a feed that was asked for', () => {
  const window = feedWindow(mm(6), mm(1), 'low');

  it('is watched outside the window', () => {
    expect(formedFeedCheck(window.low, window).state).toBe('fine');
    expect(formedFeedCheck(window.high, window).state).toBe('fine');
    expect(formedFeedCheck(mmPerRev(window.low - 0.001), window)).toMatchObject({
      state: 'watch',
      reason: 'asked',
    });
    expect(formedFeedCheck(mmPerRev(window.high + 0.001), window).state).toBe('watch');
  });

  // evidence: judgement: 0.05 to 0.30 mm/rev to cut
  it.each([
    [0.049, 'watch'],
    [0.05, 'fine'],
    [0.15, 'fine'],
    [0.3, 'fine'],
    [0.301, 'watch'],
  ] as const)('%d mm/rev to cut: %s', (feed, state) => {
    expect(cutFeedCheck(mmPerRev(feed)).state).toBe(state);
  });
});

describe('a plunge', () => {
  it('takes 15, 12 or 8 turns', () => {
    // evidence: middle of 10–20, 8–15, 5–10 (common practice), rounded up
    expect(CLASSES.map(plungeTurns)).toEqual([15, 12, 8]);
  });

  it('is done when its turns are: first bite, even infeed, three turns of nothing', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 2, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.integer({ min: 5, max: 500 }),
        (infeed, share, turns) => {
          const bite = share * infeed;
          const each = infeedPerTurn(mm(infeed), mm(bite), turns);
          expect(bite + (turns - 1 - 3) * each).toBeCloseTo(infeed, 9);
        },
      ),
    );
  });

  it('has nothing left to feed where the first bite is the whole', () => {
    expect(infeedPerTurn(mm(0.1), mm(0.12), 15)).toBe(0);
    expect(() => infeedPerTurn(mm(0.3), mm(0.1), 4)).toThrow(OutOfRange);
  });
});

describe('time', () => {
  it('of a traverse', () => {
    // evidence: worked example E3
    const { length, feed, rotation, time } = TRAVERSE;
    const found = traverseTime({
      length: mm(length),
      width: mm(0),
      feed: mmPerRev(feed),
      rotation: revPerMin(rotation),
    });
    expect(sixDigits(found)).toBe(time);
  });

  it('is the turns over the spindle speed, whichever way the wheel goes', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 300, noNaN: true }),
        fc.double({ min: 0.05, max: 1, noNaN: true }),
        fc.double({ min: 1, max: 3000, noNaN: true }),
        (length, feed, rotation) => {
          const travelled = traverseTime({
            length: mm(length),
            width: mm(6),
            feed: mmPerRev(feed),
            rotation: revPerMin(rotation),
          });
          const turned = plungeTime((length + 6) / feed, revPerMin(rotation));
          expect(travelled / turned).toBeCloseTo(1, 12);
        },
      ),
    );
  });

  it('makes no sense with a spindle that stands', () => {
    expect(() => plungeTime(15, revPerMin(0))).toThrow(OutOfRange);
    expect(() => plungeTime(0, revPerMin(100))).toThrow(OutOfRange);
    const of = { length: mm(30), width: mm(6), feed: mmPerRev(0), rotation: revPerMin(100) };
    expect(() => traverseTime(of)).toThrow(OutOfRange);
  });
});

describe('contact width', () => {
  it('is the face without its bevels', () => {
    // evidence: default wheel 20 x 8 x 6 mm with a bevel of 1 mm a side
    expect(contactWidth(mm(8), mm(1))).toBe(6);
    expect(contactWidth(mm(8), mm(0))).toBe(8);
  });

  it('cannot be less than nothing', () => {
    expect(() => contactWidth(mm(8), mm(4.1))).toThrow(OutOfRange);
    expect(() => contactWidth(mm(0), mm(0))).toThrow(OutOfRange);
    expect(() => contactWidth(mm(8), mm(-1))).toThrow(OutOfRange);
  });
});
