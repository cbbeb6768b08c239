/** A line as long as a platform lets through comes to an end, whatever it repeats: doubling would not. */
import { expect, test } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { openDesk, plainShop } from '../../src/desk/index.ts';

const LONGEST = 6_000;
/** Words that look ahead for what they belong to: each once doubled the work for the next. */
const REPEATED = ['part', 'bar', 'material', '1.0 tpi 21', '25 rpm 200', '1.5 long', 'x', '1.0 x'];
const VERBS = [
  '/knurl',
  '/knurl trouble',
  '/knurl result',
  '/shop wheels add KL-1',
  '/shop machines add lathe',
];

test.each(VERBS)('%s', { timeout: 60_000 }, async (verb) => {
  const desk = openDesk(FLEET, plainShop('in'));
  for (const words of REPEATED) {
    const line = `${verb} ${`${words} `.repeat(LONGEST / (words.length + 1))}`;
    const answer = await desk.answer({
      shop: '',
      person: { id: 'ines', name: 'Ines' },
      place: { channel: 'floor', thread: null, isPrivate: false },
      interactionId: words,
      given: { words: line },
    });
    expect({ words, kind: answer.kind }).toEqual({ words, kind: 'refusal' });
  }
});
