import { describe, expect, test } from 'vitest';
import { inch, materialById, mm, type SetupRequest } from '../../src/calc/index.ts';
import { drawPicture, type PictureNumbers } from '../../src/drawing/index.ts';
import { en, showIn } from '../../src/phrases/index.ts';
import { requestOf } from '../support/setupRequest.ts';
import { elementsOf, figure, figures, lengthOf, num, pointsOf, type Read } from './read.ts';
import { manySetups, picturesOf, spokenIn, svgOf } from './setups.ts';

/** A tenth of a per cent. */
const sameShare = (drawn: number, said: number, slack = 0): void => {
  expect(Math.abs(drawn - said)).toBeLessThanOrEqual(0.001 * Math.abs(said) + slack);
};
/** Coordinates are written with four decimals. */
const WRITTEN = 2e-4;

const radiusOf = (arc: Read): number => Number(/A(-?[\d.]+)/u.exec(arc.at['d'] ?? '')?.[1]);
const endsOf = (arc: Read) => {
  const [a = [], b = []] = [
    ...(arc.at['d'] ?? '').matchAll(/(?:M|A[\d.]+ [\d.]+ 0 [01] [01] )(-?[\d.]+) (-?[\d.]+)/gu),
  ].map(([, x, y]) => [Number(x), Number(y)]);
  return Math.hypot((a[0] ?? 0) - (b[0] ?? 0), (a[1] ?? 0) - (b[1] ?? 0));
};

type Numbers<K extends keyof PictureNumbers> = {
  readonly numbers: PictureNumbers[K];
  readonly svg: string;
};
const drawn = <K extends keyof PictureNumbers>(
  kind: K,
  request?: SetupRequest,
): readonly Numbers<K>[] => {
  const all = request === undefined ? manySetups(120) : [picturesOf(request) ?? []];
  return all.flatMap((pictures) =>
    spokenIn('mm', pictures)
      .filter((each) => each.kind === kind)
      .map((each) => ({ numbers: each.numbers as PictureNumbers[K], svg: svgOf(each) })),
  );
};

describe('tooth form', () => {
  test('height, infeed, rise, pitch and both diameters stand to each other as their figures do', () => {
    for (const { numbers: n, svg } of drawn('toothForm')) {
      const height = lengthOf(figure(svg, 'toothHeight'));
      const scale = height / n.toothHeight;
      sameShare(lengthOf(figure(svg, 'infeed')), n.infeed * scale, WRITTEN);
      const rises = figures(svg, 'rise');
      for (const rise of rises)
        sameShare(lengthOf(rise), ((n.crestDiameter - n.blankDiameter) / 2) * scale, WRITTEN);
      sameShare(radiusOf(figure(svg, 'blankDiameter')), (n.blankDiameter / 2) * scale, WRITTEN);
      sameShare(radiusOf(figure(svg, 'crestDiameter')), (n.crestDiameter / 2) * scale, WRITTEN);
      // The pitch lies along the blank: from its chord back to the arc.
      const arc = figure(svg, 'transversePitch');
      const radius = radiusOf(arc);
      const along = 2 * radius * Math.asin(endsOf(arc) / (2 * radius));
      sameShare(along, n.transversePitch * scale, 0.01);
    }
  });

  test('as many teeth are drawn as are said to be, each from groove to groove', () => {
    for (const { svg } of drawn('toothForm')) {
      const outline = elementsOf(svg).find((each) => each.at['data-teeth'] !== undefined);
      if (outline === undefined) throw new Error('no outline');
      const teeth = (pointsOf(outline).length - 1) / 3;
      expect(teeth).toBe(num(outline, 'data-teeth'));
      expect(svg).toMatch(new RegExp(`>${String(teeth)} of \\d+ teeth, to scale`, 'u'));
    }
  });

  test('the flat on the crest of the worked card is as wide as its figure', () => {
    // evidence: 21 TPI at 90 %: flat p (1 − 0.9) = 0.00476 in, by similar triangles
    const request = requestOf({ pitch: { system: 'tpi', value: 21 }, stock: inch(1) });
    const [{ svg, numbers: n } = { svg: '', numbers: null }] = drawn('toothForm', request);
    const outline = elementsOf(svg).find((each) => each.at['data-teeth'] !== undefined);
    const [, a = [0, 0], b = [0, 0]] = outline === undefined ? [] : pointsOf(outline);
    const scale = lengthOf(figure(svg, 'toothHeight')) / (n?.toothHeight ?? 0);
    sameShare(Math.hypot(a[0] - b[0], a[1] - b[1]), (25.4 / 21) * 0.1 * scale, 0.001);
  });
});

