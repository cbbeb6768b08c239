/** A shop that was told very much: invented entries by the thousand, the same for the same seed. */
import type { ForFind } from '../../../src/shop/index.ts';
import { mulberry32, oneOf } from '../random.ts';
import {
  MACHINES,
  MATERIALS,
  NOTES,
  PARTS,
  PATTERNS,
  PEOPLE,
  PITCHES,
  PRODUCTS,
  SIZES,
} from './words.ts';

export { ASKED } from './asked.ts';

const SEED = 20_250_106;
const FIRST_JOB = 10_000;
const SIGNS = Array.from('2346789CFHJKMPRTWXY');
const CODE_LENGTH = 5;
/** A thing is told every so often. */
export const EVERY_MS = 20 * 60_000;

type Kind = ForFind['kind'];

/** Of a hundred entries most are cards; some came out in a result, a few in a standard. */
const kindFor = (share: number): Kind => {
  if (share < 0.7) return 'card';
  if (share < 0.9) return 'result';
  return share < 0.97 ? 'question' : 'standard';
};

/** One entry after the other: lines as they are typed for a card, and what is said about parts. */
export function* told(from: number): Generator<ForFind> {
  const random = mulberry32(SEED);
  const some = (words: readonly string[]): string => oneOf(random, words);
  for (let at = 0; ; at += 1) {
    const kind = kindFor(random());
    const job = `J-${String(FIRST_JOB + at)}`;
    const made = [some(SIZES), some(PATTERNS), some(PITCHES), some(MATERIALS)].join(' ');
    const what = `${some(PRODUCTS)} ${some(PARTS)}`;
    const said = kind === 'card' ? `on ${some(MACHINES)}` : `${some(NOTES)}, ${some(PEOPLE)}`;
    const code = Array.from({ length: CODE_LENGTH }, () => oneOf(random, SIGNS)).join('');
    yield {
      kind,
      id: `t${String(at)}`,
      code: kind === 'card' ? code : null,
      at: from + at * EVERY_MS,
      approved: kind === 'standard' && random() < 0.5,
      texts: [job, made, what, said],
    };
  }
}
