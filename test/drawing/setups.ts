/** Set-ups for the pictures: usual ones, and those at the ends of what is answered. */
import fc from 'fast-check';
import { setupPictures } from '../../commands/knurl/pictures.ts';
import {
  degrees,
  materialById,
  mm,
  OutOfRange,
  type SetupRequest,
  setUp,
  wholeToothDiameter,
} from '../../src/calc/index.ts';
import type { Card, Picture } from '../../src/card/index.ts';
import { drawPicture } from '../../src/drawing/index.ts';
import { en, type SpokenPicture, speakPictures } from '../../src/phrases/index.ts';
import { anySetup } from '../support/anySetup.ts';
import { between, mulberry32, oneOf } from '../support/random.ts';
import { requestOf } from '../support/setupRequest.ts';

/** The pictures of a set-up; none where the set-up makes no sense. */
export const picturesOf = (request: SetupRequest): readonly Picture[] | null => {
  try {
    return setupPictures(request, setUp(request));
  } catch (error) {
    if (error instanceof OutOfRange) return null;
    throw error;
  }
};

export const spokenIn = (
  units: 'in' | 'mm',
  pictures: readonly Picture[],
): readonly SpokenPicture[] => speakPictures(en, { pictures, units } as Card);

export const svgOf = (spoken: SpokenPicture): string =>
  drawPicture(spoken.kind, spoken.numbers, spoken.words);

/** From 4 teeth to thousands, pitch 0.2 to 3.2 mm, walls down to half a millimetre, any hold. */
const extremes = (count: number, seed: number): readonly SetupRequest[] => {
  const random = mulberry32(seed);
  return Array.from({ length: count }, () => {
    const pitch = oneOf(random, [0.2, 0.5, 1, 1.6, 3.2]);
    const teeth = Math.round(oneOf(random, [4, 12, 65, 600, 2400]) * between(random, 1, 1.2));
    const stock = Math.min(500, wholeToothDiameter(teeth, mm(pitch)) * between(random, 1, 1.01));
    const length = between(random, 1, 400);
    return requestOf({
      pattern: oneOf(random, [
        { kind: 'straight' },
        { kind: 'diagonal', hand: 'left' },
        { kind: 'diamond', points: 'raised' },
        { kind: 'square', points: 'raised' },
      ] as const),
      pitch: { system: 'metric', value: pitch },
      stock: mm(stock),
      asIs: random() < 0.4,
      material: materialById('brass-free') ?? requestOf().material,
      length: random() < 0.3 ? null : mm(length),
      stickout: random() < 0.3 ? null : mm(length + between(random, 0, 400)),
      support: oneOf(random, ['chuck', 'tailstock', 'centres'] as const),
      layout: oneOf(random, ['oneSided', 'opposed', null] as const),
      bore: random() < 0.3 && stock > 12 * pitch ? mm(stock - Math.max(1, 4 * pitch)) : null,
      included: degrees(oneOf(random, [70, 90])),
    });
  });
};

/** So many set-ups that make sense, half of them extreme; the same every time. */
export const manySetups = (count: number): readonly (readonly Picture[])[] => {
  const usual = fc.sample(anySetup, { numRuns: count, seed: 8 });
  const far = extremes(count, 8);
  const drawn = (list: readonly SetupRequest[]) =>
    list
      .map(picturesOf)
      .filter((each) => each !== null)
      .slice(0, count / 2);
  return [...drawn(usual), ...drawn(far)];
};