describe('tracking strip', () => {
  test('every mark is a whole count, and the windows are as wide as what tracks', () => {
    for (const { numbers: n, svg } of drawn('trackingStrip')) {
      const step = n.transversePitch / Math.PI;
      const ticks = figures(svg, 'wholeCount');
      expect(ticks.length).toBeGreaterThan(0);
      const counts = ticks.map((tick) => num(tick, 'data-count'));
      // Neighbours of one stretch are a whole tooth apart.
      ticks.forEach((tick, i) => {
        const next = ticks[i + 1];
        if (next === undefined || counts[i + 1] !== (counts[i] ?? 0) + 1) return;
        sameShare(num(next, 'x1') - num(tick, 'x1'), step * num(tick, 'data-scale'), 0.001);
      });
      const whole = figures(svg, 'window')[Math.floor(ticks.length / 2)];
      const tick = ticks[Math.floor(ticks.length / 2)];
      if (whole === undefined || tick === undefined) throw new Error('no window');
      const widest = (n.below + n.above) * num(tick, 'data-scale');
      expect(num(whole, 'width')).toBeLessThanOrEqual(widest * 1.001 + WRITTEN);
    }
  });

  test('the arrow of a check ends on the next whole count, as far off as what is to be turned away', () => {
    const step = inch(1 / 21) / Math.PI;
    const numbers = {
      transversePitch: inch(1 / 21),
      below: mm(step / 10),
      above: mm(step / 10),
      wholeAt: null,
      marks: [{ what: 'bar', diameter: inch(0.995) }],
      expected: null,
      next: { from: inch(0.995), to: mm(65 * step), off: mm(inch(0.995) - 65 * step) },
    } as const;
    const svg = drawPicture(
      'trackingStrip',
      numbers,
      en.pictures.trackingStrip.words(numbers, showIn('in')),
    );
    const arrow = figure(svg, 'next');
    const whole = figures(svg, 'wholeCount').find((tick) => num(tick, 'data-count') === 65);
    const other = figures(svg, 'wholeCount').find((tick) => num(tick, 'data-count') === 66);
    expect(num(arrow, 'x2')).toBeCloseTo(num(whole, 'x1'), 3);
    const scale = (num(other, 'x1') - num(whole, 'x1')) / step;
    sameShare(lengthOf(arrow), (inch(0.995) - 65 * step) * scale, WRITTEN);
    const window = figures(svg, 'window')[0];
    sameShare(num(window, 'width'), (step / 5) * scale, WRITTEN);
  });

  test('a part stands at its crest diameter, beside what was expected of it, on the scale of the counts', () => {
    const step = inch(1 / 21) / Math.PI;
    const numbers = {
      transversePitch: inch(1 / 21),
      wholeAt: null,
      below: mm(step / 10),
      above: mm(step / 10),
      marks: [
        { what: 'blank', diameter: mm(65 * step) },
        { what: 'part', diameter: inch(1.004) },
      ],
      expected: { low: inch(1.001), high: inch(1.0059) },
      next: null,
    } as const;
    const said = en.pictures.trackingStrip;
    const svg = drawPicture('trackingStrip', numbers, said.words(numbers, showIn('in')));
    const [whole, other] = [65, 66].map((count) =>
      figures(svg, 'wholeCount').find((tick) => num(tick, 'data-count') === count),
    );
    const scale = (num(other, 'x1') - num(whole, 'x1')) / step;
    const expected = figure(svg, 'expected');
    sameShare(num(expected, 'width'), inch(1.0059 - 1.001) * scale, WRITTEN);
    const from = (inch(1.001) - 65 * step) * scale;
    sameShare(num(expected, 'x') - num(whole, 'x1'), from, WRITTEN);
    const part = elementsOf(svg).find(
      (each) => each.name === 'rect' && each.at['width'] === '12' && each.at['height'] === '12',
    );
    const at = num(part, 'x') + 6 - num(whole, 'x1');
    sameShare(at, (inch(1.004) - 65 * step) * scale, WRITTEN);
    expect(said.alt(numbers, showIn('in'))).toContain(
      'Part, over its crests 1.0040 in. Tracks: 0.0015 in either side of a whole count. Expected over the crests: 1.0010 to 1.0059 in',
    );
  });

  test('where nobody has counted, whole counts have places but no numbers', () => {
    const numbers = {
      transversePitch: mm(1),
      wholeAt: mm(19.9),
      below: mm(0.03),
      above: mm(0.03),
      marks: [{ what: 'bar', diameter: mm(20.3) }],
      expected: null,
      next: { from: mm(20.3), to: mm(19.9), off: mm(0.4) },
    } as const;
    const said = en.pictures.trackingStrip;
    const svg = drawPicture('trackingStrip', numbers, said.words(numbers, showIn('mm')));
    const ticks = figures(svg, 'wholeCount').map((tick) => num(tick, 'x1'));
    expect(ticks).toContain(num(figure(svg, 'next'), 'x2'));
    const [a = 0, b = 0] = ticks;
    sameShare(lengthOf(figure(svg, 'next')), (0.4 * Math.PI * (b - a)) / 1, 0.001);
    expect(svg).not.toContain('teeth');
  });

  test('a bar many counts over its blank breaks the strip, visibly and in words', () => {
    const numbers = {
      transversePitch: mm(1),
      below: mm(0.03),
      above: mm(0.03),
      marks: [
        { what: 'bar', diameter: mm(30) },
        { what: 'blank', diameter: mm(20.05) },
      ],
      wholeAt: null,
      expected: null,
      next: null,
    } as const;
    const svg = drawPicture(
      'trackingStrip',
      numbers,
      en.pictures.trackingStrip.words(numbers, showIn('mm')),
    );
    expect(svg).toContain('data-break');
    expect(svg).toContain('Strip broken');
  });
});

describe('set-up sketch', () => {
  test('what is not said to be broken stands in one proportion', () => {
    let compared = 0;
    for (const { numbers: n, svg } of drawn('setupSketch')) {
      const part = figure(svg, 'blankDiameter');
      const scale = num(part, 'data-scale');
      const isTrue = (each: Read): boolean => each.at['data-true'] === 'true';
      if (isTrue(part)) sameShare(2 * num(part, 'r'), n.blankDiameter * scale, WRITTEN);
      const wheel = figure(svg, 'wheelDiameter');
      if (isTrue(wheel)) sameShare(2 * num(wheel, 'r'), n.wheelDiameter * scale, WRITTEN);
      const length = figure(svg, 'length');
      if (isTrue(length)) sameShare(lengthOf(length), n.length * scale, WRITTEN);
      const [out] = figures(svg, 'stickout');
      if (out !== undefined && n.stickout !== null && isTrue(out)) {
        compared += 1;
        sameShare(lengthOf(out), Math.max(n.stickout, n.length) * scale, WRITTEN);
      }
      const all = [part, wheel, length, ...(out === undefined ? [] : [out])];
      if (!all.every(isTrue)) {
        expect(svg).toContain('Scale broken');
        expect(svg).toMatch(/data-break|stroke-dasharray="4 3"/u);
      }
      expect(figures(svg, 'wheelDiameter')).toHaveLength(n.opposed ? 2 : 1);
    }
    expect(compared).toBeGreaterThan(3);
  });

  test('a wall of half a millimetre is still seen, and said to be drawn thicker', () => {
    const request = requestOf({
      pitch: { system: 'metric', value: 0.2 },
      stock: mm(60),
      bore: mm(59),
      material: materialById('brass360') ?? requestOf().material,
    });
    const [{ svg } = { svg: '' }] = drawn('setupSketch', request);
    expect(svg).toContain('Scale broken');
    const radii = elementsOf(svg)
      .filter((each) => each.name === 'circle')
      .map((each) => num(each, 'r'));
    const [part = 0, bore = 0] = radii;
    expect(part - bore).toBeGreaterThanOrEqual(2.5 - WRITTEN);
  });
});

describe('developed pattern', () => {
  const numbers = (toothError: number, families: 'crossed' | 'straight' | 'square') =>
    ({
      toothCount: 57,
      transversePitch: mm(1.2),
      helix: mm(Math.PI / 6) as unknown as PictureNumbers['developedPattern']['helix'],
      families,
      toothError,
      tracks: toothError === 0,
    }) as const;
  const svgFor = (n: PictureNumbers['developedPattern']): string =>
    drawPicture('developedPattern', n, en.pictures.developedPattern.words(n, showIn('mm')));
  const groove = (svg: string, dashed: boolean): readonly Read[] =>
    elementsOf(svg).filter(
      (each) =>
        each.name === 'line' &&
        (each.at['stroke-dasharray'] !== undefined) === dashed &&
        each.at['stroke-width'] !== '1' &&
        num(each, 'y1') < 165,
    );

  test('grooves of a crossed pattern lean by the helix either way', () => {
    for (const line of groove(svgFor(numbers(0, 'crossed')), false)) {
      const lean = Math.atan2(num(line, 'x2') - num(line, 'x1'), num(line, 'y1') - num(line, 'y2'));
      sameShare(Math.abs(lean), Math.PI / 6, 1e-4);
    }
  });

  test('a straight knurl shows the teeth it says, and a second turn beside them by the error', () => {
    const svg = svgFor(numbers(0.3, 'straight'));
    const first = groove(svg, false).map((line) => num(line, 'x1'));
    const second = groove(svg, true).map((line) => num(line, 'x1'));
    expect(first).toHaveLength(8 + 1);
    expect(svg).toContain('>8 of 57 teeth round, to scale<');
    const pitch = (first[1] ?? 0) - (first[0] ?? 0);
    sameShare((second[0] ?? 0) - (first[0] ?? 0), 0.3 * pitch, WRITTEN);
  });

  test('a square pattern splits round the work; its rings, a pitch apart, fall into themselves', () => {
    const n = numbers(0.3, 'square');
    const svg = svgFor(n);
    const rows = (dashed: boolean): readonly number[] =>
      groove(svg, dashed)
        .filter((line) => line.at['y1'] === line.at['y2'])
        .map((line) => num(line, 'y1'));
    expect(rows(false).length).toBeGreaterThan(1);
    expect(rows(true)).toEqual(rows(false));
    const along = groove(svg, false).filter((line) => line.at['x1'] === line.at['x2']);
    const pitch = num(along[1], 'x1') - num(along[0], 'x1');
    sameShare((rows(false)[0] ?? 0) - (rows(false)[1] ?? 0), pitch, WRITTEN);
    expect(svg).toContain('fall into themselves');
    expect(en.pictures.developedPattern.alt(n, showIn('mm'))).toContain('fall into themselves');
  });

  test('a blank of few teeth that is whole all the same is not said to split', () => {
    const request = requestOf({
      pitch: { system: 'metric', value: 1 },
      stock: mm(1.3),
      material: materialById('brass360') ?? requestOf().material,
    });
    const pictures = picturesOf(request) ?? [];
    expect(pictures.map(({ kind }) => kind)).toEqual(['toothForm', 'trackingStrip', 'setupSketch']);
    const off = picturesOf({ ...request, stock: mm(1.45), asIs: true }) ?? [];
    expect(off.map(({ kind }) => kind)).toContain('developedPattern');
  });

  test('a blank that tracks shows no second turn', () => {
    expect(groove(svgFor(numbers(0, 'straight')), true)).toHaveLength(0);
  });
});
